import { describe, expect, it } from 'vitest';
import { boundErrors } from './boundErrors.ts';
import { coverageOf } from './coverageStudy.ts';
import { studyDesigns } from './studyDesigns.ts';

/** Runs of each design; `npm run study` makes 2,000. */
const runs = 60;
const firstSeed = 5001;
/**
 * Three standard deviations of a count of 60 with 95 % hits below its mean:
 * fewer true statements than this are no chance.
 */
const fewestTrue = Math.floor(runs * 0.95 - 3 * Math.sqrt(runs * 0.95 * 0.05));

describe.each(studyDesigns)('95 % statements of the design "$name"', (design) => {
  const coverage = coverageOf(design, runs, firstSeed);

  it('are true as often as they say', () => {
    expect(coverage.failed).toBe(0);
    for (const { stated, holds } of coverage.quantities) {
      expect(stated).toBe(runs);
      expect(holds).toBeGreaterThanOrEqual(fewestTrue);
    }
  });

  it('have uncertainties near the Cramér–Rao limit', () => {
    // Where some runs give only a bound, those that give more are a choice, and their uncertainties with them.
    for (const { uOverLimit, twoSided } of coverage.quantities)
      if (uOverLimit !== null && twoSided === runs) {
        expect(uOverLimit).toBeLessThan(1.2);
        expect(uOverLimit).toBeGreaterThan(0.85);
      }
  });

  it('have bounds where a dense profile has them', () => {
    for (const { id, bounds } of coverage.quantities) {
      if (bounds.length < 3) continue;
      const errors = boundErrors(design, id, bounds.slice(0, 9));
      expect(errors[errors.length >> 1]).toBeLessThan(0.3);
    }
  });
});
