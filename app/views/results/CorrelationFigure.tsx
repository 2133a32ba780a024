import { type KeyboardEvent, useRef, useState } from 'react';
import type { CorrelationResult } from '../../../core/index.ts';
import { formatDecimals } from '../../widgets/formatQuantity.ts';
import { CorrelationMark } from './CorrelationMark.tsx';
import { type CorrelationPair, strongestPair } from './strongestPair.ts';

interface Props {
  readonly correlation: CorrelationResult;
  readonly labels: ReadonlyMap<string, string>;
}

/**
 * How far quantities can take each other's place: a lower triangle of ellipses, narrow where the correlation is strong,
 * rising where it is positive. The number of a cell is told when it is pointed at or reached by keys.
 */
export function CorrelationFigure({ correlation, labels }: Props) {
  const { ids, matrix } = correlation;
  const [chosen, setChosen] = useState<CorrelationPair | null>(null);
  const table = useRef<HTMLTableElement>(null);
  const name = (k: number) => labels.get(ids[k]) ?? ids[k];
  const coefficient = ({ row, column }: CorrelationPair) => matrix[row * ids.length + column];
  const words = (cell: CorrelationPair) => {
    const value = coefficient(cell);
    return `${name(cell.row)} with ${name(cell.column)}: ${value === null ? 'not determined' : formatDecimals(value, 2)}`;
  };
  const strongest = strongestPair(correlation);
  const entry = strongest ?? { row: 1, column: 0 };

  const onKeyDown = (event: KeyboardEvent) => {
    const from = chosen ?? entry;
    const to = step(from, event.key);
    if (to === null || to.row < 1 || to.row >= ids.length || to.column < 0 || to.column >= to.row) return;
    event.preventDefault();
    setChosen(to);
    table.current?.querySelector<HTMLElement>(`[data-cell="${to.row} ${to.column}"]`)?.focus();
  };

  const reachable = chosen ?? entry;
  return (
    <div className="correlation">
      <table ref={table}>
        <caption className="unseen">Correlation of the quantities</caption>
        <tbody>
          {ids.map((id, row) => (
            <tr key={id}>
              <th scope="row">
                <span className="correlation-index">{row + 1}</span> {name(row)}
              </th>
              {ids.slice(0, row).map((other, column) => {
                const cell = { row, column };
                const value = coefficient(cell);
                return (
                  <td key={other}>
                    <button
                      type="button"
                      data-cell={`${row} ${column}`}
                      tabIndex={row === reachable.row && column === reachable.column ? 0 : -1}
                      aria-label={words(cell)}
                      onPointerEnter={() => setChosen(cell)}
                      onPointerLeave={() => setChosen(null)}
                      onFocus={() => setChosen(cell)}
                      onBlur={() => setChosen(null)}
                      onKeyDown={onKeyDown}
                    >
                      <CorrelationMark value={value} />
                    </button>
                  </td>
                );
              })}
              {row < ids.length - 1 && <td className="correlation-index correlation-head">{row + 1}</td>}
            </tr>
          ))}
        </tbody>
      </table>
      <p className="correlation-number">
        {chosen !== null ? words(chosen) : strongest !== null ? `Strongest: ${words(strongest)}` : ''}
      </p>
    </div>
  );
}

function step({ row, column }: CorrelationPair, key: string): CorrelationPair | null {
  if (key === 'ArrowRight') return { row, column: column + 1 };
  if (key === 'ArrowLeft') return { row, column: column - 1 };
  if (key === 'ArrowDown') return { row: row + 1, column };
  return key === 'ArrowUp' ? { row: row - 1, column } : null;
}
