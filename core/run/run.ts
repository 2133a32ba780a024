import type { Doubt } from '../notice/doubt.ts';
import type { Refusal } from '../notice/refusal.ts';
import type { RowProposal } from './rowProposal.ts';

/** What the sensor column holds: pH as the meter shows it, or millivolts. */
export type ReadingKind = 'pH' | 'mV';

/** Whether a row takes part in the fit. */
export type RowDecision =
  | {
      readonly use: 'used';
      /** Given where a person took the row back, with the reason. */
      readonly by?: 'person';
      readonly why?: string;
    }
  | { readonly use: 'excluded'; readonly by: 'rule' | 'person'; readonly why: string };

/** One row of a run; rows keep the order of the file. */
export interface RunRow {
  /** Line of the source file, counted from 1. */
  readonly line: number;
  /** Titrant volume added so far as the burette showed it, mL. */
  readonly volume_mL: number;
  /** Reading in the unit of the run: pH, or mV. */
  readonly reading: number;
  /** Temperature at this point where the file gives one, °C. */
  readonly temperature_C?: number;
  /** Time of this point in seconds, from whatever the file counts from. */
  readonly time_s?: number;
  readonly decision: RowDecision;
}

/**
 * One titration, from one file or from part of one. Every data row of the
 * source is in `rows` or in `notAccepted`; none disappears.
 */
export interface Run {
  /** Label of the run: the file name, with the sample label where a file holds several. */
  readonly name: string;
  readonly file: string;
  readonly readingKind: ReadingKind;
  readonly rows: readonly RunRow[];
  /** One refusal per row that could not be used, with its line and column. */
  readonly notAccepted: readonly Refusal[];
  readonly doubts: readonly Doubt[];
  /** Rows that look wrong, for the chemist to decide about; left out where nobody has looked. */
  readonly proposals?: readonly RowProposal[];
}
