import { fQuantile } from './fQuantile.ts';

/**
 * Quantile of Student's t distribution, by way of t² = F(1, ν).
 *
 * The library's own quantile of t is not used: it is the root of a difference
 * that vanishes near the median (with many degrees of freedom, digits are lost
 * as far as 0.6), where F is the root of a small number known in all digits.
 *
 * @param probability strictly between 0 and 1; good to eight digits from 1e-6 to 1 − 1e-6
 * @param degreesOfFreedom positive; need not be whole. Infinity gives the normal quantile.
 */
export function studentQuantile(probability: number, degreesOfFreedom: number): number {
  if (!(probability > 0 && probability < 1)) throw new Error(`studentQuantile: probability ${probability}`);
  if (!(degreesOfFreedom > 0)) throw new Error(`studentQuantile: ${degreesOfFreedom} degrees of freedom`);
  if (probability === 0.5) return 0;
  return Math.sign(probability - 0.5) * Math.sqrt(fQuantile(Math.abs(2 * probability - 1), 1, degreesOfFreedom));
}
