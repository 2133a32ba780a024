import { Fragment, useState } from 'react';
import type { Doubt, QuantityResult, RunResult } from '../../../core/index.ts';
import type { DeclaredField } from '../conditions/declaredFields.ts';
import { DoubtAtPlace } from './DoubtAtPlace.tsx';
import { intervalScale } from './intervalScale.ts';
import { isExact } from './isExact.ts';
import { QuantityRow } from './QuantityRow.tsx';

interface Props {
  readonly result: RunResult;
  /** Doubts that concern one quantity; shown under it. */
  readonly doubts: readonly Doubt[];
  /** What the conditions say, by id. */
  readonly declared: ReadonlyMap<string, DeclaredField>;
  /** What quantities and conditions are called, by id. */
  readonly labels: ReadonlyMap<string, string>;
  /** Sources of variance in the order of their looks. */
  readonly sources: readonly string[];
  /** Id of the quantity that something else on the page points at. */
  readonly pointed: string | null;
}

/** All quantities of the run: the fitted ones first, then what was declared with an uncertainty, then the exact ones. */
export function QuantityTable({ result, doubts, declared: conditions, labels, sources, pointed }: Props) {
  const { quantities } = result;
  const isFitted = result.ending.code === 'fitted';
  const [opensExact, setOpensExact] = useState(false);
  const fitted = quantities.filter(({ state }) => state === 'fitted');
  const exact = quantities.filter(isExact);
  const declared = quantities.filter((quantity) => quantity.state !== 'fitted' && !isExact(quantity));
  const showsExact = opensExact || exact.some(({ id }) => id === pointed);

  const rows = (group: readonly QuantityResult[]) =>
    group.map((quantity) => (
      <Fragment key={quantity.id}>
        <QuantityRow
          quantity={quantity}
          scale={intervalScale(quantity, quantities, conditions.get(quantity.id)?.declaration ?? null)}
          labels={labels}
          sources={sources}
          isPointed={quantity.id === pointed}
        />
        {doubts
          .filter(({ place }) => place.quantity === quantity.id)
          .map((doubt) => (
            <tr key={`${doubt.code} ${doubt.seen}`} className="doubt-row">
              <td colSpan={4}>
                <DoubtAtPlace doubt={doubt} result={result} isAtQuantity />
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
          <th scope="col" className="interval">
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
            <th colSpan={4} scope="rowgroup">
              <button
                type="button"
                className="link"
                aria-expanded={showsExact}
                onClick={() => setOpensExact(!showsExact)}
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
      <th colSpan={4} scope="rowgroup">
        {text}
      </th>
    </tr>
  );
}
