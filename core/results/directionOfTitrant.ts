import type { ShapeOfRun } from '../endpoints/shapeOfRun.ts';
import type { ReadingKind } from '../run/run.ts';

/** A base makes the pH rise, and a potential fall. A run that does neither is taken as one with a base. */
export function directionOfTitrant(shape: ShapeOfRun, readingKind: ReadingKind): 'base' | 'acid' {
  return shape.direction === (readingKind === 'mV' ? 'rising' : 'falling') ? 'acid' : 'base';
}
