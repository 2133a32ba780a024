import { expect, test } from 'vitest';
import { type LabelRequest, placeLabels } from '../../../app/figures/placeLabels.ts';

const bounds = { left: 0, top: 0, width: 100, height: 100 };

function request(...places: readonly (readonly [left: number, top: number, cost: number])[]): LabelRequest {
  return { width: 20, height: 10, candidates: places.map(([left, top, cost]) => ({ left, top, cost })) };
}

test('the cheapest place is taken', () => {
  expect(placeLabels([request([50, 50, 3], [10, 10, 1])], bounds, [], [])).toEqual([
    { left: 10, top: 10, width: 20, height: 10 },
  ]);
});

test('a label gives way to an earlier one and to an obstacle', () => {
  const obstacle = { left: 40, top: 40, width: 20, height: 10 };
  const places = placeLabels(
    [request([10, 10, 0]), request([15, 12, 0], [45, 42, 1], [70, 70, 2])],
    bounds,
    [obstacle],
    [],
  );
  expect(places.map((place) => [place?.left, place?.top])).toEqual([
    [10, 10],
    [70, 70],
  ]);
});

test('a place outside the bounds is never taken', () => {
  expect(placeLabels([request([90, 10, 0], [-1, 10, 0], [10, 95, 0])], bounds, [], [])).toEqual([null]);
});

test.each([
  ['from corner to corner', [0, 0, 60, 30]],
  ['with both ends inside', [12, 12, 14, 14]],
  ['straight up', [20, 0, 20, 60]],
  ['straight across', [0, 15, 60, 15]],
])('a line through the label, %s, costs what it says', (_, line) => {
  const request5Dearer = request([10, 10, 0], [70, 70, 5]);
  const leftWithCost = (cost: number) => placeLabels([request5Dearer], bounds, [], [{ line, cost }])[0]?.left;
  expect(leftWithCost(4)).toBe(10);
  expect(leftWithCost(6)).toBe(70);
});

test('a line that passes beside the label costs nothing', () => {
  const [place] = placeLabels([request([10, 10, 0], [70, 70, 1])], bounds, [], [{ line: [0, 25, 25, 40], cost: 50 }]);
  expect(place?.left).toBe(10);
});
