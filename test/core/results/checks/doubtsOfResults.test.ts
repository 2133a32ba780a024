import { describe, expect, it } from 'vitest';
import type { DoubtCode } from '../../../../core/notice/doubt.ts';
import type { RunResult } from '../../../../core/results/runResult.ts';
import { type Experiment, perform, runOf, sheetOf, usualErrors } from '../../../experiment.ts';
import { fitAsDeclared, fitExperiment } from './soundRuns.ts';

const errors = { seed: 11, ...usualErrors };
const acid: Experiment = { pKa: [4.8], end_mL: 3.6, errors, decimals: 3 };
const diprotic: Experiment = { pKa: [3.5, 7.5], end_mL: 6.5, errors, decimals: 3 };
const fittedFrom = (start: number) => ({ fitted: true, start }) as const;

const codes = (result: RunResult) => result.doubts.map(({ code }) => code);
const find = (result: RunResult, code: DoubtCode) => result.doubts.find((doubt) => doubt.code === code);

describe('a sound run', () => {
  it('raises none of these doubts', () => {
    expect(codes(fitExperiment(acid))).toEqual([]);
    expect(codes(fitExperiment(diprotic))).toEqual([]);
  });
});

describe('poorlyDetermined', () => {
  it('names two concentrations of which only the ratio is known well', () => {
    const result = fitExperiment(acid, {
      titrant: { concentration_M: fittedFrom(0.1) },
      reading: { offset: fittedFrom(0) },
      medium: { pKw: { value: 14, u: 0.3 } },
    });
    const doubt = find(result, 'poorly-determined');
    expect(doubt?.seen).toMatch(/^Only the ratio of titrant concentration and sample concentration is fixed/);
    expect(doubt?.place.quantity).toBe('titrant.concentration');
  });

  it('is silent where both are known to a few per cent', () => {
    const result = fitExperiment(acid, { titrant: { concentration_M: fittedFrom(0.1) } });
    expect(codes(result)).not.toContain('poorly-determined');
  });
});

describe('intervalsDisagree', () => {
  it('sees an interval that reaches farther up than down', () => {
    const result = fitExperiment(acid, {
      titrant: { concentration_M: fittedFrom(0.1) },
      reading: { offset: fittedFrom(0) },
      medium: { pKw: { value: 14, u: 0.3 } },
    });
    // Concentrations follow pKw as powers of ten: u of 35 %, and 10^±0.3 at two of them.
    const doubts = result.doubts.filter(({ code }) => code === 'intervals-disagree');
    expect(doubts.map(({ place }) => place.quantity)).toEqual(['concentration', 'titrant.concentration']);
  });
});

describe('startsDisagree', () => {
  // Two groups over the buffer region of one: one group at the whole amount, or two alike at half of it.
  const short: Experiment = { ...diprotic, pKa: [4, 13], end_mL: 2.3 };

  it('names what the second solution says', () => {
    const doubt = find(fitExperiment(short), 'starts-disagree');
    expect(doubt?.seen).toContain('concentration 0.009');
    expect(doubt?.seen).toContain('or 0.0050');
  });

  it('is silent once the concentration is declared', () => {
    const analytes = [{ groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 0, concentration_M: 0.01 }];
    expect(codes(fitExperiment(short, { sample: { analytes } }))).not.toContain('starts-disagree');
  });
});

describe('beyondReach', () => {
  it('states a bound, and no pH at which the constant would be read', () => {
    const result = fitExperiment({ ...diprotic, pKa: [4, 13], end_mL: 2.3 });
    const doubt = find(result, 'beyond-reach');
    expect(doubt?.place.quantity).toBe('pKa2');
    expect(doubt?.seen).toMatch(/only one side shows: above \d+\.\d+ at 95 %/);
    expect(doubt?.seen).not.toContain('would be read');
  });
});

describe('fewPointsAtConstant', () => {
  it('sees a buffer region that was hurried through', () => {
    const { volumes_mL, readings } = perform({ ...diprotic, points: 80 });
    const kept = Array.from(readings.keys()).filter((i) => Math.abs(readings[i] - 7.5) > 1 || i % 20 === 0);
    const run = runOf(
      kept.map((i) => volumes_mL[i]),
      kept.map((i) => readings[i]),
    );
    const doubt = find(fitAsDeclared(run, sheetOf(diprotic)), 'few-points-at-pKa');
    expect(doubt?.place.quantity).toBe('pKa2');
    expect(doubt?.place.volume_mL).toBeGreaterThan(2.5);
  });
});

describe('noVisibleStep', () => {
  it('sees that an acid is too weak to show where it ends', () => {
    const doubt = find(fitExperiment({ ...acid, pKa: [11], end_mL: 4 }), 'no-visible-step');
    expect(doubt?.seen).toContain('acid X');
    expect(Math.abs((doubt?.place.volume_mL ?? 0) - 2.5)).toBeLessThan(0.05);
  });

  it('sees a run that ends before its step', () => {
    expect(find(fitExperiment({ ...acid, end_mL: 2 }), 'no-visible-step')?.seen).toContain('The run ends at 2.000 mL');
  });

  it('asks for no step where the amount is declared', () => {
    const analytes = [{ groups: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 0, concentration_M: 0.01 }];
    expect(codes(fitExperiment({ ...acid, end_mL: 2 }, { sample: { analytes } }))).not.toContain('no-visible-step');
  });
});

describe('readingKindContradicted', () => {
  it('sees a sheet in mV over a file in pH, fitted or not', () => {
    const result = fitExperiment(acid, { reading: { kind: 'mV', E0_mV: 400, offset: null } });
    expect(find(result, 'reading-kind-contradicted')?.seen).toContain('mV');
    const few = fitExperiment({ ...acid, points: 60 }, { reading: { kind: 'mV', E0_mV: 'fitted', offset: null } });
    expect(codes(few)).toContain('reading-kind-contradicted');
  });
});

describe('pointsDistrusted', () => {
  it('names the line of a slipped reading, and what moves without it', () => {
    const { volumes_mL, readings } = perform(diprotic);
    readings[30] += 0.1;
    const result = fitAsDeclared(runOf(volumes_mL, readings), sheetOf(diprotic));
    const doubt = find(result, 'points-distrusted');
    expect(doubt?.place).toEqual({ line: 32, volume_mL: volumes_mL[30] });
    expect(doubt?.means).toContain('pKa₂ would move by');
    // It is used all the same.
    expect(result.points[30].used).toBe(true);
  });
});
