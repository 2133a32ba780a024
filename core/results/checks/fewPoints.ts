import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Fewer degrees of freedom make every uncertainty itself uncertain by more than a quarter (common practice). */
const fewestDegreesOfFreedom = 8;

/** Few points for what is fitted. */
export function fewPoints({ fit, index, used }: Analysis): Doubt[] {
  const { degreesOfFreedom } = fit.noise[index];
  if (degreesOfFreedom >= fewestDegreesOfFreedom) return [];
  return [
    {
      code: 'too-few-points',
      seen: `${used.volumes.length} points leave ${degreesOfFreedom.toFixed(1)} degrees of freedom.`,
      means: 'Hardly anything is left to judge the noise and the model by; the uncertainties are themselves uncertain.',
      remedy: 'Titrate with smaller increments, or fix what is known from elsewhere.',
      place: { volume_mL: middleOfWidestGap(used.volumes) },
    },
  ];
}

/** Where a further point would help most, mL. */
function middleOfWidestGap(volumes: Float64Array): number {
  const sorted = volumes.slice().sort();
  let widest = 0;
  for (let i = 1; i < sorted.length; i++)
    if (i === 1 || sorted[i] - sorted[i - 1] > sorted[widest + 1] - sorted[widest]) widest = i - 1;
  return 0.5 * (sorted[widest] + sorted[Math.min(widest + 1, sorted.length - 1)]);
}
