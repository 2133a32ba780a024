import { covarianceOf, estimateCovariance } from '../fit/covariance.ts';
import { parameterGradient, uncertaintyOf } from '../fit/uncertaintyOf.ts';
import { readingsReach, shiftOf } from './ladderReach.ts';
import type { LadderRung } from './ladderRung.ts';
import type { LadderSheets } from './ladderSheets.ts';

/**
 * How far outside the readings, in pH, a constant may lie that is still seen.
 * Where the run begins, a quarter of such a group has its proton in another
 * place than the rest. Where it ends there is titrant in excess, and an error
 * of any volume, strength, of pKw or of the electrode looks like a group.
 */
const outsideBeginning = 0.5;
const outsideEnd = 0.1;
/** A constant that is less certain than this, in pH, is no constant. */
const largestUncertainty = 0.5;
/** Standard uncertainties that an amount must be away from nothing, and a difference from that of alike groups. */
const certain = 3;
const apart = 2;
/**
 * Two alike groups that do not feel each other differ by this much for
 * statistical reasons alone, and make the curve of one at twice the concentration.
 */
const differenceOfAlikeGroups = Math.log10(4);

/** What speaks against counting the groups of a rung, its carbonate or its excess; empty where nothing does. */
export function ladderAgainst(rung: LadderRung, sheets: LadderSheets): string[] {
  const { end, weighted, problem } = rung;
  if (end === null) return ['it could not be fitted'];
  const estimate = estimateCovariance(end.jacobian, weighted.residualCount, weighted.parameterCount);
  const position = (id: string) => problem.parameters.findIndex((parameter) => parameter.id === id);
  const uncertainty = (id: string): number | null => {
    const j = position(id);
    const variance = covarianceOf(estimate, j, j);
    return variance === null ? null : Math.sqrt(Math.max(0, variance));
  };
  const value = (id: string) => end.values.get(id) ?? 0;
  const reach = readingsReach(rung);
  const against: string[] = [];

  const crossings = rung.constants.map((id, k) => value(id) - shiftOf(rung, k, reach.ionicStrength));
  const shown = new Set<number>();
  rung.constants.forEach((id, k) => {
    if (position(id) < 0) return;
    const u = uncertainty(id);
    const above = crossings[k] - reach.highest;
    const below = reach.lowest - crossings[k];
    const outside = Math.max(above, below);
    const allowed = (above > 0 ? 'acid' : 'base') === rung.run.run.design.titrantKind ? outsideBeginning : outsideEnd;
    const name = nameOf(k);
    if (outside > allowed || (u !== null && outside > 0 && outside + u > outsideBeginning))
      against.push(`${name} would lie ${above > 0 ? 'above' : 'below'} the readings`);
    else if (u === null || u > largestUncertainty) against.push(`${name} would not be determined`);
    else shown.add(k);
  });
  if (position(rung.concentration) >= 0) {
    const u = uncertainty(rung.concentration);
    if (u !== null && value(rung.concentration) < certain * u)
      against.push('the fitted concentration is not above nothing');
    for (let k = 0; k + 1 < rung.constants.length; k++) {
      if (!shown.has(k) || !shown.has(k + 1)) continue;
      const quantities = new Float64Array(rung.run.values.length);
      const { design } = rung.run.run;
      quantities[design.quantities.findIndex(({ id }) => id === rung.constants[k])] = -1;
      quantities[design.quantities.findIndex(({ id }) => id === rung.constants[k + 1])] = 1;
      const uDifference = uncertaintyOf(estimate, parameterGradient(rung.run.run, quantities, estimate.parameterCount));
      const difference = crossings[k + 1] - crossings[k];
      if (uDifference === null || difference > differenceOfAlikeGroups + apart * uDifference) continue;
      against.push(
        `${nameOf(k)} and ${nameOf(k + 1)} would lie closer than one group at twice the concentration allows`,
      );
    }
  }
  const openedAmount = (id: string, words: string, signed: boolean) => {
    if (position(id) < 0) return;
    const u = uncertainty(id);
    if (u === null) against.push(`${words} is not determined`);
    else if ((signed ? Math.abs(value(id)) : value(id)) < certain * u) against.push(`${words} is not above nothing`);
  };
  if (sheets.carbonate === 'open' && rung.kind.carbonate)
    openedAmount(`${sheets.carbonateVessel}.carbonate`, `the carbonate in the ${sheets.carbonateVessel}`, false);
  if (sheets.excess === 'open' && rung.kind.excess && rung.kind.groups > 0)
    openedAmount('sample.strongIon', 'the excess of strong acid or base', true);
  return against;
}

function nameOf(place: number): string {
  return `pKa${'₁₂₃₄₅₆'[place]}`;
}
