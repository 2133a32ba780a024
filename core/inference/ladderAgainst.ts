import { covarianceOf, estimateCovariance } from '../fit/covariance.ts';
import { parameterGradient, uncertaintyOf } from '../fit/uncertaintyOf.ts';
import type { LadderRung } from './ladderRung.ts';
import { carbonateId, type ReadingsReach, shiftOf } from './ladderStarts.ts';
import type { LadderSheets } from './ladderSheets.ts';

/** A constant this far outside the readings, in pH, is still seen: a sixth of its group gives its proton within them. */
const reachOutside = 0.7;
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
export function ladderAgainst(rung: LadderRung, sheets: LadderSheets, reach: ReadingsReach): string[] {
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
  const against: string[] = [];

  const crossings = rung.constants.map((id, k) => value(id) - shiftOf(rung, k, reach.ionicStrength));
  rung.constants.forEach((id, k) => {
    if (position(id) < 0) return;
    const u = uncertainty(id);
    const outside = Math.max(crossings[k] - reach.highest, reach.lowest - crossings[k]);
    const name = nameOf(k);
    if (u === null || (u > largestUncertainty && outside <= 0)) against.push(`${name} is not determined`);
    else if (outside > 0 && outside + apart * u > reachOutside)
      against.push(`${name} would lie outside the readings, ${crossings[k] > reach.highest ? 'above' : 'below'} them`);
  });
  if (position(rung.concentration) >= 0) {
    const u = uncertainty(rung.concentration);
    if (u !== null && value(rung.concentration) < certain * u)
      against.push('the fitted concentration is not above nothing');
    for (let k = 0; k + 1 < rung.constants.length; k++) {
      if (position(rung.constants[k]) < 0 || position(rung.constants[k + 1]) < 0) continue;
      const quantities = new Float64Array(rung.run.values.length);
      const { design } = rung.run.run;
      quantities[design.quantities.findIndex(({ id }) => id === rung.constants[k])] = -1;
      quantities[design.quantities.findIndex(({ id }) => id === rung.constants[k + 1])] = 1;
      const uDifference = uncertaintyOf(estimate, parameterGradient(rung.run.run, quantities, estimate.parameterCount));
      const difference = crossings[k + 1] - crossings[k];
      if (uDifference === null || difference > differenceOfAlikeGroups + apart * uDifference) continue;
      against.push(`${nameOf(k)} and ${nameOf(k + 1)} would lie closer than one group at twice the concentration allows`);
    }
  }
  const openedAmount = (id: string, words: string, signed: boolean) => {
    if (position(id) < 0) return;
    const u = uncertainty(id);
    if (u === null) against.push(`${words} is not determined`);
    else if ((signed ? Math.abs(value(id)) : value(id)) < certain * u) against.push(`${words} is not above nothing`);
  };
  if (sheets.carbonate === 'open' && rung.kind.carbonate)
    openedAmount(carbonateId(sheets), `the carbonate in the ${sheets.carbonateVessel}`, false);
  if (sheets.excess === 'open' && rung.kind.excess && rung.kind.groups > 0)
    openedAmount('sample.strongIon', 'the excess of strong acid or base', true);
  return against;
}

function nameOf(place: number): string {
  return `pKa${'₁₂₃₄₅₆'[place]}`;
}
