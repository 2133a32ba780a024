import { useState } from 'react';
import type { PointResult, Run } from '../../../core/index.ts';
import { formatDecimals } from '../../widgets/formatQuantity.ts';
import { RefusalList } from '../../widgets/RefusalList.tsx';

interface Props {
  readonly run: Run;
  /** Of the latest result; empty where there is none for this run. */
  readonly points: readonly PointResult[];
  readonly selectedLine: number | null;
  readonly onSelect: (line: number | null) => void;
  readonly onToggle: (line: number) => void;
}

/** A table longer than this is shown in parts, so that opening it never makes anybody wait. */
const rowsAtOnce = 400;

/** Every row of the source: used, or excluded with its reason. */
export function RowsTable({ run, points, selectedLine, onSelect, onToggle }: Props) {
  const [isOpen, setIsOpen] = useState(false);
  const [most, setMost] = useState(rowsAtOnce);
  const excluded = run.rows.filter(({ decision }) => decision.use === 'excluded').length;
  const residuals = new Map(points.map(({ line, residual }) => [line, residual]));
  const inPH = run.readingKind === 'pH';
  const summary = [
    `${run.rows.length} points`,
    ...(excluded === 0 ? [] : [`${excluded} excluded`]),
    ...(run.notAccepted.length === 0 ? [] : [`${run.notAccepted.length} not accepted`]),
  ].join(', ');
  return (
    <section className="rows" aria-label="Points">
      <h2>
        <button type="button" className="fold" aria-expanded={isOpen} onClick={() => setIsOpen(!isOpen)}>
          {summary}
        </button>
      </h2>
      {isOpen && (
        <>
          {run.notAccepted.length > 0 && (
            <div className="not-accepted">
              <h3>Rows not accepted</h3>
              <RefusalList refusals={run.notAccepted} />
            </div>
          )}
          <table className="points">
            <caption className="unseen">Rows of {run.file}</caption>
            <thead>
              <tr>
                <th scope="col">used</th>
                <th scope="col" className="number">
                  line
                </th>
                <th scope="col" className="number">
                  volume / mL
                </th>
                <th scope="col" className="number">
                  {inPH ? 'pH' : 'E / mV'}
                </th>
                <th scope="col" className="number">
                  residual
                </th>
                <th scope="col">reason</th>
              </tr>
            </thead>
            <tbody>
              {run.rows.slice(0, most).map(({ line, volume_mL, reading, decision }) => {
                const residual = residuals.get(line) ?? null;
                return (
                  <tr
                    key={line}
                    data-line={line}
                    className={`${decision.use}${line === selectedLine ? ' selected' : ''}`}
                    onPointerEnter={() => onSelect(line)}
                    onPointerLeave={() => onSelect(null)}
                    onFocus={() => onSelect(line)}
                    onBlur={() => onSelect(null)}
                  >
                    <td>
                      <input
                        type="checkbox"
                        aria-label={`use line ${line}`}
                        checked={decision.use === 'used'}
                        onChange={() => onToggle(line)}
                      />
                    </td>
                    <td className="number">{line}</td>
                    <td className="number">{formatDecimals(volume_mL, 3)}</td>
                    <td className="number">{formatDecimals(reading, inPH ? 3 : 1)}</td>
                    <td className="number">{residual === null ? '–' : formatDecimals(residual, inPH ? 4 : 2)}</td>
                    <td>{decision.use === 'used' ? '' : decision.why}</td>
                  </tr>
                );
              })}
            </tbody>
          </table>
          {run.rows.length > most && (
            <button type="button" className="link" onClick={() => setMost(most + rowsAtOnce)}>
              Show the next {Math.min(rowsAtOnce, run.rows.length - most)} of {run.rows.length - most} more
            </button>
          )}
        </>
      )}
    </section>
  );
}
