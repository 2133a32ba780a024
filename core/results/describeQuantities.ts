import { constantInMedium } from '../chemistry/constantInMedium.ts';
import type { ProblemFit } from '../fit/fitProblem.ts';
import { covarianceBetween, parameterGradient, uncertaintyOf } from '../fit/uncertaintyOf.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import { covarianceInterval } from '../inference/covarianceInterval.ts';
import type { Quantity } from '../model/quantity.ts';
import type { RunDesign } from '../model/runDesign.ts';
import type { Sheet } from '../sheet/sheet.ts';
import type { Speciation } from '../speciation/speciation.ts';
import { assumedInfluences } from './assumedInfluence.ts';
import { numberOrNull } from './numberOrNull.ts';
import type { ConstantResult, QuantityResult } from './runResult.ts';

/** A result rests on an assumption that would move it by more than this part of its standard uncertainty. */
const noticeableShift = 0.3;
/** Or, for assumed knowledge that takes part in the fit, on one that makes up more than this part of its variance. */
const noticeableShare = 0.1;

/** Every quantity of a fitted run with its uncertainty, or the reason why it has none. */
export function describeQuantities(
  fit: ProblemFit,
  weighted: WeightedRun,
  sheet: Sheet,
  degreesOfFreedom: number,
  speciation: Speciation,
): QuantityResult[] {
  const { design, bindings } = weighted.run;
  const { parameterCount } = fit.weighted;
  const influences = assumedInfluences(fit, weighted);
  const assumedKnowledge = design.quantities.flatMap(({ id, declaration }, q) => {
    const binding = bindings[q];
    return declaration.state === 'known' && declaration.assumed && binding.kind === 'known'
      ? [{ id, parameter: binding.terms[0].parameter }]
      : [];
  });

  return design.quantities.map((quantity, q) => {
    const value = weighted.values[q];
    const common = {
      id: quantity.id,
      label: quantity.label,
      unit: quantity.unit,
      state: stateOf(quantity),
      constant: describeConstant(quantity, value, design, sheet, speciation),
    };
    if (bindings[q].kind === 'constant')
      return { ...common, value: numberOrNull(value), u: null, interval95: null, whyNoU: 'fixed', restsOn: [] };

    const unit = new Float64Array(design.quantities.length);
    unit[q] = 1;
    const gradient = parameterGradient(weighted.run, unit, parameterCount);
    const u = uncertaintyOf(fit.covariance, gradient);
    if (u === null) return { ...common, value: null, u: null, interval95: null, whyNoU: 'undetermined', restsOn: [] };
    if (!(degreesOfFreedom > 0))
      return {
        ...common,
        value: numberOrNull(value),
        u: null,
        interval95: null,
        whyNoU: 'no-degrees-of-freedom',
        restsOn: [],
      };

    const restsOn: string[] = [];
    for (const { id, parameterShift } of influences) {
      let shift = 0;
      for (let a = 0; a < parameterCount; a++) shift += gradient[a] * parameterShift[a];
      if (Math.abs(shift) > noticeableShift * u) restsOn.push(id);
    }
    for (const { id, parameter } of assumedKnowledge) {
      const knowledge = new Float64Array(parameterCount);
      knowledge[parameter] = 1;
      const covariance = covarianceBetween(fit.covariance, gradient, knowledge);
      // The part of the variance that an error δ of unit variance passes on.
      if (covariance !== null && id !== quantity.id && covariance ** 2 > noticeableShare * u ** 2) restsOn.push(id);
    }
    if (quantity.role.kind === 'acidity' && quantity.declaration.state === 'fitted')
      restsOn.push(...assumedConditions(sheet));
    return {
      ...common,
      value: numberOrNull(value),
      u: numberOrNull(u),
      interval95: covarianceInterval(value, u, degreesOfFreedom),
      whyNoU: null,
      restsOn,
    };
  });
}

/** What the quantities of an unfitted run are: declared, or not known. */
export function describeUnfitted(design: RunDesign): QuantityResult[] {
  return design.quantities.map((quantity) => {
    const { declaration } = quantity;
    const declared = declaration.state !== 'fitted';
    return {
      id: quantity.id,
      label: quantity.label,
      unit: quantity.unit,
      state: stateOf(quantity),
      value: declared ? declaration.value : null,
      u: declaration.state === 'known' ? declaration.u : null,
      interval95: null,
      whyNoU: declaration.state === 'known' ? null : declared ? 'fixed' : 'not-fitted',
      restsOn: [],
      constant: null,
    };
  });
}

/** Conditions that are no quantities but give a constant its meaning. */
function assumedConditions(sheet: Sheet): string[] {
  const conditions: string[] = [];
  if (sheet.medium.temperature.assumed) conditions.push('medium.temperature');
  if (sheet.medium.activity.assumed) conditions.push('medium.activity');
  if (sheet.reading.scale.assumed) conditions.push('reading.scale');
  return conditions;
}

function stateOf({ declaration }: Quantity): QuantityResult['state'] {
  return declaration.assumed ? 'assumed' : declaration.state;
}

function describeConstant(
  quantity: Quantity,
  value: number,
  design: RunDesign,
  sheet: Sheet,
  speciation: Speciation,
): ConstantResult | null {
  if (quantity.role.kind !== 'acidity') return null;
  const { group } = quantity.role;
  const s = design.systems.findIndex(
    ({ firstGroup, shape }) => group >= firstGroup && group < firstGroup + shape.groups,
  );
  const system = design.systems[s];
  const own = group - system.firstGroup;
  const acidCharge = system.shape.chargeFullyProtonated - own;
  const ionicStrength = speciation.ionicStrengthAt(speciation.crossing(s, own));
  const common = { temperature_C: sheet.medium.temperature.value, ionicStrength_M: ionicStrength };
  if (design.coefficientA === 0) {
    const kind = design.scale === 'activity' ? 'mixed' : 'concentration';
    return {
      ...common,
      kind,
      thermodynamic: null,
      concentration: kind === 'concentration' ? numberOrNull(value) : null,
      mixed: kind === 'mixed' ? numberOrNull(value) : null,
    };
  }
  const convert = (scale: 'concentration' | 'mixed') =>
    numberOrNull(constantInMedium(value, acidCharge, ionicStrength, design.coefficientA, scale));
  return {
    ...common,
    kind: 'thermodynamic',
    thermodynamic: numberOrNull(value),
    concentration: convert('concentration'),
    mixed: convert('mixed'),
  };
}
