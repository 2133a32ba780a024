interface Props {
  readonly value: number;
  readonly low: number;
  readonly high: number;
  /** What the drawing spans: centre ± halfWidth, in the unit of the value. */
  readonly centre: number;
  readonly halfWidth: number;
  /** An interval to draw behind it, for comparison. */
  readonly ground: readonly [number, number] | null;
}

const width = 60;
const height = 12;
const margin = 4;

/** A 95 % interval drawn on its scale. The same facts stand beside it in figures. */
export function IntervalBar({ value, low, high, centre, halfWidth, ground }: Props) {
  const at = (x: number) => width / 2 + ((x - centre) / halfWidth) * (width / 2 - margin);
  const middle = height / 2;
  // A bar too short to be seen is still a bar.
  const from = Math.min(at(low), at(value) - 1);
  const to = Math.max(at(high), at(value) + 1);
  return (
    <svg className="interval-bar" width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
      {ground === null ? (
        <line className="interval-scale" x1={1} x2={width - 1} y1={middle} y2={middle} />
      ) : (
        <rect
          className="interval-ground"
          x={at(ground[0])}
          width={at(ground[1]) - at(ground[0])}
          y={1}
          height={height - 2}
        />
      )}
      <line className="interval-range" x1={from} x2={to} y1={middle} y2={middle} />
      <circle className="interval-value" cx={at(value)} cy={middle} r={2.6} />
    </svg>
  );
}
