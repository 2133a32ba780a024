import type { PointResult } from '../../core/index.ts';
import type { FigureTrace } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';

/** Points of the fit that lie too far from the curve for chance. */
export function standingOut(frame: FigureFrame, drawn: readonly PointResult[]): readonly PointResult[] {
  const lines = new Set(frame.run.result.robust?.distrusted.map(({ line }) => line));
  return drawn.filter((point) => point.used && lines.has(point.line));
}

/** A diamond around the mark of the point itself. */
export function standingOutMark(style: FigureStyle): NonNullable<FigureTrace['marker']> {
  return { symbol: 'diamond-open', size: 16, color: style.ink, line: { width: 1.3 } };
}
