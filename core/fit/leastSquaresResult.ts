import type { EndingCode } from './leastSquaresEnding.ts';

/** The point at which a fit ended, whatever the ending: ask `endings[ending].usable` first. */
export interface LeastSquaresResult {
  readonly ending: EndingCode;
  /** Best parameters found. */
  readonly parameters: Float64Array;
  /** Sum of squared residuals there (not halved); null where the start was not computable. */
  readonly cost: number | null;
  /** Residuals there, as the problem writes them. */
  readonly residuals: Float64Array;
  /** Derivatives there, column by column (see LeastSquaresProblem). */
  readonly jacobian: Float64Array;
  /** Number of independent directions that the derivatives hold, to rounding; see covariance.ts for a judgement. */
  readonly rank: number;
  /** Trial steps made. */
  readonly iterations: number;
  readonly residualEvaluations: number;
  readonly derivativeEvaluations: number;
}
