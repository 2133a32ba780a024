import type { ProblemFit } from '../fit/fitProblem.ts';
import { distrustCut, robustFit } from '../fit/robustFit.ts';
import type { WeightedRun } from '../fit/weightedProblem.ts';
import { freeze } from '../inference/intervals.ts';
import { boundValue } from '../model/binding.ts';
import type { Run } from '../run/run.ts';
import { numberOrNull } from './numberOrNull.ts';
import type { QuantityResult, RobustResult } from './runResult.ts';
import type { UsedPoints } from './usedPoints.ts';

/** Where more than this share of the points is wild, it is the model that misses them. */
const largestShare = 0.2;

/** The run fitted with wild points set aside: which they are, and what they do to the answers. */
export function describeRobust(
  fit: ProblemFit,
  weighted: WeightedRun,
  run: Run,
  used: UsedPoints,
  quantities: readonly QuantityResult[],
): RobustResult | null {
  const found = robustFit(
    freeze(fit).problem,
    fit.parameters,
    fit.weighted.runs.map(({ firstResidual, predicted }, r) => ({
      firstResidual,
      count: predicted.length,
      degreesOfFreedom: fit.noise[r].degreesOfFreedom,
      isDeclared: fit.noise[r].declared,
    })),
  );
  if (found === null) return null;
  const distrusted = used.rows.flatMap((row, k) => {
    const i = weighted.firstResidual + k;
    const { line, volume_mL } = run.rows[row];
    return Math.abs(found.ratios[i]) > distrustCut ? [{ line, volume_mL, weight: found.weights[i] }] : [];
  });
  if (distrusted.length > largestShare * used.rows.length) return null;
  const moves = quantities.flatMap(({ id, state, value, u }, q) => {
    if (state !== 'fitted' || value === null || u === null) return [];
    const shift = numberOrNull(boundValue(weighted.run.bindings[q], found.parameters) - value);
    return shift === null ? [] : [{ id, shift, inU: shift / u }];
  });
  return { distrusted, moves };
}
