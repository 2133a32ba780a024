import { describe, expect, it } from 'vitest';
import { Whitening } from '../../../core/fit/whitening.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';

/** Points in no order, two of them at one volume and one before the first dose. */
const volumes = Float64Array.of(3, 0, 1, 2, 2, 5, 4);
const slopes = Float64Array.of(2, 0.3, 0.5, 9, 7, 0.4, -1);
const noise = { reading: 0.005, setting_mL: 0.003, dose_mL: 0.002 };
const count = volumes.length;

/** Covariance written out: independent parts on the diagonal, dosing errors shared by all points after the dose. */
function denseCovariance({ reading, setting_mL, dose_mL }: typeof noise): number[][] {
  const doses = [...new Set(volumes)].filter((volume) => volume > 0);
  return Array.from(volumes, (first, i) =>
    Array.from(volumes, (second, j) => {
      const shared = doses.filter((dose) => dose <= Math.min(first, second)).length;
      const own = i === j ? reading ** 2 + (setting_mL * slopes[i]) ** 2 : 0;
      return own + slopes[i] * slopes[j] * dose_mL ** 2 * shared;
    }),
  );
}

/** Solves C x = b by Gaussian elimination without pivoting (C is positive definite); also ln det C. */
function solve(
  matrix: readonly (readonly number[])[],
  right: ArrayLike<number>,
): { x: number[]; logDeterminant: number } {
  const rows = matrix.map((row, i) => [...row, right[i]]);
  let logDeterminant = 0;
  for (let k = 0; k < rows.length; k++) {
    logDeterminant += Math.log(rows[k][k]);
    for (let i = 0; i < rows.length; i++) {
      if (i === k) continue;
      const factor = rows[i][k] / rows[k][k];
      for (let j = k; j <= rows.length; j++) rows[i][j] -= factor * rows[k][j];
    }
  }
  return { x: rows.map((row, k) => row[rows.length] / row[k]), logDeterminant };
}

function draw(seed: number): Float64Array {
  const random = seededNoise(seed);
  return Float64Array.from({ length: count }, () => 0.01 * random.normal());
}

function product(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
}

describe.each([
  ['accumulating dosing errors', noise],
  ['independent errors alone', { ...noise, dose_mL: 0 }],
])('whitening of %s', (_, declared) => {
  const whitening = new Whitening(volumes);
  whitening.set(declared, slopes);
  const covariance = denseCovariance(declared);

  it('makes the sum of squares that of the dense covariance matrix, and its determinant', () => {
    for (let seed = 1; seed <= 5; seed++) {
      const [first, second] = [draw(seed), draw(seed + 100)];
      const { x, logDeterminant } = solve(covariance, second);
      const [white, otherWhite] = [first.slice(), second.slice()];
      whitening.apply(white, 0);
      whitening.apply(otherWhite, 0);
      // Rounding of seven points with a condition of some thousands.
      expect(product(white, otherWhite) / product(first, x)).toBeCloseTo(1, 9);
      expect(whitening.logDeterminant).toBeCloseTo(logDeterminant, 9);
    }
  });

  it('gives the standard uncertainty of every residual by itself', () => {
    whitening.sigma.forEach((sigma, i) => {
      expect(sigma / Math.sqrt(covariance[i][i])).toBeCloseTo(1, 12);
    });
  });

  it('has its transpose', () => {
    const [left, right] = [draw(7), draw(8)];
    const [white, passed] = [right.slice(), left.slice()];
    whitening.apply(white, 0);
    whitening.applyTransposed(passed, 0);
    expect(product(left, white) / product(passed, right)).toBeCloseTo(1, 10);
  });

  it('works on a stretch of a longer vector and leaves the rest alone', () => {
    const residuals = draw(9);
    const longer = new Float64Array(count + 4).fill(3);
    longer.set(residuals, 2);
    whitening.apply(longer, 2);
    whitening.apply(residuals, 0);
    expect(Array.from(longer.subarray(2, count + 2))).toEqual(Array.from(residuals));
    expect([longer[0], longer[1], longer[count + 2], longer[count + 3]]).toEqual([3, 3, 3, 3]);
  });
});

describe('the variance that dosing errors pass on', () => {
  it('is that of the dense matrix for one unit per dose', () => {
    const whitening = new Whitening(volumes);
    whitening.set(noise, slopes);
    const influence = draw(3);
    const shared = denseCovariance({ reading: 0, setting_mL: 0, dose_mL: 1 });
    const expected = product(
      influence,
      shared.map((row) => product(row, influence)),
    );
    expect(whitening.doseVariance(influence) / expected).toBeCloseTo(1, 12);
  });
});
