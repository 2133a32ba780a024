import { type ReadExport, readExport } from '../../../core/run/readExport.ts';
import { readTable } from '../../../core/table/readTable.ts';

/**
 * Reads any file and throws where the account of its rows does not come out:
 * every row of its tables is used, excluded or not accepted, no line stands
 * twice in a run, and no number is none. Returns whether runs could be formed.
 */
export function accountFor(bytes: Uint8Array): boolean {
  const outcome = readExport(bytes, 'any.csv');
  if (!outcome.ok) {
    check(outcome.refusals.length === 1, 'one refusal');
    check(!/NaN|undefined/.test(outcome.refusals[0].message), outcome.refusals[0].message);
    return false;
  }
  const table = readTable(bytes, 'any.csv');
  if (!table.ok) throw new Error('runs without a table');
  const inFile = new Set<number>();
  for (const { rows } of table.value.sections) {
    for (const { line } of rows) {
      check(!inFile.has(line), `line ${line} is two rows`);
      inFile.add(line);
    }
  }
  accountForRuns(outcome.value, inFile);
  const { rows, used, excluded, notAccepted } = outcome.value.view.counts;
  check(rows === inFile.size && used + excluded + notAccepted === rows, 'the counts do not add up');
  return true;
}

function accountForRuns({ runs }: ReadExport, inFile: ReadonlySet<number>): void {
  // Runs side by side share their lines, so lines are compared and not counted.
  const inRuns = new Set<number>();
  for (const { rows, notAccepted, doubts, proposals = [] } of runs) {
    const lines = new Set<number>();
    const take = (line: number): void => {
      check(!lines.has(line), `line ${line} twice in a run`);
      check(inFile.has(line), `line ${line} is no row`);
      lines.add(line);
      inRuns.add(line);
    };
    for (const { line, volume_mL, reading, temperature_C = 0, time_s = 0 } of rows) {
      take(line);
      const finite = [volume_mL, reading, temperature_C, time_s].every(Number.isFinite);
      check(finite, 'a number that is none');
    }
    for (const { place } of notAccepted) take(place.line ?? -1);
    for (const { seen } of doubts) check(!/NaN|undefined/.test(seen), seen);
    for (const { lines: about, why } of proposals) {
      check(about.length > 0 && about.every((line) => lines.has(line)), 'a proposal about no row');
      check(!/NaN|undefined/.test(why), why);
    }
  }
  check(inRuns.size === inFile.size, 'a row was lost');
}

/** Assertions of the test runner take longer than the reading itself. */
function check(holds: boolean, otherwise: string): void {
  if (!holds) throw new Error(otherwise);
}
