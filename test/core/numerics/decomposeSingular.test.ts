import { describe, expect, it } from 'vitest';
import { createRandom } from '../../../core/numerics/createRandom.ts';
import { decomposeSingular } from '../../../core/numerics/decomposeSingular.ts';

describe('decomposeSingular', () => {
  it('gives the singular values of a known matrix', () => {
    // AᵀA = [[25, 20], [20, 25]] has the eigenvalues 45 and 5.
    const { singularValues } = decomposeSingular(Float64Array.of(3, 0, 4, 5), 2);
    expect(singularValues[0]).toBeCloseTo(Math.sqrt(45), 13);
    expect(singularValues[1]).toBeCloseTo(Math.sqrt(5), 13);
  });

  it.each([1, 2, 5, 12])('puts a matrix of size %d together again', (size) => {
    const random = createRandom(size);
    const rows = Float64Array.from({ length: size * size }, () => random.normal());
    const { singularValues, leftVectors, rightVectors } = decomposeSingular(rows, size);
    for (let i = 0; i < size; i++) {
      for (let j = 0; j < size; j++) {
        let sum = 0;
        for (let k = 0; k < size; k++)
          sum += leftVectors[k * size + i] * singularValues[k] * rightVectors[k * size + j];
        // Rounding of a dozen products of order one.
        expect(sum).toBeCloseTo(rows[i * size + j], 12);
      }
    }
    for (let k = 1; k < size; k++) expect(singularValues[k]).toBeLessThanOrEqual(singularValues[k - 1]);
    expect(singularValues[size - 1]).toBeGreaterThanOrEqual(0);
  });

  it('gives zeros for a matrix of zeros', () => {
    expect(Array.from(decomposeSingular(new Float64Array(9), 3).singularValues)).toEqual([0, 0, 0]);
  });
});
