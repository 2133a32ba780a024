import { describe, expect, it } from 'vitest';
import { Vessels } from '../../../core/model/vessels.ts';
import { modelOfSheet } from '../../modelOfSheet.ts';

const { design, values } = modelOfSheet(
  {
    sheet: 1,
    sample: { volume_mL: 20, extraWater_mL: 5, analytes: [], strongIon_M: -0.1, background_M: 0.05 },
    titrant: { kind: 'base', concentration_M: 0.2, background_M: 0.01 },
  },
  [0],
);

describe('Vessels', () => {
  it('dilutes both vessels by what each gives to the mixture, water included', () => {
    const vessels = new Vessels(design);
    vessels.take(values);
    const mixture = new Float64Array(2);
    expect(vessels.mix(15, mixture)).toBe(40);
    // 20/40 of (0.05, 0.15) and 15/40 of (0.21, 0.01).
    expect(mixture[0]).toBeCloseTo(0.10375, 14);
    expect(mixture[1]).toBeCloseTo(0.07875, 14);
    expect(vessels.mix(0, mixture)).toBe(25);
    expect(mixture[0]).toBeCloseTo(0.04, 14);
  });

  it('refuses values that describe no mixture', () => {
    const taken = (id: string, value: number) => {
      const changed = Float64Array.from(values);
      changed[design.quantities.findIndex((quantity) => quantity.id === id)] = value;
      return new Vessels(design).take(changed);
    };
    expect(taken('sample.volume', 20)).toBe(true);
    expect(taken('sample.volume', 0)).toBe(false);
    expect(taken('sample.volume', -1)).toBe(false);
    expect(taken('sample.extraWater', -20)).toBe(false);
    expect(taken('burette.gain', 0)).toBe(false);
    expect(taken('medium.pKw', Number.NaN)).toBe(false);
    expect(taken('titrant.concentration', Number.POSITIVE_INFINITY)).toBe(false);
  });
});
