import { type Celsius, toKelvin } from './temperature.ts';

/** Molar gas constant, J/(mol K), and Faraday constant, C/mol; CODATA 2018 (exact in the SI of 2019). */
const gasConstant = 8.31446261815324;
const faradayConstant = 96485.33212331;

/** Nernst slope RT ln10/F in millivolts per unit of pH: 59.16 mV at 25 °C. */
export function nernstSlope_mV(temperature: Celsius): number {
  return (1000 * gasConstant * toKelvin(temperature) * Math.LN10) / faradayConstant;
}
