import { expect, test } from 'vitest';
import { groupEquivalence } from '../../../../app/views/results/groupEquivalence.ts';
import { stepWords } from '../../../../app/views/results/stepWords.ts';
import type { EquivalenceResult } from '../../../../core/index.ts';

const volume = (analyte: string, step: number, by: EquivalenceResult['by'], volume_mL: number): EquivalenceResult => ({
  analyte,
  step,
  volume_mL,
  u: 0.01,
  by,
  shares: [],
  remark: '',
});
const words = (...results: EquivalenceResult[]) =>
  stepWords(groupEquivalence(results)).map(({ name, remark }) => `${name} ${remark}`.trim());

test('a step that only the readings have is called so', () => {
  expect(words(volume('strong acid', 1, 'fit', 4.9), volume('', 2, 'derivative', 5))).toEqual([
    'strong acid',
    'a step of the readings alone',
  ]);
});

test('without a fit the steps of the readings are numbered', () => {
  expect(words(volume('', 1, 'derivative', 4.9), volume('', 2, 'derivative', 9.8))).toEqual(['1', '2']);
});

test('a single substance needs no name, several do', () => {
  expect(words(volume('citric acid', 1, 'fit', 4), volume('citric acid', 2, 'fit', 8))).toEqual(['1', '2']);
  expect(words(volume('a', 1, 'fit', 4), volume('b', 1, 'fit', 8))).toEqual(['1 a', '1 b']);
});
