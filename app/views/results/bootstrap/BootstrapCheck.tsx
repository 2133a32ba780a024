import type { RunResult } from '../../../../core/index.ts';
import { checkBySimulation } from '../../../state/checkBySimulation.ts';
import { useBootstrapCheck } from '../../../state/useBootstrapCheck.ts';
import { startAnalysisWorker } from '../../../worker/startAnalysisWorker.ts';
import { workerCount } from '../../../worker/workerCount.ts';
import { BootstrapFindings } from './BootstrapFindings.tsx';
import './bootstrapCheck.css';
import { withThousands } from './withThousands.ts';

/** Intervals checked by repeating the run in simulation: on request, with its progress, and what came of it. */
export function BootstrapCheck({ result }: { readonly result: RunResult }) {
  const check = useBootstrapCheck(result);
  const canBeChecked =
    result.ending.code === 'fitted' && result.quantities.some(({ u, state }) => u !== null && state === 'fitted');
  if (!canBeChecked) return null;
  const button = (words: string) => (
    <button type="button" className="link" onClick={() => checkBySimulation(startAnalysisWorker, workerCount())}>
      {words}
    </button>
  );
  return (
    <div className="bootstrap" data-state={check?.state ?? 'none'}>
      {check === null && (
        <p>
          {button('Check by simulation')} <small>whether repetitions of the run bear out these intervals</small>
        </p>
      )}
      {check?.state === 'repeating' && (
        <p className="bootstrap-progress">
          <progress aria-label="Simulation" max={check.count} value={check.done} />
          <span className="bootstrap-count">
            {withThousands(check.done)} of {withThousands(check.count)} repetitions
          </span>{' '}
          <button type="button" className="link" onClick={check.stop}>
            Stop
          </button>
        </p>
      )}
      {check?.state === 'stopped' && (
        <p role="status">
          Stopped after {withThousands(check.done)} of {withThousands(check.count)} repetitions. {button('Start again')}
        </p>
      )}
      {check?.state === 'broken' && (
        <p role="status">
          The simulation broke off. This is a mistake of the program, not yours; the results above stand.{' '}
          {check.message} {button('Try again')}
        </p>
      )}
      {check?.state === 'done' && <BootstrapFindings check={check} result={result} />}
    </div>
  );
}
