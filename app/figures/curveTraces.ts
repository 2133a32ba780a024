import type { PointResult } from '../../core/index.ts';
import type { FigureTrace } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { dense, markerSize } from './markerSize.ts';
import { standingOut, standingOutMark } from './standingOut.ts';

/** Reading against volume: the fitted curve, the points used as open circles, the excluded ones as crosses. */
export function curveTraces(frame: FigureFrame, drawn: readonly PointResult[], style: FigureStyle): FigureTrace[] {
  const { curve } = frame.run.result;
  const used = drawn.filter((point) => point.used);
  const excluded = drawn.filter((point) => !point.used);
  const size = markerSize(drawn.length, frame.panels.curve.width);
  // Points that touch hide a line below them: then they step back and the line lies over them.
  const areDense = size < dense;
  const traces: FigureTrace[] = [];
  const line: FigureTrace[] = [];
  if (curve !== null) {
    line.push({
      type: 'scatter',
      name: 'fitted curve',
      mode: 'lines',
      x: Array.from(curve.volume_mL),
      y: Array.from(curve.reading),
      xaxis: 'x',
      yaxis: 'y',
      line: { color: style.accent, width: 2 },
    });
  }
  if (!areDense) traces.push(...line);
  traces.push({
    type: 'scatter',
    name: 'points used',
    mode: 'markers',
    x: used.map((point) => point.volume_mL),
    y: used.map((point) => point.reading),
    xaxis: 'x',
    yaxis: 'y',
    marker: {
      symbol: 'circle-open',
      size,
      color: areDense ? style.inkQuiet : style.ink,
      line: { width: areDense ? 0.9 : 1.2 },
    },
  });
  if (excluded.length > 0) {
    traces.push({
      type: 'scatter',
      name: 'points excluded',
      mode: 'markers',
      x: excluded.map((point) => point.volume_mL),
      y: excluded.map((point) => point.reading),
      xaxis: 'x',
      yaxis: 'y',
      marker: { symbol: 'x-thin', size: size + 1, color: style.ink, line: { width: 1.4, color: style.ink } },
    });
  }
  if (areDense) traces.push(...line);
  const apart = standingOut(frame, drawn);
  if (apart.length > 0) {
    traces.push({
      type: 'scatter',
      name: 'points that stand out',
      mode: 'markers',
      x: apart.map((point) => point.volume_mL),
      y: apart.map((point) => point.reading),
      xaxis: 'x',
      yaxis: 'y',
      marker: standingOutMark(style),
    });
  }
  return traces;
}
