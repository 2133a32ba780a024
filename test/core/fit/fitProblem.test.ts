import { describe, expect, it } from 'vitest';
import { covarianceOf } from '../../../core/fit/covariance.ts';
import { fitProblem, type ProblemFit } from '../../../core/fit/fitProblem.ts';
import { endings } from '../../../core/fit/leastSquaresEnding.ts';
import { type Experiment, experimentProblem, type SheetChanges, usualErrors } from '../../experiment.ts';

const diprotic: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, points: 80 };
const truth = Float64Array.of(3.5, 7.5, 0.01);
const undeclared: SheetChanges = { reading: { u: null } };

/** Fits an experiment from near the truth. */
function fitted(experiment: Experiment, changes: SheetChanges = {}): ProblemFit {
  const problem = experimentProblem(experiment, changes);
  const start = Float64Array.from(problem.parameters, ({ id, kind }) =>
    kind === 'knowledge' ? 0 : id === 'concentration' ? 0.0105 : id === 'pKa1' ? 3.7 : 7.3,
  );
  const fit = fitProblem(problem, start);
  expect(endings[fit.ending].usable, fit.ending).toBe(true);
  return fit;
}

const seeds = Array.from({ length: 16 }, (_, i) => 100 + i);
function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

describe('a run without noise', () => {
  it('gives back the truth', () => {
    const fit = fitted(diprotic);
    fit.parameters.forEach((value, j) => {
      const u = Math.sqrt(covarianceOf(fit.covariance, j, j) ?? 0);
      // A thousandth of the uncertainty that the declared noise would give.
      expect(Math.abs(value - truth[j]) / u).toBeLessThan(1e-3);
    });
    expect(fit.cost).toBeLessThan(1e-6);
  });
});

describe('declared noise', () => {
  it('is taken as declared, and its reduced chi-square says whether it is right', () => {
    const fits = seeds.map((seed) => fitted({ ...diprotic, errors: { seed, ...usualErrors } }));
    for (const { noise } of fits) {
      expect(noise[0]).toMatchObject({ declared: true, reading: 0.005, setting_mL: 0.003 });
      // Eighty points, three fitted quantities, every one determined.
      expect(noise[0].degreesOfFreedom).toBeCloseTo(77, 6);
    }
    const chi = mean(fits.map(({ noise }) => noise[0].reducedChiSquare ?? 0));
    // Standard deviation of the mean: √(2/77/16) = 0.04; four of them.
    expect(Math.abs(chi - 1)).toBeLessThan(0.16);
  });

  it('of half the size doubles nothing but the chi-square', () => {
    const experiment = { ...diprotic, errors: { seed: 100, ...usualErrors } };
    const right = fitted(experiment);
    const small = fitted(experiment, { reading: { u: 0.0025 }, burette: { uSetting_mL: 0.0015 } });
    const ratio = (small.noise[0].reducedChiSquare ?? 0) / (right.noise[0].reducedChiSquare ?? 1);
    expect(ratio).toBeCloseTo(4, 3);
    small.parameters.forEach((value, j) => {
      const variance = (fit: ProblemFit) => covarianceOf(fit.covariance, j, j) ?? 0;
      expect(variance(small) / variance(right)).toBeCloseTo(0.25, 3);
      expect(Math.abs(value - right.parameters[j]) / Math.sqrt(variance(right))).toBeLessThan(1e-2);
    });
  });
});

describe('estimated noise', () => {
  it('of the reading is recovered beside a declared setting error', () => {
    const found = seeds.map((seed) => {
      const fit = fitted({ ...diprotic, errors: { seed, uReading: 0.008, uSetting_mL: 0.003 } }, undeclared);
      expect(fit.noise[0]).toMatchObject({ declared: false, setting_mL: 0.003 });
      // Restricted likelihood and the sum of squares weigh points differently: close, not equal.
      expect(Math.abs((fit.noise[0].reducedChiSquare ?? 0) - 1)).toBeLessThan(0.2);
      return fit.noise[0].reading;
    });
    // Relative standard deviation of one 1/√(2·77) = 8 %, somewhat more beside the setting error; of the mean of
    // sixteen 2 %; four of them, and the setting error's share.
    expect(Math.abs(mean(found) / 0.008 - 1)).toBeLessThan(0.1);
  });

  it('of both is recovered without a word about either', () => {
    const changes: SheetChanges = { reading: { u: null }, burette: { uSetting_mL: null } };
    const found = seeds.map((seed) => {
      const [noise] = fitted({ ...diprotic, errors: { seed, uReading: 0.01, uSetting_mL: 0.006 } }, changes).noise;
      expect(noise.declared).toBe(false);
      return noise;
    });
    // Eighty points share their news of two sizes, few of them on steps: 10 % and 20 % each, a quarter of that for
    // the mean of sixteen; four of them.
    expect(Math.abs(mean(found.map(({ reading }) => reading)) / 0.01 - 1)).toBeLessThan(0.1);
    expect(Math.abs(mean(found.map(({ setting_mL }) => setting_mL)) / 0.006 - 1)).toBeLessThan(0.2);
  });

  it('is never below what the last digit hides', () => {
    const { noise } = fitted({ ...diprotic, decimals: 2 }, { ...undeclared, burette: { uSetting_mL: 1e-6 } });
    expect(noise[0].reading).toBeGreaterThanOrEqual(0.01 / Math.sqrt(12) - 1e-12);
  });

  it('gives uncertainties that hold the truth', () => {
    const pulls = seeds.flatMap((seed) => {
      const fit = fitted({ ...diprotic, errors: { seed, uReading: 0.008, uSetting_mL: 0.003 } }, undeclared);
      return Array.from(
        fit.parameters,
        (value, j) => (value - truth[j]) / Math.sqrt(covarianceOf(fit.covariance, j, j) ?? 0),
      );
    });
    const square = mean(pulls.map((pull) => pull ** 2));
    // 48 pulls, correlated in threes: the mean square has a standard deviation of √(2/16) to √(2/48), say 0.3; three.
    expect(square).toBeGreaterThan(0.4);
    expect(square).toBeLessThan(1.9);
  });
});

describe('weights', () => {
  it('are frozen at those of the solution: reading and slope where the curve passes the readings', () => {
    const fit = fitted({ ...diprotic, errors: { seed: 7, ...usualErrors } });
    const [{ run, model, whitening, values }] = fit.weighted.runs;
    model.predict(values, new Float64Array(run.volumes.length));
    const slopes = new Float64Array(run.volumes.length);
    model.slopesAtReadings(run.readings, slopes);
    whitening.sigma.forEach((s, i) => {
      // The solution stands still to 1e-4 of its uncertainty.
      expect(s / Math.hypot(0.005, 0.003 * slopes[i])).toBeCloseTo(1, 4);
    });
  });

  it('and residuals belong to the parameters that are given', () => {
    const fit = fitted({ ...diprotic, errors: { seed: 7, ...usualErrors } });
    const again = new Float64Array(fit.residuals.length);
    fit.weighted.residuals(fit.parameters, again);
    // Memory of the last solution: rounding.
    fit.residuals.forEach((residual, i) => {
      expect(residual).toBeCloseTo(again[i], 8);
    });
    expect(fit.residuals.reduce((sum, residual) => sum + residual ** 2, 0)).toBeCloseTo(fit.cost ?? 0, 8);
  });
});

describe('declared knowledge', () => {
  it('takes no degree of freedom from the readings where they say nothing of it', () => {
    const changes = { titrant: { concentration_M: { value: 0.1, u: 0.0001 } } };
    const fit = fitted({ ...diprotic, errors: { seed: 9, ...usualErrors } }, changes);
    // The strength is known from elsewhere ten times better than the run could say: between three and four are determined.
    expect(fit.noise[0].degreesOfFreedom).toBeGreaterThan(76.5);
    expect(fit.noise[0].degreesOfFreedom).toBeLessThanOrEqual(77);
    const knowledge = fit.weighted.problem.parameters.findIndex(({ kind }) => kind === 'knowledge');
    expect(covarianceOf(fit.covariance, knowledge, knowledge)).toBeLessThanOrEqual(1);
    expect(covarianceOf(fit.covariance, knowledge, knowledge)).toBeGreaterThan(0.5);
  });

  it('carries its uncertainty into what depends on it', () => {
    const experiment = { ...diprotic, errors: { seed: 9, ...usualErrors } };
    const alone = fitted(experiment);
    const known = fitted(experiment, { titrant: { concentration_M: { value: 0.1, u: 0.001 } } });
    const u = (fit: ProblemFit) => {
      const j = fit.weighted.problem.parameters.findIndex(({ id }) => id === 'concentration');
      return Math.sqrt(covarianceOf(fit.covariance, j, j) ?? 0);
    };
    // The amount is as uncertain as the strength, relatively: 1 % less what the run itself says of it.
    expect(u(known)).toBeGreaterThan(3 * u(alone));
    expect(u(known)).toBeLessThanOrEqual(Math.hypot(u(alone), 0.01 * 0.01) * 1.001);
  });

  it('that contradicts the readings is moved by them', () => {
    const fit = fitted(diprotic, { reading: { offset: { value: 0.1, u: 0.05 } } });
    const knowledge = fit.weighted.problem.parameters.findIndex(({ kind }) => kind === 'knowledge');
    // The offset is nothing in truth: δ = −2 where the readings are sure, and they are not quite.
    expect(fit.parameters[knowledge]).toBeLessThan(-1);
    expect(fit.parameters[knowledge]).toBeGreaterThan(-2.1);
  });
});

describe('nothing to fit', () => {
  it('ends as such, with residuals and noise', () => {
    const analytes = [{ pKa: [3.5, 7.5], concentration_M: 0.01, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }];
    const problem = experimentProblem({ ...diprotic, errors: { seed: 3, ...usualErrors } }, { sample: { analytes } });
    const fit = fitProblem(problem, new Float64Array(0));
    expect(fit.ending).toBe('no-parameters');
    expect(fit.noise[0].degreesOfFreedom).toBe(80);
    // √(2/80) = 0.16; three of them.
    expect(Math.abs((fit.noise[0].reducedChiSquare ?? 0) - 1)).toBeLessThan(0.5);
  });
});
