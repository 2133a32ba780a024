import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import { fewestForNormality, omnibusNormality } from './omnibusNormality.ts';
import { pointsDistrusted } from './pointsDistrusted.ts';
import { residualsWander } from './residualsWander.ts';
import { whitenedResiduals } from './whitenedResiduals.ts';

/**
 * Sum of squares of both scores that chance does not bring about: 1 in 10,000
 * if the scores were exactly normal (18.4, χ² with two degrees of freedom), and
 * some times that with the few dozen points of a titration, whose scores have
 * heavier tails.
 */
const largestSum = 20;

/** Residuals that are lopsided or have heavy tails. Light tails, as of rounded readings, harm no interval. */
export function residualsNotNormal(analysis: Analysis): Doubt[] {
  // Residuals that follow one another have no distribution to speak of.
  if (residualsWander(analysis).length > 0) return [];
  // Where single points do it, and they are named already, the rest is judged.
  const namedAlready = pointsDistrusted(analysis).length > 0;
  const judged = whitenedResiduals(analysis).filter(({ isTrusted }) => isTrusted || !namedAlready);
  if (judged.length < fewestForNormality) return [];
  const sample = judged.map(({ residual }) => residual);
  if (sample.every((residual) => residual === sample[0])) return [];
  const spread = Math.sqrt(sample.reduce((sum, residual) => sum + residual ** 2, 0) / sample.length);
  const { skewness, kurtosis } = omnibusNormality(sample);
  if (skewness ** 2 + Math.max(0, kurtosis) ** 2 < largestSum) return [];
  const farthest = judged.reduce((most, entry) => (Math.abs(entry.residual) > Math.abs(most.residual) ? entry : most));
  return [
    {
      code: 'residuals-not-normal',
      seen: `The residuals are not normally distributed: ${describe(skewness, kurtosis)}; the largest is ${(Math.abs(farthest.residual) / spread).toFixed(1)} times their spread, at ${farthest.volume_mL.toFixed(3)} mL (line ${farthest.line}).`,
      means: 'Intervals take the noise for normal; a few large residuals weigh more than they should.',
      remedy:
        'Look at the points with the largest residuals: exclude those with a known reason, or see how far the answers move without them.',
      place: { volume_mL: farthest.volume_mL },
    },
  ];
}

function describe(skewness: number, kurtosis: number): string {
  const parts = [
    ...(Math.abs(skewness) > 3 ? [`lopsided (${Math.abs(skewness).toFixed(1)} standard deviations)`] : []),
    ...(kurtosis > 3 ? [`with heavy tails (${kurtosis.toFixed(1)} standard deviations)`] : []),
  ];
  return parts.length > 0 ? parts.join(' and ') : 'somewhat lopsided and with heavy tails';
}
