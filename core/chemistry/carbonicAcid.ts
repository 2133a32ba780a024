import { type Celsius, toKelvin } from '../units/temperature.ts';
import { waterDensity_kg_L } from './waterDensity.ts';

/** Charge of the fully protonated form, CO2 taken together with H2CO3. */
export const carbonicChargeFullyProtonated = 0;

/**
 * Constants of carbonic acid at infinite dilution on the molal scale, 0–90 °C:
 * 6.352 and 10.329 at 25 °C.
 *
 * Source: Plummer, L. N.; Busenberg, E., Geochim. Cosmochim. Acta 46 (1982)
 * 1011–1040; coefficients from memory, checked against handbook values.
 */
export function carbonicConstantsMolal(temperature: Celsius): readonly [number, number] {
  const T = toKelvin(temperature);
  const logT = Math.log10(T);
  const first = -356.3094 - 0.06091964 * T + 21834.37 / T + 126.8339 * logT - 1684915 / T ** 2;
  const second = -107.8871 - 0.03252849 * T + 5151.79 / T + 38.92561 * logT - 563713.9 / T ** 2;
  return [-first, -second];
}

/** Constants of carbonic acid at infinite dilution on the molar scale. Molar = molal − log₁₀(density in kg/L). */
export function carbonicConstants(temperature: Celsius): readonly [number, number] {
  const shift = -Math.log10(waterDensity_kg_L(temperature));
  const [first, second] = carbonicConstantsMolal(temperature);
  return [first + shift, second + shift];
}
