import type { Outcome, Progress, Run, RunResult, SheetFile } from '../../core/index.ts';

/** What the page asks of the worker. `job` ties every answer to its question. */
export type Request =
  | { readonly kind: 'read'; readonly job: number; readonly name: string; readonly bytes: Uint8Array }
  | { readonly kind: 'analyse'; readonly job: number; readonly run: Run; readonly sheet: SheetFile }
  | { readonly kind: 'stop'; readonly job: number };

/** What the worker says. Every job ends with exactly one of the last four. */
export type Reply =
  | { readonly kind: 'progress'; readonly job: number; readonly progress: Progress }
  | { readonly kind: 'read'; readonly job: number; readonly sha256: string; readonly outcome: Outcome<readonly Run[]> }
  | { readonly kind: 'analysed'; readonly job: number; readonly outcome: Outcome<RunResult> }
  | { readonly kind: 'stopped'; readonly job: number }
  | { readonly kind: 'broken'; readonly job: number; readonly message: string };
