import { completeSheet, type Run, type RunResult, type Sheet } from '../../core/index.ts';
import { decidedRun } from './decidedRun.ts';
import type { RunInput } from './inputs.ts';
import { sheetFacts } from './sheetFacts.ts';
import { useInputs } from './useInputs.ts';
import { useWork } from './useWork.ts';

export interface ShownRun {
  readonly input: RunInput;
  readonly run: Run;
  /** The sheet with what is assumed; null where it contradicts itself. */
  readonly sheet: Sheet | null;
  /** The latest result of this run and the input it belongs to; null before the first. */
  readonly latest: { readonly input: RunInput; readonly result: RunResult } | null;
  /** True where the result belongs to the inputs as they are now. */
  readonly isCurrent: boolean;
}

/** The run on the page with all that follows from it; null where there is none. */
export function useShownRun(): ShownRun | null {
  const { runs, shown } = useInputs(({ present }) => present);
  const latest = useWork((state) => state.latest);
  const input = runs[shown];
  if (input === undefined) return null;
  const run = decidedRun(input);
  const isCurrent = latest?.input === input;
  // Between two runs there is a moment in which the latest result is of the one before.
  const isOfThisRun = latest !== null && latest.input.file === input.file && latest.input.index === input.index;
  const own = isOfThisRun ? latest : null;
  if (isCurrent) return { input, run, sheet: latest.result.sheet, latest, isCurrent };
  const completed = completeSheet(input.sheet, sheetFacts(run, own?.result.sheet ?? null));
  return { input, run, sheet: completed.ok ? completed.value : null, latest: own, isCurrent };
}
