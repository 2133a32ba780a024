import { describe, expect, it } from 'vitest';
import { wandering, wanders } from '../../../../core/results/checks/wandering.ts';
import { seededNoise } from '../../../simulator/seededNoise.ts';

describe('wandering', () => {
  it('counts stretches of one sign as by hand', () => {
    // + + − − − + − + + − − + : 7 stretches, six of each sign; 2·6·6/12 + 1 = 7 expected.
    const found = wandering([1, 2, -1, -1, -2, 1, -1, 1, 1, -1, -3, 1]);
    expect(found?.stretches).toBe(7);
    expect(found?.expectedStretches).toBe(7);
    expect(found?.stretchesShort).toBeCloseTo(0, 12);
  });

  it('says nothing about a few numbers', () => {
    expect(wandering([1, -1, 1])).toBeNull();
    expect(wanders(null)).toBe(false);
  });

  it('sees numbers of one sign, and a slow wave', () => {
    expect(wanders(wandering(new Array(30).fill(1)))).toBe(true);
    expect(wanders(wandering(Array.from({ length: 40 }, (_, i) => Math.sin(i / 4))))).toBe(true);
  });

  it('sees neighbours that are alike in size where their signs change often enough', () => {
    // A few large excursions among small numbers of either sign.
    const noise = seededNoise(5);
    const values = Array.from({ length: 80 }, (_, i) => 0.1 * noise.normal() + (i >= 30 && i < 38 ? 1 : 0));
    const found = wandering(values);
    expect(found?.stretchesShort).toBeLessThan(3.5);
    expect(wanders(found)).toBe(true);
  });

  it('leaves independent numbers alone', () => {
    const count = Array.from({ length: 1000 }, (_, seed) => {
      const noise = seededNoise(seed);
      return wanders(wandering(Array.from({ length: 60 }, () => noise.normal())));
    }).filter((found) => found).length;
    // At 3.5 standard deviations on one side, twice, 0.5 of 1,000 are expected; 4 or more are a one in 500 event.
    expect(count).toBeLessThan(4);
  });
});
