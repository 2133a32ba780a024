import { describe, expect, it } from 'vitest';
import { carbonicConstants } from '../../../core/chemistry/carbonicAcid.ts';
import { daviesFunction } from '../../../core/chemistry/davies.ts';
import { debyeHueckelA } from '../../../core/chemistry/debyeHueckel.ts';
import { waterIonProduct } from '../../../core/chemistry/waterIonProduct.ts';
import { completeSheet } from '../../../core/sheet/completeSheet.ts';
import type { RunFacts } from '../../../core/sheet/runFacts.ts';
import type { Sheet } from '../../../core/sheet/sheet.ts';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { celsius } from '../../../core/units/temperature.ts';

const facts: RunFacts = { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 2 };

function complete(keys: Omit<SheetFile, 'sheet'>, given: Partial<RunFacts> = {}): Sheet {
  const outcome = completeSheet({ sheet: 1, ...keys }, { ...facts, ...given });
  if (!outcome.ok) throw new Error(outcome.refusals[0].message);
  return outcome.value;
}

/** Every part of a sheet that says whether it is assumed, by its path. */
function assumedParts(value: unknown, path = ''): string[] {
  if (typeof value !== 'object' || value === null) return [];
  if ('assumed' in value) return value.assumed === true ? [path] : [];
  return Object.entries(value).flatMap(([key, inner]) => assumedParts(inner, path === '' ? key : `${path}.${key}`));
}

describe('completeSheet', () => {
  it('fills an empty sheet in, and marks all of it as assumed', () => {
    const sheet = complete({});
    expect(assumedParts(sheet).sort()).toEqual([
      'burette.doseUncertainty',
      'burette.gain',
      'burette.settingUncertainty',
      'medium.activity',
      'medium.pKw',
      'medium.temperature',
      'reading.offset',
      'reading.scale',
      'reading.slope',
      'reading.standardPotential',
      'sample.analytes.0.chargeFullyProtonated',
      'sample.analytes.0.groups',
      'sample.analytes.0.name',
      'sample.analytes.0.protonsLostAsWeighed',
      'sample.background',
      'sample.carbonate',
      'sample.extraWater',
      'sample.strongIon',
      'sample.volume',
      'titrant.background',
      'titrant.carbonate',
      'titrant.concentration',
      'titrant.kind',
      'titrant.strengthMeans',
    ]);
    expect(sheet.sample.volume).toEqual({ state: 'fixed', value: 25, assumed: true });
    // A guess that the run may correct: a strength that nobody has declared may be anything up to twice the usual one.
    expect(sheet.titrant.concentration).toMatchObject({ state: 'known', value: 0.1, u: 0.05, assumed: true });
    // A meter is no better than its buffers.
    expect(sheet.reading.offset).toEqual({
      state: 'known',
      value: 0,
      u: 0.02,
      source: 'calibration',
      assumed: true,
    });
    expect(sheet.reading.uncertainty).toBeNull();
    expect(sheet.sample.analytes[0]).toMatchObject({
      groups: { value: 2 },
      chargeFullyProtonated: { value: 0 },
      protonsLostAsWeighed: { value: 0 },
      concentration: { state: 'fitted', start: null },
      pKa: [
        { state: 'fitted', start: null },
        { state: 'fitted', start: null },
      ],
    });
  });

  it('marks nothing that was declared, be it declared as what would have been assumed', () => {
    const sheet = complete({
      sample: {
        volume_mL: 25,
        extraWater_mL: 0,
        strongIon_M: 0,
        carbonate_M: 0,
        background_M: 0,
        analytes: [{ name: 'A', groups: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }],
      },
      titrant: { kind: 'base', concentration_M: 0.1, strengthMeans: 'hydroxide', carbonate_M: 0, background_M: 0 },
      burette: { gain: 1, uSetting_mL: 0.003, uDose_mL: 0 },
      medium: { temperature_C: 25, activity: 'davies', pKw: 13.997 },
      reading: { scale: 'activity', offset: { value: 0, u: 0.02, source: 'calibration' }, slope: 1, u: 0.004 },
    });
    // A run in pH has no standard potential.
    expect(assumedParts(sheet)).toEqual(['reading.standardPotential']);
    expect(sheet.reading.uncertainty).toBe(0.004);
  });

  it('reads known quantities: u, U with k, and tolerances', () => {
    const { sample, titrant, burette } = complete({
      sample: { volume_mL: { value: 25, tolerance: 0.03, distribution: 'triangular', source: 'pipette' } },
      titrant: { concentration_M: { value: 0.1, U: 0.0004, k: 2 } },
      burette: { gain: { value: 1, u: 0.0005 } },
    });
    expect(titrant.concentration).toEqual({ state: 'known', value: 0.1, u: 0.0002, source: null, assumed: false });
    expect(burette.gain).toEqual({ state: 'known', value: 1, u: 0.0005, source: null, assumed: false });
    // a/√6, JCGM 100:2008, 4.3.9.
    expect(sample.volume).toEqual({
      state: 'known',
      value: 25,
      u: 0.03 / Math.sqrt(6),
      source: 'pipette',
      assumed: false,
    });
  });

  it('takes an analyte as the free base where acid is added', () => {
    expect(complete({}, { titrantKind: 'acid' }).sample.analytes[0]).toMatchObject({
      chargeFullyProtonated: { value: 2, assumed: true },
      protonsLostAsWeighed: { value: 2, assumed: true },
    });
  });

  it('fits the strong ion of a sample in which nothing else is left to find', () => {
    const fitted = { state: 'fitted', start: null, assumed: false };
    expect(complete({}, { groupsIfOpen: 0 }).sample).toMatchObject({ analytes: [], strongIon: fitted });
    expect(complete({ sample: { analytes: [] } }).sample).toMatchObject({ analytes: [], strongIon: fitted });
    // Not where it is declared, nor where the ions are.
    expect(complete({ sample: { analytes: [], strongIon_M: 0.1 } }).sample.strongIon).toMatchObject({ value: 0.1 });
    expect(complete({ sample: { cations_M: 'fitted' } }).sample.strongIon).toMatchObject({ state: 'fixed', value: 0 });
  });

  it('gives a vessel written in full no counter-ions of its own', () => {
    const { sample, titrant } = complete({
      sample: { systems: [{ pKa: [4.7] }], cations_M: 0.01 },
      titrant: { kind: 'solution', systems: [{ pKa: [9.2], concentration_M: 0.1 }], anions_M: 0.05 },
    });
    expect(sample.analytes.map((analyte) => analyte.protonsLostAsWeighed)).toEqual([null]);
    expect(sample.cations).toMatchObject({ value: 0.01, assumed: false });
    expect(sample.anions).toMatchObject({ value: 0, assumed: true });
    expect(titrant.concentration).toBeNull();
    expect(titrant.systems[0]).toMatchObject({ protonsLostAsWeighed: null, concentration: { value: 0.1 } });
    expect(titrant.anions).toMatchObject({ value: 0.05, assumed: false });
  });

  it('takes the defaults of water at the temperature of the run', () => {
    const t = celsius(37);
    const { medium } = complete({ medium: { temperature_C: 37 } });
    expect(medium.pKw).toEqual({ state: 'fixed', value: waterIonProduct(t), assumed: true });
    expect(medium.carbonicPKa).toMatchObject(carbonicConstants(t).map((value) => ({ state: 'fixed', value })));
  });

  it('without an activity model, converts these defaults to the medium that the background makes', () => {
    const af = debyeHueckelA(celsius(25)) * daviesFunction(0.1);
    const [first, second] = carbonicConstants(celsius(25));
    const pKw = waterIonProduct(celsius(25));
    const defaults = (scale: 'activity' | 'concentration', background_M: number) => {
      const { pKw: found, carbonicPKa } = complete({
        sample: { background_M },
        medium: { activity: 'none' },
        reading: { scale },
      }).medium;
      return [found, ...carbonicPKa].map((declaration) =>
        declaration.state === 'fixed' ? declaration.value : Number.NaN,
      );
    };
    // Two ions of charge one from water and from CO₂; H⁺ and CO₃²⁻ from HCO₃⁻.
    const expected = {
      concentration: [pKw - 2 * af, first - 2 * af, second - 4 * af],
      activity: [pKw - af, first - af, second - 3 * af],
    };
    for (const scale of ['concentration', 'activity'] as const)
      defaults(scale, 0.1).forEach((value, i) => {
        expect(value).toBeCloseTo(expected[scale][i], 12);
      });
    expect(defaults('concentration', 0)).toEqual([pKw, first, second]);
    // 13.78 at 0.1 M (Martell and Smith, from memory), two decimals.
    expect(Math.abs(defaults('concentration', 0.1)[0] - 13.78)).toBeLessThan(0.006);
  });

  it('assumes an electrode that reads about zero at pH 7, for readings in mV', () => {
    const { reading } = complete({}, { readingKind: 'mV' });
    expect(reading.kind).toBe('mV');
    // 7 and 0.5 in pH at 59.16 mV per pH.
    expect(reading.standardPotential).toMatchObject({ state: 'known', source: 'calibration', assumed: true });
    if (reading.standardPotential.state !== 'known') throw new Error('not known');
    expect(Math.abs(reading.standardPotential.value - 414.1)).toBeLessThan(0.05);
    expect(Math.abs(reading.standardPotential.u - 29.58)).toBeLessThan(0.005);
  });

  it('hands on what contradicts itself', () => {
    const outcome = completeSheet({ sheet: 1, reading: { kind: 'mV', offset: 0 } }, facts);
    expect(outcome.ok ? [] : outcome.refusals.map(({ code }) => code)).toEqual(['sheet-inconsistent']);
  });
});
