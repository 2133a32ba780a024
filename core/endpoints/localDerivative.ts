import { type LocalPolynomial, localPolynomial } from './localPolynomial.ts';
import { sortedByVolume } from './sortedByVolume.ts';

export interface LocalDerivativeOptions {
  /** Points in the window; at least degree + 1. Defaults to 5. */
  readonly points?: number;
  /** Degree of the polynomial. Defaults to 2. */
  readonly degree?: 2 | 3;
  /**
   * Standard deviation of the reading. Where given, a window grows until its
   * slope is forty times its own uncertainty, so that a flat stretch is
   * averaged over many points while a step keeps its sharpness.
   */
  readonly uReading?: number;
}

/**
 * Derivatives at every distinct volume at which they are defined, in rising
 * order of volume. All arrays have the same length.
 */
export interface LocalDerivative {
  /** mL */
  readonly volumes: Float64Array;
  /** Smoothed reading. */
  readonly values: Float64Array;
  /** Reading per mL. */
  readonly slopes: Float64Array;
  /** Reading per mL². */
  readonly curvatures: Float64Array;
  /** Standard deviation of the slope for noise of one unit in each reading, 1/mL. */
  readonly slopeGains: Float64Array;
  /** First and last point of each window, as positions in the distinct volumes. */
  readonly windowFirst: Int32Array;
  readonly windowLast: Int32Array;
  /** Index of each point in the input. */
  readonly inputIndex: Int32Array;
}

/** A slope is settled when it is this many times its uncertainty. */
const SETTLED = 40;
/** Windows grow by this factor at a time. */
const GROWTH = 1.4;
/** A window never holds more than an eighth of the run, nor more than this many points, so that work stays linear. */
const LARGEST_SHARE = 1 / 8;
const LARGEST_WINDOW = 201;

/**
 * Value, slope and curvature by a local polynomial on an uneven grid. The
 * window holds the nearest points, and inside the run always both neighbours
 * (on a grid whose spacing changes, the nearest alone may lie on one side).
 *
 * Input in any order; readings at the same volume are averaged. A point at
 * which the polynomial is not determined is left out; with fewer distinct
 * volumes than degree + 1 nothing is left.
 *
 * @param volumes mL
 * @param readings pH or mV
 */
export function localDerivative(
  volumes: Float64Array,
  readings: Float64Array,
  options: LocalDerivativeOptions = {},
): LocalDerivative {
  const degree = options.degree ?? 2;
  const points = options.points ?? 5;
  if (points <= degree) throw new RangeError(`a window of ${points} points does not determine degree ${degree}`);
  const sorted = sortedByVolume(volumes, readings);
  const n = sorted.volumes.length;
  const uReading = options.uReading ?? 0;
  const largest = Math.max(points, Math.min(LARGEST_WINDOW, Math.floor(n * LARGEST_SHARE)));
  const at: LocalPolynomial = { value: 0, slope: 0, curvature: 0, valueGain: 0, slopeGain: 0 };

  const values = new Float64Array(n);
  const slopes = new Float64Array(n);
  const curvatures = new Float64Array(n);
  const slopeGains = new Float64Array(n);
  const windowFirst = new Int32Array(n);
  const windowLast = new Int32Array(n);
  const kept = new Int32Array(n);
  let count = 0;
  for (let i = 0; i < n; i++) {
    let first = Math.max(0, i - 1);
    let last = Math.min(n - 1, i + 1);
    let size = points;
    let defined = false;
    for (;;) {
      while (last - first + 1 < size && (first > 0 || last < n - 1)) {
        if (first === 0) last++;
        else if (last === n - 1 || goesLeft(sorted.volumes, first, i, last)) first--;
        else last++;
      }
      defined = localPolynomial(sorted.volumes, sorted.readings, first, last, sorted.volumes[i], degree, at) || defined;
      const settled = defined && Math.abs(at.slope) >= SETTLED * uReading * at.slopeGain;
      if (settled || (defined && size >= largest) || last - first + 1 >= n) break;
      size = Math.max(size + 2, Math.ceil(size * GROWTH));
      if (defined) size = Math.min(largest, size);
    }
    if (!defined) continue;
    values[count] = at.value;
    slopes[count] = at.slope;
    curvatures[count] = at.curvature;
    slopeGains[count] = at.slopeGain;
    windowFirst[count] = first;
    windowLast[count] = last;
    kept[count] = i;
    count++;
  }
  return {
    volumes: Float64Array.from(kept.subarray(0, count), (i) => sorted.volumes[i]),
    values: values.slice(0, count),
    slopes: slopes.slice(0, count),
    curvatures: curvatures.slice(0, count),
    slopeGains: slopeGains.slice(0, count),
    windowFirst: windowFirst.slice(0, count),
    windowLast: windowLast.slice(0, count),
    inputIndex: Int32Array.from(kept.subarray(0, count), (i) => sorted.inputIndex[i]),
  };
}

/** Whether the next point of a window about i is the one to its left. */
function goesLeft(volumes: Float64Array, first: number, i: number, last: number): boolean {
  const left = volumes[i] - volumes[first - 1];
  const right = volumes[last + 1] - volumes[i];
  // Alternating on an even grid, where rounding alone would decide which side is nearer.
  if (Math.abs(left - right) <= 1e-9 * (left + right)) return i - first <= last - i;
  return left < right;
}
