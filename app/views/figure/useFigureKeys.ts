import type { KeyboardEvent } from 'react';
import type { Cursor } from '../../figures/cursor.ts';
import type { FigureFrame } from '../../figures/figureFrame.ts';
import type { FigureView } from '../../figures/figureRun.ts';
import { viewShowing, zoomAround } from '../../figures/zoomView.ts';
import type { CursorTarget } from './cursorTarget.ts';

/** Points passed by one press of an arrow, alone and with Shift. */
const STEP = 1;
const LONG_STEP = 10;
/** How much closer one press of + brings. */
const CLOSER = 0.6;

interface Wiring {
  readonly frame: FigureFrame;
  readonly cursor: Cursor | null;
  readonly onTarget: (target: CursorTarget | null) => void;
  readonly onView: (view: FigureView) => void;
  readonly onToggleRow: (line: number) => void;
}

/** From point to point by arrows, Home and End; Enter or Space excludes and includes; + and − enlarge; Escape goes back. */
export function useFigureKeys({ frame, cursor, onTarget, onView, onToggleRow }: Wiring) {
  const { run, view } = frame;
  const last = run.points.length - 1;
  const goTo = (wanted: number) => {
    const index = Math.max(0, Math.min(wanted, last));
    onTarget({ kind: 'point', index });
    onView(viewShowing(run.whole, view, run.points[index]));
  };
  const zoom = (factor: number) => {
    const point = run.points[cursor?.point ?? 0];
    onView(zoomAround(run.whole, view, point, factor));
  };
  return (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey || last < 0) return;
    const here = cursor?.point ?? null;
    const step = event.shiftKey ? LONG_STEP : STEP;
    const isHandled = () => {
      switch (event.key) {
        case 'ArrowRight':
        case 'ArrowUp':
          goTo(here === null ? 0 : here + step);
          return true;
        case 'ArrowLeft':
        case 'ArrowDown':
          goTo(here === null ? last : here - step);
          return true;
        case 'Home':
          goTo(0);
          return true;
        case 'End':
          goTo(last);
          return true;
        case 'Enter':
        case ' ':
          if (here !== null) onToggleRow(run.points[here].line);
          return true;
        case '+':
        case '=':
          zoom(CLOSER);
          return true;
        case '-':
          zoom(1 / CLOSER);
          return true;
        case '0':
          onView(run.whole);
          return true;
        case 'Escape':
          if (view === run.whole && cursor === null) return false;
          onView(run.whole);
          onTarget(null);
          return true;
        default:
          return false;
      }
    };
    if (isHandled()) event.preventDefault();
  };
}
