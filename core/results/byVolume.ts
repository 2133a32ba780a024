/** Positions in order of rising volume; of points at the same volume, the earlier first. */
export function byVolume(volumes: Float64Array): number[] {
  return Array.from(volumes.keys()).sort((a, b) => volumes[a] - volumes[b] || a - b);
}
