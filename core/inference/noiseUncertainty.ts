import { type CovarianceEstimate, estimateCovariance } from '../fit/covariance.ts';
import type { EstimatedPart } from '../fit/estimateNoise.ts';
import type { ProblemFit } from '../fit/fitProblem.ts';
import type { Noise } from '../fit/noise.ts';
import { uncertaintyOf } from '../fit/uncertaintyOf.ts';
import { Whitening } from '../fit/whitening.ts';

/** Width of the difference in ln(noise). */
const width = 0.05;

/**
 * How uncertain an uncertainty is, because the noise behind it was estimated.
 *
 * The degrees of freedom of a variance v are 2v²/var(v), with var(v) from the
 * covariance of the logarithms of the estimated noise parts. Source:
 * Satterthwaite, F. E., Biometrics Bull. 2 (1946) 110–114, in the form for
 * variance components. A variance that comes from declared knowledge alone has
 * infinitely many.
 */
export class NoiseUncertainty {
  private readonly fit: ProblemFit;
  /** Covariance of the parameters with each estimated part a little larger and a little smaller. */
  private readonly shifted: readonly {
    readonly larger: CovarianceEstimate;
    readonly smaller: CovarianceEstimate;
  }[];
  /** Covariance of the logarithms of all estimated parts, row by row. */
  private readonly logCovariance: Float64Array;

  constructor(fit: ProblemFit) {
    this.fit = fit;
    const parts = fit.noise.flatMap((noise, run) => noise.parts.map((part, k) => ({ run, part, k })));
    this.shifted = parts.map(({ run, part }) => ({
      larger: covarianceWith(fit, run, part, Math.exp(width)),
      smaller: covarianceWith(fit, run, part, Math.exp(-width)),
    }));
    this.logCovariance = new Float64Array(parts.length ** 2);
    parts.forEach((a, i) => {
      parts.forEach((b, j) => {
        if (a.run === b.run)
          this.logCovariance[i * parts.length + j] =
            fit.noise[a.run].logCovariance[a.k * fit.noise[a.run].parts.length + b.k];
      });
    });
  }

  /** Degrees of freedom of the variance of a function of the parameters, by its gradient. */
  degreesOfFreedom(gradient: Float64Array): number {
    const u = uncertaintyOf(this.fit.covariance, gradient);
    if (u === null || !(u > 0) || this.shifted.length === 0) return Number.POSITIVE_INFINITY;
    const variance = u ** 2;
    const byLog = this.shifted.map(({ larger, smaller }) => {
      const above = uncertaintyOf(larger, gradient) ?? u;
      const below = uncertaintyOf(smaller, gradient) ?? u;
      return (above ** 2 - below ** 2) / (2 * width);
    });
    let spread = 0;
    byLog.forEach((a, i) => {
      byLog.forEach((b, j) => {
        spread += a * b * this.logCovariance[i * byLog.length + j];
      });
    });
    return spread > 0 ? (2 * variance ** 2) / spread : Number.POSITIVE_INFINITY;
  }
}

function covarianceWith(fit: ProblemFit, run: number, part: EstimatedPart, factor: number): CovarianceEstimate {
  const { residualCount, parameterCount, runs } = fit.weighted;
  const jacobian = fit.plainJacobian.slice();
  runs.forEach(({ run: { volumes }, slopes, firstResidual }, r) => {
    const whitening = new Whitening(volumes);
    whitening.set(r === run ? scaled(fit.noise[r], part, factor) : fit.noise[r], slopes);
    for (let j = 0; j < parameterCount; j++) whitening.apply(jacobian, j * residualCount + firstResidual);
  });
  return estimateCovariance(jacobian, residualCount, parameterCount);
}

function scaled(noise: Noise, part: EstimatedPart, factor: number): Noise {
  return {
    reading: part === 'setting' ? noise.reading : noise.reading * factor,
    setting_mL: part === 'reading' ? noise.setting_mL : noise.setting_mL * factor,
    dose_mL: noise.dose_mL,
  };
}
