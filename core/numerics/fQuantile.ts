import quantile from '@stdlib/stats-base-dists-f-quantile';
import { nearlyInfinite } from './nearlyInfinite.ts';

/** Ratio of degrees of freedom up to which a quantile below the median keeps ten digits. */
const largestRatio = 1e6;

/**
 * Quantile of the F distribution.
 *
 * @param probability strictly between 0 and 1
 * @param numeratorDegrees degrees of freedom above the line: positive, need not be whole, may be Infinity
 * @param denominatorDegrees the same below the line
 */
export function fQuantile(probability: number, numeratorDegrees: number, denominatorDegrees: number): number {
  if (!(probability > 0 && probability < 1)) throw new Error(`fQuantile: probability ${probability}`);
  if (!(numeratorDegrees > 0 && denominatorDegrees > 0))
    throw new Error(`fQuantile: ${numeratorDegrees} and ${denominatorDegrees} degrees of freedom`);
  const above = Math.min(numeratorDegrees, nearlyInfinite);
  const below = Math.min(denominatorDegrees, nearlyInfinite);
  // Both limits at once: the distribution is a single point.
  if (above === nearlyInfinite && below === nearlyInfinite) return 1;
  // The library knows the ratio above · F / below only up to 1e16. The reciprocal has no such limit, but a small
  // probability would lose its digits by it: 1 − p is exact above a half alone.
  const byReciprocal = above > below && (probability > 0.5 || above > largestRatio * below);
  return byReciprocal ? 1 / quantile(1 - probability, below, above) : quantile(probability, above, below);
}
