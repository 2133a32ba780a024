import { describe, expect, it } from 'vitest';
import { dataSlopes } from '../../../core/fit/dataSlopes.ts';

describe('slopes from neighbours', () => {
  it('of a straight line are its slope at every point, ends included, without sign', () => {
    const volumes = Float64Array.of(0, 0.5, 2, 3);
    expect(
      Array.from(
        dataSlopes(
          volumes,
          volumes.map((v) => 7 - 2 * v),
        ),
      ),
    ).toEqual([2, 2, 2, 2]);
  });

  it('do not depend on the order of the points', () => {
    expect(Array.from(dataSlopes(Float64Array.of(2, 0, 1), Float64Array.of(9, 3, 4)))).toEqual([5, 1, 3]);
  });

  it('skip over doubled volumes', () => {
    const slopes = dataSlopes(Float64Array.of(0, 1, 1, 2), Float64Array.of(0, 1, 1.5, 4));
    expect(slopes.every(Number.isFinite)).toBe(true);
    expect([slopes[1], slopes[2]]).toEqual([2, 2]);
  });

  it('of a single volume are nothing', () => {
    expect(Array.from(dataSlopes(Float64Array.of(1, 1), Float64Array.of(3, 4)))).toEqual([0, 0]);
    expect(dataSlopes(new Float64Array(0), new Float64Array(0))).toHaveLength(0);
  });
});
