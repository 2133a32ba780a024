import type { Decoration } from './decoration.ts';
import { equivalenceMarks } from './equivalenceMarks.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { labelsAbove } from './labelsAbove.ts';
import { contains, toPixels } from './pixelAxis.ts';
import { strokeBetween } from './place.ts';

/** Length of the ticks of the derivative, px. */
const TICK = 7;

/**
 * Thin vertical rules at the fitted equivalence volumes, through curve and
 * residuals, and small ticks at the top of the curve where the readings are
 * steepest. Without a fit the ticks carry the labels.
 */
export function equivalenceRules(frame: FigureFrame, style: FigureStyle): Decoration {
  const { curve, residuals } = frame.panels;
  const { rules, ticks } = equivalenceMarks(frame.run);
  const inView = (mark: { volume_mL: number }) => contains(frame.view.volume, mark.volume_mL);
  const at = (mark: { volume_mL: number }) => toPixels(frame.axes.volume, mark.volume_mL);
  const lowest = residuals === null ? curve.top + curve.height : residuals.top + residuals.height;
  const labelled = rules.length > 0 ? rules : ticks;
  const labels = labelsAbove(
    frame,
    curve,
    labelled.filter(inView).map((mark) => ({ at: at(mark), text: mark.text })),
    { text: style.inkQuiet, stroke: style.ruleStrong },
  );
  return {
    shapes: [
      ...rules.filter(inView).map((mark) =>
        strokeBetween(frame, [at(mark), curve.top], [at(mark), lowest], {
          color: style.ruleStrong,
          width: 1,
          dash: 'dot',
        }),
      ),
      ...ticks
        .filter(inView)
        .map((mark) =>
          strokeBetween(frame, [at(mark), curve.top], [at(mark), curve.top + TICK], { color: style.ink, width: 1.4 }),
        ),
      ...labels.shapes,
    ],
    annotations: labels.annotations,
    taken: labels.taken,
    lines: [],
  };
}
