import type { FigureFrame } from '../../figures/figureFrame.ts';
import { readingOfPH } from '../../figures/pHLink.ts';
import { contains, toPixels } from '../../figures/pixelAxis.ts';
import type { Pointed } from '../page/pointing.ts';
import { PointRings } from './PointRings.tsx';

interface Props {
  readonly frame: FigureFrame;
  readonly pointed: Pointed;
}

/** What a doubt or a row of a table is about: a ring around its point, or a line at its volume or its constant. */
export function PointedMarks({ frame, pointed: { line, volume_mL, quantity } }: Props) {
  const { run, panels, axes, view } = frame;
  const { curve, residuals, speciation, arrangement } = panels;
  const lowest = residuals ?? curve;
  const point = line === undefined ? -1 : run.points.findIndex((candidate) => candidate.line === line);
  const crossing =
    quantity === undefined
      ? undefined
      : run.result.speciation?.systems
          .flatMap(({ crossings }) => crossings)
          .find(({ quantityId }) => quantityId === quantity);
  const reading = crossing === undefined || run.link === null ? null : readingOfPH(run.link, crossing.pH);
  const x = volume_mL !== undefined && contains(view.volume, volume_mL) ? toPixels(axes.volume, volume_mL) : null;
  const y = reading !== null && contains(view.reading, reading) ? toPixels(axes.reading, reading) : null;
  const across = speciation !== null && arrangement === 'beside' ? speciation : curve;
  return (
    <g className="figure-selected">
      {point >= 0 && <PointRings frame={frame} point={point} radius={9} name="figure-selected" />}
      {x !== null && (
        <>
          <line x1={x} x2={x} y1={curve.top} y2={lowest.top + lowest.height} />
          <text x={x + 5} y={curve.top + 12}>
            ?
          </text>
        </>
      )}
      {y !== null && <line x1={curve.left} x2={across.left + across.width} y1={y} y2={y} />}
    </g>
  );
}
