import { effectiveWidth } from './effectiveWidth.ts';
import type { NumberMarks } from './numberMarks.ts';
import { parseNumber } from './parseNumber.ts';

/** How well a set of lines reads with one delimiter and one way to write numbers. */
export interface MarksScore {
  /** Comparable between readings of the same lines; 0 where no line holds two numbers. */
  readonly score: number;
  /** Lines with at least two numbers, as indices into the lines scored. */
  readonly dataLines: readonly number[];
}

/** A cell that still holds a delimiter between figures was split at the wrong mark. */
const TORN = /\d\s*[;\t|]\s*[-+\d.,]/;

/** What a line counts whose number of cells is not the usual one, or whose cells are torn. */
const UNUSUAL_WIDTH = 0.5;
const TORN_LINE = 0.2;

/**
 * A step back in a column that otherwise never steps back costs more than a
 * line that cannot be read: refusing "12,345" among 12.3 and 12.4 is better
 * than reading twelve thousand.
 */
const COST_OF_BREAK = 2;
const MONOTONE_UP_TO = 0.1;
const MAXIMUM_BREAK_COST = 0.2;

const WEIGHT_OF_RANGE = 0.2;
const LARGEST_PH = 14;
const LARGEST_MILLIVOLTS = 2000;

/**
 * Scores one reading of the lines: every line with two numbers or more counts
 * by the share of its filled cells that are numbers; columns that almost never
 * step back, and values in the range of pH or mV, decide between readings that
 * take the same cells for different numbers.
 */
export function scoreMarks(cellsOfLines: readonly (readonly string[])[], marks: NumberMarks): MarksScore {
  const dataLines: number[] = [];
  const qualities: number[] = [];
  const widths = new Map<number, number>();
  const columns: number[][] = [];
  for (let index = 0; index < cellsOfLines.length; index++) {
    const cells = cellsOfLines[index];
    const values = cells.map((cell) => parseNumber(cell, marks));
    const numbers = values.filter((value) => typeof value === 'number').length;
    if (numbers < 2) continue;
    const texts = values.filter((value) => value === 'text').length;
    const torn = cells.some((cell, column) => values[column] === 'text' && TORN.test(cell));
    dataLines.push(index);
    qualities.push((numbers / (numbers + texts)) * (torn ? TORN_LINE : 1));
    const width = effectiveWidth(cells);
    widths.set(width, (widths.get(width) ?? 0) + 1);
    values.forEach((value, column) => {
      columns[column] ??= [];
      if (typeof value === 'number') columns[column].push(value);
    });
  }
  if (dataLines.length === 0) return { score: 0, dataLines };

  const usual = mostFrequent(widths);
  const quality = dataLines.reduce((sum, line, at) => {
    return sum + qualities[at] * (effectiveWidth(cellsOfLines[line]) === usual ? 1 : UNUSUAL_WIDTH);
  }, 0);
  const filled = columns.filter((column) => column !== undefined && column.length * 2 > dataLines.length);
  const breaks = filled.reduce((sum, column) => sum + costOfBreaks(column), 0);
  const range = Math.max(0, ...filled.slice(1).map(inRange)) * WEIGHT_OF_RANGE * quality;
  const score = quality + range - Math.min(breaks, MAXIMUM_BREAK_COST * dataLines.length);
  return { score, dataLines };
}

function mostFrequent(counts: ReadonlyMap<number, number>): number {
  let best = 0;
  for (const [value, count] of counts) if (count > (counts.get(best) ?? 0)) best = value;
  return best;
}

function costOfBreaks(column: readonly number[]): number {
  let rises = 0;
  let falls = 0;
  for (let index = 1; index < column.length; index++) {
    if (column[index] > column[index - 1]) rises += 1;
    else if (column[index] < column[index - 1]) falls += 1;
  }
  const breaks = Math.min(rises, falls);
  return breaks > MONOTONE_UP_TO * column.length ? 0 : COST_OF_BREAK * breaks;
}

function inRange(column: readonly number[]): number {
  const pH = column.filter((value) => value >= 0 && value <= LARGEST_PH).length;
  const millivolts = column.filter((value) => Math.abs(value) <= LARGEST_MILLIVOLTS).length;
  return Math.max(pH, millivolts / 2) / column.length;
}
