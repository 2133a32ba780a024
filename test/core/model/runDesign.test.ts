import { describe, expect, it } from 'vitest';
import type { RunDesign } from '../../../core/model/runDesign.ts';
import { Vessels } from '../../../core/model/vessels.ts';
import type { AnalyteFile, SheetFile } from '../../../core/sheet/sheetFile.ts';
import { modelOfSheet } from '../../modelOfSheet.ts';

type Keys = Omit<SheetFile, 'sheet'>;

const designOf = (keys: Keys): RunDesign => modelOfSheet({ sheet: 1, ...keys }, [0]).design;
const idsOf = (keys: Keys) => designOf(keys).quantities.map(({ id }) => id);

/** mol/L in either vessel: cations, anions, then the systems. */
function contentsOf(keys: Keys): { sample: number[]; titrant: number[] } {
  const { design, values } = modelOfSheet({ sheet: 1, ...keys }, [0]);
  const vessels = new Vessels(design);
  // What is to be fitted has no value yet: nothing, for concentrations.
  expect(vessels.take(values.map((value) => (Number.isNaN(value) ? 0 : value)))).toBe(true);
  // Sums of a few concentrations, to the last digits of a double.
  const tidy = (contents: Float64Array) => Array.from(contents, (value) => Number(value.toFixed(12)));
  return { sample: tidy(vessels.sample), titrant: tidy(vessels.titrant) };
}

describe('ids of quantities', () => {
  it('are numbered within each analyte, the first without prefix', () => {
    expect(
      idsOf({
        sample: { analytes: [{ groups: 2 }, { groups: 1 }, { groups: 1 }] },
        reading: { kind: 'pH' },
      }),
    ).toEqual([
      'pKa1',
      'pKa2',
      'concentration',
      'analyte2.pKa1',
      'analyte2.concentration',
      'analyte3.pKa1',
      'analyte3.concentration',
      'titrant.concentration',
      'titrant.carbonate',
      'titrant.strongIon',
      'titrant.background',
      'sample.carbonate',
      'sample.strongIon',
      'sample.background',
      'sample.volume',
      'sample.extraWater',
      'medium.pKw',
      'burette.gain',
      'reading.offset',
      'reading.slope',
    ]);
  });

  it('name E0 in place of the offset for readings in mV', () => {
    const ids = idsOf({ reading: { kind: 'mV', E0_mV: 410 } });
    expect(ids).toContain('reading.E0');
    expect(ids).not.toContain('reading.offset');
  });

  it('name what only some runs have: carbonic constants, counter-ions, junction terms, systems of the titrant', () => {
    const rare = (keys: Keys) =>
      idsOf(keys).filter((id) => /^carbonate|counterIon|junction|system|ations|nions/.test(id));
    expect(rare({})).toEqual([]);
    expect(rare({ titrant: { carbonate_M: 0.001 } })).toEqual(['carbonate.pKa1', 'carbonate.pKa2']);
    expect(rare({ sample: { carbonate_M: 'fitted' } })).toEqual(['carbonate.pKa1', 'carbonate.pKa2']);
    expect(rare({ reading: { junctionHydrogen: 0.1, junctionHydroxide: { value: 0, u: 0.1 } } })).toEqual([
      'reading.junctionHydrogen',
      'reading.junctionHydroxide',
    ]);
    const counterIon = { ratio: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 1, pKa: [1.9, 6.3] };
    expect(rare({ sample: { analytes: [{}, { groups: 1, counterIon }] } })).toEqual([
      'analyte2.counterIon.pKa1',
      'analyte2.counterIon.pKa2',
    ]);
    const titrant: Keys['titrant'] = { kind: 'solution', systems: [{ pKa: [4.7] }, { pKa: [9.2] }], cations_M: 0.1 };
    expect(rare({ titrant })).toEqual([
      'titrant.system1.pKa1',
      'titrant.system1.concentration',
      'titrant.system2.pKa1',
      'titrant.system2.concentration',
      'titrant.cations',
      'titrant.anions',
    ]);
  });

  it('are unique, and each quantity says what it is and in which unit', () => {
    const { quantities } = designOf({
      sample: {
        carbonate_M: 0.01,
        analytes: [
          { name: 'glycine', groups: 2 },
          { name: 'aniline', groups: 1 },
        ],
      },
    });
    expect(new Set(quantities.map(({ id }) => id)).size).toBe(quantities.length);
    const words = Object.fromEntries(quantities.map(({ id, label, unit }) => [id, `${label} [${unit}]`]));
    expect(words).toMatchObject({
      pKa2: 'pKa₂ []',
      'analyte2.pKa1': 'pKa₁ of aniline []',
      concentration: 'concentration [mol/L]',
      'analyte2.concentration': 'concentration of aniline [mol/L]',
      'carbonate.pKa1': 'pKa₁ of carbonate []',
      'sample.volume': 'sample volume [mL]',
    });
  });
});

describe('what the strength of a base means', () => {
  it.each([
    // Cations and carbonate of a base of strength 0.1 that holds 0.01 of carbonate, mol/L.
    ['hydroxide', 0.12],
    ['toHydrogencarbonate', 0.11],
    ['totalBase', 0.1],
  ] as const)('%s', (strengthMeans, cations) => {
    const { titrant } = contentsOf({
      sample: { analytes: [] },
      titrant: { kind: 'base', concentration_M: 0.1, carbonate_M: 0.01, strengthMeans },
    });
    expect(titrant).toEqual([cations, 0, 0.01]);
  });

  it('is hydroxide where nobody says otherwise, and touches neither acids nor samples', () => {
    const carbonate = { carbonate_M: 0.01, strengthMeans: 'totalBase' } as const;
    const base = contentsOf({ sample: { analytes: [] }, titrant: { kind: 'base', carbonate_M: 0.01 } });
    expect(base.titrant).toEqual([0.12, 0, 0.01]);
    const acid = contentsOf({ sample: { analytes: [], carbonate_M: 0.03 }, titrant: { kind: 'acid', ...carbonate } });
    expect(acid.titrant).toEqual([0.02, 0.1, 0.01]);
    expect(acid.sample).toEqual([0.06, 0, 0.03]);
  });
});

describe('counter-ions', () => {
  const analyte = (keys: AnalyteFile): Keys => ({ sample: { analytes: [{ concentration_M: 0.02, ...keys }] } });

  it.each<[string, AnalyteFile, number[]]>([
    // Cations, anions, analyte.
    ['a dihydrochloride', { groups: 3, chargeFullyProtonated: 2, protonsLostAsWeighed: 0 }, [0, 0.04, 0.02]],
    ['a hydrochloride', { groups: 2, chargeFullyProtonated: 1, protonsLostAsWeighed: 0 }, [0, 0.02, 0.02]],
    ['a zwitterion', { groups: 2, chargeFullyProtonated: 1, protonsLostAsWeighed: 1 }, [0, 0, 0.02]],
    ['a free acid', { groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }, [0, 0, 0.02]],
    ['a monosodium salt', { groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 1 }, [0.02, 0, 0.02]],
    ['a disodium salt', { groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 2 }, [0.04, 0, 0.02]],
  ])('of %s', (_, keys, expected) => {
    expect(contentsOf(analyte(keys)).sample).toEqual(expected);
  });

  it('that are proton systems themselves come at their ratio and leave no strong ions', () => {
    const base = { groups: 1, chargeFullyProtonated: 1, protonsLostAsWeighed: 0 };
    const sulfate = { name: 'sulfate', ratio: 0.5, chargeFullyProtonated: 0, protonsLostAsWeighed: 2, pKa: [-3, 1.99] };
    expect(contentsOf(analyte({ ...base, counterIon: sulfate })).sample).toEqual([0, 0, 0.02, 0.01]);
    // The hydrogensulfate: one for each, with one proton.
    const hydrogensulfate = { ...sulfate, ratio: 1, protonsLostAsWeighed: 1 };
    expect(contentsOf(analyte({ ...base, counterIon: hydrogensulfate })).sample).toEqual([0, 0, 0.02, 0.02]);
    // Where charges do not match, strong ions fill up: ½ of sulfate with a charge of two leaves one chloride.
    const twice = { groups: 2, chargeFullyProtonated: 2, protonsLostAsWeighed: 0 };
    expect(contentsOf(analyte({ ...twice, counterIon: sulfate })).sample).toEqual([0, 0.02, 0.02, 0.01]);
    // An ammonium salt of an acid.
    const acid = { groups: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 1 };
    const ammonium = { ratio: 1, chargeFullyProtonated: 1, protonsLostAsWeighed: 0, pKa: [9.245] };
    expect(contentsOf(analyte({ ...acid, counterIon: ammonium })).sample).toEqual([0, 0, 0.02, 0.02]);
  });

  it('stay away where the vessel declares its ions', () => {
    const { sample } = contentsOf({
      sample: { cations_M: 0.03, systems: [{ pKa: [4.7], chargeFullyProtonated: 1, concentration_M: 0.02 }] },
    });
    expect(sample).toEqual([0.03, 0, 0.02]);
  });
});

describe('what else a vessel holds', () => {
  it('strong ions of either sign, and a background of both', () => {
    const sample = (strongIon_M: number) =>
      contentsOf({ sample: { analytes: [], strongIon_M, background_M: 0.1 } }).sample;
    expect(sample(0.02)).toEqual([0.12, 0.1]);
    expect(sample(-0.02)).toEqual([0.1, 0.12]);
  });

  it('a base of strong cations, an acid of strong anions', () => {
    expect(contentsOf({ sample: { analytes: [] }, titrant: { kind: 'base' } }).titrant).toEqual([0.1, 0]);
    expect(contentsOf({ sample: { analytes: [] }, titrant: { kind: 'acid' } }).titrant).toEqual([0, 0.1]);
  });
});
