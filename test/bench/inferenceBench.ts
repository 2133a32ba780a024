import { fitFromScratch } from '../../core/fit/fitFromScratch.ts';
import { fitProblem } from '../../core/fit/fitProblem.ts';
import { bootstrap } from '../../core/inference/bootstrap.ts';
import { intervalsOf } from '../../core/inference/intervals.ts';
import { climb } from '../core/inference/ladderStudy.ts';
import { benchProblem } from './benchRun.ts';
import { firstStart } from './fitBench.ts';
import { printTiming, timeOf } from './timeOf.ts';

/** Quantities of a full set of profiles, and what it and the ladder may cost in single fits. */
const profiledQuantities = 6;
const fitsPerProfileSet = 25;
const fitsPerLadder = 150;
const replicates = 50;

/** What intervals, the ladder and the bootstrap cost, in curves of one cold fit. */
export function inferenceBench(): string[] {
  const problem = benchProblem(100);
  const { fit } = fitFromScratch(problem);
  const ofOneFit = fitProblem(problem, firstStart(problem)).weighted.curveEvaluations;
  const intervals = intervalsOf(fit, 0, [2, 12]);
  const profiled = intervals.quantities.filter((quantity) => quantity !== null).length;
  const perSet = (intervals.curveEvaluations * profiledQuantities) / profiled / ofOneFit;
  const [{ sheet, volumes, readings }] = problem.runs;
  const ladder = climb(sheet, volumes, readings);
  const profiles = timeOf(() => intervalsOf(fit, 0, [2, 12]), 3);
  const ladders = timeOf(() => climb(sheet, volumes, readings), 1, 5);
  const repeated = timeOf(
    () => {
      for (const _ of bootstrap(fit, 0, 0, replicates, 1));
    },
    1,
    5,
  );
  return [
    `Intervals, ladder and bootstrap of 100 points; one cold fit takes ${ofOneFit} curves`,
    `  curves of ${profiled} profiles                        ${intervals.curveEvaluations}, for ${profiledQuantities} of them ${perSet.toFixed(1)} fits (at most ${fitsPerProfileSet})`,
    `  time of these profiles                      ${printTiming(profiles)}`,
    `  curves of a ladder                          ${ladder.curveEvaluations}, ${(ladder.curveEvaluations / ofOneFit).toFixed(0)} fits (at most ${fitsPerLadder})`,
    `  time of a ladder                            ${printTiming(ladders)}`,
    `  time of ${replicates} bootstrap replicates             ${printTiming(repeated)}`,
  ];
}
