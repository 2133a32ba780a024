import { describe, expect, it } from 'vitest';
import type { SheetChanges } from '../../../experiment.ts';
import { fitExperiment, soundExperiment } from './soundRuns.ts';

/** Of 300 such runs, 6 or 7 raise a doubt with each kind of noise (2 %); this is a shorter look at the same. */
const runs = 40;

describe.each([
  ['declared', {}],
  ['estimated', { reading: { u: null } }],
] as const satisfies readonly (readonly [string, SheetChanges])[])('sound runs with noise that is %s', (_, changes) => {
  const results = Array.from({ length: runs }, (_, seed) => fitExperiment(soundExperiment(seed), changes));

  it('are all fitted', () => {
    for (const { ending } of results) expect(ending.code).toBe('fitted');
  });

  it('raise hardly a doubt', () => {
    const doubted = results.flatMap(({ doubts }) => (doubts.length === 0 ? [] : [doubts.map(({ code }) => code)]));
    // At 3 % per run, more than 4 of 40 are a one in 160 event.
    expect(doubted.length, doubted.join('; ')).toBeLessThanOrEqual(4);
  });

  it('have no point that is not trusted', () => {
    const distrusting = results.filter(({ robust }) => robust === null || robust.distrusted.length > 0);
    // One run in 100 by measurement; at the 5 % that are allowed, more than 5 of 40 are a one in 80 event.
    expect(distrusting.length).toBeLessThanOrEqual(5);
  });
});
