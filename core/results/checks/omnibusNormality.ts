/** With fewer numbers the approximations do not hold. */
export const fewestForNormality = 20;

/**
 * How far skewness and kurtosis of a sample lie from those of a normal
 * distribution, each as a number that is itself about standard normal.
 *
 * Skewness: D'Agostino, R. B., Biometrika 57 (1970) 679–681. Kurtosis: Anscombe,
 * F. J.; Glynn, W. J., Biometrika 70 (1983) 227–234. Formulas as collected in
 * D'Agostino, R. B.; Belanger, A.; D'Agostino Jr., R. B., Am. Stat. 44 (1990)
 * 316–321 (from memory; the test compares with computed values).
 *
 * @param sample at least `fewestForNormality` numbers, not all the same
 */
export function omnibusNormality(sample: readonly number[]): { readonly skewness: number; readonly kurtosis: number } {
  const n = sample.length;
  const mean = sample.reduce((sum, x) => sum + x, 0) / n;
  const moment = (power: number) => sample.reduce((sum, x) => sum + (x - mean) ** power, 0) / n;
  const m2 = moment(2);
  return {
    skewness: skewnessScore(moment(3) / m2 ** 1.5, n),
    kurtosis: kurtosisScore(moment(4) / m2 ** 2, n),
  };
}

function skewnessScore(skewness: number, n: number): number {
  const y = skewness * Math.sqrt(((n + 1) * (n + 3)) / (6 * (n - 2)));
  const beta2 = (3 * (n * n + 27 * n - 70) * (n + 1) * (n + 3)) / ((n - 2) * (n + 5) * (n + 7) * (n + 9));
  const w2 = Math.sqrt(2 * (beta2 - 1)) - 1;
  const delta = 1 / Math.sqrt(0.5 * Math.log(w2));
  const alpha = Math.sqrt(2 / (w2 - 1));
  return delta * Math.asinh(y / alpha);
}

function kurtosisScore(kurtosis: number, n: number): number {
  const expected = (3 * (n - 1)) / (n + 1);
  const variance = (24 * n * (n - 2) * (n - 3)) / ((n + 1) ** 2 * (n + 3) * (n + 5));
  const x = (kurtosis - expected) / Math.sqrt(variance);
  const beta1 =
    ((6 * (n * n - 5 * n + 2)) / ((n + 7) * (n + 9))) * Math.sqrt((6 * (n + 3) * (n + 5)) / (n * (n - 2) * (n - 3)));
  const a = 6 + (8 / beta1) * (2 / beta1 + Math.sqrt(1 + 4 / beta1 ** 2));
  const ratio = (1 - 2 / a) / (1 + x * Math.sqrt(2 / (a - 4)));
  // On the other side of the pole the tails are lighter than the approximation can tell.
  if (!(ratio > 0)) return Number.NEGATIVE_INFINITY;
  return (1 - 2 / (9 * a) - Math.cbrt(ratio)) / Math.sqrt(2 / (9 * a));
}
