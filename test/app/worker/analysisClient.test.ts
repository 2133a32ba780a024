import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { AnalysisClient, type WorkerLike } from '../../../app/worker/analysisClient.ts';
import type { Reply, Request } from '../../../app/worker/messages.ts';
import { runNamed } from '../state/stubClient.ts';

class StubWorker implements WorkerLike {
  readonly requests: Request[] = [];
  isEnded = false;
  onmessage: WorkerLike['onmessage'] = null;
  onerror: WorkerLike['onerror'] = null;
  postMessage(request: Request): void {
    this.requests.push(request);
  }
  terminate(): void {
    this.isEnded = true;
  }
  say(reply: Reply): void {
    this.onmessage?.({ data: reply });
  }
}

const silence = 1000;
const stopPatience = 100;
let workers: StubWorker[];
let client: AnalysisClient;

beforeEach(() => {
  vi.useFakeTimers();
  workers = [];
  client = new AnalysisClient(
    () => {
      const worker = new StubWorker();
      workers.push(worker);
      return worker;
    },
    { silence, stop: stopPatience },
  );
});

afterEach(() => {
  vi.useRealTimers();
});

const refused: Reply = { kind: 'read', job: 1, sha256: '', outcome: { ok: false, refusals: [] } };

test('answers find their questions, in whatever order they come', async () => {
  const first = client.read(new Uint8Array(), 'a');
  const second = client.read(new Uint8Array(), 'b');
  workers[0].say({ ...refused, job: 2, sha256: 'second' });
  workers[0].say({ ...refused, job: 1, sha256: 'first' });
  expect(await first).toMatchObject({ sha256: 'first' });
  expect(await second).toMatchObject({ sha256: 'second' });
});

test('progress is passed on, and a stop is asked for only while there is work', async () => {
  const seen: string[] = [];
  const { answer, stop } = client.analyse(runNamed('a'), { sheet: 1 }, ({ doing }) => seen.push(doing));
  workers[0].say({ kind: 'progress', job: 1, progress: { doing: 'fitting', share: null } });
  stop();
  workers[0].say({ kind: 'stopped', job: 1 });
  expect(await answer).toEqual({ kind: 'stopped', job: 1 });
  stop();
  expect(seen).toEqual(['fitting']);
  expect(workers[0].requests.map(({ kind }) => kind)).toEqual(['analyse', 'stop']);
});

test('a silent worker is ended, its questions are answered so, and the next one gets a new worker', async () => {
  const lost = client.read(new Uint8Array(), 'a');
  await vi.advanceTimersByTimeAsync(silence + 1);
  expect(await lost).toMatchObject({ kind: 'broken' });
  expect(workers[0].isEnded).toBe(true);
  const next = client.read(new Uint8Array(), 'b');
  workers[1].say({ ...refused, job: 2 });
  expect(await next).toMatchObject({ kind: 'read' });
});

test('signs of life keep a worker, and an idle one is left in peace', async () => {
  const { answer } = client.analyse(runNamed('a'), { sheet: 1 }, () => {});
  for (let step = 0; step < 5; step++) {
    await vi.advanceTimersByTimeAsync(0.8 * silence);
    workers[0].say({ kind: 'progress', job: 1, progress: { doing: 'fitting', share: step / 5 } });
  }
  workers[0].say({ kind: 'stopped', job: 1 });
  await answer;
  await vi.advanceTimersByTimeAsync(10 * silence);
  expect(workers[0].isEnded).toBe(false);
});

test('a worker that fails to start is told', async () => {
  const lost = client.read(new Uint8Array(), 'a');
  workers[0].onerror?.({ message: 'refused by the browser' });
  expect(await lost).toEqual({ kind: 'broken', job: 1, message: 'refused by the browser' });
});

test('work that does not stop is ended with its worker, and what else is wanted is asked again', async () => {
  const { answer, stop } = client.analyse(runNamed('a'), { sheet: 1 }, () => {});
  const other = client.read(new Uint8Array([7]), 'b');
  stop();
  await vi.advanceTimersByTimeAsync(stopPatience + 1);
  expect(await answer).toEqual({ kind: 'stopped', job: 1 });
  expect(workers[0].isEnded).toBe(true);
  expect(workers[1].requests).toEqual([{ kind: 'read', job: 2, name: 'b', bytes: new Uint8Array([7]) }]);
  workers[1].say({ ...refused, job: 2 });
  expect(await other).toMatchObject({ kind: 'read' });
});

test('work that stops in time keeps its worker', async () => {
  const { answer, stop } = client.analyse(runNamed('a'), { sheet: 1 }, () => {});
  stop();
  workers[0].say({ kind: 'stopped', job: 1 });
  await answer;
  await vi.advanceTimersByTimeAsync(2 * stopPatience);
  expect(workers[0].isEnded).toBe(false);
});
