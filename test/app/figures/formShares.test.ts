import { expect, test } from 'vitest';
import { figureRun } from '../../../app/figures/figureRun.ts';
import { formShares } from '../../../app/figures/formShares.ts';
import { toUnicode } from '../../../app/figures/richText.ts';
import { exampleResult } from './exampleResult.ts';

function sharesAt(pH: number, front: readonly string[]) {
  const run = figureRun(exampleResult({ carbonate: true }));
  return formShares(run, new Set(front), pH).map((system) =>
    system.map(({ label, share }) => `${toUnicode(label)} ${Math.round(100 * share)}`),
  );
}

test('where two forms meet they have the same share', () => {
  expect(sharesAt(6, [''])).toEqual([['H₂X 50', 'HX⁻ 50']]);
});

test('systems in front are told each for itself, the largest share first, next to nothing left out', () => {
  expect(sharesAt(8.35, ['', 'carbonate.'])).toEqual([
    ['HX⁻ 93', 'X²⁻ 7'],
    ['HCO₃⁻ 98', 'CO₃²⁻ 1'],
  ]);
  expect(sharesAt(12.5, [''])).toEqual([['X²⁻ 100']]);
});

test('outside the grid nothing is said', () => {
  expect(sharesAt(0, [''])).toEqual([[]]);
});
