import { fQuantile } from './fQuantile.ts';

/** Probabilities are not told apart below this; nothing rests on them. */
export const smallestTail = 1e-12;
/** Halvings of twelve decades: a probability is good to one part in 10⁵. */
const halvings = 22;

/**
 * Probability that F exceeds a value, from the quantile by bisection; at least
 * `smallestTail`. The lower tail of 1/F is asked, whose small probabilities keep
 * all their digits.
 *
 * @param value not negative
 */
export function fTail(value: number, numeratorDegrees: number, denominatorDegrees: number): number {
  if (!(value >= 0)) throw new Error(`fTail: value ${value}`);
  if (value === 0) return 1;
  const exceeds = (probability: number) => fQuantile(probability, denominatorDegrees, numeratorDegrees) > 1 / value;
  if (exceeds(smallestTail)) return smallestTail;
  let low = smallestTail;
  let high = 1;
  for (let i = 0; i < halvings; i++) {
    const middle = Math.sqrt(low * high);
    if (exceeds(middle)) high = middle;
    else low = middle;
  }
  return Math.sqrt(low * high);
}
