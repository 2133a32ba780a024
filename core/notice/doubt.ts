import type { Place } from './place.ts';

/** Codes of doubts. They are stable: scripts may test them. */
export type DoubtCode =
  // rows and columns of the file
  | 'rows-not-accepted'
  | 'volume-steps-back'
  | 'volume-beyond-range'
  | 'reading-beyond-range'
  | 'column-guessed'
  | 'unit-guessed'
  | 'run-split-guessed'
  | 'volume-meaning-guessed'
  | 'dose-missing'
  | 'delimiter-guessed'
  // the fit
  | 'too-few-points'
  | 'beyond-reach'
  | 'unidentifiable'
  | 'volumes-disagree'
  | 'residuals-wander'
  | 'noise-far-above-usual'
  | 'rests-on-assumption'
  | 'declaration-contradicted'
  | 'readings-drifting'
  | 'activity-out-of-range'
  | 'temperature-out-of-range'
  | 'starts-disagree'
  | 'concentration-of-nothing'
  | 'pKa-overlap'
  | 'poorly-determined'
  | 'few-points-at-pKa'
  | 'no-visible-step'
  | 'intervals-disagree'
  | 'residuals-not-normal'
  | 'points-distrusted'
  | 'declared-noise-too-small'
  | 'carbonate-likely'
  | 'electrode-likely-off'
  | 'alkaline-end-low'
  | 'sensor-stuck'
  | 'solid-likely'
  | 'reading-kind-contradicted';

/** Anything that should lower trust in a result. */
export interface Doubt {
  readonly code: DoubtCode;
  /** What was seen, with the figures. */
  readonly seen: string;
  /** What it means for the results. */
  readonly means: string;
  /** What to do about it. */
  readonly remedy: string;
  readonly place: Place;
}
