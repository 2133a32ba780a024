import type { TableSection } from '../table/table.ts';

/**
 * A short key that files with the same columns share: names, units and number
 * of columns of the table, whatever its rows hold. Equal keys by chance are
 * rarer than one in a billion.
 */
export function headerShape({ width, names, units, captions }: TableSection): string {
  const same = (cells: readonly string[]) => cells.map((cell) => cell.trim().toLowerCase());
  const text = JSON.stringify([same(names), same(units), captions.map((caption) => caption !== '')]);
  return `${width}-${hash(text, 0x811c9dc5)}${hash(text, 0x1b873593)}`;
}

/** FNV-1a over UTF-16 code units, with a mixed end; eight hexadecimal digits. */
function hash(text: string, start: number): string {
  let state = start;
  for (let at = 0; at < text.length; at++) state = Math.imul(state ^ text.charCodeAt(at), 0x01000193);
  state = Math.imul(state ^ (state >>> 15), 0x2c1b3c6d);
  return ((state ^ (state >>> 13)) >>> 0).toString(16).padStart(8, '0');
}
