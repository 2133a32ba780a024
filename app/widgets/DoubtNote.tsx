import type { ReactNode } from 'react';
import type { Doubt } from '../../core/index.ts';

interface Props {
  readonly doubt: Doubt;
  /** What leads to the place it is about. */
  readonly children?: ReactNode;
}

/** One doubt: what was seen, what it means, what to do. */
export function DoubtNote({ doubt, children }: Props) {
  return (
    <div className="doubt" data-code={doubt.code}>
      <span className="doubt-mark" aria-hidden="true">
        ?
      </span>
      <p>
        <strong>{doubt.seen}</strong> {doubt.means} <em>{doubt.remedy}</em> {children}
      </p>
    </div>
  );
}
