import type { ColumnStatistics } from './columnStatistics.ts';

export interface ColumnPair {
  readonly volume: number;
  readonly reading: number;
}

/** A range of millivolts that only a titration, not a temperature or an index, runs through. */
const TYPICAL_SPAN_MV = 50;

/** A first value up to this share of the largest counts as "starts at zero". */
const NEARLY_ZERO = 0.02;

/** With fewer points than this there are no habits to see; volumes are written first. */
const FEW = 3;

/**
 * The pair of columns that behave most like volume and reading. Volumes do not
 * step back, start at zero and go by regular doses; readings lie in 0–14 or run
 * through many millivolts, and mostly in one direction; the reading tends to
 * stand next to its volume. The weights only rank these habits; the outcome is
 * always told as a guess.
 *
 * `volumes` and `readings` are the columns that may be either. Undefined where
 * no pair of different columns is left.
 */
export function guessColumns(
  statistics: readonly ColumnStatistics[],
  volumes: readonly number[],
  readings: readonly number[],
): ColumnPair | undefined {
  let best: ColumnPair | undefined;
  let bestScore = Number.NEGATIVE_INFINITY;
  for (const volume of volumes) {
    for (const reading of readings) {
      if (volume === reading) continue;
      const score =
        volumeLikeness(statistics[volume]) +
        readingLikeness(statistics[reading]) +
        (reading === volume + 1 ? 0.1 : 0) +
        (volume < reading ? (statistics[volume].count < FEW ? 2 : 0.05) : 0);
      if (score > bestScore) {
        best = { volume, reading };
        bestScore = score;
      }
    }
  }
  return best;
}

function volumeLikeness(column: ColumnStatistics): number {
  const order = Math.max(column.rising, 0.6 * column.falling);
  const negative = column.minimum < 0 ? 1 : 0;
  const constant = column.count > 2 && column.maximum === column.minimum ? 1 : 0;
  // Row numbers behave like volumes in every way but one.
  const counts = column.counts ? 0.35 : 0;
  return order + (startsAtZero(column) ? 0.5 : 0) + 0.3 * column.regular - negative - constant - counts;
}

function readingLikeness(column: ColumnStatistics): number {
  const span = column.maximum - column.minimum;
  const asPh = column.inPhRange;
  const asMillivolts = column.inMillivoltRange * (span >= TYPICAL_SPAN_MV || column.minimum < 0 ? 0.6 : 0.2);
  const constant = column.count > 2 && span === 0 ? 0.5 : 0;
  const likeVolume = startsAtZero(column) && column.rising > 0.9 && column.regular > 0.6 ? 0.3 : 0;
  const trend = 0.4 * Math.max(column.rising, column.falling);
  return Math.max(asPh, asMillivolts) + trend - constant - likeVolume;
}

function startsAtZero(column: ColumnStatistics): boolean {
  return column.first >= 0 && column.maximum > 0 && column.first <= NEARLY_ZERO * column.maximum;
}
