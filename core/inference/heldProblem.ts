import type { LeastSquaresProblem } from '../fit/leastSquaresProblem.ts';

/** A problem with one parameter held at a value; the others keep their order. */
export class HeldProblem implements LeastSquaresProblem {
  readonly parameterCount: number;
  readonly residualCount: number;

  private readonly whole: LeastSquaresProblem;
  private readonly held: number;
  private readonly parameters: Float64Array;
  private readonly jacobian: Float64Array;

  constructor(whole: LeastSquaresProblem, held: number) {
    this.whole = whole;
    this.held = held;
    this.parameterCount = whole.parameterCount - 1;
    this.residualCount = whole.residualCount;
    this.parameters = new Float64Array(whole.parameterCount);
    this.jacobian = new Float64Array(whole.parameterCount * whole.residualCount);
  }

  /** Value at which the parameter is held. */
  hold(value: number): void {
    this.parameters[this.held] = value;
  }

  residuals(parameters: Float64Array, residuals: Float64Array): boolean {
    return this.whole.residuals(this.widened(parameters), residuals);
  }

  derivatives(parameters: Float64Array, jacobian: Float64Array): boolean {
    if (!this.whole.derivatives(this.widened(parameters), this.jacobian)) return false;
    for (let j = 0, from = 0; from < this.whole.parameterCount; from++) {
      if (from === this.held) continue;
      const column = from * this.residualCount;
      jacobian.set(this.jacobian.subarray(column, column + this.residualCount), j * this.residualCount);
      j++;
    }
    return true;
  }

  /** All parameters from those that move. */
  widened(parameters: Float64Array): Float64Array {
    for (let j = 0, to = 0; to < this.whole.parameterCount; to++)
      if (to !== this.held) this.parameters[to] = parameters[j++];
    return this.parameters;
  }

  /** The parameters that move, out of all. */
  narrowed(parameters: Float64Array): Float64Array {
    return parameters.filter((_, j) => j !== this.held);
  }
}
