import type { Doubt } from '../../core/index.ts';

/** One doubt: what was seen, what it means, what to do. */
export function DoubtNote({ doubt }: { readonly doubt: Doubt }) {
  return (
    <div className="doubt" data-code={doubt.code}>
      <span className="doubt-mark" aria-hidden="true">
        ?
      </span>
      <p>
        <strong>{doubt.seen}</strong> {doubt.means} <em>{doubt.remedy}</em>
      </p>
    </div>
  );
}
