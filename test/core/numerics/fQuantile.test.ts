import { describe, expect, it } from 'vitest';
import { fQuantile } from '../../../core/numerics/fQuantile.ts';
import { studentQuantile } from '../../../core/numerics/studentQuantile.ts';

describe('fQuantile', () => {
  it.each([1, 2.5, 40, 1e4])('is the square of a two-sided t quantile for 1 and %d degrees of freedom', (degrees) => {
    // Both invert the same incomplete beta function, to about 1e-10 where the degrees of freedom are many.
    expect(fQuantile(0.95, 1, degrees) / studentQuantile(0.975, degrees) ** 2).toBeCloseTo(1, 9);
  });

  it('has its closed form for 2 degrees of freedom on either side', () => {
    // F(x; 2, d) = 1 − (1 + 2x/d)^(−d/2), by integration of the density.
    expect(fQuantile(0.9, 2, 6) / (3 * (0.1 ** (-1 / 3) - 1))).toBeCloseTo(1, 12);
    expect(fQuantile(0.9, 6, 2) / (1 / (3 * (0.9 ** (-1 / 3) - 1)))).toBeCloseTo(1, 12);
  });

  it('turns over when both sides change places', () => {
    expect(fQuantile(0.999, 1e4, 0.7) * fQuantile(0.001, 0.7, 1e4)).toBeCloseTo(1, 9);
  });

  it('keeps the digits of a small probability', () => {
    expect(fQuantile(1e-12, 2, 6) / (3 * Math.expm1(-Math.log1p(-1e-12) / 3))).toBeCloseTo(1, 9);
    // F(x; 6, 2) = (1 + 1/(3x))^−3.
    expect(fQuantile(1e-12, 6, 2) / (1 / (3 * (1e4 - 1)))).toBeCloseTo(1, 9);
  });

  it('is 1 where both sides have infinitely many', () => {
    expect(fQuantile(0.2, Infinity, Infinity)).toBe(1);
  });

  it('throws outside its range', () => {
    expect(() => fQuantile(0, 3, 4)).toThrow('probability 0');
    expect(() => fQuantile(0.9, 0, 4)).toThrow('0 and 4 degrees of freedom');
    expect(() => fQuantile(0.9, 3, Number.NaN)).toThrow('3 and NaN degrees of freedom');
  });
});
