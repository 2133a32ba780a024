const LONGEST_SHOWN = 40;

/**
 * What stood in a cell, in quotes, for a message: shortened, with control
 * characters made visible, so that a hostile cell cannot disturb what shows it.
 */
export function quoteCell(cell: string): string {
  const trimmed = cell.trim();
  const short = trimmed.length > LONGEST_SHOWN ? `${trimmed.slice(0, LONGEST_SHOWN - 1)}…` : trimmed;
  return `"${short.replace(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}]/gu, '·')}"`;
}
