import type { Peak } from './findPeaks.ts';
import type { LocalDerivative } from './localDerivative.ts';
import { addWeights, type LocalPolynomial, localPolynomial } from './localPolynomial.ts';

/** The top of a maximum of the slope and the place of the maximum in it. */
export interface PeakTop {
  /** First and last point of the top, as positions in the arrays of the derivative. */
  readonly first: number;
  readonly last: number;
  /** Maximum of the parabola through the top, mL. */
  readonly volume_mL: number;
  /**
   * Derivative of `volume_mL` with respect to the height at each point of the
   * top; null where the parabola has no maximum inside and the highest point stands in.
   */
  readonly toHeights: Float64Array | null;
}

/** Places that exceed the higher col by this share of the rise belong to the top; the two neighbours always do. */
const TOP_SHARE = 0.6;

/**
 * Maximum of the least-squares parabola through the top of a peak: through
 * three points where the peak is sharp, through many where it is broad.
 *
 * @param heights slopes of the derivative, taken positive in the direction of the run
 */
export function peakTop(derivative: LocalDerivative, heights: Float64Array, peak: Peak): PeakTop {
  const { volumes } = derivative;
  const col = Math.max(heights[peak.colBefore], heights[peak.colAfter]);
  const enough = col + TOP_SHARE * (heights[peak.at] - col);
  let first = peak.at - 1;
  let last = peak.at + 1;
  while (first > 0 && heights[first - 1] >= enough && heights[first] >= enough) first--;
  while (last < heights.length - 1 && heights[last + 1] >= enough && heights[last] >= enough) last++;
  const centre = volumes[peak.at];
  const at: LocalPolynomial = { value: 0, slope: 0, curvature: 0, valueGain: 0, slopeGain: 0 };
  const defined = localPolynomial(volumes, heights, first, last, centre, 2, at);
  const volume_mL = centre - at.slope / at.curvature;
  if (!defined || !(at.curvature < 0) || volume_mL < volumes[first] || volume_mL > volumes[last]) {
    return { first, last, volume_mL: centre, toHeights: null };
  }
  const toHeights = new Float64Array(last - first + 1);
  const topVolumes = volumes.subarray(first, last + 1);
  const bySlope = -1 / at.curvature;
  const byCurvature = at.slope / at.curvature ** 2;
  addWeights(topVolumes, 0, last - first, centre, 2, bySlope, byCurvature, toHeights);
  return { first, last, volume_mL, toHeights };
}
