import { useState } from 'react';
import type { QuantityResult } from '../../../core/index.ts';
import { profileCurve } from '../../figures/profileCurve.ts';
import { formatQuantity } from '../../widgets/formatQuantity.ts';
import { IntervalBar } from '../../widgets/IntervalBar.tsx';
import { boundWords } from './boundWords.ts';
import { constantWords } from './constantWords.ts';
import type { IntervalScale } from './intervalScale.ts';
import { intervalWords } from './intervalWords.ts';
import { ProfileFigure } from './ProfileFigure.tsx';
import { RestsOn } from './RestsOn.tsx';
import { ShareBar } from './ShareBar.tsx';
import { shareParts } from './shareParts.ts';
import { whyNoNumber } from './whyNoNumber.ts';

interface Props {
  readonly quantity: QuantityResult;
  readonly scale: IntervalScale | null;
  /** Labels of all quantities by id, for what this one rests on. */
  readonly labels: ReadonlyMap<string, string>;
  /** Sources of variance in the order of their looks. */
  readonly sources: readonly string[];
  /** True while something else on the page points at this quantity. */
  readonly isPointed: boolean;
}

/** Intervals in more characters may break into two lines. */
const longestLine = 18;

/** One quantity with its uncertainty, its interval, what it is and what it rests on. */
export function QuantityRow({ quantity, scale, labels, sources, isPointed }: Props) {
  const [showsProfile, setShowsProfile] = useState(false);
  const { id, label, unit, state, value, u, interval95, restsOn, constant, shares } = quantity;
  const shown = formatQuantity(value, u, 6);
  const interval = intervalWords(quantity);
  const bound = boundWords(quantity);
  const [low, high] = interval95 ?? [null, null];
  const decimals = shown.value.split('.')[1]?.length ?? 0;
  const profile = profileCurve(quantity);
  const bar = value !== null && low !== null && high !== null && scale !== null && (
    <IntervalBar value={value} low={low} high={high} {...scale} ground={scale.declared} />
  );
  const why = bound === null ? whyNoNumber(quantity) : '95 % bound';
  const certainty =
    why !== null || interval === null ? (
      <span className="interval-why">{why}</span>
    ) : (
      <>
        <span className="interval-drawn">{bar}</span>
        <span className={interval.length > longestLine ? 'interval-words' : 'interval-words short'}>{interval}</span>
      </>
    );
  const cell =
    profile === null ? (
      <span className="certainty">{certainty}</span>
    ) : (
      <button
        type="button"
        className="certainty"
        aria-expanded={showsProfile}
        title={showsProfile ? 'Close the profile' : 'Show the profile'}
        onClick={() => setShowsProfile(!showsProfile)}
      >
        {certainty}
        <span className="unseen"> profile of {label}</span>
      </button>
    );
  return (
    <>
      <tr
        data-quantity={id}
        data-state={state}
        data-value={value ?? undefined}
        data-u={u ?? undefined}
        className={isPointed ? 'pointed' : undefined}
      >
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
        {value !== null && <td className="number value">{shown.value}</td>}
        {bound !== null && (
          <td colSpan={2} className="number value">
            {bound}
          </td>
        )}
        {value !== null && shown.u !== null && <td className="number">{shown.u}</td>}
        <td
          className={why === null ? 'interval' : 'why'}
          colSpan={value === null ? (bound === null ? 3 : 1) : shown.u === null ? 2 : 1}
        >
          {cell}
        </td>
      </tr>
      {showsProfile && profile !== null && (
        <tr className="remark-row">
          <td colSpan={4}>
            <ProfileFigure quantity={quantity} profile={profile} />
          </td>
        </tr>
      )}
      {constant !== null && value !== null && (
        <tr className="remark-row">
          <td colSpan={4}>{constantWords(constant, decimals)}</td>
        </tr>
      )}
      {state === 'fitted' && shares.length > 0 && (
        <tr className="remark-row">
          <td colSpan={4}>
            <ShareBar parts={shareParts(shares, sources, labels)} />
          </td>
        </tr>
      )}
      {restsOn.length > 0 && (
        <tr className="remark-row">
          <td colSpan={4}>
            <RestsOn names={restsOn.map((other) => labels.get(other) ?? other)} />
          </td>
        </tr>
      )}
    </>
  );
}
