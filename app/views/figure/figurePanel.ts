import type { FigureFrame } from '../../figures/figureFrame.ts';
import type { Rectangle } from '../../figures/rectangle.ts';

export type FigurePanel = 'curve' | 'residuals' | 'speciation';

/** The panel at a place, px; a little outside still counts, so that the ends of an axis can be reached. */
export function panelAt(frame: FigureFrame, x: number, y: number): FigurePanel | null {
  const { curve, residuals, speciation } = frame.panels;
  if (lies(curve, x, y)) return 'curve';
  if (residuals !== null && lies(residuals, x, y)) return 'residuals';
  return speciation !== null && lies(speciation, x, y) ? 'speciation' : null;
}

const NEAR = 10;

function lies(panel: Rectangle, x: number, y: number): boolean {
  return (
    x >= panel.left - NEAR &&
    x <= panel.left + panel.width + NEAR &&
    y >= panel.top - NEAR &&
    y <= panel.top + panel.height + NEAR
  );
}
