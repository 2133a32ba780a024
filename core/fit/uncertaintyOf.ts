import { bindingTerms } from '../model/binding.ts';
import type { ProblemRun } from '../model/problem.ts';
import type { CovarianceEstimate } from './covariance.ts';

/** Part of a gradient that may lie along an undetermined direction: rounding of its singular vectors. */
const participationTolerance = 1e-6;

/** Gradient with respect to the parameters of a function whose gradient with respect to the quantities of one run is given. */
export function parameterGradient(
  run: ProblemRun,
  quantityGradient: ArrayLike<number>,
  parameterCount: number,
): Float64Array {
  const gradient = new Float64Array(parameterCount);
  run.bindings.forEach((binding, q) => {
    if (quantityGradient[q] === 0) return;
    for (const { parameter, sensitivity } of bindingTerms(binding))
      gradient[parameter] += sensitivity * quantityGradient[q];
  });
  return gradient;
}

/** Covariance of two functions of the parameters by their gradients, to first order; null where the data leave either open. */
export function covarianceBetween(
  estimate: CovarianceEstimate,
  first: Float64Array,
  second: Float64Array,
): number | null {
  if (isOpen(estimate, first) || isOpen(estimate, second)) return null;
  const { parameterCount, covariance } = estimate;
  let sum = 0;
  for (let a = 0; a < parameterCount; a++)
    for (let b = 0; b < parameterCount; b++) sum += first[a] * covariance[a * parameterCount + b] * second[b];
  return sum;
}

/** Standard uncertainty of a function of the parameters; null where the data leave it open. */
export function uncertaintyOf(estimate: CovarianceEstimate, gradient: Float64Array): number | null {
  const variance = covarianceBetween(estimate, gradient, gradient);
  return variance === null ? null : Math.sqrt(Math.max(0, variance));
}

/** Whether a function moves along a direction of which the data say nothing. */
function isOpen(estimate: CovarianceEstimate, gradient: Float64Array): boolean {
  const { columnScales, undetermined } = estimate;
  if (undetermined.length === 0) return false;
  const scaled = gradient.map((g, j) => g / columnScales[j]);
  const length = Math.hypot(...scaled);
  return undetermined.some((direction) => {
    const along = direction.reduce((sum, d, j) => sum + d * scaled[j], 0);
    return Math.abs(along) > participationTolerance * length;
  });
}
