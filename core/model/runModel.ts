import { daviesFunction } from '../chemistry/davies.ts';
import { Equilibrium } from '../chemistry/equilibrium.ts';
import { anionsIndex, cationsIndex, firstSystem } from '../chemistry/mixture.ts';
import { InverseCurve } from './inverseCurve.ts';
import { ReadingScale } from './readingScale.ts';
import type { RunDesign } from './runDesign.ts';
import { Vessels } from './vessels.ts';

/** Ionic strength from which the very first solution of a point starts, mol/L. */
const firstIonicStrength = 0.02;
/** ln[H⁺] by which a reading may lie off the curve and still say where on the curve it belongs: two pH units. */
const largestMiss = 2 * Math.LN10;
/** pH from which a point without a reading starts. */
const neutral = 7;

/**
 * Predicted readings of one run, and their exact derivatives with respect to
 * its quantities. Values are in the order of `design.quantities`.
 *
 * The model remembers the last solution of every point and starts the next
 * one there; before the first, it starts from the measured reading. Memory
 * changes the result by rounding only.
 */
export class RunModel {
  readonly design: RunDesign;
  /** Volumes as the burette showed them, mL. */
  readonly volumes: Float64Array;
  readonly equilibrium: Equilibrium;
  /** ln[H⁺] and ionic strength (mol/L) of every point at the last prediction. */
  readonly logHydrogen: Float64Array;
  readonly ionicStrength: Float64Array;

  /** Burette volume at which every point was evaluated last, mL: its own, or for points met at their reading that of the curve. */
  readonly evaluatedAt: Float64Array;

  /** 1 for points that are met at their measured reading; see `meetReadings`. */
  readonly met: Uint8Array;

  private readonly vessels: Vessels;
  private readonly inverse: InverseCurve;
  private readonly scale: ReadingScale;
  private readonly mixture: Float64Array;
  private readonly startReadings: Float64Array | null;
  private values: Float64Array;
  private started = false;

  /**
   * @param volumes burette readings, mL
   * @param startReadings measured readings to start from, or null to start from neutral
   */
  constructor(design: RunDesign, volumes: Float64Array, startReadings: Float64Array | null) {
    this.design = design;
    this.volumes = volumes;
    this.startReadings = startReadings;
    this.equilibrium = new Equilibrium(
      design.systems.map((system) => system.shape),
      design.coefficientA,
    );
    this.vessels = new Vessels(design);
    this.scale = new ReadingScale(design);
    this.mixture = new Float64Array(firstSystem + design.systems.length);
    this.logHydrogen = new Float64Array(volumes.length);
    this.ionicStrength = new Float64Array(volumes.length);
    this.values = new Float64Array(design.quantities.length);
    this.evaluatedAt = volumes.slice();
    this.met = new Uint8Array(volumes.length);
    this.inverse = new InverseCurve(this.equilibrium.balance, this.vessels, this.mixture);
  }

  /**
   * From now on, evaluates the points marked 1 not at their own volume but
   * where the curve passes their measured reading, as far as there is such a
   * volume; `evaluatedAt` says where each point was evaluated. Returns whether
   * that is another choice than before.
   */
  meetReadings(points: ArrayLike<number>): boolean {
    if (this.startReadings === null) throw new Error('without readings there is nothing to meet');
    const changed = this.met.some((mark, i) => mark !== points[i]);
    this.met.set(points);
    return changed;
  }

  /** Forgets the last solutions, so that the next prediction starts cold. */
  forget(): void {
    this.started = false;
  }

  /**
   * Writes the predicted reading of every point; false when the mixture has no
   * solution at some point.
   *
   * @param values all quantities of the run, in their units
   * @param readings pH or mV, written
   */
  predict(values: Float64Array, readings: Float64Array): boolean {
    this.values = values;
    const { equilibrium, vessels, volumes, mixture, scale, logHydrogen, ionicStrength } = this;
    if (!vessels.take(values)) return false;
    scale.take(values);
    equilibrium.balance.setConstants(vessels.pKa, vessels.pKw);
    if (!this.started) this.start();
    const activityTerm = this.design.scale === 'activity' && this.design.coefficientA > 0;
    const lnA = equilibrium.balance.lnA;
    for (let i = 0; i < volumes.length; i++) {
      if (this.met[i] === 1 && this.startReadings !== null && this.meet(i, this.startReadings[i])) {
        readings[i] = this.startReadings[i];
        continue;
      }
      this.evaluatedAt[i] = volumes[i];
      vessels.mix(vessels.gain * volumes[i], mixture);
      if (!equilibrium.solve(mixture, logHydrogen[i], ionicStrength[i])) {
        this.started = false;
        return false;
      }
      const x = equilibrium.logHydrogen;
      const ionic = equilibrium.ionicStrength;
      logHydrogen[i] = x;
      ionicStrength[i] = ionic;
      const negativeLog = (activityTerm ? lnA * daviesFunction(ionic) - x : -x) / Math.LN10;
      if (scale.hasJunction) {
        // The balance was evaluated last before the final step, which [OH⁻] would feel.
        equilibrium.balance.evaluate(mixture, x, ionic);
        readings[i] = scale.readingWithJunction(negativeLog, Math.exp(x), equilibrium.balance.hydroxide);
      } else readings[i] = scale.reading(negativeLog);
    }
    return true;
  }

  /**
   * Writes the derivatives of the readings at the values predicted last, each
   * at the volume where its point was evaluated.
   *
   * @param wanted positions of the quantities to differentiate by
   * @param derivatives d reading_i / d wanted_j at [j · points + i], written
   * @param slopes d reading / d burette volume per point, unit/mL, written
   */
  differentiate(wanted: Int32Array, derivatives: Float64Array, slopes: Float64Array): void {
    const { equilibrium, vessels, evaluatedAt, mixture, scale } = this;
    const { balance, byComposition, byLogKa } = equilibrium;
    const { sample, titrant, gain } = vessels;
    const roles = this.design.quantities.map((quantity) => quantity.role);
    const count = evaluatedAt.length;
    const activityTerm = this.design.scale === 'activity' && balance.davies;
    const components = mixture.length;
    for (let i = 0; i < count; i++) {
      const volume = gain * evaluatedAt[i];
      const total = vessels.mix(volume, mixture);
      const x = this.logHydrogen[i];
      const ionic = this.ionicStrength[i];
      balance.evaluate(mixture, x, ionic);
      const hydrogen = balance.hydrogen;
      const hydroxide = balance.hydroxide;
      const negativeLog = (activityTerm ? balance.lnA * daviesFunction(ionic) - x : -x) / Math.LN10;
      const perNegativeLog = scale.perNegativeLog / Math.LN10;
      const byX = -perNegativeLog + scale.junctionHydrogen * hydrogen - scale.junctionHydroxide * hydroxide;
      const byIonic =
        (activityTerm ? perNegativeLog * balance.daviesSlope : 0) +
        2 * scale.junctionHydroxide * hydroxide * balance.daviesSlope;
      equilibrium.differentiate(mixture, byX, byIonic);

      const sampleShare = vessels.sampleVolume / total;
      const titrantShare = volume / total;
      let perVolume = 0;
      let perSampleVolume = 0;
      let perWater = 0;
      for (let c = 0; c < components; c++) {
        const g = byComposition[c] / total;
        perVolume += g * (titrant[c] - mixture[c]);
        perSampleVolume += g * (sample[c] - mixture[c]);
        perWater -= g * mixture[c];
      }
      slopes[i] = perVolume * gain;

      for (let j = 0, at = i; j < wanted.length; j++, at += count) {
        const role = roles[wanted[j]];
        switch (role.kind) {
          case 'acidity':
            derivatives[at] = -Math.LN10 * byLogKa[role.group];
            break;
          case 'amount': {
            let sum = 0;
            for (let t = 0; t < role.terms.length; t++)
              sum += role.terms[t].factor * byComposition[role.terms[t].component];
            derivatives[at] = sum * (role.vessel === 'sample' ? sampleShare : titrantShare);
            break;
          }
          case 'strongIon': {
            const share = role.vessel === 'sample' ? sampleShare : titrantShare;
            derivatives[at] =
              share * (this.values[wanted[j]] < 0 ? -byComposition[anionsIndex] : byComposition[cationsIndex]);
            break;
          }
          case 'sampleVolume':
            derivatives[at] = perSampleVolume;
            break;
          case 'extraWater':
            derivatives[at] = perWater;
            break;
          case 'buretteGain':
            derivatives[at] = perVolume * evaluatedAt[i];
            break;
          case 'ionProduct':
            derivatives[at] = -Math.LN10 * (equilibrium.byLogKw + scale.junctionHydroxide * hydroxide);
            break;
          case 'offset':
          case 'standardPotential':
            derivatives[at] = 1;
            break;
          case 'slope':
            derivatives[at] = scale.perSlope(negativeLog);
            break;
          case 'junctionHydrogen':
            derivatives[at] = hydrogen;
            break;
          case 'junctionHydroxide':
            derivatives[at] = hydroxide;
            break;
        }
      }
    }
  }

  /**
   * Writes the slope d reading/dV that the curve has where it passes each
   * measured *reading*, at the values predicted last; unit/mL.
   *
   * A volume error moves a point along the curve, so that the slope belongs to
   * the height of the point, not to its volume: on a steep step the slope at
   * the volume changes tenfold with the smallest change of the constants.
   */
  slopesAtReadings(readings: Float64Array, slopes: Float64Array): void {
    const { equilibrium, vessels, evaluatedAt, mixture, scale } = this;
    const { balance, byComposition } = equilibrium;
    const activity = this.design.scale === 'activity' && balance.davies;
    for (let i = 0; i < evaluatedAt.length; i++) {
      const total = vessels.mix(vessels.gain * evaluatedAt[i], mixture);
      const ionic = this.ionicStrength[i];
      const activityTerm = activity ? balance.lnA * daviesFunction(ionic) : 0;
      const read = activityTerm - scale.negativeLog(readings[i]) * Math.LN10;
      // A reading that means no pH at all must not decide its own weight.
      const x = Math.max(this.logHydrogen[i] - largestMiss, Math.min(this.logHydrogen[i] + largestMiss, read));
      balance.evaluate(mixture, x, ionic);
      equilibrium.differentiate(mixture, -scale.perNegativeLog / Math.LN10, 0);
      let slope = 0;
      for (let c = 0; c < mixture.length; c++) slope += (byComposition[c] * (vessels.titrant[c] - mixture[c])) / total;
      slopes[i] = slope * vessels.gain;
    }
  }

  /** Evaluates a point where the curve passes a reading; false where it never does. */
  private meet(i: number, reading: number): boolean {
    const { inverse, scale, vessels } = this;
    if (scale.hasJunction) return false;
    if (!inverse.solve(scale.negativeLog(reading), this.design.scale === 'activity', this.ionicStrength[i]))
      return false;
    this.evaluatedAt[i] = inverse.volume / vessels.gain;
    this.logHydrogen[i] = inverse.logHydrogen;
    this.ionicStrength[i] = inverse.ionicStrength;
    return true;
  }

  /** Starts every point from its measured reading. */
  private start(): void {
    const lnA = this.design.scale === 'activity' ? this.equilibrium.balance.lnA : 0;
    const activityTerm = lnA * daviesFunction(firstIonicStrength);
    for (let i = 0; i < this.volumes.length; i++) {
      const negativeLog = this.startReadings === null ? neutral : this.scale.negativeLog(this.startReadings[i]);
      this.logHydrogen[i] = activityTerm - negativeLog * Math.LN10;
      this.ionicStrength[i] = firstIonicStrength;
    }
    this.started = true;
  }
}
