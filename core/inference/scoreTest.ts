import { estimateCovariance } from '../fit/covariance.ts';
import type { ProblemFit } from '../fit/fitProblem.ts';

/** A column of which less than this part stands apart from those of the fit cannot be told from them. */
const leastApart = 1e-4;

/** What one more thing that moves the curve would do to a fit, to first order. */
export interface ScoreGain {
  /** Fall of the cost. */
  readonly gain: number;
  /** How far the thing would move, in units of its column. */
  readonly shift: number;
  /** Whitened residuals of the run afterwards; 0 at points left out. */
  readonly remaining: Float64Array;
}

/**
 * The score test: by how much would the cost fall if one more quantity were
 * free, from its column c of derivatives alone: (cᵀr)² / cᵀ(I − P)c with P the
 * projection on the columns of the fit. Nothing is fitted again. Source: Rao,
 * C. R., Proc. Camb. Phil. Soc. 44 (1948) 50–57.
 */
export class ScoreTest {
  /** Σ r² over readings and knowledge, without the points left out. */
  readonly cost: number;

  private readonly fit: ProblemFit;
  private readonly index: number;
  private readonly leftOut: readonly number[];
  private readonly jacobian: Float64Array;
  private readonly covariance: Float64Array;
  private readonly residuals: Float64Array;

  /** @param leftOut points of the run, by position, that are to have no say */
  constructor(fit: ProblemFit, index: number, leftOut: readonly number[]) {
    this.fit = fit;
    this.index = index;
    this.leftOut = leftOut.map((i) => fit.weighted.runs[index].firstResidual + i);
    const { residualCount, parameterCount } = fit.weighted;
    this.jacobian = fit.jacobian.slice();
    for (const i of this.leftOut) for (let j = 0; j < parameterCount; j++) this.jacobian[j * residualCount + i] = 0;
    this.covariance =
      leftOut.length === 0
        ? fit.covariance.covariance
        : estimateCovariance(this.jacobian, residualCount, parameterCount).covariance;
    const residuals = fit.residuals.slice();
    for (const i of this.leftOut) residuals[i] = 0;
    this.residuals = this.apart(residuals);
    this.cost = this.residuals.reduce((sum, r) => sum + r * r, 0);
  }

  /** Whitened residuals of the run as the fit without the points left out would have them. */
  get now(): Float64Array {
    return this.ofRun(this.residuals);
  }

  /**
   * @param column d reading / d thing at the points of the run, not whitened
   * @returns null where the fit moves the curve in this way already
   */
  freed(column: Float64Array): ScoreGain | null {
    const { whitening, firstResidual } = this.fit.weighted.runs[this.index];
    const whole = new Float64Array(this.fit.weighted.residualCount);
    whole.set(column, firstResidual);
    whitening.apply(whole, firstResidual);
    for (const i of this.leftOut) whole[i] = 0;
    const before = whole.reduce((sum, c) => sum + c * c, 0);
    // Twice, lest rounding of the first projection be taken for what stands apart.
    const apart = this.apart(this.apart(whole));
    const after = apart.reduce((sum, c) => sum + c * c, 0);
    if (!(after > leastApart ** 2 * before)) return null;
    const product = apart.reduce((sum, c, i) => sum + c * this.residuals[i], 0);
    const shift = -product / after;
    const remaining = this.ofRun(this.residuals.map((r, i) => r + shift * apart[i]));
    return { gain: product ** 2 / after, shift, remaining };
  }

  private ofRun(residuals: Float64Array): Float64Array {
    const { firstResidual, predicted } = this.fit.weighted.runs[this.index];
    return residuals.slice(firstResidual, firstResidual + predicted.length);
  }

  /** The part of a vector that no column of the fit reaches. */
  private apart(vector: Float64Array): Float64Array {
    const { residualCount, parameterCount } = this.fit.weighted;
    const products = new Float64Array(parameterCount);
    for (let j = 0; j < parameterCount; j++)
      for (let i = 0; i < residualCount; i++) products[j] += this.jacobian[j * residualCount + i] * vector[i];
    const left = vector.slice();
    for (let j = 0; j < parameterCount; j++) {
      let step = 0;
      for (let k = 0; k < parameterCount; k++) step += this.covariance[j * parameterCount + k] * products[k];
      for (let i = 0; i < residualCount; i++) left[i] -= this.jacobian[j * residualCount + i] * step;
    }
    return left;
  }
}
