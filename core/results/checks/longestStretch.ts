/** Volume in the middle of the longest stretch of residuals of one sign, mL: where to look first. */
export function longestStretch(compared: readonly { readonly volume_mL: number; readonly residual: number }[]): number {
  let best = { from: 0, to: 0 };
  let from = 0;
  compared.forEach(({ residual }, i) => {
    if (i > 0 && Math.sign(residual) !== Math.sign(compared[i - 1].residual)) from = i;
    if (i - from > best.to - best.from) best = { from, to: i };
  });
  return 0.5 * (compared[best.from].volume_mL + compared[best.to].volume_mL);
}
