import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { solveLeastSquares } from '../../core/fit/leastSquares.ts';
import { createRandom } from '../../core/numerics/createRandom.ts';
import { printTiming, timeOf } from './timeOf.ts';

const points = 100;
const parameters = 5;

/** The engine on a model that costs nothing, and the share of it that is the library's damped step. */
export function engineBench(): string[] {
  const random = createRandom(7);
  const matrix = Float64Array.from({ length: points * parameters }, () => random.normal());
  const observed = Float64Array.from({ length: points }, () => random.normal());
  let iterations = 0;
  const whole = timeOf(() => {
    const result = solveLeastSquares(
      {
        parameterCount: parameters,
        residualCount: points,
        residuals: (p, r) => {
          for (let i = 0; i < points; i++) {
            r[i] = -observed[i];
            for (let j = 0; j < parameters; j++) r[i] += matrix[j * points + i] * Math.sinh(p[j]);
          }
          return true;
        },
        derivatives: (p, jacobian) => {
          for (let j = 0; j < parameters; j++)
            for (let i = 0; i < points; i++) jacobian[j * points + i] = matrix[j * points + i] * Math.cosh(p[j]);
          return true;
        },
      },
      new Float64Array(parameters).fill(1),
    );
    iterations = result.iterations;
  }, 50);
  const x = Array.from({ length: parameters }, (_, i) => i);
  const library = timeOf(() => {
    levenbergMarquardt({ x, y: new Float64Array(parameters) }, (w: number[]) => (i: number) => w[i] + 0.1, {
      initialValues: new Array(parameters).fill(0),
      damping: 0.01,
      maxIterations: 1,
      errorTolerance: Number.NEGATIVE_INFINITY,
      jacobianFunction: () => (i: number) => x.map((j) => (i === j ? 1 : 0)),
    });
  }, 500);
  return [
    `Engine without a model, ${points} residuals, ${parameters} parameters`,
    `  per iteration                               ${printTiming(scaled(whole, iterations))}`,
    `  the library's damped step                   ${printTiming(library)}`,
    `  share of the library                        ${((100 * library.median) / (whole.median / iterations)).toFixed(0)} %`,
  ];
}

function scaled<Timing extends { median: number; fastest: number; slowest: number }>(timing: Timing, by: number) {
  return { median: timing.median / by, fastest: timing.fastest / by, slowest: timing.slowest / by };
}
