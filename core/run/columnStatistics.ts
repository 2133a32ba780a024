/** What the figures of one column look like, in the order of the file. */
export interface ColumnStatistics {
  /** Cells that hold a number. */
  readonly count: number;
  readonly first: number;
  readonly minimum: number;
  readonly maximum: number;
  /** Share of steps that do not go down; 1 where there is no step. */
  readonly rising: number;
  /** Share of steps that do not go up; 1 where there is no step. */
  readonly falling: number;
  /** Share of steps that have one of the three most frequent sizes. */
  readonly regular: number;
  /** Whether the column counts 1, 2, 3 … (or from 0). */
  readonly counts: boolean;
  /** Share of values from 0 to 14. */
  readonly inPhRange: number;
  /** Share of values within ±2000. */
  readonly inMillivoltRange: number;
}

const LARGEST_PH = 14;
const LARGEST_MILLIVOLTS = 2000;

/** Sizes of steps are counted up to this many different ones; irregular columns have more. */
const STEP_SIZES = 1000;

/** `values` holds NaN where a cell is no number. */
export function columnStatistics(values: Float64Array): ColumnStatistics {
  let count = 0;
  let first = 0;
  let previous = 0;
  let minimum = Number.POSITIVE_INFINITY;
  let maximum = Number.NEGATIVE_INFINITY;
  let notFalling = 0;
  let notRising = 0;
  let ones = 0;
  let inPh = 0;
  let inMillivolts = 0;
  const sizes = new Map<number, number>();
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    if (count === 0) first = value;
    else {
      const step = value - previous;
      if (step >= 0) notFalling += 1;
      if (step <= 0) notRising += 1;
      if (step === 1) ones += 1;
      const size = Math.round(step * 1e6);
      if (sizes.size < STEP_SIZES || sizes.has(size)) sizes.set(size, (sizes.get(size) ?? 0) + 1);
    }
    count += 1;
    previous = value;
    minimum = Math.min(minimum, value);
    maximum = Math.max(maximum, value);
    if (value >= 0 && value <= LARGEST_PH) inPh += 1;
    if (Math.abs(value) <= LARGEST_MILLIVOLTS) inMillivolts += 1;
  }
  const steps = count - 1;
  const frequent = [...sizes.values()].sort((a, b) => b - a).slice(0, 3);
  return {
    count,
    first,
    minimum,
    maximum,
    rising: steps > 0 ? notFalling / steps : 1,
    falling: steps > 0 ? notRising / steps : 1,
    regular: steps > 0 ? frequent.reduce((sum, times) => sum + times, 0) / steps : 0,
    counts: steps > 0 && ones === steps && (first === 0 || first === 1),
    inPhRange: count > 0 ? inPh / count : 0,
    inMillivoltRange: count > 0 ? inMillivolts / count : 0,
  };
}
