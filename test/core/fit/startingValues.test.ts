import { describe, expect, it } from 'vitest';
import { startingValues } from '../../../core/fit/startingValues.ts';
import { type Experiment, experimentProblem, type SheetChanges, usualErrors } from '../../experiment.ts';

/** Largest distance of the best candidate from the truth; in pH for constants, relative for amounts. */
function distanceOfBest(experiment: Experiment, truth: Record<string, number>, changes: SheetChanges = {}): number {
  const [run] = experimentProblem({ ...experiment, errors: { seed: 6, ...usualErrors } }, changes).runs;
  const candidates = startingValues(run);
  expect(candidates.length).toBeLessThanOrEqual(200);
  for (const values of candidates) {
    expect(values).toHaveLength(run.design.quantities.length);
    expect(values.every(Number.isFinite)).toBe(true);
  }
  const distances = candidates.map((values) =>
    Math.max(
      ...Object.entries(truth).map(([id, value]) => {
        const found = values[run.design.quantities.findIndex((quantity) => quantity.id === id)];
        return id.includes('pKa') ? Math.abs(found - value) : Math.abs(found / value - 1);
      }),
    ),
  );
  return Math.min(...distances);
}

describe('one of the starting values is near the truth', () => {
  it.each([
    ['an acid of one group', { pKa: [4.8], end_mL: 3.6 }, { pKa1: 4.8, concentration: 0.01 }, {}],
    ['a diprotic acid', { pKa: [3.5, 7.5], end_mL: 6.5 }, { pKa1: 3.5, pKa2: 7.5, concentration: 0.01 }, {}],
    [
      'an ampholyte weighed as its hydrochloride',
      { pKa: [3, 6.4, 9.5], chargeFullyProtonated: 2, end_mL: 10 },
      { pKa1: 3, pKa2: 6.4, pKa3: 9.5, concentration: 0.01 },
      {},
    ],
    [
      'a diamine with an acid',
      { pKa: [6.8, 9.9], chargeFullyProtonated: 2, protonsLostAsWeighed: 2, titrant: 'acid', end_mL: 6.5 },
      { pKa1: 6.8, pKa2: 9.9, concentration: 0.01 },
      {},
    ],
    ['a strong acid', { pKa: [], end_mL: 3.6 }, { 'sample.strongIon': -0.01 }, {}],
    ['a strong base with an acid', { pKa: [], titrant: 'acid', end_mL: 3.6 }, { 'sample.strongIon': 0.01 }, {}],
    [
      'an acid of known amount with a base of unknown strength',
      { pKa: [4.8], end_mL: 3.6 },
      { pKa1: 4.8, 'titrant.concentration': 0.1 },
      {
        sample: { analytes: [{ groups: 1, concentration_M: 0.01, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }] },
        titrant: { concentration_M: 'fitted' },
      },
    ],
  ] as const satisfies readonly (readonly [string, Experiment, Record<string, number>, SheetChanges])[])(
    'for %s',
    (_, experiment, truth, changes) => {
      // A tenth in pH, a tenth of an amount: the basin of the fit is several times wider.
      expect(distanceOfBest(experiment, truth, changes)).toBeLessThan(0.1);
    },
  );
});

describe('declared starts', () => {
  it('are kept', () => {
    const [run] = experimentProblem(
      { pKa: [4.8], end_mL: 3.6 },
      {
        sample: {
          analytes: [
            {
              pKa: [{ fitted: true, start: 5.5 }],
              concentration_M: { fitted: true, start: 0.02 },
              protonsLostAsWeighed: 0,
            },
          ],
        },
      },
    ).runs;
    const position = (id: string) => run.design.quantities.findIndex((quantity) => quantity.id === id);
    for (const values of startingValues(run)) {
      expect(values[position('pKa1')]).toBe(5.5);
      expect(values[position('concentration')]).toBe(0.02);
    }
  });

  it('of fixed and known quantities are their values', () => {
    const [run] = experimentProblem(
      { pKa: [4.8], end_mL: 3.6 },
      { titrant: { concentration_M: { value: 0.1003, u: 0.0002 } } },
    ).runs;
    const position = (id: string) => run.design.quantities.findIndex((quantity) => quantity.id === id);
    for (const values of startingValues(run)) {
      expect(values[position('titrant.concentration')]).toBe(0.1003);
      expect(values[position('sample.volume')]).toBe(25);
    }
  });
});
