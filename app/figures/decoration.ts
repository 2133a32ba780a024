import type { FigureAnnotation, FigureShape } from './figure.ts';
import type { PixelLine } from './placeLabels.ts';
import type { Rectangle } from './rectangle.ts';

/** Rules with their labels, and the rectangles that the labels take, px. */
export interface Decoration {
  readonly shapes: readonly FigureShape[];
  readonly annotations: readonly FigureAnnotation[];
  readonly taken: readonly Rectangle[];
  /** The rules as lines on the page, px, for who must find room between them. */
  readonly lines: readonly PixelLine[];
}
