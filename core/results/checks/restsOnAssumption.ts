import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Labels of conditions that are no quantities. */
const conditionLabels: Record<string, string> = {
  'medium.temperature': 'temperature',
  'medium.activity': 'activity model',
  'reading.scale': 'scale of the readings',
};

/** One doubt for every set of results that rest on the same assumptions. */
export function restsOnAssumption({ quantities }: Analysis): Doubt[] {
  const labelOf = (id: string) => quantities.find((quantity) => quantity.id === id)?.label ?? conditionLabels[id] ?? id;
  const resting = new Map<string, { results: string[]; assumptions: readonly string[] }>();
  for (const { id, state, restsOn } of quantities) {
    if (state !== 'fitted' || restsOn.length === 0) continue;
    const key = restsOn.join(' ');
    const entry = resting.get(key) ?? { results: [], assumptions: restsOn };
    entry.results.push(id);
    resting.set(key, entry);
  }
  return [...resting.values()].map(
    ({ results, assumptions }): Doubt => ({
      code: 'rests-on-assumption',
      seen: `${results.map(labelOf).join(', ')} ${results.length === 1 ? 'rests' : 'rest'} on values that nobody has declared: ${assumptions.map(labelOf).join(', ')}.`,
      means: 'Where an assumption is wrong, so is the result, whatever its uncertainty says.',
      remedy: 'Declare these values, or confirm the ones assumed.',
      place: { quantity: assumptions[0] },
    }),
  );
}
