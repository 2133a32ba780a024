import type { Outcome } from '../notice/outcome.ts';
import type { Refusal } from '../notice/refusal.ts';
import { decodeText } from './decodeText.ts';
import { chooseDialect } from './dialect.ts';
import type { HeaderFound } from './findHeader.ts';
import { findSections, type SectionFound } from './findSections.ts';
import { type LineFacts, lineFacts } from './lineFacts.ts';
import { longestRow } from './longestRow.ts';
import { splitCells } from './splitCells.ts';
import type { Table, TableSection, TextLine } from './table.ts';
import type { TableOverrules } from './tableOverrules.ts';

/** Longer lines are cut where they are kept as text: nobody reads on, and pages slow down over them. */
const LONGEST_TEXT = 1000;

/**
 * Bytes to tables: encoding, delimiter and number marks from the whole file,
 * then the tables in it with their headers, and every other line as text.
 *
 * What a person has decided in `overrules` is taken as it is. Refuses with the
 * codes of `decodeText` and `chooseDialect`.
 */
export function readTable(bytes: Uint8Array, fileName: string, overrules: TableOverrules = {}): Outcome<Table> {
  const decoded = decodeText(bytes, overrules.encoding);
  if (!decoded.ok) return { ok: false, refusals: decoded.refusals.map((refusal) => inFile(refusal, fileName)) };
  const lines = decoded.value.text.split('\n');
  // The end of the last line is not one line more.
  if (lines[lines.length - 1] === '') lines.pop();

  const choice = chooseDialect(lines, fileName, overrules);
  if (!choice.ok) return choice;
  const { dialect, doubts } = choice.value;
  const short = lines.map((line) => (line.length > longestRow ? '' : line));
  const facts = lineFacts(lines, splitCells(short, dialect.delimiter), dialect);
  const found = findSections(lines, facts, dialect.delimiter, headerIndices(overrules.headerLines, lines.length));
  if (found.length === 0) {
    const message = 'The file holds text with figures in it, but no rows of numbers.';
    const remedy = 'Export the volume and the reading (pH or mV) of each point side by side on one line.';
    return { ok: false, refusals: [{ code: 'table-no-columns', message, remedy, place: { file: fileName } }] };
  }
  const text = textLines(lines, facts, found);
  const firstLine = found[0].rows[0] + 1;
  return {
    ok: true,
    value: {
      file: fileName,
      encoding: decoded.value.encoding,
      encodingGuessed: decoded.value.guessed,
      dialect,
      lineCount: lines.length,
      preamble: text.filter(({ line }) => line < firstLine),
      sections: found.map((section) => toSection(section, facts)),
      remarks: text.filter(({ line }) => line > firstLine),
      doubts,
    },
  };
}

function headerIndices(headerLines: readonly number[] | undefined, lineCount: number): number[] | undefined {
  return headerLines
    ?.map((line) => line - 1)
    .filter((line) => Number.isInteger(line) && line >= 0 && line < lineCount)
    .sort((a, b) => a - b);
}

function inFile(refusal: Refusal, fileName: string): Refusal {
  return { ...refusal, place: { ...refusal.place, file: fileName } };
}

function toSection({ header, rows, width }: SectionFound, facts: LineFacts): TableSection {
  const fill = (cells: readonly string[]): string[] =>
    Array.from({ length: width }, (_, column) => cells[column] ?? '');
  return {
    width,
    ...(header.headerLine === undefined ? {} : { headerLine: header.headerLine + 1 }),
    headerLines: headerLinesOf(header).map((line) => line + 1),
    headerCells: headerLinesOf(header).map((line) => facts.cells[line]),
    names: fill(header.names),
    units: fill(header.units),
    captions: fill(header.captions),
    rows: rows.map((line) => ({ line: line + 1, cells: facts.cells[line] })),
    values: columnValues(facts, rows, width),
  };
}

function headerLinesOf({ captionsLine, headerLine, unitsLine }: HeaderFound): number[] {
  return [captionsLine, headerLine, unitsLine].filter((line) => line !== undefined);
}

function columnValues(facts: LineFacts, rows: readonly number[], width: number): Float64Array[] {
  const columns = Array.from({ length: width }, () => new Float64Array(rows.length).fill(Number.NaN));
  rows.forEach((line, row) => {
    const filled = Math.min(facts.widths[line], width);
    const from = facts.valuesFrom[line];
    for (let column = 0; column < filled; column++) columns[column][row] = facts.values[from + column];
  });
  return columns;
}

/** Every filled line that is neither a row nor part of a header. */
function textLines(lines: readonly string[], facts: LineFacts, sections: readonly SectionFound[]): TextLine[] {
  const taken = new Uint8Array(lines.length);
  for (const { header, rows } of sections) {
    for (const line of headerLinesOf(header)) taken[line] = 1;
    for (const line of rows) taken[line] = 1;
  }
  const text: TextLine[] = [];
  lines.forEach((line, index) => {
    if (taken[index] === 0 && line.trim() !== '' && facts.kinds[index] !== 'blank') {
      text.push(toTextLine(line, index + 1, facts.cells[index]));
    }
  });
  return text;
}

function toTextLine(line: string, number: number, cells: readonly string[]): TextLine {
  const text = line.length > LONGEST_TEXT ? `${line.slice(0, LONGEST_TEXT)}…` : line.trim();
  const pair = /^[#\s]*(\p{L}[^:=]{0,60}?)\s*[:=]\s*(\S.*)$/u.exec(text);
  if (pair !== null)
    return { line: number, text, key: pair[1], value: pair[2].replace(/^[\s;,\t|]+|[\s;,\t|]+$/g, '') };
  const filled = cells.map((cell) => cell.trim()).filter((cell) => cell !== '');
  if (filled.length >= 2 && /\p{L}/u.test(filled[0]) && cells.length <= 4) {
    return { line: number, text, key: filled[0].replace(/\s*[:=]$/, ''), value: filled.slice(1).join(' ') };
  }
  return { line: number, text };
}
