import { bindingTerms, boundValue } from '../model/binding.ts';
import type { Problem, ProblemRun } from '../model/problem.ts';
import { RunModel } from '../model/runModel.ts';
import type { LeastSquaresProblem } from './leastSquaresProblem.ts';
import { Whitening } from './whitening.ts';

/** One run inside a weighted problem; arrays have one entry per point unless said otherwise. */
export interface WeightedRun {
  readonly run: ProblemRun;
  readonly model: RunModel;
  /** Position of its first residual. */
  readonly firstResidual: number;
  /** Values of all quantities at the parameters evaluated last. */
  readonly values: Float64Array;
  /** Predicted readings there. */
  readonly predicted: Float64Array;
  /** d reading / d burette volume as it weighs the volume errors, unit/mL; see `refreshSlopes`. */
  readonly slopes: Float64Array;
  /** Covariance of its residuals; set by whoever weighs the points. */
  readonly whitening: Whitening;
}

/**
 * A problem as the engine sees it: readings of all runs, whitened,
 * then one residual of weight one for every δ of declared knowledge.
 */
export class WeightedProblem implements LeastSquaresProblem {
  readonly problem: Problem;
  readonly runs: readonly WeightedRun[];
  readonly parameterCount: number;
  readonly residualCount: number;
  /** Number of residuals that come from readings; those of knowledge follow. */
  readonly readingCount: number;

  /** How often curves and derivatives were computed from the model, for the benchmark. */
  curveEvaluations = 0;
  derivativeEvaluations = 0;

  private readonly knowledge: readonly number[];
  /** Parameters of the last derivatives; curve and derivatives there are kept, since new weights only rescale them. */
  private readonly keptParameters: Float64Array;
  private readonly keptCurves: readonly Float64Array[];
  /** Per run: quantities that move, with the parameters that move them. */
  private readonly moving: readonly {
    readonly wanted: Int32Array;
    readonly terms: readonly (readonly { readonly parameter: number; readonly sensitivity: number }[])[];
    readonly derivatives: Float64Array;
    readonly slopes: Float64Array;
  }[];

  constructor(problem: Problem) {
    this.problem = problem;
    this.parameterCount = problem.parameters.length;
    this.knowledge = problem.parameters.flatMap((parameter, index) => (parameter.kind === 'knowledge' ? [index] : []));
    let firstResidual = 0;
    this.runs = problem.runs.map((run) => {
      const count = run.volumes.length;
      const weighted: WeightedRun = {
        run,
        model: new RunModel(run.design, run.volumes, run.readings),
        firstResidual,
        values: new Float64Array(run.design.quantities.length),
        predicted: new Float64Array(count),
        slopes: new Float64Array(count),
        whitening: new Whitening(run.volumes),
      };
      firstResidual += count;
      return weighted;
    });
    this.readingCount = firstResidual;
    this.residualCount = firstResidual + this.knowledge.length;
    this.keptParameters = new Float64Array(this.parameterCount).fill(Number.NaN);
    this.keptCurves = this.runs.map(({ predicted }) => new Float64Array(predicted.length));
    this.moving = this.runs.map(({ run }) => {
      const terms = run.bindings.map(bindingTerms);
      const wanted = Int32Array.from(terms.flatMap((list, quantity) => (list.length > 0 ? [quantity] : [])));
      return {
        wanted,
        terms: Array.from(wanted, (quantity) => terms[quantity]),
        derivatives: new Float64Array(wanted.length * run.volumes.length),
        slopes: new Float64Array(run.volumes.length),
      };
    });
  }

  residuals(parameters: Float64Array, residuals: Float64Array): boolean {
    const kept = this.isKept(parameters);
    if (!kept) this.curveEvaluations++;
    for (let r = 0; r < this.runs.length; r++) {
      const { run, model, values, predicted, whitening, firstResidual } = this.runs[r];
      for (let q = 0; q < values.length; q++) values[q] = boundValue(run.bindings[q], parameters);
      if (kept) predicted.set(this.keptCurves[r]);
      else if (!model.predict(values, predicted)) return false;
      for (let i = 0; i < predicted.length; i++) residuals[firstResidual + i] = predicted[i] - run.readings[i];
      whitening.apply(residuals, firstResidual);
    }
    this.writeKnowledge(parameters, residuals);
    return true;
  }

  /** Writes the residuals of declared knowledge behind those of the readings. */
  writeKnowledge(parameters: Float64Array, residuals: Float64Array): void {
    this.knowledge.forEach((parameter, k) => {
      residuals[this.readingCount + k] = parameters[parameter];
    });
  }

  /** Called directly after `residuals` at the same parameters. */
  derivatives(parameters: Float64Array, jacobian: Float64Array): boolean {
    if (!this.isKept(parameters)) {
      this.derivativeEvaluations++;
      this.runs.forEach(({ model, predicted }, r) => {
        const { wanted, derivatives, slopes } = this.moving[r];
        model.differentiate(wanted, derivatives, slopes);
        this.keptCurves[r].set(predicted);
      });
      this.keptParameters.set(parameters);
    }
    this.writePlainJacobian(jacobian);
    for (const { whitening, firstResidual } of this.runs)
      for (let j = 0; j < this.parameterCount; j++) whitening.apply(jacobian, j * this.residualCount + firstResidual);
    return true;
  }

  /** Writes the derivatives of the readings, not whitened, at the parameters differentiated last, with the rows of knowledge. */
  writePlainJacobian(jacobian: Float64Array): void {
    jacobian.fill(0);
    this.runs.forEach(({ predicted, firstResidual }, r) => {
      const { terms, derivatives } = this.moving[r];
      const count = predicted.length;
      terms.forEach((list, j) => {
        for (const { parameter, sensitivity } of list) {
          const column = parameter * this.residualCount + firstResidual;
          for (let i = 0; i < count; i++) jacobian[column + i] += sensitivity * derivatives[j * count + i];
        }
      });
    });
    this.knowledge.forEach((parameter, k) => {
      jacobian[parameter * this.residualCount + this.readingCount + k] = 1;
    });
  }

  /**
   * Takes the slopes that weigh the volume errors from the curve asked last.
   *
   * @param pace 1 takes the new slopes, less goes part of the way to them
   */
  refreshSlopes(pace: number): void {
    for (const { run, model, slopes } of this.runs) {
      const before = slopes.slice();
      model.slopesAtReadings(run.readings, slopes);
      if (pace === 1) continue;
      for (let i = 0; i < slopes.length; i++) {
        const ratio = Math.abs(slopes[i] / before[i]);
        if (ratio > 0 && Number.isFinite(ratio)) slopes[i] = Math.sign(slopes[i]) * Math.abs(before[i]) * ratio ** pace;
      }
    }
  }

  private isKept(parameters: Float64Array): boolean {
    for (let j = 0; j < parameters.length; j++) if (parameters[j] !== this.keptParameters[j]) return false;
    // A problem without parameters has one point only, but it must be computed once.
    return parameters.length > 0;
  }
}
