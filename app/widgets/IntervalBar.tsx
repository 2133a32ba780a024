interface Props {
  readonly value: number;
  readonly low: number;
  readonly high: number;
  /** Half of the width that is shown, in the unit of the value; shared by bars that are to be compared. */
  readonly halfWidth: number;
}

const width = 88;
const height = 13;

/** A 95 % interval drawn around its value. The same facts stand beside it in figures. */
export function IntervalBar({ value, low, high, halfWidth }: Props) {
  const at = (x: number) => width / 2 + ((x - value) / halfWidth) * (width / 2 - 4);
  // A bar too short to be seen is still a bar.
  const from = Math.min(at(low), width / 2 - 1);
  const to = Math.max(at(high), width / 2 + 1);
  const middle = height / 2;
  return (
    <svg className="interval-bar" width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
      <line className="interval-scale" x1={1} x2={width - 1} y1={middle} y2={middle} />
      <line className="interval-range" x1={from} x2={to} y1={middle} y2={middle} />
      <circle className="interval-value" cx={width / 2} cy={middle} r={2.6} />
    </svg>
  );
}
