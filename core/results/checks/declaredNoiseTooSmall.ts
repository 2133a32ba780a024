import { readingResolution } from '../../fit/readingResolution.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** No electrode reads better than this, in pH (common practice: 0.001 at the very best). */
const smallestReadingNoise = 1e-4;
/** Rounding spreads readings by its step over √12; noise declared below half of that is denied by the digits themselves. */
const partOfRounding = 0.5;

/** Declared reading noise that no instrument has. */
export function declaredNoiseTooSmall({ fit, index, weighted }: Analysis): Doubt[] {
  const noise = fit.noise[index];
  if (!noise.declared) return [];
  const { readingKind, nernstSlope_mV } = weighted.run.design;
  const unit = readingKind === 'mV' ? ' mV' : ' in pH';
  const resolution = readingResolution(weighted.run.readings);
  const smallest = smallestReadingNoise * (readingKind === 'mV' ? nernstSlope_mV : 1);
  const byRounding = (partOfRounding * resolution) / Math.sqrt(12);
  if (noise.reading >= Math.max(smallest, byRounding)) return [];
  return [
    {
      code: 'declared-noise-too-small',
      seen:
        byRounding > smallest
          ? `A reading noise of ${noise.reading.toPrecision(2)}${unit} is declared, but the last digit of the readings stands for ${resolution}.`
          : `A reading noise of ${noise.reading.toPrecision(2)}${unit} is declared; no electrode reads that well.`,
      means: 'Uncertainties that follow from it are far too small, and points on the steps hardly count.',
      remedy: 'Declare the noise that repeated readings show, or leave it out to have it estimated from the run.',
      place: { quantity: 'reading.u' },
    },
  ];
}
