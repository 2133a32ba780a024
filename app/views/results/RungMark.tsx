import type { RungKind } from './rungLook.ts';

interface Props {
  readonly kind: RungKind;
  readonly x: number;
  readonly y: number;
  readonly isChosen: boolean;
  /** True where something speaks against the rung. */
  readonly isDoubtful: boolean;
}

const r = 4;

/** A rung as a mark: its form says what is fitted besides groups, filled is what the run shows, crossed is spoken against. */
export function RungMark({ kind, x, y, isChosen, isDoubtful }: Props) {
  const shape = {
    plain: <circle cx={x} cy={y} r={r} />,
    carbonate: <path d={`M${x} ${y - r - 1}L${x + r + 0.6} ${y + r - 0.6}H${x - r - 0.6}Z`} />,
    excess: <rect x={x - r + 0.4} y={y - r + 0.4} width={2 * r - 0.8} height={2 * r - 0.8} />,
    both: <path d={`M${x} ${y - r - 1.2}L${x + r + 1.2} ${y}L${x} ${y + r + 1.2}L${x - r - 1.2} ${y}Z`} />,
  }[kind];
  return (
    <g className={isChosen ? 'rung chosen' : 'rung'}>
      {isChosen && <circle className="rung-ring" cx={x} cy={y} r={r + 4} />}
      {shape}
      {isDoubtful && <path className="rung-against" d={`M${x - 6} ${y + 6}L${x + 6} ${y - 6}`} />}
    </g>
  );
}
