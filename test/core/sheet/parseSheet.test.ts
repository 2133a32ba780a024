import { describe, expect, it } from 'vitest';
import type { Refusal, RefusalCode } from '../../../core/notice/refusal.ts';
import { parseSheet } from '../../../core/sheet/parseSheet.ts';

const refusalsOf = (text: string): readonly Refusal[] => {
  const outcome = parseSheet(text, 'run.sheet.json');
  return outcome.ok ? [] : outcome.refusals;
};
const sheetText = (keys: object) => JSON.stringify({ sheet: 1, ...keys });
const sampleVolume = (volume: unknown) => ({ sample: { volume_mL: volume } });
const analyte = (keys: object) => ({ sample: { analytes: [keys] } });

const quantityForms = 'a number, "fitted", or a value with its uncertainty such as {"value": 1.23, "u": 0.01}';

describe('parseSheet', () => {
  it('reads a sheet that uses every form of a quantity', () => {
    const keys = {
      sheet: 1,
      sample: {
        volume_mL: { value: 25, tolerance: 0.03, distribution: 'triangular', source: 'pipette' },
        strongIon_M: -0.01,
        analytes: [
          {
            name: 'citric acid',
            groups: 3,
            chargeFullyProtonated: 0,
            protonsLostAsWeighed: 0,
            concentration_M: 'fitted',
            pKa: ['fitted', { fitted: true, start: 4.8 }, 6.4],
          },
        ],
      },
      titrant: { kind: 'base', concentration_M: { value: 0.1, U: 0.0004, k: 2 }, strengthMeans: 'totalBase' },
      burette: { gain: { value: 1, u: 0.0005 }, uSetting_mL: 0.003, uDose_mL: 0 },
      medium: { temperature_C: 25, activity: 'none', pKw: 13.78, carbonicPKa: [6.1, { value: 9.9, u: 0.02 }] },
      reading: { kind: 'mV', scale: 'concentration', E0_mV: { fitted: true }, slope: 0.99, u: 0.3 },
    };
    expect(parseSheet(JSON.stringify(keys), 'run.sheet.json')).toEqual({ ok: true, value: keys });
  });

  it('reads the smallest sheet, and one behind the byte order mark of an editor', () => {
    expect(parseSheet('{"sheet": 1}', 'a')).toEqual({ ok: true, value: { sheet: 1 } });
    expect(parseSheet('\uFEFF{"sheet": 1}', 'a')).toEqual({ ok: true, value: { sheet: 1 } });
  });

  it.each<[string, object, RefusalCode, string, string, string]>([
    [
      'a key of the sheet',
      { sampel: {} },
      'sheet-unknown-key',
      'sampel',
      'The key "sampel" is not known.',
      'Known here are "sheet", "sample", "titrant", "burette", "medium", "reading". Correct the spelling or take the key out; one that is not understood is never passed over.',
    ],
    [
      'a key without its unit',
      { reading: { E0: 400 } },
      'sheet-unknown-key',
      'reading.E0',
      'The key "reading.E0" is not known.',
      'Known here are "kind", "scale", "offset", "slope", "E0_mV", "junctionHydrogen", "junctionHydroxide", "u". Correct the spelling or take the key out; one that is not understood is never passed over.',
    ],
    [
      'two uncertainties at once',
      sampleVolume({ value: 25, u: 0.1, U: 0.2, k: 2 }),
      'sheet-unknown-key',
      'sample.volume_mL.u',
      'The key "sample.volume_mL.u" is not known.',
      'Known here are "value", "U", "k", "source". Correct the spelling or take the key out; one that is not understood is never passed over.',
    ],
    [
      'a negative volume',
      sampleVolume(-25),
      'sheet-out-of-range',
      'sample.volume_mL',
      '"sample.volume_mL" is -25, where a number above 0 and up to 100000 belongs.',
      'Correct the number; its unit is mL.',
    ],
    [
      'a volume of nothing',
      sampleVolume(0),
      'sheet-out-of-range',
      'sample.volume_mL',
      '"sample.volume_mL" is 0, where a number above 0 and up to 100000 belongs.',
      'Correct the number; its unit is mL.',
    ],
    [
      'a negative value with an uncertainty',
      sampleVolume({ value: -25, u: 0.1 }),
      'sheet-out-of-range',
      'sample.volume_mL.value',
      '"sample.volume_mL.value" is -25, where a number above 0 and up to 100000 belongs.',
      'Correct the number; its unit is mL.',
    ],
    [
      'a start outside the range',
      sampleVolume({ fitted: true, start: -3 }),
      'sheet-out-of-range',
      'sample.volume_mL.start',
      '"sample.volume_mL.start" is -3, where a number above 0 and up to 100000 belongs.',
      'Correct the number; its unit is mL.',
    ],
    [
      'a strength in mmol/L',
      { titrant: { concentration_M: 100 } },
      'sheet-out-of-range',
      'titrant.concentration_M',
      '"titrant.concentration_M" is 100, where a number above 0 and up to 20 belongs.',
      'Correct the number; its unit is mol/L.',
    ],
    [
      'a slope in mV',
      { reading: { slope: 59 } },
      'sheet-out-of-range',
      'reading.slope',
      '"reading.slope" is 59, where a number from 0.1 to 2 belongs.',
      'Correct the number.',
    ],
    [
      'a number beyond all doubles',
      { medium: { pKw: 'INFINITY' } },
      'sheet-out-of-range',
      'medium.pKw',
      '"medium.pKw" is Infinity, where a number from 5 to 40 belongs.',
      'Correct the number.',
    ],
    [
      'no uncertainty at all',
      sampleVolume({ value: 25, u: 0 }),
      'sheet-out-of-range',
      'sample.volume_mL.u',
      '"sample.volume_mL.u" is 0, where a number above 0 belongs.',
      'Correct the number; its unit is mL.',
    ],
    [
      'a coverage factor of 0',
      sampleVolume({ value: 25, U: 0.1, k: 0 }),
      'sheet-out-of-range',
      'sample.volume_mL.k',
      '"sample.volume_mL.k" is 0, where a number above 0 belongs.',
      'Correct the number.',
    ],
    [
      'a tolerance of 0',
      sampleVolume({ value: 25, tolerance: 0, distribution: 'normal' }),
      'sheet-out-of-range',
      'sample.volume_mL.tolerance',
      '"sample.volume_mL.tolerance" is 0, where a number above 0 belongs.',
      'Correct the number; its unit is mL.',
    ],
    [
      'an unknown distribution',
      sampleVolume({ value: 25, tolerance: 0.1, distribution: 'uniform' }),
      'sheet-wrong-type',
      'sample.volume_mL.distribution',
      '"sample.volume_mL.distribution" is "uniform", where "rectangular", "triangular" or "normal" belongs.',
      'Write "rectangular", "triangular" or "normal" there.',
    ],
    [
      'a value in braces without uncertainty',
      sampleVolume({ value: 25 }),
      'sheet-wrong-type',
      'sample.volume_mL.u',
      '"sample.volume_mL.u" is missing.',
      'A value in braces needs its uncertainty: "u", "U" with "k", or "tolerance" with "distribution"; a fixed value is the number alone.',
    ],
    [
      'U without k',
      sampleVolume({ value: 25, U: 0.1 }),
      'sheet-wrong-type',
      'sample.volume_mL.k',
      '"sample.volume_mL.k" is missing.',
      'Add it; known here are "value", "U", "k", "source".',
    ],
    [
      'a tolerance without distribution',
      sampleVolume({ value: 25, tolerance: 0.1 }),
      'sheet-wrong-type',
      'sample.volume_mL.distribution',
      '"sample.volume_mL.distribution" is missing.',
      'Add it; known here are "value", "tolerance", "distribution", "source".',
    ],
    [
      'a source of no name',
      sampleVolume({ value: 25, u: 0.1, source: ' ' }),
      'sheet-wrong-type',
      'sample.volume_mL.source',
      '"sample.volume_mL.source" is " ", where a text that is not empty belongs.',
      'Write a text that is not empty there.',
    ],
    [
      'a number in quotes',
      sampleVolume('25,50'),
      'sheet-wrong-type',
      'sample.volume_mL',
      `"sample.volume_mL" is "25,50", where ${quantityForms} belongs.`,
      'Write the number alone, without quotes: 25.50.',
    ],
    [
      'a number with its unit',
      { medium: { temperature_C: '25 °C' } },
      'sheet-wrong-type',
      'medium.temperature_C',
      '"medium.temperature_C" is "25 °C", where a number from -50 to 200 belongs.',
      'Write the number alone, without quotes: 25.',
    ],
    [
      'a volume with its unit',
      sampleVolume('25 mL'),
      'sheet-wrong-type',
      'sample.volume_mL',
      `"sample.volume_mL" is "25 mL", where ${quantityForms} belongs.`,
      'Write the number alone, without quotes: 25.',
    ],
    [
      'a word that is not "fitted"',
      sampleVolume('fit'),
      'sheet-wrong-type',
      'sample.volume_mL',
      `"sample.volume_mL" is "fit", where ${quantityForms} belongs.`,
      `Write ${quantityForms} there.`,
    ],
    [
      'nothing at all',
      sampleVolume(null),
      'sheet-wrong-type',
      'sample.volume_mL',
      `"sample.volume_mL" is null, where ${quantityForms} belongs.`,
      `Write ${quantityForms} there.`,
    ],
    [
      'a constant that is text',
      analyte({ pKa: [3, 'x'] }),
      'sheet-wrong-type',
      'sample.analytes.0.pKa.1',
      `"sample.analytes.0.pKa.1" is "x", where ${quantityForms} belongs.`,
      `Write ${quantityForms} there.`,
    ],
    [
      'one constant where a list belongs',
      analyte({ pKa: 4.7 }),
      'sheet-wrong-type',
      'sample.analytes.0.pKa',
      '"sample.analytes.0.pKa" is 4.7, where a list of up to 6 entries in square brackets belongs.',
      'Write a list of up to 6 entries in square brackets there.',
    ],
    [
      'seven groups',
      analyte({ groups: 7 }),
      'sheet-out-of-range',
      'sample.analytes.0.groups',
      '"sample.analytes.0.groups" is 7, where a whole number from 0 to 6 belongs.',
      'Correct the number.',
    ],
    [
      'half a group',
      analyte({ groups: 2.5 }),
      'sheet-out-of-range',
      'sample.analytes.0.groups',
      '"sample.analytes.0.groups" is 2.5, where a whole number from 0 to 6 belongs.',
      'Correct the number.',
    ],
    [
      'a counter-ion without charge',
      analyte({ counterIon: { ratio: 1, protonsLostAsWeighed: 0, pKa: [2] } }),
      'sheet-wrong-type',
      'sample.analytes.0.counterIon.chargeFullyProtonated',
      '"sample.analytes.0.counterIon.chargeFullyProtonated" is missing.',
      'Add it; known here are "name", "ratio", "chargeFullyProtonated", "protonsLostAsWeighed", "pKa".',
    ],
    [
      'an unknown kind of titrant',
      { titrant: { kind: 'salt' } },
      'sheet-wrong-type',
      'titrant.kind',
      '"titrant.kind" is "salt", where "base", "acid" or "solution" belongs.',
      'Write "base", "acid" or "solution" there.',
    ],
    [
      'a list where keys belong',
      { sample: [] },
      'sheet-wrong-type',
      'sample',
      '"sample" is [], where a group of keys in braces belongs.',
      'Write a group of keys in braces there.',
    ],
  ])('refuses %s', (_, keys, code, key, message, remedy) => {
    const text = sheetText(keys).replace('"INFINITY"', '1e999');
    expect(refusalsOf(text)).toEqual([{ code, message, remedy, place: { file: 'run.sheet.json', key } }]);
  });

  it('refuses what is no JSON, with the line where it breaks off', () => {
    const [broken] = refusalsOf('{\n  "sheet": 1,\n}');
    expect(broken.code).toBe('sheet-not-json');
    expect(broken.message).toMatch(/^run\.sheet\.json is not valid JSON, line 3: /);
    expect(broken.place).toEqual({ file: 'run.sheet.json', line: 3 });
    expect(refusalsOf(' \n')).toEqual([
      {
        code: 'sheet-not-json',
        message: 'run.sheet.json is empty.',
        remedy: 'Choose another sheet.',
        place: { file: 'run.sheet.json' },
      },
    ]);
    expect(refusalsOf('V;pH\n0,00;2,51')[0].code).toBe('sheet-not-json');
  });

  it('refuses other versions by their number, and what is no sheet', () => {
    const place = { file: 'run.sheet.json', key: 'sheet' };
    expect(refusalsOf('{"sheet": 2, "anything": {}}')).toEqual([
      {
        code: 'sheet-version',
        message: 'run.sheet.json is a sheet of version 2; this software reads up to version 1.',
        remedy: 'Open it with a newer version of this software.',
        place,
      },
    ]);
    for (const text of ['{}', '[]', 'null', '3', '"sheet"', '{"sheet": "1"}', '{"sheet": 0}', '{"sample": {}}'])
      expect(refusalsOf(text), text).toEqual([
        {
          code: 'sheet-version',
          message: 'run.sheet.json does not say that it is a sheet of version 1.',
          remedy: 'Choose a sheet, or let this one begin with "sheet": 1.',
          place,
        },
      ]);
  });

  it('names several slips at once, up to ten, and shortens what it repeats', () => {
    const slips = refusalsOf(sheetText({ sample: { volume_mL: -1, extraWater_mL: -1 }, burette: { gain: 0 } }));
    expect(slips.map(({ place }) => place.key)).toEqual(['sample.volume_mL', 'sample.extraWater_mL', 'burette.gain']);
    const analytes = Array.from({ length: 20 }, () => ({ groups: -1 }));
    expect(refusalsOf(sheetText({ sample: { analytes } }))).toHaveLength(10);
    const [long] = refusalsOf(sheetText(sampleVolume('x'.repeat(5000))));
    expect(long.message.length).toBeLessThan(250);
  });
});
