import type { FigureFrame } from './figureFrame.ts';
import { pHOfReading } from './pHLink.ts';

/** pH at the lower and at the upper end of the axis of the reading; null where it needs no axis of its own. */
export function pHEnds(frame: FigureFrame): [number, number] | null {
  const { link } = frame.run;
  if (link?.separate !== true) return null;
  const [low, high] = frame.view.reading;
  return [pHOfReading(link, low), pHOfReading(link, high)];
}
