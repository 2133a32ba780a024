/**
 * Reading at a volume, on the straight line between its neighbours.
 *
 * @param volumes strictly rising, mL
 * @param volume_mL within the volumes (else it throws)
 */
export function readingAt(volumes: Float64Array, readings: Float64Array, volume_mL: number): number {
  if (!(volume_mL >= volumes[0] && volume_mL <= volumes[volumes.length - 1])) {
    throw new RangeError(`${volume_mL} mL lies outside the run`);
  }
  let after = 0;
  while (volumes[after] < volume_mL) after++;
  if (volumes[after] === volume_mL) return readings[after];
  const share = (volume_mL - volumes[after - 1]) / (volumes[after] - volumes[after - 1]);
  return readings[after - 1] + share * (readings[after] - readings[after - 1]);
}
