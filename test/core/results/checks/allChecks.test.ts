import { describe, expect, it, vi } from 'vitest';
import type { DoubtCode } from '../../../../core/notice/doubt.ts';
import type { RunResult } from '../../../../core/results/runResult.ts';
import { type Experiment, perform, runOf, sheetOf, usualErrors, workUp } from '../../../experiment.ts';
import { fitAsDeclared, fitExperiment } from './soundRuns.ts';

// Ten times what the slowest of these take alone: other tests want the same cores.
vi.setConfig({ testTimeout: 30_000 });

const errors = { seed: 11, ...usualErrors };
/** A well-behaved acid of one group with a step at 2.5 mL. */
const acid: Experiment = { pKa: [4.8], end_mL: 3.6, errors };
const diprotic: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, errors };

function doubtsOf(result: RunResult, code: DoubtCode) {
  expect(result.ending.code).toBe('fitted');
  return result.doubts.filter((doubt) => doubt.code === code);
}

describe('a sound run', () => {
  it.each([
    ['an acid of one group', acid],
    ['an acid of two', diprotic],
    ['an ampholyte weighed as its hydrochloride', { ...diprotic, pKa: [4, 9], chargeFullyProtonated: 1 }],
    ['a base with an acid', { ...acid, pKa: [9], chargeFullyProtonated: 1, protonsLostAsWeighed: 1, titrant: 'acid' }],
    ['a strong acid', { ...acid, pKa: [] }],
    ['a strong base with an acid', { ...acid, pKa: [], titrant: 'acid' }],
  ] as const satisfies readonly (readonly [string, Experiment])[])('of %s raises no doubt', (_, experiment) => {
    const result = fitExperiment(experiment);
    expect(result.ending.code).toBe('fitted');
    expect(result.doubts).toEqual([]);
  });
});

describe('every doubt', () => {
  it('says what was seen, what it means and what to do, in figures that exist', () => {
    const { volumes_mL, readings } = perform(acid);
    for (const { seen, means, remedy } of workUp(runOf(volumes_mL, readings), { sheet: 1 }).doubts)
      for (const text of [seen, means, remedy]) {
        expect(text).toMatch(/^\S.*\.$/);
        expect(text).not.toMatch(/NaN|Infinity|undefined|null/);
      }
  });
});

describe('unidentifiable', () => {
  it('names the quantities of which only the ratio shows', () => {
    const [doubt, ...more] = doubtsOf(
      fitExperiment(acid, { sample: { volume_mL: { fitted: true, start: 25 } }, burette: { gain: 'fitted' } }),
      'unidentifiable',
    );
    expect(more).toEqual([]);
    // The constant and the concentration do not take part: everything scales alike.
    expect(doubt.seen).toBe('Only the ratio of burette gain and sample volume is fixed by this run.');
    expect(doubt.remedy).toBe('Declare one of them.');
  });

  it('gives no value for them, and still one for the rest', () => {
    const { quantities } = fitExperiment(acid, {
      sample: { volume_mL: { fitted: true, start: 25 } },
      burette: { gain: 'fitted' },
    });
    const find = (id: string) => quantities.find((quantity) => quantity.id === id);
    for (const id of ['sample.volume', 'burette.gain'])
      expect(find(id)).toMatchObject({ value: null, u: null, interval95: null, whyNoU: 'undetermined' });
    // Three standard uncertainties.
    expect(Math.abs((find('pKa1')?.value ?? 0) - 4.8)).toBeLessThan(3 * (find('pKa1')?.u ?? 0));
  });
});

describe('residualsWander', () => {
  it('sees carbonate that the sheet denies', () => {
    const result = fitExperiment({ ...acid, titrantCarbonate_M: 0.004 }, { titrant: { carbonate_M: 0 } });
    expect(doubtsOf(result, 'residuals-wander')).toHaveLength(1);
  });

  it('is silent with fewer points than the test needs', () => {
    const result = fitExperiment({ ...acid, points: 11, titrantCarbonate_M: 0.004 }, { titrant: { carbonate_M: 0 } });
    expect(doubtsOf(result, 'residuals-wander')).toEqual([]);
  });
});

describe('residualsWander on a run without noise', () => {
  it('is silent: what is missed is far below the noise', () => {
    const { errors: _, ...exact } = acid;
    expect(doubtsOf(fitExperiment(exact), 'residuals-wander')).toEqual([]);
    expect(doubtsOf(fitExperiment(exact, { reading: { u: null } }), 'residuals-wander')).toEqual([]);
  });
});

describe('constantsOverlap', () => {
  const two = { groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 };

  it('sees two groups in the curve of one', () => {
    const result = fitExperiment(acid, { sample: { analytes: [two] } });
    const [doubt, ...more] = doubtsOf(result, 'pKa-overlap');
    expect(more).toEqual([]);
    expect(doubt.place.quantity).toBe('pKa2');
    // Half the concentration, and constants that differ by log 4: the very same curve, with a beautiful fit.
    const concentration = result.quantities.find(({ id }) => id === 'concentration')?.value ?? 0;
    expect(Math.abs(concentration - 0.005)).toBeLessThan(1e-4);
  });

  it('believes in alike groups where the concentration is declared', () => {
    const analytes = [{ ...two, concentration_M: 0.005 }];
    expect(doubtsOf(fitExperiment(acid, { sample: { analytes } }), 'pKa-overlap')).toEqual([]);
  });

  it('is silent about groups that are close but told apart', () => {
    expect(doubtsOf(fitExperiment({ ...diprotic, pKa: [4.2, 5.1] }), 'pKa-overlap')).toEqual([]);
  });
});

describe('volumesDisagree', () => {
  it('sees a step that the model does not have', () => {
    const { volumes_mL, readings } = perform(diprotic);
    const sheet = sheetOf({ ...diprotic, pKa: [5] });
    const doubts = doubtsOf(fitAsDeclared(runOf(volumes_mL, readings), sheet), 'volumes-disagree');
    expect(doubts.length).toBeGreaterThan(0);
    // The volumes lie at 2.5 and 5 mL, where the figure shows them.
    for (const { place } of doubts) expect(place.volume_mL).toBeGreaterThan(2);
  });

  // Shoulders and weak steps, on which noise makes a maximum of the slope that the curve does not have.
  const salty = { activity: 'davies', background_M: 0.1, decimals: 3 } as const;
  it.each([
    {
      ...salty,
      pKa: [4.3, 6.34],
      chargeFullyProtonated: 1,
      concentration_M: 0.0128,
      end_mL: 8.32,
      points: 71,
      seed: 26,
    },
    { ...salty, pKa: [9.96], chargeFullyProtonated: 1, concentration_M: 0.0153, end_mL: 4.97, points: 65, seed: 110 },
    { ...salty, pKa: [4.85, 6.87, 9.03], concentration_M: 0.0133, end_mL: 13, points: 76, seed: 5 },
  ])('is silent about shoulders: pKa $pKa', ({ seed, ...shouldered }) => {
    const result = fitExperiment({ ...shouldered, errors: { ...usualErrors, seed } });
    expect(doubtsOf(result, 'volumes-disagree')).toEqual([]);
    // It is not for want of a step in the readings.
    expect(result.equivalence.some(({ by }) => by === 'derivative')).toBe(true);
  });

  it('grants a Gran line of few points the uncertainty of its uncertainty', () => {
    const steep = { pKa: [4.85, 6.87, 9.03], concentration_M: 0.0133, end_mL: 12.9675, points: 80, decimals: 3 };
    for (const seed of [0, 39])
      expect(doubtsOf(fitExperiment({ ...steep, errors: { ...usualErrors, seed } }), 'volumes-disagree')).toEqual([]);
  });
});

describe('noiseFarAboveUsual', () => {
  it('sees residuals of twice the declared noise', () => {
    const noisy = { ...acid, errors: { seed: 3, uReading: 0.012, uSetting_mL: 0.0072 } };
    const [doubt] = doubtsOf(fitExperiment(noisy), 'noise-far-above-usual');
    expect(doubt.seen).toContain('declared');
  });

  it('sees undeclared noise that no instrument makes', () => {
    const noisy = { ...acid, errors: { seed: 3, uReading: 0.08, uSetting_mL: 0.003 } };
    const [doubt] = doubtsOf(fitExperiment(noisy, { reading: { u: null } }), 'noise-far-above-usual');
    expect(doubt.seen).toContain('in pH');
  });
});

describe('beyondReach', () => {
  it('sees a constant above the last reading', () => {
    const [doubt, ...more] = doubtsOf(fitExperiment({ ...diprotic, pKa: [4, 12], end_mL: 5 }), 'beyond-reach');
    expect(more).toEqual([]);
    expect(doubt.place.quantity).toBe('pKa2');
  });

  it('lets a declared constant lie where it will', () => {
    const result = fitExperiment(
      { ...diprotic, pKa: [4, 12], end_mL: 5 },
      { sample: { analytes: [{ groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 0, pKa: ['fitted', 12] }] } },
    );
    expect(doubtsOf(result, 'beyond-reach')).toEqual([]);
  });
});

describe('concentrationOfNothing', () => {
  it('sees a fitted carbonate that is not there', () => {
    const [doubt] = doubtsOf(fitExperiment(acid, { titrant: { carbonate_M: 'fitted' } }), 'concentration-of-nothing');
    expect(doubt.place.quantity).toBe('titrant.carbonate');
  });
});

describe('fewPoints', () => {
  it('sees that hardly a degree of freedom is left', () => {
    const [doubt] = doubtsOf(fitExperiment({ ...diprotic, points: 10 }), 'too-few-points');
    expect(doubt.seen).toContain('10 points');
  });
});

describe('activityOutOfRange', () => {
  const salty: Experiment = { ...acid, activity: 'davies', background_M: 0.8 };

  it('sees an ionic strength beyond the Davies equation', () => {
    expect(doubtsOf(fitExperiment(salty), 'activity-out-of-range')).toHaveLength(1);
  });

  it('is silent below, and without an activity model', () => {
    expect(doubtsOf(fitExperiment({ ...salty, background_M: 0.3 }), 'activity-out-of-range')).toEqual([]);
    expect(doubtsOf(fitExperiment({ ...salty, activity: 'none' }), 'activity-out-of-range')).toEqual([]);
  });
});

describe('temperatureOutOfRange', () => {
  it('sees water beyond the range of its formulas', () => {
    expect(doubtsOf(fitExperiment(acid, { medium: { temperature_C: 120 } }), 'temperature-out-of-range')).toHaveLength(
      1,
    );
  });

  it('asks nothing of another solvent', () => {
    const medium = { temperature_C: 120, solvent: 'ethylene glycol' };
    expect(doubtsOf(fitExperiment(acid, { medium }), 'temperature-out-of-range')).toEqual([]);
  });
});

describe('restsOnAssumption', () => {
  it('names what nobody declared and what rests on it', () => {
    const result = fitExperiment(acid, { sample: { volume_mL: null } });
    const doubts = doubtsOf(result, 'rests-on-assumption');
    expect(doubts.some(({ seen }) => seen.includes('concentration') && seen.includes('sample volume'))).toBe(true);
    const concentration = result.quantities.find(({ id }) => id === 'concentration');
    expect(concentration?.restsOn).toEqual(['sample.volume']);
  });
});

describe('declarationContradicted', () => {
  it('says what the run makes of a strength that was declared wrongly', () => {
    const declared = fitExperiment(acid, { titrant: { concentration_M: { value: 0.104, u: 0.0002 } } });
    expect(doubtsOf(declared, 'declaration-contradicted').map(({ place }) => place.quantity)).toContain(
      'titrant.concentration',
    );
  });

  it('is silent where the run agrees with what is known', () => {
    const result = fitExperiment(acid, { titrant: { concentration_M: { value: 0.1, u: 0.0005 } } });
    expect(doubtsOf(result, 'declaration-contradicted')).toEqual([]);
  });
});
