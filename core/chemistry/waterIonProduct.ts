import { type Celsius, toKelvin } from '../units/temperature.ts';
import { waterDensity_kg_L } from './waterDensity.ts';

/** Name of the formulation, for the report. */
export const waterIonProductSource = 'IAPWS R11-07 (Bandura and Lvov 2006)';

/** Range in °C over which the default is used without a doubt. */
export const waterTemperatureRange = { lowest: 0, highest: 100 } as const;

/**
 * pKw of water at infinite dilution on the molal scale, from temperature (K)
 * and density (kg/L).
 *
 * Source: IAPWS R11-07, Release on the Ionization Constant of H2O (2007);
 * Bandura, A. V.; Lvov, S. N., J. Phys. Chem. Ref. Data 35 (2006) 15–30.
 */
export function waterIonProductMolal(temperature_K: number, density_kg_L: number): number {
  const T = temperature_K;
  const rho = density_kg_L;
  const hydrationNumber = 6;
  const molarMass_kg_mol = 18.015268e-3;
  const association = rho * Math.exp(-0.864671 + 8659.19 / T + (-22786.2 * rho ** (2 / 3)) / (T * T));
  const gasPhase = 0.61415 + 48251.33 / T - 67707.93 / T ** 2 + 1.01021e7 / T ** 3;
  return (
    -2 *
      hydrationNumber *
      (Math.log10(1 + association) -
        (association / (association + 1)) * rho * (0.642044 - 56.8534 / T - 0.375754 * rho)) +
    gasPhase +
    2 * Math.log10(molarMass_kg_mol)
  );
}

/**
 * pKw of water at infinite dilution on the molar scale, at 1 atm: 13.997 at 25 °C.
 * Molar = molal − 2 log₁₀(density in kg/L).
 */
export function waterIonProduct(temperature: Celsius): number {
  const density = waterDensity_kg_L(temperature);
  return waterIonProductMolal(toKelvin(temperature), density) - 2 * Math.log10(density);
}
