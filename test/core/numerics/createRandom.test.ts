import { describe, expect, it } from 'vitest';
import { createRandom } from '../../../core/numerics/createRandom.ts';

const COUNT = 10000;

describe('createRandom', () => {
  it('repeats itself from the same seed and not from another', () => {
    const draw = (seed: number) => {
      const random = createRandom(seed);
      return [random.uniform(), random.normal(), random.uniform()];
    };
    expect(draw(5)).toEqual(draw(5));
    expect(draw(5)).not.toEqual(draw(6));
  });

  it('draws uniform numbers from 0 to 1', () => {
    const random = createRandom(1);
    const drawn = Array.from({ length: COUNT }, () => random.uniform());
    expect(Math.min(...drawn)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...drawn)).toBeLessThan(1);
    // Four standard deviations of the mean of 10,000, each of 1/√12.
    expect(Math.abs(drawn.reduce((a, b) => a + b) / COUNT - 0.5)).toBeLessThan(4 / Math.sqrt(12 * COUNT));
  });

  it('draws normal numbers of mean 0 and standard deviation 1', () => {
    const random = createRandom(2);
    const drawn = Array.from({ length: COUNT }, () => random.normal());
    // Four standard deviations of the mean, of the mean square (2/n) and of the mean fourth power (96/n).
    expect(Math.abs(drawn.reduce((a, b) => a + b) / COUNT)).toBeLessThan(4 / Math.sqrt(COUNT));
    expect(Math.abs(drawn.reduce((a, b) => a + b * b, 0) / COUNT - 1)).toBeLessThan(4 * Math.sqrt(2 / COUNT));
    expect(Math.abs(drawn.reduce((a, b) => a + b ** 4, 0) / COUNT - 3)).toBeLessThan(4 * Math.sqrt(96 / COUNT));
  });

  it('gives neighbouring seeds beginnings that have nothing to do with each other', () => {
    const first = Array.from({ length: COUNT }, (_, seed) => createRandom(seed).uniform() - 0.5);
    let product = 0;
    for (let k = 1; k < COUNT; k++) product += first[k] * first[k - 1];
    // Correlation of neighbours: 0 within four of 1/√n. Variance of a uniform number: 1/12.
    expect(Math.abs((12 * product) / COUNT)).toBeLessThan(4 / Math.sqrt(COUNT));
    expect(Math.abs(first.reduce((a, b) => a + b) / COUNT)).toBeLessThan(4 / Math.sqrt(12 * COUNT));
  });

  it('throws at a seed that is not a whole number of 32 bits', () => {
    expect(() => createRandom(0.5)).toThrow('seed 0.5');
    expect(() => createRandom(2 ** 40)).toThrow('seed 1099511627776');
  });
});
