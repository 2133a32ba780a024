import { type Celsius, toKelvin } from '../units/temperature.ts';
import { waterPermittivity } from './waterPermittivity.ts';

/** CODATA 2018: elementary charge (C), vacuum permittivity (F/m), Boltzmann (J/K) and Avogadro (1/mol) constants. */
const elementaryCharge = 1.602176634e-19;
const vacuumPermittivity = 8.8541878128e-12;
const boltzmannConstant = 1.380649e-23;
const avogadroConstant = 6.02214076e23;

/**
 * Debye–Hückel coefficient A of water for decadic logarithms and molar
 * concentrations, in (L/mol)^½: 0.5116 at 25 °C.
 *
 * A = √(2π N_A · 1000 L/m³) (e²/(4π ε₀ ε k T))^(3/2) / ln 10, with the
 * permittivity of Malmberg and Maryott. The molal coefficient, which many
 * tables print, is this one times the root of the density in kg/L.
 */
export function debyeHueckelA(temperature: Celsius): number {
  const bjerrumLength =
    elementaryCharge ** 2 /
    (4 * Math.PI * vacuumPermittivity * waterPermittivity(temperature) * boltzmannConstant * toKelvin(temperature));
  return (Math.sqrt(2 * Math.PI * avogadroConstant * 1000) * bjerrumLength ** 1.5) / Math.LN10;
}
