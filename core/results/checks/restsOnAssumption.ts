import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** One doubt for every assumption that results rest on. */
export function restsOnAssumption({ quantities }: Analysis): Doubt[] {
  const resting = new Map<string, string[]>();
  for (const { id, state, restsOn } of quantities)
    if (state === 'fitted')
      for (const assumption of restsOn) resting.set(assumption, [...(resting.get(assumption) ?? []), id]);
  return [...resting].map(([assumption, ids]): Doubt => {
    const label = quantities.find(({ id }) => id === assumption)?.label ?? conditionLabels[assumption] ?? assumption;
    return {
      code: 'rests-on-assumption',
      seen: `The ${label} was not declared; ${ids.join(', ')} ${ids.length === 1 ? 'rests' : 'rest'} on the value assumed for it.`,
      means: 'If the assumption is wrong, so is the result, whatever its uncertainty says.',
      remedy: `Declare or confirm the ${label}.`,
      place: { quantity: assumption },
    };
  });
}

const conditionLabels: Record<string, string> = {
  'medium.temperature': 'temperature',
  'medium.activity': 'activity model',
  'reading.scale': 'scale of the readings',
};
