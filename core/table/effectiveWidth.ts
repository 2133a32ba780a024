/** Number of cells up to the last filled one: many exports end every row with an empty cell. */
export function effectiveWidth(cells: readonly string[]): number {
  let width = cells.length;
  while (width > 0 && cells[width - 1].trim() === '') width -= 1;
  return width;
}
