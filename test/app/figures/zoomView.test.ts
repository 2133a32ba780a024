import { expect, test } from 'vitest';
import { viewShowing, zoomAround, zoomView } from '../../../app/figures/zoomView.ts';

const whole = { volume: [0, 20], reading: [2, 12] } as const;

test('one direction is cut down, the other stays; ends in either order, within the whole', () => {
  expect(zoomView(whole, whole, { volume: [8, 4] })).toEqual({ volume: [4, 8], reading: [2, 12] });
  expect(zoomView(whole, whole, { reading: [5, 99] })).toEqual({ volume: [0, 20], reading: [5, 12] });
});

test('a view never becomes too small to have an axis', () => {
  const { volume } = zoomView(whole, whole, { volume: [20, 20] });
  expect(volume[1]).toBe(20);
  expect(volume[1] - volume[0]).toBeCloseTo(20 / 500, 9);
});

test('closer keeps the place where it is on the page; wider ends at the whole', () => {
  const near = zoomAround(whole, whole, { volume_mL: 5, reading: 4 }, 0.5);
  expect(near).toEqual({ volume: [2.5, 12.5], reading: [3, 8] });
  expect(zoomAround(whole, near, { volume_mL: 5, reading: 4 }, 100)).toEqual(whole);
});

test('a place out of sight is brought in, one in sight moves nothing', () => {
  const view = { volume: [4, 8], reading: [3, 5] } as const;
  expect(viewShowing(whole, view, { volume_mL: 5, reading: 4 })).toBe(view);
  const moved = viewShowing(whole, view, { volume_mL: 9, reading: 4 });
  expect(moved.volume[0]).toBeCloseTo(5.4, 9);
  expect(moved.volume[1]).toBeCloseTo(9.4, 9);
  expect(moved.reading).toEqual([3, 5]);
});
