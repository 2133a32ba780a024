import { describe, expect, it } from 'vitest';
import type { BootstrapReplicates, Progress } from '../../../core/index.ts';
import { bootstrapRun, type RepeatableResult } from '../../../core/results/bootstrapRun.ts';
import { sampleResult } from './sampleResult.ts';

function all(result: RepeatableResult, from: number, to: number): { value: BootstrapReplicates; steps: Progress[] } {
  const steps: Progress[] = [];
  const work = bootstrapRun(result, { from, to, seed: 1 });
  for (;;) {
    const step = work.next();
    if (step.done === true) return { value: step.value, steps };
    steps.push(step.value);
  }
}

describe('a share of the bootstrap of a result', () => {
  const result = sampleResult('phthalate.txt');

  it('gives the same replicates in one share and in two, with progress after each', () => {
    const whole = all(result, 0, 6);
    const [first, second] = [all(result, 0, 2), all(result, 2, 6)];
    expect([...first.value.replicates, ...second.value.replicates]).toEqual(whole.value.replicates);
    expect(whole.value.ids).toEqual(result.quantities.map(({ id }) => id));
    expect(second.steps.map(({ share }) => share)).toEqual([0, 0.25, 0.5, 0.75, 1]);
  });

  it('repeats the fit of the result: from its values the same as from scratch', () => {
    const open = result.quantities.map((quantity) => ({ ...quantity, value: null }));
    const fromValues = all(result, 0, 4).value.replicates;
    const fromScratch = all({ ...result, quantities: open }, 0, 4).value.replicates;
    result.quantities.forEach(({ u, state }, q) => {
      if (u === null || state !== 'fitted') return;
      fromValues.forEach((replicate, r) => {
        // Both fits end where steps are small beside u; one of scratch and one from the solution may differ by 1 % of it.
        expect(Math.abs((replicate?.[q] ?? Number.NaN) - (fromScratch[r]?.[q] ?? Number.NaN)) / u).toBeLessThan(0.01);
      });
    });
  });

  it('throws for a run that has no fit', () => {
    // Readings that no solution has.
    const run = { ...result.run, rows: result.run.rows.map((row) => ({ ...row, reading: 1e6 })) };
    expect(() => all({ ...result, run }, 0, 1)).toThrow('only a run that was fitted');
  });
});
