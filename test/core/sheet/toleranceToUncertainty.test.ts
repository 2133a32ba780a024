import { expect, it } from 'vitest';
import { toleranceToUncertainty } from '../../../core/sheet/toleranceToUncertainty.ts';

it('is the standard deviation of the distribution that a tolerance stands for', () => {
  // Rectangular and triangular: ∫ x² p(x) dx by the midpoint rule, good to some 1e-7 of it with 2000 strips.
  const strips = 2000;
  const spread = (density: (x: number) => number) => {
    let sum = 0;
    for (let i = 0; i < strips; i++) {
      const x = -1 + (2 * (i + 0.5)) / strips;
      sum += x * x * density(x) * (2 / strips);
    }
    return Math.sqrt(sum);
  };
  expect(toleranceToUncertainty(3, 'rectangular')).toBeCloseTo(3 * spread(() => 0.5), 5);
  expect(toleranceToUncertainty(3, 'triangular')).toBeCloseTo(3 * spread((x) => 1 - Math.abs(x)), 5);
  // A 95 % interval is ±1.96 standard deviations (every table of the normal distribution; from memory).
  expect(toleranceToUncertainty(1.96, 'normal')).toBeCloseTo(1, 4);
});
