import { describe, expect, it } from 'vitest';
import { compareIntervals } from '../../../../../app/views/results/bootstrap/compareIntervals.ts';
import { fittedQuantity, summaryOf } from './comparedExample.ts';

describe('intervals by the fit and by simulation', () => {
  it('agree where no end moved by more than a fifth of the width', () => {
    // A width of 1 from 4 to 5.
    const quantity = fittedQuantity('pKa1', [4, 5]);
    const agrees = (low: number, high: number) =>
      compareIntervals([quantity], [summaryOf('pKa1', [low, high])]).map((entry) => entry.agrees);
    expect(agrees(4.19, 5.19)).toEqual([true]);
    expect(agrees(4.21, 5)).toEqual([false]);
    expect(agrees(4, 4.79)).toEqual([false]);
    expect(agrees(3.79, 5)).toEqual([false]);
  });

  it('tell how far each end moved, in widths of the interval by the fit', () => {
    const [{ moved }] = compareIntervals([fittedQuantity('x', [0, 0.5])], [summaryOf('x', [0.05, 0.4])]);
    expect(moved[0]).toBeCloseTo(0.1, 12);
    expect(moved[1]).toBeCloseTo(-0.2, 12);
  });

  it('are compared only where both have two ends, the fitted quantities first', () => {
    const quantities = [
      { ...fittedQuantity('sample.volume', [24.9, 25.1]), state: 'known' as const },
      fittedQuantity('pKa1', [null, 2.1]),
      { ...fittedQuantity('medium.pKw', [13, 14]), u: null, interval95: null, whyNoU: 'fixed' as const },
      fittedQuantity('pKa2', [4, 5]),
      fittedQuantity('concentration', [0.01, 0.02]),
    ];
    const summaries = ['sample.volume', 'pKa1', 'medium.pKw', 'pKa2'].map((id) => summaryOf(id, [1, 2]));
    expect(compareIntervals(quantities, summaries).map(({ quantity }) => quantity.id)).toEqual([
      'pKa2',
      'sample.volume',
    ]);
  });
});
