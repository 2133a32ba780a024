import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Readings that fall short of the curve the more alkaline it is. */
export function alkalineEndLow({ causes, points }: Analysis): Doubt[] {
  const cause = causes.find(({ kind }) => kind === 'alkaline-end');
  if (cause === undefined) return [];
  const highest = points.filter((point) => point.used).reduce((most, point) => (point.pH > most.pH ? point : most));
  return [
    {
      code: 'alkaline-end-low',
      seen: `The readings fall short of the curve the more alkaline it is, up to pH ${highest.pH.toFixed(2)}, far beyond chance (${cause.strength.toFixed(1)} standard deviations).`,
      means:
        'A sensor that answers to the cation of the base as well, or CO₂ taken up from the air; pKw, the last constants and the strength of the titrant move with it.',
      remedy:
        'Exclude the most alkaline points and compare; use an electrode for high pH, or keep CO₂ away with a stream of nitrogen.',
      place: { volume_mL: highest.volume_mL },
    },
  ];
}
