import type { ProblemFit } from '../fit/fitProblem.ts';
import { parameterGradient, uncertaintyOf } from '../fit/uncertaintyOf.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import { equivalenceVolumes } from '../model/equivalenceVolumes.ts';
import { numberOrNull } from './numberOrNull.ts';
import type { EquivalenceResult } from './runResult.ts';
import type { StepsOfReadings } from './stepsOfReadings.ts';

/** Equivalence volumes of every step by the fit. */
export function equivalenceByFit(fit: ProblemFit, weighted: WeightedRun): EquivalenceResult[] {
  return equivalenceVolumes(weighted.run.design, weighted.values).map((found) => {
    const gradient = parameterGradient(weighted.run, found.gradient, fit.weighted.parameterCount);
    const u = uncertaintyOf(fit.covariance, gradient);
    // Where nothing that moves has an influence, the volume is as fixed as what it follows from.
    const isMoved = gradient.some((g) => g !== 0);
    return {
      analyte: found.analyte,
      step: found.step,
      volume_mL: u === null ? null : numberOrNull(found.volume_mL),
      u: u === null || !isMoved ? null : numberOrNull(u),
      by: 'fit' as const,
      remark: found.countedAs,
    };
  });
}

/**
 * Names the steps of the readings after the fitted ones they lie nearest to;
 * a step near none keeps its own number and no analyte.
 */
export function equivalenceByReadings(
  { derivative, gran }: StepsOfReadings,
  fitted: readonly EquivalenceResult[],
): EquivalenceResult[] {
  const results: EquivalenceResult[] = derivative.map((step, index) => ({
    ...nameOf(step.volume_mL, index + 1, fitted),
    volume_mL: step.volume_mL,
    u: step.u_mL,
    by: 'derivative' as const,
    remark: `steepest point; ${step.pointsUsed[1] - step.pointsUsed[0] + 1} points around it`,
  }));
  for (const line of gran) {
    if (line.volume_mL === null) continue;
    results.push({
      ...nameOf(line.volume_mL, line.step, fitted),
      volume_mL: line.volume_mL,
      u: line.u_mL,
      by: 'gran',
      remark: `${line.kind}; ${line.pointsUsed} points from ${line.range_mL[0].toFixed(3)} to ${line.range_mL[1].toFixed(3)} mL`,
    });
  }
  return results;
}

function nameOf(
  volume: number,
  number: number,
  fitted: readonly EquivalenceResult[],
): { analyte: string; step: number } {
  let nearest: { analyte: string; step: number; distance: number } | null = null;
  for (const { analyte, step, volume_mL } of fitted) {
    if (volume_mL === null) continue;
    const distance = Math.abs(volume_mL - volume);
    if (nearest === null || distance < nearest.distance) nearest = { analyte, step, distance };
  }
  // A tenth of the volume: an inflection may lie off its equivalence point, but not as far as the next step.
  return nearest !== null && nearest.distance < 0.1 * Math.max(volume, 1)
    ? { analyte: nearest.analyte, step: nearest.step }
    : { analyte: '', step: number };
}
