import type { Dialect } from './dialect.ts';
import { effectiveWidth } from './effectiveWidth.ts';
import { longestRow } from './longestRow.ts';
import { parseNumber } from './parseNumber.ts';

/** What a line is by itself, before its neighbours are looked at. */
export type LineKind = 'blank' | 'comment' | 'rule' | 'cells';

/** What the lines of a file hold; every array has one entry per line. */
export interface LineFacts {
  readonly cells: readonly (readonly string[])[];
  readonly kinds: readonly LineKind[];
  /** Number of cells up to the last filled one. */
  readonly widths: Int32Array;
  /** Values of all cells, line after line; NaN where a cell is no number. */
  readonly values: Float64Array;
  /** Where the values of a line begin; there are as many as its width. */
  readonly valuesFrom: Int32Array;
  /** Number of cells that are numbers. */
  readonly numbers: Int32Array;
  /** Number of cells that are neither numbers nor marks for "no value". */
  readonly texts: Int32Array;
}

/** "# remark", but not the overflow mark "####" nor a spreadsheet's "#N/A". */
const COMMENT = /^\s*#(?!#|N\/?A\b|NV\b|[A-Z]+(?:\/0)?[!?])/i;

/** A line drawn under a header with dashes, bars and the like. */
const RULE = /^(?=.*(?:[-=_*~]{3}|[─━═]{2}))[\s|+:=_*~─━═┼╪-]{3,}$/;

/** Looks at every line once. */
export function lineFacts(
  lines: readonly string[],
  cells: readonly (readonly string[])[],
  dialect: Dialect,
): LineFacts {
  const kinds: LineKind[] = new Array(lines.length);
  const widths = new Int32Array(lines.length);
  const valuesFrom = new Int32Array(lines.length);
  const values = new Float64Array(cells.reduce((sum, row) => sum + row.length, 0)).fill(Number.NaN);
  const numbers = new Int32Array(lines.length);
  const texts = new Int32Array(lines.length);
  let next = 0;
  for (let index = 0; index < lines.length; index++) {
    const kind = kindOf(lines[index], cells[index]);
    kinds[index] = kind;
    if (kind !== 'cells') continue;
    const row = cells[index];
    const width = effectiveWidth(row);
    widths[index] = width;
    valuesFrom[index] = next;
    for (let column = 0; column < width; column++) {
      const value = parseNumber(row[column], dialect.marks);
      if (typeof value === 'number') {
        values[next + column] = value;
        numbers[index] += 1;
      } else if (value === 'text') texts[index] += 1;
    }
    next += width;
  }
  return { cells, kinds, widths, values, valuesFrom, numbers, texts };
}

function kindOf(line: string, cells: readonly string[]): LineKind {
  if (line.length > longestRow) return 'comment';
  // Nearly every line is a row and begins with a figure; none of the patterns below does.
  const first = line.charCodeAt(0);
  if (first >= 0x30 && first <= 0x39 && cells.length > 0) return 'cells';
  if (effectiveWidth(cells) === 0) return 'blank';
  if (COMMENT.test(line)) return 'comment';
  if (RULE.test(line)) return 'rule';
  return 'cells';
}
