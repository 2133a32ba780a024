import { describe, expect, it } from 'vitest';
import { readingAt } from '../../../core/endpoints/readingAt.ts';
import { shapeOfRun } from '../../../core/endpoints/shapeOfRun.ts';
import { curve, evenVolumes, PHOSPHORIC_PKA } from './simulatedCurves.ts';

describe('the shape of a run', () => {
  it('of phosphoric acid with base', () => {
    const run = curve({ pKa: PHOSPHORIC_PKA, concentration_M: 0.05, volumes_mL: evenVolumes(161, 40) });
    const shape = shapeOfRun(run.volumes_mL, run.readings);
    expect(shape.direction).toBe('rising');
    expect(shape.points).toBe(161);
    expect(shape.volumeRange_mL).toEqual([0, 40]);
    expect(shape.initialReading).toBe(run.readings[0]);
    expect(shape.finalReading).toBe(run.readings[160]);
    expect(shape.readingRange).toEqual([run.readings[0], run.readings[160]]);
    expect(shape.steps.length).toBe(2);
    // Half-way to the second step the reading is pKa 2, at any dilution; the steps are off by up to 0.02 mL.
    expect(shape.halfwayReadings.length).toBe(2);
    expect(Math.abs((shape.halfwayReadings[1] ?? 0) - 7.198)).toBeLessThan(0.01);
    expect(shape.plateaus.length).toBe(3);
    expect(shape.plateaus[1].from_mL).toBe(shape.steps[0].volume_mL);
    expect(shape.plateaus[1].to_mL).toBe(shape.steps[1].volume_mL);
    expect(Math.abs(shape.plateaus[1].reading - 7.198)).toBeLessThan(0.01);
    // log 9 over half of 12.5 mL: between a quarter and three quarters of the step.
    expect(Math.abs(shape.plateaus[1].slope - Math.log10(9) / 6.25)).toBeLessThan(0.005);
    expect(shape.volumesRunBackwards).toBe(false);
  });

  it('of a falling run', () => {
    const run = curve({ pKa: [9.244], concentration_M: 0.05, volumes_mL: evenVolumes(81, 20), titrant: 'acid' });
    const shape = shapeOfRun(run.volumes_mL, run.readings);
    expect(shape.direction).toBe('falling');
    expect(shape.steps.length).toBe(1);
    expect(Math.abs((shape.halfwayReadings[0] ?? 0) - 9.244)).toBeLessThan(0.01);
    expect(shape.plateaus.every((plateau) => plateau.slope < 0)).toBe(true);
  });

  it('has no half-way reading where the run begins behind it', () => {
    const volumes_mL = evenVolumes(61, 20).filter((v) => v > 8);
    const run = curve({ pKa: [4.756], concentration_M: 0.05, volumes_mL });
    const shape = shapeOfRun(run.volumes_mL, run.readings);
    expect(shape.steps.length).toBe(1);
    expect(shape.halfwayReadings).toEqual([null]);
  });

  it('of a level line, of three points, of one and of none', () => {
    const volumes = Float64Array.of(0, 1, 2, 3, 4, 5);
    const level = shapeOfRun(volumes, new Float64Array(6).fill(7));
    expect(level.direction).toBe('flat');
    expect(level.steps).toEqual([]);
    expect(level.plateaus).toEqual([{ from_mL: 0, to_mL: 5, middle_mL: 2.5, reading: 7, slope: 0 }]);
    const three = shapeOfRun(volumes.slice(0, 3), Float64Array.of(3, 7, 11));
    expect(three).toMatchObject({ direction: 'rising', points: 3, noise: null, steps: [], halfwayReadings: [] });
    const one = shapeOfRun(Float64Array.of(1), Float64Array.of(7));
    expect(one).toMatchObject({ direction: 'flat', points: 1, initialReading: 7, finalReading: 7, plateaus: [] });
    const none = shapeOfRun(new Float64Array(0), new Float64Array(0));
    expect(none).toMatchObject({ points: 0, volumeRange_mL: null, readingRange: null, initialReading: null });
  });

  it('tells volumes that run backwards from single steps back', () => {
    const readings = Float64Array.of(1, 2, 3, 4, 5);
    expect(shapeOfRun(Float64Array.of(5, 4, 3, 2, 1), readings).volumesRunBackwards).toBe(true);
    expect(shapeOfRun(Float64Array.of(1, 2, 1.5, 3, 4), readings).volumesRunBackwards).toBe(false);
  });
});

describe('reading at a volume', () => {
  const volumes = Float64Array.of(0, 1, 3);
  const readings = Float64Array.of(2, 4, 5);

  it('lies on the straight line between neighbours', () => {
    expect([0, 0.5, 1, 2, 3].map((v) => readingAt(volumes, readings, v))).toEqual([2, 3, 4, 4.5, 5]);
  });

  it('is not asked for outside the run', () => {
    expect(() => readingAt(volumes, readings, 3.1)).toThrow('outside the run');
  });
});
