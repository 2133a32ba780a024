import type { DerivativeEndpoint } from '../../endpoints/derivativeEndpoints.ts';
import type { Doubt } from '../../notice/doubt.ts';
import { studentQuantile } from '../../numerics/studentQuantile.ts';
import type { Analysis } from '../analysis.ts';
import type { PointResult } from '../runResult.ts';

/** Disagreement beyond this many joint standard uncertainties is not chance. */
const factor = 3;
/** The same as a quantile of the normal distribution. */
const likelihood = 0.99865;
/** Part of the mean spacing of the points below which a difference of steepest points proves nothing. */
const smallestPartOfSpacing = 0.25;

/**
 * Residuals beside a step that the curve lacks are at least this large, in standard uncertainties (root mean square).
 * Less is noise on a shoulder, which makes a maximum of the slope here and none there.
 */
const noticeableMiss = 2;

/**
 * Derivative and Gran volumes of the readings that differ from those of the
 * fitted curve. Both are taken at the same volumes, so that the grid moves
 * them alike, and an inflection need not be an equivalence point.
 */
export function volumesDisagree({ readSteps, curveSteps, weighted, fit, index, points }: Analysis): Doubt[] {
  const { setting_mL } = fit.noise[index];
  const { volumes } = weighted.run;
  const first = volumes.reduce((a, b) => Math.min(a, b));
  const last = volumes.reduce((a, b) => Math.max(a, b));
  const smallest = (smallestPartOfSpacing * (last - first)) / Math.max(1, volumes.length - 1);
  const doubts: Doubt[] = [];

  for (const read of readSteps.derivative) {
    const counterpart = nearestWithin(read, curveSteps.derivative);
    const joint = Math.hypot(read.uNoise_mL, setting_mL);
    if (counterpart === null && missBeside(read, points) < noticeableMiss) continue;
    if (counterpart !== null && Math.abs(counterpart - read.volume_mL) <= Math.max(factor * joint, smallest)) continue;
    doubts.push(doubt('The readings are steepest', read.volume_mL, counterpart, joint));
  }
  // Gran functions start from the step before, so that lines are alike only where the same steps are seen.
  if (readSteps.derivative.length !== curveSteps.derivative.length) return doubts;
  for (const read of readSteps.gran) {
    if (read.volume_mL === null) continue;
    const counterpart = curveSteps.gran.find((line) => line.kind === read.kind && line.step === read.step);
    if (counterpart === undefined || counterpart.volume_mL === null) continue;
    const joint = Math.hypot(read.u_mL, setting_mL);
    // The scatter about a line of few points says little of its own uncertainty.
    const reach = Math.hypot(studentQuantile(likelihood, read.pointsUsed - 2) * read.u_mL, factor * setting_mL);
    if (Math.abs(counterpart.volume_mL - read.volume_mL) <= reach) continue;
    doubts.push(
      doubt(`The Gran line of the readings (${read.kind}) ends`, read.volume_mL, counterpart.volume_mL, joint),
    );
  }
  return doubts;
}

/** The step of the curve nearest to one of the readings, between the flattest places on either side of it. */
function nearestWithin(read: DerivativeEndpoint, steps: readonly DerivativeEndpoint[]): number | null {
  const [from, to] = read.flattest_mL;
  let nearest: number | null = null;
  for (const { volume_mL } of steps) {
    if (volume_mL < from || volume_mL > to) continue;
    if (nearest === null || Math.abs(volume_mL - read.volume_mL) < Math.abs(nearest - read.volume_mL))
      nearest = volume_mL;
  }
  return nearest;
}

/** Root mean square of the residuals between the flattest places beside a step, in standard uncertainties. */
function missBeside({ flattest_mL: [from, to] }: DerivativeEndpoint, points: readonly PointResult[]): number {
  const ratios = points.flatMap(({ volume_mL, residual, u }) =>
    residual !== null && u !== null && volume_mL >= from && volume_mL <= to ? [residual / u] : [],
  );
  return Math.sqrt(ratios.reduce((sum, ratio) => sum + ratio ** 2, 0) / Math.max(1, ratios.length));
}

function doubt(what: string, read: number, fitted: number | null, joint: number): Doubt {
  return {
    code: 'volumes-disagree',
    seen:
      fitted === null
        ? `${what} at ${read.toFixed(3)} mL; the fitted curve has no step there.`
        : `${what} at ${read.toFixed(3)} mL, the fitted curve at ${fitted.toFixed(3)} mL; noise explains ${joint.toFixed(3)} mL.`,
    means: 'The model does not describe this step: its equivalence volume and the concentration are in doubt.',
    remedy: 'Check the number of groups, the form weighed, carbonate, and points that stand out near this step.',
    place: { volume_mL: read },
  };
}
