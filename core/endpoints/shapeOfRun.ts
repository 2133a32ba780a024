import { type DerivativeEndpoint, type DerivativeEndpointOptions, derivativeEndpoints } from './derivativeEndpoints.ts';
import { readingAt } from './readingAt.ts';
import { readingNoise } from './readingNoise.ts';
import { sortedByVolume } from './sortedByVolume.ts';

/** A stretch between steps, where the curve is flattest. */
export interface Plateau {
  readonly from_mL: number;
  readonly to_mL: number;
  /** Volume and reading in the middle of the stretch. */
  readonly middle_mL: number;
  readonly reading: number;
  /** Mean slope over the middle half of the stretch, reading per mL. */
  readonly slope: number;
}

/** What the curve looks like before any model, for starting values and first doubts. */
export interface ShapeOfRun {
  readonly direction: 'rising' | 'falling' | 'flat';
  /** Number of distinct volumes. */
  readonly points: number;
  /** Lowest and highest volume, mL; null for a run without points. */
  readonly volumeRange_mL: readonly [number, number] | null;
  /** Lowest and highest reading. */
  readonly readingRange: readonly [number, number] | null;
  /** Reading at the lowest and at the highest volume. */
  readonly initialReading: number | null;
  readonly finalReading: number | null;
  /** Rough standard deviation of the reading; null where there are too few points. */
  readonly noise: number | null;
  /** In order of volume. */
  readonly steps: readonly DerivativeEndpoint[];
  /**
   * For each step, the reading half-way to it from the step before (from volume
   * zero for the first); null where that volume lies before the first point.
   */
  readonly halfwayReadings: readonly (number | null)[];
  /** One before each step and one after the last; a single one where there is no step. */
  readonly plateaus: readonly Plateau[];
  /** Whether the volumes, in the order of the rows, fall more often than they rise. */
  readonly volumesRunBackwards: boolean;
}

/** Readings that differ by no more than this many times the noise between the ends are level. */
const FLAT_OVER_NOISE = 5;

/**
 * @param volumes mL, in the order of the rows
 * @param readings pH or mV, as many
 */
export function shapeOfRun(
  volumes: Float64Array,
  readings: Float64Array,
  options: DerivativeEndpointOptions = {},
): ShapeOfRun {
  const sorted = sortedByVolume(volumes, readings);
  const n = sorted.volumes.length;
  const volumesRunBackwards = runsBackwards(volumes);
  if (n === 0) {
    return {
      direction: 'flat',
      points: 0,
      volumeRange_mL: null,
      readingRange: null,
      initialReading: null,
      finalReading: null,
      noise: null,
      steps: [],
      halfwayReadings: [],
      plateaus: [],
      volumesRunBackwards,
    };
  }
  const steps = derivativeEndpoints(volumes, readings, options);
  const noise = options.uReading ?? readingNoise(volumes, readings);
  const [first_mL, last_mL] = [sorted.volumes[0], sorted.volumes[n - 1]];
  const [initialReading, finalReading] = [sorted.readings[0], sorted.readings[n - 1]];
  const change = finalReading - initialReading;
  const isFlat = Math.abs(change) <= FLAT_OVER_NOISE * (noise ?? 0);
  const bounds = [first_mL, ...steps.map((step) => step.volume_mL), last_mL];
  return {
    direction: isFlat ? 'flat' : change > 0 ? 'rising' : 'falling',
    points: n,
    volumeRange_mL: [first_mL, last_mL],
    readingRange: [sorted.readings.reduce((a, b) => Math.min(a, b)), sorted.readings.reduce((a, b) => Math.max(a, b))],
    initialReading,
    finalReading,
    noise,
    steps,
    halfwayReadings: steps.map((step, k) => {
      const halfway_mL = ((k === 0 ? 0 : steps[k - 1].volume_mL) + step.volume_mL) / 2;
      return halfway_mL < first_mL ? null : readingAt(sorted.volumes, sorted.readings, halfway_mL);
    }),
    plateaus: bounds
      .slice(1)
      .flatMap((to_mL, k) => (to_mL > bounds[k] ? [plateauBetween(sorted, bounds[k], to_mL)] : [])),
    volumesRunBackwards,
  };
}

function plateauBetween(
  { volumes, readings }: { volumes: Float64Array; readings: Float64Array },
  from_mL: number,
  to_mL: number,
): Plateau {
  const quarter_mL = (to_mL - from_mL) / 4;
  const middle_mL = from_mL + 2 * quarter_mL;
  const rise =
    readingAt(volumes, readings, from_mL + 3 * quarter_mL) - readingAt(volumes, readings, from_mL + quarter_mL);
  return {
    from_mL,
    to_mL,
    middle_mL,
    reading: readingAt(volumes, readings, middle_mL),
    slope: rise / (2 * quarter_mL),
  };
}

/** A few steps back are doubts of their own; only the general trend counts here. */
function runsBackwards(volumes: Float64Array): boolean {
  let balance = 0;
  for (let i = 1; i < volumes.length; i++) balance += Math.sign(volumes[i] - volumes[i - 1]);
  return balance < 0;
}
