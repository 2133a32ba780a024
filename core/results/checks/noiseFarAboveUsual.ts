import type { Doubt } from '../../notice/doubt.ts';
import { chiSquareQuantile } from '../../numerics/chiSquareQuantile.ts';
import type { Analysis } from '../analysis.ts';
import { pointsDistrusted } from './pointsDistrusted.ts';
import { whitenedResiduals } from './whitenedResiduals.ts';

/** Reading noise beyond this, in pH, is no instrument's (common practice). */
const usualReadingNoise = 0.03;
/** Declared noise is doubted when the residuals ask for this many times its variance: uncertainties are then too small by a third … */
const largestReducedChiSquare = 2;
/** … and when chance does not bring it about. */
const chance = 1e-5;

/** Residuals far larger than an instrument makes them, or than was declared. */
export function noiseFarAboveUsual(analysis: Analysis): Doubt[] {
  const { fit, index, weighted } = analysis;
  const noise = fit.noise[index];
  const { readingKind, nernstSlope_mV } = weighted.run.design;
  const inPH = noise.reading / (readingKind === 'mV' ? nernstSlope_mV : 1);
  const figure = `${noise.reading.toPrecision(2)}${readingKind === 'mV' ? ' mV' : ' in pH'}`;
  const residuals = whitenedResiduals(analysis);
  const place = {
    volume_mL: residuals.reduce((most, entry) => (Math.abs(entry.residual) > Math.abs(most.residual) ? entry : most))
      .volume_mL,
  };
  if (!noise.declared)
    return inPH <= usualReadingNoise
      ? []
      : [
          {
            code: 'noise-far-above-usual',
            seen: `The residuals ask for a reading noise of ${figure}; ${usualReadingNoise} in pH is much already.`,
            means: 'Readings that were not settled, or a model that does not fit.',
            remedy: 'Look at the residuals: scattered ones speak for the readings, bent ones for the model.',
            place,
          },
        ];
  // Single points that are named already are not held against the noise.
  const judged = pointsDistrusted(analysis).length > 0 ? residuals.filter(({ isTrusted }) => isTrusted) : residuals;
  const freedom = noise.degreesOfFreedom - (residuals.length - judged.length);
  if (!(freedom > 0)) return [];
  const sum = judged.reduce((total, { residual }) => total + residual ** 2, 0);
  const reduced = sum / freedom;
  if (reduced <= largestReducedChiSquare || sum <= chiSquareQuantile(1 - chance, freedom)) return [];
  return [
    {
      code: 'noise-far-above-usual',
      seen: `The residuals are ${timesOver(Math.sqrt(reduced))} times as large as the declared noise (${figure}).`,
      means: 'Either the noise is larger than declared or the model is wrong; the uncertainties are too small.',
      remedy: 'Look at the residuals: scattered ones speak for the noise, bent ones for the model.',
      place,
    },
  ];
}

function timesOver(ratio: number): string {
  return ratio < 10 ? ratio.toFixed(1) : ratio.toFixed(0);
}
