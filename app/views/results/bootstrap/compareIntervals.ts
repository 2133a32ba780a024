import type { BootstrapSummary, QuantityResult } from '../../../../core/index.ts';

/** Ends that differ by more than this part of the width do not agree; chance moves them by about 2 % in 1,000 repetitions. */
const agreement = 0.2;

/** A quantity with its interval from the fit and the one from simulation. */
export interface ComparedQuantity {
  readonly quantity: QuantityResult;
  readonly value: number;
  readonly u: number;
  /** 95 % interval by profile. */
  readonly profile: readonly [number, number];
  readonly simulated: BootstrapSummary;
  /** How far the ends of the simulated interval lie above those of the profile, in widths of the profile's interval. */
  readonly moved: readonly [number, number];
  readonly agrees: boolean;
}

/** The quantities of which both intervals have two ends: the fitted ones first, else in the order of the results. */
export function compareIntervals(
  quantities: readonly QuantityResult[],
  summaries: readonly BootstrapSummary[],
): readonly ComparedQuantity[] {
  const compared = quantities.flatMap((quantity): ComparedQuantity[] => {
    const simulated = summaries.find(({ id }) => id === quantity.id);
    const { value, u } = quantity;
    const [low, high] = quantity.interval95 ?? [null, null];
    if (simulated === undefined || value === null || u === null || low === null || high === null) return [];
    const width = high - low;
    if (!(width > 0)) return [];
    const moved = [(simulated.interval95[0] - low) / width, (simulated.interval95[1] - high) / width] as const;
    const agrees = moved.every((part) => Math.abs(part) <= agreement);
    return [{ quantity, value, u, profile: [low, high], simulated, moved, agrees }];
  });
  const isFitted = ({ quantity }: ComparedQuantity) => quantity.state === 'fitted';
  return [...compared.filter(isFitted), ...compared.filter((entry) => !isFitted(entry))];
}
