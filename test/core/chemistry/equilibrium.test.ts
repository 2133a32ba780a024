import { describe, expect, it } from 'vitest';
import { Equilibrium } from '../../../core/chemistry/equilibrium.ts';

const neutral = -7 * Math.LN10;

describe('Equilibrium', () => {
  it('finds pure water', () => {
    const water = new Equilibrium([], 0);
    water.balance.setConstants([], 14);
    expect(water.solve(new Float64Array(2), -3 * Math.LN10, 0.1)).toBe(true);
    expect(-water.logHydrogen / Math.LN10).toBeCloseTo(7, 10);
    // [H⁺] and [OH⁻] of 1e-7 each.
    expect(water.ionicStrength / 1e-7).toBeCloseTo(1, 6);
  });

  it('finds a strong acid from any start, exactly', () => {
    const acid = new Equilibrium([], 0);
    acid.balance.setConstants([], 14);
    const exact = (0.01 + Math.sqrt(0.01 ** 2 + 4e-14)) / 2;
    for (const pH of [-5, 0, 7, 14, 20]) {
      expect(acid.solve(Float64Array.of(0, 0.01), -pH * Math.LN10, 0.1)).toBe(true);
      expect(Math.exp(acid.logHydrogen) / exact).toBeCloseTo(1, 12);
    }
  });

  it('keeps its digits at equivalence, where large charges cancel', () => {
    // 0.1 mol/L of NaOH and of HCl: pH is that of water, whatever 0.1 − 0.1 leaves of rounding.
    const salt = new Equilibrium([], 0);
    salt.balance.setConstants([], 14);
    expect(salt.solve(Float64Array.of(0.1, 0.1), -3 * Math.LN10, 0.1)).toBe(true);
    expect(-salt.logHydrogen / Math.LN10).toBeCloseTo(7, 12);
    // A weak acid with exactly as much base: hydrolysis alone, x²/(c − x) = Kw/Ka.
    const weak = new Equilibrium([{ groups: 1, chargeFullyProtonated: 0 }], 0);
    weak.balance.setConstants([5], 14);
    expect(weak.solve(Float64Array.of(0.1, 0, 0.1), neutral, 0.1)).toBe(true);
    const hydroxide = 1e-14 / Math.exp(weak.logHydrogen);
    const acidForm = hydroxide - Math.exp(weak.logHydrogen);
    expect((acidForm * hydroxide) / (0.1 - acidForm) / 1e-9).toBeCloseTo(1, 10);
  });

  it('needs few steps: at most 8 from a reading, at most 3 from the last solution', () => {
    const shapes = [{ groups: 3, chargeFullyProtonated: 0 }];
    const equilibrium = new Equilibrium(shapes, 0.5116);
    equilibrium.balance.setConstants([3.13, 4.76, 6.4], 13.997);
    for (let base = 0; base <= 0.08; base += 0.0013) {
      const mixture = Float64Array.of(base, 0, 0.02);
      expect(equilibrium.solve(mixture, neutral, 0.02)).toBe(true);
      const { logHydrogen, ionicStrength } = equilibrium;
      const stepsFrom = (x: number, ionic: number) => {
        const before = equilibrium.newtonSteps;
        expect(equilibrium.solve(mixture, x, ionic)).toBe(true);
        return equilibrium.newtonSteps - before;
      };
      // A reading is good to 0.1 in pH at worst; of the ionic strength nothing is known.
      expect(stepsFrom(logHydrogen + 0.1 * Math.LN10, 0.02), `${base} mol/L`).toBeLessThanOrEqual(8);
      expect(stepsFrom(logHydrogen + 0.01, ionicStrength * 1.01), `${base} mol/L`).toBeLessThanOrEqual(3);
    }
    expect(equilibrium.searches).toBe(0);
  });

  it('says so where there is nothing to solve', () => {
    const base = new Equilibrium([], 0);
    base.balance.setConstants([], 14);
    expect(base.solve(Float64Array.of(Number.NaN, 0), neutral, 0.1)).toBe(false);
    expect(base.solve(Float64Array.of(Number.POSITIVE_INFINITY, 0), neutral, 0.1)).toBe(false);
  });

  it('finds by searching what Newton from far away does not', () => {
    const equilibrium = new Equilibrium([{ groups: 1, chargeFullyProtonated: 0 }], 0);
    equilibrium.balance.setConstants([4.7], 14);
    const mixture = Float64Array.of(0.005, 0, 0.01);
    equilibrium.solve(mixture, neutral, 0.1);
    const found = equilibrium.logHydrogen;
    // Steps of at most two pH units: from here Newton gives up first.
    expect(equilibrium.solve(mixture, -300, 0.1)).toBe(true);
    expect(equilibrium.searches).toBe(1);
    expect(equilibrium.logHydrogen).toBeCloseTo(found, 10);
  });
});
