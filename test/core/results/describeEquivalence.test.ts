import { describe, expect, it } from 'vitest';
import { equivalenceByReadings } from '../../../core/results/describeEquivalence.ts';
import type { EquivalenceResult } from '../../../core/results/runResult.ts';
import type { StepsOfReadings } from '../../../core/results/stepsOfReadings.ts';
import { workUpExperiment } from '../../experiment.ts';

const volumes = Float64Array.from({ length: 101 }, (_, i) => i / 10);

function steps(...at: readonly number[]): StepsOfReadings {
  return {
    derivative: at.map((volume_mL) => ({
      volume_mL,
      secondDerivativeZero_mL: null,
      u_mL: 0.02,
      uNoise_mL: 0.01,
      reading: 7,
      slope: 20,
      height: 3,
      flattest_mL: [volume_mL - 1, volume_mL + 1],
      pointsUsed: [Math.round(10 * volume_mL) - 2, Math.round(10 * volume_mL) + 2],
    })),
    gran: at.map((volume_mL, k) => ({
      kind: 'acid side weak',
      step: k + 1,
      pointsUsed: 8,
      volume_mL: volume_mL + 0.03,
      u_mL: 0.01,
      range_mL: [volume_mL - 1, volume_mL - 0.2],
      rSquared: 1,
      reason: null,
    })),
  };
}

function fitted(analyte: string, step: number, volume_mL: number | null): EquivalenceResult {
  return { analyte, step, volume_mL, u: 0.01, by: 'fit', remark: '', shares: [] };
}

function namesOf(found: StepsOfReadings, byFit: readonly EquivalenceResult[]) {
  return equivalenceByReadings(found, byFit, volumes).map(({ by, analyte, step }) => `${by} ${step} of ${analyte}`);
}

describe('steps of the readings', () => {
  it('are named after the fitted steps beside them', () => {
    expect(namesOf(steps(2.5, 5.1), [fitted('X', 1, 2.48), fitted('Y', 1, 5)])).toEqual([
      'derivative 1 of X',
      'derivative 1 of Y',
      'gran 1 of X',
      'gran 1 of Y',
    ]);
  });

  it('keep their own number where no fitted step is near', () => {
    expect(namesOf(steps(2.5, 5), [fitted('X', 1, 5)])).toEqual([
      'derivative 1 of ',
      'derivative 1 of X',
      'gran 1 of ',
      'gran 1 of X',
    ]);
    expect(namesOf(steps(4), [fitted('X', 1, null)])[0]).toBe('derivative 1 of ');
    expect(namesOf(steps(2.5, 5), [])).toContain('derivative 2 of ');
  });

  it('do not share one name: the nearest has it', () => {
    const names = namesOf(steps(4.88, 4.98), [fitted('strong acid', 1, 4.879)]);
    expect(names.slice(0, 2)).toEqual(['derivative 1 of strong acid', 'derivative 2 of ']);
  });

  it('count the points between the volumes used, whatever the order of the rows', () => {
    const [forward] = equivalenceByReadings(steps(5), [], volumes);
    expect(forward.remark).toContain('5 points from 4.800 to 5.200 mL');
    const found = steps(5);
    const backwards = {
      ...found,
      derivative: found.derivative.map((step) => ({
        ...step,
        pointsUsed: [100 - step.pointsUsed[0], 100 - step.pointsUsed[1]] as const,
      })),
    };
    expect(equivalenceByReadings(backwards, [], volumes.toReversed())[0].remark).toBe(forward.remark);
  });

  it('leave out Gran lines without a volume', () => {
    const found = steps(5);
    const none = {
      ...found,
      gran: [
        {
          kind: 'base side',
          step: 1,
          pointsUsed: 2,
          volume_mL: null,
          u_mL: null,
          range_mL: null,
          rSquared: null,
          reason: 'too few points',
        },
      ],
    } as const;
    expect(equivalenceByReadings(none, [], volumes).map(({ by }) => by)).toEqual(['derivative']);
  });
});

describe('equivalence volumes of a fitted run', () => {
  it('have the uncertainty that the fitted concentration gives them', () => {
    const { equivalence, quantities } = workUpExperiment({
      pKa: [4, 8],
      end_mL: 6.5,
      errors: { seed: 4, uReading: 0.005, uSetting_mL: 0.003 },
    });
    const byFit = equivalence.filter(({ by }) => by === 'fit');
    const concentration = quantities.find(({ id }) => id === 'concentration');
    expect(byFit.map(({ step }) => step)).toEqual([1, 2]);
    for (const { volume_mL, u, step } of byFit) {
      // Volume = step · C · 25 mL / 0.1 mol/L, and everything but C is fixed.
      expect(volume_mL).toBeCloseTo(step * 250 * (concentration?.value ?? 0), 10);
      expect(u).toBeCloseTo(step * 250 * (concentration?.u ?? 0), 10);
    }
  });

  it('have no uncertainty where everything they follow from is fixed, and no value where it is not determined', () => {
    const acid = { pKa: [4.8], end_mL: 3.6 };
    const declared = {
      sample: { analytes: [{ groups: 1, concentration_M: 0.01, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }] },
    };
    expect(workUpExperiment(acid, declared).equivalence[0]).toMatchObject({ volume_mL: 2.5, u: null });
    // Sample volume and burette gain can be changed together, but what they move is the volume in mL of the burette: it stays.
    const loose = workUpExperiment(acid, {
      sample: { volume_mL: { fitted: true, start: 25 } },
      titrant: { concentration_M: { fitted: true, start: 0.1 } },
      burette: { gain: 'fitted' },
    });
    const [step] = loose.equivalence;
    expect(step.volume_mL === null || Math.abs(step.volume_mL - 2.5) < 0.01).toBe(true);
    expect((step.volume_mL === null) === (step.u === null)).toBe(true);
  });
});
