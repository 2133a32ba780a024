import { describe, expect, it } from 'vitest';
import { covarianceInterval } from '../../../core/inference/covarianceInterval.ts';

describe('the 95 % interval', () => {
  it.each([
    // Quantiles of Student's t at 0.975, as printed in any table (from memory).
    [1, 12.706],
    [5, 2.571],
    [10, 2.228],
    [30, 2.042],
    [Number.POSITIVE_INFINITY, 1.96],
  ])('with %d degrees of freedom is t u wide on either side', (freedom, t) => {
    const [low, high] = covarianceInterval(4.8, 0.01, freedom);
    expect(high - 4.8).toBeCloseTo(t * 0.01, 4);
    expect(4.8 - low).toBeCloseTo(high - 4.8, 12);
  });

  it('with parts of degrees of freedom lies between those of whole ones', () => {
    const width = (freedom: number) => covarianceInterval(0, 1, freedom)[1];
    expect(width(7.4)).toBeLessThan(width(7));
    expect(width(7.4)).toBeGreaterThan(width(8));
  });
});
