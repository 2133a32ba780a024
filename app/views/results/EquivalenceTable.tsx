import type { EquivalenceResult } from '../../../core/index.ts';
import { formatQuantity } from '../../widgets/formatQuantity.ts';
import { type EquivalenceStep, groupEquivalence } from './groupEquivalence.ts';
import { ShareBar } from './ShareBar.tsx';
import { shareParts } from './shareParts.ts';
import { stepWords } from './stepWords.ts';

interface Props {
  readonly results: readonly EquivalenceResult[];
  /** What sources of variance are called, by id. */
  readonly labels: ReadonlyMap<string, string>;
  /** Sources of variance in the order of their looks. */
  readonly sources: readonly string[];
}

const ways = [
  { by: 'fit', label: 'from the fit' },
  { by: 'derivative', label: 'derivative' },
  { by: 'gran', label: 'Gran' },
] as const;

/** Equivalence volumes of every step, by every way, side by side. */
export function EquivalenceTable({ results, labels, sources }: Props) {
  const steps = groupEquivalence(results);
  const words = stepWords(steps);
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
          {steps.map((step, k) => (
            <tr key={`${step.analyte} ${step.step}`}>
              <th scope="row">
                {words[k].name}
                {words[k].remark !== '' && <small> {words[k].remark}</small>}
              </th>
              {ways.map(({ by }) => (
                <td key={by} className="number">
                  {step[by].length === 0 ? (
                    <small>{by === 'fit' ? 'none' : 'not seen'}</small>
                  ) : (
                    step[by].map((result) => <Volume key={result.remark} result={result} />)
                  )}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <details className="how">
        <summary>How each is meant</summary>
        <ul>
          {steps.map((step, k) => (
            <li key={`${step.analyte} ${step.step}`}>
              {/^\d/.test(words[k].name) ? 'step ' : ''}
              {words[k].name} {words[k].remark}
              <Meanings step={step} labels={labels} sources={sources} />
            </li>
          ))}
        </ul>
      </details>
    </>
  );
}

function Meanings({ step, labels, sources }: { readonly step: EquivalenceStep } & Omit<Props, 'results'>) {
  return (
    <ul>
      {ways.flatMap(({ by, label }) =>
        step[by]
          .filter(({ remark, shares }) => remark !== '' || shares.length > 0)
          .map(({ remark, shares }) => (
            <li key={`${by} ${remark}`}>
              {label}
              {remark === '' ? '' : `: ${remark}`}
              {shares.length > 0 && (
                <>
                  {'; '}
                  <ShareBar parts={shareParts(shares, sources, labels)} />
                </>
              )}
            </li>
          )),
      )}
    </ul>
  );
}

function Volume({ result }: { readonly result: EquivalenceResult }) {
  if (result.volume_mL === null) return <small title={result.remark}>not determined</small>;
  const { value, u } = formatQuantity(result.volume_mL, result.u, 5);
  return (
    <div title={result.remark}>
      {value}
      {u !== null && <small> u {u}</small>}
    </div>
  );
}
