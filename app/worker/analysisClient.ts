import type { Progress, Run, SheetFile } from '../../core/index.ts';
import { longestSilence } from './longestSilence.ts';
import type { Reply, Request } from './messages.ts';

/** The part of a Worker that is used here. */
export interface WorkerLike {
  postMessage(request: Request): void;
  terminate(): void;
  onmessage: ((event: { readonly data: Reply }) => void) | null;
  onerror: ((event: { readonly message?: string }) => void) | null;
}

export type ReadReply = Exclude<Reply, { kind: 'progress' | 'analysed' | 'repeated' }>;
export type AnalysisReply = Exclude<Reply, { kind: 'progress' | 'read' | 'repeated' }>;

interface Job {
  readonly request: Request;
  readonly settle: (reply: Reply) => void;
  readonly report: (progress: Progress) => void;
}

/** How long the worker may take, in milliseconds. */
export interface Patience {
  /** Between two signs of life; only an endless loop or a lost worker takes longer. */
  readonly silence: number;
  /** To end work that it was told to stop; a worker in the middle of a long step is ended instead. */
  readonly stop: number;
}

const usualPatience: Patience = { silence: longestSilence, stop: 400 };

/**
 * The page's side of the worker: one worker, started when first needed, ended and started anew where it stays silent.
 * Every promise settles; none rejects.
 */
export class AnalysisClient {
  private readonly start: () => WorkerLike;
  private readonly patience: Patience;
  private worker: WorkerLike | null = null;
  private jobs = new Map<number, Job>();
  private lastJob = 0;
  private watchdog: ReturnType<typeof setTimeout> | undefined;

  constructor(start: () => WorkerLike, patience = usualPatience) {
    this.start = start;
    this.patience = patience;
  }

  /** Reads a file into runs. */
  read(bytes: Uint8Array, name: string): Promise<ReadReply> {
    return this.ask((job) => ({ kind: 'read', job, name, bytes }), ignore).answer as Promise<ReadReply>;
  }

  /** Works a run up; `stop` ends it at its next pause, or with its worker where that is long in coming. */
  analyse(
    run: Run,
    sheet: SheetFile,
    report: (progress: Progress) => void,
  ): { readonly answer: Promise<AnalysisReply>; readonly stop: () => void } {
    const { job, answer } = this.ask((number) => ({ kind: 'analyse', job: number, run, sheet }), report);
    const stop = () => {
      if (!this.jobs.has(job)) return;
      this.worker?.postMessage({ kind: 'stop', job });
      setTimeout(() => this.stopWithWorker(job), this.patience.stop);
    };
    return { answer: answer as Promise<AnalysisReply>, stop };
  }

  private ask(request: (job: number) => Request, report: (progress: Progress) => void) {
    const job = ++this.lastJob;
    const asked = request(job);
    const answer = new Promise<Reply>((settle) => this.jobs.set(job, { request: asked, settle, report }));
    this.worker ??= this.connect();
    this.worker.postMessage(asked);
    this.watch();
    return { job, answer };
  }

  private connect(): WorkerLike {
    const worker = this.start();
    worker.onmessage = ({ data }) => this.take(data);
    worker.onerror = ({ message }) => this.giveUp(message ?? 'The calculation could not be started.');
    return worker;
  }

  private take(reply: Reply): void {
    const job = this.jobs.get(reply.job);
    if (reply.kind === 'progress') job?.report(reply.progress);
    else {
      this.jobs.delete(reply.job);
      job?.settle(reply);
    }
    this.watch();
  }

  /** Starts waiting anew for a sign of life, while anything is awaited. */
  private watch(): void {
    clearTimeout(this.watchdog);
    if (this.jobs.size === 0) return;
    this.watchdog = setTimeout(() => {
      this.giveUp(`The calculation gave no sign of life for ${this.patience.silence / 1000} s and was ended.`);
    }, this.patience.silence);
  }

  /** Ends the worker over a job that does not stop, and asks a new one for all that is still wanted. */
  private stopWithWorker(job: number): void {
    const stopped = this.jobs.get(job);
    if (stopped === undefined) return;
    this.jobs.delete(job);
    this.worker?.terminate();
    this.worker = this.jobs.size === 0 ? null : this.connect();
    for (const { request } of this.jobs.values()) this.worker?.postMessage(request);
    this.watch();
    stopped.settle({ kind: 'stopped', job });
  }

  private giveUp(message: string): void {
    clearTimeout(this.watchdog);
    this.worker?.terminate();
    this.worker = null;
    const lost = this.jobs;
    this.jobs = new Map();
    for (const [job, { settle }] of lost) settle({ kind: 'broken', job, message });
  }
}

function ignore(): void {}
