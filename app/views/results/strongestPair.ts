import type { CorrelationResult } from '../../../core/index.ts';

/** Two quantities by their positions. */
export interface CorrelationPair {
  readonly row: number;
  /** Below `row`. */
  readonly column: number;
}

/** The pair with the largest coefficient of either sign; null where none is determined. */
export function strongestPair({ ids, matrix }: CorrelationResult): CorrelationPair | null {
  let strongest: CorrelationPair | null = null;
  let most = 0;
  for (let row = 1; row < ids.length; row++) {
    for (let column = 0; column < row; column++) {
      const size = Math.abs(matrix[row * ids.length + column] ?? 0);
      if (size > most) {
        most = size;
        strongest = { row, column };
      }
    }
  }
  return strongest;
}
