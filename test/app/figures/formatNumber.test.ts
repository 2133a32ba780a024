import { expect, test } from 'vitest';
import { decimalsIn, formatNumber, formatSigned } from '../../../app/figures/formatNumber.ts';

test('minus signs are true ones, and nothing is not negative', () => {
  expect(formatNumber(-1.25, 1)).toBe('−1.3');
  expect(formatNumber(-0.0001, 2)).toBe('0.00');
  expect(formatSigned(0.00312, 3)).toBe('+0.003');
  expect(formatSigned(-0.00312, 3)).toBe('−0.003');
  expect(formatSigned(-0.0001, 3)).toBe('0.000');
});

test('decimals are those the numbers were written with', () => {
  expect(decimalsIn([1, 2.5, 3.25], 4)).toBe(2);
  expect(decimalsIn([0.1 + 0.2], 4)).toBe(1);
  expect(decimalsIn([Math.PI], 4)).toBe(4);
  expect(decimalsIn([], 4)).toBe(0);
});
