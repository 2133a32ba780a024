/**
 * Reads a number as a person types it: decimal point or comma, minus sign or hyphen, exponent; no thousands marks,
 * because "1,000" would then have two meanings. Null where it is not such a number.
 */
export function parseEntry(text: string): number | null {
  const plain = text.trim().replace(/[−–]/, '-').replace(',', '.');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain)) return null;
  const value = Number(plain);
  return Number.isFinite(value) ? value : null;
}
