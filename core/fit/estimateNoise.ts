import { minimiseSmooth } from '../numerics/minimiseSmooth.ts';
import { type Noise, type NoiseDeclaration, noiseAt } from './noise.ts';
import { RestrictedLikelihood } from './restrictedLikelihood.ts';
import type { WeightedProblem } from './weightedProblem.ts';

/** Width of the differences in ln(noise). */
const width = 0.05;
/** Parts are told apart where the logarithm of each is known to better than this. */
const separable = 0.35;
/** A part below this share of the assumed ratio, or above its inverse, is not seen at all. */
const ratioRange = { lowest: 0.02, highest: 50 } as const;

/** A part of the noise that may be estimated; `scale` is reading and setting error together, at their assumed ratio. */
export type EstimatedPart = 'reading' | 'setting' | 'scale';

/** Noise of one run as estimated. */
export interface NoiseEstimate {
  readonly noise: Noise;
  /** Parts that were estimated; empty where all is declared. */
  readonly parts: readonly EstimatedPart[];
  /** Covariance of their logarithms, row by row. */
  readonly logCovariance: readonly number[];
}

/**
 * Noise of every run by restricted maximum likelihood at the solution, from
 * estimates that are close already. Where nothing is declared, reading and
 * setting error are told apart if the run allows it; else their assumed ratio
 * is kept.
 */
export function estimateNoise(
  weighted: WeightedProblem,
  parameters: Float64Array,
  declarations: readonly NoiseDeclaration[],
  readings: readonly number[],
  smallest: readonly number[],
): NoiseEstimate[] {
  const current = declarations.map((declaration, r) => noiseAt(declaration, readings[r]));
  if (declarations.every(({ kind }) => kind === 'declared'))
    return current.map((noise) => ({ noise, parts: [], logCovariance: [] }));
  const likelihood = new RestrictedLikelihood(weighted, parameters);
  return declarations.map((declaration, r) => {
    const valueWith = (noise: Noise) => likelihood.at(current.with(r, noise));
    const estimate = estimateRun(declaration, current[r], smallest[r], valueWith);
    current[r] = estimate.noise;
    return estimate;
  });
}

function estimateRun(
  declaration: NoiseDeclaration,
  noise: Noise,
  smallest: number,
  valueWith: (noise: Noise) => number,
): NoiseEstimate {
  if (declaration.kind === 'declared') return { noise, parts: [], logCovariance: [] };
  const bounded = (reading: number) => Math.max(smallest, reading);
  if (declaration.kind === 'scale-estimated') {
    const both = minimiseSmooth(
      ([reading, setting]) =>
        valueWith({ reading: bounded(Math.exp(reading)), setting_mL: Math.exp(setting), dose_mL: 0 }),
      [Math.log(noise.reading), Math.log(noise.setting_mL)],
      width,
    );
    const covariance = both.converged && both.hessian !== null ? inverted(both.hessian) : null;
    const ratio = Math.exp(both.at[1] - both.at[0]) / declaration.settingToReading;
    if (
      covariance !== null &&
      Math.sqrt(covariance[0]) < separable &&
      Math.sqrt(covariance[3]) < separable &&
      ratio > ratioRange.lowest &&
      ratio < ratioRange.highest &&
      Math.exp(both.at[0]) > smallest
    )
      return {
        noise: { reading: Math.exp(both.at[0]), setting_mL: Math.exp(both.at[1]), dose_mL: 0 },
        parts: ['reading', 'setting'],
        logCovariance: covariance,
      };
  }
  const one = minimiseSmooth(
    ([reading]) => valueWith(noiseAt(declaration, bounded(Math.exp(reading)))),
    [Math.log(noise.reading)],
    width,
  );
  const reading = bounded(Math.exp(one.at[0]));
  const part = declaration.kind === 'scale-estimated' ? 'scale' : 'reading';
  // Without a curvature the noise stands at the last digit of the readings and is not uncertain in this way.
  if (one.hessian === null || reading === smallest)
    return { noise: noiseAt(declaration, reading), parts: [], logCovariance: [] };
  return { noise: noiseAt(declaration, reading), parts: [part], logCovariance: [2 / one.hessian[0]] };
}

/** Covariance from the second derivatives of minus twice a log-likelihood in two variables: 2 H⁻¹. */
function inverted(hessian: readonly number[]): number[] {
  const determinant = hessian[0] * hessian[3] - hessian[1] * hessian[2];
  return [hessian[3], -hessian[1], -hessian[2], hessian[0]].map((entry) => (2 * entry) / determinant);
}
