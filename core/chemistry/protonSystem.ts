/** Largest number of ionisable groups of one proton system. */
export const largestGroupCount = 6;

/**
 * A substance that gives and takes protons: n groups in n+1 forms. Form 0 is
 * the fully protonated one, form k has lost k protons.
 */
export interface ProtonSystemShape {
  /** Number of ionisable groups n, 1–6. */
  readonly groups: number;
  /** Charge z₀ of the fully protonated form; form k has charge z₀ − k. */
  readonly chargeFullyProtonated: number;
}
