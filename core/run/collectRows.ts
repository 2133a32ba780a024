import type { Doubt } from '../notice/doubt.ts';
import type { Refusal } from '../notice/refusal.ts';
import { parseNumber } from '../table/parseNumber.ts';
import { quoteCell } from '../table/quoteCell.ts';
import type { Delimiter } from '../table/splitCells.ts';
import type { TableRow } from '../table/table.ts';
import { unitBehind } from '../table/unitBehind.ts';
import { millivolts } from '../units/potential.ts';
import { millilitres } from '../units/volume.ts';
import type { ColumnGroup } from './columnGroup.ts';
import { readTime } from './readTime.ts';
import type { RowDecision, RunRow } from './run.ts';
import type { SectionColumns } from './sectionColumns.ts';
import { volumesAdded } from './volumesAdded.ts';

export interface CollectedRows {
  readonly rows: readonly RunRow[];
  readonly notAccepted: readonly Refusal[];
  /** 'dose-missing' where the volumes are sums of which one part is not known. */
  readonly doubts: readonly Doubt[];
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
  const { section } = columns;
  const readings = section.values[group.reading];
  const shown_mL = new Float64Array(indices.length);
  indices.forEach((index, at) => {
    const { cells } = section.rows[index];
    const fits = fitsWidth(columns, cells, delimiter);
    shown_mL[at] = fits
      ? toMillilitres(section.values[group.volume][index], cells[group.volume] ?? '', group)
      : Number.NaN;
  });
  const { added_mL, firstGap } = volumesAdded(shown_mL, group.volumeMeaning);
  indices.forEach((index, at) => {
    const source = section.rows[index];
    if (!fitsWidth(columns, source.cells, delimiter)) {
      notAccepted.push(widthRefusal(columns, source, file));
      return;
    }
    const volume_mL = added_mL[at];
    const reading = toReading(readings[index], source.cells[group.reading] ?? '', group);
    if (!Number.isFinite(volume_mL) || !Number.isFinite(reading)) {
      notAccepted.push(cellRefusal(columns, group, source, !Number.isFinite(volume_mL), file));
      return;
    }
    const row: Writable<RunRow> = {
      line: source.line,
      volume_mL,
      reading,
      decision: decide(volume_mL, reading, group),
    };
    addBesides(row, columns, group, index);
    rows.push(row);
  });
  const doubts = firstGap < 0 ? [] : [doseMissing(section.rows[indices[firstGap]].line, file)];
  return { rows, notAccepted, doubts };
}

type Writable<Value> = { -readonly [Key in keyof Value]: Value[Key] };

/** Temperature and time of a row, as far as the file gives them. */
function addBesides(row: Writable<RunRow>, { section }: SectionColumns, group: ColumnGroup, index: number): void {
  if (group.temperature !== undefined) {
    const value = section.values[group.temperature][index];
    const temperature = group.temperatureUnit === 'K' ? value - 273.15 : value;
    if (Number.isFinite(temperature)) row.temperature_C = temperature;
  }
  if (group.time !== undefined) {
    const { cells } = section.rows[index];
    const time = readTime(section.values[group.time][index], cells[group.time] ?? '', group.timeUnit);
    if (time !== undefined) row.time_s = time;
  }
}

function doseMissing(line: number, file: string): Doubt {
  return {
    code: 'dose-missing',
    seen: `The addition in line ${line} is not known, and the volumes after it are sums of additions.`,
    means: 'Every volume from there on is too small by what was added.',
    remedy: 'Write the addition into the file, or leave out the rows after it.',
    place: { file, line },
  };
}

/** NaN where the cell names a unit of something else, or the number leaves the range of doubles. */
function toMillilitres(value: number, cell: string, group: ColumnGroup): number {
  const unit = (group.volumeUnitDecided ? undefined : unitBehind(cell)) ?? group.volumeUnit;
  if (unit !== 'mL' && unit !== 'µL' && unit !== 'L') return Number.NaN;
  return finite(millilitres(value, unit));
}

function toReading(value: number, cell: string, group: ColumnGroup): number {
  const unit = group.readingUnitDecided ? undefined : unitBehind(cell);
  if (group.readingKind === 'pH') return unit === undefined || unit === 'pH' ? value : Number.NaN;
  if (unit !== undefined && unit !== 'mV' && unit !== 'V') return Number.NaN;
  return finite(millivolts(value, unit ?? group.potentialUnit));
}

function finite(value: number): number {
  return Number.isFinite(value) ? value : Number.NaN;
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
function fitsWidth(
  { section: { width }, marks }: SectionColumns,
  cells: readonly string[],
  delimiter: Delimiter,
): boolean {
  if (cells.length === width) return true;
  if (cells.length < width) return delimiter !== 'spaces';
  return !cells.some((cell, column) => column >= width && typeof parseNumber(cell, marks) === 'number');
}

function widthRefusal({ section: { width } }: SectionColumns, { line, cells }: TableRow, file: string): Refusal {
  const found = cells.filter((cell) => cell.trim() !== '').length;
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
