const size = 26;
const half = size / 2;
const radius = 10.5;
/** Weaker than this is drawn quietly. */
const weak = 0.3;

/** One coefficient as the ellipse that a normal distribution with it would have; a full circle is none. */
export function CorrelationMark({ value }: { readonly value: number | null }) {
  const isWeak = value === null || Math.abs(value) < weak;
  return (
    <svg
      className={isWeak ? 'correlation-mark weak' : 'correlation-mark'}
      viewBox={`0 0 ${size} ${size}`}
      aria-hidden="true"
    >
      {value === null ? (
        <text x={half} y={half + 4} textAnchor="middle">
          –
        </text>
      ) : (
        <ellipse
          cx={half}
          cy={half}
          rx={radius * Math.sqrt(1 + Math.abs(value)) * Math.SQRT1_2}
          ry={Math.max(0.7, radius * Math.sqrt(1 - Math.abs(value)) * Math.SQRT1_2)}
          transform={`rotate(${value >= 0 ? -45 : 45} ${half} ${half})`}
        />
      )}
    </svg>
  );
}
