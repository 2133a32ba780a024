import type { completeSheet, Run, Sheet } from '../../core/index.ts';

type RunFacts = Parameters<typeof completeSheet>[1];

/**
 * What the run says of itself, taken from the sheet as it was completed last time; until then the first guess, which
 * the next result corrects.
 */
export function sheetFacts(run: Run, last: Sheet | null): RunFacts {
  const kind = last?.titrant.kind.value;
  const rows = run.rows;
  const rises = rows.length > 1 && rows[rows.length - 1].reading >= rows[0].reading;
  const guess = rises === (run.readingKind === 'pH') ? 'base' : 'acid';
  return {
    readingKind: run.readingKind,
    titrantKind: kind === 'base' || kind === 'acid' ? kind : guess,
    groupsIfOpen: last?.sample.analytes[0]?.groups.value ?? 1,
  };
}
