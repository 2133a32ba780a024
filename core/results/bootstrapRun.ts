import { fitFromScratch } from '../fit/fitFromScratch.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { bootstrap, type Replicate } from '../inference/bootstrap.ts';
import { buildProblem } from '../model/problem.ts';
import type { Run } from '../run/run.ts';
import type { Sheet } from '../sheet/sheet.ts';
import type { Progress } from './progress.ts';
import { usedPoints } from './usedPoints.ts';

/** A share of the replicates of a run: from one number up to, but without, another. */
export interface BootstrapShare {
  readonly from: number;
  readonly to: number;
  readonly seed: number;
}

/** Replicates of a fitted run, in the order of their numbers, with the ids that their values stand for. */
export interface BootstrapReplicates {
  readonly ids: readonly string[];
  readonly replicates: readonly Replicate[];
}

/**
 * Computes a share of the parametric bootstrap of a run. Shares may be computed
 * apart and joined: their numbers do not depend on how they were shared out.
 *
 * @param sheet the complete sheet of the result that is to be checked
 */
export function* bootstrapRun(run: Run, sheet: Sheet, share: BootstrapShare): Generator<Progress, BootstrapReplicates> {
  yield { doing: 'fitting', share: 0 };
  const { volumes, readings } = usedPoints(run);
  const problem = buildProblem([{ sheet, volumes, readings }]);
  if (!problem.ok) throw new Error('only a run that was fitted can be repeated');
  const { fit } = fitFromScratch(problem.value);
  if (!endings[fit.ending].usable) throw new Error('only a run that was fitted can be repeated');
  const ids = fit.weighted.runs[0].run.design.quantities.map(({ id }) => id);
  const climb = bootstrap(fit, 0, share.from, share.to, share.seed);
  for (;;) {
    const step = climb.next();
    if (step.done === true) return { ids, replicates: step.value };
    yield { doing: 'repeating the run in simulation', share: (step.value + 1 - share.from) / (share.to - share.from) };
  }
}
