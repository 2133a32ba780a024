import { debyeHueckelA } from '../../core/chemistry/debyeHueckel.ts';
import { buildProblem, type DeclaredRun, type Problem } from '../../core/model/problem.ts';
import { completeSheet } from '../../core/sheet/completeSheet.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { celsius } from '../../core/units/temperature.ts';
import { buildBaseTitrant, buildSample } from '../simulator/buildVessels.ts';
import { seededNoise } from '../simulator/seededNoise.ts';
import { type SimulatedErrors, simulateRun } from '../simulator/simulateRun.ts';

/** A simple acid run: groups at least 1 apart between pKa 3 and 11, 5–30 mM, 25 mL, 0.1 M base, 0.1 M background. */
export interface SimpleDesign {
  readonly pKa: readonly number[];
  readonly concentration_M: number;
  readonly points: number;
}

export const simpleMedium = {
  temperature_C: 25,
  activity: 'davies' as const,
  debyeHueckelA: debyeHueckelA(celsius(25)),
  pKw: 13.997,
};

/** Volumes to 1.3 times the last equivalence, evenly spaced, mL. */
function simpleVolumes({ pKa, concentration_M, points }: SimpleDesign): number[] {
  const end = 1.3 * pKa.length * (concentration_M / 0.1) * 25;
  return Array.from({ length: points }, (_, i) => (end * i) / (points - 1));
}

/** A random simple design with 1–3 groups. */
export function randomDesign(seed: number): SimpleDesign {
  const random = seededNoise(seed);
  const groups = random.integer(1, 3);
  let pKa: number[];
  do {
    pKa = Array.from({ length: groups }, () => random.uniform(3, 11)).sort((a, b) => a - b);
  } while (pKa.some((value, k) => k > 0 && value - pKa[k - 1] < 1));
  return { pKa, concentration_M: random.uniform(0.005, 0.03), points: random.integer(60, 100) };
}

/** The sheet of a simple design: constants and concentration to be fitted, everything else declared. */
export function simpleSheet(groups: number, reading: SheetFile['reading']): SheetFile {
  return {
    sheet: 1,
    sample: {
      volume_mL: 25,
      extraWater_mL: 0,
      strongIon_M: 0,
      carbonate_M: 0,
      background_M: 0.1,
      analytes: [{ name: 'acid', groups, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }],
    },
    titrant: { kind: 'base', concentration_M: 0.1, carbonate_M: 0, background_M: 0.1 },
    burette: { gain: 1, uSetting_mL: 0.003 },
    medium: { temperature_C: 25, activity: 'davies', pKw: simpleMedium.pKw },
    ...(reading === undefined ? {} : { reading }),
  };
}

/** The simulated run of a simple design, in pH or, with a potential E0, in mV. */
export function simulateDesign(design: SimpleDesign, errors?: SimulatedErrors, E0_mV?: number) {
  return simulateRun({
    sample: buildSample({
      volume_mL: 25,
      background_M: 0.1,
      analytes: [
        {
          pKa: design.pKa,
          chargeFullyProtonated: 0,
          protonsLostAsWeighed: 0,
          concentration_M: design.concentration_M,
        },
      ],
    }),
    titrant: buildBaseTitrant({ concentration_M: 0.1, background_M: 0.1 }),
    medium: simpleMedium,
    volumes_mL: simpleVolumes(design),
    reading: E0_mV === undefined ? { kind: 'pH', scale: 'activity' } : { kind: 'mV', scale: 'activity', E0_mV },
    ...(errors === undefined ? {} : { errors }),
  });
}

/** A run declared by a sheet. */
export function declare(sheet: SheetFile, volumes: Float64Array, readings: Float64Array): DeclaredRun {
  const complete = completeSheet(sheet, {
    readingKind: sheet.reading?.kind ?? 'pH',
    titrantKind: 'base',
    groupsIfOpen: 1,
  });
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  return { sheet: complete.value, volumes, readings };
}

/** A problem of runs that must be buildable. */
export function problemOf(runs: readonly DeclaredRun[], shared: readonly string[] = []): Problem {
  const problem = buildProblem(runs, shared);
  if (!problem.ok) throw new Error(JSON.stringify(problem.refusals));
  return problem.value;
}

/** Parameters by their ids, in the order of the problem. */
export function parametersOf(problem: Problem, values: Readonly<Record<string, number>>): Float64Array {
  return Float64Array.from(problem.parameters, ({ id, kind }) => {
    if (kind === 'knowledge') return 0;
    if (!(id in values)) throw new Error(`no value for ${id}`);
    return values[id];
  });
}

/** Values of a simple design by the ids of its quantities. */
export function truthOf({ pKa, concentration_M }: SimpleDesign): Record<string, number> {
  return { ...Object.fromEntries(pKa.map((value, k) => [`pKa${k + 1}`, value])), concentration: concentration_M };
}
