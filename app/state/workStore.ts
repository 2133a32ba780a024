import { createStore } from 'zustand/vanilla';
import type { Progress, Refusal, RunResult } from '../../core/index.ts';
import type { RunInput } from './inputs.ts';

/** What is being done for the run that is shown. */
export type Work =
  | { readonly state: 'idle' }
  | { readonly state: 'working'; readonly progress: Progress }
  | { readonly state: 'stopped' }
  /** The conditions contradict each other, or the problem is too large. */
  | { readonly state: 'refused'; readonly refusals: readonly Refusal[] }
  /** A mistake of the program, not of the person. */
  | { readonly state: 'broken'; readonly message: string };

export interface WorkState {
  readonly work: Work;
  /** The latest result of the run that is shown, and the input it belongs to; what lies between is being computed. */
  readonly latest: { readonly input: RunInput; readonly result: RunResult } | null;
  /** Files or sheets that were not accepted, with what was tried. */
  readonly notAccepted: { readonly what: string; readonly refusals: readonly Refusal[] } | null;
  /** Names of files being read. */
  readonly reading: readonly string[];
}

/** Everything that follows from the inputs, or passes. Nothing here is undone or kept. */
export const workStore = createStore<WorkState>(() => ({
  work: { state: 'idle' },
  latest: null,
  notAccepted: null,
  reading: [],
}));
