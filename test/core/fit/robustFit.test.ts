import { describe, expect, it } from 'vitest';
import type { LeastSquaresProblem } from '../../../core/fit/leastSquaresProblem.ts';
import { robustFit } from '../../../core/fit/robustFit.ts';
import { robustScale } from '../../../core/fit/robustScale.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';

/** A straight line a + b x through points at x = 0, 0.1, …, with standard deviation one. */
function line(values: readonly number[]): LeastSquaresProblem {
  const count = values.length;
  return {
    parameterCount: 2,
    residualCount: count,
    residuals: ([a, b], residuals) => {
      for (let i = 0; i < count; i++) residuals[i] = a + 0.1 * b * i - values[i];
      return true;
    },
    derivatives: (_, jacobian) => {
      for (let i = 0; i < count; i++) {
        jacobian[i] = 1;
        jacobian[count + i] = 0.1 * i;
      }
      return true;
    },
  };
}

function points(seed: number, count: number): number[] {
  const noise = seededNoise(seed);
  return Array.from({ length: count }, (_, i) => 3 + 0.2 * i + noise.normal());
}

const runOf = (count: number, isDeclared: boolean) => [
  { firstResidual: 0, count, degreesOfFreedom: count - 2, isDeclared },
];

describe('robustFit', () => {
  it.each([true, false])('does without wild points (noise declared: %s)', (isDeclared) => {
    const values = points(3, 60);
    const found = robustFit(line(values), Float64Array.of(3, 2), runOf(60, isDeclared));
    const wild = values.with(50, values[50] + 40).with(55, values[55] + 40);
    const without = robustFit(line(wild), Float64Array.of(3, 2), runOf(60, isDeclared));
    expect(without?.weights[50]).toBe(0);
    expect(without?.weights[55]).toBe(0);
    // What two of 60 sound points can do: a fraction of the standard uncertainties, 0.25 and 0.08.
    expect(Math.abs((without?.parameters[0] ?? 0) - (found?.parameters[0] ?? 0))).toBeLessThan(0.1);
    expect(Math.abs((without?.parameters[1] ?? 0) - (found?.parameters[1] ?? 0))).toBeLessThan(0.05);
  });

  it('minimises the weighted sum of squares: the weighted residuals stand at right angles to the derivatives', () => {
    const values = points(4, 40).with(7, 20);
    const found = robustFit(line(values), Float64Array.of(3, 2), runOf(40, true));
    const [a, b] = found?.parameters ?? [0, 0];
    const weighted = values.map((value, i) => (found?.weights[i] ?? 0) * (a + 0.1 * b * i - value));
    // Weights stand still to 1e-3 of residuals of size one.
    expect(Math.abs(weighted.reduce((sum, r) => sum + r, 0))).toBeLessThan(0.05);
    expect(Math.abs(weighted.reduce((sum, r, i) => sum + 0.1 * i * r, 0))).toBeLessThan(0.1);
  });

  it('takes a scatter larger than declared from the points, and distrusts none for it', () => {
    const values = points(5, 60).map((value, i) => 3 + 0.2 * i + 5 * (value - 3 - 0.2 * i));
    const found = robustFit(line(values), Float64Array.of(3, 2), runOf(60, true));
    expect(Math.max(...(found?.ratios.map(Math.abs) ?? []))).toBeLessThan(4);
  });

  it('trusts all points of at least 95 in 100 sound runs', () => {
    for (const isDeclared of [true, false]) {
      const distrusting = Array.from({ length: 100 }, (_, seed) =>
        robustFit(line(points(seed, 60)), Float64Array.of(3, 2), runOf(60, isDeclared))?.ratios.some(
          (ratio) => Math.abs(ratio) > 4,
        ),
      ).filter((found) => found !== false);
      expect(distrusting.length).toBeLessThanOrEqual(5);
    }
  });

  it('leaves nothing to trust where the curve cannot be computed', () => {
    const broken: LeastSquaresProblem = { ...line([1, 2, 3]), residuals: () => false };
    expect(robustFit(broken, Float64Array.of(3, 2), runOf(3, true))).toBeNull();
  });
});

describe('robustScale', () => {
  it('is the root mean square over the degrees of freedom where nothing is wild', () => {
    const noise = seededNoise(1);
    const residuals = Float64Array.from({ length: 50 }, () => noise.uniform(-1, 1));
    const square = residuals.reduce((sum, r) => sum + r * r, 0);
    expect(robustScale(residuals, 47, 4)).toBeCloseTo(Math.sqrt(square / 47), 6);
  });

  it('does not see a quarter of wild ones', () => {
    const noise = seededNoise(2);
    const residuals = Float64Array.from({ length: 80 }, (_, i) => (i % 4 === 0 ? 50 : noise.normal()));
    // 60 normal numbers give their standard deviation to 9 %.
    expect(Math.abs(robustScale(residuals, 78, 4) - 1)).toBeLessThan(0.25);
  });
});
