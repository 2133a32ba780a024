import { listLines } from './listLines.ts';
import type { RowProposal } from './rowProposal.ts';
import type { RunRow } from './run.ts';

/** Rows that say the same twice, and several readings at one volume. `rows` in the order of the file. */
export function proposeRepeats(rows: readonly RunRow[]): readonly RowProposal[] {
  // Nearly always the volumes rise, and nothing is there twice.
  let rises = true;
  for (let at = 1; at < rows.length && rises; at++) rises = rows[at].volume_mL > rows[at - 1].volume_mL;
  if (rises) return [];
  const byVolume = new Map<number, RunRow[]>();
  for (const row of rows) {
    const same = byVolume.get(row.volume_mL);
    if (same === undefined) byVolume.set(row.volume_mL, [row]);
    else same.push(row);
  }
  const proposals: RowProposal[] = [];
  for (const [volume, same] of byVolume) {
    if (same.length < 2) continue;
    const seen = new Set<number>();
    const again = same.filter(({ reading }) => {
      const known = seen.has(reading);
      seen.add(reading);
      return known;
    });
    // A reading that stands at the same volume twice by chance is one of several; the same row alone is a copy.
    if (seen.size === 1) {
      proposals.push({
        code: 'row-duplicated',
        lines: again.map(({ line }) => line),
        action: 'exclude',
        why: `the same volume, ${volume} mL, and reading stand in line ${same[0].line} already`,
      });
    } else {
      const lines = same.map(({ line }) => line);
      proposals.push({
        code: 'volume-repeated',
        lines,
        action: 'keep',
        why: `${same.length} readings at ${volume} mL (${listLines(lines)}), from ${Math.min(...seen)} to ${Math.max(...seen)}`,
      });
    }
  }
  return proposals;
}
