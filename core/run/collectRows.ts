import type { Refusal } from '../notice/refusal.ts';
import { parseNumber } from '../table/parseNumber.ts';
import { quoteCell } from '../table/quoteCell.ts';
import type { Delimiter } from '../table/splitCells.ts';
import type { TableRow } from '../table/table.ts';
import { unitBehind } from '../table/unitBehind.ts';
import { millivolts } from '../units/potential.ts';
import { millilitres } from '../units/volume.ts';
import type { ColumnGroup } from './columnGroup.ts';
import type { RowDecision, RunRow } from './run.ts';
import type { SectionColumns } from './sectionColumns.ts';

export interface CollectedRows {
  readonly rows: readonly RunRow[];
  readonly notAccepted: readonly Refusal[];
}

const USED: RowDecision = { use: 'used' };

/** Largest volume that any titration doses, mL; beyond it a number would overflow later sums. */
const LARGEST_VOLUME_ML = 1e5;

/**
 * Turns the rows of one run into points in mL and pH or mV. Rows without two
 * numbers are refused one by one; numbers beyond what can be are kept and
 * excluded by rule.
 */
export function collectRows(
  columns: SectionColumns,
  group: ColumnGroup,
  indices: readonly number[],
  delimiter: Delimiter,
  file: string,
): CollectedRows {
  const rows: RunRow[] = [];
  const notAccepted: Refusal[] = [];
  const volumes = columns.section.values[group.volume];
  const readings = columns.section.values[group.reading];
  for (const index of indices) {
    const source = columns.section.rows[index];
    const misfit = widthRefusal(columns, source, delimiter, file);
    if (misfit !== undefined) {
      notAccepted.push(misfit);
      continue;
    }
    if (Number.isNaN(volumes[index]) || Number.isNaN(readings[index])) {
      notAccepted.push(cellRefusal(columns, group, source, Number.isNaN(volumes[index]), file));
      continue;
    }
    const volume_mL = toMillilitres(volumes[index], source.cells[group.volume], group);
    const reading = toReading(readings[index], source.cells[group.reading], group);
    if (volume_mL === undefined || reading === undefined) {
      notAccepted.push(cellRefusal(columns, group, source, volume_mL === undefined, file));
      continue;
    }
    rows.push({ line: source.line, volume_mL, reading, decision: decide(volume_mL, reading, group) });
  }
  return { rows, notAccepted };
}

/** Undefined where the cell names a unit of something else, or the number leaves the range of doubles. */
function toMillilitres(value: number, cell: string, group: ColumnGroup): number | undefined {
  const unit = unitBehind(cell) ?? group.volumeUnit;
  if (unit !== 'mL' && unit !== 'µL' && unit !== 'L') return undefined;
  return finite(millilitres(value, unit));
}

function toReading(value: number, cell: string, group: ColumnGroup): number | undefined {
  const unit = unitBehind(cell);
  if (group.readingKind === 'pH') return unit === undefined || unit === 'pH' ? value : undefined;
  if (unit !== undefined && unit !== 'mV' && unit !== 'V') return undefined;
  return finite(millivolts(value, unit ?? group.potentialUnit));
}

function finite(value: number): number | undefined {
  return Number.isFinite(value) ? value : undefined;
}

function decide(volume_mL: number, reading: number, group: ColumnGroup): RowDecision {
  if (volume_mL < 0) return excluded(`the volume ${volume_mL} mL is negative`);
  if (volume_mL > LARGEST_VOLUME_ML) return excluded(`no burette gives ${volume_mL} mL`);
  if (group.readingKind === 'pH') {
    return reading >= 0 && reading <= 14 ? USED : excluded(`the reading ${reading} lies beyond pH 0–14`);
  }
  return Math.abs(reading) <= 2000 ? USED : excluded(`the reading ${reading} mV lies beyond ±2000 mV`);
}

function excluded(why: string): RowDecision {
  return { use: 'excluded', by: 'rule', why };
}

/** A row with more numbers than there are columns, or with cells missing where only blanks part them, is shifted. */
function widthRefusal(
  { section, marks }: SectionColumns,
  { line, cells }: TableRow,
  delimiter: Delimiter,
  file: string,
): Refusal | undefined {
  const { width } = section;
  let found = cells.length;
  if (found > width) {
    const surplus = cells.findIndex((cell, column) => column >= width && typeof parseNumber(cell, marks) === 'number');
    if (surplus < 0) return undefined;
  } else if (delimiter !== 'spaces' || found === width) {
    return undefined;
  }
  found = cells.filter((cell) => cell.trim() !== '').length;
  return {
    code: 'row-wrong-width',
    message: `The row has ${found} ${found === 1 ? 'cell' : 'cells'} where the table has ${width} columns, so that its numbers cannot be told apart: ${quoteCell(cells.join(' '))}.`,
    remedy: 'Look for a decimal comma, a missing cell or a number too many in this line.',
    place: { file, line, column: Math.min(cells.length, width + 1) },
  };
}

function cellRefusal(
  { section, marks }: SectionColumns,
  group: ColumnGroup,
  { line, cells }: TableRow,
  volumeIsBad: boolean,
  file: string,
): Refusal {
  const column = volumeIsBad ? group.volume : group.reading;
  const what = volumeIsBad ? 'volume' : group.readingKind === 'pH' ? 'pH' : 'potential';
  const cell = cells[column] ?? '';
  const missing = parseNumber(cell, marks) === 'missing';
  const blank = cell.trim() === '';
  const message = blank
    ? `The cell for the ${what} is empty.`
    : missing
      ? `${quoteCell(cell)} stands for a missing value where the ${what} belongs.`
      : `${quoteCell(cell)} stands where the ${what} belongs and cannot be read as one.`;
  const remedy = missing
    ? 'Nothing, if the point was not measured; else write the number into the cell.'
    : `Write the number into the cell, with a decimal ${marks.decimal === '.' ? 'point' : 'comma'} as in the rest of the file.`;
  const place = { file, line, column: Math.min(column, section.width - 1) + 1 };
  return { code: missing ? 'cell-missing' : 'cell-not-a-number', message, remedy, place };
}
