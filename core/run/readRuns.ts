import type { Outcome } from '../notice/outcome.ts';
import { readTable } from '../table/readTable.ts';
import { formRuns } from './formRuns.ts';
import type { ReadingOverrules } from './readingChoices.ts';
import type { Run } from './run.ts';

/**
 * The whole way from the bytes of an export to its runs. Every data row of the
 * file is, in one of the runs, a row (used or excluded by rule) or not accepted.
 * What a person has decided in `overrules` is taken as it is.
 *
 * Refuses with the codes of `readTable` and `formRuns`.
 */
export function readRuns(
  bytes: Uint8Array,
  fileName: string,
  overrules: ReadingOverrules = {},
): Outcome<readonly Run[]> {
  const table = readTable(bytes, fileName, overrules);
  if (!table.ok) return table;
  const formed = formRuns(table.value, overrules);
  return formed.ok ? { ok: true, value: formed.value.runs } : formed;
}
