import type { Declaration } from '../sheet/declaration.ts';

/** A vessel's share of one component of the mixture: mol/L of component per unit of the quantity. */
export interface ComponentTerm {
  /** Position in the composition: strong cations, strong anions, then the proton systems. */
  readonly component: number;
  readonly factor: number;
}

/** What a quantity does in the model of its run. */
export type QuantityRole =
  /** pKa of a group; `group` counts over all systems of the run. */
  | { readonly kind: 'acidity'; readonly group: number }
  /** A concentration in one vessel, mol/L, with what it brings into it. */
  | { readonly kind: 'amount'; readonly vessel: 'sample' | 'titrant'; readonly terms: readonly ComponentTerm[] }
  /** A signed concentration, mol/L: positive brings strong cations, negative strong anions. */
  | { readonly kind: 'strongIon'; readonly vessel: 'sample' | 'titrant' }
  | { readonly kind: 'sampleVolume' }
  | { readonly kind: 'extraWater' }
  | { readonly kind: 'ionProduct' }
  | { readonly kind: 'buretteGain' }
  | { readonly kind: 'offset' }
  | { readonly kind: 'slope' }
  | { readonly kind: 'standardPotential' }
  | { readonly kind: 'junctionHydrogen' }
  | { readonly kind: 'junctionHydroxide' };

/** A number of a run with a physical meaning. */
export interface Quantity {
  /** Stable id within its run, such as "pKa1" or "titrant.concentration". */
  readonly id: string;
  readonly label: string;
  /** Unit of the value: "mol/L", "mL", "mV" or "" for a pure number. */
  readonly unit: string;
  readonly role: QuantityRole;
  readonly declaration: Declaration;
}

/** Value from which a quantity starts, or its declared value; null where only the run can suggest one. */
export function nominalValue(quantity: Quantity): number | null {
  return quantity.declaration.state === 'fitted' ? quantity.declaration.start : quantity.declaration.value;
}
