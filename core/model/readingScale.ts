import type { QuantityRole } from './quantity.ts';
import type { RunDesign } from './runDesign.ts';

/** pH about which a meter's slope turns: buffers bracket it, so calibration is best there. */
const pivot = 7;

/**
 * How an electrode shows −log a(H⁺) or −log [H⁺], here called the negative log.
 *
 * pH meter: reading = 7 + offset + slope (negative log − 7).
 * Millivolts: E = E0 − slope · (RT ln10/F) · negative log.
 * Either plus the junction terms j_H [H⁺] + j_OH [OH⁻].
 */
export class ReadingScale {
  junctionHydrogen = 0;
  junctionHydroxide = 0;
  /** Offset in pH, or E0 in mV. */
  zero = 0;
  slope = 1;
  private readonly isPotential: boolean;
  private readonly nernstSlope: number;
  private readonly roles: readonly QuantityRole[];

  constructor(design: RunDesign) {
    this.roles = design.quantities.map((quantity) => quantity.role);
    this.isPotential = design.readingKind === 'mV';
    this.nernstSlope = design.nernstSlope_mV;
  }

  /** Takes over the values of all quantities of the run. */
  take(values: Float64Array): void {
    for (let q = 0; q < this.roles.length; q++) {
      switch (this.roles[q].kind) {
        case 'offset':
        case 'standardPotential':
          this.zero = values[q];
          break;
        case 'slope':
          this.slope = values[q];
          break;
        case 'junctionHydrogen':
          this.junctionHydrogen = values[q];
          break;
        case 'junctionHydroxide':
          this.junctionHydroxide = values[q];
          break;
        default:
          break;
      }
    }
  }

  get hasJunction(): boolean {
    return this.junctionHydrogen !== 0 || this.junctionHydroxide !== 0;
  }

  /** d reading / d(negative log), in the unit of the reading. */
  get perNegativeLog(): number {
    return this.isPotential ? -this.slope * this.nernstSlope : this.slope;
  }

  /** d reading / d slope. */
  perSlope(negativeLog: number): number {
    return this.isPotential ? -this.nernstSlope * negativeLog : negativeLog - pivot;
  }

  reading(negativeLog: number): number {
    return this.isPotential
      ? this.zero - this.slope * this.nernstSlope * negativeLog
      : pivot + this.zero + this.slope * (negativeLog - pivot);
  }

  /** The same with junction terms; [H⁺] and [OH⁻] in mol/L. */
  readingWithJunction(negativeLog: number, hydrogen: number, hydroxide: number): number {
    return this.reading(negativeLog) + this.junctionHydrogen * hydrogen + this.junctionHydroxide * hydroxide;
  }

  /** The negative log that a reading means; junction terms are left out. */
  negativeLog(reading: number): number {
    return this.isPotential
      ? (this.zero - reading) / (this.slope * this.nernstSlope)
      : pivot + (reading - pivot - this.zero) / this.slope;
  }
}
