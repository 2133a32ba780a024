import type { RowProposal } from './rowProposal.ts';
import type { ReadingKind, RunRow } from './run.ts';

/** Equal readings in a row from which on a sensor may be stuck, and by how many digits the others would have moved. */
const FEWEST_EQUAL = 5;
const DIGITS_MISSED = 5;

/** What a reading must leave its neighbours by, beside several times the noise, to be a spike. */
const SPIKE = { pH: 0.2, mV: 12 } as const;
const TIMES_THE_NOISE = 10;

/** The neighbours of a spike agree with each other: they differ by no more than this share of it. */
const NEIGHBOURS_AGREE = 0.5;

/** Readings that repeat while the volume runs on, and isolated ones far off. `rows` in the order of the file. */
export function proposeReadings(rows: readonly RunRow[], kind: ReadingKind): readonly RowProposal[] {
  return [...stuck(rows), ...spikes(rows, kind)];
}

function stuck(rows: readonly RunRow[]): RowProposal[] {
  const digit = smallestStep(rows);
  if (digit === undefined) return [];
  const proposals: RowProposal[] = [];
  for (let from = 0; from < rows.length; ) {
    let to = from;
    while (to + 1 < rows.length && rows[to + 1].reading === rows[from].reading) to += 1;
    const span = Math.abs(rows[to].volume_mL - rows[from].volume_mL);
    if (to - from + 1 >= FEWEST_EQUAL && span > 0) {
      const before = slope(rows, from - 3, from);
      const after = slope(rows, to, to + 3);
      // Beside a step one of the two is steep; a sensor that woke up jumps. The smaller one says what was to come.
      const expected = Math.min(before ?? after ?? 0, after ?? before ?? 0) * span;
      const atEnd = before === undefined || after === undefined;
      if (expected >= (atEnd ? 2 : 1) * DIGITS_MISSED * digit) {
        proposals.push({
          code: 'sensor-stuck',
          lines: rows.slice(from + 1, to + 1).map(({ line }) => line),
          action: 'exclude',
          why: `the reading stays at ${rows[from].reading} from ${rows[from].volume_mL} to ${rows[to].volume_mL} mL, where it changes beside`,
        });
      }
    }
    from = to + 1;
  }
  return proposals;
}

/** Steepness between two rows, per mL; undefined where one of them does not exist or no volume lies between. */
function slope(rows: readonly RunRow[], from: number, to: number): number | undefined {
  if (from < 0 || to >= rows.length) return undefined;
  const span = Math.abs(rows[to].volume_mL - rows[from].volume_mL);
  return span === 0 ? undefined : Math.abs(rows[to].reading - rows[from].reading) / span;
}

function smallestStep(rows: readonly RunRow[]): number | undefined {
  let smallest = Number.POSITIVE_INFINITY;
  for (let at = 1; at < rows.length; at++) {
    const step = Math.abs(rows[at].reading - rows[at - 1].reading);
    // Differences of decimal numbers carry rounding errors, which are no digits.
    if (step > 1e-9) smallest = Math.min(smallest, step);
  }
  return Number.isFinite(smallest) ? smallest : undefined;
}

function spikes(rows: readonly RunRow[], kind: ReadingKind): RowProposal[] {
  const noise = noiseOf(rows);
  const proposals: RowProposal[] = [];
  for (let at = 2; at + 2 < rows.length; at++) {
    const y = rows[at].reading;
    const before = rows[at - 1].reading;
    const after = rows[at + 1].reading;
    const lowest = Math.min(rows[at - 2].reading, before, after, rows[at + 2].reading);
    const highest = Math.max(rows[at - 2].reading, before, after, rows[at + 2].reading);
    const out = Math.max(lowest - y, y - highest);
    if (out < SPIKE[kind] || out < TIMES_THE_NOISE * noise) continue;
    if (Math.abs(after - before) > NEIGHBOURS_AGREE * out) continue;
    proposals.push({
      code: 'reading-spike',
      lines: [rows[at].line],
      action: 'exclude',
      why: `the reading ${y} stands alone between ${before} and ${after}`,
    });
  }
  return proposals;
}

/**
 * By how much a reading typically lies outside its two neighbours: nothing
 * along a curve, the noise where that hides the curve. The median is robust
 * against spikes and does not count steps.
 */
function noiseOf(rows: readonly RunRow[]): number {
  if (rows.length < 3) return 0;
  const outside = new Float64Array(rows.length - 2);
  for (let at = 0; at < outside.length; at++) {
    const before = rows[at].reading;
    const after = rows[at + 2].reading;
    const y = rows[at + 1].reading;
    outside[at] = Math.max(0, Math.min(before, after) - y, y - Math.max(before, after));
  }
  outside.sort();
  return outside[outside.length >> 1];
}
