import type { QuantityResult } from '../../../core/index.ts';
import { formatQuantity } from '../../widgets/formatQuantity.ts';
import { IntervalBar } from '../../widgets/IntervalBar.tsx';
import { constantWords } from './constantWords.ts';
import type { IntervalScale } from './intervalScale.ts';
import { intervalWords } from './intervalWords.ts';
import { RestsOn } from './RestsOn.tsx';
import { shareWords } from './shareWords.ts';
import { whyNoNumber } from './whyNoNumber.ts';

interface Props {
  readonly quantity: QuantityResult;
  readonly scale: IntervalScale | null;
  /** Labels of all quantities by id, for what this one rests on. */
  readonly labels: ReadonlyMap<string, string>;
}

/** Intervals in more characters may break into two lines. */
const longestLine = 18;

/** One quantity with its uncertainty, its interval, what it is and what it rests on. */
export function QuantityRow({ quantity, scale, labels }: Props) {
  const { id, label, unit, state, value, u, interval95, restsOn, constant } = quantity;
  const shown = formatQuantity(value, u, 6);
  const interval = intervalWords(quantity);
  const shares = shareWords(quantity.shares, labels);
  const [low, high] = interval95 ?? [null, null];
  const decimals = shown.value.split('.')[1]?.length ?? 0;
  return (
    <>
      <tr data-quantity={id} data-state={state} data-value={value ?? undefined} data-u={u ?? undefined}>
        <th scope="row">
          {label}
          {unit !== '' && <span className="unit"> {unit}</span>}
          {state === 'assumed' && (
            <>
              {' '}
              <span className="assumed-mark">assumed</span>
            </>
          )}
        </th>
        <td className="number value">{shown.value}</td>
        <td className="number">{shown.u ?? '–'}</td>
        {interval === null ? (
          <td colSpan={2} className="why">
            {whyNoNumber(quantity)}
          </td>
        ) : (
          <>
            <td className="interval">
              {value !== null && low !== null && high !== null && scale !== null && (
                <IntervalBar value={value} low={low} high={high} {...scale} ground={scale.declared} />
              )}
            </td>
            <td className={interval.length > longestLine ? 'interval-words' : 'interval-words short'}>{interval}</td>
          </>
        )}
      </tr>
      {constant !== null && (
        <tr className="remark-row">
          <td colSpan={5}>{constantWords(constant, decimals)}</td>
        </tr>
      )}
      {state === 'fitted' && shares !== null && (
        <tr className="remark-row">
          <td colSpan={5}>variance: {shares}</td>
        </tr>
      )}
      {restsOn.length > 0 && (
        <tr className="remark-row">
          <td colSpan={5}>
            <RestsOn names={restsOn.map((other) => labels.get(other) ?? other)} />
          </td>
        </tr>
      )}
    </>
  );
}
