import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Disagreement beyond this many joint standard uncertainties is not chance. */
const factor = 3;
/** Part of the mean spacing of the points below which a difference of steepest points proves nothing. */
const smallestPartOfSpacing = 0.25;

/**
 * Derivative and Gran volumes of the readings that differ from those of the
 * fitted curve. Both are taken at the same volumes, so that the grid moves
 * them alike, and an inflection need not be an equivalence point.
 */
export function volumesDisagree({ readSteps, curveSteps, weighted, fit, index }: Analysis): Doubt[] {
  const { setting_mL } = fit.noise[index];
  const { volumes } = weighted.run;
  const first = volumes.reduce((a, b) => Math.min(a, b));
  const last = volumes.reduce((a, b) => Math.max(a, b));
  const smallest = (smallestPartOfSpacing * (last - first)) / Math.max(1, volumes.length - 1);
  const doubts: Doubt[] = [];

  for (const read of readSteps.derivative) {
    const nearest = nearestOf(read.volume_mL, curveSteps.derivative);
    const joint = Math.hypot(read.uNoise_mL, setting_mL);
    if (nearest !== null && Math.abs(nearest - read.volume_mL) <= Math.max(factor * joint, smallest)) continue;
    doubts.push(doubt('The readings are steepest', read.volume_mL, nearest, joint));
  }
  for (const read of readSteps.gran) {
    if (read.volume_mL === null) continue;
    const counterpart = curveSteps.gran.find((line) => line.kind === read.kind && line.step === read.step);
    if (counterpart === undefined || counterpart.volume_mL === null) continue;
    const joint = Math.hypot(read.u_mL, setting_mL);
    if (Math.abs(counterpart.volume_mL - read.volume_mL) <= factor * joint) continue;
    doubts.push(
      doubt(`The Gran line of the readings (${read.kind}) ends`, read.volume_mL, counterpart.volume_mL, joint),
    );
  }
  return doubts;
}

function nearestOf(volume: number, steps: readonly { readonly volume_mL: number }[]): number | null {
  let nearest: number | null = null;
  for (const { volume_mL } of steps)
    if (nearest === null || Math.abs(volume_mL - volume) < Math.abs(nearest - volume)) nearest = volume_mL;
  return nearest;
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
