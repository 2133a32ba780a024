import { type ReactNode, useCallback, useLayoutEffect, useRef, useState } from 'react';
import { useDismiss } from './useDismiss.ts';

interface Props {
  readonly label: string;
  /** The element under which it opens; it gets the focus back. */
  readonly anchor: HTMLElement;
  /** Called for a click outside; Escape calls `onCancel`. */
  readonly onLeave: () => void;
  readonly onCancel: () => void;
  readonly children: ReactNode;
}

const gap = 6;

/**
 * A small form that opens in place, under what it changes, inside the nearest positioned ancestor. Focus stays in it
 * until it is closed, and then returns.
 */
export function Popover({ label, anchor, onLeave, onCancel, children }: Props) {
  const box = useRef<HTMLDivElement>(null);
  const [place, setPlace] = useState({ left: 0, top: 0 });

  useLayoutEffect(() => {
    const own = box.current;
    const frame = own?.offsetParent;
    if (own === null || !(frame instanceof HTMLElement)) return;
    // An anchor that breaks across lines has a box on each; the form opens under the last.
    const at = [...anchor.getClientRects()].at(-1) ?? anchor.getBoundingClientRect();
    const within = frame.getBoundingClientRect();
    const rightmost = Math.max(0, within.width - own.offsetWidth);
    setPlace({ left: Math.min(Math.max(0, at.left - within.left), rightmost), top: at.bottom - within.top + gap });
    const first =
      own.querySelector<HTMLElement>('[data-first]') ?? own.querySelector<HTMLElement>('input, select, button');
    first?.focus({ preventScroll: true });
    if (first instanceof HTMLInputElement && first.type === 'text') first.select();
    own.scrollIntoView({ block: 'nearest' });
    first?.scrollIntoView({ block: 'nearest' });
    return () => anchor.focus({ preventScroll: true });
  }, [anchor]);

  useDismiss(box, true, onLeave);

  const onKeyDown = useCallback(
    (event: React.KeyboardEvent) => {
      if (event.key === 'Escape') {
        event.stopPropagation();
        onCancel();
      } else if (event.key === 'Tab') keepFocus(event, box.current);
    },
    [onCancel],
  );

  return (
    <div ref={box} className="popover" role="dialog" aria-label={label} style={place} onKeyDown={onKeyDown}>
      {children}
    </div>
  );
}

/** From the last control on to the first, and back. */
function keepFocus(event: React.KeyboardEvent, box: HTMLElement | null): void {
  const controls = [...(box?.querySelectorAll<HTMLElement>('input, select, button') ?? [])].filter(
    (control) =>
      !control.hasAttribute('disabled') &&
      // Of radio buttons only the chosen one is reached by Tab.
      !(control instanceof HTMLInputElement && control.type === 'radio' && !control.checked),
  );
  const first = controls[0];
  const last = controls[controls.length - 1];
  if (first === undefined) return;
  if (event.shiftKey && document.activeElement === first) {
    event.preventDefault();
    last.focus();
  } else if (!event.shiftKey && document.activeElement === last) {
    event.preventDefault();
    first.focus();
  }
}
