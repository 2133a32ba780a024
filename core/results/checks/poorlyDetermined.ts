import type { OpenMember } from '../../inference/identifiability.ts';
import { identifiabilityInWords, listed, nameOf } from '../../inference/identifiabilityInWords.ts';
import { bindingTerms } from '../../model/binding.ts';
import type { Quantity } from '../../model/quantity.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import type { QuantityResult } from '../runResult.ts';

/** Relative uncertainty beyond which an amount, volume or gain says little (common practice: a titration gives 1 % or better). */
const poorRelative = 0.1;
/** The same for constants and the electrode, in pH. */
const poorPH = 0.2;
/** Times by which the uncertainty grows because the others are not known: less has another reason, such as noise. */
const leastGrowth = 20;
/** Part of a direction that a quantity must make up to be named in it. */
const leastPart = 0.1;

/** Fitted quantities that the run fixes well in combination and poorly one by one. */
export function poorlyDetermined({ fit, weighted, quantities }: Analysis): Doubt[] {
  const { columnScales, singularValues, rightVectors, parameterCount, rank } = fit.covariance;
  const { run } = weighted;
  const named = new Set<string>();
  const doubts: Doubt[] = [];
  for (let k = rank - 1; k >= 0 && singularValues[k] * leastGrowth < 1; k--) {
    const members = run.design.quantities.flatMap((quantity, q): (OpenMember & { part: number })[] => {
      const [term] = bindingTerms(run.bindings[q]);
      const { value, u } = quantities[q];
      if (run.bindings[q].kind !== 'parameter' || value === null || u === null || named.has(quantity.id)) return [];
      const part = rightVectors[k * parameterCount + term.parameter];
      const isPoor = u > poorSize(quantity, value, run.design.nernstSlope_mV);
      return isPoor && Math.abs(part) > leastPart && u * columnScales[term.parameter] > leastGrowth
        ? [{ quantity, value, change: part / columnScales[term.parameter], part: Math.abs(part) }]
        : [];
    });
    if (members.length < 2) continue;
    members.sort((a, b) => b.part - a.part);
    for (const { quantity } of members) named.add(quantity.id);
    doubts.push({
      code: 'poorly-determined',
      seen: `${identifiabilityInWords(members)} with any precision: ${listed(members.map((member) => describe(member, quantities)))}.`,
      means: `Singly they are hardly known, however well the curve fits; their intervals say how far ${members.length === 2 ? 'both' : 'all'} may move together.`,
      remedy: `Declare one of them: ${listed(members.map(nameOf))}.`,
      place: { quantity: members[0].quantity.id },
    });
  }
  return doubts;
}

function poorSize({ role }: Quantity, value: number, nernstSlope_mV: number): number {
  switch (role.kind) {
    case 'acidity':
    case 'ionProduct':
    case 'offset':
      return poorPH;
    case 'standardPotential':
      return poorPH * nernstSlope_mV;
    case 'junctionHydrogen':
    case 'junctionHydroxide':
      return Number.POSITIVE_INFINITY;
    default:
      return poorRelative * Math.abs(value);
  }
}

function describe(member: OpenMember, quantities: readonly QuantityResult[]): string {
  const { role, unit } = member.quantity;
  const u = quantities.find(({ id }) => id === member.quantity.id)?.u ?? 0;
  const isAbsolute = ['acidity', 'ionProduct', 'offset', 'standardPotential'].includes(role.kind);
  const size = isAbsolute
    ? `${u.toPrecision(2)}${unit === '' ? '' : ` ${unit}`}`
    : `${(100 * (u / Math.abs(member.value))).toPrecision(2)} %`;
  return `${nameOf(member)} to ${size}`;
}
