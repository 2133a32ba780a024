/** Digits of a standard uncertainty that are printed (GUM 7.2.6: two suffice). */
const uncertaintyDigits = 2;
/** Digits of a value without uncertainty. */
const plainDigits = 6;
/** Where an uncertainty needs more decimals than this, powers of ten are easier to read. */
const mostDecimals = 12;

/** A value with its uncertainty to two digits, both to the same place: "4.7561 ± 0.0023". */
export function formatWithUncertainty(value: number, u: number | null): string {
  if (u === null || !(u > 0)) return String(Number(value.toPrecision(plainDigits)));
  // Rounded first: 0.0996 is printed as 0.10, whose first digit stands a place higher.
  const rounded = Number(u.toPrecision(uncertaintyDigits));
  const decimals = uncertaintyDigits - 1 - Math.floor(Math.log10(rounded));
  if (decimals > mostDecimals) return `${value.toPrecision(plainDigits)} ± ${u.toExponential(1)}`;
  return `${toPlace(value, decimals)} ± ${toPlace(rounded, decimals)}`;
}

/** Rounded to a number of decimals; to tens, hundreds … where it is negative. */
function toPlace(value: number, decimals: number): string {
  if (decimals < 0) {
    const unit = 10 ** -decimals;
    return String(Math.round(value / unit) * unit + 0);
  }
  const text = value.toFixed(decimals);
  return Number(text) === 0 ? text.replace('-', '') : text;
}
