import { fitFromScratch } from '../../core/fit/fitFromScratch.ts';
import { fitProblem } from '../../core/fit/fitProblem.ts';
import { startingValues } from '../../core/fit/startingValues.ts';
import type { Problem } from '../../core/model/problem.ts';
import { benchProblem } from './benchRun.ts';
import { printTiming, timeOf } from './timeOf.ts';

/** The first start proposed, as parameters, without choosing among candidates. */
export function firstStart(problem: Problem): Float64Array {
  const [run] = problem.runs;
  const [values] = startingValues(run);
  const start = new Float64Array(problem.parameters.length);
  run.bindings.forEach((binding, q) => {
    if (binding.kind === 'parameter') start[binding.parameter] = values[q];
  });
  return start;
}

/** Evaluations and time of a whole fit. */
export function fitBench(): string[] {
  const problem = benchProblem(100);
  const start = firstStart(problem);
  const { weighted, ending, parameters } = fitProblem(problem, start);
  const { curveEvaluations, derivativeEvaluations } = weighted;
  const whole = timeOf(() => fitProblem(problem, start), 20);
  const automatic = timeOf(() => fitFromScratch(problem), 10);
  const evaluations = timeOf(() => {
    const residuals = new Float64Array(weighted.residualCount);
    const jacobian = new Float64Array(weighted.residualCount * weighted.parameterCount);
    for (let i = 0; i < derivativeEvaluations; i++) {
      parameters[0] += i % 2 === 0 ? 1e-4 : -1e-4;
      weighted.residuals(parameters, residuals);
      weighted.derivatives(parameters, jacobian);
    }
  }, 20);
  return [
    `Fit of 100 points, ${weighted.parameterCount} fitted quantities, cold start without candidates: ${ending}`,
    `  evaluations of the curve                    ${curveEvaluations} (at most 25)`,
    `  evaluations of derivatives                  ${derivativeEvaluations} (at most 20)`,
    `  whole fit                                   ${printTiming(whole)}`,
    `  of which curves and derivatives             ${printTiming(evaluations)}`,
    `  with automatic starts                       ${printTiming(automatic)}`,
  ];
}
