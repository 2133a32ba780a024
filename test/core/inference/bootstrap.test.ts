import { describe, expect, it } from 'vitest';
import { covarianceOf } from '../../../core/fit/covariance.ts';
import { fitFromScratch } from '../../../core/fit/fitFromScratch.ts';
import type { ProblemFit } from '../../../core/fit/fitProblem.ts';
import { bootstrap, type Replicate } from '../../../core/inference/bootstrap.ts';
import { summariseBootstrap } from '../../../core/inference/summariseBootstrap.ts';
import { declare, problemOf, simpleSheet, simulateDesign } from '../../laws/simulatedDesign.ts';

function fitted(): ProblemFit {
  const run = simulateDesign(
    { pKa: [4.2, 7.9], concentration_M: 0.015, points: 60 },
    { seed: 3, uReading: 0.005, uSetting_mL: 0.003 },
  );
  const sheet = simpleSheet(2, { kind: 'pH', scale: 'activity', offset: { value: 0, u: 0.01 }, slope: 1, u: 0.005 });
  return fitFromScratch(problemOf([declare(sheet, run.volumes_mL, run.readings)])).fit;
}

function all(fit: ProblemFit, from: number, to: number, seed: number): Replicate[] {
  const steps = bootstrap(fit, 0, from, to, seed);
  for (;;) {
    const step = steps.next();
    if (step.done === true) return step.value;
  }
}

describe('the bootstrap', () => {
  const fit = fitted();
  const ids = fit.weighted.runs[0].run.design.quantities.map(({ id }) => id);

  it('gives the same numbers however it is shared out', () => {
    const whole = all(fit, 0, 12, 5);
    const shared = [...all(fit, 0, 5, 5), ...all(fit, 5, 12, 5)];
    expect(shared).toEqual(whole);
    expect(all(fit, 0, 2, 6)).not.toEqual(whole.slice(0, 2));
  });

  it('agrees with the covariance where the problem is nearly linear', () => {
    const replicates = 300;
    const summaries = summariseBootstrap(ids, all(fit, 0, replicates, 1));
    for (const id of ['pKa1', 'pKa2', 'concentration', 'reading.offset']) {
      const summary = summaries.find((candidate) => candidate.id === id);
      const parameter = fit.weighted.problem.parameters.findIndex((candidate) => candidate.id === id);
      const u = Math.sqrt(covarianceOf(fit.covariance, parameter, parameter) ?? Number.NaN);
      const unit = id === 'reading.offset' ? 0.01 : 1;
      // The standard deviation of 300 draws is itself uncertain by 1/√600 = 4 %; 15 % is more than three times that.
      expect((summary?.u ?? 0) / (u * unit)).toBeGreaterThan(0.85);
      expect((summary?.u ?? 0) / (u * unit)).toBeLessThan(1.15);
    }
  }, 60_000);
});

describe('the summary', () => {
  it('leaves out replicates that were not fitted, and says nothing of a single one', () => {
    const replicates = [1, 2, 3, 4, 5].map((value) => Float64Array.of(value));
    const [summary] = summariseBootstrap(['x'], [...replicates, null]);
    expect(summary.median).toBe(3);
    expect(summary.u).toBeCloseTo(Math.sqrt(2.5), 12);
    expect(summary.interval95[0]).toBeCloseTo(1.1, 12);
    expect(summary.interval95[1]).toBeCloseTo(4.9, 12);
    expect(summariseBootstrap(['x'], [Float64Array.of(1), null])).toEqual([]);
  });
});
