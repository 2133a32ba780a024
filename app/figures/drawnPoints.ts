import type { PointResult } from '../../core/index.ts';
import type { FigureRun, FigureView } from './figureRun.ts';
import { thinPoints } from './thinPoints.ts';

/** What is drawn of the points in the view. */
export interface DrawnPoints {
  /** In order of volume, one on either side of the view included, so that bands reach the edge. */
  readonly points: readonly PointResult[];
  /** How many there are, drawn or not. */
  readonly available: number;
}

export function drawnPoints(run: FigureRun, view: FigureView): DrawnPoints {
  const [low, high] = view.volume;
  const first = run.points.findIndex((point) => point.volume_mL >= low);
  const last = run.points.findLastIndex((point) => point.volume_mL <= high);
  if (first < 0 || last < 0) return { points: [], available: 0 };
  const visible = run.points.slice(Math.max(0, first - 1), last + 2);
  return { points: thinPoints(visible), available: visible.length };
}
