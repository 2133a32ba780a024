import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import type { EndingCode } from './leastSquaresEnding.ts';
import { defaultLeastSquaresOptions, type LeastSquaresOptions } from './leastSquaresOptions.ts';
import type { LeastSquaresProblem } from './leastSquaresProblem.ts';
import type { LeastSquaresResult } from './leastSquaresResult.ts';
import { createLineariser, type Linearisation, scaledLength } from './linearisation.ts';
import { chooseDamping, isAcceptable, nextRadius, type Trial } from './trustRegion.ts';

/** Steps refused in a row before the search gives up: each at most half as long, so the last is 1e-15 of the first. */
const MAXIMUM_REFUSALS = 50;

/**
 * Changes of the cost below this part of it may be noise: rounding, and what the
 * iterations inside a model leave over (1e-11 in readings of standard
 * uncertainty 0.005 shakes the cost of ten points by 1e-9 of itself).
 */
const COST_NOISE = 1e-8;

/** Steps in a row after which a slope that does not fall, at half the length each time, is taken for noise. */
const MAXIMUM_SLOPE_REFUSALS = 4;

interface Point {
  readonly parameters: Float64Array;
  readonly residuals: Float64Array;
  readonly jacobian: Float64Array;
  /** Sum of squared residuals; not finite where the model could not be computed. */
  cost: number;
}

/**
 * Minimises Σ rᵢ² by the Levenberg–Marquardt method with column scaling and a
 * trust radius (Moré 1978). Residuals are evaluated once at each trial point,
 * derivatives once at each point that is taken. Units of the parameters have no
 * influence, save by rounding.
 *
 * @param start as many finite numbers as the problem has parameters.
 */
export function solveLeastSquares(
  problem: LeastSquaresProblem,
  start: ArrayLike<number>,
  options: LeastSquaresOptions = {},
): LeastSquaresResult {
  const { parameterCount, residualCount } = problem;
  if (start.length !== parameterCount || !Array.from(start).every(Number.isFinite)) {
    throw new Error(`solveLeastSquares: ${parameterCount} finite starting values wanted, got [${Array.from(start)}]`);
  }
  const settings = { ...defaultLeastSquaresOptions, ...options };
  const limits = settings.stepLimits;
  if (limits !== undefined && !(limits.length === parameterCount && Array.from(limits).every((limit) => limit > 0))) {
    throw new Error(`solveLeastSquares: ${parameterCount} positive step limits wanted, got [${Array.from(limits)}]`);
  }
  const linearise = createLineariser(residualCount, parameterCount);
  const counts = { iterations: 0, residualEvaluations: 0, derivativeEvaluations: 0 };
  let here = createPoint(problem);
  let there = createPoint(problem);
  let local: Linearisation | null = null;

  function evaluate(point: Point): boolean {
    if (!point.parameters.every(Number.isFinite)) return false;
    counts.residualEvaluations++;
    const computed = problem.residuals(point.parameters, point.residuals);
    point.cost = computed ? sumOfSquares(point.residuals) : Infinity;
    return Number.isFinite(point.cost);
  }
  function differentiate(point: Point): Linearisation | null {
    counts.derivativeEvaluations++;
    if (!problem.derivatives(point.parameters, point.jacobian)) return null;
    return linearise(point.jacobian, point.residuals, point.cost);
  }
  function finish(ending: EndingCode): LeastSquaresResult {
    const cost = ending === 'start-not-computable' ? null : here.cost;
    return { ending, ...here, cost, rank: local === null ? 0 : local.rank, ...counts };
  }

  here.parameters.set(start);
  if (!evaluate(here)) return finish('start-not-computable');
  if (parameterCount === 0) return finish('no-parameters');
  local = differentiate(here);
  if (local === null) return finish('start-not-computable');

  // A start at the origin says nothing about how long a step may be.
  let radius = settings.initialRadiusFactor * scaledLength(here.parameters, local.scales) || Infinity;
  let refusals = 0;
  let ending = endingAtPoint(local, here.cost, settings);
  while (ending === null) {
    if (counts.iterations >= settings.iterationLimit) return finish('iteration-limit');
    const { cost } = here;
    const step = limitedStep(local, radius, limits);
    radius = step.radius;
    if (!addStep(here.parameters, step.change, there.parameters)) {
      return finish(step.damped ? 'stuck' : 'step-converged');
    }
    counts.iterations++;
    let trial: Trial = { ...step, actual: evaluate(there) ? fallOfCost(here.residuals, there.residuals) : null };
    const drowned = isDrowned(local, trial, cost);
    let next: Linearisation | null = null;
    if (drowned || isAcceptable(trial)) {
      next = differentiate(there);
      if (next === null) trial = { ...trial, actual: null };
    }
    ending = endingAfterTrial(local, trial, cost, scaledLength(here.parameters, local.scales), drowned, settings);
    if (drowned && next !== null) {
      // The change of the cost says nothing here: the step is right if less is left to attain at its end.
      const falls = next.attainable < local.attainable;
      radius = falls ? Math.max(radius, 2 * step.length) : 0.5 * Math.min(radius, step.length);
      if (!falls) next = null;
    } else {
      radius = nextRadius(radius, trial);
    }
    refusals = next === null ? refusals + 1 : 0;
    if (next !== null) {
      [here, there] = [there, here];
      local = next;
      ending ??= endingAtPoint(local, here.cost, settings);
    }
    if (drowned && refusals >= MAXIMUM_SLOPE_REFUSALS) ending ??= 'cost-converged';
    if (refusals >= MAXIMUM_REFUSALS) ending ??= 'stuck';
    const progress = {
      iteration: counts.iterations,
      accepted: next !== null,
      cost: here.cost,
      parameters: here.parameters,
    };
    if (settings.onIteration?.(progress) === true) ending ??= 'stopped';
  }
  return finish(ending);
}

type Settings = typeof defaultLeastSquaresOptions & LeastSquaresOptions;

/** Convergence that shows at a point, before any step from it. */
function endingAtPoint(local: Linearisation, cost: number, settings: Settings): EndingCode | null {
  const { attainable, columnCosine, rank } = local;
  const { gradientTolerance, residualResolution } = settings;
  // Where no parameter has any influence, nothing has been fitted, however flat it is there.
  if (rank === 0) return 'stuck';
  // The columns are asked one by one as well: a column that has nearly vanished
  // counts for little in the common plane, and may yet be far from orthogonal.
  if (Math.sqrt(attainable) <= gradientTolerance * Math.sqrt(cost) && columnCosine <= gradientTolerance) {
    return 'gradient-converged';
  }
  return attainable <= residualResolution ** 2 ? 'cost-converged' : null;
}

/** Whether the change of the cost, seen and to come, is too small to be told from its noise. */
function isDrowned(local: Linearisation, { actual }: Trial, cost: number): boolean {
  return actual !== null && local.attainable <= COST_NOISE * cost && Math.abs(actual) <= COST_NOISE * cost;
}

/** Convergence that shows by a trial step, taken or not, from a point of that cost. */
function endingAfterTrial(
  local: Linearisation,
  trial: Trial,
  cost: number,
  scaledParameters: number,
  drowned: boolean,
  { costTolerance, stepTolerance }: Settings,
): EndingCode | null {
  if (trial.actual === null) return null;
  if (local.attainable <= costTolerance * cost && (drowned || Math.abs(trial.actual) <= costTolerance * cost)) {
    return 'cost-converged';
  }
  // Only an undamped step tells how far the minimum is; a damped one is as short as it was told to be.
  return !trial.damped && trial.length <= stepTolerance * scaledParameters ? 'step-converged' : null;
}

/** A damped step with what the linear problem says of it. */
interface Step extends Omit<Trial, 'actual'> {
  /** Change of each parameter, in its own units. */
  readonly change: Float64Array;
  /** The trust radius that it was made for: the one asked for, or less where a limit of a parameter required it. */
  readonly radius: number;
}

/** The step for a trust radius, with the radius drawn in until every parameter keeps its limit. */
function limitedStep(local: Linearisation, radius: number, limits: ArrayLike<number> | undefined): Step {
  const step = describeStep(local, radius);
  if (limits === undefined) return step;
  let excess = 1;
  for (let j = 0; j < step.change.length; j++) excess = Math.max(excess, Math.abs(step.change[j]) / limits[j]);
  // At least a tenth shorter each time: the radius itself is only kept to a tenth.
  return excess === 1 ? step : limitedStep(local, Math.min(0.9, 1 / excess) * step.length, limits);
}

function describeStep(local: Linearisation, radius: number): Step {
  const { scales, singularValues, rightVectors, projected, rank } = local;
  const damping = chooseDamping(local, radius);
  const principal = takeDampedStep(local, damping);
  let predicted = 0;
  let descent = 0;
  let squares = 0;
  const change = new Float64Array(scales.length);
  for (let k = 0; k < rank; k++) {
    const shift = singularValues[k] * principal[k];
    predicted -= shift * (2 * projected[k] + shift);
    descent -= projected[k] * shift;
    squares += principal[k] ** 2;
    for (let j = 0; j < scales.length; j++) change[j] += rightVectors[k * scales.length + j] * principal[k];
  }
  for (let j = 0; j < scales.length; j++) change[j] = scales[j] === 0 ? 0 : change[j] / scales[j];
  return { change, radius, predicted, descent, length: Math.sqrt(squares), damped: damping > 0 };
}

/**
 * The minimum of ‖S·w + c‖² + λ‖w‖², taken by ml-levenberg-marquardt as one
 * step of a problem of p points (see Linearisation for S and c).
 *
 * In these coordinates the matrix SᵀS + λI that the library makes is diagonal,
 * so that squaring the condition number costs no accuracy, and the size of the
 * call does not depend on the number of residuals.
 */
function takeDampedStep({ singularValues, projected, rank }: Linearisation, damping: number): ArrayLike<number> {
  const count = singularValues.length;
  // The library wants two points at least: an empty equation 0·w = 0 is added to a single one.
  const size = Math.max(2, count);
  const data = { x: Array.from({ length: size }, (_, i) => i), y: new Float64Array(size) };
  for (let k = 0; k < count; k++) data.y[k] = -projected[k];
  const row: number[] = new Array(count).fill(0);
  const model = (w: number[]) => (i: number) => (i < count ? singularValues[i] * w[i] : 0);
  const derivatives = () => (i: number) => {
    row.fill(0);
    if (i < count) row[i] = singularValues[i];
    return row;
  };
  return levenbergMarquardt(data, model, {
    initialValues: new Array(count).fill(0),
    jacobianFunction: derivatives,
    maxIterations: 1,
    // Zero is refused; this much is lost beside the smallest S² in use.
    damping: damping > 0 ? damping : (singularValues[rank - 1] * Number.EPSILON) ** 2,
    // So that the step is neither withheld as needless nor as worthless: that is judged here, on the true cost.
    errorTolerance: -Infinity,
    // The library's own limits are those of whole numbers.
    minValues: new Array(count).fill(-Infinity),
    maxValues: new Array(count).fill(Infinity),
  }).parameterValues;
}

/** Writes the sum; false where it equals the origin in every digit. */
function addStep(origin: Float64Array, change: Float64Array, sum: Float64Array): boolean {
  let moved = false;
  for (let j = 0; j < origin.length; j++) {
    sum[j] = origin[j] + change[j];
    if (sum[j] !== origin[j]) moved = true;
  }
  return moved;
}

function createPoint({ parameterCount, residualCount }: LeastSquaresProblem): Point {
  return {
    parameters: new Float64Array(parameterCount),
    residuals: new Float64Array(residualCount),
    jacobian: new Float64Array(residualCount * parameterCount),
    cost: Infinity,
  };
}

function sumOfSquares(values: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i] * values[i];
  return sum;
}

/** Difference of two sums of squares, summed point by point so that less of it is lost to rounding. */
function fallOfCost(from: Float64Array, to: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < from.length; i++) sum += (from[i] - to[i]) * (from[i] + to[i]);
  return sum;
}
