import { expect, test } from 'vitest';
import { monotoneCurve } from '../../../app/figures/monotoneCurve.ts';

const x = [0, 1, 1.5, 4, 5];
const y = [0, 0.1, 3, 3.1, 9];

test('the curve goes through its points', () => {
  const curve = monotoneCurve(x, y);
  x.forEach((at, i) => void expect(curve(at)).toBeCloseTo(y[i], 12));
});

test('between rising points it rises', () => {
  const curve = monotoneCurve(x, y);
  const heights = Array.from({ length: 501 }, (_, i) => curve(i / 100));
  for (let i = 1; i < heights.length; i++) expect(heights[i]).toBeGreaterThanOrEqual(heights[i - 1] - 1e-12);
});

test('on a straight line it is straight', () => {
  expect(monotoneCurve([0, 1, 3], [1, 3, 7])(2.2)).toBeCloseTo(5.4, 12);
});
