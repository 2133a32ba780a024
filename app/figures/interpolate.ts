/**
 * Straight line between the neighbours; null outside the grid.
 *
 * @param x rising
 * @param y as many
 */
export function interpolate(x: Float64Array, y: Float64Array, at: number): number | null {
  const last = x.length - 1;
  if (last < 0 || !(at >= x[0] && at <= x[last])) return null;
  let low = 0;
  let high = last;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (x[middle] <= at) low = middle;
    else high = middle;
  }
  const width = x[high] - x[low];
  return width > 0 ? y[low] + ((at - x[low]) / width) * (y[high] - y[low]) : y[high];
}
