import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import type { QuantityResult } from '../runResult.ts';

/** Fitted constants at whose pH nothing was read, and quantities of which only one side is known. */
export function beyondReach({ speciation, weighted, quantities, points }: Analysis): Doubt[] {
  const pH = points.filter((point) => point.used).map((point) => point.pH);
  const lowest = Math.min(...pH);
  const highest = Math.max(...pH);
  const crossings = new Map(
    weighted.run.design.systems.flatMap(({ prefix, shape }, s) =>
      Array.from({ length: shape.groups }, (_, group): [string, number] => [
        `${prefix}pKa${group + 1}`,
        speciation.crossing(s, group),
      ]),
    ),
  );
  return quantities.flatMap((quantity): Doubt[] => {
    const { id, label, state, whyNoU } = quantity;
    if (state !== 'fitted') return [];
    const crossing = crossings.get(id);
    const isOutside = crossing !== undefined && (crossing < lowest || crossing > highest);
    const reach = `the readings reach from pH ${lowest.toFixed(2)} to ${highest.toFixed(2)}`;
    if (whyNoU === 'bound')
      return [
        {
          code: 'beyond-reach',
          seen: `Of ${/^pK/.test(label) ? '' : 'the '}${label} only one side shows: ${boundOf(quantity)} at 95 %${crossing === undefined ? '' : `; ${reach}`}.`,
          means: 'Beyond this bound every value fits the run as well as any other; there is no value to state.',
          remedy:
            crossing === undefined
              ? 'State the bound, or declare the value from elsewhere.'
              : 'State the bound, extend the run in that direction or raise the concentration.',
          place: { quantity: id },
        },
      ];
    // Left open altogether, it is named elsewhere, and where it would be read is not known.
    if (crossing === undefined || !isOutside || whyNoU === 'undetermined') return [];
    return [
      {
        code: 'beyond-reach',
        seen: `${label} would be read at pH ${crossing.toFixed(2)}; ${reach}.`,
        means:
          'Its value comes from one side of its buffer region alone and leans on every other quantity, the pKw and the electrode above all.',
        remedy:
          'Extend the run in that direction or raise the concentration; otherwise declare the constant or take it as a bound.',
        place: { quantity: id },
      },
    ];
  });
}

function boundOf({ interval95, unit }: QuantityResult): string {
  const [lower, upper] = interval95 ?? [null, null];
  const suffix = unit === '' ? '' : ` ${unit}`;
  if (lower !== null) return `above ${lower.toPrecision(3)}${suffix}`;
  return upper === null ? 'none' : `below ${upper.toPrecision(3)}${suffix}`;
}
