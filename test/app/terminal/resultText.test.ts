import { describe, expect, it } from 'vitest';
import { resultText } from '../../../app/terminal/resultText.ts';
import { type Experiment, perform, runOf, workUp, workUpExperiment } from '../../experiment.ts';

const acid: Experiment = { pKa: [4.8], end_mL: 3.6, errors: { seed: 2, uReading: 0.005, uSetting_mL: 0.003 } };

describe('the text', () => {
  it('of a fitted run states points, ending, figures and noise', () => {
    const text = resultText([workUpExperiment(acid)], []);
    expect(text).toContain('60 points used of 60 rows.');
    expect(text).toMatch(/pKa₁ +4\.\d+ ± 0\.00\d+/);
    expect(text).toMatch(/concentration +0\.0\d+ ± 0\.0000\d+ mol\/L/);
    expect(text).toMatch(/Noise of a reading 0\.0050 pH \(declared\)/);
    expect(text).not.toMatch(/NaN|undefined|null|Infinity/);
  });

  it('says of a quantity that is not determined that it is not', () => {
    const text = resultText(
      [workUpExperiment(acid, { sample: { volume_mL: { fitted: true, start: 25 } }, burette: { gain: 'fitted' } })],
      [],
    );
    expect(text).toMatch(/sample volume +– +not determined by this run/);
    expect(text).not.toMatch(/NaN|undefined|null|Infinity/);
  });

  it('lists apart what is assumed, with every doubt and its remedy', () => {
    const { volumes_mL, readings } = perform(acid);
    const result = workUp(runOf(volumes_mL, readings), { sheet: 1 });
    const text = resultText([result], []);
    const assumed = text.slice(text.indexOf('Assumed, confirmed by nobody:'));
    for (const label of ['titrant concentration', 'sample volume', 'pKw']) expect(assumed).toContain(label);
    expect(result.doubts.length).toBeGreaterThan(0);
    for (const { seen, remedy } of result.doubts) for (const part of [seen, remedy]) expect(text).toContain(part);
  });

  it('says why a run was not fitted', () => {
    const result = workUp(runOf([0, 1], [3, 4]), { sheet: 1 });
    expect(resultText([result], [])).toContain(result.ending.message);
    expect(resultText([result], [])).toMatch(/pKa₁ +– +not fitted/);
  });

  it('counts refused rows beyond the first five', () => {
    const notAccepted = Array.from({ length: 8 }, (_, i) => ({
      code: 'cell-not-a-number' as const,
      message: 'No number stands there.',
      remedy: 'Write one.',
      place: { line: i + 4, column: 2 },
    }));
    const text = resultText([workUp({ ...runOf([0, 1], [3, 4]), notAccepted }, { sheet: 1 })], []);
    expect(text).toContain('2 points used of 10 rows.');
    expect(text.match(/Not accepted/g)).toHaveLength(5);
    expect(text).toContain('(line 8, column 2)');
    expect(text).toContain('and 3 more rows not accepted');
  });
});
