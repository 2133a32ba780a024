import { fitFromScratch } from '../fit/fitFromScratch.ts';
import { fitProblem, type ProblemFit } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { bootstrap, type Replicate } from '../inference/bootstrap.ts';
import { buildProblem } from '../model/problem.ts';
import type { Progress } from './progress.ts';
import type { RunResult } from './runResult.ts';
import { usedPoints } from './usedPoints.ts';

/** What must be known of a result to repeat its run. */
export type RepeatableResult = Pick<RunResult, 'run' | 'sheet' | 'quantities'>;

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
 * Computes a share of the parametric bootstrap of a fitted run. Shares may be
 * computed apart and joined: their numbers do not depend on how they were
 * shared out.
 */
export function* bootstrapRun(
  result: RepeatableResult,
  share: BootstrapShare,
): Generator<Progress, BootstrapReplicates> {
  yield { doing: 'fitting', share: 0 };
  const fit = fitAgain(result);
  const ids = fit.weighted.runs[0].run.design.quantities.map(({ id }) => id);
  const work = bootstrap(fit, 0, share.from, share.to, share.seed);
  for (;;) {
    const step = work.next();
    if (step.done === true) return { ids, replicates: step.value };
    yield { doing: 'repeating the run in simulation', share: (step.value + 1 - share.from) / (share.to - share.from) };
  }
}

/** The fit of a result: from its own values, so that it ends in the same minimum; from scratch where it left some open. */
function fitAgain({ run, sheet, quantities }: RepeatableResult): ProblemFit {
  const { volumes, readings } = usedPoints(run);
  const problem = buildProblem([{ sheet, volumes, readings }]);
  if (!problem.ok) throw new Error('bootstrapRun: only a run that was fitted can be repeated');
  const valuesById = new Map(quantities.map(({ id, value }) => [id, value]));
  const values = problem.value.parameters.map(({ id, kind }) => (kind === 'fitted' ? (valuesById.get(id) ?? null) : 0));
  const known = values.filter((value) => value !== null);
  const fit =
    known.length === values.length
      ? fitProblem(problem.value, Float64Array.from(known))
      : fitFromScratch(problem.value).fit;
  if (!endings[fit.ending].usable) throw new Error('bootstrapRun: only a run that was fitted can be repeated');
  return fit;
}
