import type { Place } from './place.ts';

/**
 * Codes of refusals: input from which nothing could be made. They are stable:
 * scripts may test them. Codes of the same area share a prefix.
 */
export type RefusalCode =
  // files and tables
  | 'file-empty'
  | 'file-not-text'
  | 'file-too-large'
  | 'file-unreadable'
  | 'table-no-columns'
  | 'table-delimiter-unclear'
  | 'row-wrong-width'
  | 'row-outside-run'
  | 'cell-not-a-number'
  | 'cell-missing'
  // sheets
  | 'sheet-not-json'
  | 'sheet-version'
  | 'sheet-unknown-key'
  | 'sheet-wrong-type'
  | 'sheet-out-of-range'
  | 'sheet-inconsistent'
  // problems
  | 'problem-too-large';

/** Input that could not be used: what stood where, and how to mend it. */
export interface Refusal {
  readonly code: RefusalCode;
  /** What was found and why it cannot be used; one or two plain sentences. */
  readonly message: string;
  /** What the user can do about it. */
  readonly remedy: string;
  readonly place: Place;
}
