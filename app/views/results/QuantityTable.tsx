import { Fragment, useState } from 'react';
import type { Doubt, QuantityResult } from '../../../core/index.ts';
import { DoubtNote } from '../../widgets/DoubtNote.tsx';
import type { DeclaredField } from '../conditions/declaredFields.ts';
import { intervalScale } from './intervalScale.ts';
import { QuantityRow } from './QuantityRow.tsx';

interface Props {
  readonly quantities: readonly QuantityResult[];
  /** False where the work ended without a fit. */
  readonly isFitted: boolean;
  /** Doubts that concern one quantity; shown under it. */
  readonly doubts: readonly Doubt[];
  /** What the conditions say, by id. */
  readonly declared: ReadonlyMap<string, DeclaredField>;
}

/** All quantities of the run: the fitted ones first, then what was declared with an uncertainty, then the exact ones. */
export function QuantityTable({ quantities, isFitted, doubts, declared: conditions }: Props) {
  const [showsExact, setShowsExact] = useState(false);
  const fitted = quantities.filter(({ state }) => state === 'fitted');
  const exact = quantities.filter(isExact);
  const declared = quantities.filter((quantity) => quantity.state !== 'fitted' && !isExact(quantity));
  // Results may rest on conditions that are no quantities, such as the scale of the readings.
  const labels = new Map([
    ...[...conditions].map(([id, { label }]) => [id, label] as const),
    ...quantities.map(({ id, label }) => [id, label] as const),
  ]);

  const rows = (group: readonly QuantityResult[]) =>
    group.map((quantity) => (
      <Fragment key={quantity.id}>
        <QuantityRow
          quantity={quantity}
          scale={intervalScale(quantity, quantities, conditions.get(quantity.id)?.declaration ?? null)}
          labels={labels}
        />
        {doubts
          .filter(({ place }) => place.quantity === quantity.id)
          .map((doubt) => (
            <tr key={doubt.code} className="doubt-row">
              <td colSpan={5}>
                <DoubtNote doubt={doubt} />
              </td>
            </tr>
          ))}
      </Fragment>
    ));

  return (
    <table className="quantities">
      <caption className="unseen">Quantities of the run</caption>
      <thead>
        <tr>
          <th scope="col">quantity</th>
          <th scope="col" className="number">
            value
          </th>
          <th scope="col" className="number">
            u
          </th>
          <th scope="col" colSpan={2}>
            95 % interval
          </th>
        </tr>
      </thead>
      {fitted.length > 0 && (
        <tbody>
          <GroupHead text={isFitted ? 'Fitted' : 'To be fitted'} />
          {rows(fitted)}
        </tbody>
      )}
      {declared.length > 0 && (
        <tbody>
          <GroupHead text={isFitted ? 'Known or assumed, and what the run makes of them' : 'Known or assumed'} />
          {rows(declared)}
        </tbody>
      )}
      {exact.length > 0 && (
        <tbody>
          <tr className="group-head">
            <th colSpan={5} scope="rowgroup">
              <button
                type="button"
                className="link"
                aria-expanded={showsExact}
                onClick={() => setShowsExact(!showsExact)}
              >
                {showsExact ? 'Hide' : 'Show'} {exact.length} taken as exact
              </button>
            </th>
          </tr>
          {showsExact && rows(exact)}
        </tbody>
      )}
    </table>
  );
}

function GroupHead({ text }: { readonly text: string }) {
  return (
    <tr className="group-head">
      <th colSpan={5} scope="rowgroup">
        {text}
      </th>
    </tr>
  );
}

function isExact({ state, u }: QuantityResult): boolean {
  return state !== 'fitted' && u === null;
}
