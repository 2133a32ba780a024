import type { Replicate } from './bootstrap.ts';
import { coverage } from './coverage.ts';

/** What the replicates say of one quantity. */
export interface BootstrapSummary {
  readonly id: string;
  readonly median: number;
  /** Standard deviation of the replicates. */
  readonly u: number;
  /** Between the quantiles that leave out 2.5 % on either side. */
  readonly interval95: readonly [number, number];
}

/** Summary over the replicates that were fitted; empty where there are fewer than two. */
export function summariseBootstrap(ids: readonly string[], replicates: readonly Replicate[]): BootstrapSummary[] {
  const fitted = replicates.filter((replicate) => replicate !== null);
  if (fitted.length < 2) return [];
  return ids.map((id, q) => {
    const values = Float64Array.from(fitted, (replicate) => replicate[q]).sort();
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    return {
      id,
      median: quantile(values, 0.5),
      u: Math.sqrt(squares / (values.length - 1)),
      interval95: [quantile(values, 0.5 * (1 - coverage)), quantile(values, 0.5 * (1 + coverage))],
    };
  });
}

/** Quantile of sorted values by straight interpolation; type 7 of Hyndman, R. J.; Fan, Y., Am. Stat. 50 (1996) 361–365. */
function quantile(sorted: Float64Array, probability: number): number {
  const position = probability * (sorted.length - 1);
  const below = Math.floor(position);
  const above = Math.min(below + 1, sorted.length - 1);
  return sorted[below] + (position - below) * (sorted[above] - sorted[below]);
}
