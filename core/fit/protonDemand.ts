import { ChargeBalance } from '../chemistry/chargeBalance.ts';
import { daviesFunction } from '../chemistry/davies.ts';
import { anionsIndex, cationsIndex, firstSystem } from '../chemistry/mixture.ts';
import type { ProblemRun } from '../model/problem.ts';
import { ReadingScale } from '../model/readingScale.ts';
import { Vessels } from '../model/vessels.ts';

/** What the readings themselves say about the protons that the open analytes have lost; one entry per point. */
export interface ProtonDemand {
  /** p[H⁺] of every reading. */
  readonly pH: Float64Array;
  /**
   * Protons lost by the open analytes since they were weighed, mol per litre
   * of sample: charge balance leaves nothing else to find.
   */
  readonly lost: Float64Array;
  /** Rough ionic strength, mol/L. */
  readonly ionicStrength: Float64Array;
}

/**
 * Turns readings into protons lost, by the charge balance of everything but
 * the open analytes. Needs no constants of theirs, only the other quantities.
 *
 * @param values all quantities of the run, with the amounts of open analytes at 0
 */
export function protonDemand(run: ProblemRun, values: Float64Array): ProtonDemand {
  const { design, volumes, readings } = run;
  const count = volumes.length;
  const demand: ProtonDemand = {
    pH: new Float64Array(count),
    lost: new Float64Array(count),
    ionicStrength: new Float64Array(count),
  };
  const balance = new ChargeBalance(
    design.systems.map((system) => system.shape),
    design.coefficientA,
  );
  const scale = new ReadingScale(design);
  const vessels = new Vessels(design);
  vessels.take(values);
  scale.take(values);
  balance.setConstants(vessels.pKa, vessels.pKw);
  const mixture = new Float64Array(firstSystem + design.systems.length);
  for (let i = 0; i < count; i++) {
    const total = vessels.mix(vessels.gain * volumes[i], mixture);
    // Strong ions of one sign are balanced by forms of the other, so the larger count is nearly the ionic strength.
    const ionic = Math.max(mixture[cationsIndex], mixture[anionsIndex], 1e-4);
    const negativeLog = scale.negativeLog(readings[i]);
    const activityTerm =
      design.scale === 'activity' && design.coefficientA > 0 ? design.coefficientA * daviesFunction(ionic) : 0;
    const pH = negativeLog - activityTerm;
    balance.evaluate(mixture, -pH * Math.LN10, ionic);
    demand.pH[i] = pH;
    demand.ionicStrength[i] = ionic;
    demand.lost[i] = ((balance.gained - balance.given) * total) / vessels.sampleVolume;
  }
  return demand;
}
