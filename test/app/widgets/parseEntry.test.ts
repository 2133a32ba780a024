import { expect, test } from 'vitest';
import { parseEntry } from '../../../app/widgets/parseEntry.ts';

test.each([
  ['0.1002', 0.1002],
  ['0,1002', 0.1002],
  [' 25 ', 25],
  ['−0.5', -0.5],
  ['-,5', -0.5],
  ['1e-3', 0.001],
  ['2.', 2],
])('%s is read', (text, value) => {
  expect(parseEntry(text)).toBe(value);
});

test.each(['', 'x', '1,000.5', '1.000,5', '1 000', '0x10', 'Infinity', '1e999', '12 mL', '.'])(
  '%s is no number',
  (text) => {
    expect(parseEntry(text)).toBe(null);
  },
);
