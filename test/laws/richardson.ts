/** Within a table each step is smaller than the one before by this factor. */
const shrink = 1.6;
const rows = 8;
/** Each table starts with steps smaller by this factor than the one before. */
const finer = 8;
const tables = 7;

/** Writes the readings at a displacement of the number differentiated by; false where there are none. */
export type ReadingsAt = (displacement: number, readings: Float64Array) => boolean;

/**
 * Derivatives of many readings with respect to one number, by central
 * differences extrapolated to step zero. One table of extrapolations can be
 * deceived by a jump inside its steps; a derivative is believed where two
 * tables, the second of steps eight times smaller, agree. The others stay NaN.
 *
 * @param count number of readings
 * @param largestStep first displacement; the smallest is some 1e-7 of it
 * @param tolerance within which two tables must agree
 */
export function richardson(
  readingsAt: ReadingsAt,
  count: number,
  largestStep: number,
  tolerance: number,
): Float64Array {
  const found = new Float64Array(count).fill(Number.NaN);
  let last: Float64Array | null = null;
  for (let table = 0, step = largestStep; table < tables && found.some(Number.isNaN); table++, step /= finer) {
    const next = extrapolate(readingsAt, count, step);
    if (last !== null && next !== null)
      for (let i = 0; i < count; i++)
        if (Number.isNaN(found[i]) && Math.abs(next[i] - last[i]) < tolerance) found[i] = next[i];
    last = next;
  }
  return found;
}

/** One table after Ridders (1982): the entry that moved least is kept, reading by reading. */
function extrapolate(readingsAt: ReadingsAt, count: number, largestStep: number): Float64Array | null {
  const above = new Float64Array(count);
  const below = new Float64Array(count);
  const best = new Float64Array(count);
  const error = new Float64Array(count).fill(Number.POSITIVE_INFINITY);
  let previous: Float64Array[] = [];
  for (let row = 0, step = largestStep; row < rows; row++, step /= shrink) {
    if (!readingsAt(step, above) || !readingsAt(-step, below)) return null;
    const current = [above.map((reading, i) => (reading - below[i]) / (2 * step))];
    for (let order = 1, factor = shrink ** 2; order <= row; order++, factor *= shrink ** 2) {
      const fine = current[order - 1];
      const coarse = previous[order - 1];
      const extrapolated = fine.map((value, i) => value + (value - coarse[i]) / (factor - 1));
      for (let i = 0; i < count; i++) {
        const moved = Math.max(Math.abs(extrapolated[i] - fine[i]), Math.abs(extrapolated[i] - coarse[i]));
        if (moved < error[i]) {
          error[i] = moved;
          best[i] = extrapolated[i];
        }
      }
      current.push(extrapolated);
    }
    previous = current;
  }
  return best;
}
