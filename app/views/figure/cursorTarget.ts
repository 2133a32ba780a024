import { type Cursor, cursorAtPH, cursorAtPoint, cursorAtVolume } from '../../figures/cursor.ts';
import type { FigureFrame } from '../../figures/figureFrame.ts';
import type { FigureRun } from '../../figures/figureRun.ts';
import { fromPixels } from '../../figures/pixelAxis.ts';
import { panelAt } from './figurePanel.ts';

/** What the person points at; the cursor follows from it and from the run as it is now. */
export type CursorTarget =
  | { readonly kind: 'volume'; readonly volume_mL: number }
  | { readonly kind: 'pH'; readonly pH: number }
  /** A point chosen by keys, by its place in `FigureRun.points`. */
  | { readonly kind: 'point'; readonly index: number };

export function targetAt(frame: FigureFrame, x: number, y: number): CursorTarget | null {
  const panel = panelAt(frame, x, y);
  if (panel === null) return null;
  if (panel !== 'speciation') return { kind: 'volume', volume_mL: fromPixels(frame.axes.volume, x) };
  const { pH } = frame.axes;
  if (pH === null) return null;
  return { kind: 'pH', pH: fromPixels(pH, frame.panels.arrangement === 'below' ? x : y) };
}

export function cursorOf(run: FigureRun, target: CursorTarget | null): Cursor | null {
  if (target === null || run.points.length === 0) return null;
  if (target.kind === 'volume') return cursorAtVolume(run, target.volume_mL);
  if (target.kind === 'pH') return cursorAtPH(run, target.pH);
  return cursorAtPoint(run, Math.min(target.index, run.points.length - 1));
}
