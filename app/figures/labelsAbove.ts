import type { Decoration } from './decoration.ts';
import type { FigureAnnotation, FigureShape } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import { labelRow } from './panels.ts';
import { strokeBetween, textAt } from './place.ts';
import type { Rectangle } from './rectangle.ts';
import { escapeMarkup, type RichText, toMarkup } from './richText.ts';
import { spreadLabels } from './spreadLabels.ts';
import { textWidth } from './textWidth.ts';

/** A label that belongs to a place along the top edge of a panel, px. */
export interface LabelAbove {
  readonly at: number;
  readonly text: RichText | string;
}

/** Free room between neighbours, px. */
const GAP = 10;
/** A label moved by less than this still stands over its rule. */
const NEAR = 4;

/**
 * Labels over a panel, in one row or, where that is too crowded, in two that
 * take turns; a label that had to move is joined to its place by a thin stroke.
 */
export function labelsAbove(
  frame: FigureFrame,
  panel: Rectangle,
  labels: readonly LabelAbove[],
  look: { readonly text: string; readonly stroke: string },
): Decoration {
  const size = frame.labelSize;
  const lengths = labels.map((label) => textWidth(label.text, size) + GAP);
  const rows = lengths.reduce((sum, length) => sum + length, 0) > panel.width ? 2 : 1;
  const shapes: FigureShape[] = [];
  const annotations: FigureAnnotation[] = [];
  const taken: Rectangle[] = [];
  for (let row = 0; row < rows; row++) {
    const members = labels.map((_, index) => index).filter((index) => index % rows === row);
    const centres = spreadLabels(
      members.map((index) => ({ at: labels[index].at, length: lengths[index] })),
      Math.max(0, panel.left - 24),
      Math.min(frame.panels.width, panel.left + panel.width + 24),
    );
    const bottom = panel.top - 6 - labelRow * row;
    members.forEach((index, k) => {
      const { at, text } = labels[index];
      const centre = Math.abs(centres[k] - at) < NEAR ? at : centres[k];
      const markup = typeof text === 'string' ? escapeMarkup(text) : toMarkup(text);
      annotations.push(
        textAt(frame, { x: centre, y: bottom, xanchor: 'center', yanchor: 'bottom' }, markup, {
          size,
          color: look.text,
        }),
      );
      const width = lengths[index] - GAP;
      taken.push({ left: centre - width / 2, top: bottom - size, width, height: size });
      if (centre !== at || row > 0) {
        shapes.push(strokeBetween(frame, [at, panel.top], [centre, bottom + 1], { color: look.stroke, width: 1 }));
      }
    });
  }
  return { shapes, annotations, taken, lines: [] };
}
