import { describe, expect, it } from 'vitest';
import { bootstrapRemarks } from '../../../../../app/views/results/bootstrap/bootstrapRemarks.ts';
import { compareIntervals } from '../../../../../app/views/results/bootstrap/compareIntervals.ts';
import type { NoiseResult } from '../../../../../core/index.ts';
import { fittedQuantity, summaryOf } from './comparedExample.ts';

const compared = (low: number, high: number) =>
  compareIntervals([fittedQuantity('pKa1', [4, 5])], [summaryOf('pKa1', [low, high])]);

const estimated: NoiseResult = {
  reading: 0.005,
  setting_mL: 0.003,
  dose_mL: 0,
  unit: 'pH',
  declared: false,
  reducedChiSquare: 1,
  degreesOfFreedom: 2.9,
};

describe('remarks on a simulation', () => {
  it('are not made where it bears out the intervals', () => {
    expect(bootstrapRemarks(compared(4.02, 4.98), 0, 1000, estimated)).toEqual([]);
  });

  it('name the quantity and the ends that moved', () => {
    const [{ seen }] = bootstrapRemarks(compared(4.05, 5.31), 0, 1000, estimated);
    expect(seen).toBe('By simulation, pKa1 has its upper end higher by 31 % of the width.');
    const [both] = bootstrapRemarks(compared(3.85, 5.31), 0, 1000, estimated);
    expect(both.seen).toBe(
      'By simulation, pKa1 has its lower end lower by 15 % and its upper end higher by 31 % of the width.',
    );
  });

  it('lay narrower intervals to the noise only where that was estimated', () => {
    expect(bootstrapRemarks(compared(4.25, 4.75), 0, 1000, estimated)[0].means).toContain('3 degrees of freedom');
    const declared = { ...estimated, declared: true };
    expect(bootstrapRemarks(compared(4.25, 4.75), 0, 1000, declared)[0].means).toContain('not straight');
    expect(bootstrapRemarks(compared(3.75, 5.25), 0, 1000, estimated)[0].means).toContain('not straight');
  });

  it('tell of repetitions without a fit where they are more than a few', () => {
    expect(bootstrapRemarks([], 20, 1000, null)).toEqual([]);
    expect(bootstrapRemarks([], 1000, 1000, null).map(({ seen }) => seen)).toEqual([
      '1,000 of 1,000 repetitions could not be fitted.',
    ]);
  });
});
