import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Reading noise beyond this, in pH, is no instrument's (common practice). */
const usualReadingNoise = 0.03;
/** Declared noise is doubted when the residuals ask for this many times its variance. */
const largestReducedChiSquare = 3;

/** Residuals far larger than an instrument makes them, or than was declared. */
export function noiseFarAboveUsual({ fit, index, weighted }: Analysis): Doubt[] {
  const noise = fit.noise[index];
  const { readingKind, nernstSlope_mV } = weighted.run.design;
  const inPH = noise.reading / (readingKind === 'mV' ? nernstSlope_mV : 1);
  const figure = `${noise.reading.toPrecision(2)}${readingKind === 'mV' ? ' mV' : ' in pH'}`;
  const tooLarge = noise.declared ? (noise.reducedChiSquare ?? 0) > largestReducedChiSquare : inPH > usualReadingNoise;
  if (!tooLarge) return [];
  return [
    {
      code: 'noise-far-above-usual',
      seen: noise.declared
        ? `The residuals are ${Math.sqrt(noise.reducedChiSquare ?? 0).toFixed(1)} times as large as the declared noise (${figure}).`
        : `The residuals ask for a reading noise of ${figure}; ${usualReadingNoise} is much already.`,
      means: noise.declared
        ? 'Either the noise is larger than declared or the model is wrong; the uncertainties are too small.'
        : 'Readings that were not settled, or a model that does not fit.',
      remedy: 'Look at the residuals: scattered ones speak for the readings, bent ones for the model.',
      place: {},
    },
  ];
}
