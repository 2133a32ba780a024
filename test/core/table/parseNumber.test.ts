import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseNumber } from '../../../core/table/parseNumber.ts';

const point = { decimal: '.', thousands: '' } as const;
const comma = { decimal: ',', thousands: '' } as const;

describe('parseNumber', () => {
  it.each([
    ['2.51', 2.51],
    [' 12 ', 12],
    ['+0.5', 0.5],
    ['.5', 0.5],
    ['5.', 5],
    ['2.51E-3', 0.00251],
    ['1e5', 1e5],
    ['\u22120.5', -0.5],
    ['\u20131.5', -1.5],
    ['2.51e\u22123', 0.00251],
    ['12.50 mL', 12.5],
    ['12.50mL', 12.5],
    ['7 pH', 7],
    ['25.0 °C', 25],
    ['123456789012345678', 123456789012345680],
    ['-0', 0],
  ])('reads %j with a decimal point', (cell, value) => {
    expect(parseNumber(cell, point)).toBe(value);
  });

  it.each([
    ['2,51', 2.51],
    ['-0,05', -0.05],
    ['2,51E-3', 0.00251],
    ['12,50 ml', 12.5],
  ])('reads %j with a decimal comma', (cell, value) => {
    expect(parseNumber(cell, comma)).toBe(value);
  });

  it.each([
    ['1,234.5', '.', ',', 1234.5],
    ['1,234,567', '.', ',', 1234567],
    ['1.234,5', ',', '.', 1234.5],
    ['1 234,5', ',', ' ', 1234.5],
    ['1\u202f234.5', '.', ' ', 1234.5],
    ["1'234.5", '.', "'", 1234.5],
    ['1’234.5', '.', "'", 1234.5],
  ] as const)('reads %j grouped in thousands', (cell, decimal, thousands, value) => {
    expect(parseNumber(cell, { decimal, thousands })).toBe(value);
  });

  it.each(['', '  ', 'N/A', 'na', 'NaN', '-', '--', '–', '#####', '*****', '?', 'Inf', '#DIV/0!', 'OVL', '1.#QNAN'])(
    'takes %j for a missing value',
    (cell) => {
      expect(parseNumber(cell, point)).toBe('missing');
    },
  );

  it.each([
    'abc',
    '2,51',
    '1,234.5',
    '12 34',
    '1.2.3',
    '12abc',
    '0x10',
    '1e',
    '--5',
    '5-',
    '1e999',
    '1e-999',
    '12:30',
    '=1+2',
  ])('does not make a number of %j', (cell) => {
    expect(parseNumber(cell, point)).toBe('text');
  });

  it.each(['12,', '0.123', '1.23', '1,234.5'])('does not make a number of %j with a decimal comma', (cell) => {
    expect(parseNumber(cell, { decimal: ',', thousands: '.' })).toBe('text');
  });

  it('gives exactly the double that was written, by the short way and the long', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.nat(12), (value, decimals) => {
        for (const written of [
          String(value),
          value.toExponential(),
          Math.abs(value) < 1e6 ? value.toFixed(decimals) : '1',
        ]) {
          // Negative zero is read as zero: no reading is told from the other.
          expect(parseNumber(written, point)).toBe(Number(written) + 0);
          expect(parseNumber(written.replace('.', ','), comma)).toBe(Number(written) + 0);
        }
      }),
      { seed: 11, numRuns: 500 },
    );
  });
});
