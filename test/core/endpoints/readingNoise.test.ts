import { describe, expect, it } from 'vitest';
import { readingNoise } from '../../../core/endpoints/readingNoise.ts';
import { curve, evenVolumes, PHOSPHORIC_PKA } from './simulatedCurves.ts';

describe('noise without a model', () => {
  it('finds the noise of a simulated curve in spite of its steps', () => {
    let squares = 0;
    for (let seed = 1; seed <= 20; seed++) {
      const run = curve({
        pKa: PHOSPHORIC_PKA,
        concentration_M: 0.02,
        volumes_mL: evenVolumes(120, 15),
        errors: { seed, uReading: 0.005 },
      });
      squares += (readingNoise(run.volumes_mL, run.readings) ?? 0) ** 2 / 20;
    }
    // A quartile of some 100 correlated distances is good to 20 %, over 20 runs to 5 %; curvature adds some.
    expect(Math.sqrt(squares)).toBeGreaterThan(0.0045);
    expect(Math.sqrt(squares)).toBeLessThan(0.0065);
  });

  it('is never below the rounding of the display', () => {
    const volumes = Float64Array.from({ length: 20 }, (_, i) => i);
    const readings = volumes.map((v) => Math.floor(v / 10) * 0.01);
    expect(readingNoise(volumes, readings)).toBeCloseTo(0.01 / Math.sqrt(12), 12);
  });

  it('is zero for a level line and null for too few points', () => {
    const volumes = Float64Array.of(0, 1, 2, 3, 4, 5);
    expect(readingNoise(volumes, new Float64Array(6).fill(7))).toBe(0);
    expect(readingNoise(volumes.slice(0, 4), volumes.slice(0, 4))).toBeNull();
  });
});
