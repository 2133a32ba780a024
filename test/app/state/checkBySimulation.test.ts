import { beforeEach, expect, test } from 'vitest';
import { bootstrapStore } from '../../../app/state/bootstrapStore.ts';
import { checkBySimulation } from '../../../app/state/checkBySimulation.ts';
import { inputStore } from '../../../app/state/inputStore.ts';
import type { RunInput } from '../../../app/state/inputs.ts';
import { workStore } from '../../../app/state/workStore.ts';
import type { WorkerLike } from '../../../app/worker/analysisClient.ts';
import type { Reply, Request } from '../../../app/worker/messages.ts';
import { markedResult } from './stubClient.ts';

class StubWorker implements WorkerLike {
  isEnded = false;
  onmessage: WorkerLike['onmessage'] = null;
  onerror: WorkerLike['onerror'] = null;
  private latest: (Request & { readonly kind: 'repeat' }) | null = null;
  postMessage(request: Request): void {
    if (request.kind === 'repeat') this.latest = request;
  }
  terminate(): void {
    this.isEnded = true;
  }
  say(reply: Reply): void {
    this.onmessage?.({ data: reply });
  }
  /** Finishes everything that it is dealt; every tenth replicate cannot be fitted. */
  finishAll(): void {
    while (this.latest !== null) {
      const { job, share } = this.latest;
      this.latest = null;
      const numbers = Array.from({ length: share.to - share.from }, (_, k) => share.from + k);
      const replicates = numbers.map((number) => (number % 10 === 0 ? null : Float64Array.of(number)));
      this.say({ kind: 'repeated', job, repeated: { ids: ['pKa1'], replicates } });
    }
  }
}

const input = (file: string): RunInput => ({
  file,
  index: 0,
  isSample: false,
  sheet: { sheet: 1 },
  decisions: new Map(),
});
const show = (shown: RunInput) => inputStore.setState({ present: { runs: [shown], shown: 0 }, past: [], future: [] });
const settled = () => new Promise<void>((resolve) => setTimeout(resolve));

let workers: StubWorker[];
const ask = () =>
  checkBySimulation(() => {
    const worker = new StubWorker();
    workers.push(worker);
    return worker;
  }, 1);
const check = () => bootstrapStore.getState().check;
const first = input('a.csv');
const result = markedResult('first');

beforeEach(() => {
  workers = [];
  show(first);
  workStore.setState({ work: { state: 'idle' }, latest: { input: first, result } });
  bootstrapStore.setState({ check: null });
});

test('a check reports how far it is and ends with what the fitted repetitions say', async () => {
  ask();
  expect(check()).toMatchObject({ state: 'repeating', of: result, done: 0, count: 1000 });
  workers[0].say({ kind: 'progress', job: 0, progress: { doing: 'repeating', share: 0.5 } });
  expect(check()).toMatchObject({ state: 'repeating', done: 25 });
  workers[0].finishAll();
  await settled();
  expect(check()).toMatchObject({ state: 'done', of: result, failed: 100, seed: 1 });
  const done = check();
  expect(done?.state === 'done' ? done.summaries.map(({ id }) => id) : []).toEqual(['pKa1']);
});

test('a stop is answered at once with what was done, and another check may follow', async () => {
  ask();
  workers[0].say({ kind: 'progress', job: 0, progress: { doing: 'repeating', share: 0.5 } });
  const running = check();
  if (running?.state === 'repeating') running.stop();
  await settled();
  expect(check()).toMatchObject({ state: 'stopped', done: 25 });
  expect(workers[0].isEnded).toBe(true);
  ask();
  workers[1].finishAll();
  await settled();
  expect(check()?.state).toBe('done');
});

test('a mistake is told', async () => {
  ask();
  workers[0].say({ kind: 'broken', job: 0, message: 'a mistake' });
  await settled();
  expect(check()).toMatchObject({ state: 'broken', message: 'a mistake' });
});

test('changed inputs end a running check and drop it, and it does not come back', async () => {
  ask();
  show(input('a.csv'));
  expect(check()).toBe(null);
  expect(workers[0].isEnded).toBe(true);
  workers[0].finishAll();
  await settled();
  expect(check()).toBe(null);
});

test('changed inputs drop a finished check, even where the same inputs come back', async () => {
  ask();
  workers[0].finishAll();
  await settled();
  show(input('a.csv'));
  expect(check()).toBe(null);
  show(first);
  expect(check()).toBe(null);
});

test('another result drops the check', () => {
  ask();
  workStore.setState({ latest: { input: first, result: markedResult('second') } });
  expect(check()).toBe(null);
});

test('a result that is no longer that of the inputs cannot be checked', () => {
  show(input('a.csv'));
  ask();
  expect(check()).toBe(null);
  expect(workers).toEqual([]);
});
