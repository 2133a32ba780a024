import type { Problem } from '../model/problem.ts';

/** The same problem on fewer points of every run, evenly taken, both ends included. Runs that are short enough stay as they are. */
export function thinnedProblem(problem: Problem, pointsOfRun: number): Problem {
  if (problem.runs.every(({ volumes }) => volumes.length <= pointsOfRun)) return problem;
  const runs = problem.runs.map((run) => {
    const count = run.volumes.length;
    if (count <= pointsOfRun) return run;
    const kept = Array.from({ length: pointsOfRun }, (_, k) => Math.round((k * (count - 1)) / (pointsOfRun - 1)));
    const take = (values: Float64Array) => Float64Array.from(kept, (i) => values[i]);
    return { ...run, volumes: take(run.volumes), readings: take(run.readings) };
  });
  return { ...problem, runs };
}
