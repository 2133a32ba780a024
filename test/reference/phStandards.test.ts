import { describe, expect, it } from 'vitest';
import { debyeHueckelA } from '../../core/chemistry/debyeHueckel.ts';
import { Equilibrium } from '../../core/chemistry/equilibrium.ts';
import { waterDensity_kg_L } from '../../core/chemistry/waterDensity.ts';
import { waterIonProductMolal } from '../../core/chemistry/waterIonProduct.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { celsius, toKelvin } from '../../core/units/temperature.ts';
import { readingsOfSheet } from '../modelOfSheet.ts';
import buffers from './buffers-nist.json';
import handbook from './pka-handbook.json';

interface Standard {
  /** Beginning of its name in `iupac_2002`. */
  readonly name: string;
  /** Its name in `recomputed`. */
  readonly recomputed: string;
  readonly acid: string;
  /** mol/kg of the acid in all its forms, and of the alkali ions that come with it. */
  readonly acid_molal: number;
  readonly cations_molal: number;
}

const standards: readonly Standard[] = [
  // KH₂C₆H₅O₇
  {
    name: '0.05 m potassium dihydrogen citrate',
    recomputed: 'citrate',
    acid: 'citric',
    acid_molal: 0.05,
    cations_molal: 0.05,
  },
  {
    name: '0.05 m potassium hydrogen phthalate',
    recomputed: 'phthalate',
    acid: 'phthalic',
    acid_molal: 0.05,
    cations_molal: 0.05,
  },
  {
    name: '0.025 m / 0.025 m phosphate',
    recomputed: 'phosphate 1:1',
    acid: 'phosphoric',
    acid_molal: 0.05,
    cations_molal: 0.075,
  },
  {
    name: '0.008695 m / 0.03043 m phosphate',
    recomputed: 'phosphate 1:3.5',
    acid: 'phosphoric',
    acid_molal: 0.008695 + 0.03043,
    cations_molal: 0.008695 + 2 * 0.03043,
  },
  // Borax gives four boric acid for two sodium.
  { name: '0.01 m borax', recomputed: 'borax', acid: 'boric', acid_molal: 0.04, cations_molal: 0.02 },
  {
    name: '0.025 m / 0.025 m carbonate',
    recomputed: 'carbonate',
    acid: 'carbonic',
    acid_molal: 0.05,
    cations_molal: 0.075,
  },
  // KH₃(C₂O₄)₂: two oxalic acids for one potassium.
  {
    name: '0.05 m potassium tetroxalate',
    recomputed: 'tetroxalate',
    acid: 'oxalic',
    acid_molal: 0.1,
    cations_molal: 0.05,
  },
];

const t = celsius(25);
const density = waterDensity_kg_L(t);
/** Debye–Hückel A on the molal scale, (kg/mol)^½. */
const molalA = debyeHueckelA(t) * Math.sqrt(density);
const molalPKw = waterIonProductMolal(toKelvin(t), density);

function constantsOf(acid: string): number[] {
  const found = handbook.acids.find(({ name }) => name.startsWith(acid));
  if (found === undefined) throw new Error(`no ${acid} acid`);
  expect(found.charge_fully_protonated).toBe(0);
  return found.pKa;
}

/** −log₁₀(m γ) of H⁺, everything on the molal scale. */
function molalPH({ acid, acid_molal, cations_molal }: Standard, coefficientA: number): number {
  const pKa = constantsOf(acid);
  const equilibrium = new Equilibrium([{ groups: pKa.length, chargeFullyProtonated: 0 }], coefficientA);
  equilibrium.balance.setConstants(pKa, molalPKw);
  expect(equilibrium.solve(Float64Array.of(cations_molal, 0, acid_molal), -7 * Math.LN10, 0.05)).toBe(true);
  return equilibrium.negativeLogActivity;
}

/** The same buffer as a sheet in mol/L, its constants turned from mol/kg to mol/L. */
function molarSheet({ acid, acid_molal, cations_molal }: Standard): SheetFile {
  const shift = -Math.log10(density);
  const pKa = constantsOf(acid).map((value) => value + shift);
  return {
    sheet: 1,
    sample: {
      volume_mL: 50,
      cations_M: cations_molal * density,
      anions_M: 0,
      systems: [{ groups: pKa.length, pKa, chargeFullyProtonated: 0, concentration_M: acid_molal * density }],
    },
    titrant: { kind: 'base', concentration_M: 0.1, carbonate_M: 0 },
    medium: { temperature_C: 25, activity: 'davies' },
    reading: { kind: 'pH', scale: 'activity', offset: 0, slope: 1 },
  };
}

describe('pH standards at 25 °C from constants at infinite dilution with Davies', () => {
  it.each(standards)('$recomputed', (standard) => {
    const table = buffers.iupac_2002.find(({ name }) => name.startsWith(standard.name));
    const row = buffers.recomputed.rows.find(({ buffer }) => buffer === standard.recomputed);
    if (table === undefined || row === undefined) throw new Error('the entry is missing');
    // IUPAC Recommendations 2002 (Buck et al.), from memory; citrate 3.776 and carbonate 10.012 looked up. Constants of
    // pka-handbook.json, looked up or from memory as it says there.
    const printed = table.pH_S[table.temperature_C.indexOf(25)] ?? Number.NaN;
    expect(row.pH_S_25C).toBe(printed);
    // 0.015: what activities of single ions, a convention in any case, and Davies leave at I up to 0.1.
    expect(Math.abs(molalPH(standard, molalA) - printed)).toBeLessThan(0.015);
    // A separate program with A = 0.5098 (from the later permittivity), printed with three decimals; it kept
    // the pKw of another table, which borax and carbonate do not feel.
    expect(Math.abs(molalPH(standard, 0.5098) - row.pH_davies_C03)).toBeLessThan(0.001);
  });

  it.each(standards)('$recomputed in mol/L, by the model of a run', (standard) => {
    const [pH] = readingsOfSheet(molarSheet(standard), [0]);
    // The molar pH lies −log₁₀ ρ = 0.0013 above the molal one; the 0.3 I of Davies counts mol/L here, mol/kg there.
    expect(Math.abs(pH + Math.log10(density) - molalPH(standard, molalA))).toBeLessThan(0.0003);
  });
});
