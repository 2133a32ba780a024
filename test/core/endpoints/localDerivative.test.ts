import { describe, expect, it } from 'vitest';
import { localDerivative } from '../../../core/endpoints/localDerivative.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';

/** An uneven grid: dense in the middle, as dynamic dosing leaves it. */
const uneven = Float64Array.of(0, 1, 2, 2.5, 2.7, 2.8, 2.85, 2.9, 3, 3.2, 3.7, 4.7, 6);

function expectAllClose(actual: Float64Array, expected: Float64Array, tolerance: number): void {
  expect(actual.length).toBe(expected.length);
  actual.forEach((value, i) => {
    expect(Math.abs(value - expected[i])).toBeLessThan(tolerance);
  });
}

describe('on an uneven grid', () => {
  it('is exact for a quadratic', () => {
    const readings = uneven.map((v) => 3 - 2 * v + 0.5 * v * v);
    const derivative = localDerivative(uneven, readings);
    // Rounding of values of order one over windows of 0.1 mL: 1e-16/0.1² for the second derivative.
    expectAllClose(derivative.values, readings, 1e-12);
    expectAllClose(
      derivative.slopes,
      uneven.map((v) => -2 + v),
      1e-11,
    );
    expectAllClose(
      derivative.curvatures,
      uneven.map(() => 1),
      1e-10,
    );
  });

  it('is exact for a cubic with degree 3', () => {
    const readings = uneven.map((v) => v ** 3 - v);
    const derivative = localDerivative(uneven, readings, { points: 7, degree: 3 });
    // As above, for values up to 200.
    expectAllClose(derivative.values, readings, 1e-10);
    expectAllClose(
      derivative.slopes,
      uneven.map((v) => 3 * v * v - 1),
      1e-9,
    );
    expectAllClose(
      derivative.curvatures,
      uneven.map((v) => 6 * v),
      1e-8,
    );
  });

  it('agrees with the weights of Savitzky and Golay where the grid is even', () => {
    // Slope at the middle of five points, quadratic: (−2, −1, 0, 1, 2)/10 (Anal. Chem. 36 (1964) 1627, from memory).
    const derivative = localDerivative(Float64Array.of(0, 1, 2, 3, 4), Float64Array.of(4, 1, 7, 2, 6));
    expect(derivative.slopes[2]).toBeCloseTo((-2 * 4 - 1 + 2 + 2 * 6) / 10, 12);
    expect(derivative.values[2]).toBeCloseTo((-3 * 4 + 12 * 1 + 17 * 7 + 12 * 2 - 3 * 6) / 35, 12);
    expect(derivative.slopeGains[2]).toBeCloseTo(Math.sqrt(10) / 10, 12);
  });
});

it('does not depend on the order of the points and averages those at one volume', () => {
  const readings = uneven.map((v) => Math.sin(v));
  const order = [4, 0, 12, 7, 3, 9, 1, 2, 11, 10, 8, 6, 5];
  const shuffled = localDerivative(
    Float64Array.from(order, (i) => uneven[i]),
    Float64Array.from(order, (i) => readings[i]),
  );
  const inOrder = localDerivative(uneven, readings);
  expect(shuffled.slopes).toEqual(inOrder.slopes);
  expect([...shuffled.inputIndex].map((i) => order[i])).toEqual([...inOrder.inputIndex]);

  const twice = localDerivative(Float64Array.of(0, 1, 1, 2), Float64Array.of(0, 0.5, 1.5, 2), { points: 3 });
  expect([...twice.volumes]).toEqual([0, 1, 2]);
  expect(twice.slopes[1]).toBeCloseTo(1, 12);
});

it('leaves out what is not determined and never gives NaN', () => {
  const few = localDerivative(Float64Array.of(1, 2), Float64Array.of(5, 6));
  expect(few.volumes.length).toBe(0);
  expect(localDerivative(Float64Array.of(1, 1, 1), Float64Array.of(5, 6, 7)).slopes.length).toBe(0);
  expect(localDerivative(new Float64Array(0), new Float64Array(0)).slopes.length).toBe(0);
  // Fewer points than the window: it takes what there is.
  expect(localDerivative(Float64Array.of(0, 1, 2), Float64Array.of(0, 1, 4)).slopes[1]).toBeCloseTo(2, 12);
  // Volumes a rounding apart determine nothing by themselves; every number that is given is finite.
  const near = localDerivative(Float64Array.of(0, 1e-300, 2e-300, 1, 2), Float64Array.of(1, 2, 1, 3, 4), { points: 3 });
  for (const list of [near.values, near.slopes, near.curvatures, near.slopeGains]) {
    expect(list.every(Number.isFinite)).toBe(true);
  }
  expect(() => localDerivative(uneven, uneven, { points: 2 })).toThrow('does not determine');
});

it('widens its windows until a slope stands out of the noise, and not where it does already', () => {
  const noise = seededNoise(5);
  const volumes = Float64Array.from({ length: 401 }, (_, i) => i * 0.05);
  const curveOf = (v: number) => 4 + 0.1 * v + 5 / (1 + Math.exp(-(v - 15) / 0.1));
  const readings = volumes.map((v) => curveOf(v) + 0.005 * noise.normal());
  const derivative = localDerivative(volumes, readings, { points: 3, uReading: 0.005 });
  const widthAt = (i: number) => derivative.windowLast[i] - derivative.windowFirst[i] + 1;
  // Twenty points of 0.05 mL each: 0.1 per mL is told from noise; three times its uncertainty is a loose bound.
  expect(widthAt(100)).toBeGreaterThan(20);
  expect(Math.abs(derivative.slopes[100] - 0.1)).toBeLessThan(3 * 0.005 * derivative.slopeGains[100]);
  expect(widthAt(300)).toBe(3);
});
