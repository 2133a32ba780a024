import type { TextEncodingName } from '../table/decodeText.ts';
import type { NumberMarks } from '../table/numberMarks.ts';
import type { Delimiter } from '../table/splitCells.ts';
import type { TableOverrules } from '../table/tableOverrules.ts';
import type { ExportUnit } from '../units/readUnit.ts';

/** What a column is used for. */
export type ColumnUse = 'volume' | 'increment' | 'pH' | 'mV' | 'temperature' | 'time' | 'sample' | 'ignored';

/**
 * What the figures of the volume column are: the sum added so far, single
 * additions, or the scale of a burette that goes up from where it stood, or down.
 */
export type VolumeMeaning = 'cumulative' | 'increments' | 'burette' | 'countingDown';

/** What parts the rows of the file into runs. */
export type RunSplit = 'none' | 'sampleColumn' | 'restart' | 'blocks' | 'sideBySide';

export interface ColumnSetting {
  readonly role: ColumnUse;
  /** Null where the column needs none. */
  readonly unit: ExportUnit | null;
}

/** How a file is read; plain data. */
export interface ReadingChoices {
  readonly encoding: TextEncodingName;
  readonly delimiter: Delimiter;
  readonly decimal: NumberMarks['decimal'];
  readonly thousands: NumberMarks['thousands'];
  /** Lines of captions, header and units of the main table, counted from 1; empty where it has none. */
  readonly headerLines: readonly number[];
  /** One entry per column of the main table, the one with most rows. */
  readonly columns: readonly ColumnSetting[];
  readonly volumeMeaning: VolumeMeaning;
  readonly runSplit: RunSplit;
}

/**
 * What a person has decided about reading a file; the rest is decided by the
 * file. `columns` goes by the number of the column, counted from 0, and holds
 * only what was decided. Part of `ReadingChoices` can stand in its place.
 */
export interface ReadingOverrules extends TableOverrules {
  readonly columns?: Readonly<Record<number, Partial<ColumnSetting>>>;
  readonly volumeMeaning?: VolumeMeaning;
  readonly runSplit?: RunSplit;
}
