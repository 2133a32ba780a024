import { type RefObject, useEffect } from 'react';

/** Calls `dismiss` when the person points at something outside the element, while `isOpen`. */
export function useDismiss(element: RefObject<HTMLElement | null>, isOpen: boolean, dismiss: () => void): void {
  useEffect(() => {
    if (!isOpen) return;
    const onPointer = (event: PointerEvent) => {
      if (event.target instanceof Node && element.current?.contains(event.target) !== true) dismiss();
    };
    document.addEventListener('pointerdown', onPointer, true);
    return () => document.removeEventListener('pointerdown', onPointer, true);
  }, [element, isOpen, dismiss]);
}
