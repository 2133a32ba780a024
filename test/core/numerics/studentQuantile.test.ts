import { describe, expect, it } from 'vitest';
import { studentQuantile } from '../../../core/numerics/studentQuantile.ts';

describe('studentQuantile', () => {
  it.each([0.6, 0.9, 0.975, 0.999, 0.025])(
    'agrees with the closed forms for 1, 2 and 4 degrees of freedom at %d',
    (p) => {
      // One degree: the Cauchy distribution. Two and four: Shaw, J. Comput. Finance 9 (2006) 37 (from memory).
      const product = 4 * p * (1 - p);
      const cosine = Math.cos(Math.acos(Math.sqrt(product)) / 3) / Math.sqrt(product);
      const expected: readonly [number, number][] = [
        [1, Math.tan(Math.PI * (p - 0.5))],
        [2, (2 * (p - 0.5)) / Math.sqrt(product / 2)],
        [4, 2 * Math.sign(p - 0.5) * Math.sqrt(cosine - 1)],
      ];
      for (const [degrees, quantile] of expected) {
        // The library inverts the incomplete beta function to about 1e-13; closed forms round near p = 0.999.
        expect(Math.abs(studentQuantile(p, degrees) / quantile - 1)).toBeLessThan(1e-11);
      }
    },
  );

  it('goes over into the normal distribution', () => {
    // 97.5 % point of the standard normal distribution, 1.959963984540054 (from memory, in any table).
    expect(studentQuantile(0.975, Infinity)).toBeCloseTo(1.959963984540054, 10);
    expect(studentQuantile(0.975, 1e15)).toBe(studentQuantile(0.975, Infinity));
  });

  it('throws outside its range', () => {
    expect(() => studentQuantile(1, 3)).toThrow('probability 1');
    expect(() => studentQuantile(0.9, 0)).toThrow('0 degrees of freedom');
    expect(() => studentQuantile(Number.NaN, 3)).toThrow('probability NaN');
  });
});
