import type { DrawnForm } from './drawnForms.ts';
import type { FigureTrace } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { toUnicode } from './richText.ts';

/** Share of every form in per cent: running sideways beside the curve, upwards below it; those in front come last. */
export function speciationTraces(frame: FigureFrame, forms: readonly DrawnForm[], style: FigureStyle): FigureTrace[] {
  const turned = frame.panels.arrangement === 'below';
  return [...forms.filter((form) => !form.inFront), ...forms.filter((form) => form.inFront)].map((form) => {
    const share = Array.from(form.fraction, (fraction) => 100 * fraction);
    const pH = Array.from(form.pH);
    return {
      type: 'scatter',
      name: toUnicode(form.label),
      mode: 'lines',
      x: turned ? pH : share,
      y: turned ? share : pH,
      xaxis: 'x2',
      yaxis: 'y3',
      line: form.inFront
        ? { color: style.forms[form.colour % style.forms.length], dash: form.stroke.dash, width: form.stroke.width }
        : { color: style.ruleStrong, dash: form.stroke.dash, width: 0.8 },
    };
  });
}
