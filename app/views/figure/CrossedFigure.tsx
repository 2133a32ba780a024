import { useMemo, useRef, useState } from 'react';
import type { RunResult } from '../../../core/index.ts';
import { crossedFigure } from '../../figures/crossedFigure.ts';
import { drawnPoints } from '../../figures/drawnPoints.ts';
import { figureCaption } from '../../figures/figureCaption.ts';
import { figureFrame } from '../../figures/figureFrame.ts';
import { type FigureView, figureRun } from '../../figures/figureRun.ts';
import { defaultFrontSystems } from '../../figures/frontSystems.ts';
import { labelRow } from '../../figures/panels.ts';
import type { Pointed } from '../page/pointing.ts';
import { FigureActions } from './FigureActions.tsx';
import { FigureLayer } from './FigureLayer.tsx';
import { Plot } from './Plot.tsx';
import { SystemChooser } from './SystemChooser.tsx';
import { useFigureStyle } from './useFigureStyle.ts';
import { useWidth } from './useWidth.ts';
import './crossedFigure.css';

interface Props {
  readonly result: RunResult;
  /** What is marked from elsewhere on the page. */
  readonly pointed: Pointed | null;
  /** Excludes or includes the row of this source line. */
  readonly onToggleRow: (line: number) => void;
}

/** What the person chose to see of one run; it survives new fits of that run and ends with another run. */
interface Choice {
  readonly run: string;
  readonly view: FigureView | null;
  readonly front: ReadonlySet<string> | null;
}

/** Reading against volume, residuals below it, speciation beside it on the same pH axis, and one cursor through all three. */
export function CrossedFigure({ result, pointed, onToggleRow }: Props) {
  const area = useRef<HTMLDivElement>(null);
  const width = useWidth(area);
  const style = useFigureStyle(area);
  const run = useMemo(() => figureRun(result), [result]);
  const name = `${result.run.file}\n${result.run.name}`;
  const [chosen, setChosen] = useState<Choice>({ run: name, view: null, front: null });
  const choice = chosen.run === name ? chosen : { run: name, view: null, front: null };
  const view = choice.view ?? run.whole;
  const front = useMemo(() => choice.front ?? defaultFrontSystems(result), [choice.front, result]);
  const frame = useMemo(() => (width === null ? null : figureFrame(run, view, width)), [run, view, width]);
  const figure = useMemo(
    () => (frame === null || style === null ? null : crossedFigure(frame, front, style)),
    [frame, front, style],
  );
  const setView = (next: FigureView) => {
    if (next !== view) setChosen({ ...choice, view: next === run.whole ? null : next });
  };
  const systems = result.speciation?.systems.length ?? 0;
  return (
    <figure className="crossed-figure" aria-label={`Titration curve of ${result.run.name}`}>
      <div ref={area} className="figure-area" style={{ height: frame?.panels.height }}>
        {figure !== null && <Plot figure={figure} />}
        {frame !== null && (
          <FigureLayer frame={frame} front={front} pointed={pointed} onView={setView} onToggleRow={onToggleRow} />
        )}
        {frame?.panels.speciation != null && result.speciation !== null && systems > 1 && (
          <SystemChooser
            speciation={result.speciation}
            panel={frame.panels.speciation}
            room={frame.panels.arrangement === 'below' ? labelRow + 6 : 0}
            front={front}
            onChange={(next) => setChosen({ ...choice, front: next })}
          />
        )}
      </div>
      <FigureActions
        run={run}
        view={view}
        front={front}
        drawn={drawnPoints(run, view)}
        onWhole={choice.view === null ? null : () => setView(run.whole)}
      />
      <figcaption>{figureCaption(run)}</figcaption>
    </figure>
  );
}
