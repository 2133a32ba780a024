import type { Noise } from './noise.ts';

/**
 * Turns the residuals of a run into independent ones of variance one, in time
 * proportional to the number of points.
 *
 * Reading noise and setting errors are independent from point to point; dosing
 * errors accumulate, so that a residual carries slope · (sum of the errors of
 * all doses so far). The sum is a random walk, which a Kalman filter follows:
 * what each residual adds to the forecast from those before it is independent
 * of them. Source: Harvey, A. C., Forecasting, Structural Time Series Models
 * and the Kalman Filter, Cambridge University Press 1989, section 3.2 (from
 * memory); the test compares with the dense covariance matrix.
 */
export class Whitening {
  /** Standard uncertainty of each residual by itself, in the unit of the reading. */
  readonly sigma: Float64Array;
  /** ln of the determinant of the covariance matrix of the residuals. */
  logDeterminant = 0;

  /** Points in order of dosing, and whether each of them follows a dose. */
  private readonly order: Int32Array;
  private readonly isDosed: Uint8Array;
  private readonly slopes: Float64Array;
  /** 1 / standard deviation of what a residual adds, and how much of that corrects the sum of dosing errors. */
  private readonly inverse: Float64Array;
  private readonly gains: Float64Array;
  private accumulates = false;

  /** @param volumes burette readings, mL; in any order */
  constructor(volumes: Float64Array) {
    this.order = Int32Array.from(volumes.keys()).sort((a, b) => volumes[a] - volumes[b] || a - b);
    this.isDosed = Uint8Array.from(this.order, (point, k) =>
      volumes[point] > (k === 0 ? 0 : volumes[this.order[k - 1]]) ? 1 : 0,
    );
    this.sigma = new Float64Array(volumes.length).fill(1);
    this.slopes = new Float64Array(volumes.length);
    this.inverse = new Float64Array(volumes.length).fill(1);
    this.gains = new Float64Array(volumes.length);
  }

  /**
   * Sets the covariance of the residuals.
   *
   * @param slopes d reading/dV of the curve at every point, unit/mL
   */
  set(noise: Noise, slopes: Float64Array): void {
    const { order, isDosed, sigma, inverse, gains } = this;
    this.slopes.set(slopes);
    this.accumulates = noise.dose_mL > 0;
    this.logDeterminant = 0;
    const doseVariance = noise.dose_mL ** 2;
    let total = 0;
    let uncertain = 0;
    for (let k = 0; k < order.length; k++) {
      const i = order[k];
      const own = noise.reading ** 2 + (noise.setting_mL * slopes[i]) ** 2;
      if (isDosed[k] === 1) {
        total += doseVariance;
        uncertain += doseVariance;
      }
      const forecast = own + slopes[i] ** 2 * uncertain;
      sigma[i] = Math.sqrt(own + slopes[i] ** 2 * total);
      inverse[i] = 1 / Math.sqrt(forecast);
      gains[i] = (uncertain * slopes[i]) / forecast;
      uncertain -= gains[i] * slopes[i] * uncertain;
      this.logDeterminant += Math.log(forecast);
    }
  }

  /** Whitens the numbers of all points, which stand from position `first` on, in place. */
  apply(values: Float64Array, first: number): void {
    const { order, slopes, inverse, gains } = this;
    if (!this.accumulates) {
      for (let i = 0; i < inverse.length; i++) values[first + i] *= inverse[i];
      return;
    }
    let sum = 0;
    for (let k = 0; k < order.length; k++) {
      const i = order[k];
      const added = values[first + i] - slopes[i] * sum;
      sum += gains[i] * added;
      values[first + i] = added * inverse[i];
    }
  }

  /** The transposed whitening of the numbers of all points, in place: what each residual passes on to the whitened ones. */
  applyTransposed(values: Float64Array, first: number): void {
    const { order, slopes, inverse, gains } = this;
    if (!this.accumulates) {
      this.apply(values, first);
      return;
    }
    let passed = 0;
    for (let k = order.length - 1; k >= 0; k--) {
      const i = order[k];
      const added = inverse[i] * values[first + i] + gains[i] * passed;
      passed -= slopes[i] * added;
      values[first + i] = added;
    }
  }

  /** Variance that accumulating errors of variance one per dose give to Σ influence · residual. */
  doseVariance(influence: Float64Array): number {
    const { order, isDosed, slopes } = this;
    let later = 0;
    let variance = 0;
    for (let k = order.length - 1; k >= 0; k--) {
      const i = order[k];
      later += influence[i] * slopes[i];
      if (isDosed[k] === 1) variance += later ** 2;
    }
    return variance;
  }
}
