import type { Doubt } from '../notice/doubt.ts';
import type { Outcome } from '../notice/outcome.ts';
import { commasAreBoth } from './commasAreBoth.ts';
import { longestRow } from './longestRow.ts';
import type { NumberMarks } from './numberMarks.ts';
import { parseNumber } from './parseNumber.ts';
import { quoteCell } from './quoteCell.ts';
import { type MarksScore, scoreMarks } from './scoreMarks.ts';
import { type Delimiter, splitCells } from './splitCells.ts';
import type { TableOverrules } from './tableOverrules.ts';

/** How a file writes its table: what parts cells, and how numbers are written. */
export interface Dialect {
  readonly delimiter: Delimiter;
  readonly marks: NumberMarks;
}

export interface DialectChoice {
  readonly dialect: Dialect;
  /** 'delimiter-guessed' where another reading is about as good and gives other numbers. */
  readonly doubts: readonly Doubt[];
}

interface Candidate extends Dialect, MarksScore {
  readonly cells: readonly (readonly string[])[];
}

/** Lines that are scored: the first ones and, of a longer file, an even selection of the rest. */
const LINES_SCORED = 2000;
const FIRST_LINES = 500;

/** A reading whose score comes this close to the best one cannot be told from it by the file alone. */
const AS_GOOD = 0.97;

const DELIMITERS: readonly Delimiter[] = ['\t', ';', '|', ',', 'spaces'];

/**
 * Decides delimiter, decimal mark and thousands mark together, from lines of
 * the whole file: each combination that the file could be written in is tried
 * on the same lines, and the one by which they read best as a table of numbers
 * is taken. `lines` are the lines of the file without their ends.
 *
 * Refuses with 'table-no-columns' where no combination gives a line with two
 * numbers, and with 'table-delimiter-unclear' where commas part cells and
 * decimals alike. What `asked` decides is not tried otherwise.
 */
export function chooseDialect(
  lines: readonly string[],
  fileName: string,
  asked: TableOverrules = {},
): Outcome<DialectChoice> {
  const numbered = selectLines(lines);
  const sample = numbered.map((index) => lines[index]);
  const candidates = candidatesFor(sample, asked).sort((a, b) => b.score - a.score || assumes(a) - assumes(b));
  const best = candidates[0];
  if (best === undefined || best.score <= 0) return { ok: false, refusals: [noColumns(lines, fileName, asked)] };
  const firstLine = numbered[best.dataLines[0]] + 1;
  const dialect: Dialect = { delimiter: best.delimiter, marks: best.marks };

  const dataLines = best.dataLines.map((at) => sample[at]);
  const dataCells = best.dataLines.map((at) => best.cells[at]);
  const settled = asked.delimiter !== undefined && asked.decimal !== undefined;
  if (!settled && best.delimiter === ',' && best.marks.decimal === '.' && commasAreBoth(dataLines, dataCells)) {
    const message = `Commas seem to part the cells and the decimals alike (line ${firstLine}: ${quoteCell(lines[firstLine - 1])}), so that the numbers cannot be told apart.`;
    const remedy = 'Export again with semicolons or tabs between the columns, or with decimal points.';
    return {
      ok: false,
      refusals: [{ code: 'table-delimiter-unclear', message, remedy, place: { file: fileName, line: firstLine } }],
    };
  }
  const doubts: Doubt[] = [];
  const rival = rivalOf(best, candidates);
  if (rival !== undefined) doubts.push(marksDoubt(best, rival, numbered, fileName));
  else if (asked.delimiter === undefined && couldBeOneColumn(best, sample, lines.slice(0, firstLine - 1)))
    doubts.push(oneColumnDoubt(lines[firstLine - 1], firstLine, fileName));
  return { ok: true, value: { dialect, doubts } };
}

/** Of two readings that are equally good, the one without a thousands mark assumes less. */
function assumes({ marks }: Candidate): number {
  return marks.thousands === '' ? 0 : 1;
}

function selectLines(lines: readonly string[]): number[] {
  const usable: number[] = [];
  lines.forEach((line, index) => {
    if (line.length <= longestRow && /\d/.test(line)) usable.push(index);
  });
  if (usable.length <= LINES_SCORED) return usable;
  const rest = usable.length - FIRST_LINES;
  const taken = LINES_SCORED - FIRST_LINES;
  return [
    ...usable.slice(0, FIRST_LINES),
    ...Array.from({ length: taken }, (_, at) => usable[FIRST_LINES + Math.floor((at * rest) / taken)]),
  ];
}

function candidatesFor(sample: readonly string[], asked: TableOverrules): Candidate[] {
  const text = sample.join('\n');
  const quoted = text.includes('"');
  const candidates: Candidate[] = [];
  for (const delimiter of asked.delimiter === undefined ? DELIMITERS : [asked.delimiter]) {
    if (!text.includes(delimiter === 'spaces' ? ' ' : delimiter)) continue;
    const cells = splitCells(sample, delimiter);
    for (const decimal of asked.decimal === undefined ? (['.', ','] as const) : [asked.decimal]) {
      // A comma between unquoted figures cannot both part cells and stand before decimals.
      if (decimal === ',' && delimiter === ',' && !quoted && asked.delimiter === undefined) continue;
      const tried = asked.thousands === undefined ? thousandsFor(text, delimiter, decimal) : [asked.thousands];
      for (const thousands of tried) {
        if (thousands === decimal) continue;
        // Without any comma there is nothing to try but points that part thousands.
        if (asked.decimal === undefined && decimal === ',' && thousands !== '.' && !text.includes(',')) continue;
        const marks: NumberMarks = { decimal, thousands };
        candidates.push({ delimiter, marks, cells, ...scoreMarks(cells, marks) });
      }
    }
  }
  return candidates;
}

function thousandsFor(text: string, delimiter: Delimiter, decimal: '.' | ','): readonly NumberMarks['thousands'][] {
  const found: NumberMarks['thousands'][] = [''];
  const other = decimal === '.' ? ',' : '.';
  if (
    (other !== delimiter || text.includes('"')) &&
    (other === ',' ? /\d,\d{3}(?!\d)/ : /\d\.\d{3}(?!\d)/).test(text)
  ) {
    found.push(other);
  }
  const blank = delimiter === 'spaces' ? /\d[\u00a0\u2009\u202f]\d{3}(?!\d)/ : /\d[ \u00a0\u2009\u202f]\d{3}(?!\d)/;
  if (blank.test(text)) found.push(' ');
  if (/\d['’]\d{3}(?!\d)/.test(text)) found.push("'");
  return found;
}

/** The best other reading, if it is about as good and takes some cell for another number. */
function rivalOf(best: Candidate, candidates: readonly Candidate[]): Candidate | undefined {
  return candidates.find((other) => {
    if (other === best || other.score < AS_GOOD * best.score) return false;
    return other.delimiter !== best.delimiter || firstDifference(best, other) !== undefined;
  });
}

function firstDifference(
  best: Candidate,
  other: Candidate,
): { readonly line: number; readonly cell: string } | undefined {
  for (const line of best.dataLines) {
    const cell = best.cells[line].find(
      (text) => !sameValue(parseNumber(text, best.marks), parseNumber(text, other.marks)),
    );
    if (cell !== undefined) return { line, cell };
  }
  return undefined;
}

function sameValue(a: ReturnType<typeof parseNumber>, b: ReturnType<typeof parseNumber>): boolean {
  return a === b || typeof a !== 'number' || typeof b !== 'number';
}

/** Whether every row could as well be one number with a comma in it, and no header says that there are two columns. */
function couldBeOneColumn(best: Candidate, sample: readonly string[], above: readonly string[]): boolean {
  if (best.delimiter !== ',' || above.some((line) => /[\p{L}].*,.*[\p{L}]/u.test(line))) return false;
  return best.dataLines.every((line) => /^\s*[-+]?\d+,\d{3}\s*$/.test(sample[line]));
}

function noColumns(lines: readonly string[], fileName: string, asked: TableOverrules) {
  const filled = lines.filter((line) => line.trim() !== '');
  const first = lines.findIndex((line) => line.trim() !== '') + 1;
  return {
    code: 'table-no-columns' as const,
    message: `No line of the file holds two numbers: ${filled.length} ${filled.length === 1 ? 'line' : 'lines'} of text, beginning with ${quoteCell(filled[0] ?? '')}.`,
    remedy:
      Object.keys(asked).length > 0
        ? 'Take back what was chosen for encoding, delimiter or decimal mark, or choose otherwise.'
        : 'Export the titration with the volume and the reading (pH or mV) of each point side by side on one line.',
    place: { file: fileName, line: Math.max(1, first) },
  };
}

function marksDoubt(best: Candidate, rival: Candidate, numbered: readonly number[], fileName: string): Doubt {
  const difference = best.delimiter === rival.delimiter ? firstDifference(best, rival) : undefined;
  const line = numbered[difference?.line ?? best.dataLines[0]] + 1;
  const seen =
    difference === undefined
      ? `The columns could be parted by ${delimiterName(best.delimiter)} or by ${delimiterName(rival.delimiter)}; ${delimiterName(best.delimiter)} were taken.`
      : `${quoteCell(difference.cell)} was read as ${parseNumber(difference.cell, best.marks)}; it could as well mean ${parseNumber(difference.cell, rival.marks)}.`;
  return {
    code: 'delimiter-guessed',
    seen,
    means: 'Nothing in the file decides between the two; with the other reading every result would be different.',
    remedy: 'Compare a volume with the burette, and export with a clear decimal mark if it was read wrongly.',
    place: { file: fileName, line },
  };
}

function oneColumnDoubt(text: string, line: number, fileName: string): Doubt {
  return {
    code: 'delimiter-guessed',
    seen: `${quoteCell(text)} was read as two whole numbers with a comma between them.`,
    means: 'It could as well be a single number with a decimal or a thousands comma.',
    remedy: 'Export with semicolons or tabs between the columns.',
    place: { file: fileName, line },
  };
}

function delimiterName(delimiter: Delimiter): string {
  return { ',': 'commas', ';': 'semicolons', '\t': 'tabs', '|': 'bars', spaces: 'spaces' }[delimiter];
}
