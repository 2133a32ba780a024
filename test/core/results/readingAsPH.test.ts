import { describe, expect, it } from 'vitest';
import { readingAsPH } from '../../../core/results/readingAsPH.ts';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { modelOfSheet } from '../../modelOfSheet.ts';

/** RT ln10 / F at 25 °C in mV. */
const nernst = 59.15935;

function sheet(
  reading: SheetFile['reading'],
  medium: SheetFile['medium'] = { activity: 'davies', pKw: 14 },
): SheetFile {
  return { sheet: 1, sample: { background_M: 0.1, analytes: [{ pKa: [4], concentration_M: 0.01 }] }, medium, reading };
}

describe('a reading as pH', () => {
  it('of an ideal meter is the reading', () => {
    const { design, values } = modelOfSheet(sheet({ kind: 'pH', offset: 0, slope: 1 }), [0]);
    expect(readingAsPH(design, values, 0.1).pH(4.321)).toBeCloseTo(4.321, 12);
  });

  it('of a meter with offset and slope is what it means', () => {
    const { design, values } = modelOfSheet(sheet({ kind: 'pH', offset: 0.1, slope: 0.95 }), [0]);
    expect(readingAsPH(design, values, 0.1).pH(7.1 + 0.95 * 2)).toBeCloseTo(9, 12);
  });

  it('of an electrode in mV follows from E0 and slope', () => {
    const { design, values } = modelOfSheet(sheet({ kind: 'mV', E0_mV: 410, slope: 1 }), [0]);
    // The constant is given to seven digits here.
    expect(readingAsPH(design, values, 0.1).pH(410 - 3 * nernst)).toBeCloseTo(3, 5);
  });

  it('differs from p[H⁺] by the activity coefficient at the ionic strength given', () => {
    const { design, values } = modelOfSheet(sheet({ kind: 'pH', offset: 0, slope: 1 }), [0]);
    const asPH = readingAsPH(design, values, 0.1);
    // Davies at 0.1 mol/L with A = 0.5116: 0.5116 (0.31623/1.31623 − 0.03) = 0.10757 for a single charge.
    expect(asPH.pH(4) - asPH.concentrationPH(4)).toBeCloseTo(0.10757, 4);
    expect(asPH.concentrationPKw).toBeCloseTo(14 - 2 * 0.10757, 4);
  });

  it('is p[H⁺] itself on the concentration scale and without an activity model', () => {
    const concentration = modelOfSheet(sheet({ kind: 'pH', scale: 'concentration', offset: 0, slope: 1 }), [0]);
    expect(readingAsPH(concentration.design, concentration.values, 0.1).concentrationPH(4)).toBeCloseTo(4, 12);
    const none = modelOfSheet(sheet({ kind: 'pH', offset: 0, slope: 1 }, { activity: 'none', pKw: 13.8 }), [0]);
    const asPH = readingAsPH(none.design, none.values, 0.1);
    expect(asPH.concentrationPH(4)).toBeCloseTo(4, 12);
    expect(asPH.concentrationPKw).toBe(13.8);
  });

  it('before a fit takes declared values, and an ideal electrode for what is to be fitted', () => {
    const { design } = modelOfSheet(sheet({ kind: 'pH', offset: 'fitted', slope: 'fitted' }), [0]);
    expect(readingAsPH(design, null, null).pH(5)).toBeCloseTo(5, 12);
    const declared = modelOfSheet(sheet({ kind: 'pH', offset: { value: 0.2, u: 0.01 }, slope: 1 }), [0]);
    expect(readingAsPH(declared.design, null, null).pH(5)).toBeCloseTo(4.8, 12);
    // An E0 to be fitted, of which nothing is known: any pH shown is a guess, but a finite one near the scale.
    const mV = modelOfSheet(sheet({ kind: 'mV', E0_mV: 'fitted', slope: 1 }), [0]);
    expect(Number.isFinite(readingAsPH(mV.design, null, null).pH(200))).toBe(true);
  });
});
