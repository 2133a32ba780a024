import type { ProblemFit } from '../fit/fitProblem.ts';
import { parameterGradient, uncertaintyOf } from '../fit/uncertaintyOf.ts';
import { WeightedProblem } from '../fit/weightedProblem.ts';
import type { Quantity } from '../model/quantity.ts';
import { studentQuantile } from '../numerics/studentQuantile.ts';
import { coverage } from './coverage.ts';
import { NoiseUncertainty } from './noiseUncertainty.ts';
import { type FrozenMinimum, type ProfilePoint, profileInterval } from './profileInterval.ts';

/** How far beyond the readings a constant still means something, in pH. */
const constantMargin = 8;
/** Bounds of a search where the unit gives none: this many times the value, and more than any titration holds. */
const widestFactor = 20;
const knowledgeRange = 12;

/** What the data say of one quantity. */
export interface QuantityInterval {
  /** Standard uncertainty to first order; null where the data leave the quantity open. */
  readonly u: number | null;
  /** Of the noise behind `u`; Infinity where it was declared. */
  readonly degreesOfFreedom: number;
  /** 95 % interval; either end null where the profile never closes. */
  readonly interval: readonly [number | null, number | null];
  /** The profile in values of the quantity, rising; empty for a quantity that follows from several parameters. */
  readonly points: readonly ProfilePoint[];
}

/** Intervals of all quantities of one run that the fit moves, in the order of its quantities; null for constants. */
export interface Intervals {
  readonly quantities: readonly (QuantityInterval | null)[];
  /** Parameters below the minimum that a profile came upon; null where the minimum stood. */
  readonly better: Float64Array | null;
  /** Curves computed for them, for the benchmark. */
  readonly curveEvaluations: number;
}

/**
 * 95 % intervals by profile likelihood with the weights of the fit frozen.
 *
 * @param pHRange of the readings
 */
export function intervalsOf(fit: ProblemFit, index: number, pHRange: readonly [number, number]): Intervals {
  const minimum = freeze(fit);
  const noise = new NoiseUncertainty(fit);
  const { run, values } = fit.weighted.runs[index];
  let better: Float64Array | null = null;
  const quantities = run.design.quantities.map((quantity, q): QuantityInterval | null => {
    const binding = run.bindings[q];
    if (binding.kind === 'constant') return null;
    const unit = new Float64Array(run.bindings.length);
    unit[q] = 1;
    const gradient = parameterGradient(run, unit, fit.weighted.parameterCount);
    const u = uncertaintyOf(fit.covariance, gradient);
    const degreesOfFreedom = noise.degreesOfFreedom(gradient);
    const factor = studentQuantile(0.5 * (1 + coverage), degreesOfFreedom);
    if (binding.kind === 'known' && binding.terms.length !== 1) {
      const half = u === null ? null : factor * u;
      const interval: [number | null, number | null] =
        half === null ? [null, null] : [values[q] - half, values[q] + half];
      return { u, degreesOfFreedom, interval, points: [] };
    }
    const sensitivity = binding.kind === 'known' ? binding.terms[0].sensitivity : 1;
    const nominal = binding.kind === 'known' ? binding.nominal : 0;
    const parameter = binding.kind === 'known' ? binding.terms[0].parameter : binding.parameter;
    const range =
      binding.kind === 'known' ? ([-knowledgeRange, knowledgeRange] as const) : rangeOf(quantity, values[q], pHRange);
    const profile = profileInterval(minimum, parameter, factor ** 2, range);
    better ??= profile.better;
    const toQuantity = (end: number) => nominal + sensitivity * end;
    const ends = [profile.lower, profile.upper].map((end) => (end === null ? null : toQuantity(end)));
    const points = profile.points.map(({ value, rise }) => ({ value: toQuantity(value), rise }));
    // A negative sensitivity turns the profile round.
    if (sensitivity < 0) {
      ends.reverse();
      points.reverse();
    }
    return { u, degreesOfFreedom, interval: [ends[0], ends[1]], points };
  });
  return { quantities, better, curveEvaluations: minimum.problem.curveEvaluations };
}

/** The minimum with its weights, in a problem of its own, so that profiles leave the fit as it is. */
export function freeze(fit: ProblemFit): FrozenMinimum & { readonly problem: WeightedProblem } {
  const problem = new WeightedProblem(fit.weighted.problem);
  problem.weighLike(fit.weighted, fit.noise);
  const residuals = new Float64Array(problem.residualCount);
  if (!problem.residuals(fit.parameters, residuals)) throw new Error('the curve of a fit can be computed again');
  const cost = residuals.reduce((sum, r) => sum + r * r, 0);
  return { problem, parameters: fit.parameters, cost, covariance: fit.covariance };
}

function rangeOf(
  { role, unit }: Quantity,
  value: number,
  [lowest, highest]: readonly [number, number],
): [number, number] {
  if (role.kind === 'acidity' || role.kind === 'ionProduct') return [lowest - constantMargin, highest + constantMargin];
  const reach = widestFactor * Math.max(Math.abs(value), unit === 'mol/L' ? 0.01 : 1);
  return [value - reach, value + reach];
}
