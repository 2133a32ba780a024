import { expect, it } from 'vitest';
import { sortedByVolume } from '../../../core/endpoints/sortedByVolume.ts';

it('sorts, averages readings at the same volume, remembers the input and leaves it alone', () => {
  const volumes = Float64Array.of(2, 0, 1, 2, 2);
  const readings = Float64Array.of(7, 1, 3, 8, 9);
  const sorted = sortedByVolume(volumes, readings);
  expect([...sorted.volumes]).toEqual([0, 1, 2]);
  expect([...sorted.readings]).toEqual([1, 3, 8]);
  expect([...sorted.inputIndex]).toEqual([1, 2, 0]);
  expect([...volumes]).toEqual([2, 0, 1, 2, 2]);
});

it('takes an empty run', () => {
  expect(sortedByVolume(new Float64Array(0), new Float64Array(0)).volumes.length).toBe(0);
});

it('throws on what a programmer should never pass', () => {
  expect(() => sortedByVolume(Float64Array.of(1, 2), Float64Array.of(1))).toThrow('2 volumes but 1 readings');
  expect(() => sortedByVolume(Float64Array.of(1, 2), Float64Array.of(1, Number.NaN))).toThrow('finite');
});
