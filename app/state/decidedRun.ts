import type { Run } from '../../core/index.ts';
import { fileShelf } from './fileShelf.ts';
import type { RunInput } from './inputs.ts';

const decided = new WeakMap<RunInput, Run>();

/** The run of an input with the person's decisions about its rows. The same input gives the same object. */
export function decidedRun(input: RunInput): Run {
  const known = decided.get(input);
  if (known !== undefined) return known;
  const read = fileShelf.get(input.file).runs[input.index];
  const run: Run =
    input.decisions.size === 0
      ? read
      : {
          ...read,
          rows: read.rows.map((row) => ({ ...row, decision: input.decisions.get(row.line) ?? row.decision })),
        };
  decided.set(input, run);
  return run;
}
