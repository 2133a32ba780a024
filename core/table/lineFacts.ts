import type { Dialect } from './dialect.ts';
import { effectiveWidth } from './effectiveWidth.ts';
import { parseNumber } from './parseNumber.ts';

/** What a line is by itself, before its neighbours are looked at. */
export type LineKind = 'blank' | 'comment' | 'rule' | 'cells';

/** What the lines of a file hold; every array has one entry per line. */
export interface LineFacts {
  readonly cells: readonly (readonly string[])[];
  readonly kinds: readonly LineKind[];
  /** Number of cells up to the last filled one. */
  readonly widths: Int32Array;
  /** Number of cells that are numbers. */
  readonly numbers: Int32Array;
  /** Number of cells that are neither numbers nor marks for "no value". */
  readonly texts: Int32Array;
}

/** Longer lines are shown as text and not taken apart. */
const LONGEST_ROW = 20_000;

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
  const numbers = new Int32Array(lines.length);
  const texts = new Int32Array(lines.length);
  for (let index = 0; index < lines.length; index++) {
    const kind = kindOf(lines[index], cells[index]);
    kinds[index] = kind;
    if (kind !== 'cells') continue;
    const row = cells[index];
    const width = effectiveWidth(row);
    widths[index] = width;
    for (let column = 0; column < width; column++) {
      const value = parseNumber(row[column], dialect.marks);
      if (typeof value === 'number') numbers[index] += 1;
      else if (value === 'text') texts[index] += 1;
    }
  }
  return { cells, kinds, widths, numbers, texts };
}

function kindOf(line: string, cells: readonly string[]): LineKind {
  if (effectiveWidth(cells) === 0) return 'blank';
  if (line.length > LONGEST_ROW || COMMENT.test(line)) return 'comment';
  // Only a line that begins without a figure or letter can be a rule; this spares the rows the pattern.
  const first = line.charCodeAt(0);
  if ((first < 0x30 || first > 0x39) && RULE.test(line)) return 'rule';
  return 'cells';
}
