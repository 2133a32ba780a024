import type {
  BootstrapReplicates,
  BootstrapShare,
  Outcome,
  Progress,
  RepeatableResult,
  Run,
  RunResult,
  SheetFile,
} from '../../core/index.ts';

/** What the page asks of the worker. `job` ties every answer to its question. */
export type Request =
  | { readonly kind: 'read'; readonly job: number; readonly name: string; readonly bytes: Uint8Array }
  | { readonly kind: 'analyse'; readonly job: number; readonly run: Run; readonly sheet: SheetFile }
  | { readonly kind: 'repeat'; readonly job: number; readonly result: RepeatableResult; readonly share: BootstrapShare }
  | { readonly kind: 'stop'; readonly job: number };

/** What the worker says. Every job ends with exactly one reply that is not its progress. */
export type Reply =
  | { readonly kind: 'progress'; readonly job: number; readonly progress: Progress }
  | { readonly kind: 'read'; readonly job: number; readonly sha256: string; readonly outcome: Outcome<readonly Run[]> }
  | { readonly kind: 'analysed'; readonly job: number; readonly outcome: Outcome<RunResult> }
  | { readonly kind: 'repeated'; readonly job: number; readonly repeated: BootstrapReplicates }
  | { readonly kind: 'stopped'; readonly job: number }
  | { readonly kind: 'broken'; readonly job: number; readonly message: string };
