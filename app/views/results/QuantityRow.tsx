import type { QuantityResult } from '../../../core/index.ts';
import { formatQuantity } from '../../widgets/formatQuantity.ts';
import { IntervalBar } from '../../widgets/IntervalBar.tsx';
import { constantWords } from './constantWords.ts';
import { intervalWords } from './intervalWords.ts';
import { whyNoNumber } from './whyNoNumber.ts';

interface Props {
  readonly quantity: QuantityResult;
  readonly halfWidth: number;
  /** Labels of all quantities by id, for what this one rests on. */
  readonly labels: ReadonlyMap<string, string>;
}

/** One quantity with its uncertainty, its interval, what it is and what it rests on. */
export function QuantityRow({ quantity, halfWidth, labels }: Props) {
  const { id, label, unit, state, value, u, interval95, restsOn, constant } = quantity;
  const shown = formatQuantity(value, u, 6);
  const why = whyNoNumber(quantity);
  const interval = intervalWords(quantity);
  const [low, high] = interval95 ?? [null, null];
  const remarks = [
    ...(state === 'assumed' ? ['assumed'] : state === 'known' ? ['known'] : []),
    ...(constant === null ? [] : [constantWords(constant, decimalsOf(shown.value))]),
    ...(restsOn.length === 0
      ? []
      : [`rests on assumed ${restsOn.map((other) => labels.get(other) ?? other).join(', ')}`]),
  ];
  return (
    <>
      <tr data-quantity={id} data-state={state} data-value={value ?? undefined} data-u={u ?? undefined}>
        <th scope="row">{label}</th>
        <td className="number value">{shown.value}</td>
        <td className="number">{shown.u ?? <span className="why">{state === 'fitted' ? '–' : ''}</span>}</td>
        <td className="unit">{unit}</td>
        <td className="interval">
          {value !== null && low !== null && high !== null && halfWidth > 0 && (
            <IntervalBar value={value} low={low} high={high} halfWidth={halfWidth} />
          )}
          {interval === null ? <span className="why">{why}</span> : <span className="interval-words">{interval}</span>}
        </td>
      </tr>
      {remarks.length > 0 && (
        <tr className="remark-row">
          <td colSpan={5}>
            {remarks.map((remark, index) => (
              <span
                key={remark}
                className={remark === 'assumed' || remark.startsWith('rests') ? 'assumed-mark' : undefined}
              >
                {index > 0 && ' · '}
                {remark}
              </span>
            ))}
          </td>
        </tr>
      )}
    </>
  );
}

function decimalsOf(text: string): number {
  return text.split('.')[1]?.length ?? 0;
}
