import { type ConstantMark, constantMarks } from './constantMarks.ts';
import type { Decoration } from './decoration.ts';
import type { FigureAnnotation, FigureShape } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { labelsAbove } from './labelsAbove.ts';
import { labelsOnRules } from './labelsOnRules.ts';
import { contains, type PixelAxis, toPixels } from './pixelAxis.ts';
import { strokeBetween, textAt } from './place.ts';
import type { Rectangle } from './rectangle.ts';
import { toMarkup } from './richText.ts';
import { spreadLabels } from './spreadLabels.ts';
import { textWidth } from './textWidth.ts';

const nothing: Decoration = { shapes: [], annotations: [], taken: [], lines: [] };

/** Distance of a label from the end of its rule, px. */
const STEP = 8;

/**
 * Thin rules at the constants of the plotted scale. Beside the curve each runs
 * through both panels to its label at the right; with the speciation below,
 * each panel has its own rule and its own label.
 */
export function constantRules(frame: FigureFrame, front: ReadonlySet<string>, style: FigureStyle): Decoration {
  const marks = constantMarks(frame.run, front).filter((mark) => contains(frame.view.reading, mark.reading));
  if (frame.axes.pH === null || frame.panels.speciation === null) return nothing;
  return frame.panels.arrangement === 'below'
    ? rulesInEach(frame, frame.axes.pH, frame.panels.speciation, marks, style)
    : rulesThroughBoth(frame, frame.panels.speciation, marks, style);
}

function rulesThroughBoth(
  frame: FigureFrame,
  speciation: Rectangle,
  marks: readonly ConstantMark[],
  style: FigureStyle,
): Decoration {
  const { curve } = frame.panels;
  const size = frame.labelSize;
  const end = speciation.left + speciation.width;
  const heights = marks.map((mark) => toPixels(frame.axes.reading, mark.reading));
  const centres = spreadLabels(
    heights.map((at) => ({ at, length: size + 6 })),
    speciation.top - size / 2,
    speciation.top + speciation.height + size / 2,
  );
  const line = { color: style.ruleStrong, width: 0.8 };
  const shapes: FigureShape[] = [];
  const annotations: FigureAnnotation[] = [];
  const taken: Rectangle[] = [];
  marks.forEach((mark, k) => {
    shapes.push(strokeBetween(frame, [curve.left, heights[k]], [end, heights[k]], line));
    shapes.push(strokeBetween(frame, [end, heights[k]], [end + STEP, centres[k]], line));
    annotations.push(
      textAt(frame, { x: end + STEP + 3, y: centres[k], xanchor: 'left', yanchor: 'middle' }, toMarkup(mark.label), {
        size,
        color: style.ink,
      }),
    );
    const width = textWidth(mark.label, size);
    taken.push({ left: end + STEP, top: centres[k] - size / 2 - 1, width: width + 3, height: size + 2 });
  });
  return { shapes, annotations, taken, lines: heights.map((at) => [curve.left, at, end, at]) };
}

function rulesInEach(
  frame: FigureFrame,
  pH: PixelAxis,
  speciation: Rectangle,
  marks: readonly ConstantMark[],
  style: FigureStyle,
): Decoration {
  const { curve } = frame.panels;
  const line = { color: style.ruleStrong, width: 0.8 };
  const look = { text: style.ink, stroke: style.ruleStrong };
  const across = marks.map((mark) => toPixels(pH, mark.pH));
  const above = labelsAbove(
    frame,
    speciation,
    marks.map((mark, k) => ({ at: across[k], text: mark.label })),
    look,
  );
  const inside = labelsOnRules(frame, marks, style);
  return {
    shapes: [
      ...marks.map((mark) => {
        const height = toPixels(frame.axes.reading, mark.reading);
        return strokeBetween(frame, [curve.left, height], [curve.left + curve.width, height], line);
      }),
      ...across.map((at) => strokeBetween(frame, [at, speciation.top], [at, speciation.top + speciation.height], line)),
      ...above.shapes,
    ],
    annotations: [...above.annotations, ...inside.annotations],
    taken: [...above.taken, ...inside.taken],
    lines: across.map((at) => [at, speciation.top, at, speciation.top + speciation.height]),
  };
}
