import { constantRules } from './constantRules.ts';
import { curveTraces } from './curveTraces.ts';
import { drawnForms } from './drawnForms.ts';
import { drawnPoints } from './drawnPoints.ts';
import { equivalenceRules } from './equivalenceRules.ts';
import type { Figure, FigureTrace } from './figure.ts';
import { figureAxes } from './figureAxes.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { formNames } from './formNames.ts';
import { pHEnds } from './pHEnds.ts';
import { residualTraces } from './residualTraces.ts';
import { speciationTraces } from './speciationTraces.ts';

/** Which systems of the speciation stand in front, by the prefix of their quantities. */
export type FrontSystems = ReadonlySet<string>;

/**
 * The crossed figure as plain data: reading against volume, residuals below on
 * the same volume axis, speciation on the same pH axis.
 */
export function crossedFigure(frame: FigureFrame, front: FrontSystems, style: FigureStyle): Figure {
  const drawn = drawnPoints(frame.run, frame.view).points;
  const forms = drawnForms(frame, front);
  const { axes, titles } = figureAxes(frame, style);
  const equivalence = equivalenceRules(frame, style);
  const constants = constantRules(frame, front, style);
  const names = formNames(frame, forms, constants, style);
  return {
    data: [
      ...residualTraces(frame, drawn, style),
      ...curveTraces(frame, drawn, style),
      ...speciationTraces(frame, forms, style),
      ...pHAxisCarrier(frame),
    ].map((trace) => ({ ...trace, hoverinfo: 'skip', showlegend: false })),
    layout: {
      width: frame.panels.width,
      height: frame.panels.height,
      margin: { l: 0, r: 0, t: 0, b: 0, pad: 0 },
      paper_bgcolor: style.paper,
      plot_bgcolor: 'rgba(0,0,0,0)',
      font: { family: style.fontFamily, size: frame.labelSize, color: style.ink },
      showlegend: false,
      dragmode: false,
      hovermode: false,
      separators: '. ',
      ...axes,
      shapes: [...equivalence.shapes, ...constants.shapes],
      annotations: [...titles, ...equivalence.annotations, ...constants.annotations, ...names],
    },
  };
}

/** The plotting library leaves out an axis that carries nothing; one point without a value makes it draw the pH. */
function pHAxisCarrier(frame: FigureFrame): FigureTrace[] {
  if (pHEnds(frame) === null) return [];
  return [{ type: 'scatter', name: 'pH axis', mode: 'markers', x: [null], y: [null], xaxis: 'x', yaxis: 'y4' }];
}
