import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Fewer degrees of freedom make every uncertainty itself uncertain by more than a quarter (common practice). */
const fewestDegreesOfFreedom = 8;

/** Few points for what is fitted. */
export function fewPoints({ fit, index, points }: Analysis): Doubt[] {
  const { degreesOfFreedom } = fit.noise[index];
  if (degreesOfFreedom >= fewestDegreesOfFreedom) return [];
  const used = points.filter((point) => point.used).length;
  return [
    {
      code: 'too-few-points',
      seen: `${used} points leave ${degreesOfFreedom.toFixed(1)} degrees of freedom.`,
      means: 'Hardly anything is left to judge the noise and the model by; the uncertainties are themselves uncertain.',
      remedy: 'Titrate with smaller increments, or fix what is known from elsewhere.',
      place: {},
    },
  ];
}
