import type { Decoration } from './decoration.ts';
import type { DrawnForm } from './drawnForms.ts';
import type { FigureAnnotation } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { contains, type PixelAxis, toPixels } from './pixelAxis.ts';
import { textAt } from './place.ts';
import { type LabelRequest, type PixelLine, placeLabels } from './placeLabels.ts';
import type { Rectangle } from './rectangle.ts';
import { toMarkup } from './richText.ts';
import { textWidth } from './textWidth.ts';

/** Distance of a name from its curve, px. */
const STEP = 6;
/** What it costs to stand at half the curve's largest share instead of at the largest. */
const COST_OF_HALF = 30;
/** What it costs to stand on a curve or a rule. */
const COST_OF_LINE = 12;
/** A form that never reaches this share in view lies on the axis and stays without a name. */
const VISIBLE = 0.02;
/** Below this share of its own maximum a curve no longer carries its name. */
const LEAST = 0.35;
/** About so many places along a curve are near enough to each other. */
const PLACES = 120;

/** The name of each form in front, on its curve: near its maximum, clear of other names, and of curves where it can be. */
export function formNames(
  frame: FigureFrame,
  forms: readonly DrawnForm[],
  constants: Decoration,
  style: FigureStyle,
): FigureAnnotation[] {
  const { pH, fraction } = frame.axes;
  const { speciation, arrangement, width } = frame.panels;
  if (pH === null || fraction === null || speciation === null) return [];
  const size = frame.labelSize + 1;
  const named = forms.filter((form) => form.inFront);
  const turned = arrangement === 'below';
  const lines = named.map((form) => pixelLine(form, pH, fraction, turned));
  const requests = named.map((form, k) => nameRequest(form, lines[k], pH, size, turned));
  const bounds: Rectangle = turned
    ? {
        left: speciation.left,
        top: speciation.top - size - 4,
        width: width - speciation.left,
        height: speciation.height + size,
      }
    : {
        left: speciation.left,
        top: speciation.top - size,
        width: width - speciation.left,
        height: speciation.height + size,
      };
  const annotations: FigureAnnotation[] = [];
  // The largest shares have the most obvious places, so they choose first.
  const order = named.map((_, k) => k).sort((a, b) => largest(named[b]) - largest(named[a]));
  const places = placeLabels(
    order.map((k) => requests[k]),
    bounds,
    constants.taken,
    [...lines, ...constants.lines].map((line) => ({ line, cost: COST_OF_LINE })),
  );
  places.forEach((place, index) => {
    if (place === null) return;
    const form = named[order[index]];
    annotations.push(
      textAt(
        frame,
        { x: place.left, y: place.top + place.height / 2, xanchor: 'left', yanchor: 'middle' },
        toMarkup(form.label),
        { size, color: style.forms[form.colour % style.forms.length] },
      ),
    );
  });
  return annotations;
}

function largest(form: DrawnForm): number {
  return form.fraction.reduce((a, b) => Math.max(a, b), 0);
}

function pixelLine(form: DrawnForm, pH: PixelAxis, fraction: PixelAxis, turned: boolean): PixelLine {
  const line: number[] = [];
  form.pH.forEach((value, i) => {
    const along = toPixels(pH, value);
    const across = toPixels(fraction, form.fraction[i]);
    if (turned) line.push(along, across);
    else line.push(across, along);
  });
  return line;
}

function nameRequest(form: DrawnForm, line: PixelLine, pH: PixelAxis, size: number, turned: boolean): LabelRequest {
  const width = textWidth(form.label, size);
  const height = size + 2;
  const visible = Array.from(form.pH.keys()).filter((i) => contains(pH.range, form.pH[i]));
  const top = visible.reduce((most, i) => Math.max(most, form.fraction[i]), 0);
  if (top < VISIBLE) return { width, height, candidates: [] };
  const every = Math.max(1, Math.floor(visible.length / PLACES));
  const candidates = [];
  for (let v = 0; v < visible.length; v += every) {
    const i = visible[v];
    const share = form.fraction[i] / top;
    if (!(share >= LEAST)) continue;
    const [x, y] = [line[2 * i], line[2 * i + 1]];
    const cost = 2 * COST_OF_HALF * (1 - share);
    const right = { left: x + STEP, top: y - height / 2 };
    const left = { left: x - STEP - width, top: y - height / 2 };
    const above = { left: x - width / 2, top: y - STEP - height };
    const below = { left: x - width / 2, top: y + STEP };
    candidates.push(
      { ...right, cost: cost + (turned ? 2 : 0) },
      { ...left, cost: cost + 4 },
      { ...above, cost: cost + (turned ? 0 : 3) },
      { ...below, cost: cost + 5 },
    );
  }
  return { width, height, candidates };
}
