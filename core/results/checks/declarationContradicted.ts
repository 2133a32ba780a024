import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** A declared value that the run moves by more than this many of its declared uncertainties was not declared rightly. */
const factor = 3;
/** An assumed value counts as corrected when it moves by this part of its wide uncertainty, and by more than its new one allows. */
const noticeablePart = 0.2;

/** Known values that the run moves away from what was declared or assumed for them. */
export function declarationContradicted({ weighted, quantities }: Analysis): Doubt[] {
  return weighted.run.design.quantities.flatMap(({ id, label, unit, declaration }): Doubt[] => {
    const { value, u } = quantities.find((quantity) => quantity.id === id) ?? { value: null, u: null };
    if (declaration.state !== 'known' || value === null || u === null) return [];
    const moved = Math.abs(value - declaration.value);
    const corrected = declaration.assumed && moved > noticeablePart * declaration.u && moved > factor * u;
    if (!(moved > factor * declaration.u || corrected)) return [];
    const suffix = unit === '' ? '' : ` ${unit}`;
    const figures = `${declaration.value.toPrecision(4)} ± ${declaration.u.toPrecision(2)}${suffix}`;
    return [
      {
        code: 'declaration-contradicted',
        seen: `The run asks for a ${label} of ${value.toPrecision(4)}${suffix}; ${figures} was ${declaration.assumed ? 'assumed' : 'declared'}.`,
        means: declaration.assumed
          ? 'The value found holds only if everything else about the run is as declared or assumed.'
          : 'Either the declared value is wrong or something else is, for which this quantity stands in.',
        remedy: `Check the ${label}${declaration.assumed ? ' and declare it' : ', and what else bears on the same part of the curve'}.`,
        place: { quantity: id },
      },
    ];
  });
}
