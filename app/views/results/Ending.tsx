import type { RunResult } from '../../../core/index.ts';
import { noiseWords } from './noiseWords.ts';

/** How the work on the run ended: one word where it went well, the reason where it did not. */
export function Ending({ result }: { readonly result: RunResult }) {
  const { ending, noise, points } = result;
  const isSuccess = ending.code === 'fitted' || ending.code === 'predicted';
  const used = points.filter((point) => point.used).length;
  return (
    <div className={`ending${isSuccess ? '' : ' failed'}`} data-ending={ending.code}>
      {ending.code === 'fitted' ? (
        <p>
          <strong>Fitted</strong> to {used} points.{' '}
          {noise !== null && <span className="noise">{noiseWords(noise)}</span>}
        </p>
      ) : (
        <p>
          {ending.message} {noise !== null && <span className="noise">{noiseWords(noise)}</span>}
        </p>
      )}
      {ending.code === 'fitted' && (
        <details className="how">
          <summary>How the fit ended</summary>
          {ending.message}
        </details>
      )}
    </div>
  );
}
