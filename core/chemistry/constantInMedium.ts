import { daviesFunction } from './davies.ts';

/**
 * Which species of a constant stand as concentrations: `concentration` all
 * three, `mixed` all but H⁺, which stands as its activity.
 */
export type ConstantScale = 'concentration' | 'mixed';

/**
 * Converts an acidity constant from infinite dilution to a medium by Davies.
 *
 * pKc = pK⁰ − (1 + z_base² − z_acid²) A f(I); pK_mixed = pKc + A f(I).
 *
 * @param pKa constant at infinite dilution
 * @param acidCharge charge of the acid form; its base carries one less
 * @param ionicStrength of the medium, mol/L
 * @param coefficientA Debye–Hückel A, (L/mol)^½
 */
export function constantInMedium(
  pKa: number,
  acidCharge: number,
  ionicStrength: number,
  coefficientA: number,
  scale: ConstantScale,
): number {
  const af = coefficientA * daviesFunction(ionicStrength);
  const concentrationShift = (2 - 2 * acidCharge) * af;
  return pKa - concentrationShift + (scale === 'mixed' ? af : 0);
}

/** The same for the ion product of water: two charged species, no acid form. */
export function ionProductInMedium(
  pKw: number,
  ionicStrength: number,
  coefficientA: number,
  scale: ConstantScale,
): number {
  return constantInMedium(pKw, 0, ionicStrength, coefficientA, scale);
}
