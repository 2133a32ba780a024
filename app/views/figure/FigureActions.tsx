import type { DrawnPoints } from '../../figures/drawnPoints.ts';
import type { FigureRun, FigureView } from '../../figures/figureRun.ts';
import { saveFigure } from './saveFigure.ts';

interface Props {
  readonly run: FigureRun;
  readonly view: FigureView;
  readonly front: ReadonlySet<string>;
  readonly drawn: DrawnPoints;
  /** Back to the whole run; null where it is all in view. */
  readonly onWhole: (() => void) | null;
}

/** What can be done with the figure, and what is to be known about its drawing. */
export function FigureActions({ run, view, front, drawn, onWhole }: Props) {
  return (
    <div className="figure-actions">
      {onWhole !== null && (
        <button type="button" className="link" onClick={onWhole}>
          Show the whole run
        </button>
      )}
      {drawn.points.length < drawn.available && (
        <span>
          {drawn.points.length} of {drawn.available} points in view are drawn, every extreme among them; the fit uses
          all.
        </span>
      )}
      <span className="figure-save">
        Save figure as
        {(['svg', 'png'] as const).map((format) => (
          <button key={format} type="button" className="link" onClick={() => void saveFigure(run, view, front, format)}>
            {format.toUpperCase()}
          </button>
        ))}
      </span>
    </div>
  );
}
