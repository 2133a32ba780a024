import type { ExportUnit } from '../units/readUnit.ts';

/** Seconds. */
const DAY = 86400;

const CLOCK = /(\d{1,3}):([0-5]\d)(?::([0-5]\d(?:[.,]\d+)?))?\s*$/;
const YEAR_FIRST = /^\s*(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})[T\s]/;
const DAY_FIRST = /^\s*(\d{1,2})\.(\d{1,2})\.(\d{4})\s/;

/**
 * The time in a cell, in seconds from whatever the file counts from: a number
 * in `unit` (seconds where that is no unit of time), "0:03:20", "10:15" or a
 * date with a time of day. Undefined where the cell holds none.
 */
export function readTime(value: number, cell: string, unit: ExportUnit | undefined): number | undefined {
  if (!Number.isNaN(value)) {
    const seconds = unit === 'min' ? 60 * value : unit === 'h' ? 3600 * value : value;
    return Number.isFinite(seconds) ? seconds : undefined;
  }
  const clock = CLOCK.exec(cell);
  if (clock === null) return undefined;
  // Two parts are hours and minutes, as on the clock.
  const ofDay = 3600 * Number(clock[1]) + 60 * Number(clock[2]) + Number((clock[3] ?? '0').replace(',', '.'));
  const date = YEAR_FIRST.exec(cell);
  if (date !== null) return ofDay + dayNumber(Number(date[1]), Number(date[2]), Number(date[3])) * DAY;
  const day = DAY_FIRST.exec(cell);
  return day === null ? ofDay : ofDay + dayNumber(Number(day[3]), Number(day[2]), Number(day[1])) * DAY;
}

/** Days of the Gregorian calendar; the year begins with March, so that the leap day is its last. */
function dayNumber(year: number, month: number, day: number): number {
  const y = month < 3 ? year - 1 : year;
  const m = month < 3 ? month + 9 : month - 3;
  return 365 * y + Math.floor(y / 4) - Math.floor(y / 100) + Math.floor(y / 400) + Math.floor((153 * m + 2) / 5) + day;
}
