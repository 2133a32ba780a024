import { describe, expect, it } from 'vitest';
import { readingResolution } from '../../../core/fit/readingResolution.ts';

describe('the last digit of readings', () => {
  it.each([
    [[3, 4, 11], 1],
    [[3.1, 4, 11.25], 0.01],
    // 0.1 and its like are no binary fractions.
    [[0.1, 0.2, 0.3], 0.1],
    [[2.701, 11.045], 0.001],
    [[-304, 12], 1],
    [[-304.5], 0.1],
    [[], 1],
  ])('of %j is %d', (readings, resolution) => {
    expect(readingResolution(Float64Array.from(readings))).toBeCloseTo(resolution, 12);
  });

  it('of numbers that nobody rounded is beyond what an export prints', () => {
    expect(readingResolution(Float64Array.of(Math.PI, Math.E))).toBeLessThanOrEqual(1e-8);
  });
});
