import type { ChargeBalance } from '../chemistry/chargeBalance.ts';
import { daviesFunction } from '../chemistry/davies.ts';
import { anionsIndex, cationsIndex, firstSystem } from '../chemistry/mixture.ts';
import type { Vessels } from './vessels.ts';

/** Rounds in which volume and ionic strength settle; the ionic strength hardly moves the volume, so that few are needed. */
const mostRounds = 40;
/** Relative change of the ionic strength that ends the search. */
const tolerance = 1e-13;
/** The titrant must carry at least this share of its own charge at the reading, or the volume runs away. */
const smallestCharge = 0.1;

/**
 * The volume of titrant at which a run passes a given pH: at fixed [H⁺] the
 * charge balance is linear in the volume. The counterpart of solving the pH
 * for a given volume.
 */
export class InverseCurve {
  /** True volume, mL, ln[H⁺] and ionic strength (mol/L) found last. */
  volume = 0;
  logHydrogen = 0;
  ionicStrength = 0;

  private readonly balance: ChargeBalance;
  private readonly vessels: Vessels;
  private readonly mixture: Float64Array;

  constructor(balance: ChargeBalance, vessels: Vessels, mixture: Float64Array) {
    this.balance = balance;
    this.vessels = vessels;
    this.mixture = mixture;
  }

  /**
   * Finds the volume at which −log a(H⁺) or −log[H⁺] has the value given;
   * false where the titrant cannot bring the mixture there.
   */
  solve(negativeLog: number, isActivity: boolean, guessIonicStrength: number): boolean {
    const { balance, vessels, mixture } = this;
    const { sample, titrant, sampleVolume, extraWater } = vessels;
    let ionic = guessIonicStrength;
    for (let round = 0; round < mostRounds; round++) {
      const activityTerm = isActivity && balance.davies ? balance.lnA * daviesFunction(ionic) : 0;
      const x = activityTerm - negativeLog * Math.LN10;
      balance.evaluate(mixture, x, ionic);
      const free = balance.hydrogen - balance.hydroxide;
      let sampleCharge = sample[cationsIndex] - sample[anionsIndex];
      let titrantCharge = titrant[cationsIndex] - titrant[anionsIndex];
      for (let s = 0; s < balance.shapes.length; s++) {
        const charge = balance.shapes[s].chargeFullyProtonated - balance.meanLost[s];
        sampleCharge += sample[firstSystem + s] * charge;
        titrantCharge += titrant[firstSystem + s] * charge;
      }
      const slope = titrantCharge + free;
      if (!(Math.abs(slope) > smallestCharge * Math.abs(titrantCharge)) || slope * titrantCharge <= 0) return false;
      const volume = -(sampleVolume * sampleCharge + (sampleVolume + extraWater) * free) / slope;
      // A little below zero is a reading that noise has moved off the first point.
      if (!(volume > -0.5 * sampleVolume)) return false;
      vessels.mix(volume, mixture);
      let ions = mixture[cationsIndex] + mixture[anionsIndex] + balance.hydrogen + balance.hydroxide;
      for (let s = 0; s < balance.shapes.length; s++) ions += mixture[firstSystem + s] * balance.meanSquaredCharge[s];
      const next = 0.5 * ions;
      const settled = !balance.davies || Math.abs(next - ionic) <= tolerance * next;
      ionic = next;
      if (settled) {
        this.volume = volume;
        this.logHydrogen = x;
        this.ionicStrength = ionic;
        return Number.isFinite(volume) && ionic > 0;
      }
    }
    return false;
  }
}
