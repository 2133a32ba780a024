import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Standard deviations of the count of runs that chance does not bring about. */
const factor = 3.5;
/** With fewer points the normal approximation to the count is poor. */
const fewestPoints = 12;

/** Residuals below this part of their uncertainties, root mean square, may do as they like: they move no result. */
const negligiblePart = 0.1;

/**
 * Residuals that keep their sign for long: the runs test on their signs in
 * order of volume. Source: Wald, A.; Wolfowitz, J., Ann. Math. Stat. 11 (1940) 147–162.
 */
export function residualsWander({ points }: Analysis): Doubt[] {
  const compared = points
    .flatMap(({ used, volume_mL, residual, u }) =>
      used && residual !== null && residual !== 0 && u !== null ? [{ volume_mL, residual, u }] : [],
    )
    .sort((a, b) => a.volume_mL - b.volume_mL);
  const count = compared.length;
  if (count < fewestPoints) return [];
  const chiSquare = compared.reduce((sum, { residual, u }) => sum + (residual / u) ** 2, 0);
  if (chiSquare < count * negligiblePart ** 2) return [];
  const residuals = compared.map(({ residual }) => Math.sign(residual));
  const positive = residuals.filter((sign) => sign > 0).length;
  const negative = count - positive;
  const runs = 1 + residuals.filter((sign, i) => i > 0 && sign !== residuals[i - 1]).length;
  const expected = (2 * positive * negative) / count + 1;
  const variance = ((expected - 1) * (expected - 2)) / (count - 1);
  if (!(variance > 0) || (runs - expected) / Math.sqrt(variance) > -factor) return [];
  return [
    {
      code: 'residuals-wander',
      seen: `The residuals change sign in only ${runs} stretches over ${count} points; ${expected.toFixed(0)} would be expected of chance.`,
      means:
        'The curve misses the readings in a regular way, so that the model or a declared value is wrong somewhere, and the uncertainties are too small.',
      remedy:
        'Look where the residuals bend: at the ends suspect pKw, carbonate or the electrode, in between the number of groups or a declared concentration.',
      place: {},
    },
  ];
}
