import { useEffect, useRef } from 'react';
import type { Figure } from '../../figures/figure.ts';
import { drawFigure, eraseFigure } from '../../figures/plotly.ts';

/** Draws a figure. Assistive technology passes it by: what it shows is told in the caption and by the cursor. */
export function Plot({ figure }: { readonly figure: Figure }) {
  const element = useRef<HTMLDivElement>(null);
  const latest = useRef(figure);
  // Calls follow each other, because the library must finish one drawing before the next begins.
  const queue = useRef(Promise.resolve());

  useEffect(() => {
    latest.current = figure;
    const target = element.current;
    if (target === null) return;
    queue.current = queue.current.then(() => (latest.current === figure ? drawFigure(target, figure) : undefined));
  }, [figure]);

  useEffect(() => {
    const target = element.current;
    if (target === null) return;
    return () => {
      // Effects may run twice in development; an element that is still on the page keeps its drawing.
      queue.current = queue.current.then(() => (target.isConnected ? undefined : eraseFigure(target)));
    };
  }, []);

  return <div ref={element} className="figure-plot" aria-hidden="true" />;
}
