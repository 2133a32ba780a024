import type { Problem } from '../model/problem.ts';
import { type CovarianceEstimate, covarianceOf, estimateCovariance } from './covariance.ts';
import { dataSlopes } from './dataSlopes.ts';
import { type EstimatedPart, estimateNoise, type NoiseEstimate } from './estimateNoise.ts';
import { estimateReadingNoise } from './estimateReadingNoise.ts';
import { solveLeastSquares } from './leastSquares.ts';
import { type EndingCode, endings } from './leastSquaresEnding.ts';
import { declaredNoise, type Noise, noiseAt } from './noise.ts';
import { readingResolution } from './readingResolution.ts';
import { thinnedProblem } from './thinnedProblem.ts';
import { WeightedProblem } from './weightedProblem.ts';

/** Reading noise assumed for the first weights, in pH; the readings correct it at once. */
const firstReadingNoise = 0.02;
/** Runs with more points than this are fitted on so many of them first, which gives all of them a start and weights. */
const longRun = 400;
/** Rounds of weighing and fitting; the weights change the answer little, so that a few suffice. */
const mostRounds = 30;
/** The solution stands still when parameters move by less than this part of their uncertainty. */
const standstill = 1e-4;
/** The same for the noise, relative. */
const noiseStandstill = 1e-4;
/** Refits after the restricted likelihood has corrected the noise, and the correction that asks for none, relative. */
const mostCorrections = 3;
const smallestCorrection = 2e-3;
/** Weights that move the solution by more than this part of the last move are taken up more slowly from then on. */
const slowdown = 0.5;
const slowestPace = 0.5;
/** Cost tolerance while the weights still change; what it leaves over the next round takes up. */
const roughCostTolerance = 1e-5;
/** Change of the whitened residuals, in standard uncertainties, that no longer matters. */
const residualResolution = 1e-6;
/** No constant moves by more than this in one step, in pH, lest it lands where the run says nothing. */
const constantStepLimit = 2;
/** No declared knowledge moves by more than this in one step, in standard uncertainties. */
const knowledgeStepLimit = 4;

/** Noise of one run as it stands in the fit. */
export interface RunNoise extends Noise {
  /** Parts that were estimated from the run, with the covariance of their logarithms, row by row. */
  readonly parts: readonly EstimatedPart[];
  readonly logCovariance: readonly number[];
  readonly declared: boolean;
  /** Points minus what the data determined; not always a whole number. */
  readonly degreesOfFreedom: number;
  /** Whitened sum of squares over degrees of freedom; null where none is left. */
  readonly reducedChiSquare: number | null;
}

export interface ProblemFit {
  readonly ending: EndingCode;
  readonly parameters: Float64Array;
  /** Σ of squared whitened residuals, knowledge included; null where the curve could not be computed. */
  readonly cost: number | null;
  /** At the solution: curves, slopes and weights of every run. */
  readonly weighted: WeightedProblem;
  readonly residuals: Float64Array;
  readonly jacobian: Float64Array;
  /** The same before whitening, for other weights. */
  readonly plainJacobian: Float64Array;
  readonly covariance: CovarianceEstimate;
  readonly noise: readonly RunNoise[];
}

/**
 * Fits a problem from one start. The weight of a volume error follows the
 * slope of the curve, and undeclared noise follows the residuals, so that
 * weighing and fitting alternate until the solution stands still; restricted
 * likelihood then sets undeclared noise, and the last weights are frozen.
 *
 * @param start one number per parameter of the problem
 */
export function fitProblem(problem: Problem, start: Float64Array): ProblemFit {
  const weighted = new WeightedProblem(problem);
  const { runs } = weighted;
  const declarations = runs.map(({ run }) => declaredNoise(run.sheet, run.design.nernstSlope_mV));
  const smallest = runs.map(({ run }) => readingResolution(run.readings) / Math.sqrt(12));
  const stepLimits = stepLimitsOf(problem);
  let readings = declarations.map((declaration, r) => {
    const { readingKind, nernstSlope_mV } = runs[r].run.design;
    return declaration.kind === 'declared'
      ? declaration.reading
      : firstReadingNoise * (readingKind === 'mV' ? nernstSlope_mV : 1);
  });
  let estimates: readonly NoiseEstimate[] | null = null;
  const noises = () => runs.map((_, r) => estimates?.[r].noise ?? noiseAt(declarations[r], readings[r]));
  let parameters = start;
  let rough = true;
  const few = thinnedProblem(problem, longRun);
  const preliminary = few === problem ? null : fitProblem(few, start);
  if (preliminary !== null && endings[preliminary.ending].usable) {
    parameters = preliminary.parameters;
    readings = preliminary.noise.map(({ reading }) => reading);
    weighted.residuals(parameters, new Float64Array(weighted.residualCount));
    weighted.weigh(noises(), 1);
    rough = false;
  } else
    runs.forEach(({ run, slopes, whitening }, r) => {
      slopes.set(dataSlopes(run.volumes, run.readings));
      whitening.set(noiseAt(declarations[r], readings[r]), slopes);
    });

  let previousMove = Number.POSITIVE_INFINITY;
  let pace = 1;
  let corrections = 0;
  for (let round = 0; ; round++) {
    const result = solveLeastSquares(weighted, parameters, {
      stepLimits,
      residualResolution,
      ...(rough ? { costTolerance: roughCostTolerance, iterationLimit: 60 } : { iterationLimit: 200 }),
    });
    const usable = endings[result.ending].usable || (rough && result.ending === 'iteration-limit');
    const covariance = estimateCovariance(result.jacobian, weighted.residualCount, weighted.parameterCount);
    const moved = largestMove(parameters, result.parameters, covariance);
    parameters = result.parameters;
    const freedom = runs.map((_, r) => degreesOfFreedom(weighted, r, result.jacobian, covariance));
    // Curves and values belong to the point asked last, which need not be the solution.
    weighted.residuals(parameters, result.residuals);

    const finish = (): ProblemFit => ({
      ...result,
      parameters,
      weighted,
      plainJacobian: plainJacobianAt(weighted, parameters, result.ending),
      covariance,
      noise: runs.map((_, r) => ({
        ...(estimates?.[r].noise ?? noiseAt(declarations[r], readings[r])),
        parts: estimates?.[r].parts ?? [],
        logCovariance: estimates?.[r].logCovariance ?? [],
        declared: declarations[r].kind === 'declared',
        degreesOfFreedom: freedom[r],
        reducedChiSquare: freedom[r] > 0 ? sumOfSquares(weighted, r, result.residuals) / freedom[r] : null,
      })),
    });
    if (!usable) return finish();
    if (round === mostRounds) return { ...finish(), ending: 'iteration-limit' };

    if (estimates === null) {
      const plain = new Float64Array(weighted.residualCount);
      weighted.writePlainResiduals(parameters, plain);
      const next = readings.map((reading, r) => {
        const { whitening, slopes, firstResidual } = runs[r];
        if (!(freedom[r] > 0)) return reading;
        const misses = plain.slice(firstResidual, firstResidual + slopes.length);
        return estimateReadingNoise(declarations[r], misses, whitening, slopes, freedom[r], smallest[r]);
      });
      const noiseMoved = next.some((reading, r) => Math.abs(reading / readings[r] - 1) > noiseStandstill);
      const stands = !rough && moved < standstill && !noiseMoved;
      if (stands && declarations.every(({ kind }) => kind === 'declared')) return finish();
      // Where the model is far from the readings, full weights can swing from one solution to another and back.
      if (round > 1 && moved > slowdown * previousMove) pace = Math.max(slowestPace, 0.5 * pace);
      previousMove = moved;
      readings = readings.map((reading, r) => (pace === 1 ? next[r] : reading * (next[r] / reading) ** pace));
      if (stands && freedom.every((value) => value > 0))
        estimates = estimateNoise(weighted, parameters, declarations, readings, smallest);
      else if (stands) return finish();
    } else {
      const before = estimates;
      const next = estimateNoise(weighted, parameters, declarations, readings, smallest);
      const corrected = next.some(({ noise }, r) => largestCorrection(noise, before[r].noise) > smallestCorrection);
      corrections++;
      if (!corrected || corrections >= mostCorrections) return finish();
      estimates = next;
    }
    weighted.weigh(noises(), rough ? 1 : pace);
    rough = false;
  }
}

/** Derivatives without weights at the solution, where the model stands already unless its last trial was refused. */
function plainJacobianAt(weighted: WeightedProblem, parameters: Float64Array, ending: EndingCode): Float64Array {
  const jacobian = new Float64Array(weighted.residualCount * weighted.parameterCount);
  if (ending === 'start-not-computable' || parameters.length === 0) return jacobian;
  weighted.derivatives(parameters, jacobian);
  weighted.writePlainJacobian(jacobian);
  return jacobian;
}

/** Points of a run minus the directions that they determined: the sum of 1 − leverage over its readings. */
function degreesOfFreedom(
  weighted: WeightedProblem,
  run: number,
  jacobian: Float64Array,
  { covariance }: CovarianceEstimate,
): number {
  const { firstResidual, predicted } = weighted.runs[run];
  const { parameterCount, residualCount } = weighted;
  let determined = 0;
  for (let a = 0; a < parameterCount; a++)
    for (let b = 0; b <= a; b++) {
      let product = 0;
      for (let i = firstResidual; i < firstResidual + predicted.length; i++)
        product += jacobian[a * residualCount + i] * jacobian[b * residualCount + i];
      determined += (a === b ? 1 : 2) * product * covariance[a * parameterCount + b];
    }
  return predicted.length - determined;
}

function sumOfSquares(weighted: WeightedProblem, run: number, residuals: Float64Array): number {
  const { firstResidual, predicted } = weighted.runs[run];
  let sum = 0;
  for (let i = firstResidual; i < firstResidual + predicted.length; i++) sum += residuals[i] ** 2;
  return sum;
}

function largestCorrection(noise: Noise, before: Noise): number {
  const change = (to: number, from: number) => (from > 0 ? Math.abs(to / from - 1) : 0);
  return Math.max(change(noise.reading, before.reading), change(noise.setting_mL, before.setting_mL));
}

/** Largest change of a determined parameter in units of its uncertainty. */
function largestMove(from: Float64Array, to: Float64Array, estimate: CovarianceEstimate): number {
  let largest = 0;
  for (let j = 0; j < from.length; j++) {
    const variance = covarianceOf(estimate, j, j);
    if (variance !== null && variance > 0) largest = Math.max(largest, Math.abs(to[j] - from[j]) / Math.sqrt(variance));
  }
  return largest;
}

function stepLimitsOf(problem: Problem): Float64Array {
  const limits = Float64Array.from(problem.parameters, ({ kind }) =>
    kind === 'knowledge' ? knowledgeStepLimit : Number.POSITIVE_INFINITY,
  );
  for (const { design, bindings } of problem.runs)
    design.quantities.forEach(({ role }, q) => {
      const binding = bindings[q];
      if (role.kind === 'acidity' && binding.kind === 'parameter') limits[binding.parameter] = constantStepLimit;
    });
  return limits;
}
