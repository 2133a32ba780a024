import { expect, test } from 'vitest';
import { placeWords } from '../../../../app/views/results/placeWords.ts';
import { exampleResult } from '../../figures/exampleResult.ts';
import { fittedConstant } from './fittedConstant.ts';

const result = { ...exampleResult(), quantities: [fittedConstant] };

test('a doubt leads to its quantity, its point or its volume', () => {
  expect(placeWords({ quantity: 'pKa1' }, result, false)).toMatchObject({ words: 'show pKa₁', where: 'table' });
  expect(placeWords({ line: 5 }, result, false)).toMatchObject({ words: 'show line 5', where: 'figure' });
  expect(placeWords({ volume_mL: 2.345 }, result, false)?.place).toEqual({ volume_mL: 2.345 });
});

test('under its own quantity it leads to the figure, where that is drawn', () => {
  expect(placeWords({ quantity: 'pKa1' }, result, true)).toMatchObject({
    words: 'show on the figure',
    where: 'figure',
  });
  expect(placeWords({ quantity: 'burette.gain' }, result, true)).toBe(null);
});

test('what is not on the page cannot be shown', () => {
  expect(placeWords({ line: 1 }, result, false)).toBe(null);
  expect(placeWords({ key: 'medium.pKw' }, result, false)).toBe(null);
});
