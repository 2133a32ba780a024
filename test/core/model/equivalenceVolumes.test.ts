import { describe, expect, it } from 'vitest';
import { equivalenceVolumes } from '../../../core/model/equivalenceVolumes.ts';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { modelOfSheet } from '../../modelOfSheet.ts';

/** Sheet parts that every case shares; 25 mL of sample, 0.1 mol/L of titrant. */
function sheet(sample: SheetFile['sample'], titrant: SheetFile['titrant'] = {}): SheetFile {
  return {
    sheet: 1,
    sample: { volume_mL: 25, ...sample },
    titrant: { kind: 'base', concentration_M: 0.1, ...titrant },
    medium: { activity: 'none', pKw: 14 },
    reading: { kind: 'pH', scale: 'concentration' },
  };
}

function volumesOf(declared: SheetFile) {
  const { design, values } = modelOfSheet(declared, [0]);
  return equivalenceVolumes(design, values);
}

/** Relative: the volumes are solutions of one linear equation. */
const rounding = 1e-12;

function expectVolumes(declared: SheetFile, expected: readonly number[]): void {
  const found = volumesOf(declared);
  expect(found.map(({ step }) => step)).toEqual(expected.map((_, k) => k + 1));
  expected.forEach((volume, k) => {
    expect(Math.abs(found[k].volume_mL / volume - 1), `step ${k + 1}: ${found[k].volume_mL}`).toBeLessThan(rounding);
  });
}

const weak = { name: 'acid X', concentration_M: 0.01, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 };

describe('equivalence volumes, by hand', () => {
  it('of an acid of one group: C V₀ / c', () => {
    expectVolumes(sheet({ analytes: [{ ...weak, pKa: [4.8] }] }), [2.5]);
  });

  it('of a triprotic acid: whole multiples', () => {
    expectVolumes(sheet({ analytes: [{ ...weak, pKa: [2, 7, 12] }] }), [2.5, 5, 7.5]);
  });

  it('of a monosodium salt: only the steps it still has with a base', () => {
    expectVolumes(sheet({ analytes: [{ ...weak, pKa: [3, 5.4], protonsLostAsWeighed: 1 }] }), [2.5]);
  });

  it('of a monosodium salt with an acid: the step back', () => {
    const analyte = { ...weak, pKa: [3, 5.4], protonsLostAsWeighed: 1 };
    expectVolumes(sheet({ analytes: [analyte] }, { kind: 'acid' }), [2.5]);
  });

  it('of an ampholyte weighed as its dihydrochloride', () => {
    const analyte = { ...weak, pKa: [2.9, 6.4, 9.5], chargeFullyProtonated: 2 };
    expectVolumes(sheet({ analytes: [analyte] }), [2.5, 5, 7.5]);
  });

  it('of a diamine with an acid, in the order of the titration', () => {
    const analyte = { ...weak, pKa: [6.8, 9.9], chargeFullyProtonated: 2, protonsLostAsWeighed: 2 };
    const declared = sheet({ analytes: [analyte] }, { kind: 'acid' });
    expectVolumes(declared, [2.5, 5]);
    expect(volumesOf(declared)[0].analyte).toBe('acid X');
  });

  it('are read on the burette: its gain divides them', () => {
    const declared = { ...sheet({ analytes: [{ ...weak, pKa: [4.8] }] }), burette: { gain: 1.25 } };
    expectVolumes(declared, [2]);
  });

  it('do not depend on water and background', () => {
    expectVolumes(sheet({ analytes: [{ ...weak, pKa: [4.8] }], extraWater_mL: 40, background_M: 0.1 }), [2.5]);
  });

  it('of a weak acid in an excess of strong acid: the excess first, numbered 0', () => {
    const found = volumesOf(sheet({ analytes: [{ ...weak, pKa: [7] }], strongIon_M: -0.004 }));
    const byStep = new Map(found.map((entry) => [entry.step, entry]));
    expect(byStep.get(0)?.analyte).toBe('strong acid');
    // 0.004 · 25 / 0.1, and 0.01 · 25 / 0.1 on top.
    expect(byStep.get(0)?.volume_mL).toBeCloseTo(1, 10);
    expect(byStep.get(1)?.volume_mL).toBeCloseTo(3.5, 10);
  });

  it('lie nowhere where the titrant leads away from them', () => {
    const analyte = { ...weak, pKa: [4.8] };
    expect(volumesOf(sheet({ analytes: [analyte] }, { kind: 'acid' }))).toEqual([]);
  });
});

describe('a strong acid of 0.02 mol/L with a base that holds 0.005 mol/L of carbonate', () => {
  /** 0.5 mmol of acid, titrated to CO₂: every carbonate takes two protons. */
  const acid = { analytes: [], strongIon_M: -0.02 };
  const cases = [
    // OH⁻ 0.1 and 2 × 0.005 of carbonate: 0.11 mol/L of base.
    ['hydroxide', 0.5 / 0.11],
    // OH⁻ + CO₃²⁻ is 0.1: 0.095 of hydroxide and 2 × 0.005: 0.105.
    ['toHydrogencarbonate', 0.5 / 0.105],
    // OH⁻ + 2 CO₃²⁻ is 0.1.
    ['totalBase', 0.5 / 0.1],
  ] as const;

  it.each(cases)('whose strength means %s', (strengthMeans, volume) => {
    const found = volumesOf(sheet(acid, { strengthMeans, carbonate_M: 0.005 }));
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ analyte: 'strong acid', step: 1, countedAs: 'carbonate counted as CO₂' });
    expect(Math.abs(found[0].volume_mL / volume - 1)).toBeLessThan(rounding);
  });

  it.each([
    // Near pH 5.8, where acid and hydrogencarbonate are equal and few: the carbonate is CO₂, which takes two.
    [4, 'CO₂', 0.25 / 0.11],
    // Beyond pH 7: hydrogencarbonate, which takes one. 0.25 mmol against 0.1 of hydroxide and 0.005 of carbonate.
    [7, 'HCO₃⁻', 0.25 / 0.105],
  ])('counts carbonate to the form present at the step of a weak acid of pKa %d', (pKa, form, volume) => {
    const [step] = volumesOf(
      sheet({ analytes: [{ ...weak, pKa: [pKa] }] }, { strengthMeans: 'hydroxide', carbonate_M: 0.005 }),
    );
    expect(step.countedAs).toBe(`carbonate counted as ${form}`);
    expect(Math.abs(step.volume_mL / volume - 1)).toBeLessThan(rounding);
  });
});

describe('two analytes', () => {
  const pair = { ...weak, name: 'stronger', pKa: [3] };
  const other = { ...weak, name: 'weaker', concentration_M: 0.02, pKa: [8] };

  it('have a step each, the weaker after the stronger', () => {
    const found = volumesOf(sheet({ analytes: [pair, other] }));
    expect(found.map(({ analyte, step }) => [analyte, step])).toEqual([
      ['stronger', 1],
      ['weaker', 1],
    ]);
    expect(found[0].volume_mL).toBeCloseTo(2.5, 10);
    expect(found[1].volume_mL).toBeCloseTo(7.5, 10);
    expect(found[0].countedAs).toBe('weaker counted with 1 proton left');
    expect(found[1].countedAs).toBe('stronger counted with 0 protons left');
  });
});

describe('a weak titrant', () => {
  it('of ammonia is counted by the form present at the step', () => {
    const ammonia = { name: 'ammonia', pKa: [9.25], chargeFullyProtonated: 1, concentration_M: 0.1 };
    const [step] = volumesOf({
      ...sheet({ analytes: [{ ...weak, pKa: [4.8] }] }),
      titrant: { kind: 'solution', cations_M: 0, anions_M: 0, systems: [ammonia] },
    });
    expect(Math.abs(step.volume_mL / 2.5 - 1)).toBeLessThan(rounding);
    expect(step.countedAs).toBe('ammonia counted with 1 proton left');
  });
});

describe('the gradient', () => {
  const cases: readonly (readonly [string, SheetFile])[] = [
    [
      'of an ampholyte with a base that holds carbonate',
      sheet(
        {
          analytes: [{ ...weak, pKa: [2.9, 6.4, 9.5], chargeFullyProtonated: 2 }],
          strongIon_M: 0.001,
          carbonate_M: 0.0005,
          extraWater_mL: 10,
        },
        { strengthMeans: 'toHydrogencarbonate', carbonate_M: 0.002 },
      ),
    ],
    ['of a strong acid', sheet({ analytes: [], strongIon_M: -0.02 }, { carbonate_M: 0.005 })],
    [
      'of two analytes, one with a counter-ion that takes protons',
      sheet({
        analytes: [
          { ...weak, pKa: [3] },
          {
            ...weak,
            name: 'base B',
            pKa: [8],
            chargeFullyProtonated: 1,
            counterIon: {
              name: 'maleate',
              ratio: 1,
              chargeFullyProtonated: 0,
              protonsLostAsWeighed: 1,
              pKa: [1.9, 6.1],
            },
          },
        ],
      }),
    ],
    [
      'of a base with an acid',
      sheet({ analytes: [{ ...weak, pKa: [9], chargeFullyProtonated: 1, protonsLostAsWeighed: 1 }] }, { kind: 'acid' }),
    ],
  ];

  it.each(cases)('%s agrees with differences', (_, declared) => {
    const { design, values } = modelOfSheet({ ...declared, burette: { gain: 1.02 } }, [0]);
    const found = equivalenceVolumes(design, values);
    expect(found.length).toBeGreaterThan(0);
    design.quantities.forEach(({ id }, q) => {
      const width = 1e-5 * Math.max(Math.abs(values[q]), 1e-3);
      const at = (value: number) => {
        const moved = values.slice();
        moved[q] = value;
        return equivalenceVolumes(design, moved);
      };
      // A concentration of nothing cannot be lowered: only its upper side is taken, at which forms and signs stay.
      const oneSided = values[q] === 0;
      const [above, below] = [at(values[q] + width), oneSided ? found : at(values[q] - width)];
      // A quantity that is absent may bring a step of its own; the others stay comparable by their place.
      found.forEach(({ gradient, volume_mL, analyte, step }, k) => {
        const difference = (above[k].volume_mL - below[k].volume_mL) / (oneSided ? width : 2 * width);
        // Central differences of a hyperbola in 1e-5 of the value: 1e-10 of it, and rounding of 1e-16/1e-5.
        const size = Math.max(Math.abs(gradient[q]), volume_mL);
        const tolerance = oneSided ? 1e-3 : 1e-7;
        expect(Math.abs(gradient[q] - difference) / size, `${id} at step ${step} of ${analyte}`).toBeLessThan(
          tolerance,
        );
      });
    });
  });
});
