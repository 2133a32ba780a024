import { expect, test } from 'vitest';
import { spreadLabels } from '../../../app/figures/spreadLabels.ts';

test('labels with room stay where they want to be', () => {
  expect(
    spreadLabels(
      [
        { at: 80, length: 20 },
        { at: 20, length: 20 },
      ],
      0,
      100,
    ),
  ).toEqual([80, 20]);
});

test('two labels on one place share the shift, in the order given', () => {
  expect(
    spreadLabels(
      [
        { at: 50, length: 20 },
        { at: 50, length: 20 },
      ],
      0,
      100,
    ),
  ).toEqual([40, 60]);
});

test('labels at an edge are pushed inwards and push their neighbours on', () => {
  expect(
    spreadLabels(
      [
        { at: 1, length: 20 },
        { at: 12, length: 20 },
        { at: 90, length: 30 },
      ],
      0,
      100,
    ),
  ).toEqual([10, 30, 85]);
});

test('no two of many crowded labels overlap, and none leaves the range', () => {
  const wanted = [30, 31, 33, 34, 60, 61, 99].map((at, k) => ({ at, length: 8 + (k % 3) }));
  const centres = spreadLabels(wanted, 0, 100);
  wanted.forEach(({ length }, k) => {
    // 1e-9: sums of halves round in the last place.
    expect(centres[k] - length / 2).toBeGreaterThanOrEqual(-1e-9);
    expect(centres[k] + length / 2).toBeLessThanOrEqual(100 + 1e-9);
    if (k > 0) expect(centres[k] - centres[k - 1]).toBeGreaterThanOrEqual((length + wanted[k - 1].length) / 2 - 1e-9);
  });
});

test('nothing gives nothing', () => {
  expect(spreadLabels([], 0, 100)).toEqual([]);
});
