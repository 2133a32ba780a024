import type { LadderRung } from './ladderRung.ts';
import type { LadderSheets } from './ladderSheets.ts';

/** How a rung is contained in another: where the larger one must be put to make the curve of the smaller. */
export type Nesting =
  /** The same groups; what is fitted in addition stands at its declared value. */
  | { readonly kind: 'same-groups' }
  /** One group more, out of reach at the upper or the lower end of the constants. */
  | { readonly kind: 'group-out-of-reach'; readonly end: 'upper' | 'lower'; readonly place: number }
  /** One group, of a substance at a concentration of nothing. */
  | { readonly kind: 'nothing-there' }
  /** One group that is always lost (lower) or never lost (upper): a strong acid or base. */
  | { readonly kind: 'strong'; readonly end: 'upper' | 'lower' };

/** Says how the smaller rung is contained in the larger one; null where it is not, or not directly. */
export function ladderNesting(smaller: LadderRung, larger: LadderRung, sheets: LadderSheets): Nesting | null {
  const [few, many] = [smaller.kind, larger.kind];
  const added = Number(many.carbonate) - Number(few.carbonate) + Number(many.excess) - Number(few.excess);
  if (few.groups === many.groups) {
    const within = Number(few.carbonate) <= Number(many.carbonate) && Number(few.excess) <= Number(many.excess);
    return within && added > 0 ? { kind: 'same-groups' } : null;
  }
  if (many.groups !== few.groups + 1 || few.carbonate !== many.carbonate) return null;
  const { design } = larger.run.run;
  const analyte = design.systems.find(({ prefix, role }) => role === 'analyte' && prefix === sheets.prefix);
  if (analyte === undefined) return null;
  // With its ions declared apart, a substance counts from its uncharged form.
  const lost = analyte.protonsLostAsWeighed ?? analyte.shape.chargeFullyProtonated;
  if (few.groups > 0) {
    if (few.excess !== many.excess) return null;
    const place = many.keys.findIndex((key) => !few.keys.includes(key));
    if (place === many.keys.length - 1 && place >= lost) return { kind: 'group-out-of-reach', end: 'upper', place };
    if (place === 0 && lost > 0) return { kind: 'group-out-of-reach', end: 'lower', place };
    return null;
  }
  if (!larger.problem.parameters.some(({ id }) => id === larger.concentration)) return null;
  if (many.excess) return few.excess ? { kind: 'nothing-there' } : null;
  return strongLimit(smaller, larger, analyte.shape.chargeFullyProtonated, lost);
}

/**
 * A strong acid or base as a substance with one group. With activity
 * coefficients, only where no form has a charge of two: the ionic strength of
 * the salt would give it away.
 */
function strongLimit(smaller: LadderRung, larger: LadderRung, charge: number, lost: number): Nesting | null {
  const strongIon = smaller.end?.values.get('sample.strongIon') ?? 0;
  const counterIon = larger.kind.sheet.sample.analytes.some((analyte) => analyte.counterIon !== null);
  const declared = larger.kind.sheet.sample.strongIon;
  if (counterIon || declared.state !== 'fixed' || declared.value !== 0) return null;
  const plain = larger.run.run.design.coefficientA === 0;
  if (strongIon < 0 && lost === 0 && (plain || charge === 0 || charge === 1)) return { kind: 'strong', end: 'lower' };
  if (strongIon > 0 && lost === 1 && (plain || charge === 0 || charge === 1)) return { kind: 'strong', end: 'upper' };
  return null;
}
