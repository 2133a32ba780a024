import type { Place, RunResult } from '../../../core/index.ts';
import { formatDecimals } from '../../widgets/formatQuantity.ts';
import type { Pointed } from '../page/pointing.ts';

/** A place that can be marked on the page, and what the button says that does it. */
export interface ShownPlace {
  readonly place: Pointed;
  readonly words: string;
  /** Where on the page it is marked. */
  readonly where: 'figure' | 'table';
}

/**
 * @param isAtQuantity whether the doubt already stands under the quantity it is about
 * @returns null where nothing on the page can be marked
 */
export function placeWords(
  { quantity, volume_mL, line }: Place,
  result: RunResult,
  isAtQuantity: boolean,
): ShownPlace | null {
  if (quantity !== undefined) {
    const found = result.quantities.find(({ id }) => id === quantity);
    const isDrawn = result.speciation?.systems.some(({ crossings }) =>
      crossings.some(({ quantityId }) => quantityId === quantity),
    );
    if (isAtQuantity)
      return isDrawn === true ? { place: { quantity }, words: 'show on the figure', where: 'figure' } : null;
    if (found !== undefined) return { place: { quantity }, words: `show ${found.label}`, where: 'table' };
  }
  if (line !== undefined && result.points.some((point) => point.line === line))
    return { place: { line }, words: `show line ${line}`, where: 'figure' };
  if (volume_mL !== undefined && result.points.length > 0)
    return { place: { volume_mL }, words: `show at ${formatDecimals(volume_mL, 2)} mL`, where: 'figure' };
  return null;
}
