/** A row of a Markdown table. */
export interface TableRow {
  /** What stands between backticks in the first cell. */
  readonly names: readonly string[];
  /** Text of all cells, the first included. */
  readonly cells: readonly string[];
}

/** A part of a Markdown text from a heading to the next one that is no deeper. */
export interface Section {
  readonly text: string;
  /** Rows of all its tables, without their heads. */
  readonly rows: readonly TableRow[];
  /** Everything that its tables name, in order. */
  readonly names: readonly string[];
}

/** The section under a heading; throws where there is no such heading. */
export function section(markdown: string, heading: string): Section {
  const lines = markdown.split('\n');
  const start = lines.findIndex((line) => line.replace(/^#+ /, '') === heading && line.startsWith('#'));
  if (start < 0) throw new Error(`There is no heading "${heading}".`);
  const depth = lines[start].indexOf(' ');
  const length = lines.slice(start + 1).findIndex((line) => /^#+ /.test(line) && line.indexOf(' ') <= depth);
  const own = lines.slice(start, length < 0 ? undefined : start + 1 + length);
  const rows = own.flatMap((line, index) =>
    line.startsWith('|') && !isHead(own, index) && !isRule(line) ? [readRow(line)] : [],
  );
  return { text: own.join('\n'), rows, names: rows.flatMap(({ names }) => names) };
}

function isHead(lines: readonly string[], index: number): boolean {
  return index + 1 < lines.length && isRule(lines[index + 1]);
}

function isRule(line: string): boolean {
  return /^\|[\s|:-]+\|$/.test(line) && line.includes('---');
}

function readRow(line: string): TableRow {
  const cells = line
    .slice(1, -1)
    .split('|')
    .map((cell) => cell.trim());
  return { names: [...cells[0].matchAll(/`([^`]+)`/g)].map(([, name]) => name), cells };
}
