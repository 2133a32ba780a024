import { type PointerEvent, useRef, useState } from 'react';
import type { FigureFrame } from '../../figures/figureFrame.ts';
import type { FigureView } from '../../figures/figureRun.ts';
import type { CursorTarget } from './cursorTarget.ts';
import { targetAt } from './cursorTarget.ts';
import { panelAt } from './figurePanel.ts';
import { pointAt } from './pointAt.ts';
import { type Drag, viewOfDrag } from './zoomDrag.ts';

/** A press that moves less than this is a click, px. */
const STILL = 5;

interface Wiring {
  readonly frame: FigureFrame;
  readonly onTarget: (target: CursorTarget | null) => void;
  readonly onView: (view: FigureView) => void;
  readonly onToggleRow: (line: number) => void;
}

/**
 * Moving reads, a click on a point excludes or includes it, dragging enlarges,
 * a double click shows all. A finger only reads: its second tap on the same
 * point is the click, so that no point is excluded by a brush of the hand.
 */
export function useFigurePointer({ frame, onTarget, onView, onToggleRow }: Wiring) {
  const pressed = useRef<Drag | null>(null);
  const tapped = useRef<number | null>(null);
  const [drag, setDrag] = useState<Drag | null>(null);
  const [isOverPoint, setOverPoint] = useState(false);

  const placeOf = (event: PointerEvent): readonly [number, number] => {
    const box = event.currentTarget.getBoundingClientRect();
    return [event.clientX - box.left, event.clientY - box.top];
  };

  const onPointerDown = (event: PointerEvent) => {
    if (event.button !== 0) return;
    const [x, y] = placeOf(event);
    const panel = panelAt(frame, x, y);
    pressed.current = panel === null ? null : { panel, from: [x, y], to: [x, y] };
    if (event.pointerType === 'touch') onTarget(targetAt(frame, x, y));
    else event.currentTarget.setPointerCapture(event.pointerId);
  };

  const onPointerMove = (event: PointerEvent) => {
    const [x, y] = placeOf(event);
    onTarget(targetAt(frame, x, y));
    if (event.pointerType === 'touch') return;
    setOverPoint(pointAt(frame, panelAt(frame, x, y), x, y) !== null);
    const start = pressed.current;
    if (start === null) return;
    const isMoved = drag !== null || Math.hypot(x - start.from[0], y - start.from[1]) >= STILL;
    if (isMoved) setDrag({ ...start, to: [x, y] });
  };

  const onPointerUp = (event: PointerEvent) => {
    const start = pressed.current;
    pressed.current = null;
    setDrag(null);
    if (start === null) return;
    const [x, y] = placeOf(event);
    const isMoved = Math.hypot(x - start.from[0], y - start.from[1]) >= STILL;
    if (drag !== null && isMoved) {
      onView(viewOfDrag(frame, { ...start, to: [x, y] }));
      return;
    }
    const point = isMoved ? null : pointAt(frame, start.panel, x, y);
    if (event.pointerType === 'touch') {
      if (point !== null && tapped.current === point) onToggleRow(frame.run.points[point].line);
      tapped.current = point;
    } else if (point !== null) onToggleRow(frame.run.points[point].line);
  };

  const giveUp = () => {
    pressed.current = null;
    setDrag(null);
  };

  return {
    drag,
    isOverPoint,
    giveUp,
    handlers: {
      onPointerDown,
      onPointerMove,
      onPointerUp,
      onPointerCancel: giveUp,
      onPointerLeave: (event: PointerEvent) => {
        if (event.pointerType !== 'touch') onTarget(null);
      },
      onDoubleClick: () => onView(frame.run.whole),
    },
  };
}
