import type { ProblemFit } from '../fit/fitProblem.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import type { Quantity } from '../model/quantity.ts';
import { plausibleError } from './plausibleError.ts';

/** How far the parameters would move if an assumed quantity were wrong by its plausible error. */
export interface AssumedInfluence {
  readonly id: string;
  /** Change of every parameter of the problem. */
  readonly parameterShift: Float64Array;
  /** Change of the assumed quantity itself. */
  readonly error: number;
  readonly quantity: number;
}

/**
 * Influence of every fixed quantity of a run that nobody has confirmed, to
 * first order: the shift of the minimum is −C Jᵀ (dr/dq) Δq.
 */
export function assumedInfluences(fit: ProblemFit, weighted: WeightedRun): AssumedInfluence[] {
  const { design } = weighted.run;
  const assumed = design.quantities.flatMap((quantity, q) => (isAssumedFixed(quantity) ? [q] : []));
  if (assumed.length === 0) return [];
  const count = weighted.predicted.length;
  const derivatives = new Float64Array(assumed.length * count);
  weighted.model.predict(weighted.values, weighted.predicted);
  weighted.model.differentiate(Int32Array.from(assumed), derivatives, new Float64Array(count));
  for (let j = 0; j < assumed.length; j++) weighted.whitening.apply(derivatives, j * count);
  const { parameterCount, residualCount } = fit.weighted;
  const { covariance } = fit.covariance;
  return assumed.map((q, j) => {
    const quantity = design.quantities[q];
    const error = plausibleError(quantity, weighted.values[q]);
    const pull = new Float64Array(parameterCount);
    for (let a = 0; a < parameterCount; a++) {
      const column = a * residualCount + weighted.firstResidual;
      for (let i = 0; i < count; i++) pull[a] += fit.jacobian[column + i] * derivatives[j * count + i];
    }
    const parameterShift = new Float64Array(parameterCount);
    for (let a = 0; a < parameterCount; a++)
      for (let b = 0; b < parameterCount; b++)
        parameterShift[a] -= covariance[a * parameterCount + b] * pull[b] * error;
    return { id: quantity.id, parameterShift, error, quantity: q };
  });
}

function isAssumedFixed({ declaration }: Quantity): boolean {
  return declaration.state === 'fixed' && declaration.assumed;
}
