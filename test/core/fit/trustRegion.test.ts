import { describe, expect, it } from 'vitest';
import type { Linearisation } from '../../../core/fit/linearisation.ts';
import { chooseDamping, isAcceptable, nextRadius, type Trial } from '../../../core/fit/trustRegion.ts';

function linearisation(singularValues: readonly number[], projected: readonly number[], rank: number): Linearisation {
  const size = singularValues.length;
  return {
    scales: new Float64Array(size).fill(1),
    singularValues: Float64Array.from(singularValues),
    rightVectors: new Float64Array(size * size),
    projected: Float64Array.from(projected),
    rank,
    attainable: projected.reduce((sum, c) => sum + c * c, 0),
    columnCosine: 1,
  };
}

function stepLength({ singularValues, projected, rank }: Linearisation, damping: number): number {
  let squares = 0;
  for (let k = 0; k < rank; k++)
    squares += ((singularValues[k] * projected[k]) / (singularValues[k] ** 2 + damping)) ** 2;
  return Math.sqrt(squares);
}

describe('chooseDamping', () => {
  it('is none where the undamped step lies inside', () => {
    expect(chooseDamping(linearisation([2, 1], [2, 1], 2), 1.5)).toBe(0);
    expect(chooseDamping(linearisation([2, 1], [2, 1], 2), Infinity)).toBe(0);
  });

  it.each([
    ['a well-conditioned problem', [2, 1.5, 1], [3, -4, 5], 3],
    ['a condition number of 1e10', [1, 1e-5, 1e-10], [1, 1, 1], 3],
    ['a missing direction', [1, 1e-3, 0], [1, 1, 0], 2],
  ])('keeps the step within 10 %% of the radius: %s', (_, singularValues, projected, rank) => {
    const local = linearisation(singularValues, projected, rank);
    const full = stepLength(local, 0);
    for (const share of [0.9, 0.5, 1e-2, 1e-5, 1e-9]) {
      const radius = share * full;
      const length = stepLength(local, chooseDamping(local, radius));
      expect(Math.abs(length / radius - 1)).toBeLessThanOrEqual(0.12);
      expect(length).toBeLessThanOrEqual(1.1 * radius);
    }
  });
});

describe('nextRadius', () => {
  const trial: Trial = { actual: 1, predicted: 1, descent: 0.5, length: 2, damped: true };

  it('doubles the step after a good prediction and after an undamped step that was fair', () => {
    expect(nextRadius(2, trial)).toBe(4);
    expect(nextRadius(10, { ...trial, actual: 0.5, damped: false })).toBe(4);
  });

  it('stays after a fair prediction', () => {
    expect(nextRadius(2.1, { ...trial, actual: 0.5 })).toBe(2.1);
  });

  it('shrinks to the lowest point of the parabola, by 2 to 10 times', () => {
    expect(nextRadius(2, { ...trial, actual: 0.1 })).toBe(1);
    // cost −2·0.5·t + 3·t²: lowest at t = 1/6, above the least of 0.1.
    expect(nextRadius(2, { ...trial, actual: -2 })).toBeCloseTo(2 / 6, 14);
    expect(nextRadius(2, { ...trial, actual: -1e9 })).toBeCloseTo(0.2, 14);
  });

  it('becomes shorter than a step that failed, however large it was', () => {
    expect(nextRadius(1e9, { ...trial, actual: -1e-9 })).toBeLessThanOrEqual(1);
    expect(nextRadius(1e9, { ...trial, actual: null })).toBe(0.5);
  });

  it('belongs to a step that is taken only if the cost falls by a fair part of the prediction', () => {
    expect(isAcceptable({ ...trial, actual: 2e-4 })).toBe(true);
    expect(isAcceptable({ ...trial, actual: 5e-5 })).toBe(false);
    expect(isAcceptable({ ...trial, actual: 0, predicted: 0 })).toBe(false);
    expect(isAcceptable({ ...trial, actual: null })).toBe(false);
  });
});
