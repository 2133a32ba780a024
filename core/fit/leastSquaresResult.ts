import type { EndingCode } from './leastSquaresEnding.ts';

/** Where a fit stands after one trial step. The arrays are the engine's own: read them, do not keep them. */
export interface LeastSquaresProgress {
  /** Trial steps so far. */
  readonly iteration: number;
  /** Whether the last trial step was taken. */
  readonly accepted: boolean;
  /** Sum of squared residuals at the best point so far. */
  readonly cost: number;
  readonly parameters: Float64Array;
}

/**
 * When to stop. All are relative and free of units except `residualResolution`.
 * The defaults stand in `defaultLeastSquaresOptions`.
 */
export interface LeastSquaresOptions {
  /** Largest part of the sum of squares that the last step and the next prediction may still gain. */
  readonly costTolerance?: number;
  /** Largest Gauss–Newton step, relative to the parameters, both in units of the column scales. */
  readonly stepTolerance?: number;
  /** Largest cosine of the angle between the residuals and the plane of the derivatives. */
  readonly gradientTolerance?: number;
  /**
   * Change of the residual vector (Euclidean length, in units of the residuals)
   * that no longer matters; for whitened residuals, 1e-6 is a millionth of a
   * standard uncertainty. 0 (the default) switches the criterion off. Needed
   * where the residuals themselves end as rounding noise, as in data without noise.
   */
  readonly residualResolution?: number;
  /** Largest number of trial steps. */
  readonly iterationLimit?: number;
  /** First trust radius as a multiple of the scaled length of the start. */
  readonly initialRadiusFactor?: number;
  /** Largest change of each parameter in a single step, in units of the parameter; Infinity for no limit. */
  readonly stepLimits?: ArrayLike<number>;
  /** Called after each trial step; returning true stops the fit. */
  readonly onIteration?: (progress: LeastSquaresProgress) => boolean | undefined;
}

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
