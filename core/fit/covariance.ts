import { decomposeSingular } from '../numerics/decomposeSingular.ts';
import { triangularise } from '../numerics/triangularise.ts';

/**
 * What the derivatives say of the uncertainty of the parameters, for residuals
 * of unit variance. *Scaled parameters* are the parameters times `columnScales`,
 * so that each of them alone moves the residual vector by one.
 */
export interface CovarianceEstimate {
  readonly parameterCount: number;
  /** Norm of each column of the Jacobian; 1 for a column of zeros. */
  readonly columnScales: Float64Array;
  /** Of the Jacobian with its columns scaled to norm one, descending. */
  readonly singularValues: Float64Array;
  /** Unit vectors in scaled parameters, vector k at [k·p, (k + 1)·p). */
  readonly rightVectors: Float64Array;
  /** Number of singular values that count; what is left of p is undetermined. */
  readonly rank: number;
  /** Unit vectors in scaled parameters along which the data say nothing. */
  readonly undetermined: readonly Float64Array[];
  /** False for a parameter that takes part in an undetermined direction. */
  readonly determined: readonly boolean[];
  /**
   * (JᵀJ)⁻¹ in the units of the parameters, row by row, taken over the
   * determined directions alone. Entries of a parameter that is not determined
   * mean nothing: read through `covarianceOf`.
   */
  readonly covariance: Float64Array;
}

/**
 * Singular values below this part of the largest count as zero. Derivatives are
 * good to about 1e-12 of their column, so that a direction this faint would
 * still carry three digits; beyond it, a printed uncertainty would be noise.
 */
const DEFAULT_RANK_TOLERANCE = 1e-9;

/**
 * A component of an undetermined direction below this is rounding of the
 * singular vectors, not participation.
 */
const PARTICIPATION_TOLERANCE = 1e-6;

/**
 * Covariance of the parameters at a minimum, by QR and singular values of the
 * whitened Jacobian, so that its condition number is not squared.
 *
 * @param jacobian ∂rᵢ/∂pⱼ at index j·residualCount + i.
 */
export function estimateCovariance(
  jacobian: Float64Array,
  residualCount: number,
  parameterCount: number,
  rankTolerance = DEFAULT_RANK_TOLERANCE,
): CovarianceEstimate {
  if (jacobian.length !== residualCount * parameterCount) {
    throw new Error(`estimateCovariance: ${jacobian.length} derivatives for ${residualCount} × ${parameterCount}`);
  }
  const columnScales = new Float64Array(parameterCount);
  const { singularValues, rightVectors } = decomposeScaled(jacobian, residualCount, parameterCount, columnScales);

  const undetermined: Float64Array[] = [];
  const determined: boolean[] = new Array(parameterCount).fill(true);
  const covariance = new Float64Array(parameterCount * parameterCount);
  for (let k = 0; k < parameterCount; k++) {
    const direction = rightVectors.slice(k * parameterCount, (k + 1) * parameterCount);
    if (singularValues[k] <= rankTolerance * singularValues[0]) {
      undetermined.push(direction);
      for (let j = 0; j < parameterCount; j++) {
        if (Math.abs(direction[j]) > PARTICIPATION_TOLERANCE) determined[j] = false;
      }
      continue;
    }
    for (let j = 0; j < parameterCount; j++) direction[j] /= columnScales[j] * singularValues[k];
    for (let i = 0; i < parameterCount; i++) {
      for (let j = 0; j < parameterCount; j++) covariance[i * parameterCount + j] += direction[i] * direction[j];
    }
  }
  const rank = parameterCount - undetermined.length;
  return { parameterCount, columnScales, singularValues, rightVectors, rank, undetermined, determined, covariance };
}

/** Covariance of two parameters (the variance, if they are the same); null where either is not determined. */
export function covarianceOf(estimate: CovarianceEstimate, first: number, second: number): number | null {
  const { determined, covariance, parameterCount } = estimate;
  return determined[first] && determined[second] ? covariance[first * parameterCount + second] : null;
}

/** Singular values and right vectors of the Jacobian with unit columns, whose norms are written to `columnScales`. */
function decomposeScaled(
  jacobian: Float64Array,
  residualCount: number,
  parameterCount: number,
  columnScales: Float64Array,
) {
  if (parameterCount === 0) return { singularValues: new Float64Array(0), rightVectors: new Float64Array(0) };
  const rowCount = Math.max(residualCount, parameterCount);
  const columns = new Float64Array(rowCount * (parameterCount + 1));
  for (let j = 0; j < parameterCount; j++) {
    let sum = 0;
    for (let i = 0; i < residualCount; i++) sum += jacobian[j * residualCount + i] ** 2;
    if (!Number.isFinite(sum)) throw new Error(`estimateCovariance: column ${j} of the Jacobian is not finite`);
    columnScales[j] = sum > 0 ? Math.sqrt(sum) : 1;
    for (let i = 0; i < residualCount; i++) {
      columns[j * rowCount + i] = jacobian[j * residualCount + i] / columnScales[j];
    }
  }
  const triangle = new Float64Array(parameterCount * parameterCount);
  triangularise(columns, rowCount, parameterCount, { triangle, rightHand: new Float64Array(parameterCount) });
  return decomposeSingular(triangle, parameterCount);
}
