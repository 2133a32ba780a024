import { useCallback, useEffect, useMemo, useState } from 'react';
import type { Pointed, Pointing } from './pointing.ts';

/**
 * Keeps what is marked on the page for one run; Escape takes the mark away.
 *
 * @param run names the run; another run has other places
 */
export function usePointed(run: string): Pointing {
  const [marked, setMarked] = useState<{ readonly run: string; readonly place: Pointed } | null>(null);
  const pointed = marked !== null && marked.run === run ? marked.place : null;

  const point = useCallback(
    (place: Pointed | null, inSight?: 'figure' | 'table') => {
      setMarked(place === null ? null : { run, place });
      if (place === null || inSight === undefined) return;
      const found = inSight === 'figure' ? '.crossed-figure' : `tr[data-quantity="${place.quantity}"]`;
      // After the mark is drawn: a folded row has to open first.
      requestAnimationFrame(() => document.querySelector(found)?.scrollIntoView({ block: 'nearest' }));
    },
    [run],
  );

  useEffect(() => {
    if (pointed === null) return;
    const onKey = (event: KeyboardEvent) => {
      if (event.key === 'Escape') setMarked(null);
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [pointed]);

  return useMemo(() => ({ pointed, point }), [pointed, point]);
}
