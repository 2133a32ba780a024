import type { FigureFrame } from '../../figures/figureFrame.ts';
import { toPixels } from '../../figures/pixelAxis.ts';
import type { FigurePanel } from './figurePanel.ts';

/** A point is meant within this distance of its mark, px. */
const NEAR = 13;

/** Place in `FigureRun.points` of the point whose mark is nearest to a place, px; null where none is near. */
export function pointAt(frame: FigureFrame, panel: FigurePanel | null, x: number, y: number): number | null {
  const { volume, reading, residual } = frame.axes;
  let best: number | null = null;
  let bestDistance = NEAR;
  if (panel === null || panel === 'speciation') return null;
  frame.run.points.forEach((point, index) => {
    const dx = toPixels(volume, point.volume_mL) - x;
    if (Math.abs(dx) > bestDistance) return;
    let dy: number;
    if (panel === 'curve') dy = toPixels(reading, point.reading) - y;
    else if (residual === null || point.residual === null) return;
    else dy = toPixels(residual, Math.max(residual.range[0], Math.min(point.residual, residual.range[1]))) - y;
    const distance = Math.hypot(dx, dy);
    if (distance <= bestDistance) {
      best = index;
      bestDistance = distance;
    }
  });
  return best;
}
