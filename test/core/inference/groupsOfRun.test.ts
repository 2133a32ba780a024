import { describe, expect, it, vi } from 'vitest';
import type { RunResult } from '../../../core/results/runResult.ts';
import { type Experiment, perform, runOf, sheetOf, usualErrors, workUp } from '../../experiment.ts';

// Ten times what the slowest of these take alone: other tests want the same cores.
vi.setConfig({ testTimeout: 30_000 });

/** Works a run up as a user does who does not know the number of groups, only what was weighed. */
function climb(experiment: Experiment, declaredNoise: boolean): RunResult {
  const { volumes_mL, readings } = perform(experiment);
  const { sample, ...rest } = sheetOf(experiment, {
    sample: { strongIon_M: null, analytes: null },
    reading: declaredNoise ? {} : { u: null },
    burette: declaredNoise ? {} : { uSetting_mL: null },
  });
  const { chargeFullyProtonated = 0, protonsLostAsWeighed } = experiment;
  // Where a base is titrated with an acid, its charge goes with the number of groups and is left open.
  const analyte = protonsLostAsWeighed === undefined ? { chargeFullyProtonated } : {};
  return workUp(runOf(volumes_mL, readings), { ...rest, sample: { ...sample, analytes: [analyte] } });
}

const cases: readonly (readonly [string, Experiment, number])[] = [
  ['a strong acid', { pKa: [], end_mL: 3.6 }, 0],
  ['a strong base with an acid', { pKa: [], titrant: 'acid', end_mL: 3.6 }, 0],
  ['an acid of one group', { pKa: [4.8], end_mL: 3.6 }, 1],
  [
    'a base of one group with an acid',
    { pKa: [9], chargeFullyProtonated: 1, protonsLostAsWeighed: 1, titrant: 'acid', end_mL: 3.6 },
    1,
  ],
  ['an acid of two groups far apart', { pKa: [3.5, 8.5], end_mL: 6.5 }, 2],
  ['an acid of two groups close together', { pKa: [4.2, 5.2], end_mL: 6.5 }, 2],
  ['an acid of three groups', { pKa: [3.1, 4.7, 6.4], end_mL: 9.5 }, 3],
  ['a dihydrochloride of three groups', { pKa: [3, 6.4, 9.5], chargeFullyProtonated: 2, end_mL: 10 }, 3],
];

describe('the number of groups, left open in the sheet,', () => {
  it.each(cases)('is found for %s, its noise declared or not', (_, experiment, groups) => {
    for (const declaredNoise of [true, false]) {
      const result = climb({ ...experiment, errors: { seed: 41, ...usualErrors } }, declaredNoise);
      expect(result.ending.code).toBe('fitted');
      const constants = result.quantities.filter(({ id }) => /^pKa\d$/.test(id));
      expect(constants.length, declaredNoise ? 'declared' : 'undeclared').toBe(groups);
      for (const { state } of constants) expect(state).toBe('fitted');
      expect(result.ladder?.sentence).toMatch(/^[A-Z].*\.$/);
    }
  });

  it('is not overestimated where points are few', () => {
    const result = climb({ pKa: [4.8], end_mL: 3.6, points: 6, errors: { seed: 41, ...usualErrors } }, true);
    expect(result.quantities.filter(({ id }) => /^pKa\d$/.test(id)).length).toBeLessThanOrEqual(1);
  });
});
