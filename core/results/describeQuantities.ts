import { constantInMedium } from '../chemistry/constantInMedium.ts';
import type { ProblemFit } from '../fit/fitProblem.ts';
import { covarianceBetween, parameterGradient } from '../fit/uncertaintyOf.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import type { Intervals } from '../inference/intervals.ts';
import { sharesOf } from '../inference/shares.ts';
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
  intervals: Intervals,
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

  return design.quantities.map((quantity, q): QuantityResult => {
    const value = weighted.values[q];
    const found = intervals.quantities[q];
    const without = {
      id: quantity.id,
      label: quantity.label,
      unit: quantity.unit,
      state: stateOf(quantity),
      u: null,
      interval95: null,
      restsOn: [],
      shares: [],
      profile: [],
      constant: describeConstant(quantity, value, design, sheet, speciation),
    };
    if (found === null) return { ...without, value: numberOrNull(value), whyNoU: 'fixed' };
    if (!(degreesOfFreedom > 0)) return { ...without, value: numberOrNull(value), whyNoU: 'no-degrees-of-freedom' };

    const [lower, upper] = found.interval;
    const profile = found.points.filter(({ rise }) => Number.isFinite(rise));
    const open = { ...without, value: null, constant: null, profile };
    if (found.u === null || (lower === null && upper === null)) return { ...open, whyNoU: 'undetermined' };
    const gradient = unitGradient(weighted, q, parameterCount);
    const restsOn = restsOnOf(quantity, gradient, found.u);
    if (lower === null || upper === null) return { ...open, interval95: [lower, upper], whyNoU: 'bound', restsOn };
    return {
      ...without,
      value: numberOrNull(value),
      u: numberOrNull(found.u),
      interval95: [lower, upper],
      whyNoU: null,
      restsOn,
      shares: sharesOf(fit, gradient),
      profile,
    };
  });

  function restsOnOf(quantity: Quantity, gradient: Float64Array, u: number): string[] {
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
    const isConstant = quantity.role.kind === 'acidity' && quantity.declaration.state === 'fitted';
    return isConstant ? [...restsOn, ...assumedConditions(sheet)] : restsOn;
  }
}

function unitGradient(weighted: WeightedRun, quantity: number, parameterCount: number): Float64Array {
  const unit = new Float64Array(weighted.run.bindings.length);
  unit[quantity] = 1;
  return parameterGradient(weighted.run, unit, parameterCount);
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
      shares: [],
      profile: [],
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
