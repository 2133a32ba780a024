import { type LocalPolynomial, localPolynomial } from './localPolynomial.ts';
import { sortedByVolume } from './sortedByVolume.ts';

/** Lower quartile of |x| over standard deviation, for a normal distribution. */
const QUARTILE_OVER_SD = 0.31863936396437514;
/** Points on each side of the one judged. */
const REACH = 2;
const FEWEST_POINTS = 2 * REACH + 1;

/**
 * A rough standard deviation of the reading without a model: from the distance
 * of each reading from the quadratic through its two neighbours on either side,
 * each divided by what independent noise of one unit would give. Their lower
 * quartile stands for all of them, because on a coarse grid most points lie
 * where the curve bends more than a quadratic. Never below the rounding of the
 * display, taken as the smallest step between readings over √12. On a coarse
 * grid it remains an upper estimate.
 *
 * @returns the estimate in the unit of the reading, or null with fewer than five distinct volumes
 */
export function readingNoise(volumes: Float64Array, readings: Float64Array): number | null {
  const sorted = sortedByVolume(volumes, readings);
  const n = sorted.volumes.length;
  if (n < FEWEST_POINTS) return null;
  const at: LocalPolynomial = { value: 0, slope: 0, curvature: 0, valueGain: 0, slopeGain: 0 };
  const around = new Float64Array(2 * REACH);
  const aroundReadings = new Float64Array(2 * REACH);
  const distances: number[] = [];
  for (let i = REACH; i < n - REACH; i++) {
    // The quadratic leaves the point itself out; its prediction then carries noise of its own.
    let k = 0;
    for (let j = i - REACH; j <= i + REACH; j++) {
      if (j === i) continue;
      around[k] = sorted.volumes[j];
      aroundReadings[k++] = sorted.readings[j];
    }
    if (!localPolynomial(around, aroundReadings, 0, 2 * REACH - 1, sorted.volumes[i], 2, at)) continue;
    distances.push(Math.abs(sorted.readings[i] - at.value) / Math.sqrt(1 + at.valueGain * at.valueGain));
  }
  if (distances.length === 0) return null;
  distances.sort((a, b) => a - b);
  const quartile = distances[Math.floor((distances.length - 1) / 4)];
  return Math.max(quartile / QUARTILE_OVER_SD, smallestStep(sorted.readings) / Math.sqrt(12));
}

function smallestStep(readings: Float64Array): number {
  let smallest = Number.POSITIVE_INFINITY;
  for (let i = 1; i < readings.length; i++) {
    const step = Math.abs(readings[i] - readings[i - 1]);
    if (step > 0 && step < smallest) smallest = step;
  }
  return Number.isFinite(smallest) ? smallest : 0;
}
