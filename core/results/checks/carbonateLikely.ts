import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Carbonate that the sheet denies and the residuals ask for. */
export function carbonateLikely({ causes }: Analysis): Doubt[] {
  const cause = causes.find(({ kind }) => kind === 'carbonate');
  if (cause === undefined) return [];
  const where = cause.id.startsWith('titrant') ? 'titrant' : 'sample';
  return [
    {
      code: 'carbonate-likely',
      seen: `About ${cause.wanted.toPrecision(2)} mol/L of carbonate in the ${where} would explain what the curve misses, far beyond chance (${cause.strength.toFixed(1)} standard deviations).`,
      means: 'Carbonate that is there and not declared bends the curve near its steps and moves every result.',
      remedy: `Let the carbonate in the ${where} be fitted and compare; use boiled water and fresh base under a soda-lime trap.`,
      place: { quantity: cause.id },
    },
  ];
}
