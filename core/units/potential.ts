/** Units in which exports give electrode potentials. Inside Stepwell every potential is in mV. */
export type PotentialUnit = 'mV' | 'V';

/** A potential in mV; `value` is in `unit`. */
export function millivolts(value: number, unit: PotentialUnit): number {
  return unit === 'V' ? value * 1000 : value;
}
