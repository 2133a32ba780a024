import type { ConstantMark } from './constantMarks.ts';
import type { Decoration } from './decoration.ts';
import { equivalenceMarks } from './equivalenceMarks.ts';
import type { FigureAnnotation } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { toPixels } from './pixelAxis.ts';
import { textAt } from './place.ts';
import { placeLabels } from './placeLabels.ts';
import { toMarkup } from './richText.ts';
import { textWidth } from './textWidth.ts';

/** Places tried along a rule. */
const PLACES = 13;
/** What it costs to hide part of the curve, or of a rule; the far end of its own rule costs nothing. */
const COST_OF_CURVE = 60;
const COST_OF_RULE = 12;

/** Labels at either end of the rules inside the curve's panel, where the curve leaves room. */
export function labelsOnRules(frame: FigureFrame, marks: readonly ConstantMark[], style: FigureStyle): Decoration {
  const { curve } = frame.panels;
  const size = frame.labelSize - 1;
  const requests = marks.map((mark) => {
    const width = textWidth(mark.label, size);
    const height = toPixels(frame.axes.reading, mark.reading);
    const free = curve.width - width - 8;
    const places = Array.from({ length: PLACES }, (_, k) => k / (PLACES - 1));
    return {
      width,
      height: size,
      // The ends of the rule are where a label is looked for.
      candidates: places.flatMap((share) => {
        const left = curve.left + 4 + share * free;
        const cost = 10 * Math.min(share, 1 - share);
        return [
          { left, top: height - size - 3, cost },
          { left, top: height + 3, cost: cost + 1 },
        ];
      }),
    };
  });
  const found = placeLabels(
    requests,
    curve,
    [],
    [
      { line: pointLine(frame), cost: COST_OF_CURVE },
      ...equivalenceLines(frame).map((line) => ({ line, cost: COST_OF_RULE })),
    ],
  );
  const annotations: FigureAnnotation[] = [];
  found.forEach((place, k) => {
    if (place === null) return;
    annotations.push(
      textAt(
        frame,
        { x: place.left, y: place.top + place.height / 2, xanchor: 'left', yanchor: 'middle' },
        toMarkup(marks[k].label),
        { size, color: style.inkQuiet },
      ),
    );
  });
  return { shapes: [], annotations, taken: found.filter((place) => place !== null), lines: [] };
}

/** The rules at the equivalence volumes, which a label should not stand on. */
function equivalenceLines(frame: FigureFrame): number[][] {
  const { curve } = frame.panels;
  return equivalenceMarks(frame.run).rules.map(({ volume_mL }) => {
    const x = toPixels(frame.axes.volume, volume_mL);
    return [x, curve.top, x, curve.top + curve.height];
  });
}

function pointLine(frame: FigureFrame): number[] {
  const { curve } = frame.run.result;
  const line: number[] = [];
  const visit = (volume_mL: number, reading: number) =>
    line.push(toPixels(frame.axes.volume, volume_mL), toPixels(frame.axes.reading, reading));
  if (curve !== null) curve.volume_mL.forEach((volume_mL, i) => void visit(volume_mL, curve.reading[i]));
  else for (const point of frame.run.points) visit(point.volume_mL, point.reading);
  return line;
}
