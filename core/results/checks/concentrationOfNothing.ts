import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** An amount below this many of its standard uncertainties cannot be told from nothing. */
const factor = 2;

/** Fitted amounts that may as well be nothing. */
export function concentrationOfNothing({ quantities }: Analysis): Doubt[] {
  return quantities.flatMap(({ id, label, unit, state, value, u }): Doubt[] => {
    if (state !== 'fitted' || unit !== 'mol/L' || value === null || u === null || Math.abs(value) > factor * u)
      return [];
    return [
      {
        code: 'concentration-of-nothing',
        seen: `The ${label} is ${value.toPrecision(2)} mol/L with a standard uncertainty of ${u.toPrecision(2)} mol/L.`,
        means: 'The run does not show that there is any of it.',
        remedy: 'Fix it at zero, unless something else says that it is there.',
        place: { quantity: id },
      },
    ];
  });
}
