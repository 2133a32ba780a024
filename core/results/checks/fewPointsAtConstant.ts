import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Half width of the buffer region of a group in pH: within it, from a tenth to ten elevenths are ionised. */
const bufferRegion = 1;
/** Two points fix a constant and a concentration; a third is the first that can disagree. */
const fewestPoints = 3;

/** Fitted constants in whose buffer region hardly anything was read. */
export function fewPointsAtConstant({ speciation, weighted, quantities, points }: Analysis): Doubt[] {
  const used = points.filter((point) => point.used);
  const lowest = Math.min(...used.map(({ pH }) => pH));
  const highest = Math.max(...used.map(({ pH }) => pH));
  return weighted.run.design.systems.flatMap(({ prefix, shape }, s) =>
    Array.from({ length: shape.groups }, (_, group): Doubt[] => {
      const quantity = quantities.find(({ id }) => id === `${prefix}pKa${group + 1}`);
      if (quantity?.state !== 'fitted' || quantity.value === null) return [];
      const crossing = speciation.crossing(s, group);
      if (crossing < lowest || crossing > highest) return [];
      const near = used.filter(({ pH }) => Math.abs(pH - crossing) <= bufferRegion);
      if (near.length >= fewestPoints) return [];
      const nearest = used.reduce((best, point) =>
        Math.abs(point.pH - crossing) < Math.abs(best.pH - crossing) ? point : best,
      );
      return [
        {
          code: 'few-points-at-pKa',
          seen: `${near.length === 0 ? 'No point lies' : near.length === 1 ? '1 point lies' : `${near.length} points lie`} within ${bufferRegion} pH of where ${quantity.label} is read, at pH ${crossing.toFixed(2)}.`,
          means: 'The constant hangs on single readings: one that slipped moves it, and nothing would show it.',
          remedy: 'Titrate with smaller increments in this region, or repeat the run.',
          place: { quantity: quantity.id, volume_mL: nearest.volume_mL },
        },
      ];
    }).flat(),
  );
}
