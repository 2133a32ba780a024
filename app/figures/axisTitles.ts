import type { FigureAnnotation } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { pHEnds } from './pHEnds.ts';
import { textAt } from './place.ts';
import type { Rectangle } from './rectangle.ts';

/** Titles of all axes; those of the vertical ones stand in one line. */
export function axisTitles(frame: FigureFrame, style: FigureStyle): FigureAnnotation[] {
  const { panels, run } = frame;
  const { curve, residuals, speciation } = panels;
  const font = { size: frame.labelSize + 1, color: style.ink };
  const kind = run.result.run.readingKind;
  const upwards = (x: number, panel: Rectangle, text: string) => ({
    ...textAt(frame, { x, y: panel.top + panel.height / 2, xanchor: 'center', yanchor: 'middle' }, text, font),
    textangle: -90,
  });
  const beneath = (panel: Rectangle, text: string) =>
    textAt(
      frame,
      { x: panel.left + panel.width / 2, y: panel.top + panel.height + 27, xanchor: 'center', yanchor: 'top' },
      text,
      font,
    );
  const list = [
    upwards(panels.titleLeft, curve, kind === 'mV' ? 'reading / mV' : pHEnds(frame) === null ? 'pH' : 'pH as read'),
    beneath(residuals ?? curve, 'titrant added / mL'),
  ];
  if (residuals !== null) list.push(upwards(panels.titleLeft, residuals, kind === 'mV' ? 'residual / mV' : 'residual'));
  if (pHEnds(frame) !== null) {
    const right = curve.left + curve.width + (panels.narrow ? 38 : 46);
    list.push(upwards(right, curve, kind === 'mV' ? 'pH' : 'pH as calibrated'));
  }
  if (speciation !== null) {
    if (panels.arrangement === 'below') {
      list.push(beneath(speciation, 'pH'), upwards(panels.titleLeft, speciation, 'share of the forms / %'));
    } else list.push(beneath(speciation, 'share of the forms / %'));
  }
  return list;
}
