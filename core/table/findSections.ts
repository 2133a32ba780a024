import { findHeader, type HeaderFound } from './findHeader.ts';
import { givenHeader } from './givenHeader.ts';
import type { LineFacts } from './lineFacts.ts';
import type { Delimiter } from './splitCells.ts';

/** One table as line indices, counted from 0. */
export interface SectionFound {
  readonly header: HeaderFound;
  readonly rows: readonly number[];
  readonly width: number;
}

interface OpenSection {
  readonly header: HeaderFound;
  readonly rows: number[];
  readonly widths: Map<number, number>;
}

/** A table of so few rows without a header, beside a real one, is a line of text that happens to hold figures. */
const STRAY_ROWS = 2;
const REAL_ROWS = 5;

/**
 * Finds the tables of a file in one pass. A line with two numbers is a full
 * row; lines between full rows that hold a number, or marks for "no value"
 * only, are rows with something missing; a header begins a new table; all
 * other lines are text. `headerLines` (indices, in order) are what a person
 * has declared the header of the first table to be.
 */
export function findSections(
  lines: readonly string[],
  facts: LineFacts,
  delimiter: Delimiter,
  headerLines?: readonly number[],
): SectionFound[] {
  const sections: OpenSection[] = [];
  let current: OpenSection | undefined;
  let pending: number[] = [];
  // What stands above a header, or is one, is no row.
  const firstRow = headerLines === undefined || headerLines.length === 0 ? 0 : headerLines[headerLines.length - 1] + 1;
  for (let line = firstRow; line < lines.length; line++) {
    if (!isFullRow(facts, line, delimiter)) {
      pending.push(line);
      continue;
    }
    let header: HeaderFound | undefined;
    if (current === undefined || pending.length > 0) {
      const found =
        current === undefined && headerLines !== undefined
          ? givenHeader(facts, headerLines, pending)
          : findHeader(lines, facts, pending, facts.widths[line], delimiter);
      if (current === undefined || beginsAnew(current, found, facts, pending, line)) header = found;
    }
    if (header !== undefined) {
      if (current !== undefined) takeTrailingRows(current, facts, pending, header);
      current = { header, rows: [...header.rows], widths: new Map() };
      sections.push(current);
    } else if (current !== undefined && pending.length > 0) {
      const width = usualWidth(current);
      for (const between of pending) if (isRowBetween(facts, between, width)) current.rows.push(between);
    }
    if (current === undefined) continue;
    current.rows.push(line);
    const width = facts.widths[line];
    current.widths.set(width, (current.widths.get(width) ?? 0) + 1);
    pending = [];
  }
  if (current !== undefined) takeTrailingRows(current, facts, pending);
  return withoutStrays(sections).map(({ header, rows, widths }) => ({
    header,
    rows,
    width: Math.max(usualWidth({ widths }), header.names.findLastIndex((name) => name !== '') + 1),
  }));
}

function isFullRow(facts: LineFacts, line: number, delimiter: Delimiter): boolean {
  if (facts.kinds[line] !== 'cells' || facts.numbers[line] < 2) return false;
  // Parted at every blank, prose with a few figures in it would pass for rows.
  return delimiter !== 'spaces' || facts.numbers[line] >= facts.texts[line];
}

function beginsAnew(
  current: OpenSection,
  header: HeaderFound,
  facts: LineFacts,
  pending: readonly number[],
  line: number,
): boolean {
  const apart = pending.some((index) => {
    return index !== header.headerLine && (facts.kinds[index] === 'blank' || facts.widths[index] === 1);
  });
  if (header.headerLine === undefined) return apart && !current.widths.has(facts.widths[line]);
  if (header.names.join('\n') === current.header.names.join('\n')) return true;
  // A row of words amid rows is a damaged row unless something sets it apart.
  return apart || !current.widths.has(facts.widths[line]) || firstNumber(facts, line) < lastNumber(facts, current);
}

function firstNumber(facts: LineFacts, line: number): number {
  for (const cell of facts.cells[line]) {
    const value = Number(cell.replace(',', '.'));
    if (cell.trim() !== '' && Number.isFinite(value)) return value;
  }
  return Number.NaN;
}

function lastNumber(facts: LineFacts, section: OpenSection): number {
  return firstNumber(facts, section.rows[section.rows.length - 1]);
}

function isRowBetween(facts: LineFacts, line: number, width: number): boolean {
  if (facts.kinds[line] !== 'cells') return false;
  if (facts.numbers[line] > 0) return facts.widths[line] <= width + 1;
  return facts.texts[line] === 0 || (facts.widths[line] === width && width >= 2);
}

/** Rows with something missing that touch the end of a table; what stands further below is text. */
function takeTrailingRows(
  section: OpenSection,
  facts: LineFacts,
  pending: readonly number[],
  next?: HeaderFound,
): void {
  const width = usualWidth(section);
  const taken = new Set(next?.rows ?? []);
  for (const line of pending) {
    if (facts.kinds[line] !== 'cells' || taken.has(line)) return;
    if (facts.texts[line] > 0) {
      const first = facts.cells[line][0].trim();
      const remark = /[:=]$|\p{L}\s+\p{L}/u.test(first) || facts.widths[line] !== width;
      if (facts.numbers[line] === 0 || remark) return;
    }
    section.rows.push(line);
  }
}

function usualWidth(section: Pick<OpenSection, 'widths'>): number {
  let best = 0;
  for (const [width, count] of section.widths) if (count > (section.widths.get(best) ?? 0)) best = width;
  return best;
}

function withoutStrays(sections: readonly OpenSection[]): readonly OpenSection[] {
  const longest = sections.reduce((most, section) => Math.max(most, section.rows.length), 0);
  if (longest < REAL_ROWS) return sections;
  return sections.filter((section) => section.rows.length > STRAY_ROWS || section.header.headerLine !== undefined);
}
