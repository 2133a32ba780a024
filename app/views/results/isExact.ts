import type { QuantityResult } from '../../../core/index.ts';

/** Declared without an uncertainty: of no interest until somebody asks. */
export function isExact({ state, u }: QuantityResult): boolean {
  return state !== 'fitted' && u === null;
}
