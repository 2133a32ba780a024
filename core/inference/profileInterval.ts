import { type CovarianceEstimate, covarianceOf } from '../fit/covariance.ts';
import { solveLeastSquares } from '../fit/leastSquares.ts';
import { endings } from '../fit/leastSquaresEnding.ts';
import type { LeastSquaresProblem } from '../fit/leastSquaresProblem.ts';
import { HeldProblem } from './heldProblem.ts';

/** Refits on one side before the search for its end is given up. */
const mostRefits = 14;
/** The end is found when the profile there is this close to its threshold, relative. */
const endTolerance = 5e-3;
/** Each step outward at most doubles the distance. */
const largestGrowth = 2;
/** Change of the whitened residuals, in standard uncertainties, that no longer matters in a refit. */
const residualResolution = 1e-3;
const costTolerance = 1e-8;
/** A profile that rises by less than this while the distance doubles will not close. */
const flatRise = 0.02;
/** A profile that is flat this many times as far out as it should have closed will not close. */
const farOut = 8;
/** A refit that ends below the minimum by more than this part of the threshold shows that it was none. */
const lowerMinimum = 1e-3;

/** One refit with the parameter held. */
export interface ProfilePoint {
  readonly value: number;
  /** Rise of the cost above its minimum. */
  readonly rise: number;
}

/** A minimum with frozen weights, about which profiles are taken. */
export interface FrozenMinimum {
  readonly problem: LeastSquaresProblem;
  readonly parameters: Float64Array;
  readonly cost: number;
  readonly covariance: CovarianceEstimate;
}

/** Interval of one parameter by profile likelihood; null on a side where the profile never reaches its threshold. */
export interface ProfileInterval {
  readonly lower: number | null;
  readonly upper: number | null;
  /** Refits made, in order of rising value, the minimum included. */
  readonly points: readonly ProfilePoint[];
  /** Parameters of a refit that ended below the minimum; null where the minimum stood. */
  readonly better: Float64Array | null;
}

/**
 * Profile-likelihood interval of a parameter: the values at which the cost,
 * minimised over all other parameters, rises by `threshold` above its minimum.
 * The covariance of the noise stays frozen at the solution. Source: Venzon,
 * D. J.; Moolgavkar, S. H., Appl. Statist. 37 (1988) 87–94.
 *
 * @param threshold square of the quantile: t² with the degrees of freedom of the noise, or χ² with one
 * @param range values outside which the parameter means nothing
 */
export function profileInterval(
  minimum: FrozenMinimum,
  parameter: number,
  threshold: number,
  range: readonly [number, number],
): ProfileInterval {
  const side = new ProfileSide(minimum, parameter, threshold);
  const estimate = minimum.parameters[parameter];
  const lower = side.findEnd(-1, estimate - range[0]);
  const upper = side.findEnd(1, range[1] - estimate);
  const points = [...side.points, { value: estimate, rise: 0 }].sort((a, b) => a.value - b.value);
  return { lower, upper, points, better: side.better };
}

/** The search for the ends of one profile. */
class ProfileSide {
  readonly points: ProfilePoint[] = [];
  better: Float64Array | null = null;

  private readonly minimum: FrozenMinimum;
  private readonly held: HeldProblem;
  private readonly estimate: number;
  private readonly threshold: number;
  private readonly spread: number;
  private readonly slopes: Float64Array;
  private leastRise: number;

  constructor(minimum: FrozenMinimum, parameter: number, threshold: number) {
    const { problem, parameters, covariance } = minimum;
    this.minimum = minimum;
    this.held = new HeldProblem(problem, parameter);
    this.estimate = parameters[parameter];
    this.threshold = threshold;
    const variance = covarianceOf(covariance, parameter, parameter);
    this.spread = variance === null ? Number.POSITIVE_INFINITY : Math.sqrt(variance);
    this.slopes = slopesAlong(covariance, parameter);
    this.leastRise = -lowerMinimum * threshold;
  }

  /** @param limit distance beyond which the parameter means nothing */
  findEnd(direction: 1 | -1, limit: number): number | null {
    if (!(limit > 0)) return null;
    const target = Math.sqrt(this.threshold);
    const start = this.held.narrowed(this.minimum.parameters);
    let distance = Math.min(limit, Number.isFinite(this.spread) ? target * this.spread : 0.1 * limit);
    // The root of the rise is nearly straight in the distance: what is known of it below and above the target.
    let below = { distance: 0, root: 0, parameters: start };
    let above: { distance: number; root: number } | null = null;
    for (let refit = 0; refit < mostRefits; refit++) {
      const at = this.estimate + direction * distance;
      const moved = direction * (distance - below.distance);
      const { rise, parameters } = this.refit(
        at,
        below.parameters.map((value, j) => value + moved * this.slopes[j]),
      );
      const root = Math.sqrt(Math.max(0, rise));
      if (Math.abs(root - target) <= endTolerance * target) return at;
      if (root > target) {
        above = { distance, root };
      } else {
        const isFlat = distance >= 1.5 * below.distance && rise - below.root ** 2 < flatRise * this.threshold;
        if (distance >= limit || (below.distance > 0 && isFlat && distance > farOut * target * this.spread))
          return null;
        below = { distance, root, parameters };
      }
      distance = nextDistance(below, above, target, limit);
    }
    // The bracket is narrow by now, and its middle as good as its ends.
    return above === null ? null : this.estimate + direction * 0.5 * (below.distance + above.distance);
  }

  private refit(at: number, start: Float64Array): { rise: number; parameters: Float64Array } {
    this.held.hold(at);
    const result = solveLeastSquares(this.held, start, { residualResolution, costTolerance, iterationLimit: 60 });
    if (result.cost === null || !endings[result.ending].usable)
      return {
        rise: result.cost === null ? Number.POSITIVE_INFINITY : result.cost - this.minimum.cost,
        parameters: start,
      };
    const rise = result.cost - this.minimum.cost;
    this.points.push({ value: at, rise });
    if (rise < this.leastRise) {
      this.leastRise = rise;
      this.better = this.held.widened(result.parameters).slice();
    }
    return { rise, parameters: result.parameters };
  }
}

function nextDistance(
  below: { distance: number; root: number },
  above: { distance: number; root: number } | null,
  target: number,
  limit: number,
): number {
  if (above === null || !Number.isFinite(above.root)) {
    const ceiling =
      above === null ? Math.min(limit, largestGrowth * below.distance) : 0.5 * (below.distance + above.distance);
    const straight = below.root > 0 ? (below.distance * target) / below.root : ceiling;
    return Math.min(ceiling, Math.max(straight, 1.05 * below.distance));
  }
  const share = (target - below.root) / (above.root - below.root);
  // Never closer than a tenth to either end of the bracket.
  return below.distance + Math.min(0.9, Math.max(0.1, share)) * (above.distance - below.distance);
}

/** How the other parameters move with the held one along the valley, from the covariance. */
function slopesAlong({ covariance, parameterCount }: CovarianceEstimate, parameter: number): Float64Array {
  const variance = covariance[parameter * parameterCount + parameter];
  const slopes: number[] = [];
  for (let j = 0; j < parameterCount; j++)
    if (j !== parameter) slopes.push(variance > 0 ? covariance[j * parameterCount + parameter] / variance : 0);
  return Float64Array.from(slopes);
}
