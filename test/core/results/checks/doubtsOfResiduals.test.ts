import { describe, expect, it } from 'vitest';
import type { DoubtCode } from '../../../../core/notice/doubt.ts';
import type { RunResult } from '../../../../core/results/runResult.ts';
import { type Experiment, perform, runOf, type SheetChanges, sheetOf, usualErrors } from '../../../experiment.ts';
import { seededNoise } from '../../../simulator/seededNoise.ts';
import { fitAsDeclared, fitExperiment } from './soundRuns.ts';

const errors = { seed: 11, ...usualErrors };
const acid: Experiment = { pKa: [4.8], end_mL: 3.6, errors, decimals: 3 };
const diprotic: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, errors, decimals: 3 };
const noises: [string, SheetChanges][] = [
  ['declared', {}],
  ['estimated', { reading: { u: null } }],
];

const codes = (result: RunResult) => result.doubts.map(({ code }) => code);
const find = (result: RunResult, code: DoubtCode) => result.doubts.find((doubt) => doubt.code === code);

/** The diprotic run with its readings tampered with, and its true sheet. */
function tampered(change: (reading: number, i: number) => number, changes: SheetChanges = {}): RunResult {
  const { volumes_mL, readings } = perform(diprotic);
  return fitAsDeclared(runOf(volumes_mL, readings.map(change)), sheetOf(diprotic, changes));
}

describe('a sound run', () => {
  it.each(noises)('raises none of these doubts with noise %s', (_, changes) => {
    expect(codes(tampered((reading) => reading, changes))).toEqual([]);
    expect(codes(fitExperiment(acid, changes))).toEqual([]);
  });
});

describe.each(noises)('with noise %s', (_, changes) => {
  it.each([0.001, 0.004, 0.01])('carbonateLikely names %f mol/L of carbonate that the sheet denies', (carbonate) => {
    const doubt = find(
      fitExperiment({ ...acid, titrantCarbonate_M: carbonate }, { ...changes, titrant: { carbonate_M: 0 } }),
      'carbonate-likely',
    );
    expect(doubt?.place.quantity).toBe('titrant.carbonate');
    // The score test goes one step of Gauss and Newton: within a quarter where the misfit is large.
    const about = Number(doubt?.seen.match(/About (\S+) mol/)?.[1]);
    expect(Math.abs(about / carbonate - 1)).toBeLessThan(0.25);
  });

  it('electrodeLikelyOff names an offset of 0.05 that the sheet denies', () => {
    const doubt = find(
      tampered((reading) => reading + 0.05, changes),
      'electrode-likely-off',
    );
    expect(doubt?.place.quantity).toBe('reading.offset');
    // Known to about 0.002 here.
    expect(Math.abs(Number(doubt?.seen.match(/about (\S+) in/)?.[1]) - 0.05)).toBeLessThan(0.01);
  });

  it('alkalineEndLow sees a sensor that answers to sodium', () => {
    const result = tampered((reading) => reading - 0.1 * 10 ** (reading - 11.5), changes);
    expect(find(result, 'alkaline-end-low')?.place.volume_mL).toBe(6.5);
    // The ten points it concerns are explained, not distrusted.
    expect(codes(result)).not.toContain('points-distrusted');
  });

  it('does not blame the electrode or carbonate for a group too few', () => {
    const analytes = [{ groups: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }];
    const result = fitExperiment({ ...diprotic, pKa: [4, 6] }, { ...changes, sample: { analytes } });
    expect(codes(result)).toContain('residuals-wander');
    for (const code of ['carbonate-likely', 'electrode-likely-off', 'alkaline-end-low'] as const)
      expect(codes(result)).not.toContain(code);
  });

  it('sensorStuck sees a reading that stands still across a step', () => {
    const { readings } = perform(diprotic);
    const result = tampered((reading, i) => (i >= 20 && i < 25 ? readings[20] : reading), changes);
    expect(find(result, 'sensor-stuck')?.place.line).toBe(22);
  });

  it.each([0.15, 0.3, -0.15, -0.3])('solidLikely sees readings that break off by %f in a buffer region', (jump) => {
    const result = tampered((reading, i) => (i >= 33 ? reading + jump : reading), changes);
    expect(find(result, 'solid-likely')?.place.volume_mL).toBeCloseTo((33 * 6.5) / 59, 6);
  });

  it('solidLikely sees a supersaturated solution come down', () => {
    // Readings run ahead until the solid forms, and turn back there.
    const ahead = (reading: number, i: number) => (i >= 20 && i < 34 ? reading + 0.06 * (i - 19) : reading);
    expect(find(tampered(ahead, changes), 'solid-likely')?.seen).toContain('turn back');
  });
});

describe('electrodeLikelyOff', () => {
  it('doubts a declared calibration that the run denies', () => {
    const known: SheetChanges = { reading: { offset: { value: 0, u: 0.01 } } };
    const doubt = find(
      tampered((reading) => reading + 0.2, known),
      'electrode-likely-off',
    );
    expect(doubt?.seen).toContain('in place of 0.000');
    // Two of its standard uncertainties are nothing.
    expect(codes(tampered((reading) => reading + 0.02, known))).toEqual([]);
  });
});

describe('sensorStuck', () => {
  it('leaves a plateau alone on which the curve stands still as well', () => {
    const run = { ...diprotic, points: 600, decimals: 2, errors: { seed: 11, uReading: 1e-4 } };
    const { readings } = perform(run);
    // There are stretches of four equal readings in it.
    expect(readings.some((reading, i) => i > 2 && [1, 2, 3].every((k) => readings[i - k] === reading))).toBe(true);
    expect(codes(fitExperiment(run))).not.toContain('sensor-stuck');
  });
});

describe('residualsNotNormal', () => {
  const long: Experiment = { ...diprotic, points: 120, errors: { seed: 11, uSetting_mL: 0.003 } };

  it.each(noises)('sees readings that slip to one side only, with noise %s', (_, changes) => {
    const noise = seededNoise(2);
    const { volumes_mL, readings } = perform(long);
    // Exponential errors of mean zero and standard deviation 0.005, as of a sensor that lags.
    const lagging = readings.map((reading) => reading - 0.005 * (1 + Math.log(noise.uniform(0, 1))));
    const doubt = find(fitAsDeclared(runOf(volumes_mL, lagging), sheetOf(long, changes)), 'residuals-not-normal');
    expect(doubt?.seen).toContain('lopsided');
    expect(doubt?.place.volume_mL).toBeGreaterThan(0);
  });

  it.each(noises)('is silent about normal errors of the same size, with noise %s', (_, changes) => {
    const usual = { ...long, errors };
    expect(codes(fitExperiment(usual, changes))).toEqual([]);
  });

  it('is silent about readings that are rounded so coarsely that they are spread evenly', () => {
    const coarse = { ...long, decimals: 2, errors: { seed: 11, uReading: 0.001 } };
    expect(codes(fitExperiment(coarse, { reading: { u: null } }))).toEqual([]);
  });
});

describe('declaredNoiseTooSmall', () => {
  it('lets the fit stand, with a doubt', () => {
    const result = fitExperiment(acid, { reading: { u: 1e-9 } });
    expect(result.ending.code).toBe('fitted');
    expect(find(result, 'declared-noise-too-small')?.seen).toContain('0.001');
    const constant = result.quantities.find(({ id }) => id === 'pKa1')?.value ?? 0;
    // The points between the steps carry it all the same.
    expect(Math.abs(constant - 4.8)).toBeLessThan(0.01);
  });

  it('is silent where the digits allow it', () => {
    expect(codes(fitExperiment({ ...acid, decimals: 2 }))).not.toContain('declared-noise-too-small');
  });
});
