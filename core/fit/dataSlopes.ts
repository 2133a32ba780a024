/**
 * Size of d reading/dV at every point, from the neighbours alone, in
 * unit/mL: good enough to weigh points before there is a curve.
 * Points may come in any order; doubled volumes are skipped over.
 */
export function dataSlopes(volumes: Float64Array, readings: Float64Array): Float64Array {
  const order = Array.from(volumes.keys()).sort((a, b) => volumes[a] - volumes[b]);
  const slopes = new Float64Array(volumes.length);
  for (let k = 0; k < order.length; k++) {
    const here = order[k];
    let before = k;
    while (before > 0 && volumes[order[before]] === volumes[here]) before--;
    let after = k;
    while (after < order.length - 1 && volumes[order[after]] === volumes[here]) after++;
    const span = volumes[order[after]] - volumes[order[before]];
    if (span > 0) slopes[here] = Math.abs(readings[order[after]] - readings[order[before]]) / span;
  }
  return slopes;
}
