import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { debyeHueckelA } from '../../core/chemistry/debyeHueckel.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { celsius } from '../../core/units/temperature.ts';
import { buildAcidTitrant, buildBaseTitrant, buildSample } from '../simulator/buildVessels.ts';
import type { SimulatedMedium, SimulatedVessel } from '../simulator/simulatedVessel.ts';
import { type SimulatedErrors, type SimulatedReading, simulateRun } from '../simulator/simulateRun.ts';

/*
 * Writes fit-runs.json beside this file: seeded runs of the independent simulator with their sheets, to be fitted by
 * SciPy (makeFits.py) and by the program. Run by hand: node app/terminal/launch.mjs test/reference/makeFitRuns.ts
 */

const temperature_C = 25;
const pKw = 13.997;
/** Carbonic acid at 25 °C and infinite dilution; source in SOURCES.md (pka-handbook). */
const carbonicPKa: [number, number] = [6.351, 10.329];
const uReading = 0.005;
const uSetting_mL = 0.003;

interface FitRun {
  readonly name: string;
  readonly seed: number;
  readonly sample: SimulatedVessel;
  readonly titrant: SimulatedVessel;
  readonly activity?: 'davies' | 'none';
  readonly reading?: SimulatedReading;
  readonly uReading?: number;
  readonly uDose_mL?: number;
  readonly points: number;
  readonly end_mL: number;
  /** Of the sheet; what is left out is as in `sheetOf`. */
  readonly declared: Pick<SheetFile, 'sample' | 'titrant' | 'medium' | 'reading'>;
  /** Truth of what is fitted, and the declared value of what is known. */
  readonly truth: Readonly<Record<string, number>>;
}

const medium = (activity: 'davies' | 'none'): SimulatedMedium => ({
  temperature_C,
  activity,
  debyeHueckelA: debyeHueckelA(celsius(temperature_C)),
  pKw,
});

/** One weighed acid or base in 25 mL. */
function weighed(
  pKa: readonly number[],
  concentration_M: number,
  background_M: number,
  chargeFullyProtonated = 0,
  protonsLostAsWeighed = 0,
  carbonate_M = 0,
) {
  const analyte = { pKa, chargeFullyProtonated, protonsLostAsWeighed };
  return {
    sample: buildSample({
      volume_mL: 25,
      background_M,
      carbonate_M,
      carbonicPKa,
      analytes: [{ ...analyte, concentration_M }],
    }),
    analytes: [{ name: 'analyte', groups: pKa.length, chargeFullyProtonated, protonsLostAsWeighed }],
    truth: { ...Object.fromEntries(pKa.map((value, k) => [`pKa${k + 1}`, value])), concentration: concentration_M },
  };
}

function sheetOf(run: FitRun): SheetFile {
  const { declared, activity = 'davies' } = run;
  return {
    sheet: 1,
    sample: { volume_mL: 25, extraWater_mL: 0, strongIon_M: 0, carbonate_M: 0, background_M: 0.1, ...declared.sample },
    titrant: {
      kind: 'base',
      concentration_M: 0.1,
      strengthMeans: 'hydroxide',
      carbonate_M: 0,
      background_M: 0.1,
      ...declared.titrant,
    },
    burette: { gain: 1, uSetting_mL, uDose_mL: run.uDose_mL ?? 0 },
    medium: { temperature_C, activity, pKw, carbonicPKa, ...declared.medium },
    reading: {
      kind: 'pH',
      scale: activity === 'davies' ? 'activity' : 'concentration',
      ...(declared.reading?.kind === 'mV' ? {} : { offset: 0 }),
      slope: 1,
      u: run.uReading ?? uReading,
      ...declared.reading,
    },
  };
}

const base = buildBaseTitrant({ concentration_M: 0.1, background_M: 0.1 });

function runs(): FitRun[] {
  const mono = weighed([4.756], 0.02, 0.1);
  const overlapping = weighed([4.3, 5.1], 0.015, 0.1);
  const citric = weighed([3.128, 4.761, 6.396], 0.012, 0.1);
  const amine = weighed([8.07], 0.02, 0.1, 1, 1);
  const dilute = weighed([7.2], 0.002, 0.1, 0, 0, 0.0003);
  const glycine = weighed([2.35, 9.78], 0.02, 0, 1, 1);
  const phthalate = weighed([2.95, 5.408], 0.02, 0.05, 0, 1);
  const plain: Pick<FitRun, 'titrant' | 'points' | 'end_mL'> = { titrant: base, points: 60, end_mL: 6.5 };
  return [
    { ...plain, ...mono, name: 'monoprotic', seed: 101, declared: { sample: { analytes: mono.analytes } } },
    {
      ...plain,
      ...overlapping,
      name: 'diprotic, overlapping by 0.8',
      seed: 102,
      points: 80,
      end_mL: 9.75,
      declared: { sample: { analytes: overlapping.analytes } },
    },
    {
      ...plain,
      ...citric,
      name: 'citric acid with offset fitted',
      seed: 103,
      points: 100,
      end_mL: 11.7,
      reading: { kind: 'pH', scale: 'activity', offset: 0.02 },
      truth: { ...citric.truth, 'reading.offset': 0.02 },
      declared: { sample: { analytes: citric.analytes }, reading: { offset: 'fitted' } },
    },
    {
      ...plain,
      ...amine,
      name: 'base by acid, titrant known',
      seed: 104,
      titrant: buildAcidTitrant({ concentration_M: 0.1003, background_M: 0.1 }),
      truth: { ...amine.truth, 'titrant.concentration': 0.1 },
      declared: {
        sample: { analytes: amine.analytes },
        titrant: { kind: 'acid', concentration_M: { value: 0.1, u: 0.0002 } },
      },
    },
    {
      ...plain,
      ...dilute,
      name: 'dilute, carbonate of the sample fitted',
      seed: 105,
      titrant: buildBaseTitrant({ concentration_M: 0.01, background_M: 0.1 }),
      points: 90,
      end_mL: 8.5,
      truth: { ...dilute.truth, 'sample.carbonate': 0.0003, 'sample.strongIon': -0.0006 },
      sample: {
        ...dilute.sample,
        // What turned the carbonate into carbonic acid before the run.
        anions_M: dilute.sample.anions_M + 0.0006,
      },
      declared: {
        sample: { analytes: dilute.analytes, carbonate_M: 'fitted', strongIon_M: -0.0006 },
        titrant: { concentration_M: 0.01 },
      },
    },
    {
      ...plain,
      name: 'strong acid in mV',
      seed: 106,
      sample: buildSample({ volume_mL: 25, background_M: 0.1, analytes: [], strongIon_M: -0.02 }),
      reading: { kind: 'mV', scale: 'activity', E0_mV: 405 },
      uReading: 0.3,
      truth: { 'sample.strongIon': -0.02, 'reading.E0': 405 },
      declared: {
        sample: { analytes: [], strongIon_M: 'fitted' },
        reading: { kind: 'mV', E0_mV: 'fitted' },
      },
    },
    {
      ...plain,
      ...glycine,
      name: 'zwitterion in a medium of its own, pKw fitted',
      seed: 107,
      activity: 'none',
      points: 70,
      end_mL: 8,
      titrant: buildBaseTitrant({ concentration_M: 0.1 }),
      truth: { ...glycine.truth, 'medium.pKw': pKw },
      declared: {
        sample: { analytes: [{ ...glycine.analytes[0], pKa: [2.35, 'fitted'] }], background_M: 0 },
        titrant: { background_M: 0 },
        medium: { pKw: 'fitted' },
      },
    },
    {
      ...plain,
      ...phthalate,
      name: 'hydrogenphthalate, carbonate of the titrant fitted',
      seed: 108,
      titrant: buildBaseTitrant({
        concentration_M: 0.1,
        background_M: 0.1,
        carbonate_M: 0.002,
        strengthMeans: 'toHydrogencarbonate',
        carbonicPKa,
      }),
      points: 80,
      end_mL: 8,
      truth: { ...phthalate.truth, 'titrant.carbonate': 0.002 },
      declared: {
        sample: { analytes: phthalate.analytes, background_M: 0.05 },
        titrant: { carbonate_M: 'fitted', strengthMeans: 'toHydrogencarbonate' },
      },
    },
    {
      ...plain,
      ...mono,
      name: 'monoprotic, doses accumulate',
      seed: 109,
      uDose_mL: 0.002,
      declared: { sample: { analytes: mono.analytes } },
    },
    {
      ...plain,
      ...citric,
      name: 'citric acid, doses accumulate',
      seed: 110,
      uDose_mL: 0.004,
      points: 100,
      end_mL: 11.7,
      declared: { sample: { analytes: citric.analytes } },
    },
    {
      ...plain,
      ...amine,
      name: 'base by acid, titrant known, doses accumulate',
      seed: 111,
      uDose_mL: 0.003,
      titrant: buildAcidTitrant({ concentration_M: 0.1003, background_M: 0.1 }),
      truth: { ...amine.truth, 'titrant.concentration': 0.1 },
      declared: {
        sample: { analytes: amine.analytes },
        titrant: { kind: 'acid', concentration_M: { value: 0.1, u: 0.0002 } },
      },
    },
  ];
}

function simulated(run: FitRun) {
  const { sample, titrant, activity = 'davies', points, end_mL, seed, uDose_mL = 0 } = run;
  const errors: SimulatedErrors = { seed, uReading: run.uReading ?? uReading, uSetting_mL, uDose_mL };
  const { volumes_mL, readings } = simulateRun({
    sample,
    titrant,
    medium: medium(activity),
    volumes_mL: Array.from({ length: points }, (_, i) => Number(((end_mL * i) / (points - 1)).toFixed(4))),
    reading: run.reading ?? { kind: 'pH', scale: activity === 'davies' ? 'activity' : 'concentration' },
    errors,
  });
  return {
    name: run.name,
    seed,
    sheet: sheetOf(run),
    truth: run.truth,
    volumes_mL: Array.from(volumes_mL),
    readings: Array.from(readings, (reading) => Number(reading.toFixed(6))),
  };
}

const document = {
  about:
    'Seeded runs of the independent simulator, written by makeFitRuns.ts. `truth`: of the fitted quantities, and the declared value of the known ones.',
  debyeHueckelA: debyeHueckelA(celsius(temperature_C)),
  runs: runs().map(simulated),
};
// Lists of numbers on one line each, so that a changed run shows as one.
const text = JSON.stringify(document, null, 1).replace(/\[\s+(-?[\d.e-]+,?\s+)+\]/g, (list) =>
  list.replace(/\s+/g, ' '),
);
writeFileSync(fileURLToPath(new URL('fit-runs.json', import.meta.url)), `${text}\n`);
