import type { FigureRun, FigureView } from './figureRun.ts';
import { contains, type Range } from './pixelAxis.ts';

/** The band around zero spans this many standard uncertainties of a point. */
export const bandWidth = 2;

/**
 * Range of the residual axis, symmetric around zero: it shows every point used
 * in the view and the band of a quiet stretch. Null where nothing was compared
 * with a curve.
 */
export function residualRange(run: FigureRun, view: FigureView): Range | null {
  if (run.result.curve === null) return null;
  let largest = 0;
  let smallestU = Number.POSITIVE_INFINITY;
  let any = false;
  for (const point of run.points) {
    if (point.residual === null) continue;
    any = true;
    if (!point.used || !contains(view.volume, point.volume_mL)) continue;
    largest = Math.max(largest, Math.abs(point.residual));
    if (point.u !== null && point.u > 0) smallestU = Math.min(smallestU, point.u);
  }
  if (!any) return null;
  const band = Number.isFinite(smallestU) ? bandWidth * smallestU : 0;
  const half = 1.12 * Math.max(largest, band);
  // An exact fit still needs an axis; the least place of a meter is finer than nothing.
  return half > 1e-9 ? [-half, half] : [-1e-3, 1e-3];
}
