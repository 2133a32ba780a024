import { type SimulatedRun, type SimulatedRunInput, simulateRun } from '../test/simulator/simulateRun.ts';
import { type Dosing, doseVolumes } from './doseVolumes.ts';

/** One invented run: the text of its export, its sheet and its truth. */
export interface SampleRun {
  readonly file: string;
  readonly exported: string;
  readonly sheet: Readonly<Record<string, unknown>>;
  /** Values of everything known or fitted, by the id of the quantity. */
  readonly truth: Readonly<Record<string, number>>;
}

/** Water at 25 °C, molar scale: Debye–Hückel A, pKw and the constants of carbonic acid at infinite dilution. */
export const waterAt25 = {
  temperature_C: 25,
  activity: 'davies',
  debyeHueckelA: 0.5116,
  pKw: 13.997,
} as const;
export const carbonicPKaAt25: readonly number[] = [6.353, 10.33];

/** Doses as a titrator would, then reads with noise. */
export function titrate(input: Omit<SimulatedRunInput, 'volumes_mL'>, dosing: Dosing): SimulatedRun {
  return simulateRun({ ...input, volumes_mL: doseVolumes(input, dosing) });
}
