import { describe, expect, it } from 'vitest';
import { chiSquareQuantile } from '../../core/numerics/chiSquareQuantile.ts';
import { fQuantile } from '../../core/numerics/fQuantile.ts';
import { studentQuantile } from '../../core/numerics/studentQuantile.ts';
import reference from './quantiles.json' with { type: 'json' };

/** Half a unit in the eighth significant digit of 1.0000000: at least eight digits everywhere. */
const eightDigits = 5e-9;

/** Largest deviation of a table, relative; NaN where any value is not a number. */
function largestDeviation(
  rows: readonly (readonly (number | string)[])[],
  quantile: (...arguments_: number[]) => number,
) {
  return Math.max(
    ...rows.map((row) => {
      // JSON has no infinity: it stands there in words.
      const numbers = row.map(Number);
      const expected = numbers.pop() as number;
      return Math.abs(quantile(...numbers) / expected - 1);
    }),
  );
}

describe('quantiles agree with SciPy to eight digits', () => {
  it('of Student’s t, from half a degree of freedom to infinitely many', () => {
    expect(reference.t.length).toBeGreaterThan(200);
    expect(largestDeviation(reference.t, (p, d) => studentQuantile(p, d))).toBeLessThan(eightDigits);
  });

  it('of χ², from half a degree of freedom to a million', () => {
    expect(reference.chiSquare.length).toBeGreaterThan(200);
    expect(largestDeviation(reference.chiSquare, (p, d) => chiSquareQuantile(p, d))).toBeLessThan(eightDigits);
  });

  it('of F, with infinitely many degrees of freedom on either side', () => {
    expect(reference.f.length).toBeGreaterThan(1500);
    expect(largestDeviation(reference.f, (p, a, b) => fQuantile(p, a, b))).toBeLessThan(eightDigits);
  });
});
