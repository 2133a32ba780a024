import { describe, expect, it } from 'vitest';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { readingsOfSheet } from '../modelOfSheet.ts';
import titrations from './worked-titrations.json';

type Table = (typeof titrations.tables)[number];

/** Constants as each book states them, of which the file keeps the rounded pKa. */
const constants: Record<string, readonly number[]> = {
  'openstax-acetic': [-Math.log10(1.8e-5)],
  'openstax-exercise-formic': [-Math.log10(1.8e-4)],
  'harvey-acetic': [4.757],
  'skoog-acetic-0p1': [-Math.log10(1.75e-5)],
  'glycine-hcl-henderson': [2.35, 9.778],
};

/** Harris computes with Kw = 1.01e-14, of which the file keeps pKw with three decimals. */
const ionProducts: Record<string, number> = { 'harris-koh-hbr': -Math.log10(1.01e-14) };

/** Points that lie farther from exact algebra than the printed digits allow: by how much in pH, and why. */
const exceptions: Record<string, Record<number, { readonly within: number; readonly why: string }>> = {
  'openstax-hcl': { 22: { within: 0.00503, why: '[H⁺] rounded to 0.00638 on the way' } },
  'openstax-acetic': { 0: { within: 0.0054, why: 'square-root formula for the first point' } },
  'openstax-exercise-hno3': { 15: { within: 0.00091, why: '1.5119 cut, not rounded' } },
  'openstax-exercise-formic': {
    0: { within: 0.0117, why: 'square-root formula for the first point' },
    25: { within: 0.0052, why: 'Kb rounded to 5.6e-11 on the way' },
  },
  'fccj-strong': { 30: { within: 0.0051, why: '[H⁺] rounded to 0.0143 on the way' } },
  'harvey-acetic': {
    15: { within: 0.0067, why: 'table from memory' },
    22: { within: 0.0077, why: 'table from memory' },
  },
  'harris-koh-hbr': {
    6: { within: 0.0103, why: 'table from memory' },
    7: { within: 0.0103, why: 'table from memory' },
    9.5: { within: 0.0103, why: 'table from memory' },
    9.9: { within: 0.0103, why: 'table from memory' },
    9.99: { within: 0.0103, why: 'table from memory' },
  },
  'skoog-acetic-0p1': { 49.9: { within: 0.0061, why: 'table from memory' } },
};

function sheetOf(table: Table): SheetFile {
  const pKa = constants[table.id];
  const { V_mL, c_M } = table.analyte;
  const base = table.analyte.species === 'KOH';
  return {
    sheet: 1,
    sample: {
      volume_mL: V_mL,
      strongIon_M: pKa !== undefined ? 0 : base ? c_M : -c_M,
      carbonate_M: 0,
      analytes:
        pKa === undefined
          ? []
          : [
              {
                groups: pKa.length,
                pKa: [...pKa],
                chargeFullyProtonated: pKa.length - 1,
                protonsLostAsWeighed: 0,
                concentration_M: c_M,
              },
            ],
    },
    titrant: { kind: base ? 'acid' : 'base', concentration_M: table.titrant.c_M, carbonate_M: 0 },
    medium: { temperature_C: table.temperature_C, activity: 'none', pKw: ionProducts[table.id] ?? table.pKw },
    reading: { kind: 'pH', scale: 'concentration', offset: 0, slope: 1 },
  };
}

describe('textbook tables (each with its source in worked-titrations.json), by the model of a run', () => {
  const tables = titrations.tables.filter(({ id }) => id !== 'glycine-hcl-henderson');

  it.each(tables)('$id within the printed precision', (table) => {
    expect(table.pH.length).toBeGreaterThanOrEqual(4);
    const computed = readingsOfSheet(sheetOf(table), table.volume_mL);
    table.pH.forEach((printed, i) => {
      const decimals = Math.max(2, String(printed).split('.')[1]?.length ?? 0);
      const halfUnit = 0.5 * 10 ** -decimals;
      const exception = exceptions[table.id]?.[table.volume_mL[i]];
      const deviation = Math.abs(computed[i] - printed);
      const where = `${table.volume_mL[i]} mL: ${computed[i]} against ${printed}`;
      // An exception that is not needed would hide a change.
      if (exception !== undefined) expect(deviation, `${where}, excused for nothing`).toBeGreaterThan(halfUnit);
      expect(deviation, where).toBeLessThan(exception?.within ?? halfUnit);
    });
  });

  it.each(tables)('$id: the exact values of a separate program', (table) => {
    const exact: readonly number[] = table.recomputed.pH ?? [];
    expect(exact.length).toBe(table.volume_mL.length);
    const computed = readingsOfSheet(sheetOf(table), table.volume_mL);
    // Kept with four decimals.
    exact.forEach((pH, i) => {
      expect(Math.abs(computed[i] - pH), `${table.volume_mL[i]} mL`).toBeLessThan(5.1e-5);
    });
  });

  it('the answers the books give for half-way and equivalence', () => {
    let answers = 0;
    for (const table of tables) {
      const { V_eq_mL, pH_eq, pH_half } = table.answers;
      if (V_eq_mL === undefined) continue;
      const [half, equivalence] = readingsOfSheet(sheetOf(table), [V_eq_mL / 2, V_eq_mL]);
      // Printed with two decimals; the half-way value is the pKa itself, from which free H⁺ moves the exact
      // one by 0.0006.
      if (pH_half !== undefined) expect(Math.abs(half - pH_half)).toBeLessThan(0.0056);
      if (pH_eq !== undefined) expect(Math.abs(equivalence - pH_eq)).toBeLessThan(0.005);
      answers += Number(pH_half !== undefined) + Number(pH_eq !== undefined);
    }
    expect(answers).toBe(3);
  });

  it('glycine hydrochloride: the exact volume for pH 2.73, where the printed answer neglects free H⁺', () => {
    const table = titrations.tables.find(({ id }) => id === 'glycine-hcl-henderson');
    if (table === undefined) throw new Error('the table is missing');
    const { exact_V_mL_for_pH_2p73: exactVolume, pH_at_12p4_mL: pHThere } = table.recomputed;
    if (exactVolume === undefined || pHThere === undefined) throw new Error('the exact values are missing');
    // The printed 12.4 mL is the rounded 17.5 mL / (1 + 10^(2.35 − 2.73)), for which pH 2.853 was found.
    const neglecting = 17.5 / (1 + 10 ** (2.35 - 2.73));
    expect(Math.abs(neglecting - table.volume_mL[0])).toBeLessThan(0.05);
    const computed = readingsOfSheet(sheetOf(table), [exactVolume, neglecting]);
    // Kept with three decimals.
    expect(Math.abs(computed[0] - table.pH[0])).toBeLessThan(0.0005);
    expect(Math.abs(computed[1] - pHThere)).toBeLessThan(0.00051);
  });
});

describe('curves computed by a separate program (exact charge balance, no activity)', () => {
  it.each(titrations.computed_reference_curves)('$id', (curve) => {
    expect(curve.pH.length).toBeGreaterThanOrEqual(13);
    const base = curve.titrant_strong_base_M;
    const sheet: SheetFile = {
      sheet: 1,
      sample: {
        volume_mL: curve.V0_mL,
        cations_M: curve.strong_cation_M,
        anions_M: curve.strong_anion_M,
        systems: curve.components.map(({ pKa, charge_fully_protonated, c_M }) => ({
          groups: pKa.length,
          pKa,
          chargeFullyProtonated: charge_fully_protonated,
          concentration_M: c_M,
        })),
      },
      titrant: {
        kind: base === null ? 'acid' : 'base',
        concentration_M: base ?? curve.titrant_strong_acid_M ?? Number.NaN,
        carbonate_M: 0,
      },
      medium: { temperature_C: 25, activity: 'none', pKw: curve.pKw },
      reading: { kind: 'pH', scale: 'concentration', offset: 0, slope: 1 },
    };
    const computed = readingsOfSheet(sheet, curve.volume_mL);
    // Printed with six decimals.
    curve.pH.forEach((pH, i) => {
      expect(Math.abs(computed[i] - pH), `${curve.volume_mL[i]} mL`).toBeLessThan(1e-6);
    });
  });
});
