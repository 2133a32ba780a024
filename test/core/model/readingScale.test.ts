import { describe, expect, it } from 'vitest';
import { ReadingScale } from '../../../core/model/readingScale.ts';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { modelOfSheet } from '../../modelOfSheet.ts';

function scaleOf(reading: SheetFile['reading']): ReadingScale {
  const { design, values } = modelOfSheet({ sheet: 1, reading }, [0]);
  const scale = new ReadingScale(design);
  scale.take(values);
  return scale;
}

describe('ReadingScale', () => {
  it('turns the slope of a meter about pH 7', () => {
    const scale = scaleOf({ kind: 'pH', offset: 0.03, slope: 0.98 });
    expect(scale.reading(7)).toBeCloseTo(7.03, 12);
    expect(scale.reading(4)).toBeCloseTo(7.03 - 3 * 0.98, 12);
    expect(scale.perNegativeLog).toBe(0.98);
    expect(scale.perSlope(4)).toBe(-3);
  });

  it('lets the potential fall as the pH rises, by 59.16 mV per pH at 25 °C', () => {
    const scale = scaleOf({ kind: 'mV', E0_mV: 410, slope: 1 });
    expect(scale.reading(0)).toBe(410);
    // The figure of every electrode manual (from memory), two decimals.
    expect(Math.abs(scale.reading(1) - (410 - 59.16))).toBeLessThan(0.005);
    expect(Math.abs(scale.perSlope(2) + 2 * 59.16)).toBeLessThan(0.01);
  });

  it('adds junction terms in the unit of the reading', () => {
    const scale = scaleOf({ kind: 'mV', E0_mV: 410, slope: 1, junctionHydrogen: -20, junctionHydroxide: 30 });
    expect(scale.hasJunction).toBe(true);
    expect(scale.readingWithJunction(1, 0.1, 0.2) - scale.reading(1)).toBeCloseTo(-2 + 6, 12);
    expect(scaleOf({ kind: 'pH', offset: 0 }).hasJunction).toBe(false);
  });

  it('turns readings back into what they mean', () => {
    for (const reading of [
      { kind: 'pH', offset: 0.03, slope: 0.98 },
      { kind: 'mV', E0_mV: 410, slope: 0.99 },
    ] as const) {
      const scale = scaleOf(reading);
      for (const negativeLog of [-0.3, 2, 7, 13.1])
        expect(scale.negativeLog(scale.reading(negativeLog))).toBeCloseTo(negativeLog, 12);
    }
  });
});
