import type { Table } from '../table/table.ts';
import type { Run } from './run.ts';
import { showCell } from './showCell.ts';

export type RowStatus = 'used' | 'excluded' | 'notAccepted';

/** What became of a row in one of the runs that share its line. */
export interface RowInRun {
  /** Index of the run. */
  readonly run: number;
  readonly status: RowStatus;
  readonly why?: string;
}

/** One line of the file as it was understood; blank lines are left out. */
export interface ViewLine {
  /** Line of the source file, counted from 1. */
  readonly line: number;
  readonly kind: 'text' | 'header' | 'row';
  /** Cells as written, made fit to be shown; a text line is one cell. */
  readonly cells: readonly string[];
  /** Of rows: 'used' where any run uses it, else 'excluded' where any run keeps it. */
  readonly status?: RowStatus;
  /** Why the row is not used. */
  readonly why?: string;
  /** Given where several runs stand side by side in the line. */
  readonly runs?: readonly RowInRun[];
}

/** How many rows the file has, and what became of them: the last three add up to the first. */
export interface RowCounts {
  readonly rows: number;
  readonly used: number;
  readonly excluded: number;
  readonly notAccepted: number;
}

export interface TableView {
  readonly lines: readonly ViewLine[];
  readonly counts: RowCounts;
}

const RANK: Readonly<Record<RowStatus, number>> = { used: 2, excluded: 1, notAccepted: 0 };

/** The file as it was read, line by line. */
export function tableView(table: Table, runs: readonly Run[]): TableView {
  const fates = fatesByLine(runs);
  const lines: ViewLine[] = [];
  for (const { line, text } of [...table.preamble, ...table.remarks]) {
    lines.push({ line, kind: 'text', cells: [showCell(text)] });
  }
  const counts = { rows: 0, used: 0, excluded: 0, notAccepted: 0 };
  for (const section of table.sections) {
    section.headerLines.forEach((line, at) => {
      lines.push({ line, kind: 'header', cells: section.headerCells[at].map(showCell) });
    });
    for (const { line, cells } of section.rows) {
      const found = fates.get(line) ?? [];
      const best = found.reduce<RowInRun | undefined>(
        (most, fate) => (most === undefined || RANK[fate.status] > RANK[most.status] ? fate : most),
        undefined,
      );
      const status = best?.status ?? 'notAccepted';
      counts.rows += 1;
      counts[status] += 1;
      lines.push({
        line,
        kind: 'row',
        cells: cells.map(showCell),
        status,
        ...(best?.why === undefined ? {} : { why: best.why }),
        ...(found.length > 1 ? { runs: found } : {}),
      });
    }
  }
  lines.sort((a, b) => a.line - b.line);
  return { lines, counts };
}

function fatesByLine(runs: readonly Run[]): Map<number, RowInRun[]> {
  const fates = new Map<number, RowInRun[]>();
  const add = (line: number, fate: RowInRun): void => {
    const known = fates.get(line);
    if (known === undefined) fates.set(line, [fate]);
    else known.push(fate);
  };
  runs.forEach((run, index) => {
    for (const { line, decision } of run.rows) {
      const why = decision.use === 'excluded' ? { why: decision.why } : {};
      add(line, { run: index, status: decision.use, ...why });
    }
    for (const { place, message } of run.notAccepted) {
      if (place.line !== undefined) add(place.line, { run: index, status: 'notAccepted', why: message });
    }
  });
  return fates;
}
