/** With fewer points the normal approximation to either figure is poor. */
const fewestPoints = 12;

/** How residuals keep their sign and their size from one point to the next. */
export interface Wandering {
  /** Stretches of one sign, and how many chance would make. */
  readonly stretches: number;
  readonly expectedStretches: number;
  /** Standard deviations by which the stretches fall short; negative where there are more than expected. */
  readonly stretchesShort: number;
  /** Correlation of neighbours, −1 to 1, and the same in standard deviations. */
  readonly correlation: number;
  readonly correlationOver: number;
}

/**
 * Runs test on the signs, and the correlation of neighbours, of whitened
 * residuals in order of volume; null with too few of them.
 *
 * Sources: Wald, A.; Wolfowitz, J., Ann. Math. Stat. 11 (1940) 147–162. Anderson,
 * R. L., Ann. Math. Stat. 13 (1942) 1–13: mean about −1/n, variance about 1/n.
 */
export function wandering(residuals: readonly number[]): Wandering | null {
  const compared = residuals.filter((residual) => residual !== 0);
  const count = compared.length;
  if (count < fewestPoints) return null;
  const positive = compared.filter((residual) => residual > 0).length;
  const stretches = 1 + compared.filter((residual, i) => i > 0 && residual > 0 !== compared[i - 1] > 0).length;
  const expectedStretches = (2 * positive * (count - positive)) / count + 1;
  const variance = ((expectedStretches - 1) * (expectedStretches - 2)) / (count - 1);
  let squares = 0;
  let products = 0;
  compared.forEach((residual, i) => {
    squares += residual ** 2;
    if (i > 0) products += residual * compared[i - 1];
  });
  const correlation = products / squares;
  return {
    stretches,
    expectedStretches,
    // All of one sign: the approximation has no variance left, and chance no part in it.
    stretchesShort: variance > 0 ? (expectedStretches - stretches) / Math.sqrt(variance) : Math.sqrt(count),
    correlation,
    correlationOver: (correlation + 1 / count) * Math.sqrt(count),
  };
}

/** Standard deviations of either figure that chance does not bring about: one run in 4,000. */
const factor = 3.5;

/** Whether residuals wander. */
export function wanders(found: Wandering | null): boolean {
  return found !== null && Math.max(found.stretchesShort, found.correlationOver) > factor;
}
