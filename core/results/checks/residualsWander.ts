import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';
import { longestStretch } from './longestStretch.ts';
import { wandering, wanders } from './wandering.ts';
import { whitenedResiduals } from './whitenedResiduals.ts';

/** Residuals below this part of their uncertainties, root mean square, may do as they like: they move no result. */
const negligiblePart = 0.1;

/** Residuals that keep their sign, or their size, from point to point. */
export function residualsWander(analysis: Analysis): Doubt[] {
  const compared = whitenedResiduals(analysis);
  const residuals = compared.map(({ residual }) => residual);
  const chiSquare = residuals.reduce((sum, residual) => sum + residual ** 2, 0);
  if (chiSquare < residuals.length * negligiblePart ** 2) return [];
  const found = wandering(residuals);
  if (found === null || !wanders(found)) return [];
  return [
    {
      code: 'residuals-wander',
      seen: `The residuals change sign in only ${found.stretches} stretches over ${residuals.length} points, where chance would make ${found.expectedStretches.toFixed(0)}; neighbours are correlated by ${found.correlation.toFixed(2)}.`,
      means:
        'The curve misses the readings in a regular way, so that the model or a declared value is wrong somewhere, and the uncertainties are too small.',
      remedy:
        'Look where the residuals bend: at the ends suspect pKw, carbonate or the electrode, in between the number of groups, a declared concentration, or dosing errors that accumulate.',
      place: { volume_mL: longestStretch(compared) },
    },
  ];
}
