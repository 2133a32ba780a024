import type { WeightedRun } from '../fit/weightedProblem.ts';
import { RunModel } from '../model/runModel.ts';
import type { CurveResult } from './runResult.ts';

/** Even points of the drawn curve, and extra points around every equivalence volume. */
const evenPoints = 240;
const pointsPerStep = 48;
/** Reach of the extra points to either side, as part of the whole volume. */
const stepReach = 0.03;

/** The curve of a run on a grid fine enough to draw its steps, in order of rising volume; null where it cannot be computed. */
export function drawCurve(
  weighted: WeightedRun,
  stepVolumes: readonly number[],
  pHOf: (reading: number) => number,
): CurveResult | null {
  const { volumes } = weighted.run;
  const first = volumes.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY);
  const last = volumes.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
  const span = last - first;
  const grid: number[] = [];
  for (let k = 0; k <= evenPoints; k++) grid.push(first + (span * k) / evenPoints);
  for (const volume of stepVolumes)
    for (let k = -pointsPerStep; k <= pointsPerStep; k++) {
      // Cubic spacing crowds the points where the curve is steepest.
      const at = volume + stepReach * span * (k / pointsPerStep) ** 3;
      if (at > first && at < last) grid.push(at);
    }
  const volume_mL = Float64Array.from(new Set(grid)).sort();
  const model = new RunModel(weighted.run.design, volume_mL, null);
  const reading = new Float64Array(volume_mL.length);
  if (!model.predict(weighted.values, reading)) return null;
  return { volume_mL, reading, pH: reading.map(pHOf), ionicStrength_M: model.ionicStrength.slice() };
}
