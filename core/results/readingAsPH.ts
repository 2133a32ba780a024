import { ionProductInMedium } from '../chemistry/constantInMedium.ts';
import { daviesFunction } from '../chemistry/davies.ts';
import { nominalValue } from '../model/quantity.ts';
import { ReadingScale } from '../model/readingScale.ts';
import type { RunDesign } from '../model/runDesign.ts';

/** Ionic strength taken for conversions before there is a model, where no background is declared, mol/L. */
const usualIonicStrength = 0.05;

/** How readings of a run translate into pH, with the electrode as fitted or as declared. */
export interface ReadingAsPH {
  /** pH on the scale of the run. */
  pH(reading: number): number;
  /** p[H⁺], at one typical ionic strength of the run. */
  concentrationPH(reading: number): number;
  /** Ion product on the concentration scale at that ionic strength. */
  readonly concentrationPKw: number;
}

/**
 * @param values all quantities of the run; null before a fit: declared values and usual ones
 * @param ionicStrength typical of the run, mol/L; null where only the background is known
 */
export function readingAsPH(design: RunDesign, values: Float64Array | null, ionicStrength: number | null): ReadingAsPH {
  const taken =
    values ??
    Float64Array.from(
      design.quantities,
      (quantity) => nominalValue(quantity) ?? (quantity.role.kind === 'slope' ? 1 : 0),
    );
  const valueFor = (id: string) => taken[design.quantities.findIndex((quantity) => quantity.id === id)];
  const scale = new ReadingScale(design);
  scale.take(taken);
  const ionic = ionicStrength ?? Math.max(usualIonicStrength, valueFor('sample.background'));
  const activityTerm = design.scale === 'activity' ? design.coefficientA * daviesFunction(ionic) : 0;
  return {
    pH: (reading) => scale.negativeLog(reading),
    concentrationPH: (reading) => scale.negativeLog(reading) - activityTerm,
    concentrationPKw:
      design.coefficientA > 0
        ? ionProductInMedium(valueFor('medium.pKw'), ionic, design.coefficientA, 'concentration')
        : valueFor('medium.pKw'),
  };
}
