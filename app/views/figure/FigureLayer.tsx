import { useId, useState } from 'react';
import { describePoint } from '../../figures/describePoint.ts';
import type { FigureFrame } from '../../figures/figureFrame.ts';
import type { FigureView } from '../../figures/figureRun.ts';
import type { Pointed } from '../page/pointing.ts';
import { CursorMarks } from './CursorMarks.tsx';
import { type CursorTarget, cursorOf } from './cursorTarget.ts';
import { Readout } from './Readout.tsx';
import { useFigureKeys } from './useFigureKeys.ts';
import { useFigurePointer } from './useFigurePointer.ts';
import { markedByDrag } from './zoomDrag.ts';

interface Props {
  readonly frame: FigureFrame;
  readonly front: ReadonlySet<string>;
  readonly pointed: Pointed | null;
  readonly onView: (view: FigureView) => void;
  readonly onToggleRow: (line: number) => void;
}

/** Everything that moves, over the drawn figure: cursor, readout, enlarging, keys. The drawing itself stays as it is. */
export function FigureLayer({ frame, front, pointed, onView, onToggleRow }: Props) {
  const { run, panels } = frame;
  const help = useId();
  const [target, setTarget] = useState<CursorTarget | null>(null);
  const cursor = cursorOf(run, target);
  const wiring = { frame, onTarget: setTarget, onView, onToggleRow };
  const onKeyDown = useFigureKeys({ ...wiring, cursor });
  const { drag, isOverPoint, handlers, giveUp } = useFigurePointer(wiring);
  const point = cursor?.point ?? null;
  return (
    <>
      <div
        className={isOverPoint ? 'figure-layer figure-over-point' : 'figure-layer'}
        role="slider"
        tabIndex={0}
        aria-label="Points of the run"
        aria-describedby={help}
        aria-orientation="horizontal"
        aria-valuemin={1}
        aria-valuemax={Math.max(1, run.points.length)}
        aria-valuenow={(point ?? 0) + 1}
        aria-valuetext={point === null ? `${run.points.length} points` : describePoint(run, point)}
        onKeyDown={(event) => {
          if (event.key === 'Escape' && drag !== null) giveUp();
          else onKeyDown(event);
        }}
        onBlur={() => setTarget(null)}
        {...handlers}
      >
        <CursorMarks
          frame={frame}
          cursor={cursor}
          pointed={pointed}
          zoomed={drag === null ? null : markedByDrag(frame, drag)}
        />
      </div>
      <p id={help} className="figure-hidden">
        Left and right arrows go from point to point, with Shift ten at a time; Home and End go to the first and last.
        Enter excludes or includes the point. Plus and minus enlarge and reduce, Escape shows the whole run.
      </p>
      <Readout run={run} front={front} cursor={cursor} at={panels.readout} canExclude={run.points.length > 0} />
    </>
  );
}
