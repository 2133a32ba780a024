import { bindingTerms, boundValue } from '../model/binding.ts';
import type { Problem, ProblemRun } from '../model/problem.ts';
import { RunModel } from '../model/runModel.ts';
import type { LeastSquaresProblem } from './leastSquaresProblem.ts';
import type { Noise } from './noise.ts';
import { Whitening } from './whitening.ts';

/**
 * A point whose whole uncertainty is this many times that of its reading is
 * compared by volume. Either way is right to first order; by volume, the
 * parameters come in straight where the curve is steep.
 */
const byVolumeFrom = 1.2;
/** Once compared by volume, a point is again compared by reading only below this, lest it go to and fro. */
const byVolumeUntil = 1.1;

/**
 * Change of the whitened residuals, in standard uncertainties per unit of pKa,
 * below which a constant has no influence: moved over the whole scale it would
 * change them by a millionth.
 */
const unseenInfluence = 1e-7;

/** Readings of a curve and the burette volumes at which they were evaluated, mL. */
interface Evaluation {
  readonly readings: Float64Array;
  readonly volumes: Float64Array;
}

/** One run inside a weighted problem; arrays have one entry per point unless said otherwise. */
export interface WeightedRun {
  readonly run: ProblemRun;
  readonly model: RunModel;
  /** Position of its first residual. */
  readonly firstResidual: number;
  /** Values of all quantities at the parameters evaluated last. */
  readonly values: Float64Array;
  /** Predicted readings there; of points that are compared by volume, to first order from their readings. */
  readonly predicted: Float64Array;
  /** d reading / d burette volume where the curve passes the readings, unit/mL; see `weigh`. */
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
  /** Parameters that are fitted constants of groups. */
  private readonly constants: readonly number[];
  /** Parameters of the last derivatives; curve and derivatives there are kept, since new weights only rescale them. */
  private readonly keptParameters: Float64Array;
  private readonly kept: readonly Evaluation[];
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
    this.constants = [
      ...new Set(
        problem.runs.flatMap(({ design, bindings }) =>
          bindings.flatMap((binding, q) =>
            binding.kind === 'parameter' && design.quantities[q].role.kind === 'acidity' ? [binding.parameter] : [],
          ),
        ),
      ),
    ];
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
    this.kept = this.runs.map(({ predicted }) => ({
      readings: new Float64Array(predicted.length),
      volumes: new Float64Array(predicted.length),
    }));
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
      const { run, model, values, predicted, slopes } = this.runs[r];
      const { readings, volumes } = this.kept[r];
      for (let q = 0; q < values.length; q++) values[q] = boundValue(run.bindings[q], parameters);
      if (kept) predicted.set(readings);
      else if (!model.predict(values, predicted)) return false;
      // A point met at its reading is predicted by the difference of its volumes times its slope.
      const evaluatedAt = kept ? volumes : model.evaluatedAt;
      for (let i = 0; i < predicted.length; i++) predicted[i] += slopes[i] * (run.volumes[i] - evaluatedAt[i]);
    }
    this.writePlainResiduals(parameters, residuals);
    for (const { whitening, firstResidual } of this.runs) whitening.apply(residuals, firstResidual);
    return true;
  }

  /** Writes the residuals before whitening, curve minus reading, at the parameters asked last, and those of knowledge. */
  writePlainResiduals(parameters: Float64Array, residuals: Float64Array): void {
    for (const { run, predicted, firstResidual } of this.runs)
      for (let i = 0; i < predicted.length; i++) residuals[firstResidual + i] = predicted[i] - run.readings[i];
    this.writeKnowledge(parameters, residuals);
  }

  private writeKnowledge(parameters: Float64Array, residuals: Float64Array): void {
    this.knowledge.forEach((parameter, k) => {
      residuals[this.readingCount + k] = parameters[parameter] - this.problem.parameters[parameter].declared;
    });
  }

  /** Called directly after `residuals` at the same parameters. */
  derivatives(parameters: Float64Array, jacobian: Float64Array): boolean {
    if (!this.isKept(parameters)) {
      this.derivativeEvaluations++;
      this.runs.forEach(({ run, model, predicted, slopes }, r) => {
        const { wanted, derivatives, slopes: slopesThere } = this.moving[r];
        const { readings, volumes } = this.kept[r];
        model.differentiate(wanted, derivatives, slopesThere);
        volumes.set(model.evaluatedAt);
        for (let i = 0; i < readings.length; i++)
          readings[i] = predicted[i] - slopes[i] * (run.volumes[i] - volumes[i]);
      });
      this.keptParameters.set(parameters);
    }
    this.writePlainJacobian(jacobian);
    for (const { whitening, firstResidual } of this.runs)
      for (let j = 0; j < this.parameterCount; j++) whitening.apply(jacobian, j * this.residualCount + firstResidual);
    this.dropUnseen(jacobian);
    return true;
  }

  /**
   * Sets the derivatives by a constant that the run does not see to zero: far
   * outside the readings they are rounding, and no step along them is a step.
   */
  private dropUnseen(jacobian: Float64Array): void {
    for (const j of this.constants) {
      const column = jacobian.subarray(j * this.residualCount, (j + 1) * this.residualCount);
      let sum = 0;
      for (const value of column) sum += value * value;
      if (sum < unseenInfluence ** 2) column.fill(0);
    }
  }

  /** Writes the derivatives of the readings, not whitened, at the parameters differentiated last, with the rows of knowledge. */
  writePlainJacobian(jacobian: Float64Array): void {
    jacobian.fill(0);
    this.runs.forEach(({ run, slopes, firstResidual }, r) => {
      const { terms, derivatives, slopes: slopesThere } = this.moving[r];
      const { volumes } = this.kept[r];
      const count = slopes.length;
      // The derivative of a reading where a point was met becomes that of its predicted reading.
      const factors = slopes.map((slope, i) => (volumes[i] === run.volumes[i] ? 1 : slope / slopesThere[i]));
      terms.forEach((list, j) => {
        for (const { parameter, sensitivity } of list) {
          const column = parameter * this.residualCount + firstResidual;
          for (let i = 0; i < count; i++) jacobian[column + i] += sensitivity * factors[i] * derivatives[j * count + i];
        }
      });
    });
    this.knowledge.forEach((parameter, k) => {
      jacobian[parameter * this.residualCount + this.readingCount + k] = 1;
    });
  }

  /**
   * Weighs the points anew: takes the slopes from the curve asked last and
   * sets the covariance of the residuals.
   *
   * Points whose volume error outweighs that of the reading are compared by
   * volume from now on, as far as the electrode allows: where the curve is
   * steep and bent, the volume that belongs to a reading follows the
   * parameters in a straight line, and the reading at a volume does not. When
   * this stands still, the cost is that of orthogonal distance regression.
   *
   * @param noises of every run
   * @param pace 1 takes the new slopes, less goes part of the way to them
   */
  weigh(noises: readonly Noise[], pace: number): void {
    this.runs.forEach(({ run, model, slopes, whitening }, r) => {
      const before = slopes.slice();
      model.slopesAtReadings(run.readings, slopes);
      if (pace < 1)
        for (let i = 0; i < slopes.length; i++) {
          const ratio = Math.abs(slopes[i] / before[i]);
          if (ratio > 0 && Number.isFinite(ratio))
            slopes[i] = Math.sign(slopes[i]) * Math.abs(before[i]) * ratio ** pace;
        }
      this.setWeights(r, noises[r], whitening);
    });
  }

  /** Takes slopes over from another weighted problem of the same runs, with the noise given. */
  weighLike(other: WeightedProblem, noises: readonly Noise[]): void {
    this.runs.forEach(({ slopes, whitening }, r) => {
      slopes.set(other.runs[r].slopes);
      this.setWeights(r, noises[r], whitening);
    });
  }

  private setWeights(run: number, noise: Noise, whitening: Whitening): void {
    const { model, slopes } = this.runs[run];
    whitening.set(noise, slopes);
    const changed = model.meetReadings(
      whitening.sigma.map((sigma, i) =>
        sigma > (model.met[i] === 1 ? byVolumeUntil : byVolumeFrom) * noise.reading ? 1 : 0,
      ),
    );
    // New weights only rescale what is kept, unless points are evaluated elsewhere from now on.
    if (changed) this.keptParameters.fill(Number.NaN);
  }

  private isKept(parameters: Float64Array): boolean {
    for (let j = 0; j < parameters.length; j++) if (parameters[j] !== this.keptParameters[j]) return false;
    // A problem without parameters has one point only, but it must be computed once.
    return parameters.length > 0;
  }
}
