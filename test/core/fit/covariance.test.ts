import { describe, expect, it } from 'vitest';
import { covarianceOf, estimateCovariance } from '../../../core/fit/covariance.ts';

/** Column by column, as the engine keeps it. */
function columnsOf(rows: readonly (readonly number[])[]): Float64Array {
  return Float64Array.from(rows[0].flatMap((_, j) => rows.map((row) => row[j])));
}

const x = [1, 2, 3, 5, 8];

describe('estimateCovariance', () => {
  it('gives the closed form for a straight line', () => {
    const estimate = estimateCovariance(columnsOf(x.map((at) => [1, at])), x.length, 2);
    const n = x.length;
    const sum = x.reduce((a, b) => a + b);
    const squares = x.reduce((a, b) => a + b * b, 0);
    const determinant = n * squares - sum * sum;
    expect(covarianceOf(estimate, 0, 0)).toBeCloseTo(squares / determinant, 13);
    expect(covarianceOf(estimate, 0, 1)).toBeCloseTo(-sum / determinant, 13);
    expect(covarianceOf(estimate, 1, 0)).toBe(covarianceOf(estimate, 0, 1));
    expect(covarianceOf(estimate, 1, 1)).toBeCloseTo(n / determinant, 13);
    expect(estimate.rank).toBe(2);
    expect(estimate.undetermined).toEqual([]);
  });

  it('carries the units of the parameters and none of their size', () => {
    const plain = estimateCovariance(columnsOf(x.map((at) => [1, at])), x.length, 2);
    const scaled = estimateCovariance(columnsOf(x.map((at) => [1e-9, at * 1e12])), x.length, 2);
    // Scaling the columns leaves the singular values alone, to rounding.
    scaled.singularValues.forEach((value, k) => {
      expect(value).toBeCloseTo(plain.singularValues[k], 14);
    });
    expect((covarianceOf(scaled, 0, 0) ?? 0) * 1e-18).toBeCloseTo(covarianceOf(plain, 0, 0) ?? 0, 13);
    expect((covarianceOf(scaled, 1, 1) ?? 0) * 1e24).toBeCloseTo(covarianceOf(plain, 1, 1) ?? 0, 13);
  });

  it('survives a condition number of 1e7, where the normal matrix would not', () => {
    // Columns u and u + ε·v with u ⊥ v of norm 2: C₁₁ = (JᵀJ)⁻¹₁₁ = (1 + ε²)/(4ε²), C₂₂ = 1/(4ε²).
    const epsilon = 1e-7;
    const rows = [1, -1, 1, -1].map((v) => [1, 1 + epsilon * v]);
    const estimate = estimateCovariance(columnsOf(rows), 4, 2);
    expect(estimate.rank).toBe(2);
    // The entries 1 ± 1e-7 are rounded at 1e-16, so ε is known to 1e-9 of itself.
    expect((covarianceOf(estimate, 1, 1) ?? 0) * 4 * epsilon ** 2).toBeCloseTo(1, 7);
    expect((covarianceOf(estimate, 0, 0) ?? 0) * 4 * epsilon ** 2).toBeCloseTo(1, 7);
  });

  it('gives no variance to a parameter that takes part in an undetermined direction, and names the direction', () => {
    // The second column is ten times the first: only p₀ + 10 p₁ is determined.
    const estimate = estimateCovariance(columnsOf(x.map((at) => [at, 10 * at, 1])), x.length, 3);
    expect(estimate.rank).toBe(2);
    expect(estimate.determined).toEqual([false, false, true]);
    expect(covarianceOf(estimate, 0, 0)).toBeNull();
    expect(covarianceOf(estimate, 1, 2)).toBeNull();
    const [direction] = estimate.undetermined;
    // In scaled parameters the two move against each other by equal amounts.
    expect(Math.abs(direction[0])).toBeCloseTo(Math.SQRT1_2, 12);
    expect(direction[0] + direction[1]).toBeCloseTo(0, 12);
    expect(direction[2]).toBeCloseTo(0, 12);
    // The third parameter is as uncertain as in the problem with one column less.
    const reduced = estimateCovariance(columnsOf(x.map((at) => [at, 1])), x.length, 2);
    expect(covarianceOf(estimate, 2, 2)).toBeCloseTo(covarianceOf(reduced, 1, 1) ?? 0, 12);
  });

  it('takes a column of zeros for a parameter that the data do not see', () => {
    const estimate = estimateCovariance(columnsOf(x.map((at) => [at, 0])), x.length, 2);
    expect(estimate.determined).toEqual([true, false]);
    expect(estimate.undetermined.map((direction) => Array.from(direction, Math.abs))).toEqual([[0, 1]]);
    expect(covarianceOf(estimate, 0, 0)).toBeCloseTo(1 / x.reduce((a, b) => a + b * b, 0), 14);
  });

  it('determines no more directions than there are residuals', () => {
    const estimate = estimateCovariance(columnsOf([[1, 1, 1]]), 1, 3);
    expect(estimate.rank).toBe(1);
    expect(estimate.undetermined).toHaveLength(2);
    expect(estimate.determined).toEqual([false, false, false]);
  });

  it('says nothing of nothing', () => {
    const estimate = estimateCovariance(new Float64Array(0), 4, 0);
    expect(estimate.rank).toBe(0);
    expect(estimate.determined).toEqual([]);
  });

  it('throws at derivatives of the wrong number or not finite', () => {
    expect(() => estimateCovariance(new Float64Array(5), 2, 3)).toThrow('5 derivatives for 2 × 3');
    expect(() => estimateCovariance(Float64Array.of(1, Number.NaN), 2, 1)).toThrow('column 0');
  });
});
