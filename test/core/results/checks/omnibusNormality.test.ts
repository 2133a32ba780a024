import { describe, expect, it } from 'vitest';
import { omnibusNormality } from '../../../../core/results/checks/omnibusNormality.ts';
import { seededNoise } from '../../../simulator/seededNoise.ts';

/** 30 numbers that can be written down in a line. */
const plain = Array.from({ length: 30 }, (_, i) => (((i * 37) % 23) - 11) / 7 + 0.3 * ((i * i) % 5));

describe('omnibusNormality', () => {
  it('gives the scores of scipy.stats.skewtest and kurtosistest', () => {
    // SciPy 1.10 on the same numbers; with the fourth of them moved to 9.
    const first = omnibusNormality(plain);
    expect(first.skewness).toBeCloseTo(-0.004697609086631561, 10);
    expect(first.kurtosis).toBeCloseTo(-0.17033439462605787, 10);
    const second = omnibusNormality(plain.with(3, 9));
    expect(second.skewness).toBeCloseTo(4.663993801837612, 10);
    expect(second.kurtosis).toBeCloseTo(4.22293355851568, 10);
  });

  it('is about standard normal for normal numbers', () => {
    const scores = Array.from({ length: 400 }, (_, seed) => {
      const noise = seededNoise(seed);
      return omnibusNormality(Array.from({ length: 60 }, () => noise.normal()));
    });
    for (const key of ['skewness', 'kurtosis'] as const) {
      const squares = scores.reduce((sum, score) => sum + score[key] ** 2, 0) / scores.length;
      // 400 squares of mean 1 scatter by 0.07.
      expect(Math.abs(squares - 1)).toBeLessThan(0.25);
    }
  });
});
