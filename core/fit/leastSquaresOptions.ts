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
 * When to stop and how far to go at a time. The tolerances are relative and free
 * of units; what is left out has the value in `defaultLeastSquaresOptions`.
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

/**
 * Used where a caller says nothing. Each of the tolerances ends a fit within a
 * ten-millionth of a standard uncertainty of the minimum or so (times the square
 * root of the degrees of freedom), which is finer than any use of a result and
 * still within reach of derivatives that are good to 1e-12.
 */
export const defaultLeastSquaresOptions: Required<Omit<LeastSquaresOptions, 'stepLimits' | 'onIteration'>> = {
  costTolerance: 1e-15,
  stepTolerance: 1e-10,
  gradientTolerance: 1e-8,
  residualResolution: 0,
  iterationLimit: 1000,
  initialRadiusFactor: 1,
};
