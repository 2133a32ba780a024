import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Disagreement beyond this many joint standard uncertainties is not chance. */
const factor = 3;

/**
 * Steps of the readings that are not where the fitted curve has them. Both are
 * taken at the same volumes, so that the grid moves them alike and an
 * inflection need not be an equivalence point.
 */
export function volumesDisagree({ readSteps, curveSteps, weighted, fit, index }: Analysis): Doubt[] {
  const setting = fit.noise[index].setting_mL;
  return readSteps.flatMap((read): Doubt[] => {
    const curve = curveSteps.reduce<(typeof curveSteps)[number] | null>(
      (best, step) =>
        best === null || Math.abs(step.volume_mL - read.volume_mL) < Math.abs(best.volume_mL - read.volume_mL)
          ? step
          : best,
      null,
    );
    const volumes = weighted.run.volumes;
    const spacing = volumes.length > 1 ? (Math.max(...volumes) - Math.min(...volumes)) / (volumes.length - 1) : 0;
    const joint = Math.hypot(read.uNoise_mL, setting);
    const distance = curve === null ? Number.POSITIVE_INFINITY : Math.abs(curve.volume_mL - read.volume_mL);
    // A single point may belong to either side of a steep step, so that less than the spacing there proves nothing.
    if (distance <= factor * joint || distance <= 0.25 * spacing) return [];
    return [
      {
        code: 'volumes-disagree',
        seen:
          curve === null
            ? `The readings are steepest at ${read.volume_mL.toFixed(3)} mL; the fitted curve has no step there.`
            : `The readings are steepest at ${read.volume_mL.toFixed(3)} mL, the fitted curve at ${curve.volume_mL.toFixed(3)} mL; noise explains ${joint.toFixed(3)} mL.`,
        means: 'The model does not describe this step: its equivalence volume and the concentration are in doubt.',
        remedy: 'Check the number of groups, the form weighed, carbonate, and points that stand out near this step.',
        place: { volume_mL: read.volume_mL },
      },
    ];
  });
}
