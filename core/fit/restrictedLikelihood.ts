import { triangularise } from '../numerics/triangularise.ts';
import type { Noise } from './noise.ts';
import type { WeightedProblem } from './weightedProblem.ts';
import { Whitening } from './whitening.ts';

/** A diagonal below this part of its column belongs to a direction of which the data say nothing. */
const smallestDiagonal = 1e-9;

/**
 * Restricted likelihood of the noise of a problem, linearised at its solution:
 * ln det V + ln det(JᵀV⁻¹J) + the least sum of squares, with the rows of
 * knowledge among J. Minus twice the logarithm, up to a constant.
 *
 * Source: Patterson, H. D.; Thompson, R., Biometrika 58 (1971) 545–554.
 */
export class RestrictedLikelihood {
  private readonly weighted: WeightedProblem;
  private readonly plain: Float64Array;
  private readonly misses: Float64Array;
  private readonly columns: Float64Array;
  private readonly whitenings: readonly Whitening[];
  private readonly result: { triangle: Float64Array; rightHand: Float64Array };

  /**
   * @param weighted asked last for curve and derivatives at the solution
   * @param parameters the solution
   */
  constructor(weighted: WeightedProblem, parameters: Float64Array) {
    const { residualCount, parameterCount, runs } = weighted;
    this.weighted = weighted;
    this.plain = new Float64Array(residualCount * parameterCount);
    weighted.writePlainJacobian(this.plain);
    this.misses = new Float64Array(residualCount);
    weighted.writePlainResiduals(parameters, this.misses);
    this.columns = new Float64Array(residualCount * (parameterCount + 1));
    this.whitenings = runs.map(({ run }) => new Whitening(run.volumes));
    this.result = {
      triangle: new Float64Array(parameterCount * parameterCount),
      rightHand: new Float64Array(parameterCount),
    };
  }

  /** @param noises one per run */
  at(noises: readonly Noise[]): number {
    const { columns, plain, misses, result } = this;
    const { residualCount, parameterCount, runs } = this.weighted;
    columns.set(plain);
    columns.set(misses, residualCount * parameterCount);
    let value = 0;
    runs.forEach(({ slopes, firstResidual }, r) => {
      const whitening = this.whitenings[r];
      whitening.set(noises[r], slopes);
      value += whitening.logDeterminant;
      for (let j = 0; j <= parameterCount; j++) whitening.apply(columns, j * residualCount + firstResidual);
    });
    const norms = Float64Array.from({ length: parameterCount }, (_, j) => {
      let sum = 0;
      for (let i = 0; i < residualCount; i++) sum += columns[j * residualCount + i] ** 2;
      return Math.sqrt(sum);
    });
    triangularise(columns, residualCount, parameterCount, result);
    for (let j = 0; j < parameterCount; j++) {
      const diagonal = Math.abs(result.triangle[j * parameterCount + j]);
      if (diagonal > smallestDiagonal * norms[j]) value += 2 * Math.log(diagonal);
    }
    for (let i = parameterCount; i < residualCount; i++) value += columns[parameterCount * residualCount + i] ** 2;
    return value;
  }
}
