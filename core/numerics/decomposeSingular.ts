import { Matrix, SingularValueDecomposition } from 'ml-matrix';

/** A = U diag(s) Vᵀ of a square matrix. */
export interface SingularDecomposition {
  /** Descending, none negative. */
  readonly singularValues: Float64Array;
  /** Column k of U at [k·size, (k + 1)·size). */
  readonly leftVectors: Float64Array;
  /** Column k of V at [k·size, (k + 1)·size). */
  readonly rightVectors: Float64Array;
}

/**
 * Singular value decomposition of a square matrix of finite numbers, given row
 * by row. Errors of the singular values are of the order of rounding times the
 * largest of them.
 */
export function decomposeSingular(rows: Float64Array, size: number): SingularDecomposition {
  const decomposition = new SingularValueDecomposition(Matrix.from1DArray(size, size, rows));
  return {
    singularValues: Float64Array.from(decomposition.diagonal),
    leftVectors: columnByColumn(decomposition.leftSingularVectors, size),
    rightVectors: columnByColumn(decomposition.rightSingularVectors, size),
  };
}

function columnByColumn(matrix: Matrix, size: number): Float64Array {
  const flat = new Float64Array(size * size);
  for (let k = 0; k < size; k++) for (let i = 0; i < size; i++) flat[k * size + i] = matrix.get(i, k);
  return flat;
}
