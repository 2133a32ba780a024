import { describe, expect, it } from 'vitest';
import { readUnit } from '../../../core/units/readUnit.ts';
import { millilitres } from '../../../core/units/volume.ts';

describe('millilitres', () => {
  it('converts without a second rounding', () => {
    expect([millilitres(12.5, 'mL'), millilitres(1234.5, 'µL'), millilitres(0.025, 'L')]).toEqual([12.5, 1.2345, 25]);
  });

  it('knows the micro sign, the Greek letter and the plain u for the same unit', () => {
    expect(['µL', 'μl', '[uL]', '(ML)', 'cm³', 'kg'].map(readUnit)).toEqual(['µL', 'µL', 'µL', 'mL', 'mL', undefined]);
  });
});
