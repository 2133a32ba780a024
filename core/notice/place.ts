/**
 * Where a notice points: a cell of a file, a key of a sheet, a stretch of the
 * run or a quantity. Every part is optional; what is known is given.
 */
export interface Place {
  /** File name as the user gave it. */
  readonly file?: string;
  /** Line of the source file, counted from 1. */
  readonly line?: number;
  /** Column of the table (cell number in its line), counted from 1. */
  readonly column?: number;
  /** Key path inside a sheet, such as "sample.analytes.0.pKa.1". */
  readonly key?: string;
  /** Id of a quantity, such as "pKa1". */
  readonly quantity?: string;
  /** Volume of titrant in mL at which to look on the figure. */
  readonly volume_mL?: number;
}
