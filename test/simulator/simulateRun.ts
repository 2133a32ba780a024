import { seededNoise } from './seededNoise.ts';
import type { SimulatedMedium, SimulatedVessel } from './simulatedVessel.ts';
import { type SimulatedPoint, simulatePoint } from './simulatePoint.ts';

/** What the instrument shows for a pX, the pH on its own scale. */
export type SimulatedReading =
  | {
      readonly kind: 'pH';
      readonly scale: 'activity' | 'concentration';
      /** reading = 7 + offset + slope (pX − 7). */
      readonly offset?: number;
      readonly slope?: number;
    }
  | {
      readonly kind: 'mV';
      readonly scale: 'activity' | 'concentration';
      /** E = E0 − slope (RT ln10 / F) pX. */
      readonly E0_mV: number;
      readonly slope?: number;
    };

/** Standard deviations; anything left out is zero. */
export interface SimulatedErrors {
  readonly seed: number;
  /** Of the reading, in its unit, independent at each point. */
  readonly uReading?: number;
  /** Of the volume in mL, independent at each point, the one at volume zero included. */
  readonly uSetting_mL?: number;
  /** Of each single dose in mL; it stays in every later volume. A volume above the last one is one dose. */
  readonly uDose_mL?: number;
}

export interface SimulatedRunInput {
  readonly sample: SimulatedVessel;
  readonly titrant: SimulatedVessel;
  readonly extraWater_mL?: number;
  readonly medium: SimulatedMedium;
  /** Volumes as the burette shows them, mL. */
  readonly volumes_mL: ArrayLike<number>;
  /** True volume over shown volume. */
  readonly buretteGain?: number;
  readonly reading: SimulatedReading;
  readonly errors?: SimulatedErrors;
}

export interface SimulatedRun {
  /** As the burette shows them, mL. */
  readonly volumes_mL: Float64Array;
  /** pH or mV, with their errors. */
  readonly readings: Float64Array;
  /** Volumes truly added, mL. */
  readonly trueVolumes_mL: Float64Array;
  readonly points: readonly SimulatedPoint[];
}

/** CODATA 2018 values, exact by definition: J/(mol K) and C/mol. */
const GAS_CONSTANT = 8.31446261815324;
const FARADAY_CONSTANT = 96485.33212331;

/** RT ln10 / F in mV. */
export function nernstSlope_mV(temperature_C: number): number {
  return (1000 * GAS_CONSTANT * (temperature_C + 273.15) * Math.LN10) / FARADAY_CONSTANT;
}

function readingOf(pX: number, reading: SimulatedReading, temperature_C: number): number {
  const slope = reading.slope ?? 1;
  if (reading.kind === 'mV') return reading.E0_mV - slope * nernstSlope_mV(temperature_C) * pX;
  return 7 + (reading.offset ?? 0) + slope * (pX - 7);
}

/** A whole titration: what the export of the instrument would hold, and the truth behind it. */
export function simulateRun(input: SimulatedRunInput): SimulatedRun {
  const { sample, titrant, extraWater_mL = 0, medium, buretteGain = 1, errors } = input;
  const volumes_mL = Float64Array.from(input.volumes_mL);
  const readings = new Float64Array(volumes_mL.length);
  const trueVolumes_mL = new Float64Array(volumes_mL.length);
  const points: SimulatedPoint[] = [];
  const noise = seededNoise(errors?.seed ?? 0);
  let accumulated_mL = 0;
  let last_mL = 0;
  for (let i = 0; i < volumes_mL.length; i++) {
    // Every kind of error draws at every point, so that switching one off leaves the others as they were.
    const doseDraw = noise.normal();
    const settingDraw = noise.normal();
    const readingDraw = noise.normal();
    if (volumes_mL[i] > last_mL) accumulated_mL += (errors?.uDose_mL ?? 0) * doseDraw;
    last_mL = volumes_mL[i];
    trueVolumes_mL[i] = buretteGain * volumes_mL[i] + accumulated_mL + (errors?.uSetting_mL ?? 0) * settingDraw;
    const point = simulatePoint({ sample, titrant, extraWater_mL, volume_mL: trueVolumes_mL[i], medium });
    points.push(point);
    const pX = input.reading.scale === 'activity' ? point.pH_activity : point.pH_concentration;
    readings[i] = readingOf(pX, input.reading, medium.temperature_C) + (errors?.uReading ?? 0) * readingDraw;
  }
  return { volumes_mL, readings, trueVolumes_mL, points };
}
