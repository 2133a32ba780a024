import type { PointResult } from '../../core/index.ts';
import type { FigureTrace } from './figure.ts';
import type { FigureFrame } from './figureFrame.ts';
import type { FigureStyle } from './figureStyle.ts';
import { markerSize } from './markerSize.ts';
import { bandWidth } from './residualRange.ts';
import { standingOut, standingOutMark } from './standingOut.ts';

/** Opacity of the band as two hexadecimal digits: 12 %. */
const BAND_ALPHA = '1f';

type FigureMarker = NonNullable<FigureTrace['marker']>;

/** A point with a residual, and the height at which it is drawn. */
interface Drawn {
  readonly volume_mL: number;
  readonly at: number;
}

/**
 * Residuals against volume over a quiet band of twice the uncertainty that each
 * point carries. Excluded points too far out for the panel stand at its edge
 * as triangles that point outwards.
 */
export function residualTraces(frame: FigureFrame, drawn: readonly PointResult[], style: FigureStyle): FigureTrace[] {
  if (frame.axes.residual === null) return [];
  const [low, high] = frame.axes.residual.range;
  const used: Drawn[] = [];
  const excluded: Drawn[] = [];
  const above: Drawn[] = [];
  const below: Drawn[] = [];
  for (const { residual, used: isUsed, volume_mL } of drawn) {
    if (residual === null) continue;
    if (isUsed) used.push({ volume_mL, at: residual });
    else if (residual > high) above.push({ volume_mL, at: high });
    else if (residual < low) below.push({ volume_mL, at: low });
    else excluded.push({ volume_mL, at: residual });
  }
  const size = markerSize(drawn.length, frame.panels.curve.width) - 1;
  const cross: FigureMarker = {
    symbol: 'x-thin',
    size: size + 1.5,
    color: style.ink,
    line: { width: 1.2, color: style.ink },
  };
  const outward: FigureMarker = { size: 8, color: style.ink, line: { width: 1.2 } };
  return [
    ...bandTrace(drawn, style),
    markers('residuals', used, { symbol: 'circle', size, color: style.ink }),
    markers('residuals of excluded points', excluded, cross),
    markers('excluded points above the panel', above, { ...outward, symbol: 'triangle-up-open' }),
    markers('excluded points below the panel', below, { ...outward, symbol: 'triangle-down-open' }),
    markers(
      'residuals that stand out',
      standingOut(frame, drawn).flatMap(({ volume_mL, residual }) =>
        residual === null || residual > high || residual < low ? [] : [{ volume_mL, at: residual }],
      ),
      standingOutMark(style),
    ),
  ].filter((trace) => (trace.x?.length ?? 0) > 0);
}

function markers(name: string, points: readonly Drawn[], marker: FigureMarker): FigureTrace {
  return {
    type: 'scatter',
    name,
    mode: 'markers',
    x: points.map((point) => point.volume_mL),
    y: points.map((point) => point.at),
    xaxis: 'x',
    yaxis: 'y2',
    cliponaxis: false,
    marker,
  };
}

/** From the first point to the last along the upper edge and back along the lower one. */
function bandTrace(drawn: readonly PointResult[], style: FigureStyle): FigureTrace[] {
  const edge: { volume_mL: number; half: number }[] = [];
  for (const { used, u, volume_mL } of drawn) if (used && u !== null) edge.push({ volume_mL, half: bandWidth * u });
  if (edge.length < 2) return [];
  const back = edge.toReversed();
  return [
    {
      type: 'scatter',
      name: 'band of twice the uncertainty',
      mode: 'lines',
      x: [...edge, ...back].map((point) => point.volume_mL),
      y: [...edge.map((point) => point.half), ...back.map((point) => -point.half)],
      xaxis: 'x',
      yaxis: 'y2',
      fill: 'toself',
      // Seen through, so that rules and zero line go on below it.
      fillcolor: `${style.accent}${BAND_ALPHA}`,
      line: { width: 0 },
    },
  ];
}
