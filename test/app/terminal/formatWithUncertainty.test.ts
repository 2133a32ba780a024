import { describe, expect, it } from 'vitest';
import { formatWithUncertainty } from '../../../app/terminal/formatWithUncertainty.ts';

describe('a value with its uncertainty', () => {
  it.each([
    [4.75612, 0.00231, '4.7561 ± 0.0023'],
    [0.0150432, 0.0000181, '0.015043 ± 0.000018'],
    [411.324, 0.0843, '411.324 ± 0.084'],
    [25, 0.0122, '25.000 ± 0.012'],
    // The uncertainty gains a place as it is rounded.
    [4.7561, 0.0996, '4.76 ± 0.10'],
    [4.7561, 0.00999, '4.756 ± 0.010'],
    [12.34, 9.96, '12 ± 10'],
    // To tens and hundreds: no digit that the uncertainty does not support.
    [1234.5, 123, '1230 ± 120'],
    [-98765, 4321, '-98800 ± 4300'],
    // Nothing has no sign.
    [-0.0000004, 0.002, '0.0000 ± 0.0020'],
    [-3, 120, '0 ± 120'],
    [-0.00618, 0.0018, '-0.0062 ± 0.0018'],
  ])('%d with u = %d is printed as %s', (value, u, text) => {
    expect(formatWithUncertainty(value, u)).toBe(text);
  });

  it('is printed to six digits where there is no uncertainty', () => {
    expect(formatWithUncertainty(13.99712345, null)).toBe('13.9971');
    expect(formatWithUncertainty(0.1, null)).toBe('0.1');
    expect(formatWithUncertainty(0, null)).toBe('0');
    expect(formatWithUncertainty(2.5, 0)).toBe('2.5');
  });

  it('keeps an uncertainty far below the value readable', () => {
    expect(formatWithUncertainty(1e-14, 1.2e-15)).toBe('1.00000e-14 ± 1.2e-15');
  });
});
