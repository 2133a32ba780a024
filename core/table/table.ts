import type { Doubt } from '../notice/doubt.ts';
import type { TextEncodingName } from './decodeText.ts';
import type { Dialect } from './dialect.ts';

/** A line of the file that is no row of a table: a title, a comment, a setting, a remark. */
export interface TextLine {
  /** Line of the source file, counted from 1. */
  readonly line: number;
  readonly text: string;
  /** Where the line reads as "key: value" (or key and value in cells): what it is about … */
  readonly key?: string;
  /** … and what it says, as written. */
  readonly value?: string;
}

/** One data row, cells as written. */
export interface TableRow {
  /** Line of the source file, counted from 1. */
  readonly line: number;
  /** Cells in order; a row may have fewer or more than its table has columns. */
  readonly cells: readonly string[];
}

/** One table of the file: rows of the same columns, with what stands above them. */
export interface TableSection {
  /** Number of columns that the rows and the header agree on. */
  readonly width: number;
  /** Line of the header; undefined where the table has none. */
  readonly headerLine?: number;
  /** All lines taken up by captions, header and units row, in order. */
  readonly headerLines: readonly number[];
  /** Their cells as written, in the same order. */
  readonly headerCells: readonly (readonly string[])[];
  /** Header of each column, '' where there is none. */
  readonly names: readonly string[];
  /** Unit of each column from a row under the header, as written; '' where there is none. */
  readonly units: readonly string[];
  /** What stands above the header of each column, for tables side by side; '' where nothing does. */
  readonly captions: readonly string[];
  readonly rows: readonly TableRow[];
  /** Per column the number in each row, NaN where the cell is none; to be looked up, never shown. */
  readonly values: readonly Float64Array[];
}

/** A text file as it was understood: every line is blank, a text line, a header line or a data row. */
export interface Table {
  readonly file: string;
  readonly encoding: TextEncodingName;
  /** Whether the encoding was told by the look of the bytes alone. */
  readonly encodingGuessed: boolean;
  readonly dialect: Dialect;
  readonly lineCount: number;
  /** Text lines above the first table. */
  readonly preamble: readonly TextLine[];
  /** At least one, in the order of the file. */
  readonly sections: readonly TableSection[];
  /** Text lines below the first row of the first table: between tables, between rows and after. */
  readonly remarks: readonly TextLine[];
  readonly doubts: readonly Doubt[];
}
