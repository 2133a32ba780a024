import type { LadderResult } from '../../../core/index.ts';
import { LadderFigure } from './LadderFigure.tsx';
import { LadderTable } from './LadderTable.tsx';

/** How many groups the run shows, and on request what each number of them would give. */
export function Ladder({ ladder }: { readonly ladder: LadderResult }) {
  const [first, ...others] = sentences(ladder.sentence);
  return (
    <>
      <p>
        <strong>{first}</strong> {others.join(' ')}
      </p>
      <details className="how">
        <summary>Other numbers of groups</summary>
        <LadderFigure ladder={ladder} />
        <LadderTable ladder={ladder} />
      </details>
    </>
  );
}

/** Full stops end sentences only where a space and a capital follow; numbers have theirs inside. */
function sentences(text: string): string[] {
  return text.split(/(?<=\.) (?=[A-Z])/);
}
