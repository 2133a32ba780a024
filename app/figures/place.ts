import type { FigureAnnotation, FigureShape } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';

/** Where a text is held: its left edge, middle or right edge, and its top, middle or bottom. */
export interface TextAnchor {
  readonly x: number;
  readonly y: number;
  readonly xanchor: 'left' | 'center' | 'right';
  readonly yanchor: 'top' | 'middle' | 'bottom';
}

/** A text at a place given in px. */
export function textAt(
  frame: FigureFrame,
  anchor: TextAnchor,
  text: string,
  font: { readonly size: number; readonly color: string },
): FigureAnnotation {
  return {
    text,
    xref: 'paper',
    yref: 'paper',
    x: anchor.x / frame.panels.width,
    y: 1 - anchor.y / frame.panels.height,
    xanchor: anchor.xanchor,
    yanchor: anchor.yanchor,
    showarrow: false,
    borderpad: 0,
    font,
  };
}

/** A straight stroke between two places given in px. */
export function strokeBetween(
  frame: FigureFrame,
  from: readonly [number, number],
  to: readonly [number, number],
  line: NonNullable<FigureShape['line']>,
): FigureShape {
  const { width, height } = frame.panels;
  return {
    type: 'line',
    layer: 'below',
    xref: 'paper',
    yref: 'paper',
    x0: from[0] / width,
    y0: 1 - from[1] / height,
    x1: to[0] / width,
    y1: 1 - to[1] / height,
    line,
  };
}
