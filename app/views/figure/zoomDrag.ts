import type { FigureFrame } from '../../figures/figureFrame.ts';
import type { FigureView } from '../../figures/figureRun.ts';
import { readingOfPH } from '../../figures/pHLink.ts';
import { fromPixels, type Range } from '../../figures/pixelAxis.ts';
import type { Rectangle } from '../../figures/rectangle.ts';
import { zoomView } from '../../figures/zoomView.ts';
import type { FigurePanel } from './figurePanel.ts';

/** A drag from one place to another, px, and the panel it began in. */
export interface Drag {
  readonly panel: FigurePanel;
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
}

/** A drag shorter than this in one direction leaves that direction as it is, px. */
const STRAIGHT = 24;

/** What the drag marks: a stretch of volume, a stretch of pH, or a box of both. */
export function markedByDrag(frame: FigureFrame, drag: Drag): Rectangle {
  const { panel, alongX, alongY } = panelOf(frame, drag);
  const [x0, x1] = alongX
    ? ends(drag.from[0], drag.to[0], panel.left, panel.width)
    : [panel.left, panel.left + panel.width];
  const [y0, y1] = alongY
    ? ends(drag.from[1], drag.to[1], panel.top, panel.height)
    : [panel.top, panel.top + panel.height];
  return { left: x0, top: y0, width: x1 - x0, height: y1 - y0 };
}

/** The view that shows what the drag marks. */
export function viewOfDrag(frame: FigureFrame, drag: Drag): FigureView {
  const { axes, run, view } = frame;
  const { alongX, alongY } = panelOf(frame, drag);
  const marked = markedByDrag(frame, drag);
  const x: Range = [marked.left, marked.left + marked.width];
  const y: Range = [marked.top, marked.top + marked.height];
  if (drag.panel === 'speciation') {
    const { pH } = axes;
    const { link } = run;
    if (pH === null || link === null) return view;
    const [a, b] = alongX ? x : y;
    return zoomView(run.whole, view, {
      reading: [readingOfPH(link, fromPixels(pH, a)), readingOfPH(link, fromPixels(pH, b))],
    });
  }
  return zoomView(run.whole, view, {
    ...(alongX && { volume: [fromPixels(axes.volume, x[0]), fromPixels(axes.volume, x[1])] }),
    ...(alongY && { reading: [fromPixels(axes.reading, y[0]), fromPixels(axes.reading, y[1])] }),
  });
}

function panelOf(frame: FigureFrame, drag: Drag): { panel: Rectangle; alongX: boolean; alongY: boolean } {
  const { curve, residuals, speciation, arrangement } = frame.panels;
  if (drag.panel === 'residuals' && residuals !== null) return { panel: residuals, alongX: true, alongY: false };
  if (drag.panel === 'speciation' && speciation !== null) {
    const turned = arrangement === 'below';
    return { panel: speciation, alongX: turned, alongY: !turned };
  }
  const dx = Math.abs(drag.to[0] - drag.from[0]);
  const dy = Math.abs(drag.to[1] - drag.from[1]);
  return { panel: curve, alongX: dx >= STRAIGHT || dx >= dy, alongY: dy >= STRAIGHT || dy > dx };
}

function ends(a: number, b: number, start: number, length: number): [number, number] {
  const kept = (value: number) => Math.max(start, Math.min(value, start + length));
  return [Math.min(kept(a), kept(b)), Math.max(kept(a), kept(b))];
}
