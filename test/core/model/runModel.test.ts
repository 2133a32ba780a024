import { describe, expect, it } from 'vitest';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { modelOfSheet } from '../../modelOfSheet.ts';

const sheet: SheetFile = {
  sheet: 1,
  sample: {
    volume_mL: 25,
    background_M: 0.1,
    analytes: [{ pKa: [4, 8], concentration_M: 0.01, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }],
  },
  titrant: { kind: 'base', concentration_M: 0.1, carbonate_M: 0.001 },
  burette: { gain: 1.01 },
  medium: { activity: 'davies', pKw: 13.997 },
  reading: { kind: 'pH', scale: 'activity', offset: 0.02, slope: 0.99 },
};
const volumes = Float64Array.from({ length: 41 }, (_, i) => 0.15 * i);

describe('the slope where the curve passes the readings', () => {
  it('is that at the volumes where the readings lie on the curve', () => {
    for (const reading of [sheet.reading, { kind: 'mV', scale: 'concentration', E0_mV: 400, slope: 0.99 } as const]) {
      const { model, values } = modelOfSheet({ ...sheet, reading }, volumes);
      const readings = new Float64Array(volumes.length);
      model.predict(values, readings);
      const atVolumes = new Float64Array(volumes.length);
      model.differentiate(new Int32Array(0), new Float64Array(0), atVolumes);
      const atReadings = new Float64Array(volumes.length);
      model.slopesAtReadings(readings, atReadings);
      // At fixed ionic strength: what is left out is the change of the activity term along the curve.
      atReadings.forEach((slope, i) => {
        expect(Math.abs(slope / atVolumes[i] - 1), `at ${volumes[i]} mL`).toBeLessThan(0.03);
      });
    }
  });

  it('belongs to the height of a reading that lies off the curve', () => {
    const none: SheetFile = {
      ...sheet,
      medium: { activity: 'none', pKw: 14 },
      reading: { kind: 'pH', scale: 'concentration' },
    };
    const { model, values } = modelOfSheet(none, volumes);
    const readings = new Float64Array(volumes.length);
    model.predict(values, readings);
    // The reading of a point 0.02 mL further on: a setting error moves a point along the curve.
    const shifted = volumes.map((volume) => volume + 0.02);
    const further = modelOfSheet(none, shifted);
    const furtherReadings = new Float64Array(volumes.length);
    further.model.predict(values, furtherReadings);
    const expected = new Float64Array(volumes.length);
    further.model.differentiate(new Int32Array(0), new Float64Array(0), expected);
    const slopes = new Float64Array(volumes.length);
    model.slopesAtReadings(furtherReadings, slopes);
    // Dilution over 0.02 mL of 25 mL, and forms that differ in it: a percent. At the volume it would be tens of percent off.
    const worst = slopes.reduce((most, slope, i) => Math.max(most, Math.abs(slope / expected[i] - 1)), 0);
    expect(worst).toBeLessThan(0.02);
    const atVolumes = new Float64Array(volumes.length);
    model.differentiate(new Int32Array(0), new Float64Array(0), atVolumes);
    const worstAtVolumes = atVolumes.reduce((most, slope, i) => Math.max(most, Math.abs(slope / expected[i] - 1)), 0);
    expect(worstAtVolumes).toBeGreaterThan(0.1);
  });

  it('is finite for readings that mean no pH at all', () => {
    const { model, values } = modelOfSheet(sheet, volumes);
    model.predict(values, new Float64Array(volumes.length));
    const slopes = new Float64Array(volumes.length);
    model.slopesAtReadings(
      volumes.map((_, i) => (i % 2 === 0 ? -500 : 500)),
      slopes,
    );
    expect(slopes.every(Number.isFinite)).toBe(true);
  });
});

describe('a model', () => {
  it('refuses values without a mixture and recovers at the next ones', () => {
    const { model, values, design } = modelOfSheet(sheet, volumes);
    const before = new Float64Array(volumes.length);
    expect(model.predict(values, before)).toBe(true);
    const impossible = values.slice();
    impossible[design.quantities.findIndex(({ id }) => id === 'sample.volume')] = 0;
    expect(model.predict(impossible, new Float64Array(volumes.length))).toBe(false);
    const after = new Float64Array(volumes.length);
    expect(model.predict(values, after)).toBe(true);
    // The memory of the last solution changes a reading by rounding alone.
    for (let i = 0; i < after.length; i++) expect(Math.abs(after[i] - before[i])).toBeLessThan(1e-11);
  });
});
