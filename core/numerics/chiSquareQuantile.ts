import { fQuantile } from './fQuantile.ts';

/**
 * Quantile of the χ² distribution: degrees of freedom times the quantile of F
 * with infinitely many below the line.
 *
 * The library's own quantile of χ² is not used: from about 2,000 degrees of
 * freedom on it is wrong in the fourth digit (0.002 of itself at the most),
 * since its incomplete gamma function is. F rests on the incomplete beta
 * function, which is sound there.
 *
 * @param probability strictly between 0 and 1
 * @param degreesOfFreedom positive and finite; need not be whole
 */
export function chiSquareQuantile(probability: number, degreesOfFreedom: number): number {
  if (!(degreesOfFreedom > 0 && degreesOfFreedom < Infinity))
    throw new Error(`chiSquareQuantile: ${degreesOfFreedom} degrees of freedom`);
  return degreesOfFreedom * fQuantile(probability, degreesOfFreedom, Infinity);
}
