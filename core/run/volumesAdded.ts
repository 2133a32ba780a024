import type { VolumeMeaning } from './readingChoices.ts';

export interface VolumesAdded {
  /** Volume added at each row, mL; NaN where it is not known. */
  readonly added_mL: Float64Array;
  /** Position of the first row whose own addition is not known, although later ones are; -1 where there is none. */
  readonly firstGap: number;
}

/** Digits that survive sums and differences of what a burette shows; more would print rounding errors. */
const DIGITS = 12;

/** From what the burette column shows in one run, in mL and in the order of the file, to the volume added so far. */
export function volumesAdded(shown_mL: Float64Array, meaning: VolumeMeaning): VolumesAdded {
  if (meaning === 'cumulative') return { added_mL: shown_mL, firstGap: -1 };
  const added_mL = new Float64Array(shown_mL.length);
  if (meaning === 'increments') {
    let sum = 0;
    let gap = -1;
    let firstGap = -1;
    for (let row = 0; row < shown_mL.length; row++) {
      if (Number.isNaN(shown_mL[row])) {
        if (gap < 0) gap = row;
        added_mL[row] = Number.NaN;
        continue;
      }
      if (gap >= 0 && firstGap < 0) firstGap = gap;
      sum = rounded(sum + shown_mL[row]);
      added_mL[row] = sum;
    }
    return { added_mL, firstGap };
  }
  const start = shown_mL.find((value) => !Number.isNaN(value)) ?? 0;
  for (let row = 0; row < shown_mL.length; row++) {
    const difference = meaning === 'burette' ? shown_mL[row] - start : start - shown_mL[row];
    // Plus zero: minus zero would be shown as "-0".
    added_mL[row] = rounded(difference) + 0;
  }
  return { added_mL, firstGap: -1 };
}

function rounded(value: number): number {
  return Number(value.toPrecision(DIGITS));
}
