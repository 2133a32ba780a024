import { fitProblem, type ProblemFit } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import { type Intervals, intervalsOf } from './intervals.ts';

/** Lower minima that are followed before the last one is taken as it is. */
const mostDescents = 3;

/** A fit with its intervals, which no profile has found to lie above another minimum. */
export interface SettledFit {
  readonly fit: ProblemFit;
  readonly intervals: Intervals;
}

/** Takes the intervals of one run; where a profile comes upon a lower minimum, fits again from there. */
export function settledFit(first: ProblemFit, index: number): SettledFit {
  let fit = first;
  for (let descent = 0; ; descent++) {
    const intervals = intervalsOf(fit, index, pHRange(fit, index));
    if (intervals.better === null || descent === mostDescents) return { fit, intervals };
    const lower = fitProblem(fit.weighted.problem, intervals.better);
    if (!endings[lower.ending].usable) return { fit, intervals };
    fit = lower;
  }
}

/** Lowest and highest p[H⁺] of the curve of a run. */
function pHRange(fit: ProblemFit, index: number): readonly [number, number] {
  let lowest = Number.POSITIVE_INFINITY;
  let highest = Number.NEGATIVE_INFINITY;
  for (const x of fit.weighted.runs[index].model.logHydrogen) {
    lowest = Math.min(lowest, -x / Math.LN10);
    highest = Math.max(highest, -x / Math.LN10);
  }
  return [lowest, highest];
}
