import { studentQuantile } from '../numerics/studentQuantile.ts';

/** Coverage of every interval that is stated. */
export const coverage = 0.95;

/**
 * Symmetric 95 % interval from a standard uncertainty.
 *
 * @param degreesOfFreedom of the noise where it was estimated from the run, Infinity where it was declared
 */
export function covarianceInterval(value: number, u: number, degreesOfFreedom: number): readonly [number, number] {
  const factor = studentQuantile(0.5 * (1 + coverage), degreesOfFreedom);
  return [value - factor * u, value + factor * u];
}
