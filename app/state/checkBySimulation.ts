import { summariseBootstrap, usualSeed } from '../../core/index.ts';
import type { WorkerLike } from '../worker/analysisClient.ts';
import { repeatInWorkers } from '../worker/repeatInWorkers.ts';
import { bootstrapStore } from './bootstrapStore.ts';
import { inputStore } from './inputStore.ts';
import { workStore } from './workStore.ts';

/** Ends of intervals are then known to about 2 % of their width. */
const repetitions = 1000;

/** Ends what belongs to the check before and forgets it. */
let leave: (() => void) | null = null;

/**
 * Checks the result on the page by simulation. The check belongs to that result: it is ended and dropped as soon as
 * the inputs change or another result is shown. Does nothing while the result is not that of the inputs.
 *
 * @param start starts a worker
 */
export function checkBySimulation(start: () => WorkerLike, workerCount: number): void {
  const { latest } = workStore.getState();
  if (latest === null || !isShown(latest)) return;
  leave?.();
  const { result } = latest;
  const asked = { of: result, count: repetitions, seed: usualSeed };
  let done = 0;
  const report = (repeated: number) => {
    done = repeated;
    if (leave === own) bootstrapStore.setState({ check: { ...asked, state: 'repeating', done, stop } });
  };
  const { answer, stop } = repeatInWorkers(start, workerCount, { result, count: repetitions, seed: usualSeed }, report);

  const follow = () => {
    if (!isShown(latest)) own();
  };
  const unfollow = [inputStore.subscribe(follow), workStore.subscribe(follow)];
  const own = () => {
    for (const end of unfollow) end();
    leave = null;
    stop();
    bootstrapStore.setState({ check: null });
  };
  leave = own;
  report(0);

  answer.then((reply) => {
    if (leave !== own) return;
    if (reply.kind === 'stopped') bootstrapStore.setState({ check: { ...asked, state: 'stopped', done } });
    else if (reply.kind === 'broken')
      bootstrapStore.setState({ check: { ...asked, state: 'broken', message: reply.message } });
    else {
      const { ids, replicates } = reply.repeated;
      const summaries = summariseBootstrap(ids, replicates);
      const failed = replicates.filter((replicate) => replicate === null).length;
      bootstrapStore.setState({ check: { ...asked, state: 'done', summaries, failed } });
    }
  });
}

/** True while a result is the one on the page and belongs to the inputs as they are. */
function isShown(latest: NonNullable<ReturnType<typeof workStore.getState>['latest']>): boolean {
  const { present } = inputStore.getState();
  return present.runs[present.shown] === latest.input && workStore.getState().latest?.result === latest.result;
}
