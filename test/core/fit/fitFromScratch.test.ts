import { describe, expect, it } from 'vitest';
import { covarianceOf } from '../../../core/fit/covariance.ts';
import { fitFromScratch, objectiveOf } from '../../../core/fit/fitFromScratch.ts';
import { fitProblem } from '../../../core/fit/fitProblem.ts';
import { endings } from '../../../core/fit/leastSquaresEnding.ts';
import type { Problem } from '../../../core/model/problem.ts';
import { type Experiment, experimentProblem, perform, problemOf, sheetOf, usualErrors } from '../../experiment.ts';

function expectTruth(problem: Problem, truth: readonly number[]): void {
  const { fit } = fitFromScratch(problem);
  expect(endings[fit.ending].usable, fit.ending).toBe(true);
  problem.parameters.forEach(({ id, kind }, j) => {
    if (kind !== 'fitted') return;
    const u = Math.sqrt(covarianceOf(fit.covariance, j, j) ?? 0);
    // Four standard uncertainties, one in 15,000 for each; seeds are fixed.
    expect(Math.abs(fit.parameters[j] - truth[j]) / u, id).toBeLessThan(4);
  });
  // No worse than from the truth itself.
  const start = Float64Array.from(problem.parameters, ({ kind }, j) => (kind === 'fitted' ? truth[j] : 0));
  expect(objectiveOf(fit)).toBeLessThan(objectiveOf(fitProblem(problem, start)) + 1e-3);
}

const errors = { seed: 21, ...usualErrors };

describe('a fit without help finds the truth', () => {
  it.each([
    ['of one group', { pKa: [4.8], end_mL: 3.6, errors }],
    ['of three groups close together', { pKa: [3.1, 4.7, 6.4], end_mL: 9.5, errors }],
    ['of a strong acid', { pKa: [], end_mL: 3.6, errors }],
    ['of more points than starts are compared on', { pKa: [3.5, 7.5], end_mL: 6.5, points: 150, errors }],
    [
      'of a base with an acid',
      { pKa: [9], chargeFullyProtonated: 1, protonsLostAsWeighed: 1, titrant: 'acid', end_mL: 3.6, errors },
    ],
  ] as const satisfies readonly (readonly [string, Experiment])[])('%s', (_, experiment) => {
    expectTruth(experimentProblem(experiment), experiment.pKa.length === 0 ? [-0.01] : [...experiment.pKa, 0.01]);
  });

  it('of two linked runs with shared constants and titrant', () => {
    const experiments = [0.008, 0.013].map(
      (concentration_M, i): Experiment => ({
        pKa: [4, 8],
        concentration_M,
        end_mL: 8,
        errors: { ...usualErrors, seed: 31 + i },
      }),
    );
    const titrant = { concentration_M: { value: 0.1, u: 0.0002, source: 'standardisation' } };
    const problem = problemOf(
      experiments.map((experiment) => ({ run: perform(experiment), sheet: sheetOf(experiment, { titrant }) })),
      ['pKa1', 'pKa2'],
    );
    expect(problem.parameters).toHaveLength(5);
    const amounts = [0.008, 0.013];
    expectTruth(
      problem,
      problem.parameters.map(({ id, runs }) =>
        id === 'pKa1' ? 4 : id === 'pKa2' ? 8 : id === 'concentration' ? amounts[runs[0]] : 0,
      ),
    );
  });
});

describe('the objective', () => {
  it('is infinite where the curve could not be computed', () => {
    const fit = fitProblem(
      experimentProblem({ pKa: [4.8], end_mL: 3.6 }, { sample: { volume_mL: 'fitted' } }),
      // No mixture: a sample of less than nothing.
      Float64Array.of(4.8, 0.01, -25),
    );
    expect(fit.ending).toBe('start-not-computable');
    expect(objectiveOf(fit)).toBe(Number.POSITIVE_INFINITY);
  });

  it('compares fits with different weights: larger noise costs its logarithm', () => {
    const problem = experimentProblem({ pKa: [4.8], end_mL: 3.6, errors });
    const fit = fitProblem(problem, Float64Array.of(4.8, 0.01));
    const before = objectiveOf(fit);
    const [{ whitening, slopes }] = fit.weighted.runs;
    whitening.set({ reading: 2 * usualErrors.uReading, setting_mL: 2 * usualErrors.uSetting_mL, dose_mL: 0 }, slopes);
    // The cost stays what it was; 60 points with twice the sigma.
    expect(objectiveOf(fit) - before).toBeCloseTo(2 * 60 * Math.LN2, 8);
  });
});
