import { createStore } from 'zustand/vanilla';
import type { BootstrapSummary, RunResult } from '../../core/index.ts';

/** A check of one result by simulation, as far as it has come. */
export type BootstrapCheck = {
  /** The result that is checked; under any other this is not shown. */
  readonly of: RunResult;
  /** Repetitions asked for. */
  readonly count: number;
  readonly seed: number;
} & (
  | { readonly state: 'repeating'; readonly done: number; readonly stop: () => void }
  | { readonly state: 'stopped'; readonly done: number }
  | {
      readonly state: 'done';
      /** Empty where fewer than two repetitions could be fitted. */
      readonly summaries: readonly BootstrapSummary[];
      /** Repetitions that could not be fitted. */
      readonly failed: number;
    }
  /** A mistake of the program, not of the person. */
  | { readonly state: 'broken'; readonly message: string }
);

export interface BootstrapState {
  /** Null until one is asked for, and again when inputs change. */
  readonly check: BootstrapCheck | null;
}

/** The simulation that checks the result on the page; it goes when that result goes. */
export const bootstrapStore = createStore<BootstrapState>(() => ({ check: null }));
