import { describe, expect, it } from 'vitest';
import { chooseGroups, type Ladder } from '../../../core/inference/chooseGroups.ts';
import { completeSheet } from '../../../core/sheet/completeSheet.ts';
import { type Experiment, perform, sheetOf, usualErrors } from '../../experiment.ts';

function climb(experiment: Experiment, facts: { readonly declaredNoise: boolean }): Ladder {
  const { volumes_mL, readings } = perform(experiment);
  const { sample, reading, ...rest } = sheetOf(experiment, {
    reading: facts.declaredNoise ? {} : { u: null },
    burette: facts.declaredNoise ? {} : { uSetting_mL: null },
  });
  const { analytes: _, strongIon_M: __, ...vessel } = sample ?? {};
  const { chargeFullyProtonated = 0, protonsLostAsWeighed } = experiment;
  const climbing = chooseGroups(
    (groups) => {
      // What a user knows who does not know the number of groups: what was weighed, or nothing.
      const analyte = protonsLostAsWeighed === undefined ? { chargeFullyProtonated } : {};
      const sheet = completeSheet(
        { ...rest, sample: { ...vessel, analytes: [analyte] }, ...(reading === undefined ? {} : { reading }) },
        { readingKind: 'pH', titrantKind: experiment.titrant ?? 'base', groupsIfOpen: groups },
      );
      if (!sheet.ok) throw new Error(JSON.stringify(sheet.refusals));
      return sheet.value;
    },
    volumes_mL,
    readings,
  );
  const told: number[] = [];
  let step = climbing.next();
  while (step.done !== true) {
    told.push(step.value);
    step = climbing.next();
  }
  expect(told).toEqual(step.value.rungs.map(({ groups }) => groups));
  return step.value;
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

describe('the ladder', () => {
  it.each(cases)('finds the groups of %s, its noise declared or not', (_, experiment, groups) => {
    for (const declaredNoise of [true, false]) {
      const { chosen, rungs } = climb({ ...experiment, errors: { seed: 41, ...usualErrors } }, { declaredNoise });
      expect(chosen.groups, declaredNoise ? 'declared' : 'undeclared').toBe(groups);
      expect(rungs).toContain(chosen);
      expect(chosen.fitted).not.toBeNull();
    }
  });

  it('ends where the points run out', () => {
    const { chosen, rungs } = climb({ pKa: [4.8], end_mL: 3.6, points: 4 }, { declaredNoise: true });
    // A group more needs a constant and an amount, and one point beyond all of them.
    expect(rungs.at(-1)).toMatchObject({ fitted: null, aicc: null });
    expect(chosen.groups).toBeLessThanOrEqual(1);
  });
});
