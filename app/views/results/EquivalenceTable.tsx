import type { EquivalenceResult } from '../../../core/index.ts';
import { formatQuantity } from '../../widgets/formatQuantity.ts';
import { groupEquivalence } from './groupEquivalence.ts';

const ways = [
  { by: 'fit', label: 'from the fit' },
  { by: 'derivative', label: 'derivative' },
  { by: 'gran', label: 'Gran' },
] as const;

/** Equivalence volumes of every step, by every way, side by side. */
export function EquivalenceTable({ results }: { readonly results: readonly EquivalenceResult[] }) {
  const steps = groupEquivalence(results);
  const severalAnalytes = new Set(steps.map(({ analyte }) => analyte)).size > 1;
  const remarks = [...new Set(results.map(({ by, remark }) => `${by}\n${remark}`))].map((text) => text.split('\n'));
  return (
    <>
      <table className="equivalence">
        <caption className="unseen">Equivalence volumes in mL</caption>
        <thead>
          <tr>
            <th scope="col">step</th>
            {ways.map(({ by, label }) => (
              <th key={by} scope="col" className="number">
                {label}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {steps.map((step) => (
            <tr key={`${step.analyte} ${step.step}`}>
              <th scope="row">
                {step.step > 0 ? step.step : ''}
                {(severalAnalytes || step.step === 0) && <small> {step.analyte}</small>}
              </th>
              {ways.map(({ by }) => (
                <Volume key={by} result={step[by]} />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <details className="how">
        <summary>How each is meant</summary>
        <ul>
          {remarks
            .filter(([, remark]) => remark !== '')
            .map(([by, remark]) => (
              <li key={`${by} ${remark}`}>
                <strong>{ways.find((way) => way.by === by)?.label}:</strong> {remark}
              </li>
            ))}
        </ul>
      </details>
    </>
  );
}

function Volume({ result }: { readonly result: EquivalenceResult | null }) {
  if (result === null || result.volume_mL === null)
    return (
      <td className="number" title={result?.remark ?? 'This way sees no such step.'}>
        –
      </td>
    );
  const { value, u } = formatQuantity(result.volume_mL, result.u, 5);
  return (
    <td className="number" title={result.remark}>
      {value}
      {u !== null && <small> u {u}</small>}
    </td>
  );
}
