import type { QuantityResult } from '../../../core/index.ts';

/**
 * Half of the width that the drawn interval of a quantity spans. Constants of the run share one, so that the eye can
 * compare them; every other quantity has its own.
 */
export function scaleOf(quantity: QuantityResult, all: readonly QuantityResult[]): number {
  const compared = isConstant(quantity) ? all.filter((other) => isConstant(other) && other.state === 'fitted') : [];
  return Math.max(...[quantity, ...compared].map(reach));
}

function isConstant({ id }: QuantityResult): boolean {
  return /(^|\.)pKa\d$/.test(id);
}

/** How far the interval reaches from the value, on its longer side. */
function reach({ value, interval95 }: QuantityResult): number {
  if (value === null || interval95 === null) return 0;
  const [low, high] = interval95;
  return Math.max(low === null ? 0 : value - low, high === null ? 0 : high - value);
}
