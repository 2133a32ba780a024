import type { Celsius } from '../units/temperature.ts';

/**
 * Static relative permittivity of water at 1 atm, 0–100 °C; dimensionless.
 *
 * Source: Malmberg, C. G.; Maryott, A. A., J. Res. Natl. Bur. Stand. 56 (1956) 1–8.
 */
export function waterPermittivity(temperature: Celsius): number {
  const t = temperature;
  return 87.74 + t * (-0.40008 + t * (9.398e-4 - 1.41e-6 * t));
}
