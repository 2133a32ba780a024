/** Units in which exports give volumes. Inside Stepwell every volume is in mL. */
export type VolumeUnit = 'mL' | 'µL' | 'L';

/** A volume in mL; `value` is in `unit`. */
export function millilitres(value: number, unit: VolumeUnit): number {
  switch (unit) {
    case 'mL':
      return value;
    case 'µL':
      // Division rounds correctly; a product with the inexact 0.001 does not always.
      return value / 1000;
    case 'L':
      return value * 1000;
  }
}
