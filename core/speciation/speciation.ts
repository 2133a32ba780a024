import { ChargeBalance } from '../chemistry/chargeBalance.ts';
import { daviesFunction } from '../chemistry/davies.ts';
import { firstSystem } from '../chemistry/mixture.ts';
import type { RunDesign } from '../model/runDesign.ts';
import { Vessels } from '../model/vessels.ts';

/** Halvings of a bracket of pH: 16 units to below 1e-13. */
const halvings = 60;
/** Range of pH searched for the isoelectric point. */
const searchRange = { lowest: -2, highest: 16 } as const;
/** Rounds in which a constant and the ionic strength at its own pH settle. */
const settlingRounds = 60;
/** Ionic strength where the run says nothing of it, mol/L. */
const neutralIonicStrength = 1e-7;

/** Ionic strength along a run: pH rising, mol/L. */
export interface IonicStrengthAlongRun {
  readonly pH: Float64Array;
  readonly ionicStrength_M: Float64Array;
}

/**
 * Shares of the forms of all systems of a run at any pH of the run's own scale,
 * at the ionic strength that the run has at that pH.
 */
export class Speciation {
  private readonly balance: ChargeBalance;
  private readonly design: RunDesign;
  private readonly along: IonicStrengthAlongRun;
  private readonly pKa: Float64Array;
  private readonly nothing: Float64Array;

  constructor(design: RunDesign, values: Float64Array, along: IonicStrengthAlongRun) {
    const vessels = new Vessels(design);
    vessels.take(values);
    this.design = design;
    this.along = along;
    this.pKa = vessels.pKa;
    this.balance = new ChargeBalance(
      design.systems.map((system) => system.shape),
      design.coefficientA,
    );
    this.balance.setConstants(vessels.pKa, vessels.pKw);
    this.nothing = new Float64Array(firstSystem + design.systems.length);
  }

  /** Ionic strength at a pH, mol/L; beyond the ends of the run that of the end. */
  ionicStrengthAt(pH: number): number {
    const { pH: grid, ionicStrength_M } = this.along;
    if (grid.length === 0) return neutralIonicStrength;
    let low = 0;
    let high = grid.length - 1;
    if (pH <= grid[low]) return ionicStrength_M[low];
    if (pH >= grid[high]) return ionicStrength_M[high];
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (grid[middle] > pH) high = middle;
      else low = middle;
    }
    const share = (pH - grid[low]) / (grid[high] - grid[low]);
    return ionicStrength_M[low] + share * (ionicStrength_M[high] - ionicStrength_M[low]);
  }

  /** Shares of the forms of one system, from the fully protonated one on; they sum to 1. */
  fractionsAt(system: number, pH: number): Float64Array {
    this.evaluate(pH);
    const first = this.firstForm(system);
    const inverse = this.balance.inverseSum[system];
    return Float64Array.from(
      { length: this.design.systems[system].shape.groups + 1 },
      (_, k) => this.balance.weights[first + k] * inverse,
    );
  }

  /** Mean charge of one system. */
  meanChargeAt(system: number, pH: number): number {
    this.evaluate(pH);
    return this.design.systems[system].shape.chargeFullyProtonated - this.balance.meanLost[system];
  }

  /** pH of the run's scale at which the two forms on either side of a group are equal: pKa′. */
  crossing(system: number, group: number): number {
    const { firstGroup, shape } = this.design.systems[system];
    const acidCharge = shape.chargeFullyProtonated - group;
    const thermodynamic = this.pKa[firstGroup + group];
    const activityTerm = (ionic: number) =>
      this.design.coefficientA > 0 ? this.design.coefficientA * daviesFunction(ionic) : 0;
    // On the activity scale H⁺ itself stands as its activity.
    const factor = 2 - 2 * acidCharge - (this.design.scale === 'activity' ? 1 : 0);
    let pH = thermodynamic;
    for (let round = 0; round < settlingRounds; round++) {
      const next = thermodynamic - factor * activityTerm(this.ionicStrengthAt(pH));
      // Halving the last moves keeps a steep change of ionic strength from swinging.
      pH = round < 10 ? next : 0.5 * (pH + next);
    }
    return pH;
  }

  /** pH of zero mean charge of one system; null where its charge never crosses zero. */
  isoelectricPoint(system: number): number | null {
    const { chargeFullyProtonated, groups } = this.design.systems[system].shape;
    // With zero charge only in a form at either end, zero is approached and never crossed.
    if (chargeFullyProtonated <= 0 || chargeFullyProtonated - groups >= 0) return null;
    let low: number = searchRange.lowest;
    let high: number = searchRange.highest;
    if (this.meanChargeAt(system, low) <= 0 || this.meanChargeAt(system, high) >= 0) return null;
    for (let i = 0; i < halvings; i++) {
      const middle = 0.5 * (low + high);
      if (this.meanChargeAt(system, middle) > 0) low = middle;
      else high = middle;
    }
    return 0.5 * (low + high);
  }

  private evaluate(pH: number): void {
    const ionic = this.ionicStrengthAt(pH);
    const activityTerm =
      this.design.scale === 'activity' && this.design.coefficientA > 0
        ? this.design.coefficientA * daviesFunction(ionic)
        : 0;
    this.balance.evaluate(this.nothing, -(pH - activityTerm) * Math.LN10, ionic);
  }

  private firstForm(system: number): number {
    let first = 0;
    for (let s = 0; s < system; s++) first += this.design.systems[s].shape.groups + 1;
    return first;
  }
}
