import { expect, test } from 'vitest';
import { formatDeclared, formatQuantity, formatSignificant } from '../../../app/widgets/formatQuantity.ts';

test.each([
  [2.93561, 0.00297, '2.9356', '0.0030'],
  [9.67, 0.0996, '9.67', '0.10'],
  [25.0004, 0.0121, '25.000', '0.012'],
  [-0.00896, 0.0018, '−0.0090', '0.0018'],
  [0.0000001, 0.01, '0.000', '0.010'],
  [-0.0001, 0.01, '0.000', '0.010'],
  [1234.5, 123, '1230', '120'],
  [0.01181444, 0.0000008, '0.01181444', '0.00000080'],
  [1.23456e-9, 2.3e-11, '1.235 × 10⁻⁹', '0.023 × 10⁻⁹'],
])('%d with u %d is written %s, u %s', (value, u, valueText, uText) => {
  expect(formatQuantity(value, u)).toEqual({ value: valueText, u: uText });
});

test('a missing number is a dash, a number without uncertainty keeps its own digits', () => {
  expect(formatQuantity(null, null)).toEqual({ value: '–', u: null });
  expect(formatQuantity(13.99712345, null, 6)).toEqual({ value: '13.9971', u: null });
});

test('significant digits without zeros that say nothing', () => {
  expect([0, 0.1, 0.00012, 12345.678, 1.2e-7].map((value) => formatSignificant(value, 4))).toEqual([
    '0',
    '0.1',
    '0.00012',
    '12350',
    '1.2 × 10⁻⁷',
  ]);
});

test('a declared number keeps all of its digits, and shows at least so many', () => {
  expect([25, 0.10023, -0.5, 1e-9].map((value) => formatDeclared(value, 2))).toEqual([
    '25.00',
    '0.10023',
    '−0.50',
    '1 × 10⁻⁹',
  ]);
});
