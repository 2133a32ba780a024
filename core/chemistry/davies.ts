/**
 * Coefficient of the linear term, as in the later form of the equation.
 * Source: Davies, C. W., Ion Association, Butterworths 1962, p. 41.
 */
const daviesLinearCoefficient = 0.3;

/** Ionic strength in mol/L up to which the equation is commonly trusted (common practice). */
export const daviesUpperIonicStrength = 0.5;

/**
 * The Davies function f(I) = √I/(1+√I) − 0.3 I, with −log γ_z = A z² f(I).
 * I in mol/L; dimensionless when A is in (L/mol)^½.
 */
export function daviesFunction(ionicStrength: number): number {
  const root = Math.sqrt(ionicStrength);
  return root / (1 + root) - daviesLinearCoefficient * ionicStrength;
}

/** Derivative of the Davies function with respect to I, in L/mol. I must be positive. */
export function daviesDerivative(ionicStrength: number): number {
  const root = Math.sqrt(ionicStrength);
  return 1 / (2 * root * (1 + root) * (1 + root)) - daviesLinearCoefficient;
}
