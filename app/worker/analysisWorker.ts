import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex } from '@noble/hashes/utils.js';
import { analyseRun, bootstrapRun, type Progress, readRuns } from '../../core/index.ts';
import { driveGenerator } from './driveGenerator.ts';
import type { Reply, Request } from './messages.ts';

/** The worker: everything that reads or computes happens here, away from the page. */

// The page is compiled with the types of documents; this file alone runs in a worker.
const scope = self as unknown as {
  onmessage: ((event: MessageEvent<Request>) => void) | null;
  postMessage(reply: Reply): void;
};

const stopped = new Set<number>();
const running = new Set<number>();

// A channel to itself returns to the event loop without the delay that timers have.
const channel = new MessageChannel();
const waiting: (() => void)[] = [];
channel.port1.onmessage = () => waiting.shift()?.();
const pause = () =>
  new Promise<void>((resume) => {
    waiting.push(resume);
    channel.port2.postMessage(null);
  });

scope.onmessage = ({ data }) => {
  if (data.kind === 'stop') {
    if (running.has(data.job)) stopped.add(data.job);
    return;
  }
  running.add(data.job);
  answer(data)
    .catch((error: unknown): Reply => {
      const message = error instanceof Error ? `${error.name}: ${error.message}` : String(error);
      return { kind: 'broken', job: data.job, message };
    })
    .then((reply) => {
      running.delete(data.job);
      stopped.delete(data.job);
      scope.postMessage(reply);
    });
};

async function answer(request: Exclude<Request, { kind: 'stop' }>): Promise<Reply> {
  const { job } = request;
  if (request.kind === 'read') {
    const outcome = readRuns(request.bytes, request.name);
    return { kind: 'read', job, sha256: bytesToHex(sha256(request.bytes)), outcome };
  }
  const hooks = {
    now: () => performance.now(),
    pause,
    isStopped: () => stopped.has(job),
    report: (progress: Progress) => scope.postMessage({ kind: 'progress', job, progress }),
  };
  if (request.kind === 'repeat') {
    const ended = await driveGenerator(bootstrapRun(request.result, request.share), hooks);
    return ended === null ? { kind: 'stopped', job } : { kind: 'repeated', job, repeated: ended.value };
  }
  const ended = await driveGenerator(analyseRun(request.run, request.sheet), hooks);
  return ended === null ? { kind: 'stopped', job } : { kind: 'analysed', job, outcome: ended.value };
}
