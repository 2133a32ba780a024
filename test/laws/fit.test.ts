import { describe, expect, it } from 'vitest';
import { covarianceOf } from '../../core/fit/covariance.ts';
import { fitFromScratch } from '../../core/fit/fitFromScratch.ts';
import { fitProblem, type ProblemFit } from '../../core/fit/fitProblem.ts';
import { endings } from '../../core/fit/leastSquaresEnding.ts';
import { createRandom } from '../../core/numerics/createRandom.ts';
import { nernstSlope_mV } from '../simulator/simulateRun.ts';
import {
  declare,
  parametersOf,
  problemOf,
  randomDesign,
  simpleSheet,
  simulateDesign,
  truthOf,
} from './simulatedDesign.ts';

const pHReading = { kind: 'pH', scale: 'activity', offset: 0, slope: 1, u: 0.005 } as const;
const errors = { uReading: 0.005, uSetting_mL: 0.003 };

function uncertainties({ covariance, parameters }: ProblemFit): number[] {
  return Array.from(parameters, (_, j) => Math.sqrt(covarianceOf(covariance, j, j) ?? Number.NaN));
}

function expectSame(fit: ProblemFit, reference: ProblemFit, partOfU: number): void {
  uncertainties(reference).forEach((u, j) => {
    expect(Math.abs(fit.parameters[j] - reference.parameters[j])).toBeLessThan(partOfU * u);
  });
}

describe('a fit from the automatic start', () => {
  it('ends no higher than a fit from the truth, over 200 runs with noise', () => {
    let missed = 0;
    for (let seed = 1; seed <= 200; seed++) {
      const design = randomDesign(seed);
      const run = simulateDesign(design, { ...errors, seed });
      const problem = problemOf([declare(simpleSheet(design.pKa.length, pHReading), run.volumes_mL, run.readings)]);
      const fromTruth = fitProblem(problem, parametersOf(problem, truthOf(design)));
      const { fit } = fitFromScratch(problem);
      expect(fromTruth.cost).not.toBeNull();
      if (!endings[fit.ending].usable || (fit.cost ?? Infinity) > (fromTruth.cost ?? 0) * (1 + 1e-6)) missed++;
    }
    // At least 99 % of the runs.
    expect(missed).toBeLessThanOrEqual(2);
  }, 120_000);

  it('returns the truth of runs without noise', () => {
    for (let seed = 1; seed <= 40; seed++) {
      const design = randomDesign(seed);
      const run = simulateDesign(design);
      const problem = problemOf([declare(simpleSheet(design.pKa.length, pHReading), run.volumes_mL, run.readings)]);
      const { fit } = fitFromScratch(problem);
      expect(endings[fit.ending].usable).toBe(true);
      const truth = parametersOf(problem, truthOf(design));
      // With noise of 0.005 declared, a thousandth of the uncertainty is far above what solver and engine leave over.
      uncertainties(fit).forEach((u, j) => {
        expect(Math.abs(fit.parameters[j] - truth[j])).toBeLessThan(1e-3 * u);
      });
    }
  }, 60_000);
});

describe('a fit', () => {
  const design = randomDesign(7);
  const run = simulateDesign(design, { ...errors, seed: 7 });
  const sheet = simpleSheet(design.pKa.length, pHReading);
  const reference = fitFromScratch(problemOf([declare(sheet, run.volumes_mL, run.readings)])).fit;

  it('does not depend on the order of the points', () => {
    const random = createRandom(3);
    const order = Array.from(run.volumes_mL.keys())
      .map((i) => ({ i, key: random.uniform() }))
      .sort((a, b) => a.key - b.key)
      .map(({ i }) => i);
    const shuffled = (values: Float64Array) => Float64Array.from(order, (i) => values[i]);
    const { fit } = fitFromScratch(problemOf([declare(sheet, shuffled(run.volumes_mL), shuffled(run.readings))]));
    // The rounds of weighing stop when the solution moves by less than 1e-4 u.
    expectSame(fit, reference, 1e-3);
  });

  it('does not depend on the unit of the reading', () => {
    const E0_mV = 400;
    const perPH = nernstSlope_mV(25);
    const { fit } = fitFromScratch(
      problemOf([
        declare(
          simpleSheet(design.pKa.length, { kind: 'mV', scale: 'activity', E0_mV, slope: 1, u: 0.005 * perPH }),
          run.volumes_mL,
          run.readings.map((pH) => E0_mV - perPH * pH),
        ),
      ]),
    );
    expectSame(fit, reference, 1e-3);
  });
});
