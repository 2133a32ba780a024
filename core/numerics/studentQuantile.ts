import quantile from '@stdlib/stats-base-dists-t-quantile';

/**
 * Quantile of Student's t distribution.
 *
 * @param probability strictly between 0 and 1
 * @param degreesOfFreedom positive; need not be whole. Infinity gives the normal quantile.
 */
export function studentQuantile(probability: number, degreesOfFreedom: number): number {
  if (!(probability > 0 && probability < 1)) throw new Error(`studentQuantile: probability ${probability}`);
  if (!(degreesOfFreedom > 0)) throw new Error(`studentQuantile: ${degreesOfFreedom} degrees of freedom`);
  return quantile(probability, Math.min(degreesOfFreedom, NEARLY_NORMAL));
}

/** From here on t and normal quantiles differ by less than 1e-8 (leading term z(z² + 1)/4ν). */
const NEARLY_NORMAL = 1e9;
