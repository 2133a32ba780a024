import { fitProblem, type ProblemFit } from '../fit/fitProblem.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import type { Problem } from '../model/problem.ts';
import { RunModel } from '../model/runModel.ts';
import { createRandom, type Random } from '../numerics/createRandom.ts';

/** Seeds of neighbouring replicates lie this far apart, so that one seed's replicates are not another's. */
const seedStride = 1_000_003;

/** Values of all quantities of one run in one simulated repetition; null where it could not be fitted. */
export type Replicate = Float64Array | null;

/**
 * Repeats a run in simulation and fits every repetition as the run itself:
 * readings from the fitted curve with noise as fitted, volumes with their
 * errors, declared values drawn anew (parametric bootstrap: Efron, B.;
 * Tibshirani, R. J., An Introduction to the Bootstrap, Chapman & Hall 1993,
 * section 6.5). Yields the number of each replicate when it is done.
 *
 * A replicate depends on the seed and its own number alone, so that any share
 * of them may be computed anywhere.
 *
 * @param index of the run whose quantities are wanted
 * @param from first replicate, and `to` the one after the last
 */
export function* bootstrap(
  fit: ProblemFit,
  index: number,
  from: number,
  to: number,
  seed: number,
): Generator<number, Replicate[]> {
  const replicates: Replicate[] = [];
  for (let number = from; number < to; number++) {
    const repeated = repeat(fit, createRandom(seed * seedStride + number));
    const again = repeated === null ? null : fitProblem(repeated, fit.parameters);
    replicates.push(again !== null && endings[again.ending].usable ? again.weighted.runs[index].values.slice() : null);
    yield number;
  }
  return replicates;
}

/** The same problem with readings and declarations drawn anew; null where a drawn volume leaves no mixture. */
function repeat(fit: ProblemFit, random: Random): Problem | null {
  const { problem, runs } = fit.weighted;
  const parameters = problem.parameters.map((parameter, j) =>
    parameter.kind === 'knowledge' ? { ...parameter, declared: fit.parameters[j] + random.normal() } : parameter,
  );
  const repeated: Problem['runs'][number][] = [];
  for (const [r, { run, values }] of runs.entries()) {
    const noise = fit.noise[r];
    const volumes = run.volumes.slice();
    const order = Array.from(volumes.keys()).sort((a, b) => run.volumes[a] - run.volumes[b] || a - b);
    let sum = 0;
    order.forEach((point, k) => {
      const isDosed = run.volumes[point] > (k === 0 ? 0 : run.volumes[order[k - 1]]);
      if (isDosed) sum += noise.dose_mL * random.normal();
      volumes[point] += sum + noise.setting_mL * random.normal();
    });
    const readings = new Float64Array(volumes.length);
    if (!new RunModel(run.design, volumes, null).predict(values, readings)) return null;
    repeated.push({ ...run, readings: readings.map((reading) => reading + noise.reading * random.normal()) });
  }
  return { runs: repeated, parameters };
}
