import type { FigureRun } from './figureRun.ts';
import { interpolate } from './interpolate.ts';
import { pHOfReading, readingOfPH } from './pHLink.ts';

/** What the cursor points at: a place on the curve, or on the points where there is no curve. */
export interface Cursor {
  /** mL; null where the curve never reaches the pH pointed at. */
  readonly volume_mL: number | null;
  /** In the unit of the run. */
  readonly reading: number;
  /** Null where the run says nothing about pH. */
  readonly pH: number | null;
  /** Nearest point by volume: its place in `FigureRun.points`; null where there is none. */
  readonly point: number | null;
}

/** The curve at a volume, kept within the volumes of the curve; without a curve, the nearest point. */
export function cursorAtVolume(run: FigureRun, volume_mL: number): Cursor | null {
  if (run.points.length === 0) return null;
  const { curve } = run.result;
  const point = nearestPoint(run, volume_mL);
  if (curve === null || curve.volume_mL.length === 0)
    return cursorAtReading(run, run.points[point].volume_mL, run.points[point].reading, point);
  const last = curve.volume_mL.length - 1;
  const kept = Math.max(curve.volume_mL[0], Math.min(volume_mL, curve.volume_mL[last]));
  const reading = interpolate(curve.volume_mL, curve.reading, kept);
  return reading === null ? null : cursorAtReading(run, kept, reading, nearestPoint(run, kept));
}

/** A point itself, its volume on the curve. */
export function cursorAtPoint(run: FigureRun, point: number): Cursor {
  const { volume_mL, reading } = run.points[point];
  const { curve } = run.result;
  const onCurve = curve === null ? null : interpolate(curve.volume_mL, curve.reading, volume_mL);
  return cursorAtReading(run, volume_mL, onCurve ?? reading, point);
}

/** Where the curve first takes this pH. */
export function cursorAtPH(run: FigureRun, pH: number): Cursor | null {
  if (run.link === null) return null;
  const reading = readingOfPH(run.link, pH);
  const volume_mL = firstVolumeAt(run, reading);
  return { volume_mL, reading, pH, point: volume_mL === null ? null : nearestPoint(run, volume_mL) };
}

function cursorAtReading(run: FigureRun, volume_mL: number, reading: number, point: number): Cursor {
  return { volume_mL, reading, pH: run.link === null ? null : pHOfReading(run.link, reading), point };
}

/** Place of the point with the nearest volume. */
export function nearestPoint(run: FigureRun, volume_mL: number): number {
  let low = 0;
  let high = run.points.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (run.points[middle].volume_mL <= volume_mL) low = middle;
    else high = middle;
  }
  const below = volume_mL - run.points[low].volume_mL;
  return below <= run.points[high].volume_mL - volume_mL ? low : high;
}

function firstVolumeAt(run: FigureRun, reading: number): number | null {
  const { curve } = run.result;
  if (curve === null) return null;
  for (let i = 1; i < curve.reading.length; i++) {
    const before = curve.reading[i - 1] - reading;
    const after = curve.reading[i] - reading;
    if (before === 0) return curve.volume_mL[i - 1];
    if (before * after > 0) continue;
    return curve.volume_mL[i - 1] + (before / (before - after)) * (curve.volume_mL[i] - curve.volume_mL[i - 1]);
  }
  return null;
}
