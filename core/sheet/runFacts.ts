import type { ReadingKind } from '../run/run.ts';

/** What the run itself says that a sheet may leave out. */
export interface RunFacts {
  readonly readingKind: ReadingKind;
  /** Whether the pH rises (a base is added) or falls. */
  readonly titrantKind: 'base' | 'acid';
  /** Number of groups for an analyte whose sheet leaves both groups and constants open; 0 leaves it out. */
  readonly groupsIfOpen: number;
}
