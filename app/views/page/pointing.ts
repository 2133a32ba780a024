import { createContext, useContext } from 'react';
import type { Place } from '../../../core/index.ts';

/** What one part of the page makes another part mark: a point, a volume or a quantity. */
export type Pointed = Pick<Place, 'line' | 'volume_mL' | 'quantity'>;

export interface Pointing {
  readonly pointed: Pointed | null;
  /** Marks a place, and brings it into sight in the part of the page that is named; null takes the mark away. */
  readonly point: (place: Pointed | null, inSight?: 'figure' | 'table') => void;
}

export const PointingContext = createContext<Pointing>({ pointed: null, point: () => undefined });

export function usePointing(): Pointing {
  return useContext(PointingContext);
}
