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
  const severalFiles = new Set(refusals.map(({ place }) => place.file)).size > 1;
  return (
    <ul className="refusals">
      {shown.map((group) => (
        <li
          key={JSON.stringify([group.first.code, group.first.place, group.first.message])}
          data-code={group.first.code}
        >
          <span className="refusal-place">{placeWords(group, severalFiles)}</span> {group.first.message}{' '}
          <em>{group.first.remedy}</em>
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

function placeWords({ first, lines, count }: RefusalGroup, namesFile: boolean): string {
  const { column, file } = first.place;
  const where: string[] = namesFile && file !== undefined ? [file] : [];
  if (count > 1 && lines.length > 0) {
    const listed = lines.slice(0, mostLines).join(', ');
    const others = lines.length > mostLines ? ` and ${lines.length - mostLines} more` : '';
    return `${[...where, `${where.length > 0 ? 'lines' : 'Lines'} ${listed}${others}`].join(', ')}; the first:`;
  }
  if (lines.length > 0) where.push(`${where.length > 0 ? 'line' : 'Line'} ${lines[0]}`);
  if (column !== undefined) where.push(`column ${column}`);
  return where.length === 0 ? '' : `${where.join(', ')}:`;
}
