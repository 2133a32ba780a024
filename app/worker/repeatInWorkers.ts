import type { BootstrapReplicates, RepeatableResult, Replicate } from '../../core/index.ts';
import type { WorkerLike } from './analysisClient.ts';
import { longestSilence } from './longestSilence.ts';
import type { Reply } from './messages.ts';

/** Replicates that a worker gets at a time: enough that fitting the run again before them costs little. */
const shareSize = 50;

/** What is to be repeated, and how often. */
export interface Repetition {
  readonly result: RepeatableResult;
  readonly count: number;
  readonly seed: number;
}

export type RepetitionReply =
  | { readonly kind: 'repeated'; readonly repeated: BootstrapReplicates }
  | { readonly kind: 'stopped' }
  | { readonly kind: 'broken'; readonly message: string };

/**
 * Repeats a run in simulation, dealt out to workers of its own, which end with it. Replicates are joined by their
 * number, so that they do not depend on how many workers there are, or on which of them is fastest.
 *
 * @param report called with the number of replicates that are done
 * @returns `answer` never rejects; `stop` ends the workers at once, whatever they are at
 */
export function repeatInWorkers(
  start: () => WorkerLike,
  workerCount: number,
  { result, count, seed }: Repetition,
  report: (done: number) => void,
): { readonly answer: Promise<RepetitionReply>; readonly stop: () => void } {
  const replicates = new Array<Replicate>(count).fill(null);
  const { run, sheet, quantities } = result;
  const workers: WorkerLike[] = [];
  /** Replicates done of the shares that are at work, by the first of their numbers, which also names the job. */
  const partly = new Map<number, number>();
  let next = 0;
  let finished = 0;
  let watchdog: ReturnType<typeof setTimeout> | undefined;
  let settle: ((reply: RepetitionReply) => void) | null = null;
  const answer = new Promise<RepetitionReply>((resolve) => {
    settle = resolve;
  });

  const end = (reply: RepetitionReply) => {
    if (settle === null) return;
    clearTimeout(watchdog);
    for (const worker of workers) worker.terminate();
    settle(reply);
    settle = null;
  };

  /** Starts waiting anew for a sign of life. */
  const watch = () => {
    clearTimeout(watchdog);
    watchdog = setTimeout(() => {
      const message = `The simulation gave no sign of life for ${longestSilence / 1000} s and was ended.`;
      end({ kind: 'broken', message });
    }, longestSilence);
  };

  const deal = (worker: WorkerLike) => {
    if (next >= count) return;
    const from = next;
    next = Math.min(from + shareSize, count);
    partly.set(from, 0);
    const share = { from, to: next, seed };
    worker.postMessage({ kind: 'repeat', job: from, result: { run, sheet, quantities }, share });
  };

  const take = (worker: WorkerLike, reply: Reply) => {
    if (settle === null) return;
    watch();
    if (reply.kind === 'broken') end({ kind: 'broken', message: reply.message });
    else if (reply.kind === 'progress') {
      const size = Math.min(shareSize, count - reply.job);
      partly.set(reply.job, Math.round((reply.progress.share ?? 0) * size));
      report(finished + sum(partly.values()));
    } else if (reply.kind === 'repeated') {
      const { ids, replicates: share } = reply.repeated;
      share.forEach((replicate, k) => {
        replicates[reply.job + k] = replicate;
      });
      partly.delete(reply.job);
      finished += share.length;
      report(finished + sum(partly.values()));
      if (finished === count) end({ kind: 'repeated', repeated: { ids, replicates } });
      else deal(worker);
    }
  };

  const shares = Math.ceil(count / shareSize);
  for (let w = 0; w < Math.min(workerCount, shares); w++) {
    const worker = start();
    worker.onmessage = ({ data }) => take(worker, data);
    worker.onerror = ({ message }) =>
      end({ kind: 'broken', message: message ?? 'The simulation could not be started.' });
    workers.push(worker);
    deal(worker);
  }
  watch();
  return { answer, stop: () => end({ kind: 'stopped' }) };
}

function sum(values: Iterable<number>): number {
  let total = 0;
  for (const value of values) total += value;
  return total;
}
