import type { FigureFrame } from '../../figures/figureFrame.ts';
import { contains, toPixels } from '../../figures/pixelAxis.ts';

interface Props {
  readonly frame: FigureFrame;
  readonly point: number;
  readonly radius: number;
  readonly name: string;
}

/** Around a point of the curve, and around its residual where that lies in its panel. */
export function PointRings({ frame, point, radius, name }: Props) {
  const { volume_mL, reading, residual } = frame.run.points[point];
  const { volume, reading: readingAxis, residual: residualAxis } = frame.axes;
  if (!contains(volume.range, volume_mL)) return null;
  const x = toPixels(volume, volume_mL);
  return (
    <g className={name}>
      {contains(readingAxis.range, reading) && <circle cx={x} cy={toPixels(readingAxis, reading)} r={radius} />}
      {residual !== null && residualAxis !== null && contains(residualAxis.range, residual) && (
        <circle cx={x} cy={toPixels(residualAxis, residual)} r={radius} />
      )}
    </g>
  );
}
