import type { Doubt } from '../notice/doubt.ts';
import type { Outcome } from '../notice/outcome.ts';
import type { Refusal } from '../notice/refusal.ts';
import { quoteCell } from '../table/quoteCell.ts';
import type { Table, TableSection } from '../table/table.ts';
import { type ColumnChoice, chooseColumns } from './chooseColumns.ts';
import { collectRows } from './collectRows.ts';
import type { ColumnGroup } from './columnGroup.ts';
import { nameRuns } from './nameRuns.ts';
import { proposeRows } from './proposeRows.ts';
import type { ReadingOverrules, RunSplit } from './readingChoices.ts';
import { reviewRun } from './reviewRun.ts';
import type { Run } from './run.ts';
import { type SectionColumns, sectionColumns } from './sectionColumns.ts';
import { sectionLabel } from './sectionLabel.ts';
import { splitRows } from './splitRows.ts';

export interface ReadSection {
  readonly columns: SectionColumns;
  readonly choice: ColumnChoice | undefined;
}

type Draft = Omit<Run, 'name'> & { readonly label?: string };

/** A table this short beside one this long is a list of results, unless it has the same header. */
const LIST_ROWS = 3;
const LONG_ROWS = 8;

/** What was made of the tables of a file. */
export interface FormedRuns {
  /** At least one, in the order of the file. */
  readonly runs: readonly Run[];
  /** All tables with their columns, in the order of the file; those without a choice hold no run. */
  readonly sections: readonly ReadSection[];
  /** The table with most rows of those that hold runs. */
  readonly main: ReadSection & { readonly choice: ColumnChoice };
  /** How the rows were parted. */
  readonly runSplit: RunSplit;
  /** Whether nothing but the figures parted them. */
  readonly splitGuessed: boolean;
}

/**
 * From tables to runs. Every data row is, in one of the runs, a row (used or
 * excluded by rule) or not accepted.
 *
 * Refuses with 'table-no-columns' where the rows hold no column of volumes with
 * one of readings.
 */
export function formRuns(table: Table, overrules: ReadingOverrules): Outcome<FormedRuns> {
  const { file } = table;
  const longest = table.sections.reduce((most, section) => (section.rows.length > most.rows.length ? section : most));
  const sections = table.sections.map((section): ReadSection => {
    // Columns are decided by their number: tables of other columns are not meant.
    const { columns: decided, ...others } = overrules;
    const meant = section.width === longest.width && decided !== undefined ? overrules : others;
    const columns = sectionColumns(section, table.dialect, meant);
    return { columns, choice: chooseColumns(columns, file, meant) };
  });
  const main = mainSection(sections);
  if (main === undefined) return { ok: false, refusals: [noColumns(table)] };

  const drafts: Draft[] = [];
  const outside: Refusal[] = [];
  let holding = 0;
  sections.forEach((section, index) => {
    if (section.choice === undefined || !belongs(section, main)) {
      outside.push(...rowsOutside(section.columns.section, file));
    } else {
      holding += 1;
      drafts.push(...runsOf(table, index, section.columns, section.choice, overrules.runSplit));
    }
  });
  const parted = overrules.runSplit === 'none' ? together(drafts) : drafts;
  // What belongs to no run must be seen with one of them; the first is always there.
  const [first, ...others] = parted;
  const notAccepted = [...first.notAccepted, ...outside];
  const doubts = [...table.doubts, ...first.doubts];
  const runs = nameRuns([{ ...first, notAccepted, doubts }, ...others], file);
  const splitGuessed = runs.some((run) => run.doubts.some(({ code }) => code === 'run-split-guessed'));
  const runSplit =
    overrules.runSplit ??
    (runs.length === 1
      ? 'none'
      : main.choice.groups.length > 1
        ? 'sideBySide'
        : holding > 1
          ? 'blocks'
          : splitGuessed
            ? 'restart'
            : 'sampleColumn');
  return { ok: true, value: { runs, sections, main, runSplit, splitGuessed } };
}

/** All drafts of a kind as one, in the order of the file. */
function together(drafts: readonly Draft[]): Draft[] {
  const [first] = drafts;
  const alike = drafts.filter(({ readingKind }) => readingKind === first.readingKind);
  if (alike.length === 1) return [...drafts];
  const { label: _, ...rest } = first;
  const rows = alike.flatMap((draft) => draft.rows);
  const notAccepted = alike.flatMap((draft) => draft.notAccepted);
  const reviewed = reviewRun(rows, notAccepted, first.readingKind, first.file);
  const told = new Set(reviewed.map(({ code }) => code));
  const doubts = [...alike.flatMap((draft) => draft.doubts).filter(({ code }) => !told.has(code)), ...reviewed];
  const merged = { ...rest, rows, notAccepted, doubts, proposals: proposeRows(rows, first.readingKind) };
  return [merged, ...drafts.filter(({ readingKind }) => readingKind !== first.readingKind)];
}

function mainSection(sections: readonly ReadSection[]): FormedRuns['main'] | undefined {
  let main: FormedRuns['main'] | undefined;
  for (const { columns, choice } of sections) {
    if (choice === undefined) continue;
    if (main === undefined || columns.section.rows.length > main.columns.section.rows.length)
      main = { columns, choice };
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

function runsOf(
  table: Table,
  index: number,
  columns: SectionColumns,
  choice: ColumnChoice,
  split: RunSplit | undefined,
): Draft[] {
  const { file, dialect } = table;
  const rowsTaken = new Uint8Array(columns.section.rows.length);
  const alone = choice.groups.length === 1;
  const shared = choice.groups.every(({ volume }) => volume === choice.groups[0].volume);
  const drafts = choice.groups.flatMap((group): Draft[] => {
    const parts = splitRows(columns, group, split);
    return parts.map((part, at): Draft => {
      const own = alone ? part.rows : part.rows.filter((row) => isFilled(columns, group, shared, row));
      for (const row of own) rowsTaken[row] = 1;
      const { rows, notAccepted, doubts } = collectRows(columns, group, own, dialect.delimiter, file);
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
          ...doubts,
          ...(part.byRestart && at > 0 && split === undefined
            ? [splitDoubt(columns.section.rows[part.rows[0]].line, file)]
            : []),
          ...reviewRun(rows, notAccepted, group.readingKind, file),
        ],
        proposals: proposeRows(rows, group.readingKind),
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
