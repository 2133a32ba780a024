import { listLines } from './listLines.ts';
import { proposeReadings } from './proposeReadings.ts';
import { proposeRepeats } from './proposeRepeats.ts';
import { proposeVolumes } from './proposeVolumes.ts';
import type { ProposalCode, RowProposal } from './rowProposal.ts';
import type { ReadingKind, RunRow } from './run.ts';

/** Findings of a kind that are listed one by one; more are told as one, or a noisy logger would fill the page. */
const LISTED = 12;

/** Looks for rows that are conspicuous; nothing is excluded by it. `rows` in the order of the file. */
export function proposeRows(rows: readonly RunRow[], kind: ReadingKind): readonly RowProposal[] {
  const usable = rows.filter(({ decision }) => decision.use === 'used');
  const byVolume = proposeVolumes(usable);
  const slipped = new Set(byVolume.flatMap(({ code, lines }) => (code === 'volume-slipped' ? lines : [])));
  const inSequence = slipped.size === 0 ? usable : usable.filter(({ line }) => !slipped.has(line));
  const all = [...beyondRange(rows), ...byVolume, ...proposeRepeats(inSequence), ...proposeReadings(inSequence, kind)];
  return gathered(all);
}

/** What a rule has excluded already. */
function beyondRange(rows: readonly RunRow[]): RowProposal[] {
  return rows.flatMap(({ line, volume_mL, decision }): RowProposal[] => {
    if (decision.use !== 'excluded' || decision.by !== 'rule') return [];
    const code = volume_mL < 0 || volume_mL > 1e5 ? 'volume-beyond-range' : 'reading-beyond-range';
    return [{ code, lines: [line], action: 'exclude', why: decision.why }];
  });
}

function gathered(proposals: readonly RowProposal[]): RowProposal[] {
  const byCode = new Map<ProposalCode, RowProposal[]>();
  for (const proposal of proposals) {
    const same = byCode.get(proposal.code);
    if (same === undefined) byCode.set(proposal.code, [proposal]);
    else same.push(proposal);
  }
  return [...byCode.values()].flatMap((same) => {
    if (same.length <= LISTED) return same;
    const lines = [...new Set(same.flatMap((proposal) => proposal.lines))].sort((a, b) => a - b);
    const why = `${same.length} findings (${listLines(lines)}); the first: ${same[0].why}`;
    return [{ ...same[0], lines, why }];
  });
}
