import type { QuantityResult } from '../../core/index.ts';
import { monotoneCurve } from './monotoneCurve.ts';

/** A value of a quantity, in its unit, and the rise of the weighted sum of squares there. */
export type ProfilePlace = readonly [value: number, rise: number];

/** The profile of a quantity, ready to be drawn. */
export interface ProfileCurve {
  /** Values in view, rising. */
  readonly values: readonly [number, number];
  /** Rises in view: from 0 to this. */
  readonly highest: number;
  /** Rise at which the 95 % interval ends; null where neither end was reached. */
  readonly threshold: number | null;
  /** Places computed, each by a fit with the quantity held. */
  readonly refits: readonly ProfilePlace[];
  /** Between the first and the last of them. */
  readonly curve: readonly ProfilePlace[];
  /** What the standard uncertainty alone would say; empty where there is none. */
  readonly parabola: readonly ProfilePlace[];
}

/** Places along a drawn curve. */
const steps = 80;
/** Free room beside the interval, as a part of what is shown. */
const room = 0.16;
/** The lowest place may lie this far from the value, in standard uncertainties. */
const offValue = 0.1;
/** The view ends so far above the threshold. */
const above = 1.6;

/** Null where no profile was taken. */
export function profileCurve({ profile, value, u, interval95 }: QuantityResult): ProfileCurve | null {
  const refits = profile
    .map(({ value: at, rise }): ProfilePlace => [at, Math.max(0, rise)])
    .sort((a, b) => a[0] - b[0]);
  const distinct = refits.filter(([at], i) => i === 0 || at > refits[i - 1][0]);
  if (distinct.length < 2) return null;
  const [low, high] = interval95 ?? [null, null];
  const best = distinct.reduce((a, b) => (b[1] < a[1] ? b : a));
  // Its lowest place is the value; a profile that says otherwise is not about this quantity as it is printed.
  if (value !== null && u !== null && Math.abs(best[0] - value) > offValue * u) return null;
  const values = distinct.map(([at]) => at);
  // The root of the rise is nearly straight, so that a few refits give the whole curve.
  const root = monotoneCurve(
    values,
    distinct.map(([at, rise]) => Math.sqrt(rise) * (at < best[0] ? -1 : 1)),
  );
  const rise = (at: number) => root(at) ** 2;
  const [first, last] = [values[0], values[values.length - 1]];
  const ends = [low, high].filter((end) => end !== null).filter((end) => end >= first && end <= last);
  const threshold = ends.length === 0 ? null : ends.reduce((sum, end) => sum + rise(end), 0) / ends.length;
  const reach = value === null || u === null || threshold === null ? 0 : Math.sqrt(threshold) * u;
  const shown =
    value === null ? [first, last] : [Math.min(low ?? first, value - reach), Math.max(high ?? last, value + reach)];
  const margin = room * (shown[1] - shown[0]);
  const view = [shown[0] - margin, shown[1] + margin] as const;
  const highest = threshold === null ? above * Math.max(1, ...distinct.map(([, at]) => at)) : above * threshold;
  return {
    values: view,
    highest,
    threshold,
    refits: distinct.filter(([at, height]) => at >= view[0] && at <= view[1] && height <= highest),
    curve: along(Math.max(first, view[0]), Math.min(last, view[1]), rise),
    parabola: value === null || u === null ? [] : along(view[0], view[1], (at) => ((at - value) / u) ** 2),
  };
}

function along(from: number, to: number, rise: (at: number) => number): ProfilePlace[] {
  return Array.from({ length: steps + 1 }, (_, i) => {
    const at = from + (i / steps) * (to - from);
    return [at, rise(at)] as const;
  });
}
