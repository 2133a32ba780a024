import { covarianceBetween, parameterGradient } from '../../fit/uncertaintyOf.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/**
 * Two alike groups that do not feel each other differ by this much, for
 * statistical reasons alone, and together make exactly the curve of one group
 * at twice the concentration.
 */
const differenceOfAlikeGroups = Math.log10(4);
/** Standard uncertainties by which a difference must exceed it. */
const factor = 2;

/** Neighbouring fitted constants that a single group of twice the fitted concentration would explain as well. */
export function constantsOverlap({ fit, weighted, speciation, quantities }: Analysis): Doubt[] {
  const { design } = weighted.run;
  const position = (id: string) => design.quantities.findIndex((quantity) => quantity.id === id);
  const isFitted = (id: string) => design.quantities[position(id)]?.declaration.state === 'fitted';
  const doubts: Doubt[] = [];
  design.systems.forEach(({ prefix, shape, role }, s) => {
    // Where the concentration is declared, one group cannot stand for two.
    if (role !== 'analyte' || !isFitted(`${prefix}concentration`)) return;
    for (let group = 0; group + 1 < shape.groups; group++) {
      const [lower, upper] = [`${prefix}pKa${group + 1}`, `${prefix}pKa${group + 2}`];
      if (!isFitted(lower) || !isFitted(upper)) continue;
      // A constant without a value is doubted for that already, and its distance says nothing.
      if (quantities[position(lower)].value === null || quantities[position(upper)].value === null) continue;
      const byQuantity = new Float64Array(design.quantities.length);
      byQuantity[position(upper)] = 1;
      byQuantity[position(lower)] = -1;
      const gradient = parameterGradient(weighted.run, byQuantity, fit.weighted.parameterCount);
      const variance = covarianceBetween(fit.covariance, gradient, gradient);
      if (variance === null) continue;
      const u = Math.sqrt(Math.max(0, variance));
      const difference = speciation.crossing(s, group + 1) - speciation.crossing(s, group);
      if (difference > differenceOfAlikeGroups + factor * u) continue;
      const labels = [lower, upper].map((id) => design.quantities[position(id)].label);
      doubts.push({
        code: 'pKa-overlap',
        seen: `${labels.join(' and ')} lie ${difference.toFixed(2)} ± ${u.toPrecision(2)} apart; two groups that are alike lie ${differenceOfAlikeGroups.toFixed(2)} apart.`,
        means:
          'One group at twice the concentration makes the same curve, so that this run tells neither how many groups there are nor how much of the substance.',
        remedy: 'Declare the concentration from the amount weighed, or take one group fewer.',
        place: { quantity: upper },
      });
    }
  });
  return doubts;
}
