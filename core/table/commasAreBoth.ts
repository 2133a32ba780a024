/**
 * Whether "0,00,2,51" is what this file holds: nothing but whole numbers
 * between commas, and either a piece such as "00" or "05", which is no whole
 * number anyone writes, or a first column that stands still while the piece
 * after it counts on. `lines` are the data lines, `rows` their cells.
 */
export function commasAreBoth(lines: readonly string[], rows: readonly (readonly string[])[]): boolean {
  if (lines.some((line) => line.includes('.') || line.includes('"'))) return false;
  if (rows.some((cells) => cells.slice(1).some((cell, at) => /^\s*0\d+\s*$/.test(cell) && /\d\s*$/.test(cells[at])))) {
    return true;
  }
  const fourPieces = rows.filter((cells) => cells.length === 4 && cells.every((cell) => /^\s*-?\d+\s*$/.test(cell)));
  if (fourPieces.length < rows.length || rows.length < 4) return false;
  let ties = 0;
  for (let index = 1; index < rows.length; index++) {
    const before = Number(rows[index - 1][0]);
    const now = Number(rows[index][0]);
    if (now < before || (now === before && Number(rows[index][1]) <= Number(rows[index - 1][1]))) return false;
    if (now === before) ties += 1;
  }
  return ties > 0 && rows.every((cells) => cells[1].trim().length === rows[0][1].trim().length);
}
