import { expect, test } from 'vitest';
import { strongestPair } from '../../../../app/views/results/strongestPair.ts';

test('the strongest pair is found whatever its sign, and what is not determined is passed by', () => {
  const matrix = [1, 0.2, null, 0.2, 1, -0.9, null, -0.9, 1];
  expect(strongestPair({ ids: ['a', 'b', 'c'], matrix })).toEqual({ row: 2, column: 1 });
  expect(strongestPair({ ids: ['a', 'b'], matrix: [1, null, null, 1] })).toBe(null);
});
