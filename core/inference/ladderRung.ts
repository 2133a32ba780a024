import { solveLeastSquares } from '../fit/leastSquares.ts';
import type { Noise } from '../fit/noise.ts';
import { WeightedProblem, type WeightedRun } from '../fit/weightedProblem.ts';
import { buildProblem, type Problem } from '../model/problem.ts';
import type { LadderSheets, RungSheet } from './ladderSheets.ts';

/** No constant moves by more than this in one step, in pH. */
const constantStepLimit = 2;
/** No declared knowledge moves by more than this in one step, in standard uncertainties. */
const knowledgeStepLimit = 4;
/** Costs are compared to a few units; this part of a cost that matters is nothing beside them. */
const costTolerance = 1e-5;
/** Steps of one fit: a constant on its way out of the readings need not arrive. */
const iterationLimit = 20;
/** Standard uncertainties beyond which a miss counts for less when starts are compared. */
const broadMiss = 10;

/** Weights that all rungs have in common. */
export interface CommonNoise {
  readonly noise: Noise;
  /** d reading/dV of the curve where it passes each reading, unit/mL. */
  readonly slopes: Float64Array;
}

/** Where the fits of a rung have come to. */
export interface RungEnd {
  readonly parameters: Float64Array;
  /** Σ of squared whitened residuals, knowledge included. */
  readonly cost: number;
  readonly residuals: Float64Array;
  readonly jacobian: Float64Array;
  /** Values of all quantities by their ids. */
  readonly values: ReadonlyMap<string, number>;
}

/** One rung of a ladder: its problem under the common noise, and the best end found. */
export class LadderRung {
  readonly kind: RungSheet;
  readonly problem: Problem;
  readonly weighted: WeightedProblem;
  /** Ids of the constants of the counted groups, in the order of `kind.keys`. */
  readonly constants: readonly string[];
  readonly concentration: string;
  /** Number of quantities fitted; declared knowledge is the same in every rung. */
  readonly fitted: number;
  end: RungEnd | null = null;

  private readonly stepLimits: Float64Array;
  private readonly scratch: Float64Array;

  constructor(sheets: LadderSheets, kind: RungSheet, volumes: Float64Array, readings: Float64Array) {
    const problem = buildProblem([{ sheet: kind.sheet, volumes, readings }]);
    if (!problem.ok) throw new Error('one run with at most six groups counted is never too large');
    this.kind = kind;
    this.problem = problem.value;
    this.weighted = new WeightedProblem(problem.value);
    this.constants = kind.keys.map((_, k) => `${sheets.prefix}pKa${k + 1}`);
    this.concentration = `${sheets.prefix}concentration`;
    this.fitted = problem.value.parameters.filter((parameter) => parameter.kind === 'fitted').length;
    this.scratch = new Float64Array(this.weighted.residualCount);
    const { design, bindings } = problem.value.runs[0];
    this.stepLimits = Float64Array.from(problem.value.parameters, (parameter) =>
      parameter.kind === 'knowledge' ? knowledgeStepLimit : Number.POSITIVE_INFINITY,
    );
    design.quantities.forEach(({ role }, q) => {
      const binding = bindings[q];
      if (role.kind === 'acidity' && binding.kind === 'parameter')
        this.stepLimits[binding.parameter] = constantStepLimit;
    });
  }

  get run(): WeightedRun {
    return this.weighted.runs[0];
  }

  /** Number of readings. */
  get points(): number {
    return this.weighted.readingCount;
  }

  /** Root mean square of the whitened readings at the end; 1 where the rung explains them to their noise. */
  get weightedResidual(): number | null {
    if (this.end === null) return null;
    let sum = 0;
    for (let i = 0; i < this.points; i++) sum += this.end.residuals[i] ** 2;
    return Math.sqrt(sum / this.points);
  }

  /** Root mean square of curve minus reading at the end, in the unit of the reading. */
  get residual(): number | null {
    if (this.end === null || !this.weighted.residuals(this.end.parameters, this.scratch)) return null;
    const { predicted, run } = this.run;
    const sum = predicted.reduce((total, value, i) => total + (value - run.readings[i]) ** 2, 0);
    return Math.sqrt(sum / this.points);
  }

  /** Takes up other weights; what was found under the old ones is only a start. */
  weigh({ noise, slopes }: CommonNoise): void {
    this.run.whitening.set(noise, slopes);
  }

  /** How far a start is from the readings, misses far out counted little; Infinity where it has no curve. */
  distance(parameters: Float64Array): number {
    if (!this.weighted.residuals(parameters, this.scratch)) return Number.POSITIVE_INFINITY;
    let sum = 0;
    for (const residual of this.scratch) sum += Math.log1p((residual / broadMiss) ** 2);
    return Number.isFinite(sum) ? sum : Number.POSITIVE_INFINITY;
  }

  /** Fits from a start and keeps the end if it is the best so far. */
  fitFrom(start: Float64Array): void {
    const { weighted, stepLimits } = this;
    const result = solveLeastSquares(weighted, start, {
      stepLimits,
      costTolerance,
      iterationLimit,
      residualResolution: 1e-4,
    });
    const { parameters, cost, residuals, jacobian } = result;
    if (cost === null || (this.end !== null && cost >= this.end.cost)) return;
    // Values belong to the point asked last, which need not be the best.
    weighted.residuals(parameters, residuals);
    const { run, values } = this.run;
    const byId = new Map(run.design.quantities.map(({ id }, q) => [id, values[q]]));
    this.end = { parameters, cost, residuals, jacobian, values: byId };
  }

  /** Fits once more from the end, under weights that have changed. */
  refit(): void {
    if (this.end === null) return;
    const { parameters } = this.end;
    this.end = null;
    this.fitFrom(parameters);
  }
}
