/**
 * A sum of squares to be minimised, Σ rᵢ². The engine sees numbers only: what a
 * residual or a parameter means is the business of whoever states the problem.
 *
 * Residuals are *model minus observation*, already divided by their standard
 * uncertainty (whitened), with any known quantity added as a further residual.
 * A parameter that is to be held is left out of the problem.
 */
export interface LeastSquaresProblem {
  readonly parameterCount: number;
  readonly residualCount: number;
  /**
   * Writes the residuals at these parameters. Returns false where the model
   * cannot be computed; a result that is not finite counts as the same.
   */
  residuals(parameters: Float64Array, residuals: Float64Array): boolean;
  /**
   * Writes ∂rᵢ/∂pⱼ at index j·residualCount + i (column by column). Called only
   * directly after `residuals` at the same parameters, so that intermediate
   * results may be kept between the two. Returns false where the derivatives
   * cannot be computed.
   */
  derivatives(parameters: Float64Array, jacobian: Float64Array): boolean;
}
