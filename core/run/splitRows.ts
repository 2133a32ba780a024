import type { ColumnGroup } from './columnGroup.ts';
import type { RunSplit } from './readingChoices.ts';
import type { SectionColumns } from './sectionColumns.ts';

/** Rows of a table, as indices in order, that make one run. */
export interface RowGroup {
  readonly label?: string;
  readonly rows: readonly number[];
  /** Whether only the volume starting again told this run from the one before it. */
  readonly byRestart: boolean;
}

/** Points that a run must have before its volume can start again, and after. */
const POINTS_BEFORE = 4;
const POINTS_AFTER = 3;

/** Within this share of the range of volumes a value counts as the end, or as the start, of a run. */
const NEAR = 0.1;

/**
 * Parts the rows of a table into runs: by the labels of a sample column, and
 * where the volume starts again, or only as a person has asked.
 */
export function splitRows(columns: SectionColumns, group: ColumnGroup, asked?: RunSplit): readonly RowGroup[] {
  const labelled = byLabel(columns, asked === undefined || asked === 'sampleColumn' ? group.sample : undefined);
  if (asked !== undefined && asked !== 'restart') return labelled.map((part) => ({ ...part, byRestart: false }));
  if (group.volumeMeaning === 'increments') return labelled.flatMap((part) => byZeroIncrement(columns, group, part));
  const sign = group.volumeMeaning === 'countingDown' ? -1 : 1;
  const volumes = columns.section.values[group.volume];
  const upwards = sign > 0 ? volumes : volumes.map((value) => -value);
  return labelled.flatMap(({ label, rows }) => {
    const parts = byRestart(upwards, rows);
    return parts.map((part, index) => ({
      ...(label === undefined ? {} : { label: parts.length > 1 ? `${label} ${index + 1}` : label }),
      rows: part,
      byRestart: parts.length > 1,
    }));
  });
}

/** Additions start again with one of nothing, where the reading goes back to where it was at first. */
function byZeroIncrement(
  columns: SectionColumns,
  group: ColumnGroup,
  { label, rows }: { readonly label?: string; readonly rows: readonly number[] },
): RowGroup[] {
  const values = columns.section.values[group.volume];
  const readings = columns.section.values[group.reading];
  const parts: number[][] = [[]];
  rows.forEach((row, at) => {
    const current = parts[parts.length - 1];
    const goesBack =
      at > 0 && Math.abs(readings[row] - readings[current[0]]) < Math.abs(readings[row] - readings[rows[at - 1]]);
    const longEnough = current.length >= POINTS_BEFORE && at + POINTS_AFTER <= rows.length;
    if (values[row] === 0 && longEnough && goesBack) parts.push([]);
    parts[parts.length - 1].push(row);
  });
  return parts.map((part, index) => ({
    ...(label === undefined ? {} : { label: parts.length > 1 ? `${label} ${index + 1}` : label }),
    rows: part,
    byRestart: parts.length > 1,
  }));
}

function byLabel(columns: SectionColumns, sample: number | undefined): { label?: string; rows: number[] }[] {
  const rows = columns.section.rows;
  if (sample === undefined) return [{ rows: rows.map((_, index) => index) }];
  const groups = new Map<string, number[]>();
  let current = '';
  rows.forEach(({ cells }, index) => {
    // Merged cells of spreadsheets leave the label in the first row of its block only.
    current = (cells[sample] ?? '').trim() || current;
    const group = groups.get(current);
    if (group === undefined) groups.set(current, [index]);
    else group.push(index);
  });
  return [...groups].map(([label, indices]) => ({ ...(label === '' ? {} : { label }), rows: indices }));
}

/**
 * Parts rows where the volume falls from near the top of a rising stretch to
 * near its bottom and rises on from there. One slipped digit, a table that
 * runs backwards and a refill do none of the three.
 */
function byRestart(volumes: Float64Array, rows: readonly number[]): readonly (readonly number[])[] {
  const numeric = rows.filter((row) => !Number.isNaN(volumes[row]));
  const starts: number[] = [];
  let minimum = Number.POSITIVE_INFINITY;
  let maximum = Number.NEGATIVE_INFINITY;
  let count = 0;
  let falls = 0;
  numeric.forEach((row, at) => {
    const value = volumes[row];
    const previous = at > 0 ? volumes[numeric[at - 1]] : value;
    if (value < previous && count >= POINTS_BEFORE && at + POINTS_AFTER <= numeric.length) {
      const next = volumes[numeric[at + 1]];
      const afterNext = volumes[numeric[at + 2]];
      const near = NEAR * (maximum - minimum);
      const startsAgain = previous >= maximum - near && value <= minimum + near && near > 0;
      if (startsAgain && falls <= NEAR * count && next >= value && afterNext >= next && next < previous) {
        starts.push(row);
        minimum = Number.POSITIVE_INFINITY;
        maximum = Number.NEGATIVE_INFINITY;
        count = 0;
        falls = 0;
      }
    }
    if (count > 0 && value < previous) falls += 1;
    minimum = Math.min(minimum, value);
    maximum = Math.max(maximum, value);
    count += 1;
  });
  if (starts.length === 0) return [rows];
  const parts: number[][] = [[]];
  let next = 0;
  for (const row of rows) {
    if (row === starts[next]) {
      parts.push([]);
      next += 1;
    }
    parts[parts.length - 1].push(row);
  }
  return parts;
}
