import type { LeastSquaresProblem } from './leastSquaresProblem.ts';

/** A problem whose readings count by weights of their own; declared knowledge keeps its weight of one. */
export class RobustProblem implements LeastSquaresProblem {
  readonly parameterCount: number;
  readonly residualCount: number;
  /** √w of every residual that comes from a reading, 0–1; set by whoever judges the points. */
  readonly roots: Float64Array;

  private readonly whole: LeastSquaresProblem;

  /** @param readingCount residuals that come from readings; they stand first */
  constructor(whole: LeastSquaresProblem, readingCount: number) {
    this.whole = whole;
    this.parameterCount = whole.parameterCount;
    this.residualCount = whole.residualCount;
    this.roots = new Float64Array(readingCount).fill(1);
  }

  residuals(parameters: Float64Array, residuals: Float64Array): boolean {
    if (!this.whole.residuals(parameters, residuals)) return false;
    this.weigh(residuals, 0);
    return true;
  }

  derivatives(parameters: Float64Array, jacobian: Float64Array): boolean {
    if (!this.whole.derivatives(parameters, jacobian)) return false;
    for (let j = 0; j < this.parameterCount; j++) this.weigh(jacobian, j * this.residualCount);
    return true;
  }

  private weigh(values: Float64Array, first: number): void {
    for (let i = 0; i < this.roots.length; i++) values[first + i] *= this.roots[i];
  }
}
