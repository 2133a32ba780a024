import type { NoiseDeclaration } from './noise.ts';

/** Halvings of an interval of six decades: below one part in 10⁹. */
const halvings = 60;

/**
 * Reading noise at which the weighted sum of squares of a run equals the
 * degrees of freedom that its data leave.
 *
 * @param misses reading minus curve, in the unit of the reading
 * @param slopes d reading/dV of the curve, unit/mL
 * @param smallest noise that is not undercut, in the unit of the reading: no instrument shows less than its last digit
 */
export function estimateReadingNoise(
  declaration: NoiseDeclaration,
  misses: Float64Array,
  slopes: Float64Array,
  degreesOfFreedom: number,
  smallest: number,
): number {
  if (declaration.kind === 'declared') return declaration.reading;
  if (declaration.kind === 'scale-estimated') {
    const ratio = declaration.settingToReading;
    let sum = 0;
    for (let i = 0; i < misses.length; i++) sum += misses[i] ** 2 / (1 + (ratio * slopes[i]) ** 2);
    return Math.max(smallest, Math.sqrt(sum / degreesOfFreedom));
  }
  const setting = declaration.setting_mL;
  const excess = (variance: number) => {
    let sum = 0;
    for (let i = 0; i < misses.length; i++) sum += misses[i] ** 2 / (variance + (setting * slopes[i]) ** 2);
    return sum - degreesOfFreedom;
  };
  let low = smallest ** 2;
  if (excess(low) <= 0) return smallest;
  let high = Math.max(4 * low, misses.reduce((sum, miss) => sum + miss ** 2, 0) / degreesOfFreedom);
  for (let i = 0; i < halvings; i++) {
    const middle = Math.sqrt(low * high);
    if (excess(middle) > 0) low = middle;
    else high = middle;
  }
  // The bracket holds variances, and its middle is their geometric mean.
  return (low * high) ** 0.25;
}
