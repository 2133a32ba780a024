import { expect, it } from 'vitest';
import { findPeaks } from '../../../core/endpoints/findPeaks.ts';

const sure = (count: number) => new Float64Array(count);

it('takes maxima between two cols, not those at the ends', () => {
  const peaks = findPeaks(Float64Array.of(9, 1, 5, 2, 8, 3, 10), sure(7));
  expect(peaks).toEqual([
    { at: 2, colBefore: 1, colAfter: 3 },
    { at: 4, colBefore: 1, colAfter: 5 },
  ]);
});

it('takes the first point of a level top', () => {
  expect(findPeaks(Float64Array.of(1, 5, 5, 1), sure(4)).map((peak) => peak.at)).toEqual([1]);
});

it('wants a peak to stand above its cols by a fifth, and out of the noise', () => {
  expect(findPeaks(Float64Array.of(10, 10, 11.9, 10, 10), sure(5))).toEqual([]);
  expect(findPeaks(Float64Array.of(10, 10, 12.1, 10, 10), sure(5)).length).toBe(1);
  expect(findPeaks(Float64Array.of(1, 1, 5, 1, 1), new Float64Array(5).fill(1)).length).toBe(0);
  expect(findPeaks(Float64Array.of(1, 1, 9, 1, 1), new Float64Array(5).fill(1)).length).toBe(1);
});

it('passes over a col that is itself uncertain', () => {
  // The lowest place says nothing; the next one does.
  expect(findPeaks(Float64Array.of(1, 9, 2, -5), Float64Array.of(0, 0, 0, 50))[0].colAfter).toBe(2);
});
