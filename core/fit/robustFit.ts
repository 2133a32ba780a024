import { solveLeastSquares } from './leastSquares.ts';
import { endings } from './leastSquaresEnding.ts';
import type { LeastSquaresProblem } from './leastSquaresProblem.ts';
import { RobustProblem } from './robustProblem.ts';
import { robustScale } from './robustScale.ts';

/**
 * Tukey's biweight with the constant that keeps 95 % of the efficiency of least
 * squares under normal errors. Source: Beaton, A. E.; Tukey, J. W.,
 * Technometrics 16 (1974) 147–185; the constant as in Holland, P. W.; Welsch,
 * R. E., Commun. Statist. A 6 (1977) 813–827.
 */
const biweightConstant = 4.685;
/**
 * Standard deviations beyond which a point is not trusted: one normal residual
 * in 16,000 lies there, so that a hundred sound points raise suspicion in one run of 160.
 */
export const distrustCut = 4;
/** Rounds of weighing and fitting, and the change of a weight that asks for no more. */
const mostRounds = 30;
const standstill = 1e-3;
/** Rounds after which the scale is held, so that the weights can settle. */
const scaledRounds = 6;
const residualResolution = 1e-4;

/** The readings of one run among the residuals. */
export interface ScatteredRun {
  readonly firstResidual: number;
  readonly count: number;
  readonly degreesOfFreedom: number;
  /** Declared noise is granted in any case; a larger scatter is taken from the points. */
  readonly isDeclared: boolean;
}

/** A fit in which wild points count less or nothing. */
export interface RobustFit {
  readonly parameters: Float64Array;
  /** Of every reading of the problem, 0–1. */
  readonly weights: Float64Array;
  /** Whitened residuals of all readings there, over the scatter of the trusted ones. */
  readonly ratios: Float64Array;
}

/**
 * Fits a problem again with iteratively reweighted least squares from its
 * solution. The covariance of the readings stays as it is; only its size is
 * taken from the points that belong together. With accumulating errors a
 * residual is what its point adds to the forecast from those before it.
 *
 * @param problem whitened as in the fit, residuals of readings first
 * @returns null where no fit with such weights can be had
 */
export function robustFit(
  problem: LeastSquaresProblem,
  start: Float64Array,
  runs: readonly ScatteredRun[],
): RobustFit | null {
  const readingCount = runs.reduce((sum, { count }) => sum + count, 0);
  const robust = new RobustProblem(problem, readingCount);
  const residuals = new Float64Array(problem.residualCount);
  const weights = new Float64Array(readingCount).fill(1);
  const ratios = new Float64Array(readingCount);
  const scales = new Float64Array(runs.length);
  let parameters = start;
  for (let round = 0; round < mostRounds; round++) {
    if (!problem.residuals(parameters, residuals)) return null;
    let change = 0;
    runs.forEach(({ firstResidual, count, degreesOfFreedom, isDeclared }, r) => {
      const own = residuals.subarray(firstResidual, firstResidual + count);
      if (round < scaledRounds)
        scales[r] = Math.max(isDeclared ? 1 : 0, robustScale(own, degreesOfFreedom, distrustCut));
      own.forEach((residual, k) => {
        const i = firstResidual + k;
        ratios[i] = scales[r] > 0 ? residual / scales[r] : 0;
        const weight = biweight(ratios[i]);
        change = Math.max(change, Math.abs(weight - weights[i]));
        weights[i] = weight;
        robust.roots[i] = Math.sqrt(weight);
      });
    });
    if (change < standstill || parameters.length === 0) break;
    const result = solveLeastSquares(robust, parameters, { residualResolution, iterationLimit: 60 });
    if (!endings[result.ending].usable) return null;
    parameters = result.parameters;
  }
  return { parameters, weights, ratios };
}

function biweight(ratio: number): number {
  const share = ratio / biweightConstant;
  return Math.abs(share) >= 1 ? 0 : (1 - share * share) ** 2;
}
