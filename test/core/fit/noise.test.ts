import { describe, expect, it } from 'vitest';
import { declaredNoise, noiseAt } from '../../../core/fit/noise.ts';
import { completeSheet } from '../../../core/sheet/completeSheet.ts';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { plainFacts } from '../../modelOfSheet.ts';

function declarationOf(sheet: Omit<SheetFile, 'sheet'>, perPH = 59) {
  const complete = completeSheet({ sheet: 1, ...sheet }, plainFacts);
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  return declaredNoise(complete.value, perPH);
}

describe('declared noise', () => {
  it('is taken as declared where the reading is', () => {
    const declaration = declarationOf({ reading: { u: 0.004 }, burette: { uSetting_mL: 0.002 } });
    expect(declaration).toEqual({ kind: 'declared', reading: 0.004, setting_mL: 0.002, dose_mL: 0 });
    // A size that the residuals suggest does not move it.
    expect(noiseAt(declaration, 0.1)).toEqual({ reading: 0.004, setting_mL: 0.002, dose_mL: 0 });
  });

  it('leaves the reading to be estimated beside a declared setting error', () => {
    const declaration = declarationOf({ burette: { uSetting_mL: 0.002 } });
    expect(declaration).toEqual({ kind: 'reading-estimated', setting_mL: 0.002, dose_mL: 0 });
    expect(noiseAt(declaration, 0.007)).toEqual({ reading: 0.007, setting_mL: 0.002, dose_mL: 0 });
  });

  it('takes dosing errors as declared, and then the assumed setting error beside them', () => {
    const declaration = declarationOf({ burette: { uDose_mL: 0.001 } });
    expect(declaration).toEqual({ kind: 'reading-estimated', setting_mL: 0.003, dose_mL: 0.001 });
    expect(noiseAt(declaration, 0.007)).toEqual({ reading: 0.007, setting_mL: 0.003, dose_mL: 0.001 });
  });

  it('takes the ratio of both for granted where neither is declared', () => {
    const declaration = declarationOf({});
    // 0.003 mL against 0.005 in pH.
    expect(declaration).toEqual({ kind: 'scale-estimated', settingToReading: 0.6 });
    expect(noiseAt(declaration, 0.01)).toEqual({ reading: 0.01, setting_mL: 0.006, dose_mL: 0 });
  });

  it('means the same ratio in mV', () => {
    const declaration = declarationOf({ reading: { kind: 'mV' } }, 60);
    expect(noiseAt(declaration, 0.6).setting_mL).toBeCloseTo(0.006, 12);
  });
});
