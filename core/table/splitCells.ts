import Papa from 'papaparse';

/** What parts the cells of a line; 'spaces' is a run of one or more blanks. */
export type Delimiter = ',' | ';' | '\t' | '|' | 'spaces';

/** Lines handed to the quote-aware parser at a time; a stray quote can upset no more than these. */
const LINES_PER_BATCH = 500;

/** Lines that one quoted cell may run over: headers do that, data do not. */
const MAXIMUM_LINES_PER_CELL = 5;

const CONSUMED: readonly string[] = [];

/**
 * Splits lines into cells, one array of cells per line, in order. A quoted
 * cell that runs over several lines belongs to its first line; the lines it
 * has swallowed give no cells. Quotes that do not close are taken as they
 * stand, so that none of them can hide the lines after it.
 */
export function splitCells(lines: readonly string[], delimiter: Delimiter): readonly (readonly string[])[] {
  if (delimiter === 'spaces') return lines.map(splitAtSpaces);
  const text = lines.join('\n');
  if (!text.includes('"')) return parse(text, delimiter, true);
  return splitQuoted(lines, delimiter);
}

function parse(text: string, delimiter: Delimiter, fastMode: boolean): string[][] {
  // An empty text has one empty line, not none.
  if (text === '') return [['']];
  return Papa.parse<string[]>(text, { delimiter, newline: '\n', fastMode, dynamicTyping: false }).data;
}

function splitAtSpaces(line: string): readonly string[] {
  if (line.includes('"')) {
    const quoted = line.match(/"(?:[^"]|"")*"|[^ ]+/g) ?? [''];
    return quoted.map((cell) =>
      /^".*"$/.test(cell) && cell.length > 1 ? cell.slice(1, -1).replaceAll('""', '"') : cell,
    );
  }
  return line.trim().split(/ +/);
}

function splitQuoted(lines: readonly string[], delimiter: Delimiter): readonly (readonly string[])[] {
  const cells: (readonly string[])[] = new Array(lines.length).fill(CONSUMED);
  let starts: number[] = [];
  let batch: string[] = [];
  const flush = (): void => {
    if (batch.length === 0) return;
    const parsed = parse(batch.join('\n'), delimiter, false);
    const agrees = parsed.length === batch.length;
    for (let at = 0; at < batch.length; at++) {
      cells[starts[at]] = agrees ? flat(parsed[at]) : splitAlone(batch[at], delimiter);
    }
    starts = [];
    batch = [];
  };
  for (let index = 0; index < lines.length; index++) {
    if (quotesAreOdd(lines[index])) {
      flush();
      const last = closingLine(lines, index, delimiter);
      cells[index] = splitAlone(lines.slice(index, last + 1).join('\n'), delimiter);
      index = last;
      continue;
    }
    starts.push(index);
    batch.push(lines[index]);
    if (batch.length === LINES_PER_BATCH) flush();
  }
  flush();
  return cells;
}

/** One line by itself; where its quotes make no sense they count as ordinary characters. */
function splitAlone(line: string, delimiter: Delimiter): readonly string[] {
  if (quotesAreOdd(line)) return line.split(delimiter);
  const parsed = parse(line, delimiter, false);
  return parsed.length === 1 ? flat(parsed[0]) : line.replaceAll('\n', ' ').split(delimiter);
}

function flat(row: string[]): readonly string[] {
  return row.some((cell) => cell.includes('\n')) ? row.map((cell) => cell.replace(/\s*\n\s*/g, ' ')) : row;
}

/** The line on which a cell opened on line `from` closes; `from` itself where it does not close, or hides data. */
function closingLine(lines: readonly string[], from: number, delimiter: Delimiter): number {
  const furthest = Math.min(lines.length, from + MAXIMUM_LINES_PER_CELL) - 1;
  for (let at = from + 1; at <= furthest; at++) {
    const pieces = lines[at].split('"')[0].split(delimiter);
    if (pieces.filter((piece) => /^\s*[-+]?\d[\d.,]*\s*$/.test(piece)).length >= 2) return from;
    if (quotesAreOdd(lines[at])) return at;
  }
  return from;
}

function quotesAreOdd(line: string): boolean {
  let odd = false;
  for (let at = line.indexOf('"'); at >= 0; at = line.indexOf('"', at + 1)) odd = !odd;
  return odd;
}
