import { expect, it } from 'vitest';
import { ChargeBalance } from '../../../core/chemistry/chargeBalance.ts';

it('a sum of weights that overflows gives no number, and comes to an end', () => {
  const balance = new ChargeBalance([{ groups: 2, chargeFullyProtonated: 0 }], 0);
  // At pH 7 the last form weighs 10^308.1: the weights themselves are finite, twice the last one is not.
  balance.setConstants([0, 14 - 308.1], 14);
  balance.evaluate(Float64Array.of(0.1, 0.1, 0.01), -7 * Math.LN10, 0.1);
  expect(Number.isFinite(balance.meanLost[0])).toBe(false);
  expect(balance.gained > 0 && balance.given > 0 && Number.isFinite(balance.gained / balance.given)).toBe(false);
});
