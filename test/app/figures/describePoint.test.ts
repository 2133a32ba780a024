import { expect, test } from 'vitest';
import { describePoint } from '../../../app/figures/describePoint.ts';
import { figureRun } from '../../../app/figures/figureRun.ts';
import { exampleResult } from './exampleResult.ts';

test('a point is told with its line, volume, reading, residual and whether it is excluded', () => {
  const run = figureRun(exampleResult({ kind: 'mV', excluded: [3] }));
  expect(describePoint(run, 0)).toMatch(/^line 2, 0\.000 mL, \d+\.\d\d mV, residual [+−]\d\.\d\d mV$/);
  expect(describePoint(run, 1)).toMatch(/^line 3, .*, excluded$/);
});

test('without a curve there is no residual', () => {
  expect(describePoint(figureRun(exampleResult({ fitted: false })), 0)).toMatch(/^line 2, 0\.000 mL, pH \d\.\d+$/);
});
