import { buildProblem, type Problem, type ProblemRun } from '../model/problem.ts';
import { dataSlopes } from './dataSlopes.ts';
import { fitProblem, type ProblemFit } from './fitProblem.ts';
import { endings } from './leastSquaresEnding.ts';
import { startingValues } from './startingValues.ts';
import { thinnedProblem } from './thinnedProblem.ts';
import { WeightedProblem } from './weightedProblem.ts';

/** Points on which starts are compared; more would only cost time. */
const comparedPoints = 60;
/** Standard uncertainties with which they are compared: wide, so that the shape decides. */
const comparedReadingNoise = 0.05;
const comparedSetting_mL = 0.02;
/** A point that is off by more than this many standard uncertainties counts as no worse. */
const largestMiss = 10;
/** Starts that are fitted on the compared points, and ends of those that are fitted on all points. */
const fittedStarts = 6;
const fittedEnds = 2;
/** Two objectives closer than this are the same minimum. */
const sameObjective = 1e-3;

/** A fit without help from the user. */
export interface FitFromScratch {
  readonly fit: ProblemFit;
  /** The next best of them; null where all starts ended in one place. */
  readonly runnerUp: ProblemFit | null;
}

/** Fits a problem from several starts of its own and keeps the best end. */
export function fitFromScratch(problem: Problem): FitFromScratch {
  const starts = problem.runs.length === 1 ? rankStarts(problem) : [toParameters(problem, problem.runs.map(bestOfRun))];
  const few = problem.runs.length === 1 ? thinnedProblem(problem, comparedPoints) : problem;
  const ends =
    few === problem && starts.length === 1
      ? starts
      : distinct(starts.slice(0, fittedStarts).map((start) => fitProblem(few, start))).map((fit) => fit.parameters);
  const fits = distinct(ends.slice(0, fittedEnds).map((start) => fitProblem(problem, start)));
  return { fit: fits[0], runnerUp: fits[1] ?? null };
}

/**
 * Minus twice the log-likelihood, up to a constant: what ends with different
 * weights are compared by.
 */
export function objectiveOf(fit: ProblemFit): number {
  if (fit.cost === null) return Number.POSITIVE_INFINITY;
  let objective = fit.cost;
  for (const { whitening } of fit.weighted.runs) objective += whitening.logDeterminant;
  return objective;
}

/** Best end first, each minimum once; an end that is no minimum stands behind all that are. */
function distinct(fits: readonly ProblemFit[]): ProblemFit[] {
  const ranked = fits
    .map((fit) => ({ fit, objective: objectiveOf(fit), usable: endings[fit.ending].usable }))
    .sort((a, b) => Number(b.usable) - Number(a.usable) || a.objective - b.objective);
  const kept: typeof ranked = [];
  for (const entry of ranked)
    if (kept.every(({ objective }) => !(Math.abs(objective - entry.objective) <= sameObjective))) kept.push(entry);
  return kept.map(({ fit }) => fit);
}

/** All starts of a problem of one run, best first, as parameters. */
function rankStarts(problem: Problem): Float64Array[] {
  const [run] = problem.runs;
  const weighted = new WeightedProblem(thinnedProblem(problem, comparedPoints));
  const [{ run: few, whitening }] = weighted.runs;
  const unit = run.design.readingKind === 'mV' ? run.design.nernstSlope_mV : 1;
  const noise = { reading: comparedReadingNoise * unit, setting_mL: comparedSetting_mL, dose_mL: 0 };
  whitening.set(noise, dataSlopes(few.volumes, few.readings));
  const residuals = new Float64Array(weighted.residualCount);
  return startingValues(run)
    .map((values) => {
      const start = toParameters(problem, [values]);
      if (!weighted.residuals(start, residuals)) return { start, score: Number.POSITIVE_INFINITY };
      const score = residuals.reduce((sum, r) => sum + Math.min(Math.abs(r), largestMiss), 0);
      return { start, score };
    })
    .sort((a, b) => a.score - b.score)
    .map(({ start }) => start);
}

/** Values of all quantities of a run at the best end of a fit of this run alone. */
function bestOfRun(run: ProblemRun): Float64Array {
  const alone = buildProblem([run]);
  if (!alone.ok) throw new Error('a run of a problem is no larger than the problem');
  return fitFromScratch(alone.value).fit.weighted.runs[0].values;
}

/** Parameters that give the runs these values; where runs share one, the mean of theirs. Knowledge starts at 0. */
function toParameters(problem: Problem, values: readonly Float64Array[]): Float64Array {
  const sums = new Float64Array(problem.parameters.length);
  const counts = new Float64Array(problem.parameters.length);
  problem.runs.forEach(({ bindings }, r) => {
    bindings.forEach((binding, q) => {
      if (binding.kind !== 'parameter') return;
      sums[binding.parameter] += values[r][q];
      counts[binding.parameter]++;
    });
  });
  return sums.map((sum, j) => (counts[j] > 0 ? sum / counts[j] : 0));
}
