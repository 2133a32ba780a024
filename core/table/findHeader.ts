import { readUnit } from '../units/readUnit.ts';
import type { LineFacts } from './lineFacts.ts';
import { isMissingMark } from './missingMarks.ts';
import type { Delimiter } from './splitCells.ts';

/** What was found above the first full row of a table; lines are indices, counted from 0. */
export interface HeaderFound {
  readonly headerLine?: number;
  readonly unitsLine?: number;
  readonly captionsLine?: number;
  readonly names: readonly string[];
  readonly units: readonly string[];
  readonly captions: readonly string[];
  /** Lines between header and first full row that are rows with something missing or wrong. */
  readonly rows: readonly number[];
}

/** Text lines that may stand between a header and its rows, such as "Start of titration". */
const TEXT_LINES_PASSED = 3;

const OTHER_DELIMITERS: readonly RegExp[] = [/\t/, /;/, /\|/, / {2,}/, /,/];

/**
 * Looks upwards from the first full row of a table, over the lines `above`
 * (indices in order), for its header, the row of units under it and the
 * captions over it.
 */
export function findHeader(
  lines: readonly string[],
  facts: LineFacts,
  above: readonly number[],
  width: number,
  delimiter: Delimiter,
): HeaderFound {
  let unitsLine: number | undefined;
  let passed = 0;
  const partial: number[] = [];
  for (let at = above.length - 1; at >= 0 && passed <= TEXT_LINES_PASSED; at--) {
    const line = above[at];
    const kind = facts.kinds[line];
    if (kind === 'blank' || kind === 'rule') continue;
    if (kind === 'cells' && facts.numbers[line] + facts.texts[line] === 0) {
      partial.push(line);
      continue;
    }
    if (unitsLine === undefined && facts.widths[line] <= width && isUnitsRow(facts.cells[line])) {
      unitsLine = line;
      continue;
    }
    const names = headerNames(lines[line], facts, line, width, delimiter);
    if (names !== undefined) {
      const captionsLine = captionsAbove(facts, above, at, width);
      return {
        headerLine: line,
        ...(unitsLine === undefined ? {} : { unitsLine }),
        ...(captionsLine === undefined ? {} : { captionsLine }),
        names,
        units: unitsLine === undefined ? [] : facts.cells[unitsLine].map((cell) => cell.trim()),
        captions: captionsLine === undefined ? [] : spread(facts.cells[captionsLine]),
        rows: partial.reverse(),
      };
    }
    if (kind === 'cells' && facts.numbers[line] > 0 && facts.widths[line] <= width) partial.push(line);
    else passed += 1;
  }
  if (unitsLine !== undefined) {
    const units = facts.cells[unitsLine].map((cell) => cell.trim());
    return {
      headerLine: unitsLine,
      names: units,
      units,
      captions: [],
      rows: partial.filter((line) => line > unitsLine).reverse(),
    };
  }
  return { names: [], units: [], captions: [], rows: leadingRows(facts, above) };
}

/** Without a header only rows that touch the table and hold no text belong to it. */
export function leadingRows(facts: LineFacts, above: readonly number[]): number[] {
  const rows: number[] = [];
  for (let at = above.length - 1; at >= 0; at--) {
    const line = above[at];
    if (facts.kinds[line] !== 'cells' || facts.texts[line] > 0) break;
    rows.push(line);
  }
  return rows.reverse();
}

export function isUnitsRow(cells: readonly string[]): boolean {
  const filled = cells.map((cell) => cell.trim()).filter((cell) => cell !== '');
  const units = filled.map(readUnit);
  // "V" and "pH" alone are the names of columns.
  if (!units.some((unit) => unit !== undefined && unit !== 'V' && unit !== 'pH')) return false;
  return filled.every(
    (cell, at) =>
      units[at] !== undefined || isMissingMark(cell) || /^\W?K\W?$/.test(cell) || /^[[(]\W*1?[\])]$/.test(cell),
  );
}

/** The cells of a line as column names, if it can be a header of `width` columns. */
function headerNames(
  text: string,
  facts: LineFacts,
  line: number,
  width: number,
  delimiter: Delimiter,
): readonly string[] | undefined {
  if (facts.kinds[line] === 'comment') {
    const bare = text.replace(/^\s*#+\s*/, '');
    return splitOtherwise(bare, width, true);
  }
  if (facts.numbers[line] > 0) return undefined;
  const cells = facts.cells[line].map((cell) => cell.trim());
  const filled = cells.filter((cell) => cell !== '').length;
  if (delimiter === 'spaces') return splitOtherwise(text.trim(), width, true) ?? joinUnits(cells, width);
  if (facts.texts[line] >= 2 && Math.abs(facts.widths[line] - width) <= 1 && filled >= width - 1) return cells;
  return filled === 1 ? splitOtherwise(text.trim(), width, false) : undefined;
}

/** Headers are now and then parted by another mark than the rows; only an exact fit counts, and figures never do. */
function splitOtherwise(text: string, width: number, atBlanks: boolean): readonly string[] | undefined {
  for (const delimiter of atBlanks ? [...OTHER_DELIMITERS, / +/] : OTHER_DELIMITERS) {
    const cells = text.split(delimiter).map((cell) => cell.trim());
    if (cells.length !== width || width < 2) continue;
    if (cells.every((cell) => /\p{L}/u.test(cell) && !/^[-+\d]/.test(cell) && cell.length <= 40)) return cells;
  }
  return undefined;
}

/** Blanks inside "V (mL)" do not part columns: units go to the word before them. */
function joinUnits(cells: readonly string[], width: number): readonly string[] | undefined {
  const names: string[] = [];
  for (const cell of cells) {
    if (names.length > 0 && (/^[([/]/.test(cell) || readUnit(cell) === 'mL')) names[names.length - 1] += ` ${cell}`;
    else names.push(cell);
  }
  return names.length === width && width >= 2 ? names : undefined;
}

function captionsAbove(
  facts: LineFacts,
  above: readonly number[],
  headerAt: number,
  width: number,
): number | undefined {
  const line = above[headerAt - 1];
  if (line === undefined || facts.kinds[line] !== 'cells' || facts.numbers[line] > 0) return undefined;
  // Tables side by side: a caption over the first column of each, nothing over the others.
  const filled = facts.cells[line].filter((cell) => cell.trim() !== '').length;
  return filled >= 2 && filled < width && facts.widths[line] <= width && facts.widths[line] > filled ? line : undefined;
}

export function spread(cells: readonly string[]): string[] {
  let last = '';
  return cells.map((cell) => {
    last = cell.trim() === '' ? last : cell.trim();
    return last;
  });
}
