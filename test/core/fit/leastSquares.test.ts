import { describe, expect, it } from 'vitest';
import { solveLeastSquares } from '../../../core/fit/leastSquares.ts';
import { endings } from '../../../core/fit/leastSquaresEnding.ts';
import type { LeastSquaresProblem } from '../../../core/fit/leastSquaresProblem.ts';
import { createRandom } from '../../../core/numerics/createRandom.ts';

/** A problem from a model of one predictor and its derivatives, both written down as formulas. */
function problemOf(
  x: readonly number[],
  y: readonly number[],
  parameterCount: number,
  model: (p: Float64Array, x: number) => number,
  partials: (p: Float64Array, x: number) => readonly number[],
): LeastSquaresProblem {
  return {
    parameterCount,
    residualCount: x.length,
    residuals(p, residuals) {
      for (let i = 0; i < x.length; i++) residuals[i] = model(p, x[i]) - y[i];
      return true;
    },
    derivatives(p, jacobian) {
      for (let i = 0; i < x.length; i++) {
        const row = partials(p, x[i]);
        for (let j = 0; j < parameterCount; j++) jacobian[j * x.length + i] = row[j];
      }
      return true;
    },
  };
}

/** Residuals A p − b with the rows of A given. */
function linearProblem(rows: readonly (readonly number[])[], b: readonly number[]): LeastSquaresProblem {
  const x = rows.map((_, i) => i);
  return problemOf(
    x,
    b,
    rows[0].length,
    (p, i) => rows[i].reduce((sum, a, j) => sum + a * p[j], 0),
    (_, i) => rows[i],
  );
}

const times = [0, 1, 2, 3, 4, 6, 8, 10];

/** a·exp(−b·t) + c with seeded noise, in parameters divided by the given units. */
function decayProblem(units: readonly number[] = [1, 1, 1], noise = 0.01): LeastSquaresProblem {
  const random = createRandom(7);
  const [ua, ub, uc] = units;
  return problemOf(
    times,
    times.map((t) => 2 * Math.exp(-0.5 * t) + 0.3 + noise * random.normal()),
    3,
    (p, t) => p[0] * ua * Math.exp(-p[1] * ub * t) + p[2] * uc,
    (p, t) => {
      const decay = Math.exp(-p[1] * ub * t);
      return [ua * decay, -t * p[0] * ua * ub * decay, uc];
    },
  );
}

describe('solveLeastSquares', () => {
  it('gives the closed form for a straight line, in two evaluations of the derivatives', () => {
    const x = [1, 2, 3, 5, 8];
    const y = [2.1, 3.9, 6.2, 9.8, 16.3];
    const result = solveLeastSquares(
      problemOf(
        x,
        y,
        2,
        (p, at) => p[0] + p[1] * at,
        (_, at) => [1, at],
      ),
      [100, -50],
      // A straight line is done in one step if that step is allowed to be as long as it likes.
      { initialRadiusFactor: 1e6 },
    );
    const meanX = x.reduce((a, b) => a + b) / x.length;
    const meanY = y.reduce((a, b) => a + b) / x.length;
    const sxx = x.reduce((sum, v) => sum + (v - meanX) ** 2, 0);
    const sxy = x.reduce((sum, v, i) => sum + (v - meanX) * (y[i] - meanY), 0);
    const syy = y.reduce((sum, v) => sum + (v - meanY) ** 2, 0);
    expect(result.ending).toBe('gradient-converged');
    // Rounding alone: a few units in the last place of figures of order 100.
    expect(result.parameters[1]).toBeCloseTo(sxy / sxx, 12);
    expect(result.parameters[0]).toBeCloseTo(meanY - (sxy / sxx) * meanX, 12);
    expect(result.cost).toBeCloseTo(syy - sxy ** 2 / sxx, 12);
    expect(result.derivativeEvaluations).toBe(2);
    expect(result.residualEvaluations).toBe(2);
  });

  it('fits a decay from a rough start within the evaluations that a good fit needs', () => {
    const result = solveLeastSquares(decayProblem(), [1, 2, 0]);
    expect(endings[result.ending].usable).toBe(true);
    // Eight readings with noise 0.01 leave the parameters about 0.02 of freedom.
    expect(result.parameters[0]).toBeCloseTo(2, 1);
    expect(result.parameters[1]).toBeCloseTo(0.5, 1);
    expect(result.parameters[2]).toBeCloseTo(0.3, 1);
    expect(result.derivativeEvaluations).toBeLessThanOrEqual(12);
  });

  it('takes the same path in any units, to the last bit where the units are powers of two', () => {
    const path = (units: readonly number[]) => {
      const visited: number[][] = [];
      const start = [1, 2, 0.1].map((value, j) => value / units[j]);
      const result = solveLeastSquares(decayProblem(units), start, {
        onIteration: ({ parameters }) => {
          visited.push(Array.from(parameters, (value, j) => value * units[j]));
          return false;
        },
      });
      return { visited, result };
    };
    const plain = path([1, 1, 1]);
    const binary = path([2 ** 20, 2 ** -20, 2 ** 7]);
    expect(binary.visited).toEqual(plain.visited);

    const decimal = path([1e6, 1e-6, 1e6]);
    expect(decimal.result.iterations).toBe(plain.result.iterations);
    expect(decimal.result.ending).toBe(plain.result.ending);
    decimal.visited.forEach((point, k) => {
      // Rounding of the units, amplified by the condition of the problem (about 10) over a few steps.
      point.forEach((value, j) => {
        expect(Math.abs(value - plain.visited[k][j])).toBeLessThanOrEqual(1e-11);
      });
    });
  });

  it('is deterministic', () => {
    expect(solveLeastSquares(decayProblem(), [1, 2, 0])).toEqual(solveLeastSquares(decayProblem(), [1, 2, 0]));
  });

  it('takes damped steps that solve (JᵀJ + λD²)δ = −Jᵀr with a length within 10 % of the trust radius', () => {
    const rows = [
      [1, 2, 0.5],
      [3, -1, 0.1],
      [0.2, 4, 2],
      [1, 1, -3],
      [2, 0.3, 1],
    ];
    const b = [400, -300, 200, 500, 100];
    const start = [0.1, 0.2, -0.1];
    const factor = 0.5;
    const { parameters } = solveLeastSquares(linearProblem(rows, b), start, {
      initialRadiusFactor: factor,
      iterationLimit: 1,
    });
    const step = Array.from(parameters, (value, j) => value - start[j]);
    const dot = (u: readonly number[], v: readonly number[]) => u.reduce((sum, value, i) => sum + value * v[i], 0);
    const columns = start.map((_, j) => rows.map((row) => row[j]));
    const scales = columns.map((column) => Math.hypot(...column));
    const end = rows.map((row, i) => dot(row, Array.from(parameters)) - b[i]);
    // JᵀJδ + Jᵀr is the gradient at the far end of the step; −λ D_j² δ_j has to be the same.
    const dampings = columns.map((column, j) => -dot(column, end) / (scales[j] ** 2 * step[j]));
    expect(dampings[0]).toBeGreaterThan(1);
    // Relative, with room for the cancellation between 500 and steps of order 0.1.
    expect(Math.abs(dampings[1] / dampings[0] - 1)).toBeLessThan(1e-10);
    expect(Math.abs(dampings[2] / dampings[0] - 1)).toBeLessThan(1e-10);
    const radius = factor * Math.hypot(...start.map((value, j) => value * scales[j]));
    const length = Math.hypot(...step.map((value, j) => value * scales[j]));
    expect(Math.abs(length / radius - 1)).toBeLessThanOrEqual(0.1);
  });

  it('does not square the condition number', () => {
    // Two columns that differ by 1e-9: their normal matrix is singular in double precision.
    const rows = times.map((t) => [1 + 1e-9 * t, 1, t * t]);
    const truth = [3, -2, 0.5];
    const b = rows.map((row) => row.reduce((sum, a, j) => sum + a * truth[j], 0));
    const result = solveLeastSquares(linearProblem(rows, b), [0, 0, 0]);
    expect(endings[result.ending].usable).toBe(true);
    expect(result.rank).toBe(3);
    // Rounding of b (1e-15) times the condition number (about 1e9).
    expect(Math.abs(result.parameters[0] - 3)).toBeLessThan(1e-5);
    expect(Math.abs(result.parameters[1] + 2)).toBeLessThan(1e-5);
  });

  it('ends usable where only a sum is determined, and moves along nothing else', () => {
    const rows = times.map((t) => [t, t, 1]);
    const b = times.map((t) => 6 * t + 1);
    const result = solveLeastSquares(linearProblem(rows, b), [1, 3, 0.5]);
    expect(endings[result.ending].usable).toBe(true);
    expect(result.rank).toBe(2);
    // The shortest way from (1, 3) to a sum of 6 is (2, 4).
    expect(result.parameters[0]).toBeCloseTo(2, 10);
    expect(result.parameters[1]).toBeCloseTo(4, 10);
  });

  it('copes with fewer residuals than parameters', () => {
    const result = solveLeastSquares(linearProblem([[1, 1]], [4]), [1, 1]);
    expect(endings[result.ending].usable).toBe(true);
    expect(result.rank).toBe(1);
    expect(result.parameters[0]).toBeCloseTo(2, 12);
    expect(result.parameters[1]).toBeCloseTo(2, 12);
  });

  it('fits a single parameter and leaves one without influence alone', () => {
    const one = solveLeastSquares(linearProblem([[2], [1]], [8, 4]), [1]);
    expect(one.parameters[0]).toBeCloseTo(4, 12);
    const two = solveLeastSquares(
      linearProblem(
        [
          [2, 0],
          [1, 0],
        ],
        [8, 4],
      ),
      [1, 17],
    );
    expect(two.parameters[0]).toBeCloseTo(4, 12);
    expect(two.parameters[1]).toBe(17);
    expect(two.rank).toBe(1);
    expect(endings[two.ending].usable).toBe(true);
  });

  it('does not call it a fit where no parameter has any influence', () => {
    const result = solveLeastSquares(linearProblem([[0], [0]], [1, 2]), [5]);
    expect(result.ending).toBe('stuck');
    expect(endings[result.ending].usable).toBe(false);
  });

  it('returns the residuals of the given values where nothing is to be fitted', () => {
    const result = solveLeastSquares(linearProblem([[], []], [3, -4]), []);
    expect(result.ending).toBe('no-parameters');
    expect(result.cost).toBe(25);
    expect(endings[result.ending].usable).toBe(true);
  });
});

describe('the region where the model can be computed', () => {
  /** ln p against −1, 0 and 1.1: the first full step from 50 leads to a negative p. */
  function logarithm(refuse: boolean): LeastSquaresProblem {
    const plain = problemOf(
      [-1, 0, 1.1],
      [-1, 0, 1.1],
      1,
      (p) => Math.log(p[0]),
      (p) => [1 / p[0]],
    );
    return {
      ...plain,
      residuals: (p, residuals) => (refuse && p[0] <= 0 ? false : plain.residuals(p, residuals)),
    };
  }

  it.each([true, false])('steps back from its edge (said so: %s; else not a number)', (refuse) => {
    const accepted: boolean[] = [];
    const result = solveLeastSquares(logarithm(refuse), [50], {
      initialRadiusFactor: 100,
      onIteration: (progress) => {
        accepted.push(progress.accepted);
        return false;
      },
    });
    expect(accepted[0]).toBe(false);
    expect(endings[result.ending].usable).toBe(true);
    // Tolerance of the fit: 1e-8 of the residuals.
    expect(result.parameters[0]).toBeCloseTo(Math.exp(0.1 / 3), 7);
  });

  it('steps back where the derivatives cannot be computed', () => {
    const plain = logarithm(true);
    let refused = 0;
    const result = solveLeastSquares(
      {
        ...plain,
        derivatives(p, jacobian) {
          if (p[0] < 1) {
            refused++;
            return false;
          }
          return plain.derivatives(p, jacobian);
        },
      },
      // The first full step leads from 4 to −1.4, the second, half as long, to where nothing can be said.
      [4],
    );
    expect(refused).toBeGreaterThan(0);
    expect(endings[result.ending].usable).toBe(true);
    expect(result.parameters[0]).toBeCloseTo(Math.exp(0.1 / 3), 7);
  });

  it('names a start that lies outside', () => {
    const result = solveLeastSquares(logarithm(true), [-1]);
    expect(result.ending).toBe('start-not-computable');
    expect(result.cost).toBeNull();
    expect(endings[result.ending].usable).toBe(false);
    expect(solveLeastSquares(logarithm(false), [-1]).ending).toBe('start-not-computable');
    const noDerivatives = { ...logarithm(true), derivatives: () => false };
    expect(solveLeastSquares(noDerivatives, [1]).ending).toBe('start-not-computable');
  });
});

describe('how a fit ends', () => {
  it('at the limit of iterations, with the best point so far', () => {
    const result = solveLeastSquares(decayProblem(), [1, 2, 0], { iterationLimit: 2 });
    expect(result.ending).toBe('iteration-limit');
    expect(result.iterations).toBe(2);
    expect(endings[result.ending].usable).toBe(false);
    const start = solveLeastSquares(decayProblem(), [1, 2, 0], { iterationLimit: 0 });
    expect(result.cost).toBeLessThan(start.cost ?? 0);
  });

  it('when it is asked to stop', () => {
    const result = solveLeastSquares(decayProblem(), [1, 2, 0], { onIteration: ({ iteration }) => iteration === 3 });
    expect(result.ending).toBe('stopped');
    expect(result.iterations).toBe(3);
  });

  it('stuck, at its start, where the derivatives point uphill', () => {
    const plain = decayProblem();
    const result = solveLeastSquares(
      {
        ...plain,
        derivatives(p, jacobian) {
          plain.derivatives(p, jacobian);
          for (let i = 0; i < jacobian.length; i++) jacobian[i] = -jacobian[i];
          return true;
        },
      },
      [1, 2, 0.1],
    );
    expect(result.ending).toBe('stuck');
    expect(endings[result.ending].usable).toBe(false);
    expect(Array.from(result.parameters)).toEqual([1, 2, 0.1]);
  });

  it('at the exact answer with nothing left over', () => {
    const result = solveLeastSquares(decayProblem([1, 1, 1], 0), [1, 2, 0]);
    expect(endings[result.ending].usable).toBe(true);
    // Rounding times the condition of the problem.
    expect(result.parameters[0]).toBeCloseTo(2, 12);
    expect(result.parameters[1]).toBeCloseTo(0.5, 12);
    expect(result.parameters[2]).toBeCloseTo(0.3, 12);
  });

  it.each([0, 0.01])('converged although the model carries noise of its own (data noise %d)', (dataNoise) => {
    // An iterated model is exact to about 1e-11 only; residuals divided by 0.005 then carry 2e-9.
    const plain = decayProblem([1, 1, 1], dataNoise);
    const clean = solveLeastSquares(plain, [1, 2, 0]);
    for (let seed = 0; seed < 50; seed++) {
      const jitter = createRandom(seed);
      const noisy: LeastSquaresProblem = {
        ...plain,
        residuals(p, residuals) {
          plain.residuals(p, residuals);
          for (let i = 0; i < residuals.length; i++) residuals[i] = residuals[i] / 0.005 + 2e-9 * jitter.normal();
          return true;
        },
        derivatives(p, jacobian) {
          plain.derivatives(p, jacobian);
          for (let i = 0; i < jacobian.length; i++) jacobian[i] /= 0.005;
          return true;
        },
      };
      const result = solveLeastSquares(noisy, [1, 2, 0], { residualResolution: 1e-6 });
      expect(endings[result.ending].usable, `${result.ending}, seed ${seed}`).toBe(true);
      expect(result.iterations).toBeLessThanOrEqual(15);
      // One standard uncertainty is about 0.01 here; a millionth of it is lost to the noise of the model.
      for (let j = 0; j < 3; j++) expect(Math.abs(result.parameters[j] - clean.parameters[j])).toBeLessThan(1e-8);
    }
  });

  it('is judged by a table in which only a minimum, or nothing to do, counts as usable', () => {
    const usable = Object.entries(endings).flatMap(([code, { usable: yes }]) => (yes ? [code] : []));
    expect(usable.sort()).toEqual(['cost-converged', 'gradient-converged', 'no-parameters', 'step-converged']);
  });
});

describe('what the engine asks of a problem', () => {
  it('derivatives only directly after the residuals at the same point, each point once, all of it counted', () => {
    const plain = decayProblem();
    const visited: string[] = [];
    let differentiated = 0;
    const result = solveLeastSquares(
      {
        ...plain,
        residuals(p, residuals) {
          visited.push(Array.from(p).join());
          return plain.residuals(p, residuals);
        },
        derivatives(p, jacobian) {
          differentiated++;
          expect(Array.from(p).join()).toBe(visited.at(-1));
          return plain.derivatives(p, jacobian);
        },
      },
      [1, 2, 0],
    );
    expect(new Set(visited).size).toBe(visited.length);
    expect(result.residualEvaluations).toBe(visited.length);
    expect(result.derivativeEvaluations).toBe(differentiated);
  });

  it('hands back residuals and derivatives of the very point it returns', () => {
    const problem = decayProblem();
    const result = solveLeastSquares(problem, [1, 2, 0]);
    const residuals = new Float64Array(problem.residualCount);
    const jacobian = new Float64Array(problem.residualCount * problem.parameterCount);
    problem.residuals(result.parameters, residuals);
    problem.derivatives(result.parameters, jacobian);
    expect(result.residuals).toEqual(residuals);
    expect(result.jacobian).toEqual(jacobian);
    expect(result.cost).toBe(residuals.reduce((sum, r) => sum + r * r, 0));
  });

  it('keeps the limits of a single step and still arrives', () => {
    const limits = [0.5, 0.1, Infinity];
    let previous = [1, 2, 0];
    let largest = 0;
    const limited = solveLeastSquares(decayProblem(), previous, {
      stepLimits: limits,
      onIteration: ({ parameters }) => {
        parameters.forEach((value, j) => {
          largest = Math.max(largest, Math.abs(value - previous[j]) / limits[j]);
        });
        previous = Array.from(parameters);
        return false;
      },
    });
    expect(largest).toBeLessThanOrEqual(1);
    expect(largest).toBeGreaterThan(0.7);
    const free = solveLeastSquares(decayProblem(), [1, 2, 0]);
    // Both stop within 1e-7 of the minimum, in standard uncertainties.
    for (let j = 0; j < 3; j++) expect(limited.parameters[j]).toBeCloseTo(free.parameters[j], 8);
  });

  it('throws where start and problem do not fit', () => {
    expect(() => solveLeastSquares(decayProblem(), [1, 2])).toThrow('3 finite starting values');
    expect(() => solveLeastSquares(decayProblem(), [1, 2, Number.NaN])).toThrow('3 finite starting values');
    expect(() => solveLeastSquares(decayProblem(), [1, 2, 3], { stepLimits: [1, 0, 1] })).toThrow(
      'positive step limits',
    );
  });
});
