/** A maximum between two cols, as positions in the arrays it was found in. */
export interface Peak {
  readonly at: number;
  /** The lowest place between this peak and the next higher ground on either side. */
  readonly colBefore: number;
  readonly colAfter: number;
}

/** A peak must exceed this multiple of each of its cols … */
const PROMINENCE = 1.2;
/** … by this many standard deviations. There are many places at which noise could make a bump, so four are needed. */
const SIGNIFICANCE = 4;

/**
 * Maxima that stand out from both sides. One at either end of the arrays does
 * not count: nothing shows that it is over.
 *
 * @param heights for example slopes, taken positive in the direction of the run
 * @param u standard uncertainty of each height
 */
export function findPeaks(heights: Float64Array, u: Float64Array): Peak[] {
  const n = heights.length;
  const peaks: Peak[] = [];
  for (let i = 1; i < n - 1; i++) {
    // On a level top its first point stands for all of it.
    if (!(heights[i] > heights[i - 1]) || heights[i] < heights[i + 1]) continue;
    const colBefore = colTowards(heights, u, i, -1);
    const colAfter = colTowards(heights, u, i, 1);
    if (colBefore >= 0 && colAfter >= 0) peaks.push({ at: i, colBefore, colAfter });
  }
  return peaks;
}

/**
 * The lowest place on the way from a peak to higher ground or to the end that
 * the peak surely stands above, or −1.
 */
function colTowards(heights: Float64Array, u: Float64Array, peak: number, step: 1 | -1): number {
  let lowest = -1;
  for (let j = peak + step; j >= 0 && j < heights.length && heights[j] <= heights[peak]; j += step) {
    if (lowest >= 0 && heights[j] >= heights[lowest]) continue;
    const excess = heights[peak] - PROMINENCE * heights[j];
    if (excess > 0 && excess >= SIGNIFICANCE * Math.hypot(u[peak], PROMINENCE * u[j])) lowest = j;
  }
  return lowest;
}
