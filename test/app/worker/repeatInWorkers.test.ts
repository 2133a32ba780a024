import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import type { WorkerLike } from '../../../app/worker/analysisClient.ts';
import { longestSilence } from '../../../app/worker/longestSilence.ts';
import type { Reply, Request } from '../../../app/worker/messages.ts';
import { repeatInWorkers } from '../../../app/worker/repeatInWorkers.ts';
import { bootstrapRun } from '../../../core/index.ts';
import { sampleResult } from '../../core/results/sampleResult.ts';

type RepeatRequest = Request & { readonly kind: 'repeat' };

class StubWorker implements WorkerLike {
  readonly requests: RepeatRequest[] = [];
  isEnded = false;
  onmessage: WorkerLike['onmessage'] = null;
  onerror: WorkerLike['onerror'] = null;
  postMessage(request: Request): void {
    if (request.kind === 'repeat') this.requests.push(request);
  }
  terminate(): void {
    this.isEnded = true;
  }
  say(reply: Reply): void {
    this.onmessage?.({ data: reply });
  }
  /** Answers the latest request with replicates whose only value is their number. */
  finish(): void {
    const { job, share } = this.requests[this.requests.length - 1];
    const replicates = Array.from({ length: share.to - share.from }, (_, k) => Float64Array.of(share.from + k));
    this.say({ kind: 'repeated', job, repeated: { ids: ['number'], replicates } });
  }
}

const result = sampleResult('phthalate.txt');
let workers: StubWorker[];
let reported: number[];
const start = () => {
  const worker = new StubWorker();
  workers.push(worker);
  return worker;
};
const repeat = (workerCount: number, count: number) =>
  repeatInWorkers(start, workerCount, { result, count, seed: 1 }, (done) => reported.push(done));

beforeEach(() => {
  vi.useFakeTimers();
  workers = [];
  reported = [];
});

afterEach(() => {
  vi.useRealTimers();
});

test('shares are dealt to whoever is free and joined by number, whichever is done first', async () => {
  const { answer } = repeat(2, 170);
  const [slow, fast] = workers;
  fast.finish();
  fast.finish();
  slow.finish();
  fast.finish();
  expect([slow, fast].map(({ requests }) => requests.map(({ share }) => [share.from, share.to]))).toEqual([
    [[0, 50]],
    [
      [50, 100],
      [100, 150],
      [150, 170],
    ],
  ]);
  const reply = await answer;
  if (reply.kind !== 'repeated') throw new Error(`The repetition ended as ${reply.kind}.`);
  expect(reply.repeated.replicates.map((replicate) => replicate?.[0])).toEqual(
    Array.from({ length: 170 }, (_, k) => k),
  );
  expect(workers.map(({ isEnded }) => isEnded)).toEqual([true, true]);
});

test('progress counts what is done in shares that are still at work', () => {
  repeat(2, 100);
  const [first, second] = workers;
  first.say({ kind: 'progress', job: 0, progress: { doing: 'repeating', share: 0.4 } });
  second.say({ kind: 'progress', job: 50, progress: { doing: 'repeating', share: 0.2 } });
  first.finish();
  expect(reported).toEqual([20, 30, 60]);
});

test('no more workers are started than there are shares', () => {
  repeat(4, 80);
  expect(workers.length).toBe(2);
});

test('a stop ends every worker at once, busy or not, and what they still say counts for nothing', async () => {
  const { answer, stop } = repeat(2, 1000);
  stop();
  expect(workers.map(({ isEnded }) => isEnded)).toEqual([true, true]);
  workers[0].finish();
  stop();
  expect(await answer).toEqual({ kind: 'stopped' });
  expect(reported).toEqual([]);
  expect(workers[0].requests.length).toBe(1);
});

test('a mistake in one worker ends them all and is told', async () => {
  const { answer } = repeat(2, 1000);
  workers[1].say({ kind: 'broken', job: 50, message: 'a mistake' });
  expect(await answer).toEqual({ kind: 'broken', message: 'a mistake' });
  expect(workers.map(({ isEnded }) => isEnded)).toEqual([true, true]);
});

test('a worker that fails to start is told', async () => {
  const { answer } = repeat(1, 1000);
  workers[0].onerror?.({ message: 'refused by the browser' });
  expect(await answer).toEqual({ kind: 'broken', message: 'refused by the browser' });
});

test('workers that stay silent are ended, those that show signs of life are not', async () => {
  const { answer } = repeat(1, 1000);
  await vi.advanceTimersByTimeAsync(0.8 * longestSilence);
  workers[0].say({ kind: 'progress', job: 0, progress: { doing: 'repeating', share: 0.1 } });
  await vi.advanceTimersByTimeAsync(0.8 * longestSilence);
  expect(workers[0].isEnded).toBe(false);
  await vi.advanceTimersByTimeAsync(0.3 * longestSilence);
  expect(await answer).toMatchObject({ kind: 'broken' });
  expect(workers[0].isEnded).toBe(true);
});

/** A worker that does the real work, and takes its time over every other share. */
class WorkingWorker extends StubWorker {
  override postMessage(request: Request): void {
    super.postMessage(request);
    if (request.kind !== 'repeat') return;
    const work = bootstrapRun(request.result, request.share);
    let step = work.next();
    while (step.done !== true) step = work.next();
    const repeated = step.value;
    setTimeout(() => this.say({ kind: 'repeated', job: request.job, repeated }), request.job % 100 === 0 ? 40 : 10);
  }
}

test('one worker and two give the same numbers', async () => {
  const count = 130;
  const numbers = async (workerCount: number) => {
    const { answer } = repeatInWorkers(
      () => new WorkingWorker(),
      workerCount,
      { result, count, seed: 1 },
      () => {},
    );
    await vi.advanceTimersByTimeAsync(1000);
    const reply = await answer;
    if (reply.kind !== 'repeated') throw new Error(`The repetition ended as ${reply.kind}.`);
    return reply.repeated.replicates.map((replicate) => replicate && [...replicate]);
  };
  const alone = await numbers(1);
  expect(await numbers(2)).toEqual(alone);
  expect(new Set(alone.map((replicate) => replicate?.join())).size).toBe(count);
}, 30_000);
