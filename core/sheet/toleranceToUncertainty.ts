/** Distribution that a tolerance ±a stands for. */
export type ToleranceDistribution = 'rectangular' | 'triangular' | 'normal';

/**
 * Divisors that turn the half-width of a tolerance into a standard uncertainty.
 * Rectangular √3 and triangular √6 after the GUM (JCGM 100:2008, 4.3.7 and
 * 4.3.9); normal takes the tolerance as a 95 % interval, 1.960.
 */
const divisors: Record<ToleranceDistribution, number> = {
  rectangular: Math.sqrt(3),
  triangular: Math.sqrt(6),
  normal: 1.959963984540054,
};

/** Standard uncertainty, in the unit of the tolerance, of a value stated as ±tolerance. */
export function toleranceToUncertainty(tolerance: number, distribution: ToleranceDistribution): number {
  return tolerance / divisors[distribution];
}
