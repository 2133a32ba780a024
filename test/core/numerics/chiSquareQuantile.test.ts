import { describe, expect, it } from 'vitest';
import { chiSquareQuantile } from '../../../core/numerics/chiSquareQuantile.ts';
import { studentQuantile } from '../../../core/numerics/studentQuantile.ts';

describe('chiSquareQuantile', () => {
  it.each([0.001, 0.5, 0.95, 0.9999])('has its closed forms for 1 and 2 degrees of freedom at %d', (p) => {
    // Two degrees: an exponential distribution of mean 2. One degree: the square of a normal variable.
    // 1e-9: the limit of F taken at 1e13 degrees of freedom is good to about 1e-11.
    expect(Math.abs(chiSquareQuantile(p, 2) / (-2 * Math.log1p(-p)) - 1)).toBeLessThan(1e-9);
    expect(Math.abs(chiSquareQuantile(p, 1) / studentQuantile((1 + p) / 2, Infinity) ** 2 - 1)).toBeLessThan(1e-9);
  });

  it('throws outside its range', () => {
    expect(() => chiSquareQuantile(1, 3)).toThrow('probability 1');
    expect(() => chiSquareQuantile(0.9, 0)).toThrow('0 degrees of freedom');
    expect(() => chiSquareQuantile(0.9, Infinity)).toThrow('Infinity degrees of freedom');
  });
});
