import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { type IonicStrengthAlongRun, Speciation } from '../../../core/speciation/speciation.ts';
import { modelOfSheet } from '../../modelOfSheet.ts';

interface Case {
  readonly pKa: readonly number[];
  readonly chargeFullyProtonated?: number;
  readonly activity?: 'davies' | 'none';
  readonly scale?: 'activity' | 'concentration';
  readonly along?: IonicStrengthAlongRun;
}

const evenStrength: IonicStrengthAlongRun = { pH: Float64Array.of(2, 12), ionicStrength_M: Float64Array.of(0.1, 0.1) };
/** Rising, with a dip: as where a salt forms and the run dilutes. */
const uneven: IonicStrengthAlongRun = {
  pH: Float64Array.of(2, 4, 6, 9, 12),
  ionicStrength_M: Float64Array.of(0.01, 0.12, 0.05, 0.2, 0.15),
};

function speciationOf({
  pKa,
  chargeFullyProtonated = 0,
  activity = 'none',
  scale = 'activity',
  along = evenStrength,
}: Case) {
  const sheet: SheetFile = {
    sheet: 1,
    sample: { analytes: [{ pKa: [...pKa], chargeFullyProtonated, concentration_M: 0.01 }] },
    medium: { activity, pKw: 14 },
    reading: { kind: 'pH', scale },
  };
  const { design, values } = modelOfSheet(sheet, [0]);
  return new Speciation(design, values, along);
}

const arbitraryCase = fc.record({
  pKa: fc.array(fc.double({ min: 1, max: 13, noNaN: true }), { minLength: 1, maxLength: 6 }),
  chargeFullyProtonated: fc.integer({ min: -2, max: 4 }),
  activity: fc.constantFrom('davies' as const, 'none' as const),
  scale: fc.constantFrom('activity' as const, 'concentration' as const),
  along: fc.constantFrom(evenStrength, uneven),
});

describe('fractions', () => {
  it('sum to one and are none below zero, at any pH', () => {
    fc.assert(
      fc.property(arbitraryCase, fc.double({ min: -2, max: 16, noNaN: true }), (one, pH) => {
        const fractions = speciationOf(one).fractionsAt(0, pH);
        expect(fractions).toHaveLength(one.pKa.length + 1);
        // Rounding of at most seven terms.
        expect(Math.abs(fractions.reduce((sum, fraction) => sum + fraction, 0) - 1)).toBeLessThan(1e-14);
        for (const fraction of fractions) expect(fraction).toBeGreaterThanOrEqual(0);
      }),
      { seed: 1, numRuns: 300 },
    );
  });

  it('of an acid of one group without activity are those of the textbook', () => {
    // 1 / (1 + 10^(pH − pKa)): one in eleven where pH is one above.
    const speciation = speciationOf({ pKa: [5] });
    expect(speciation.fractionsAt(0, 6)[0]).toBeCloseTo(1 / 11, 12);
    expect(speciation.fractionsAt(0, 4)[0]).toBeCloseTo(10 / 11, 12);
    expect(speciation.meanChargeAt(0, 6)).toBeCloseTo(-10 / 11, 12);
  });
});

describe('where a group crosses', () => {
  it('both forms are equal, to rounding', () => {
    fc.assert(
      fc.property(arbitraryCase, (one) => {
        const speciation = speciationOf(one);
        one.pKa.forEach((_, group) => {
          const fractions = speciation.fractionsAt(0, speciation.crossing(0, group));
          // Forms that hardly exist cross as well, so the difference is taken relative to them.
          expect(Math.abs(fractions[group] / fractions[group + 1] - 1)).toBeLessThan(1e-10);
        });
      }),
      { seed: 2, numRuns: 200 },
    );
  });

  it('is the constant itself without an activity model', () => {
    expect(speciationOf({ pKa: [3, 8] }).crossing(0, 1)).toBeCloseTo(8, 12);
  });

  it('is the constant of the scale with Davies', () => {
    // A f(0.1) = 0.5116 (0.31623/1.31623 − 0.03) = 0.10757.
    const af = 0.10757;
    expect(speciationOf({ pKa: [5], activity: 'davies' }).crossing(0, 0)).toBeCloseTo(5 - af, 4);
    expect(speciationOf({ pKa: [5], activity: 'davies', scale: 'concentration' }).crossing(0, 0)).toBeCloseTo(
      5 - 2 * af,
      4,
    );
    // A cation acid: the two charged species balance, and H⁺ is an activity.
    expect(speciationOf({ pKa: [9], chargeFullyProtonated: 1, activity: 'davies' }).crossing(0, 0)).toBeCloseTo(
      9 + af,
      4,
    );
  });
});

describe('the isoelectric point', () => {
  it('of an ampholyte like glycine is the mean of its constants without activity', () => {
    expect(speciationOf({ pKa: [2.35, 9.78], chargeFullyProtonated: 1 }).isoelectricPoint(0)).toBeCloseTo(
      (2.35 + 9.78) / 2,
      10,
    );
  });

  it('has no net charge with Davies and uneven ionic strength either', () => {
    const speciation = speciationOf({
      pKa: [2.9, 6.4, 9.5],
      chargeFullyProtonated: 2,
      activity: 'davies',
      along: uneven,
    });
    const point = speciation.isoelectricPoint(0);
    expect(point).toBeGreaterThan(6.4);
    expect(point).toBeLessThan(9.5);
    expect(speciation.meanChargeAt(0, point ?? 0)).toBeCloseTo(0, 10);
  });

  it.each([
    ['an acid, whose charge only falls from zero', [4], 0],
    ['a base, whose charge only falls to zero', [9], 1],
    ['a dianion', [4, 9], -1],
    ['a dication', [4, 9], 3],
  ])('of %s is none', (_, pKa, chargeFullyProtonated) => {
    expect(speciationOf({ pKa, chargeFullyProtonated }).isoelectricPoint(0)).toBeNull();
  });
});

describe('ionic strength along a run', () => {
  const speciation = speciationOf({ pKa: [5], along: uneven });

  it('is that of the run at its points, straight between, and that of the end beyond', () => {
    expect(speciation.ionicStrengthAt(4)).toBe(0.12);
    expect(speciation.ionicStrengthAt(5)).toBeCloseTo(0.085, 12);
    expect(speciation.ionicStrengthAt(-1)).toBe(0.01);
    expect(speciation.ionicStrengthAt(15)).toBe(0.15);
  });

  it('is next to nothing where there is no run', () => {
    const alone = speciationOf({ pKa: [5], along: { pH: new Float64Array(0), ionicStrength_M: new Float64Array(0) } });
    expect(alone.ionicStrengthAt(7)).toBeLessThan(1e-6);
  });
});

describe('several systems', () => {
  it('are told apart', () => {
    const { design, values } = modelOfSheet(
      {
        sheet: 1,
        sample: {
          analytes: [
            { pKa: [3, 5], chargeFullyProtonated: 0, concentration_M: 0.01 },
            { name: 'other', pKa: [9], chargeFullyProtonated: 1, concentration_M: 0.01 },
          ],
        },
        medium: { activity: 'none', pKw: 14 },
        reading: { kind: 'pH' },
      },
      [0],
    );
    const speciation = new Speciation(design, values, evenStrength);
    expect(speciation.crossing(1, 0)).toBeCloseTo(9, 12);
    expect(speciation.fractionsAt(1, 9)).toEqual(Float64Array.of(0.5, 0.5));
    expect(speciation.fractionsAt(0, 5)[2]).toBeCloseTo(0.5, 2);
    expect(speciation.meanChargeAt(1, 9)).toBeCloseTo(0.5, 12);
  });
});
