import type { WeightedRun } from '../fit/weightedProblem.ts';
import { RunModel } from '../model/runModel.ts';
import type { Run } from '../run/run.ts';
import { numberOrNull } from './numberOrNull.ts';
import type { ReadingAsPH } from './readingAsPH.ts';
import type { PointResult } from './runResult.ts';
import type { UsedPoints } from './usedPoints.ts';

/** Every row of a run, with its distance from the curve where there is one. Excluded rows are compared as well. */
export function describePoints(
  run: Run,
  used: UsedPoints,
  asPH: ReadingAsPH,
  weighted: WeightedRun | null,
): PointResult[] {
  const residuals = weighted === null ? null : residualsOfRows(run, weighted);
  const u = new Map(used.rows.map((row, i) => [row, weighted === null ? null : weighted.whitening.sigma[i]]));
  return run.rows.map((row, i) => ({
    line: row.line,
    volume_mL: row.volume_mL,
    reading: row.reading,
    pH: asPH.pH(row.reading),
    used: row.decision.use === 'used',
    residual: residuals === null ? null : numberOrNull(residuals[i]),
    u: u.get(i) ?? null,
  }));
}

function residualsOfRows(run: Run, weighted: WeightedRun): Float64Array | null {
  const volumes = Float64Array.from(run.rows, (row) => row.volume_mL);
  const model = new RunModel(weighted.run.design, volumes, null);
  const predicted = new Float64Array(volumes.length);
  if (!model.predict(weighted.values, predicted)) return null;
  return predicted.map((value, i) => run.rows[i].reading - value);
}
