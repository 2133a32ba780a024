import { useWork } from '../../state/useWork.ts';
import { RefusalList } from '../../widgets/RefusalList.tsx';

interface Props {
  readonly onStop: () => void;
  readonly onRetry: () => void;
}

/** What is being done, or why nothing is. */
export function WorkLine({ onStop, onRetry }: Props) {
  const work = useWork((state) => state.work);
  const reading = useWork((state) => state.reading);
  return (
    <div className="work-line" role="status">
      {reading.length > 0 && <p className="working">Reading {reading.join(', ')} …</p>}
      {work.state === 'working' && (
        <p className="working">
          {work.progress.doing}
          {work.progress.share === null ? ' …' : ` … ${Math.round(100 * work.progress.share)} %`}{' '}
          <button type="button" className="link" onClick={onStop}>
            Stop
          </button>
        </p>
      )}
      {work.state === 'stopped' && (
        <p>
          Stopped before there was a result.{' '}
          <button type="button" className="link" onClick={onRetry}>
            Fit again
          </button>
        </p>
      )}
      {work.state === 'refused' && (
        <div className="notice">
          <h2>These conditions cannot be used together</h2>
          <RefusalList refusals={work.refusals} />
        </div>
      )}
      {work.state === 'broken' && (
        <div className="notice">
          <h2>The calculation broke off</h2>
          <p>
            This is a mistake of the program, not yours; your files and conditions are as they were. {work.message}{' '}
            <button type="button" className="link" onClick={onRetry}>
              Try again
            </button>
          </p>
        </div>
      )}
    </div>
  );
}
