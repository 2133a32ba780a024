import { expect, it } from 'vitest';
import { daviesDerivative, daviesFunction } from '../../../core/chemistry/davies.ts';

it('has the derivative of its function', () => {
  for (const ionicStrength of [1e-6, 0.001, 0.05, 0.3, 1]) {
    const step = 1e-4 * ionicStrength;
    const difference = (daviesFunction(ionicStrength + step) - daviesFunction(ionicStrength - step)) / (2 * step);
    // Central differences at a step of 1e-4 are good to some 1e-8 of the steep part.
    expect(Math.abs(daviesDerivative(ionicStrength) - difference)).toBeLessThan(1e-7 * Math.abs(difference) + 1e-9);
  }
});

it('begins as √I and turns at the ionic strength where both of its terms pull alike', () => {
  expect(daviesFunction(0)).toBe(0);
  expect(daviesFunction(1e-10) / 1e-5).toBeCloseTo(1, 4);
  // √I (1+√I)² = 1/0.6 at √I = 0.6285.
  expect(daviesDerivative(0.394)).toBeGreaterThan(0);
  expect(daviesDerivative(0.396)).toBeLessThan(0);
});
