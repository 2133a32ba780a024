import type { Run } from '../run/run.ts';

/** The rows of a run that take part in the fit, in the order of the file. */
export interface UsedPoints {
  /** mL */
  readonly volumes: Float64Array;
  /** In the unit of the run. */
  readonly readings: Float64Array;
  /** Positions among the rows of the run. */
  readonly rows: readonly number[];
}

export function usedPoints(run: Run): UsedPoints {
  const rows = run.rows.flatMap((row, i) => (row.decision.use === 'used' ? [i] : []));
  return {
    volumes: Float64Array.from(rows, (i) => run.rows[i].volume_mL),
    readings: Float64Array.from(rows, (i) => run.rows[i].reading),
    rows,
  };
}
