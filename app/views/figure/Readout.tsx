import type { Cursor } from '../../figures/cursor.ts';
import { describePoint } from '../../figures/describePoint.ts';
import type { FigureRun } from '../../figures/figureRun.ts';
import { formatNumber } from '../../figures/formatNumber.ts';
import { formShares } from '../../figures/formShares.ts';
import type { Rectangle } from '../../figures/rectangle.ts';
import { FormName } from './FormName.tsx';

interface Props {
  readonly run: FigureRun;
  readonly front: ReadonlySet<string>;
  readonly cursor: Cursor | null;
  readonly at: Rectangle;
  readonly canExclude: boolean;
}

/** The numbers at the cursor; how to get them while there is none. */
export function Readout({ run, front, cursor, at, canExclude }: Props) {
  return (
    <div className="figure-readout" style={{ left: at.left, top: at.top, width: at.width, minHeight: at.height }}>
      {cursor === null ? (
        <p className="figure-hint">
          Move across the figure to read it{canExclude ? ', click a point to exclude or include it' : ''}, drag to
          enlarge.
        </p>
      ) : (
        <CursorNumbers run={run} front={front} cursor={cursor} />
      )}
    </div>
  );
}

function CursorNumbers({ run, front, cursor }: Pick<Props, 'run' | 'front'> & { readonly cursor: Cursor }) {
  const isPotential = run.result.run.readingKind === 'mV';
  const shares = cursor.pH === null ? [] : formShares(run, front, cursor.pH);
  return (
    <>
      <p className="figure-place">
        {cursor.volume_mL !== null && <span>{formatNumber(cursor.volume_mL, run.decimals.volume)} mL</span>}
        {isPotential && <span>{formatNumber(cursor.reading, run.decimals.reading)} mV</span>}
        {cursor.pH !== null && <span>pH {formatNumber(isPotential ? cursor.pH : cursor.reading, 2)}</span>}
      </p>
      <p>
        {shares.flat().map(({ label, share }) => (
          <span key={label.map(({ text }) => text).join('')} className="figure-share">
            <FormName label={label} /> {percent(share)}
          </span>
        ))}
      </p>
      {cursor.point !== null && <p className="figure-nearest">nearest point: {describePoint(run, cursor.point)}</p>}
    </>
  );
}

function percent(share: number): string {
  return share > 0.995 ? '> 99 %' : `${formatNumber(100 * share, 0)} %`;
}
