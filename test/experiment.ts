import { buildProblem, type Problem } from '../core/model/problem.ts';
import { analyseRun } from '../core/results/analyseRun.ts';
import type { RunResult } from '../core/results/runResult.ts';
import type { ReadingKind, Run } from '../core/run/run.ts';
import { completeSheet } from '../core/sheet/completeSheet.ts';
import type { SheetFile } from '../core/sheet/sheetFile.ts';
import { buildAcidTitrant, buildBaseTitrant, buildSample } from './simulator/buildVessels.ts';
import type { SimulatedMedium } from './simulator/simulatedVessel.ts';
import { type SimulatedErrors, type SimulatedRun, simulateRun } from './simulator/simulateRun.ts';

/** Constants of this medium, pKw 14: nothing stands between the equilibria and the reading. */
const plainMedium: SimulatedMedium = { temperature_C: 25, activity: 'none', debyeHueckelA: 0, pKw: 14 };
/** Constants at infinite dilution; Debye–Hückel A of water at 25 °C, molar scale. */
const daviesMedium: SimulatedMedium = { temperature_C: 25, activity: 'davies', debyeHueckelA: 0.5116, pKw: 14 };

/** One substance titrated with a strong base or acid of 0.1 mol/L; 25 mL of sample. */
export interface Experiment {
  /** None: strong acid (or, against an acid, strong base) alone, at `concentration_M`. */
  readonly pKa: readonly number[];
  readonly chargeFullyProtonated?: number;
  readonly protonsLostAsWeighed?: number;
  readonly concentration_M?: number;
  readonly titrant?: 'base' | 'acid';
  readonly titrantCarbonate_M?: number;
  /** Readings and constants on the activity scale with Davies; else on the concentration scale without. */
  readonly activity?: 'davies' | 'none';
  /** In both vessels, mol/L. */
  readonly background_M?: number;
  readonly points?: number;
  /** Volume of the last point, mL. */
  readonly end_mL: number;
  readonly errors?: SimulatedErrors;
  /** Decimals of the readings, as an export prints them; left out: not rounded. */
  readonly decimals?: number;
}

const sampleVolume_mL = 25;
const titrant_M = 0.1;
/** Noise of a good automatic titrator, as the sheets of these experiments declare it. */
export const usualErrors = { uReading: 0.005, uSetting_mL: 0.003 } as const;

export function evenVolumes(points: number, end_mL: number): number[] {
  return Array.from({ length: points }, (_, i) => (i * end_mL) / (points - 1));
}

/** The readings of an experiment from the independent simulator. */
export function perform(experiment: Experiment): SimulatedRun {
  const { pKa, end_mL, titrant = 'base', concentration_M = 0.01, points = 60, errors, decimals } = experiment;
  const { titrantCarbonate_M: carbonate_M = 0, background_M = 0, activity = 'none' } = experiment;
  const isBase = titrant === 'base';
  const run = simulateRun({
    sample: buildSample({
      volume_mL: sampleVolume_mL,
      background_M,
      strongIon_M: pKa.length > 0 ? 0 : isBase ? -concentration_M : concentration_M,
      analytes:
        pKa.length === 0
          ? []
          : [
              {
                pKa,
                chargeFullyProtonated: experiment.chargeFullyProtonated ?? 0,
                protonsLostAsWeighed: experiment.protonsLostAsWeighed ?? 0,
                concentration_M,
              },
            ],
    }),
    titrant: isBase
      ? buildBaseTitrant({ concentration_M: titrant_M, carbonate_M, background_M })
      : buildAcidTitrant({ concentration_M: titrant_M, background_M }),
    medium: activity === 'davies' ? daviesMedium : plainMedium,
    volumes_mL: evenVolumes(points, end_mL),
    reading: { kind: 'pH', scale: activity === 'davies' ? 'activity' : 'concentration' },
    ...(errors === undefined ? {} : { errors }),
  });
  if (decimals !== undefined)
    run.readings.forEach((reading, i) => {
      run.readings[i] = Number(reading.toFixed(decimals));
    });
  return run;
}

/** Keys of a sheet's parts with other values; null leaves the key out. */
export type SheetChanges = {
  readonly [Part in keyof SheetFile]?: {
    readonly [Key in keyof NonNullable<SheetFile[Part]>]?: NonNullable<SheetFile[Part]>[Key] | null;
  };
};

/** The sheet that declares an experiment truly, its constants and its concentration left to be fitted. */
export function sheetOf(experiment: Experiment, changes: SheetChanges = {}): SheetFile {
  const { pKa, activity = 'none', background_M = 0 } = experiment;
  const sheet = {
    sheet: 1,
    sample: {
      volume_mL: sampleVolume_mL,
      extraWater_mL: 0,
      strongIon_M: pKa.length > 0 ? 0 : 'fitted',
      carbonate_M: 0,
      background_M,
      analytes:
        pKa.length === 0
          ? []
          : [
              {
                name: 'acid X',
                groups: pKa.length,
                chargeFullyProtonated: experiment.chargeFullyProtonated ?? 0,
                protonsLostAsWeighed: experiment.protonsLostAsWeighed ?? 0,
              },
            ],
      ...changes.sample,
    },
    titrant: {
      kind: experiment.titrant ?? 'base',
      concentration_M: titrant_M,
      strengthMeans: 'hydroxide',
      carbonate_M: experiment.titrantCarbonate_M ?? 0,
      background_M,
      ...changes.titrant,
    },
    burette: { gain: 1, uSetting_mL: usualErrors.uSetting_mL, uDose_mL: 0, ...changes.burette },
    medium: { temperature_C: 25, activity, pKw: plainMedium.pKw, ...changes.medium },
    reading: {
      kind: 'pH',
      scale: activity === 'davies' ? 'activity' : 'concentration',
      offset: 0,
      slope: 1,
      u: usualErrors.uReading,
      ...changes.reading,
    },
  };
  return Object.fromEntries(
    Object.entries(sheet).map(([part, keys]) => [
      part,
      typeof keys === 'object' ? Object.fromEntries(Object.entries(keys).filter(([, value]) => value !== null)) : keys,
    ]),
  ) as unknown as SheetFile;
}

/** A run whose rows are all used. */
export function runOf(volumes: ArrayLike<number>, readings: ArrayLike<number>, readingKind: ReadingKind = 'pH'): Run {
  return {
    name: 'experiment',
    file: 'experiment.csv',
    readingKind,
    rows: Array.from(volumes, (volume_mL, i) => ({
      line: i + 2,
      volume_mL,
      reading: readings[i],
      decision: { use: 'used' },
    })),
    notAccepted: [],
    doubts: [],
  };
}

/** The whole way from a run and its sheet to the result, at once. */
export function workUp(run: Run, sheet: SheetFile): RunResult {
  const work = analyseRun(run, sheet);
  let step = work.next();
  while (step.done !== true) step = work.next();
  if (!step.value.ok) throw new Error(JSON.stringify(step.value.refusals));
  return step.value.value;
}

/** Performs an experiment and works it up, with its true sheet or with a changed one. */
export function workUpExperiment(experiment: Experiment, changes: SheetChanges = {}): RunResult {
  const { volumes_mL, readings } = perform(experiment);
  return workUp(runOf(volumes_mL, readings), sheetOf(experiment, changes));
}

/** Problem of several runs, each with its sheet; fitted quantities named in `shared` are common to all. */
export function problemOf(
  runs: readonly { readonly run: SimulatedRun; readonly sheet: SheetFile }[],
  shared: readonly string[] = [],
): Problem {
  const problem = buildProblem(
    runs.map(({ run, sheet }) => {
      const complete = completeSheet(sheet, { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 1 });
      if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
      return { sheet: complete.value, volumes: run.volumes_mL, readings: run.readings };
    }),
    shared,
  );
  if (!problem.ok) throw new Error(JSON.stringify(problem.refusals));
  return problem.value;
}

/** Problem of one experiment. */
export function experimentProblem(experiment: Experiment, changes: SheetChanges = {}): Problem {
  return problemOf([{ run: perform(experiment), sheet: sheetOf(experiment, changes) }]);
}
