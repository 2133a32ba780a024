/** Median of |x| of the standard normal distribution, which makes a median of sizes a standard deviation. */
const medianOfNormal = 0.6744897501960817;
/** Rounds in which the points that belong to the scatter settle. */
const mostRounds = 50;

/**
 * Standard deviation of whitened residuals without those that lie beyond
 * `cut` of it: the root mean square of the rest, found again until the same
 * points belong to it, from the median of the sizes on. Nearly as sharp as the
 * plain root mean square where nothing is amiss, and blind to a few wild
 * points where something is.
 *
 * @param freedom degrees of freedom of all residuals
 */
export function robustScale(residuals: Float64Array, freedom: number, cut: number): number {
  const count = residuals.length;
  if (!(freedom > 0) || count === 0) return 1;
  const sizes = residuals.map(Math.abs).sort();
  let scale = (sizes[count >> 1] / medianOfNormal) * Math.sqrt(count / freedom);
  for (let round = 0; round < mostRounds; round++) {
    const kept = sizes.filter((size) => size <= cut * scale);
    const left = freedom - (count - kept.length);
    // Half of all residuals lie within the median by its meaning; what fits exactly has no scatter to tell.
    if (!(left > 0) || !(scale > 0)) return scale;
    const next = Math.sqrt(kept.reduce((sum, size) => sum + size * size, 0) / left);
    if (Math.abs(next - scale) <= 1e-6 * scale) return next;
    scale = next;
  }
  return scale;
}
