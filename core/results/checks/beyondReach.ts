import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Fitted constants at whose pH nothing was read. */
export function beyondReach({ speciation, weighted, quantities, points }: Analysis): Doubt[] {
  const pH = points.filter((point) => point.used).map((point) => point.pH);
  const lowest = Math.min(...pH);
  const highest = Math.max(...pH);
  return weighted.run.design.systems.flatMap((system, s) =>
    Array.from({ length: system.shape.groups }, (_, group): Doubt[] => {
      const id = `${system.prefix}pKa${group + 1}`;
      const quantity = quantities.find((candidate) => candidate.id === id);
      if (quantity?.state !== 'fitted') return [];
      const crossing = speciation.crossing(s, group);
      if (crossing >= lowest && crossing <= highest) return [];
      return [
        {
          code: 'beyond-reach',
          seen: `${quantity.label} would be read at pH ${crossing.toFixed(2)}; the readings reach from ${lowest.toFixed(2)} to ${highest.toFixed(2)}.`,
          means:
            'Its value comes from one side of its buffer region alone and leans on every other quantity, the pKw and the electrode above all.',
          remedy:
            'Extend the run in that direction or raise the concentration; otherwise declare the constant or take it as a bound.',
          place: { quantity: id },
        },
      ];
    }).flat(),
  );
}
