/** Points in order of volume, one for each distinct volume. */
export interface SortedPoints {
  /** Strictly rising, mL. */
  readonly volumes: Float64Array;
  /** The mean where several readings share a volume. */
  readonly readings: Float64Array;
  /** For each, the index in the input of (the first of) its readings. */
  readonly inputIndex: Int32Array;
}

/**
 * Sorts points by volume and merges those at the same volume, because a slope
 * between them has no meaning. The input is left as it is.
 *
 * @param volumes mL, in any order
 * @param readings pH or mV, as many as volumes; all finite (else it throws: rows that are not numbers never get here)
 */
export function sortedByVolume(volumes: Float64Array, readings: Float64Array): SortedPoints {
  if (volumes.length !== readings.length) {
    throw new RangeError(`${volumes.length} volumes but ${readings.length} readings`);
  }
  if (!volumes.every(Number.isFinite) || !readings.every(Number.isFinite)) {
    throw new RangeError('volumes and readings must be finite');
  }
  const order = Int32Array.from(volumes, (_, i) => i).sort((a, b) => volumes[a] - volumes[b] || a - b);
  const distinct = new Float64Array(order.length);
  const means = new Float64Array(order.length);
  const inputIndex = new Int32Array(order.length);
  let count = 0;
  for (let i = 0; i < order.length; ) {
    const volume = volumes[order[i]];
    let sum = 0;
    let end = i;
    while (end < order.length && volumes[order[end]] === volume) sum += readings[order[end++]];
    distinct[count] = volume;
    means[count] = sum / (end - i);
    inputIndex[count] = order[i];
    count++;
    i = end;
  }
  return {
    volumes: distinct.slice(0, count),
    readings: means.slice(0, count),
    inputIndex: inputIndex.slice(0, count),
  };
}
