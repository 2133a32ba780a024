import { changeInputs } from './inputStore.ts';
import type { RunInput } from './inputs.ts';

/** Changes what was decided about the run that is shown. */
export function changeShownRun(words: string, change: (run: RunInput) => RunInput): void {
  changeInputs(words, (inputs) => {
    const run = inputs.runs[inputs.shown];
    if (run === undefined) return inputs;
    const changed = change(run);
    if (changed === run) return inputs;
    return { ...inputs, runs: inputs.runs.map((other) => (other === run ? changed : other)) };
  });
}
