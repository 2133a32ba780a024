import { type RefObject, useLayoutEffect, useState } from 'react';

/** Width of the element in whole px, followed as it changes; null before it is laid out. */
export function useWidth(element: RefObject<HTMLElement | null>): number | null {
  const [width, setWidth] = useState<number | null>(null);
  useLayoutEffect(() => {
    if (element.current === null) return;
    setWidth(Math.floor(element.current.clientWidth));
    const observer = new ResizeObserver(([entry]) => setWidth(Math.floor(entry.contentRect.width)));
    observer.observe(element.current);
    return () => observer.disconnect();
  }, [element]);
  return width === 0 ? null : width;
}
