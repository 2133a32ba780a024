import { type ExportUnit, readUnit } from '../units/readUnit.ts';

const NUMBER_ONLY = /^[\d.,+\-eE\s]*$/;
const LEADING_NUMBER = /^[\s+\-‐‑‒–—−\d.,'’\u00a0\u2009\u202f]+(?:[eE][-+−]?\d+)?/;

/** The unit behind the number in a cell such as "12.50 mL"; undefined where the cell names none. */
export function unitBehind(cell: string): ExportUnit | undefined {
  if (NUMBER_ONLY.test(cell)) return undefined;
  return readUnit(cell.replace(LEADING_NUMBER, ''));
}
