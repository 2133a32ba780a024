import { describe, expect, it } from 'vitest';
import { fitFromScratch } from '../../../core/fit/fitFromScratch.ts';
import { fitProblem } from '../../../core/fit/fitProblem.ts';
import { ScoreTest } from '../../../core/inference/scoreTest.ts';
import { type Experiment, perform, problemOf, sheetOf, usualErrors } from '../../experiment.ts';

const experiment: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, errors: { seed: 11, ...usualErrors } };
const run = perform(experiment);
const shifted = { ...run, readings: run.readings.map((reading) => reading + 0.02) };
const { fit } = fitFromScratch(problemOf([{ run: shifted, sheet: sheetOf(experiment) }]));

describe('ScoreTest', () => {
  const freed = new ScoreTest(fit, 0, []).freed(new Float64Array(60).fill(1));

  it('foretells what freeing the offset gains', () => {
    const free = problemOf([
      { run: shifted, sheet: sheetOf(experiment, { reading: { offset: { fitted: true, start: 0 } } }) },
    ]);
    const again = fitProblem(free, Float64Array.from([...fit.parameters, 0]));
    // The curve is bent only a little over 0.02 in pH, and the weights follow it.
    expect((freed?.gain ?? 0) / ((fit.cost ?? 0) - (again.cost ?? 0))).toBeCloseTo(1, 1);
    expect(Math.abs((freed?.shift ?? 0) - again.parameters[3])).toBeLessThan(0.002);
  });

  it('leaves what is gained out of the remaining residuals', () => {
    const left = freed?.remaining.reduce((sum, r) => sum + r * r, 0) ?? 0;
    expect(left + (freed?.gain ?? 0)).toBeCloseTo(fit.cost ?? 0, 6);
  });

  it('gains nothing from what the fit moves already', () => {
    const count = 60;
    const column = fit.plainJacobian.slice(0, count);
    expect(new ScoreTest(fit, 0, []).freed(column)).toBeNull();
  });

  it('gives a point that is left out no say', () => {
    const wild = { ...run, readings: run.readings.with(59, run.readings[59] + 0.2) };
    const slipped = fitFromScratch(problemOf([{ run: wild, sheet: sheetOf(experiment) }])).fit;
    const offset = new Float64Array(60).fill(1);
    const all = new ScoreTest(slipped, 0, []).freed(offset)?.gain ?? 0;
    const without = new ScoreTest(slipped, 0, [59]).freed(offset)?.gain ?? 0;
    // 20 is what a quantity gains by chance less than once in 100,000 runs.
    expect(all).toBeGreaterThan(20);
    expect(without).toBeLessThan(20);
  });
});
