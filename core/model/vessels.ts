import { anionsIndex, cationsIndex, firstSystem } from '../chemistry/mixture.ts';
import type { QuantityRole } from './quantity.ts';
import type { RunDesign } from './runDesign.ts';

/** The two solutions of a run and how they are mixed, as its quantities say. */
export class Vessels {
  /** mol/L in either vessel: cations, anions, then the systems. */
  readonly sample: Float64Array;
  readonly titrant: Float64Array;
  /** Constants of all groups in turn. */
  readonly pKa: Float64Array;
  pKw = 14;
  /** mL */
  sampleVolume = 0;
  extraWater = 0;
  /** True volume over burette reading. */
  gain = 1;

  private readonly roles: readonly QuantityRole[];

  constructor(design: RunDesign) {
    this.roles = design.quantities.map((quantity) => quantity.role);
    this.sample = new Float64Array(firstSystem + design.systems.length);
    this.titrant = new Float64Array(firstSystem + design.systems.length);
    this.pKa = new Float64Array(design.systems.reduce((sum, system) => sum + system.shape.groups, 0));
  }

  /**
   * Takes over the values of all quantities; false where they describe no
   * mixture (a number that is not finite, a vessel without volume).
   */
  take(values: Float64Array): boolean {
    this.sample.fill(0);
    this.titrant.fill(0);
    for (let q = 0; q < this.roles.length; q++) {
      const role = this.roles[q];
      const value = values[q];
      if (!Number.isFinite(value)) return false;
      switch (role.kind) {
        case 'acidity':
          this.pKa[role.group] = value;
          break;
        case 'amount': {
          const vessel = this[role.vessel];
          for (const term of role.terms) vessel[term.component] += term.factor * value;
          break;
        }
        case 'strongIon':
          if (value < 0) this[role.vessel][anionsIndex] -= value;
          else this[role.vessel][cationsIndex] += value;
          break;
        case 'sampleVolume':
          this.sampleVolume = value;
          break;
        case 'extraWater':
          this.extraWater = value;
          break;
        case 'ionProduct':
          this.pKw = value;
          break;
        case 'buretteGain':
          this.gain = value;
          break;
        default:
          break;
      }
    }
    return this.sampleVolume > 0 && this.sampleVolume + this.extraWater > 0 && this.gain > 0;
  }

  /**
   * Writes the mixture after `volume` mL of titrant (true volume), mol/L, and
   * returns its total volume in mL.
   */
  mix(volume: number, mixture: Float64Array): number {
    const total = this.sampleVolume + this.extraWater + volume;
    const sampleShare = this.sampleVolume / total;
    const titrantShare = volume / total;
    for (let c = 0; c < mixture.length; c++) mixture[c] = sampleShare * this.sample[c] + titrantShare * this.titrant[c];
    return total;
  }
}
