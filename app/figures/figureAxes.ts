import { axisTitles } from './axisTitles.ts';
import type { FigureAnnotation, FigureLayout } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { pHEnds } from './pHEnds.ts';
import type { Rectangle } from './rectangle.ts';

/** About one number per this many px. */
const PX_PER_NUMBER_ACROSS = 64;
const PX_PER_NUMBER_UP = 48;

/** The axes of all panels, with their numbers and titles; domains and ranges are those of the frame. */
export function figureAxes(
  frame: FigureFrame,
  style: FigureStyle,
): { axes: Partial<FigureLayout>; titles: FigureAnnotation[] } {
  const { panels, axes } = frame;
  const { curve, residuals, speciation } = panels;
  const turned = panels.arrangement === 'below';
  const base = {
    showgrid: false,
    zeroline: false,
    showline: false,
    ticks: 'outside',
    ticklen: 5,
    tickwidth: 1,
    tickcolor: style.ink,
    tickfont: { size: frame.labelSize, color: style.ink },
    fixedrange: true,
    automargin: false,
    exponentformat: 'power',
  } as const;
  const across = (panel: Rectangle): [number, number] => [
    panel.left / panels.width,
    (panel.left + panel.width) / panels.width,
  ];
  const up = (panel: Rectangle): [number, number] => [
    1 - (panel.top + panel.height) / panels.height,
    1 - panel.top / panels.height,
  ];
  const numbers = (length: number, each: number) => Math.max(2, Math.round(length / each));
  const perHundred = { ...base, range: [0, 100] as [number, number], tickvals: [0, 25, 50, 75, 100] };
  const pHRange: [number, number] = axes.pH === null ? [0, 14] : [...axes.pH.range];
  const residualAxis: Partial<FigureLayout> =
    residuals === null || axes.residual === null
      ? {}
      : {
          yaxis2: {
            ...base,
            domain: up(residuals),
            range: [...axes.residual.range],
            anchor: 'x',
            nticks: 4,
            zeroline: true,
            zerolinecolor: style.ruleStrong,
            zerolinewidth: 1,
          },
        };
  const speciationAxes: Partial<FigureLayout> =
    speciation === null
      ? {}
      : {
          xaxis2: turned
            ? {
                ...base,
                domain: across(speciation),
                range: pHRange,
                anchor: 'y3',
                nticks: numbers(speciation.width, 40),
              }
            : { ...perHundred, domain: across(speciation), anchor: 'y3' },
          yaxis3: turned
            ? { ...perHundred, domain: up(speciation), anchor: 'x2' }
            : { ...base, domain: up(speciation), range: pHRange, anchor: 'x2', showticklabels: false, ticks: '' },
        };
  return {
    axes: {
      xaxis: {
        ...base,
        domain: across(curve),
        range: [...axes.volume.range],
        anchor: residuals === null ? 'y' : 'y2',
        nticks: numbers(curve.width, PX_PER_NUMBER_ACROSS),
      },
      yaxis: {
        ...base,
        domain: up(curve),
        range: [...axes.reading.range],
        anchor: 'x',
        nticks: numbers(curve.height, PX_PER_NUMBER_UP),
      },
      ...residualAxis,
      ...speciationAxes,
      ...pHAxis(frame, base),
    },
    titles: axisTitles(frame, style),
  };
}

/** What the readings mean in pH, at the right of the curve; it lies over the axis of the reading. */
function pHAxis(frame: FigureFrame, base: object): Partial<FigureLayout> {
  const ends = pHEnds(frame);
  if (ends === null) return {};
  return {
    yaxis4: {
      ...base,
      overlaying: 'y',
      side: 'right',
      anchor: 'x',
      range: ends,
      // An overlaid axis would otherwise take the places of the numbers below it, which are no round pH.
      tickmode: 'auto',
      nticks: Math.max(2, Math.round(frame.panels.curve.height / PX_PER_NUMBER_UP)),
    },
  };
}
