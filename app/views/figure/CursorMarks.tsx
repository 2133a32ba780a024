import type { Cursor } from '../../figures/cursor.ts';
import type { FigureFrame } from '../../figures/figureFrame.ts';
import { contains, toPixels } from '../../figures/pixelAxis.ts';
import type { Rectangle } from '../../figures/rectangle.ts';
import type { Pointed } from '../page/pointing.ts';
import { PointedMarks } from './PointedMarks.tsx';
import { PointRings } from './PointRings.tsx';

interface Props {
  readonly frame: FigureFrame;
  readonly cursor: Cursor | null;
  /** What is marked from elsewhere on the page. */
  readonly pointed: Pointed | null;
  /** The part being marked for enlarging. */
  readonly zoomed: Rectangle | null;
}

/** The lines of the cursor through all panels, the ring around its point, and what is marked from elsewhere. */
export function CursorMarks({ frame, cursor, pointed, zoomed }: Props) {
  return (
    <svg className="figure-marks" width={frame.panels.width} height={frame.panels.height} aria-hidden="true">
      {zoomed !== null && (
        <rect className="figure-zoomed" x={zoomed.left} y={zoomed.top} width={zoomed.width} height={zoomed.height} />
      )}
      {pointed !== null && <PointedMarks frame={frame} pointed={pointed} />}
      {cursor !== null && <CursorLines frame={frame} cursor={cursor} />}
      {cursor?.point != null && (
        <PointRings frame={frame} point={cursor.point} radius={6.5} name="figure-nearest-ring" />
      )}
    </svg>
  );
}

function CursorLines({ frame, cursor }: { readonly frame: FigureFrame; readonly cursor: Cursor }) {
  const { curve, residuals, speciation, arrangement } = frame.panels;
  const { view, axes } = frame;
  const lowest = residuals ?? curve;
  const x =
    cursor.volume_mL !== null && contains(view.volume, cursor.volume_mL)
      ? toPixels(axes.volume, cursor.volume_mL)
      : null;
  const y = contains(view.reading, cursor.reading) ? toPixels(axes.reading, cursor.reading) : null;
  const isBelow = arrangement === 'below' && speciation !== null && axes.pH !== null && cursor.pH !== null;
  const across = speciation !== null && arrangement === 'beside' ? speciation : curve;
  return (
    <g className="figure-cursor">
      {x !== null && <line x1={x} x2={x} y1={curve.top} y2={lowest.top + lowest.height} />}
      {y !== null && <line x1={curve.left} x2={across.left + across.width} y1={y} y2={y} />}
      {y !== null && isBelow && (
        <line
          x1={toPixels(axes.pH, cursor.pH)}
          x2={toPixels(axes.pH, cursor.pH)}
          y1={speciation.top}
          y2={speciation.top + speciation.height}
        />
      )}
      {x !== null && y !== null && <circle cx={x} cy={y} r={3} />}
    </g>
  );
}
