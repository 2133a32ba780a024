import { describe, expect, it } from 'vitest';
import { createRandom } from '../../../core/numerics/createRandom.ts';
import { triangularise } from '../../../core/numerics/triangularise.ts';

function reduce(columns: readonly (readonly number[])[]) {
  const rowCount = columns[0].length;
  const columnCount = columns.length - 1;
  const triangle = new Float64Array(columnCount ** 2);
  const rightHand = new Float64Array(columnCount);
  triangularise(Float64Array.from(columns.flat()), rowCount, columnCount, { triangle, rightHand });
  return { triangle, rightHand };
}

const dot = (u: readonly number[], v: readonly number[]) => u.reduce((sum, value, i) => sum + value * v[i], 0);

describe('triangularise', () => {
  it('keeps every product of the columns: RᵀR = AᵀA and Rᵀz = Aᵀb', () => {
    const random = createRandom(11);
    const columns = Array.from({ length: 5 }, () => Array.from({ length: 30 }, () => random.normal()));
    const { triangle, rightHand } = reduce(columns);
    for (let j = 0; j < 4; j++) {
      const own = [0, 1, 2, 3].map((k) => triangle[k * 4 + j]);
      for (let k = 0; k < j; k++) expect(triangle[j * 4 + k]).toBe(0);
      // Sums of 30 products of order one: rounding of 1e-14 at most.
      for (let l = 0; l < 4; l++) {
        const other = [0, 1, 2, 3].map((k) => triangle[k * 4 + l]);
        expect(dot(own, other)).toBeCloseTo(dot(columns[j], columns[l]), 13);
      }
      expect(dot(own, Array.from(rightHand))).toBeCloseTo(dot(columns[j], columns[4]), 13);
    }
  });

  it('keeps small differences between columns, which products of columns would lose', () => {
    // R₁₁ is the norm of what the second column adds to the first: ε·v with v ⊥ u.
    const epsilon = 2 ** -30;
    const { triangle } = reduce([
      [1, 1, 1, 1],
      [1 + epsilon, 1 - epsilon, 1 + epsilon, 1 - epsilon],
      [0, 0, 0, 0],
    ]);
    // Rounding of 1e-16 beside 2ε = 1.9e-9.
    expect(Math.abs(triangle[3]) / (2 * epsilon)).toBeCloseTo(1, 6);
  });

  it('passes over columns of zeros and takes a square matrix', () => {
    const { triangle, rightHand } = reduce([
      [0, 0],
      [3, 4],
      [1, 2],
    ]);
    expect(Array.from(triangle)).toEqual([0, 3, 0, expect.closeTo(-4, 14)]);
    // The first row is left as it was, the second is mirrored.
    expect(rightHand[0]).toBe(1);
    expect(rightHand[1]).toBeCloseTo(-2, 14);
  });

  it('throws at fewer rows than columns', () => {
    expect(() => reduce([[1], [2], [3]])).toThrow('1 rows for 2 columns');
  });
});
