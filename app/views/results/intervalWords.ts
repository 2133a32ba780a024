import type { QuantityResult } from '../../../core/index.ts';
import { formatQuantity } from '../../widgets/formatQuantity.ts';

/** The 95 % interval in figures, rounded as the uncertainty is: "2.91–2.95", "below 2.1"; null where there is none. */
export function intervalWords({ interval95, u }: QuantityResult): string | null {
  if (interval95 === null) return null;
  const [low, high] = interval95;
  const show = (value: number) => formatQuantity(value, u, 3).value;
  // A dash between numbers of which one is negative could be read as its sign.
  if (low !== null && high !== null) return `${show(low)}${low < 0 || high < 0 ? ' to ' : '–'}${show(high)}`;
  if (high !== null) return `below ${show(high)}`;
  return low === null ? null : `above ${show(low)}`;
}
