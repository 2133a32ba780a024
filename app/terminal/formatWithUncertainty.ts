/** Digits of a standard uncertainty that are printed (GUM 7.2.6: two suffice). */
const uncertaintyDigits = 2;
/** Digits of a value without uncertainty. */
const plainDigits = 6;

/** A value with its uncertainty to two digits, both to the same place: "4.7561 ± 0.0023". */
export function formatWithUncertainty(value: number, u: number | null): string {
  if (u === null || !(u > 0)) return String(Number(value.toPrecision(plainDigits)));
  const decimals = Math.max(0, uncertaintyDigits - 1 - Math.floor(Math.log10(u)));
  return decimals > 12
    ? `${value.toPrecision(plainDigits)} ± ${u.toExponential(1)}`
    : `${value.toFixed(decimals)} ± ${u.toFixed(decimals)}`;
}
