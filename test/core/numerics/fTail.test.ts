import { describe, expect, it } from 'vitest';
import { fTail, smallestTail } from '../../../core/numerics/fTail.ts';
import { studentQuantile } from '../../../core/numerics/studentQuantile.ts';

describe('the upper tail of F', () => {
  it('is (1 + 2F/n)^(−n/2) with two degrees of freedom above the line', () => {
    for (const n of [3, 20, 200])
      for (const F of [0.1, 1, 5, 20]) {
        const exact = (1 + (2 * F) / n) ** (-n / 2);
        // The bisection stops at one part in 10⁵.
        if (exact > smallestTail) expect(fTail(F, 2, n) / exact).toBeCloseTo(1, 4);
      }
  });

  it('is twice that of t at the root of F with one', () => {
    for (const n of [4, 50])
      for (const tail of [0.2, 0.01, 1e-4])
        expect(fTail(studentQuantile(1 - tail / 2, n) ** 2, 1, n) / tail).toBeCloseTo(1, 4);
  });

  it('is 1 at nothing and never less than its smallest', () => {
    expect(fTail(0, 1, 10)).toBe(1);
    expect(fTail(Number.MAX_VALUE, 1, 100)).toBe(smallestTail);
  });

  it('refuses what is no ratio of variances', () => {
    expect(() => fTail(-1, 1, 10)).toThrow('fTail');
    expect(() => fTail(Number.NaN, 1, 10)).toThrow('fTail');
  });
});
