/** What stands where there is no number. */
const dash = '–';

/** More decimals than this say nothing a chemist can use; smaller numbers are written with a power of ten. */
const mostDecimals = 10;

/** A number rounded for reading, with its uncertainty to the same decimal. */
export interface FormattedQuantity {
  readonly value: string;
  /** Null where there is no uncertainty. */
  readonly u: string | null;
}

/**
 * The one place where results are rounded: the uncertainty to two significant digits, the value to the same decimal;
 * without an uncertainty the value to `digitsWithoutU` significant digits.
 */
export function formatQuantity(value: number | null, u: number | null, digitsWithoutU = 5): FormattedQuantity {
  if (value === null) return { value: dash, u: null };
  if (u === null || !(u > 0)) return { value: formatSignificant(value, digitsWithoutU), u: null };
  const decimals = decimalsFor(u, 2);
  if (decimals > mostDecimals) {
    const exponent = Math.floor(Math.log10(Math.max(Math.abs(value), u)));
    const scale = 10 ** exponent;
    const inner = Math.max(0, decimals + exponent);
    const mantissa = withMinus((value / scale).toFixed(inner));
    return { value: `${mantissa}${powerOfTen(exponent)}`, u: `${(u / scale).toFixed(inner)}${powerOfTen(exponent)}` };
  }
  return {
    value: formatDecimals(roundTo(value, decimals), decimals),
    u: formatDecimals(roundTo(u, decimals), decimals),
  };
}

/** A number with a given number of decimals; negative numbers get a minus sign, not a hyphen. */
export function formatDecimals(value: number, decimals: number): string {
  const text = value.toFixed(Math.min(20, Math.max(0, decimals)));
  return withMinus(/^-0(\.0*)?$/.test(text) ? text.slice(1) : text);
}

/** A number to significant digits, without zeros that say nothing. */
export function formatSignificant(value: number, digits: number): string {
  if (value === 0) return '0';
  const exponent = Math.floor(Math.log10(Math.abs(value)));
  if (exponent < -4 || exponent > 6) {
    const mantissa = (value / 10 ** exponent).toPrecision(digits).replace(/\.?0+$/, '');
    return `${withMinus(mantissa)}${powerOfTen(exponent)}`;
  }
  return withMinus(String(Number(value.toPrecision(digits))));
}

/** A number as it was declared, with at least so many decimals. */
export function formatDeclared(value: number, leastDecimals: number): string {
  const short = String(value);
  if (/e/.test(short)) return formatSignificant(value, 6);
  const decimals = short.split('.')[1]?.length ?? 0;
  return formatDecimals(value, Math.max(decimals, leastDecimals));
}

/** Decimals that show `value` to so many significant digits. */
function decimalsFor(value: number, digits: number): number {
  const exponent = Math.floor(Math.log10(value));
  // 0.0996 rounds up to 0.10, which has a digit more than its logarithm says.
  const rounded = Number(value.toPrecision(digits));
  return digits - 1 - Math.max(exponent, Math.floor(Math.log10(rounded)));
}

/** Rounds to tens and hundreds too, where decimals are negative. */
function roundTo(value: number, decimals: number): number {
  if (decimals >= 0) return value;
  const unit = 10 ** -decimals;
  return Math.round(value / unit) * unit;
}

function withMinus(text: string): string {
  return text.replace('-', '−');
}

function powerOfTen(exponent: number): string {
  const digits = '⁰¹²³⁴⁵⁶⁷⁸⁹';
  const raised = [...String(Math.abs(exponent))].map((digit) => digits[Number(digit)]).join('');
  return ` × 10${exponent < 0 ? '⁻' : ''}${raised}`;
}
