import type { ColumnRole } from './columnRole.ts';
import type { ColumnStatistics } from './columnStatistics.ts';
import type { ReadingKind } from './run.ts';

export interface KindChoice {
  readonly kind: ReadingKind;
  /** 'header': the name says so; 'figures': only the values do; 'against-header': the values say otherwise than the name. */
  readonly by: 'header' | 'figures' | 'against-header';
}

/** Share of values that must contradict a name before the values are believed. */
const CLEARLY = 0.8;

/** A pH scale ends at 14; values that spread wider than that are not readings of pH with slips in them. */
const SPREAD_OF_MILLIVOLTS = 14;

/** An electrode that answers at all moves by more than this over a titration. */
const SPREAD_OF_PH = 1;

/** Whether a sensor column holds pH or millivolts. */
export function readingKind(
  role: ColumnRole | undefined,
  unitIsVolt: boolean,
  statistics: ColumnStatistics,
): KindChoice {
  const { count, minimum, maximum, inPhRange, inMillivoltRange } = statistics;
  const spread = maximum - minimum;
  if (role === 'pH') {
    const beyond = 1 - inPhRange;
    const asMillivolts =
      count >= 5 && beyond >= CLEARLY && inMillivoltRange >= CLEARLY && spread > SPREAD_OF_MILLIVOLTS;
    return asMillivolts ? { kind: 'mV', by: 'against-header' } : { kind: 'pH', by: 'header' };
  }
  if (role === 'mV') {
    const asPh = count >= 5 && !unitIsVolt && inPhRange === 1 && spread >= SPREAD_OF_PH && maximum > 2;
    return asPh ? { kind: 'pH', by: 'against-header' } : { kind: 'mV', by: 'header' };
  }
  return { kind: inPhRange >= 0.5 ? 'pH' : 'mV', by: 'figures' };
}
