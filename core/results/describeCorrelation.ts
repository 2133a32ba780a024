import type { ProblemFit } from '../fit/fitProblem.ts';
import { covarianceBetween, parameterGradient } from '../fit/uncertaintyOf.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import type { CorrelationResult } from './runResult.ts';

/** Correlation of all quantities of a run that the fit moves. */
export function describeCorrelation(fit: ProblemFit, weighted: WeightedRun): CorrelationResult {
  const { design, bindings } = weighted.run;
  const moving = design.quantities.flatMap(({ id }, q) => (bindings[q].kind === 'constant' ? [] : [{ id, q }]));
  const gradients = moving.map(({ q }) => {
    const unit = new Float64Array(design.quantities.length);
    unit[q] = 1;
    return parameterGradient(weighted.run, unit, fit.weighted.parameterCount);
  });
  const variances = gradients.map((gradient) => covarianceBetween(fit.covariance, gradient, gradient));
  const matrix = gradients.flatMap((first, a) =>
    gradients.map((second, b) => {
      const covariance = covarianceBetween(fit.covariance, first, second);
      const scale = Math.sqrt((variances[a] ?? 0) * (variances[b] ?? 0));
      return covariance === null || !(scale > 0) ? null : Math.max(-1, Math.min(1, covariance / scale));
    }),
  );
  return { ids: moving.map(({ id }) => id), matrix };
}
