import { simulatePoint } from '../test/simulator/simulatePoint.ts';
import type { SimulatedRunInput } from '../test/simulator/simulateRun.ts';

/** How the titrator chose its doses; volumes in mL. */
export interface Dosing {
  readonly last_mL: number;
  readonly smallest_mL: number;
  readonly largest_mL: number;
  /** Change of pH that a dose aims at. */
  readonly aim_pH: number;
}

/**
 * Volumes of a dynamic titration, mL: each dose aims at an equal change of pH,
 * is a multiple of the smallest dose and at most three times the one before.
 */
export function doseVolumes(input: Omit<SimulatedRunInput, 'volumes_mL'>, dosing: Dosing): number[] {
  const { last_mL, smallest_mL, largest_mL, aim_pH } = dosing;
  const pHAt = (volume_mL: number) =>
    simulatePoint({
      sample: input.sample,
      titrant: input.titrant,
      extraWater_mL: input.extraWater_mL ?? 0,
      medium: input.medium,
      volume_mL,
    }).pH_activity;
  const volumes = [0];
  let volume = 0;
  let dose = largest_mL;
  while (volume + smallest_mL / 2 < last_mL) {
    const slope = Math.abs(pHAt(volume + smallest_mL) - pHAt(volume)) / smallest_mL;
    const wanted = Math.min(largest_mL, 3 * dose, Math.max(smallest_mL, aim_pH / slope), last_mL - volume);
    dose = smallest_mL * Math.max(1, Math.round(wanted / smallest_mL));
    volume = Number((volume + dose).toFixed(4));
    volumes.push(volume);
  }
  return volumes;
}
