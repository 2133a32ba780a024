import { expect, test } from 'vitest';
import { cursorAtPH, cursorAtPoint, cursorAtVolume, nearestPoint } from '../../../app/figures/cursor.ts';
import { figureRun } from '../../../app/figures/figureRun.ts';
import { nernstSlope_mV } from '../../simulator/simulateRun.ts';
import { exampleResult } from './exampleResult.ts';

test('at a volume the cursor stands on the curve, with the pH and the nearest point', () => {
  const run = figureRun(exampleResult({ kind: 'mV' }));
  const cursor = cursorAtVolume(run, 7.5);
  // Half-way to the second equivalence of 10 mL the pH is the second constant; 0.02 for the water's share of the charge.
  expect(cursor?.pH).toBeCloseTo(6, 1);
  expect(cursor?.reading).toBeCloseTo(400 - 6 * nernstSlope_mV(25), 0);
  expect(cursor?.volume_mL).toBe(7.5);
  const distances = run.points.map((point) => Math.abs(point.volume_mL - 7.5));
  expect(distances[cursor?.point ?? 0]).toBe(Math.min(...distances));
});

test('beyond the curve the cursor stays at its end', () => {
  const run = figureRun(exampleResult());
  expect(cursorAtVolume(run, -3)).toMatchObject({ volume_mL: 0, point: 0 });
  expect(cursorAtVolume(run, 99)?.point).toBe(run.points.length - 1);
});

test('a pH finds the volume where the curve takes it, and comes back to itself', () => {
  const run = figureRun(exampleResult());
  const cursor = cursorAtPH(run, 6.5);
  expect(cursorAtVolume(run, cursor?.volume_mL ?? Number.NaN)?.pH).toBeCloseTo(6.5, 9);
});

test('a pH that the curve never takes has a height and no volume', () => {
  const run = figureRun(exampleResult());
  expect(cursorAtPH(run, 13.9)).toEqual({ volume_mL: null, reading: expect.closeTo(13.9, 9), pH: 13.9, point: null });
});

test('a point of an unfitted run is pointed at itself', () => {
  const run = figureRun(exampleResult({ fitted: false }));
  const { volume_mL, reading } = run.points[7];
  expect(cursorAtPoint(run, 7)).toMatchObject({ volume_mL, reading, point: 7 });
  expect(cursorAtVolume(run, volume_mL + 0.001)).toMatchObject({ volume_mL, reading, point: 7 });
});

test('a point of a fitted run is pointed at on the curve', () => {
  const run = figureRun(exampleResult());
  const { reading, residual } = run.points[7];
  expect(cursorAtPoint(run, 7).reading).toBeCloseTo(reading - (residual ?? 0), 9);
});

test('the nearest of the points is found from every side', () => {
  const run = figureRun(exampleResult({ points: 5 }));
  const volumes = run.points.map((point) => point.volume_mL);
  expect(nearestPoint(run, -1)).toBe(0);
  expect(nearestPoint(run, volumes[2])).toBe(2);
  expect(nearestPoint(run, (volumes[2] + volumes[3]) / 2 + 0.01)).toBe(3);
  expect(nearestPoint(run, 99)).toBe(4);
});

test('a run without points has no cursor', () => {
  const empty = { ...exampleResult({ fitted: false }), points: [] };
  expect(cursorAtVolume(figureRun(empty), 3)).toBeNull();
});
