/** A number with a fixed count of decimals and a true minus sign; no negative zero. */
export function formatNumber(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text.replace('-', '−');
}

/** The same with its sign always shown. */
export function formatSigned(value: number, decimals: number): string {
  const text = formatNumber(value, decimals);
  return text.startsWith('−') || /^0(\.0*)?$/.test(text) ? text : `+${text}`;
}

/** How many decimals the numbers were written with, at most `most`. */
export function decimalsIn(values: readonly number[], most: number): number {
  let decimals = 0;
  for (const value of values) {
    // A conversion of units leaves some 1e-16 of the value behind; a tenth of a millionth of the last place is not meant.
    while (decimals < most && Math.abs(value * 10 ** decimals - Math.round(value * 10 ** decimals)) > 1e-6) decimals++;
    if (decimals === most) break;
  }
  return decimals;
}
