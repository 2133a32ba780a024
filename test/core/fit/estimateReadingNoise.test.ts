import { describe, expect, it } from 'vitest';
import { estimateReadingNoise } from '../../../core/fit/estimateReadingNoise.ts';
import { Whitening } from '../../../core/fit/whitening.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';

const count = 4000;
const slopes = Float64Array.from({ length: count }, (_, i) => (i % 10 === 0 ? 20 : 0.5));

const volumes = Float64Array.from({ length: count }, (_, i) => i);

/** Misses of a reading noise and a setting error. */
function missesOf(reading: number, setting_mL: number, seed: number): Float64Array {
  const noise = seededNoise(seed);
  return slopes.map((slope) => Math.hypot(reading, setting_mL * slope) * noise.normal());
}

/** Relative standard deviation of an estimated standard deviation is 1/√(2n); four of them. */
const statistical = 4 / Math.sqrt(2 * count);

describe('the reading noise', () => {
  it('is left as it is declared', () => {
    const declaration = { kind: 'declared', reading: 0.004, setting_mL: 0.003, dose_mL: 0 } as const;
    expect(estimateReadingNoise(declaration, missesOf(0.1, 0, 1), new Whitening(volumes), slopes, count, 1e-4)).toBe(
      0.004,
    );
  });

  it('is found beside a known setting error', () => {
    const declaration = { kind: 'reading-estimated', setting_mL: 0.003, dose_mL: 0 } as const;
    for (const truth of [0.001, 0.005, 0.05]) {
      const found = estimateReadingNoise(
        declaration,
        missesOf(truth, 0.003, 2),
        new Whitening(volumes),
        slopes,
        count,
        1e-6,
      );
      expect(Math.abs(found / truth - 1), `${truth}`).toBeLessThan(2 * statistical);
    }
  });

  it('makes the weighted sum of squares equal to the degrees of freedom', () => {
    const misses = missesOf(0.005, 0.003, 3);
    for (const declaration of [
      { kind: 'reading-estimated', setting_mL: 0.002, dose_mL: 0 },
      { kind: 'scale-estimated', settingToReading: 0.6 },
    ] as const) {
      const reading = estimateReadingNoise(declaration, misses, new Whitening(volumes), slopes, 3990, 1e-6);
      const setting = declaration.kind === 'reading-estimated' ? 0.002 : 0.6 * reading;
      const sum = misses.reduce((total, miss, i) => total + miss ** 2 / (reading ** 2 + (setting * slopes[i]) ** 2), 0);
      // Bisection ends far below one part in 10⁶.
      expect(sum / 3990).toBeCloseTo(1, 6);
    }
  });

  it('keeps the assumed ratio where both sizes are estimated', () => {
    const declaration = { kind: 'scale-estimated', settingToReading: 0.6 } as const;
    const found = estimateReadingNoise(
      declaration,
      missesOf(0.01, 0.006, 4),
      new Whitening(volumes),
      slopes,
      count,
      1e-6,
    );
    expect(Math.abs(found / 0.01 - 1)).toBeLessThan(statistical);
  });

  it('is never below the last digit of the instrument', () => {
    const nothing = new Float64Array(count);
    for (const declaration of [
      { kind: 'reading-estimated', setting_mL: 0.003, dose_mL: 0 },
      { kind: 'scale-estimated', settingToReading: 0.6 },
    ] as const)
      expect(estimateReadingNoise(declaration, nothing, new Whitening(volumes), slopes, count, 0.0029)).toBe(0.0029);
  });

  it('is that smallest one where the setting error explains more than there is', () => {
    const declaration = { kind: 'reading-estimated', setting_mL: 1, dose_mL: 0 } as const;
    expect(
      estimateReadingNoise(declaration, missesOf(0.001, 0.003, 5), new Whitening(volumes), slopes, count, 1e-4),
    ).toBe(1e-4);
  });
});
