import type { Declaration } from './declaration.ts';
import type { QuantityFile } from './sheetFile.ts';
import { toleranceToUncertainty } from './toleranceToUncertainty.ts';

/** Turns a quantity as written in a sheet into its declaration. */
export function readDeclaration(quantity: QuantityFile): Declaration {
  if (typeof quantity === 'number') return { state: 'fixed', value: quantity, assumed: false };
  if (quantity === 'fitted') return { state: 'fitted', start: null, assumed: false };
  if ('fitted' in quantity) return { state: 'fitted', start: quantity.start ?? null, assumed: false };
  const u =
    'u' in quantity
      ? quantity.u
      : 'U' in quantity
        ? quantity.U / quantity.k
        : toleranceToUncertainty(quantity.tolerance, quantity.distribution);
  return { state: 'known', value: quantity.value, u, source: quantity.source ?? null, assumed: false };
}
