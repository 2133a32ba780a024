import { useState } from 'react';
import type { Refusal } from '../../core/index.ts';
import { groupRefusals, type RefusalGroup } from './groupRefusals.ts';

const mostShown = 8;
const mostLines = 12;

/** What was not accepted: where, why, and how to mend it. Long lists begin folded. */
export function RefusalList({ refusals }: { readonly refusals: readonly Refusal[] }) {
  const [showsAll, setShowsAll] = useState(false);
  const groups = groupRefusals(refusals);
  const shown = showsAll ? groups : groups.slice(0, mostShown);
  const left = groups.length - shown.length;
  return (
    <ul className="refusals">
      {shown.map((group) => (
        <li
          key={JSON.stringify([group.first.code, group.first.place, group.first.message])}
          data-code={group.first.code}
        >
          <span className="refusal-place">{placeWords(group)}</span> {group.first.message} <em>{group.first.remedy}</em>
        </li>
      ))}
      {left > 0 && (
        <li>
          <button type="button" className="link" onClick={() => setShowsAll(true)}>
            and {left} more
          </button>
        </li>
      )}
    </ul>
  );
}

function placeWords({ first, lines, count }: RefusalGroup): string {
  const { column, key } = first.place;
  if (count > 1 && lines.length > 0) {
    const listed = lines.slice(0, mostLines).join(', ');
    return `Lines ${listed}${lines.length > mostLines ? ` and ${lines.length - mostLines} more` : ''}; the first:`;
  }
  if (lines.length > 0) return `Line ${lines[0]}${column === undefined ? '' : `, column ${column}`}:`;
  return key === undefined ? '' : `${key}:`;
}
