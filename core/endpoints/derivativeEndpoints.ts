import { findPeaks } from './findPeaks.ts';
import { type LocalDerivative, localDerivative } from './localDerivative.ts';
import { addWeights, type LocalPolynomial, localPolynomial } from './localPolynomial.ts';
import { type PeakTop, peakTop } from './peakTop.ts';
import { readingAt } from './readingAt.ts';
import { readingNoise } from './readingNoise.ts';
import { sortedByVolume } from './sortedByVolume.ts';

/** One step of the curve. An inflection, which for a weak step need not be the equivalence point. */
export interface DerivativeEndpoint {
  /** Where the slope is largest, mL. */
  readonly volume_mL: number;
  /** Where the second derivative crosses zero, mL; null where it does not cross beside the largest slope. */
  readonly secondDerivativeZero_mL: number | null;
  /** Standard uncertainty of `volume_mL`: noise and the spacing of the points (a uniform share of one interval). */
  readonly u_mL: number;
  /** The part of it that noise of the reading and of the volume gives; the spacing moves a smooth curve on the same points alike. */
  readonly uNoise_mL: number;
  /** Reading at `volume_mL`, interpolated between points. */
  readonly reading: number;
  /** Largest slope, reading per mL, negative in a falling run. */
  readonly slope: number;
  /** Rise from the flattest place before to the flattest place after the step; negative in a falling run. */
  readonly height: number;
  /** Those two places, mL. */
  readonly flattest_mL: readonly [number, number];
  /** Input indices of the points of lowest and of highest volume that shaped the estimate. */
  readonly pointsUsed: readonly [number, number];
}

export interface DerivativeEndpointOptions {
  /** Standard deviation of the reading; estimated from the scatter where left out. */
  readonly uReading?: number;
  /** Standard deviation of the volume of each point, mL. Defaults to 0. */
  readonly uVolume_mL?: number;
}

/** Fewer distinct volumes show no step with a foot on both sides. */
const FEWEST_POINTS = 5;
/** A step rises by at least this many times the noise and by this share of the whole range; less may be drift. */
const LEAST_HEIGHT_OVER_NOISE = 20;
const LEAST_SHARE_OF_RANGE = 0.02;
/** Below this share of the range a reading carries nothing but rounding. */
const ROUNDING_SHARE = 1e-9;

/**
 * Steps of a titration curve without a model: places where the slope has a
 * maximum that stands out (see findPeaks) between two flatter stretches. The
 * slope comes from local quadratics whose windows widen with the noise; the
 * maximum from a parabola through the top of the slopes, the second-derivative
 * zero from a straight line through the second derivatives there.
 *
 * Both estimates inherit the spacing of the points: where the whole step falls
 * between two readings, they lie near the middle of that interval. To compare
 * with a fitted curve, take that curve at the same volumes with the same options.
 *
 * @param volumes mL, in any order
 * @param readings pH or mV, rising or falling
 * @returns in order of volume; empty where no step stands out
 */
export function derivativeEndpoints(
  volumes: Float64Array,
  readings: Float64Array,
  options: DerivativeEndpointOptions = {},
): DerivativeEndpoint[] {
  const sorted = sortedByVolume(volumes, readings);
  const n = sorted.volumes.length;
  if (n < FEWEST_POINTS) return [];
  // One reading gone astray must not look like a step; a monotone run passes through unchanged.
  const calm = medianOfThree(sorted.readings);
  const range = calm.reduce((a, b) => Math.max(a, b)) - calm.reduce((a, b) => Math.min(a, b));
  const noise = Math.max(
    options.uReading ?? readingNoise(sorted.volumes, sorted.readings) ?? 0,
    ROUNDING_SHARE * range,
  );
  const leastHeight = Math.max(LEAST_HEIGHT_OVER_NOISE * noise, LEAST_SHARE_OF_RANGE * range);
  if (range === 0 || range < LEAST_HEIGHT_OVER_NOISE * noise) return [];
  const direction = Math.sign(calm[n - 1] - calm[0]);

  const derivative = localDerivative(sorted.volumes, calm, { points: 3, degree: 2, uReading: noise });
  const heights = derivative.slopes.map((slope) => direction * slope);
  const uHeights = derivative.slopeGains.map((gain) => noise * gain);
  const endpoints: DerivativeEndpoint[] = [];
  for (const peak of findPeaks(heights, uHeights)) {
    const height = derivative.values[peak.colAfter] - derivative.values[peak.colBefore];
    if (direction * height < leastHeight) continue;
    const top = peakTop(derivative, heights, peak);
    const interval = (derivative.volumes[peak.at + 1] - derivative.volumes[peak.at - 1]) / 2;
    const uNoise_mL = uOfPlace(derivative, top, sorted.volumes, calm, noise, options.uVolume_mL ?? 0);
    endpoints.push({
      volume_mL: top.volume_mL,
      secondDerivativeZero_mL: curvatureZero(derivative, direction, top),
      u_mL: Math.hypot(uNoise_mL, interval / Math.sqrt(12)),
      uNoise_mL,
      reading: readingAt(sorted.volumes, calm, top.volume_mL),
      slope: derivative.slopes[peak.at],
      height,
      flattest_mL: [derivative.volumes[peak.colBefore], derivative.volumes[peak.colAfter]],
      pointsUsed: [
        sorted.inputIndex[derivative.windowFirst[top.first]],
        sorted.inputIndex[derivative.windowLast[top.last]],
      ],
    });
  }
  return endpoints;
}

/** Median of each reading and its neighbours; the ends stay. */
function medianOfThree(readings: Float64Array): Float64Array {
  return readings.map((reading, i) => {
    if (i === 0 || i === readings.length - 1) return reading;
    const [before, after] = [readings[i - 1], readings[i + 1]];
    return Math.max(Math.min(before, after), Math.min(Math.max(before, after), reading));
  });
}

/** Noise of readings and volumes, carried through the slopes to the place of the maximum, mL. */
function uOfPlace(
  derivative: LocalDerivative,
  top: PeakTop,
  volumes: Float64Array,
  readings: Float64Array,
  uReading: number,
  uVolume_mL: number,
): number {
  const { windowFirst, windowLast } = derivative;
  if (top.toHeights === null) return (derivative.volumes[top.last] - derivative.volumes[top.first]) / Math.sqrt(12);
  const toReadings = new Float64Array(volumes.length);
  for (let i = top.first; i <= top.last; i++) {
    const factor = top.toHeights[i - top.first];
    addWeights(volumes, windowFirst[i], windowLast[i], derivative.volumes[i], 2, factor, 0, toReadings);
  }
  let variance = 0;
  for (let j = windowFirst[top.first]; j <= windowLast[top.last]; j++) {
    variance += (toReadings[j] * Math.hypot(uReading, steepnessAt(volumes, readings, j) * uVolume_mL)) ** 2;
  }
  return Math.sqrt(variance);
}

/** Steepness of the curve through a point and its neighbours, reading per mL. */
function steepnessAt(volumes: Float64Array, readings: Float64Array, i: number): number {
  const before = Math.max(0, i - 1);
  const after = Math.min(volumes.length - 1, i + 1);
  return (readings[after] - readings[before]) / (volumes[after] - volumes[before]);
}

/**
 * Where the second derivative crosses zero within the top: between two points
 * if it crosses once, else, where noise makes it cross more often, where the
 * straight line through all of them does.
 */
function curvatureZero(derivative: LocalDerivative, direction: number, top: PeakTop): number | null {
  const { volumes, curvatures } = derivative;
  const crossings: number[] = [];
  for (let i = top.first; i < top.last; i++) {
    const [before, after] = [direction * curvatures[i], direction * curvatures[i + 1]];
    if (before > 0 && after <= 0) {
      crossings.push(volumes[i] + ((volumes[i + 1] - volumes[i]) * before) / (before - after));
    }
  }
  if (crossings.length === 1) return crossings[0];
  const line: LocalPolynomial = { value: 0, slope: 0, curvature: 0, valueGain: 0, slopeGain: 0 };
  if (!localPolynomial(volumes, curvatures, top.first, top.last, top.volume_mL, 1, line)) return null;
  if (!(direction * line.slope < 0)) return null;
  const zero = top.volume_mL - line.value / line.slope;
  return zero >= volumes[top.first] && zero <= volumes[top.last] ? zero : null;
}
