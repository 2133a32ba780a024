import type { BootstrapSummary, QuantityResult } from '../../../../../core/index.ts';

/** A fitted quantity with an interval; a bound where one end is missing. */
export function fittedQuantity(id: string, interval95: readonly [number | null, number | null]): QuantityResult {
  const [low, high] = interval95;
  const isBound = low === null || high === null;
  return {
    id,
    label: id,
    unit: '',
    state: 'fitted',
    value: isBound ? null : (low + high) / 2,
    u: isBound ? null : (high - low) / 4,
    interval95,
    whyNoU: isBound ? 'bound' : null,
    restsOn: [],
    shares: [],
    profile: [],
    constant: null,
  };
}

export function summaryOf(id: string, interval95: readonly [number, number]): BootstrapSummary {
  const [low, high] = interval95;
  return { id, median: (low + high) / 2, u: (high - low) / 4, interval95 };
}
