import { describe, expect, it } from 'vitest';
import type { Analysis } from '../../../../core/results/analysis.ts';
import { stillDrifting } from '../../../../core/results/checks/stillDrifting.ts';
import type { RunRow } from '../../../../core/run/run.ts';

/** Two readings at every volume, half a minute apart, with a drift in pH per minute. */
function analysisOf(drift: number, withTime = true): Analysis {
  const rows = Array.from({ length: 20 }, (_, i): RunRow => {
    const dose = i >> 1;
    const second = i % 2;
    return {
      line: i + 2,
      volume_mL: 0.5 * dose,
      reading: 3 + 0.2 * dose + 0.5 * drift * second,
      decision: { use: 'used' },
      ...(withTime ? { time_s: 60 * dose + 30 * second } : {}),
    };
  });
  // The check reads the rows and the kind of the reading alone.
  return {
    run: { rows },
    weighted: { run: { design: { readingKind: 'pH', nernstSlope_mV: 59.16 } } },
  } as unknown as Analysis;
}

describe('stillDrifting', () => {
  it('names how fast the readings moved, and where', () => {
    const [doubt, ...others] = stillDrifting(analysisOf(0.1));
    expect(others).toEqual([]);
    expect(doubt.code).toBe('readings-drifting');
    expect(doubt.seen).toContain('0.10 pH per minute');
  });

  it('is silent where the readings had settled, and where no time is known', () => {
    expect(stillDrifting(analysisOf(0.01))).toEqual([]);
    expect(stillDrifting(analysisOf(0.1, false))).toEqual([]);
  });
});
