/** Longer cells are cut where they are shown. */
const LONGEST_SHOWN = 200;

const PLAIN = /^[\p{L}\p{N}\p{P}\p{S} ]*$/u;
const INVISIBLE = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}\p{Co}\p{Cn}]/gu;

/** A cell as it may be shown: shortened, with control characters and marks of direction made visible. */
export function showCell(cell: string): string {
  const short = cell.length > LONGEST_SHOWN ? `${cell.slice(0, LONGEST_SHOWN - 1)}…` : cell;
  return PLAIN.test(short) ? short : short.replace(INVISIBLE, '·');
}
