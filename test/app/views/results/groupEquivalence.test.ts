import { expect, test } from 'vitest';
import { groupEquivalence } from '../../../../app/views/results/groupEquivalence.ts';
import type { EquivalenceResult } from '../../../../core/index.ts';

const volume = (step: number, by: EquivalenceResult['by'], volume_mL: number | null): EquivalenceResult => ({
  analyte: 'acid',
  step,
  volume_mL,
  u: 0.01,
  by,
  shares: [],
  remark: '',
});

test('the ways to a step stand side by side, steps in the order of their volumes', () => {
  const steps = groupEquivalence([
    volume(2, 'fit', 10),
    volume(1, 'fit', 5),
    volume(1, 'gran', 5.01),
    volume(2, 'derivative', null),
    volume(1, 'derivative', 4.99),
  ]);
  expect(steps.map(({ step }) => step)).toEqual([1, 2]);
  expect(steps[0].gran.map(({ volume_mL }) => volume_mL)).toEqual([5.01]);
  expect(steps[1].derivative.map(({ volume_mL }) => volume_mL)).toEqual([null]);
  expect(steps[1].gran).toEqual([]);
});

test('a step that only one way sees is kept', () => {
  expect(groupEquivalence([volume(1, 'gran', 3)])).toMatchObject([{ fit: [], gran: [{ volume_mL: 3 }] }]);
});

test('lines on either side of a step both stand', () => {
  const [step] = groupEquivalence([volume(1, 'gran', 3), volume(1, 'gran', 3.02)]);
  expect(step.gran.map(({ volume_mL }) => volume_mL)).toEqual([3, 3.02]);
});
