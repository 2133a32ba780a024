import type { Doubt } from '../notice/doubt.ts';
import type { Outcome } from '../notice/outcome.ts';
import type { Refusal } from '../notice/refusal.ts';
import { quoteCell } from '../table/quoteCell.ts';
import { readTable } from '../table/readTable.ts';
import type { Table, TableSection } from '../table/table.ts';
import { type ColumnChoice, chooseColumns } from './chooseColumns.ts';
import { collectRows } from './collectRows.ts';
import type { ColumnGroup } from './columnGroup.ts';
import { nameRuns } from './nameRuns.ts';
import { reviewRun } from './reviewRun.ts';
import type { Run } from './run.ts';
import { type SectionColumns, sectionColumns } from './sectionColumns.ts';
import { sectionLabel } from './sectionLabel.ts';
import { splitRows } from './splitRows.ts';

interface ReadSection {
  readonly columns: SectionColumns;
  readonly choice: ColumnChoice | undefined;
}

type Draft = Omit<Run, 'name'> & { readonly label?: string };

/** A table this short beside one this long is a list of results, unless it has the same header. */
const LIST_ROWS = 3;
const LONG_ROWS = 8;

/**
 * The whole way from the bytes of an export to its runs. Every data row of the
 * file is, in one of the runs, a row (used or excluded by rule) or not accepted.
 *
 * Refuses with the codes of `readTable`, and with 'table-no-columns' where the
 * rows hold no column of volumes with one of readings.
 */
export function readRuns(bytes: Uint8Array, fileName: string): Outcome<readonly Run[]> {
  const read = readTable(bytes, fileName);
  if (!read.ok) return read;
  const table = read.value;
  const sections = table.sections.map((section): ReadSection => {
    const columns = sectionColumns(section, table.dialect);
    return { columns, choice: chooseColumns(columns, fileName) };
  });
  const main = mainSection(sections);
  if (main === undefined) return { ok: false, refusals: [noColumns(table)] };

  const drafts: Draft[] = [];
  const outside: Refusal[] = [];
  sections.forEach((section, index) => {
    if (section.choice === undefined || !belongs(section, main)) {
      outside.push(...rowsOutside(section.columns.section, fileName));
    } else {
      drafts.push(...runsOf(table, index, section.columns, section.choice));
    }
  });
  // What belongs to no run must be seen with one of them; the first is always there.
  const [first, ...others] = drafts;
  const notAccepted = [...first.notAccepted, ...outside];
  const doubts = [...table.doubts, ...first.doubts];
  return { ok: true, value: nameRuns([{ ...first, notAccepted, doubts }, ...others], fileName) };
}

function mainSection(sections: readonly ReadSection[]): ReadSection | undefined {
  let main: ReadSection | undefined;
  for (const section of sections) {
    if (section.choice === undefined) continue;
    if (main === undefined || section.columns.section.rows.length > main.columns.section.rows.length) main = section;
  }
  return main;
}

/** Whether a table beside the main one holds runs too, and not results, settings or something else. */
function belongs({ columns, choice }: ReadSection, main: ReadSection): boolean {
  const own = columns.section;
  const its = main.columns.section;
  if (own === its) return true;
  if (own.headerLine !== undefined && own.names.join('\n') === its.names.join('\n')) return true;
  if (own.rows.length < LIST_ROWS && its.rows.length >= LONG_ROWS) return false;
  if (choice?.named === true) return true;
  return own.headerLine === undefined ? own.width === its.width : main.choice?.named !== true;
}

function runsOf(table: Table, index: number, columns: SectionColumns, choice: ColumnChoice): Draft[] {
  const { file, dialect } = table;
  const rowsTaken = new Uint8Array(columns.section.rows.length);
  const alone = choice.groups.length === 1;
  const shared = choice.groups.every(({ volume }) => volume === choice.groups[0].volume);
  const drafts = choice.groups.flatMap((group): Draft[] => {
    const parts = splitRows(columns, group);
    return parts.map((part, at): Draft => {
      const own = alone ? part.rows : part.rows.filter((row) => isFilled(columns, group, shared, row));
      for (const row of own) rowsTaken[row] = 1;
      const { rows, notAccepted } = collectRows(columns, group, own, dialect.delimiter, file);
      const labels = [choice.groups.length > 1 ? group.label : sectionLabel(table, index), part.label];
      const label = labels.filter((text) => text !== undefined && text !== '').join(', ');
      return {
        ...(label === '' ? {} : { label }),
        file,
        readingKind: group.readingKind,
        rows,
        notAccepted,
        doubts: [
          ...choice.doubts,
          ...(part.byRestart && at > 0 ? [splitDoubt(columns.section.rows[part.rows[0]].line, file)] : []),
          ...reviewRun(rows, notAccepted, group.readingKind, file),
        ],
      };
    });
  });
  // Side by side, a row may be empty in every pair of columns and yet hold something elsewhere.
  const left = columns.section.rows.filter((_, row) => rowsTaken[row] === 0);
  if (left.length === 0) return drafts;
  const [first, ...others] = drafts;
  return [
    { ...first, notAccepted: [...first.notAccepted, ...left.map((row) => rowOutside(row.line, row.cells, file))] },
    ...others,
  ];
}

/**
 * Side by side, the shorter of two runs ends in empty cells, which are no rows
 * of it; readings that share one volume column are each taken where they stand.
 */
function isFilled({ section }: SectionColumns, group: ColumnGroup, shared: boolean, row: number): boolean {
  const { cells } = section.rows[row];
  const hasReading = (cells[group.reading] ?? '').trim() !== '';
  return hasReading || (!shared && (cells[group.volume] ?? '').trim() !== '');
}

function splitDoubt(line: number, file: string): Doubt {
  return {
    code: 'run-split-guessed',
    seen: `In line ${line} the volume starts again; a new run was begun there.`,
    means: 'Nothing but the volumes says that two runs follow each other.',
    remedy: 'Compare with the record; a column with the name of the sample would settle it.',
    place: { file, line },
  };
}

function rowsOutside(section: TableSection, file: string): Refusal[] {
  return section.rows.map(({ line, cells }) => rowOutside(line, cells, file));
}

function rowOutside(line: number, cells: readonly string[], file: string): Refusal {
  return {
    code: 'row-outside-run',
    message: `The row ${quoteCell(cells.join(' '))} belongs to no titration: no volume with a reading beside it.`,
    remedy: 'Nothing, if it is a list of results or settings; else give its columns headers such as "V (mL)" and "pH".',
    place: { file, line },
  };
}

function noColumns({ file, sections }: Table): Refusal {
  const longest = sections.reduce((most, section) => (section.rows.length > most.rows.length ? section : most));
  const names = longest.names.filter((name) => name !== '');
  const seen =
    names.length > 0 ? `columns ${names.map(quoteCell).join(', ')}` : `${longest.width} columns without a header`;
  return {
    code: 'table-no-columns',
    message: `The table has ${seen}, but none that can be a volume with another that can be a reading.`,
    remedy: 'Export the volume added and the reading, and head the columns "V (mL)" and "pH" or "E (mV)".',
    place: { file, line: longest.headerLine ?? longest.rows[0].line },
  };
}
