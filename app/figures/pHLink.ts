import type { RunResult } from '../../core/index.ts';

/** How a reading and the pH it means hang together: a straight line, pH = intercept + slope · reading. */
export interface PHLink {
  readonly intercept: number;
  readonly slope: number;
  /** True where the two differ visibly, so that the pH needs an axis of its own. */
  readonly separate: boolean;
}

/** A pH that differs from the reading by less than this is a few px away from it: no reason for a second axis. */
const VISIBLE_PH = 0.1;

/**
 * The straight line through the two points of the result that lie farthest
 * apart. Null where a run in mV has too little spread to say.
 */
export function pHLink(result: RunResult): PHLink | null {
  let low: { reading: number; pH: number } | null = null;
  let high: { reading: number; pH: number } | null = null;
  const visit = (reading: number, pH: number) => {
    if (!Number.isFinite(reading) || !Number.isFinite(pH)) return;
    if (low === null || reading < low.reading) low = { reading, pH };
    if (high === null || reading > high.reading) high = { reading, pH };
  };
  for (const { reading, pH } of result.points) visit(reading, pH);
  const { curve } = result;
  if (curve !== null) curve.reading.forEach((reading, i) => void visit(reading, curve.pH[i]));
  const link = lineThrough(low, high);
  if (result.run.readingKind === 'mV') return link === null ? null : { ...link, separate: true };
  if (link === null || low === null || high === null) return { intercept: 0, slope: 1, separate: false };
  const farthest = Math.max(
    ...[low, high].map(({ reading, pH }: { reading: number; pH: number }) => Math.abs(reading - pH)),
  );
  return farthest < VISIBLE_PH ? { ...link, separate: false } : { ...link, separate: true };
}

function lineThrough(
  low: { reading: number; pH: number } | null,
  high: { reading: number; pH: number } | null,
): { intercept: number; slope: number } | null {
  if (low === null || high === null || low.reading === high.reading || low.pH === high.pH) return null;
  const slope = (high.pH - low.pH) / (high.reading - low.reading);
  return { slope, intercept: low.pH - slope * low.reading };
}

export function pHOfReading(link: PHLink, reading: number): number {
  return link.intercept + link.slope * reading;
}

export function readingOfPH(link: PHLink, pH: number): number {
  return (pH - link.intercept) / link.slope;
}
