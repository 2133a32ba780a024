import type { PointResult } from '../../core/index.ts';

/** More points than this are not told apart on a screen, and slow it down. */
export const mostPointsDrawn = 3000;

/** Part of the drawn points that is kept for extremes; more would make the cloud look hollow. */
const EXTREME_SHARE = 0.2;

/**
 * Chooses which of many points are drawn: the ends; every so many-th point, so
 * that the cloud keeps its look; and from each stretch of neighbours the lowest
 * and highest reading and residual, so that no spike disappears.
 *
 * @param points in the order in which they are drawn
 * @returns the points themselves where there are at most `most`, else at most as many, in the same order
 */
export function thinPoints(points: readonly PointResult[], most: number = mostPointsDrawn): readonly PointResult[] {
  if (points.length <= most) return points;
  const stretches = Math.max(1, Math.floor((EXTREME_SHARE * most) / 4));
  const kept = new Set<number>();
  const even = Math.max(2, most - 4 * stretches);
  for (let k = 0; k < even; k++) kept.add(Math.round((k * (points.length - 1)) / (even - 1)));
  for (let s = 0; s < stretches; s++) {
    const from = Math.floor((s * points.length) / stretches);
    const to = Math.floor(((s + 1) * points.length) / stretches);
    for (const of of [readingOf, residualOf]) {
      let [low, high] = [from, from];
      for (let i = from + 1; i < to; i++) {
        if (of(points[i]) < of(points[low])) low = i;
        if (of(points[i]) > of(points[high])) high = i;
      }
      kept.add(low).add(high);
    }
  }
  return [...kept].sort((a, b) => a - b).map((i) => points[i]);
}

function readingOf(point: PointResult): number {
  return point.reading;
}

function residualOf(point: PointResult): number {
  return point.residual ?? 0;
}
