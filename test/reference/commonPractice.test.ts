import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Equilibrium } from '../../core/chemistry/equilibrium.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { modelOfSheet, readingsOfSheet } from '../modelOfSheet.ts';

// Rules that every analyst knows; common practice, no source.

function twoGroupAcid(concentration_M: number, pKa: readonly number[]): SheetFile {
  return {
    sheet: 1,
    sample: {
      volume_mL: 20,
      strongIon_M: 0,
      carbonate_M: 0,
      background_M: 0,
      analytes: [{ groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 0, concentration_M, pKa: [...pKa] }],
    },
    titrant: { kind: 'base', concentration_M, strengthMeans: 'hydroxide', carbonate_M: 0, background_M: 0 },
    medium: { temperature_C: 25, activity: 'none', pKw: 14 },
    reading: { kind: 'pH', scale: 'concentration', offset: 0, slope: 1 },
  };
}

describe('common practice', () => {
  it.each([0.05, 0.1, 0.3])('a two-group acid with pKa 3 and 9 at %f M shows them half-way', (concentration_M) => {
    // As strong as the acid, so that an equivalence takes the 20 mL of the sample.
    const halfWay = readingsOfSheet(twoGroupAcid(concentration_M, [3, 9]), [10, 20, 30]);
    // Free H⁺ at the first half-way and OH⁻ at the last, against what is left of the acid, allow 0.05.
    [3, 6, 9].forEach((expected, i) => {
      expect(Math.abs(halfWay[i] - expected)).toBeLessThan(0.05);
    });
  });

  it('the rule fails where it must: at 1 mM, half-way lies well above the first pKa', () => {
    const [halfWay] = readingsOfSheet(twoGroupAcid(0.001, [3, 9]), [10]);
    expect(halfWay).toBeGreaterThan(3.2);
  });

  it('two forms are equal exactly where the pH is the pKa of this medium between them', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 6 }),
        fc.integer({ min: -1, max: 3 }),
        fc.double({ min: 1, max: 4, noNaN: true }),
        fc.double({ min: 0.2, max: 1.8, noNaN: true }),
        (groups, chargeFullyProtonated, first, gap) => {
          const pKa = Array.from({ length: groups }, (_, k) => first + gap * k);
          const { balance } = new Equilibrium([{ groups, chargeFullyProtonated }], 0);
          balance.setConstants(pKa, 14);
          pKa.forEach((constant, k) => {
            balance.evaluate(Float64Array.of(0, 0, 0.01), -constant * Math.LN10, 0.1);
            // Each weight is a product of up to six exponentials of numbers up to 35, each good to 35 roundings.
            expect(Math.abs(balance.weights[k + 1] / balance.weights[k] - 1)).toBeLessThan(1e-13);
          });
        },
      ),
      { seed: 20263, numRuns: 100, endOnFailure: true },
    );
  });

  it('and so they are in the mixture of a run that reads this pH', () => {
    // Half-way itself is near, not exact, for free H⁺ takes part: the volume is sought at which the run reads 4.5.
    const sheet = twoGroupAcid(0.05, [4.5, 9.5]);
    let low = 0;
    let high = 20;
    for (let halving = 0; halving < 60; halving++) {
      const middle = (low + high) / 2;
      if (readingsOfSheet(sheet, [middle])[0] < 4.5) low = middle;
      else high = middle;
    }
    const { model, values } = modelOfSheet(sheet, [low]);
    const readings = new Float64Array(1);
    expect(model.predict(values, readings)).toBe(true);
    const { balance } = model.equilibrium;
    balance.evaluate(new Float64Array(3), model.logHydrogen[0], 0.1);
    // The volume is halved to rounding: the reading meets the constant to about 1e-13, the ratio to 3e-13.
    expect(Math.abs(balance.weights[1] / balance.weights[0] - 1)).toBeLessThan(1e-11);
  });
});
