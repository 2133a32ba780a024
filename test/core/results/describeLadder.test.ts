import { describe, expect, it } from 'vitest';
import type { RunResult } from '../../../core/results/runResult.ts';
import { type Experiment, perform, runOf, sheetOf, usualErrors, workUp } from '../../experiment.ts';

/** Works an experiment up with a sheet that declares these constants as fitted. */
function workUpAs(experiment: Experiment, declared: readonly number[]): RunResult {
  const { volumes_mL, readings } = perform({ ...experiment, errors: { seed: 43, ...usualErrors } });
  return workUp(runOf(volumes_mL, readings), sheetOf({ ...experiment, pKa: declared }));
}

function constantsOf({ quantities }: RunResult): number {
  return quantities.filter(({ id }) => /^pKa/.test(id)).length;
}

describe('what a run shows beside what is declared', () => {
  it('is the same where both agree', () => {
    const { ladder } = workUpAs({ pKa: [4.8], end_mL: 3.6 }, [4.8]);
    expect(ladder).toMatchObject({ groups: 1, declared: 1 });
    expect(ladder?.sentence).toMatch(/^This run shows 1 ionisable group, as declared\./);
  });

  it('is said where the run shows more groups, and the fit keeps to the sheet', () => {
    const result = workUpAs({ pKa: [3.1, 4.7, 6.4], end_mL: 9.5 }, [3.1, 6.4]);
    expect(result.ladder).toMatchObject({ groups: 3, declared: 2 });
    expect(result.ladder?.sentence).toMatch(/^This run shows 3 ionisable groups, where 2 are declared\./);
    expect(constantsOf(result)).toBe(2);
  });

  it('is said where the run shows fewer, with what speaks against another', () => {
    const result = workUpAs({ pKa: [4.8], end_mL: 3.6 }, [4.8, 8]);
    expect(result.ladder).toMatchObject({ groups: 1, declared: 2 });
    expect(result.ladder?.sentence).toMatch(/^This run shows 1 ionisable group, where 2 are declared/);
    const two = result.ladder?.rungs.find(({ groups, carbonate, excess }) => groups === 2 && !carbonate && !excess);
    expect(two?.againstIt).toEqual(['pKa₂ would lie above the readings']);
  });

  it('is a strong acid where no group is declared and none is there', () => {
    const { ladder } = workUpAs({ pKa: [], end_mL: 3.6 }, []);
    expect(ladder).toMatchObject({ groups: 0, declared: 0 });
    expect(ladder?.sentence).toMatch(/^This run shows no ionisable group, as declared: a strong acid or base/);
  });
});

describe('the figures of a ladder', () => {
  const { ladder } = workUpAs({ pKa: [3.5, 8.5], end_mL: 6.5 }, [3.5, 8.5]);

  it('stand for every rung, in order, without a number that is none', () => {
    const rungs = ladder?.rungs ?? [];
    expect(rungs.map(({ groups }) => groups)).toEqual(rungs.map(({ groups }) => groups).sort((a, b) => a - b));
    expect(rungs[ladder?.chosen ?? -1].groups).toBe(2);
    expect(rungs[ladder?.chosen ?? -1].pKa.map((value) => value?.toFixed(1))).toEqual(['3.5', '8.5']);
    for (const rung of rungs) {
      expect(rung.pKa).toHaveLength(rung.groups);
      for (const value of [rung.cost, rung.aicc, rung.residual, rung.weightedResidual, rung.weight, ...rung.pKa])
        expect(value === null || Number.isFinite(value)).toBe(true);
    }
  });
});
