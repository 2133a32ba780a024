import type { QuantityResult } from '../../../../core/index.ts';

/** A fitted constant, to be varied. */
export const fittedConstant: QuantityResult = {
  id: 'pKa1',
  label: 'pKa₁',
  unit: '',
  state: 'fitted',
  value: 2.93,
  u: 0.01,
  interval95: [2.91, 2.96],
  whyNoU: null,
  restsOn: [],
  shares: [],
  profile: [],
  constant: null,
};
