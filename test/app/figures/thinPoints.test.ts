import { expect, test } from 'vitest';
import { mostPointsDrawn, thinPoints } from '../../../app/figures/thinPoints.ts';
import type { PointResult } from '../../../core/index.ts';

function points(count: number): PointResult[] {
  return Array.from({ length: count }, (_, i) => ({
    line: i + 2,
    volume_mL: i / 1000,
    reading: 3 + i / count,
    pH: 3,
    used: true,
    residual: 0.001 * Math.sin(i),
    u: 0.005,
  }));
}

test('few points are left as they are', () => {
  const few = points(mostPointsDrawn);
  expect(thinPoints(few)).toBe(few);
});

test('many become few, in their order, with both ends', () => {
  const many = points(50_000);
  const drawn = thinPoints(many);
  expect(drawn.length).toBeLessThanOrEqual(mostPointsDrawn);
  expect(drawn.length).toBeGreaterThan(mostPointsDrawn / 2);
  expect(drawn[0]).toBe(many[0]);
  expect(drawn.at(-1)).toBe(many.at(-1));
  expect(drawn.every((point, i) => i === 0 || point.line > drawn[i - 1].line)).toBe(true);
});

test('every spike of a reading or a residual is drawn', () => {
  const many = points(50_000);
  many[12_345] = { ...many[12_345], reading: 12 };
  many[23_456] = { ...many[23_456], reading: 1 };
  many[34_567] = { ...many[34_567], residual: 0.5 };
  many[45_678] = { ...many[45_678], residual: -0.5 };
  const lines = new Set(thinPoints(many).map((point) => point.line));
  expect([12_345, 23_456, 34_567, 45_678].filter((i) => !lines.has(many[i].line))).toEqual([]);
});

test('the cloud keeps its look: most of what is drawn is picked without regard to its size', () => {
  const drawn = thinPoints(points(50_000));
  const small = drawn.filter((point) => Math.abs(point.residual ?? 0) < 0.0005).length;
  // A third of a sine's values lie below half its height; with extremes alone there would be next to none.
  expect(small / drawn.length).toBeGreaterThan(0.2);
});

test('points without residuals can be thinned', () => {
  const unfitted = points(10_000).map((point) => ({ ...point, residual: null, u: null }));
  expect(thinPoints(unfitted).length).toBeLessThanOrEqual(mostPointsDrawn);
});
