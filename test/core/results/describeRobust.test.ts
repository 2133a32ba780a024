import { describe, expect, it } from 'vitest';
import { type Experiment, perform, runOf, type SheetChanges, sheetOf, usualErrors } from '../../experiment.ts';
import { fitAsDeclared } from './checks/soundRuns.ts';

const diprotic: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, decimals: 3 };

describe.each([
  ['declared', {}],
  ['estimated', { reading: { u: null } }],
] as const satisfies readonly (readonly [string, SheetChanges])[])('with noise %s', (_, changes) => {
  // On a plateau, beside a step, at either end.
  it.each([3, 12, 30, 40, 57])(
    'a reading that slipped at point %i is named, and the robust answer does without it',
    (slipped) => {
      const { volumes_mL, readings } = perform({ ...diprotic, errors: { seed: 5, ...usualErrors } });
      readings[slipped] += 0.15;
      const { robust, quantities } = fitAsDeclared(runOf(volumes_mL, readings), sheetOf(diprotic, changes));
      expect(robust?.distrusted.map(({ line }) => line)).toContain(slipped + 2);
      expect(robust?.distrusted.length).toBeLessThanOrEqual(2);
      for (const { id, shift, inU } of robust?.moves ?? []) {
        const found = quantities.find((quantity) => quantity.id === id);
        const truth = id === 'pKa1' ? 3.5 : id === 'pKa2' ? 7.5 : 0.01;
        // Three standard uncertainties, which an estimate of the noise that the slip is part of only widens.
        expect(Math.abs((found?.value ?? 0) + shift - truth) / (found?.u ?? 0), id).toBeLessThan(3);
        expect(inU).toBeCloseTo(shift / (found?.u ?? 1), 12);
      }
    },
  );
});

it('has nothing to say where the model, and not single points, misses the readings', () => {
  const { volumes_mL, readings } = perform({ ...diprotic, pKa: [4, 6], errors: { seed: 5, ...usualErrors } });
  const { robust } = fitAsDeclared(runOf(volumes_mL, readings), sheetOf({ ...diprotic, pKa: [5] }));
  expect(robust?.distrusted.length ?? 0).toBe(0);
});
