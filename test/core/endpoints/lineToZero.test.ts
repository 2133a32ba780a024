import { expect, it } from 'vitest';
import { lineToZero } from '../../../core/endpoints/lineToZero.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';

const x = [1, 2, 4, 5, 7];

it('is exact on a line', () => {
  const line = lineToZero(
    x,
    x.map((v) => -3 * (v - 10)),
  );
  // Rounding alone.
  expect(line?.zero).toBeCloseTo(10, 12);
  expect(line?.slope).toBeCloseTo(-3, 12);
  expect(line?.rSquared).toBeCloseTo(1, 12);
  expect(line?.u).toBeLessThan(1e-12);
});

it('states the uncertainty that repeated noise shows', () => {
  const noise = seededNoise(11);
  let squares = 0;
  let stated = 0;
  const repeats = 500;
  for (let k = 0; k < repeats; k++) {
    const line = lineToZero(
      x,
      x.map((v) => -3 * (v - 10) * (1 + 0.01 * noise.normal())),
    );
    if (line === null) throw new Error('no line');
    squares += (line.zero - 10) ** 2 / repeats;
    stated += line.u ** 2 / repeats;
  }
  // Both variances come from 500 draws: 6 % each on the variance, three of them, and second-order terms.
  expect(Math.abs(Math.sqrt(stated / squares) - 1)).toBeLessThan(0.15);
});

it('gives nothing for two points, one place or a level line', () => {
  expect(lineToZero([1, 2], [1, 2])).toBeNull();
  expect(lineToZero([1, 1, 1], [1, 2, 3])).toBeNull();
  expect(lineToZero([1, 2, 3], [5, 5, 5])).toBeNull();
});
