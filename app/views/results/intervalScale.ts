import type { Declaration, QuantityResult } from '../../../core/index.ts';

/** What a drawn interval spans, in the unit of its quantity. */
export interface IntervalScale {
  readonly centre: number;
  readonly halfWidth: number;
  /** What was declared, as a 95 % interval: the ground on which the run's own interval is drawn. */
  readonly declared: readonly [number, number] | null;
}

/** 95 % of a normal distribution lie within so many standard deviations. */
const within95 = 1.959963984540054;

/**
 * The span on which to draw the interval of a quantity. A known quantity is drawn on what was declared, so that it
 * shows what the run added. Fitted constants share one span, so that the eye can compare them; any other quantity
 * has its own. Null where there is nothing to draw.
 */
export function intervalScale(
  quantity: QuantityResult,
  all: readonly QuantityResult[],
  declaration: Declaration | null,
): IntervalScale | null {
  const { value, interval95, state } = quantity;
  if (value === null || interval95 === null || interval95[0] === null || interval95[1] === null) return null;
  if (state !== 'fitted' && declaration?.state === 'known') {
    const half = within95 * declaration.u;
    const declared = [declaration.value - half, declaration.value + half] as const;
    const farthest = Math.max(half, ...interval95.map((end) => Math.abs((end ?? 0) - declaration.value)));
    return { centre: declaration.value, halfWidth: farthest, declared };
  }
  const compared = isConstant(quantity) ? all.filter((other) => isConstant(other) && other.state === 'fitted') : [];
  return { centre: value, halfWidth: Math.max(...[quantity, ...compared].map(reach)), declared: null };
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
