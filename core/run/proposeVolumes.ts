import type { RowProposal } from './rowProposal.ts';
import type { RunRow } from './run.ts';

/** A volume outside the interval between its neighbours by so many of their distances is a slip, not a step back. */
const FAR_OUT = 2;

/** At the end of a run there is a neighbour on one side only, and a last large addition is not unusual. */
const FAR_OUT_AT_END = 5;

/** Volumes that leave the sequence of their neighbours. `rows` in the order of the file. */
export function proposeVolumes(rows: readonly RunRow[]): readonly RowProposal[] {
  const volumes = new Float64Array(rows.length);
  for (let at = 0; at < volumes.length; at++) volumes[at] = rows[at].volume_mL;
  const sign = direction(volumes);
  const slips = new Set<number>();
  const proposals: RowProposal[] = [];
  for (let at = 0; at < rows.length; at++) {
    // Between its neighbours a volume is where it belongs.
    const inside = at > 0 && at + 1 < rows.length && sign * (volumes[at] - volumes[at - 1]) >= 0;
    if (inside && sign * (volumes[at + 1] - volumes[at]) >= 0) continue;
    const between = slipAt(volumes, at, sign);
    if (between === undefined) continue;
    slips.add(at);
    proposals.push({
      code: 'volume-slipped',
      lines: [rows[at].line],
      action: 'exclude',
      why: `the volume ${volumes[at]} mL is far off its neighbours, ${between}`,
    });
  }
  let last = -1;
  for (let at = 0; at < rows.length; at++) {
    if (slips.has(at)) continue;
    if (last >= 0 && sign * (volumes[at] - volumes[last]) < 0) {
      proposals.push({
        code: 'volume-steps-back',
        lines: [rows[at].line],
        action: 'exclude',
        why: `the volume steps back from ${volumes[last]} to ${volumes[at]} mL`,
      });
    }
    last = at;
  }
  return proposals;
}

/** Plus one where the volumes mostly rise, minus one where they mostly fall. */
function direction(volumes: Float64Array): number {
  let rises = 0;
  let falls = 0;
  for (let at = 1; at < volumes.length; at++) {
    if (volumes[at] > volumes[at - 1]) rises += 1;
    else if (volumes[at] < volumes[at - 1]) falls += 1;
  }
  return falls > rises ? -1 : 1;
}

/** A decimal mark one place off puts a volume back among its neighbours. */
function isBetween(value: number, low: number, high: number): boolean {
  return value !== 0 && value > low && value < high;
}

/** In words between what a slipped volume stands; undefined where there is no slip. */
function slipAt(volumes: Float64Array, at: number, sign: number): string | undefined {
  const count = volumes.length;
  const v = (index: number): number => sign * volumes[index];
  if (at >= 1 && at + 1 < count) {
    const low = v(at - 1);
    const high = v(at + 1);
    const ordered = high > low && (at < 2 || v(at - 2) <= low) && (at + 2 >= count || v(at + 2) >= high);
    // Two points on either side, or three on one, hold the sequence.
    const out = Math.max(low - v(at), v(at) - high);
    if (!ordered || count < 5 || out <= 0) return undefined;
    const markMoved = isBetween(10 * v(at), low, high) || isBetween(v(at) / 10, low, high);
    if (!markMoved && out < FAR_OUT * (high - low)) return undefined;
    return `${volumes[at - 1]} and ${volumes[at + 1]} mL`;
  }
  if (count < 5) return undefined;
  const inner = at === 0 ? [1, 2, 3, 4] : [count - 2, count - 3, count - 4, count - 5];
  const distance = Math.max(...inner.slice(1).map((index, k) => Math.abs(v(index) - v(inner[k]))));
  const ordered = inner.slice(1).every((index, k) => (at === 0 ? v(index) >= v(inner[k]) : v(index) <= v(inner[k])));
  const out = at === 0 ? v(0) - v(1) : v(count - 2) - v(count - 1);
  const beyond = at === 0 ? 0 : v(count - 1) - v(count - 2);
  const spread = Math.abs(v(inner[0]) - v(inner[3]));
  const jump =
    beyond > FAR_OUT_AT_END * Math.max(distance, spread) && volumes[at] > FAR_OUT_AT_END * volumes[count - 2];
  if (!ordered || !((out > FAR_OUT * distance && distance > 0) || (jump && distance > 0))) return undefined;
  return `${volumes[inner[0]]} and ${volumes[inner[1]]} mL`;
}
