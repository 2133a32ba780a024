import type { Celsius } from '../units/temperature.ts';

/**
 * Density of liquid water at 1 atm in kg/L, 0–100 °C.
 *
 * Source: Kell, G. S., J. Chem. Eng. Data 20 (1975) 97–105, the rational
 * formula for air-free water; good to about 0.00001 kg/L in this range.
 */
export function waterDensity_kg_L(temperature: Celsius): number {
  const t = temperature;
  const numerator =
    999.83952 + t * (16.945176 + t * (-7.9870401e-3 + t * (-46.170461e-6 + t * (105.56302e-9 - 280.54253e-12 * t))));
  return numerator / (1 + 16.87985e-3 * t) / 1000;
}
