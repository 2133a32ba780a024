import type { ProblemFit } from '../fit/fitProblem.ts';

/** A part of the variance of a result, by where it comes from. */
export interface Share {
  /** "reading noise", "setting error", "dosing error", or the source or quantity whose declared uncertainty it is. */
  readonly source: string;
  /** 0–1; the shares of a result add up to one. */
  readonly share: number;
}

/** A share below this is rounding. */
const smallestShare = 1e-9;

/**
 * Splits the variance of a function of the parameters, by its gradient g. A
 * reading passes the part V⁻¹ J C g of its error on, a source of declared
 * knowledge the part C g; both are independent.
 */
export function sharesOf(fit: ProblemFit, gradient: Float64Array): Share[] {
  const { weighted, jacobian, covariance: estimate, noise } = fit;
  const { parameterCount, residualCount, problem } = weighted;
  const towards = new Float64Array(parameterCount);
  for (let a = 0; a < parameterCount; a++)
    for (let b = 0; b < parameterCount; b++) towards[a] += estimate.covariance[a * parameterCount + b] * gradient[b];

  const variances = new Map<string, number>();
  const add = (source: string, variance: number) => variances.set(source, (variances.get(source) ?? 0) + variance);
  weighted.runs.forEach(({ whitening, slopes, firstResidual }, r) => {
    const influence = new Float64Array(slopes.length);
    for (let a = 0; a < parameterCount; a++) {
      const column = a * residualCount + firstResidual;
      for (let i = 0; i < influence.length; i++) influence[i] += jacobian[column + i] * towards[a];
    }
    whitening.applyTransposed(influence, 0);
    let reading = 0;
    let setting = 0;
    influence.forEach((part, i) => {
      reading += part ** 2;
      setting += (part * slopes[i]) ** 2;
    });
    add('reading noise', noise[r].reading ** 2 * reading);
    add('setting error', noise[r].setting_mL ** 2 * setting);
    add('dosing error', noise[r].dose_mL ** 2 * whitening.doseVariance(influence));
  });
  problem.parameters.forEach(({ kind, id }, j) => {
    if (kind === 'knowledge') add(id, towards[j] ** 2);
  });
  const total = [...variances.values()].reduce((sum, variance) => sum + variance, 0);
  if (!(total > 0)) return [];
  return [...variances]
    .map(([source, variance]) => ({ source, share: variance / total }))
    .filter(({ share }) => share > smallestShare)
    .sort((a, b) => b.share - a.share);
}
