import { debyeHueckelA } from '../../core/chemistry/debyeHueckel.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { celsius } from '../../core/units/temperature.ts';
import { buildBaseTitrant, buildSample } from '../simulator/buildVessels.ts';
import type { SimulatedRunInput } from '../simulator/simulateRun.ts';

/** A value that the sheet declares with its uncertainty, and that differs a little from the truth in every run. */
export interface Declared {
  readonly truth: number;
  readonly u: number;
}

/** True values of one design and how they are declared. */
export interface StudyDesign {
  readonly name: string;
  readonly pKa: readonly number[];
  readonly concentration_M: number;
  readonly titrant: Declared | number;
  readonly volume: Declared | number;
  readonly gain: Declared | number;
  readonly offset: Declared | number;
  /** mol/L in the sample, fitted; null: none, and declared as none. */
  readonly carbonate_M: number | null;
  readonly points: number;
  readonly uReading: number;
  readonly uSetting_mL: number;
  readonly uDose_mL: number;
  /** Which parts of the noise the sheet leaves out. */
  readonly noise: 'declared' | 'reading left out' | 'all left out';
}

const usual = {
  titrant: 0.1,
  volume: 25,
  gain: 1,
  offset: { truth: 0, u: 0.01 },
  carbonate_M: null,
  points: 60,
  uReading: 0.005,
  uSetting_mL: 0.003,
  uDose_mL: 0,
  noise: 'declared',
} as const;

/** The designs of the coverage study; declared values are redrawn for every run as truth + u·N(0,1). */
export const studyDesigns: readonly StudyDesign[] = [
  { ...usual, name: 'monoprotic, good', pKa: [4.76], concentration_M: 0.02, noise: 'all left out' },
  {
    ...usual,
    name: 'diprotic, 0.8 apart',
    pKa: [4.6, 5.4],
    concentration_M: 0.015,
    noise: 'reading left out',
  },
  { ...usual, name: 'triprotic, one at the edge of reach', pKa: [0.5, 5.6, 8.9], concentration_M: 0.006 },
  {
    ...usual,
    name: 'dilute, carbonate fitted',
    pKa: [4.2],
    concentration_M: 0.001,
    titrant: 0.01,
    carbonate_M: 0.0002,
  },
  {
    ...usual,
    name: 'titrant known ± u',
    pKa: [3.9, 7.4],
    concentration_M: 0.012,
    titrant: { truth: 0.1, u: 0.0003 },
    volume: { truth: 25, u: 0.02 },
  },
  {
    ...usual,
    name: 'accumulated dosing error, gain known ± u',
    pKa: [4.76],
    concentration_M: 0.02,
    gain: { truth: 1, u: 0.001 },
    uSetting_mL: 0.001,
    uDose_mL: 0.002,
  },
];

const temperature_C = 25;
const background_M = 0.1;
const pKw = 13.997;
const carbonicPKa: [number, number] = [6.353, 10.33];

function truthOf(value: Declared | number): number {
  return typeof value === 'number' ? value : value.truth;
}

/** True values by the ids of the fitted quantities. */
export function fittedTruth({ pKa, concentration_M, carbonate_M }: StudyDesign): Record<string, number> {
  return {
    ...Object.fromEntries(pKa.map((value, k) => [`pKa${k + 1}`, value])),
    concentration: concentration_M,
    ...(carbonate_M === null ? {} : { 'sample.carbonate': carbonate_M }),
  };
}

/** The run of a design as the simulator takes it. */
export function studyInput(design: StudyDesign, seed: number | null): SimulatedRunInput {
  const titrant_M = truthOf(design.titrant);
  const steps = design.pKa.length * design.concentration_M + 2 * (design.carbonate_M ?? 0);
  const end = (1.35 * steps * truthOf(design.volume)) / titrant_M;
  return {
    sample: buildSample({
      volume_mL: truthOf(design.volume),
      background_M,
      carbonate_M: design.carbonate_M ?? 0,
      carbonicPKa,
      // Carbonate stands beside its own acid here, as in water that has taken up carbon dioxide.
      strongIon_M: -2 * (design.carbonate_M ?? 0),
      analytes: [
        {
          pKa: design.pKa,
          chargeFullyProtonated: 0,
          protonsLostAsWeighed: 0,
          concentration_M: design.concentration_M,
        },
      ],
    }),
    titrant: buildBaseTitrant({ concentration_M: titrant_M, background_M }),
    medium: { temperature_C, activity: 'davies', debyeHueckelA: debyeHueckelA(celsius(temperature_C)), pKw },
    volumes_mL: Array.from({ length: design.points }, (_, i) => (end * i) / (design.points - 1)),
    buretteGain: truthOf(design.gain),
    reading: { kind: 'pH', scale: 'activity', offset: truthOf(design.offset) },
    ...(seed === null
      ? {}
      : {
          errors: {
            seed,
            uReading: design.uReading,
            uSetting_mL: design.uSetting_mL,
            uDose_mL: design.uDose_mL,
          },
        }),
  };
}

/** The sheet of one run, with its declared values drawn. */
export function studySheet(design: StudyDesign, normal: () => number): SheetFile {
  const draw = (value: Declared | number) =>
    typeof value === 'number' ? value : { value: value.truth + value.u * normal(), u: value.u };
  const reading = { kind: 'pH' as const, scale: 'activity' as const, offset: draw(design.offset), slope: 1 };
  const gain = draw(design.gain);
  return {
    sheet: 1,
    sample: {
      volume_mL: draw(design.volume),
      extraWater_mL: 0,
      strongIon_M: -2 * (design.carbonate_M ?? 0),
      carbonate_M: design.carbonate_M === null ? 0 : 'fitted',
      background_M,
      analytes: [{ name: 'acid', groups: design.pKa.length, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }],
    },
    titrant: { kind: 'base', concentration_M: draw(design.titrant), carbonate_M: 0, background_M },
    burette:
      design.noise === 'all left out' ? { gain } : { gain, uSetting_mL: design.uSetting_mL, uDose_mL: design.uDose_mL },
    medium: { temperature_C, activity: 'davies', pKw, carbonicPKa },
    reading: design.noise === 'declared' ? { ...reading, u: design.uReading } : reading,
  };
}
