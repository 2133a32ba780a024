import type { RunResult } from '../../../core/index.ts';
import { formatDecimals, formatQuantity, formatSignificant } from '../../widgets/formatQuantity.ts';
import { usePointing } from '../page/pointing.ts';

interface Props {
  readonly result: RunResult;
  readonly labels: ReadonlyMap<string, string>;
}

/** Points that a fit would rather not believe, and how far the answers would move without them. */
export function StandingOut({ result, labels }: Props) {
  const { pointed, point } = usePointing();
  const { robust, quantities } = result;
  if (robust === null) return null;
  const { distrusted, moves } = robust;
  const farthest = moves.reduce((most, { inU }) => Math.max(most, Math.abs(inU)), 0);
  const u = new Map(quantities.map((quantity) => [quantity.id, quantity] as const));
  return (
    <>
      {distrusted.length === 0 ? (
        <p>None. Where distant points count less, no answer moves by more than {formatSignificant(farthest, 2)} u.</p>
      ) : (
        <p>
          {distrusted.length === 1
            ? 'Too far from the curve for chance: '
            : `${distrusted.length} lie too far from the curve for chance: `}
          {distrusted.map(({ line, volume_mL, weight }, i) => (
            <span key={line}>
              {i > 0 && ', '}
              <button
                type="button"
                className="link show-place"
                aria-pressed={pointed?.line === line}
                onClick={() => point(pointed?.line === line ? null : { line }, 'figure')}
              >
                line {line}
              </button>{' '}
              at {formatDecimals(volume_mL, 3)} mL
              {weight > 0 && ` (counted ${formatSignificant(100 * weight, 1)} %)`}
            </span>
          ))}
          . The results above use {distrusted.length === 1 ? 'it' : 'them'} all the same.
        </p>
      )}
      {moves.length > 0 && (
        <details className="how">
          <summary>
            {distrusted.length === 0
              ? 'How each answer would move'
              : `How each answer would move without ${distrusted.length === 1 ? 'it' : 'them'}`}
          </summary>
          <table className="moves">
            <caption className="unseen">Moves of the answers where distant points count less</caption>
            <thead>
              <tr>
                <th scope="col">quantity</th>
                <th scope="col" className="number">
                  move
                </th>
                <th scope="col" className="number">
                  in u
                </th>
              </tr>
            </thead>
            <tbody>
              {moves.map(({ id, shift, inU }) => (
                <tr key={id}>
                  <th scope="row">
                    {labels.get(id) ?? id}
                    {u.get(id)?.unit ? <span className="unit"> {u.get(id)?.unit}</span> : null}
                  </th>
                  <td className="number">{signed(formatQuantity(shift, u.get(id)?.u ?? null, 2).value)}</td>
                  <td className="number">{signed(formatDecimals(inU, 2))}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </details>
      )}
    </>
  );
}

function signed(text: string): string {
  return text.startsWith('−') || /^0(\.0*)?$/.test(text) ? text : `+${text}`;
}
