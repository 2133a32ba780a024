const SHOWN = 5;

/** "line 7", "lines 7, 9 and 12", "lines 1, 2, 3, 4, 5 and 40 more" for a message. */
export function listLines(lines: readonly number[]): string {
  if (lines.length === 1) return `line ${lines[0]}`;
  if (lines.length > SHOWN) return `lines ${lines.slice(0, SHOWN).join(', ')} and ${lines.length - SHOWN} more`;
  return `lines ${lines.slice(0, -1).join(', ')} and ${lines[lines.length - 1]}`;
}
