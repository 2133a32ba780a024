import { expect, test } from 'vitest';
import { figureCaption } from '../../../app/figures/figureCaption.ts';
import { figureRun } from '../../../app/figures/figureRun.ts';
import { exampleResult } from './exampleResult.ts';

const captionOf = (wanted: Parameters<typeof exampleResult>[0]) => figureCaption(figureRun(exampleResult(wanted)));

test('a fitted run is told with its points, ranges, equivalence volumes, residuals and constants', () => {
  const caption = captionOf({ excluded: [4], carbonate: true });
  expect(caption).toMatch(/^pH from \d\.\d+ to \d+\.\d+ over 0\.000 to 18\.000 mL of titrant, 60 points/);
  expect(caption).toContain('the 1 excluded');
  expect(caption).toContain('equivalence volumes 5.000, 10.000 and 15.000 mL.');
  expect(caption).toContain('steepest, 5.03, 10.03 and 15.03 mL.');
  expect(caption).toMatch(/Residuals lie between −0\.0\d+ and \+0\.0\d+; the band is twice/);
  expect(caption).toContain('example acid (X), whose 4 forms meet at pKa′ 3.00, 6.00 and 9.50');
  expect(caption).toContain('carbonate, whose 3 forms meet at pKa′ 6.35 and 10.33');
});

test('an unfitted run is told without what it does not have', () => {
  const caption = captionOf({ fitted: false });
  expect(caption).not.toMatch(/curve|Residuals|equivalence volume|forms/);
  expect(caption).toContain('60 points (open circles).');
});

test('millivolts keep their unit', () => {
  expect(captionOf({ kind: 'mV' })).toMatch(/^Readings from −\d+\.\d+ to \d+\.\d+ mV .* mV; the band/);
});

test('no points, no ranges', () => {
  expect(figureCaption(figureRun({ ...exampleResult({ fitted: false }), points: [] }))).toBe(
    'The run holds no points.',
  );
});
