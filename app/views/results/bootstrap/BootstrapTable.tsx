import { formatQuantity } from '../../../widgets/formatQuantity.ts';
import { IntervalBar } from '../../../widgets/IntervalBar.tsx';
import { intervalWords } from '../intervalWords.ts';
import type { ComparedQuantity } from './compareIntervals.ts';

/** Uncertainties and intervals by the fit and by simulation, one below the other and drawn on the same scale. */
export function BootstrapTable({ compared }: { readonly compared: readonly ComparedQuantity[] }) {
  return (
    <table className="bootstrap-table">
      <caption className="unseen">Uncertainties by the fit and by simulation</caption>
      <thead>
        <tr>
          <th scope="col">quantity</th>
          <th scope="col">by</th>
          <th scope="col" className="number">
            u
          </th>
          <th scope="col" className="interval">
            95 % interval
          </th>
        </tr>
      </thead>
      {compared.map((entry) => (
        <Comparison key={entry.quantity.id} entry={entry} />
      ))}
    </table>
  );
}

function Comparison({ entry }: { readonly entry: ComparedQuantity }) {
  const { quantity, value, u, profile, simulated, agrees } = entry;
  const { id, label, unit } = quantity;
  const reach = Math.max(...[...profile, ...simulated.interval95].map((end) => Math.abs(end - value)));
  const lines = [
    { by: 'fit', centre: value, u, interval: profile },
    { by: 'simulation', centre: simulated.median, u: simulated.u, interval: simulated.interval95 },
  ];
  return (
    <tbody data-compared={id} data-agrees={agrees}>
      {lines.map((line, k) => (
        <tr key={line.by} data-by={line.by} data-u={line.u}>
          {k === 0 && (
            <th scope="rowgroup" rowSpan={2}>
              {label}
              {unit !== '' && <span className="unit"> {unit}</span>}
            </th>
          )}
          <td>{line.by}</td>
          <td className="number">{formatQuantity(value, line.u).u}</td>
          <td className="interval">
            <span className="certainty">
              <span className="interval-drawn">
                <IntervalBar
                  value={line.centre}
                  low={line.interval[0]}
                  high={line.interval[1]}
                  centre={value}
                  halfWidth={reach}
                  ground={null}
                />
              </span>
              <span className="interval-words short">
                {intervalWords({ ...quantity, u: line.u, interval95: line.interval })}
              </span>
            </span>
          </td>
        </tr>
      ))}
    </tbody>
  );
}
