import { describe, expect, it } from 'vitest';
import { resultDocument } from '../../../app/terminal/resultDocument.ts';
import type { Refusal } from '../../../core/index.ts';
import { type Experiment, perform, runOf, workUp, workUpExperiment } from '../../experiment.ts';
import { readDocument } from './documentShape.ts';

const diprotic: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, errors: { seed: 2, uReading: 0.005, uSetting_mL: 0.003 } };
const whole = perform(diprotic);
const tooFew = perform({ ...diprotic, points: 4 });

const results = {
  'a fitted run': workUpExperiment(diprotic),
  'a run with nothing fitted': workUpExperiment(diprotic, {
    sample: { analytes: [{ pKa: [3.5, 7.5], concentration_M: 0.01 }] },
  }),
  'a run with a quantity that is not determined': workUpExperiment(diprotic, {
    sample: { volume_mL: { fitted: true, start: 25 } },
    burette: { gain: 'fitted' },
  }),
  'a run without a sheet': workUp(runOf(whole.volumes_mL, whole.readings), { sheet: 1 }),
  'a run of too few points': workUp(runOf(tooFew.volumes_mL, tooFew.readings), { sheet: 1 }),
  'a run without rows': workUp(runOf([], []), { sheet: 1 }),
};

describe('the document', () => {
  it.each(Object.entries(results))('of %s has every key, and null for what is missing', (_, result) => {
    const document = resultDocument([result], []);
    // Through text and back: an undefined value would be gone, a NaN would have become null unseen.
    expect(JSON.parse(JSON.stringify(document))).toEqual(document);
    readDocument(JSON.stringify(document));
  });

  it('of a call without runs and refusals is whole', () => {
    expect(readDocument(JSON.stringify(resultDocument([], [])))).toMatchObject({ runs: [], refusals: [] });
  });

  it('names quantities by their stable ids, numbered within each analyte', () => {
    const [run] = resultDocument([results['a fitted run']], []).runs;
    const ids = run.quantities.map(({ id }) => id);
    for (const id of [
      'pKa1',
      'pKa2',
      'concentration',
      'titrant.concentration',
      'titrant.carbonate',
      'sample.volume',
      'sample.extraWater',
      'sample.strongIon',
      'sample.carbonate',
      'medium.pKw',
      'burette.gain',
      'reading.offset',
      'reading.slope',
    ])
      expect(ids).toContain(id);
  });

  it('counts the points that were used', () => {
    const run = runOf([0, 1, 2], [3, 4, 5]);
    const [first, ...others] = run.rows;
    const excluded = { ...first, decision: { use: 'excluded', by: 'person', why: 'air bubble' } as const };
    const result = workUp({ ...run, rows: [excluded, ...others] }, { sheet: 1 });
    expect(resultDocument([result], []).runs[0].points).toBe(2);
  });

  it('says of a run that was not fitted why, with null for what is not known', () => {
    const [run] = resultDocument([results['a run of too few points']], []).runs;
    expect(run.ending.code).toBe('too-few-points');
    expect(run.quantities[0]).toMatchObject({ value: null, u: null, interval95: null, whyNoU: 'not-fitted' });
    expect(run.noise).toMatchObject({ reading: null, reducedChiSquare: null, degreesOfFreedom: null, unit: 'pH' });
  });

  it('puts refusals in one list: those of the call, then rows of runs, each with its place', () => {
    const ofCall: Refusal = {
      code: 'file-empty',
      message: 'The file is empty.',
      remedy: 'Choose it.',
      place: { file: 'a' },
    };
    const ofRow: Refusal = {
      code: 'cell-not-a-number',
      message: '"x" is no number.',
      remedy: 'Write one.',
      place: { line: 7, column: 2 },
    };
    const result = workUp({ ...runOf([0, 1], [3, 4]), notAccepted: [ofRow] }, { sheet: 1 });
    expect(resultDocument([result], [ofCall]).refusals).toEqual([
      {
        code: 'file-empty',
        file: 'a',
        line: null,
        column: null,
        key: null,
        message: ofCall.message,
        remedy: 'Choose it.',
      },
      {
        code: 'cell-not-a-number',
        file: 'experiment.csv',
        line: 7,
        column: 2,
        key: null,
        message: ofRow.message,
        remedy: 'Write one.',
      },
    ]);
  });
});
