import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/**
 * Drift, in pH per minute, at which a reading counts as settled; automatic
 * titrators wait for something between 0.01 and 0.05 (common practice).
 */
const settledDrift = 0.03;
/** A single volume may have been disturbed; so many show that the waiting time was too short. */
const fewestVolumes = 2;

/** Readings that were still moving when they were taken, where a time column and several readings at one volume show it. */
export function stillDrifting({ run, weighted }: Analysis): Doubt[] {
  const { readingKind, nernstSlope_mV } = weighted.run.design;
  const unitsPerPH = readingKind === 'mV' ? nernstSlope_mV : 1;
  const byVolume = new Map<number, { time: number; reading: number }[]>();
  for (const { volume_mL, reading, time_s, decision } of run.rows) {
    if (time_s === undefined || decision.use !== 'used') continue;
    byVolume.set(volume_mL, [...(byVolume.get(volume_mL) ?? []), { time: time_s, reading }]);
  }
  const drifting = [...byVolume].flatMap(([volume, taken]) => {
    const sorted = taken.toSorted((a, b) => a.time - b.time);
    const [first, last] = [sorted[0], sorted[sorted.length - 1]];
    const minutes = (last.time - first.time) / 60;
    if (!(minutes > 0)) return [];
    const drift = Math.abs(last.reading - first.reading) / unitsPerPH / minutes;
    return drift > settledDrift ? [{ volume, drift }] : [];
  });
  if (drifting.length < fewestVolumes) return [];
  const worst = drifting.reduce((most, entry) => (entry.drift > most.drift ? entry : most));
  return [
    {
      code: 'readings-drifting',
      seen: `At ${drifting.length} volumes the reading was still moving, by up to ${worst.drift.toFixed(2)} pH per minute (at ${worst.volume.toFixed(3)} mL).`,
      means:
        'The sensor or the solution had not come to rest; constants and the steepest points follow the dosing in time.',
      remedy: 'Wait longer after every dose, or let the titrator wait for a smaller drift.',
      place: { volume_mL: worst.volume },
    },
  ];
}
