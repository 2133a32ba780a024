import { describe, expect, it } from 'vitest';
import { covarianceOf } from '../../core/fit/covariance.ts';
import { fitFromScratch } from '../../core/fit/fitFromScratch.ts';
import type { ProblemFit } from '../../core/fit/fitProblem.ts';
import { endings } from '../../core/fit/leastSquaresEnding.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { buildBaseTitrant, buildSample, buildWeakTitrant } from '../simulator/buildVessels.ts';
import { simulateRun } from '../simulator/simulateRun.ts';
import { declare, problemOf, simpleMedium, simpleSheet, simulateDesign } from './simulatedDesign.ts';

const errors = { uReading: 0.005, uSetting_mL: 0.003 };
const reading = { kind: 'pH', scale: 'activity', offset: 0, slope: 1, u: 0.005 } as const;

function uOf({ covariance }: ProblemFit, parameter: number): number {
  return Math.sqrt(covarianceOf(covariance, parameter, parameter) ?? Number.NaN);
}

/** Every parameter named lies within 4 of its standard uncertainties of the truth: 1 in 16,000 by chance. */
function expectTruth(fit: ProblemFit, truth: readonly (readonly [id: string, run: number, value: number])[]): void {
  expect(endings[fit.ending].usable).toBe(true);
  for (const [id, run, value] of truth) {
    const index = fit.weighted.problem.parameters.findIndex(
      (parameter) => parameter.id === id && parameter.runs.includes(run),
    );
    expect(index).toBeGreaterThanOrEqual(0);
    expect(Math.abs(fit.parameters[index] - value) / uOf(fit, index)).toBeLessThan(4);
  }
}

describe('problems of more than one run or substance, against runs of the independent simulator', () => {
  it('two linked runs share their constants and the error of their titrant, with concentrations of their own', () => {
    const strength = 0.1002;
    const sheet = (): SheetFile => {
      const simple = simpleSheet(2, reading);
      return {
        ...simple,
        titrant: { ...simple.titrant, concentration_M: { value: strength, u: 0.0004, source: 'standardisation' } },
      };
    };
    const concentrations = [0.012, 0.02];
    const runs = concentrations.map((concentration_M, r) => {
      const simulated = simulateDesign({ pKa: [4.3, 8.1], concentration_M, points: 80 }, { ...errors, seed: 20 + r });
      return declare(sheet(), simulated.volumes_mL, simulated.readings);
    });
    const problem = problemOf(runs, ['pKa1', 'pKa2']);
    expect(problem.parameters.map(({ id, kind }) => `${kind} ${id}`).sort()).toEqual([
      'fitted concentration',
      'fitted concentration',
      'fitted pKa1',
      'fitted pKa2',
      'knowledge standardisation',
    ]);
    const { fit } = fitFromScratch(problem);
    expectTruth(fit, [
      ['pKa1', 0, 4.3],
      ['pKa2', 0, 8.1],
      ['concentration', 0, 0.012],
      ['concentration', 1, 0.02],
    ]);
    // The alkaline ends tell something of the titrant as well; what is left of its error is common to both runs, so
    // that each concentration carries at least all of it, relative to its value.
    const source = problem.parameters.findIndex(({ kind }) => kind === 'knowledge');
    const ofTitrant = (0.0004 * uOf(fit, source)) / strength;
    const concentrationsAt = problem.parameters.flatMap(({ id }, j) => (id === 'concentration' ? [j] : []));
    for (const [k, j] of concentrationsAt.entries())
      expect(uOf(fit, j) / concentrations[k]).toBeGreaterThan(0.99 * ofTitrant);
    const [a, b] = concentrationsAt;
    const correlation = (covarianceOf(fit.covariance, a, b) ?? 0) / (uOf(fit, a) * uOf(fit, b));
    expect(correlation).toBeGreaterThan(0.9);
  });

  it('two analytes in one beaker', () => {
    const first = { pKa: [3.9], chargeFullyProtonated: 0, protonsLostAsWeighed: 0, concentration_M: 0.012 };
    const second = { pKa: [7.2], chargeFullyProtonated: 1, protonsLostAsWeighed: 0, concentration_M: 0.008 };
    const simulated = simulateRun({
      sample: buildSample({ volume_mL: 25, background_M: 0.1, analytes: [first, second] }),
      titrant: buildBaseTitrant({ concentration_M: 0.1, background_M: 0.1 }),
      medium: simpleMedium,
      volumes_mL: Array.from({ length: 90 }, (_, i) => (6.5 * i) / 89),
      reading: { kind: 'pH', scale: 'activity' },
      errors: { ...errors, seed: 5 },
    });
    const simple = simpleSheet(1, reading);
    const sheet: SheetFile = {
      ...simple,
      sample: {
        ...simple.sample,
        analytes: [
          { name: 'acid', groups: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 },
          { name: 'amine hydrochloride', groups: 1, chargeFullyProtonated: 1, protonsLostAsWeighed: 0 },
        ],
      },
    };
    const { fit } = fitFromScratch(problemOf([declare(sheet, simulated.volumes_mL, simulated.readings)]));
    expectTruth(fit, [
      ['pKa1', 0, 3.9],
      ['concentration', 0, 0.012],
      ['analyte2.pKa1', 0, 7.2],
      ['analyte2.concentration', 0, 0.008],
    ]);
  });

  it('a weak base as titrant', () => {
    const ammonia = { pKa: [9.245], chargeFullyProtonated: 1, protonsLostAsWeighed: 1, concentration_M: 0.1 };
    const simulated = simulateRun({
      sample: buildSample({
        volume_mL: 25,
        background_M: 0.1,
        analytes: [{ pKa: [3.2], chargeFullyProtonated: 0, protonsLostAsWeighed: 0, concentration_M: 0.02 }],
      }),
      titrant: buildWeakTitrant({ background_M: 0.1, analytes: [ammonia] }),
      medium: simpleMedium,
      volumes_mL: Array.from({ length: 80 }, (_, i) => (9 * i) / 79),
      reading: { kind: 'pH', scale: 'activity' },
      errors: { ...errors, seed: 11 },
    });
    const simple = simpleSheet(1, reading);
    const sheet: SheetFile = {
      ...simple,
      titrant: {
        kind: 'solution',
        carbonate_M: 0,
        background_M: 0.1,
        cations_M: 0,
        anions_M: 0,
        systems: [{ name: 'ammonia', groups: 1, chargeFullyProtonated: 1, concentration_M: 0.1, pKa: ['fitted'] }],
      },
    };
    const { fit } = fitFromScratch(problemOf([declare(sheet, simulated.volumes_mL, simulated.readings)]));
    expectTruth(fit, [
      ['pKa1', 0, 3.2],
      ['concentration', 0, 0.02],
      ['titrant.system1.pKa1', 0, 9.245],
    ]);
  });
});
