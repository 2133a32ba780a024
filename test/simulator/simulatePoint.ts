import type { SimulatedMedium, SimulatedSystem, SimulatedVessel } from './simulatedVessel.ts';

/** The mixture of both vessels at one volume of titrant. */
export interface SimulatedPoint {
  /** −log10 of the concentration of H⁺ in mol/L. */
  readonly pH_concentration: number;
  /** −log10 of the activity of H⁺. */
  readonly pH_activity: number;
  /** mol/L, over every ion of the mixture. */
  readonly ionicStrength: number;
  readonly hydrogen_M: number;
  readonly hydroxide_M: number;
  /**
   * mol/L; one entry per system, those of the sample before those of the
   * titrant; in each the forms from fully protonated to fully deprotonated.
   */
  readonly speciesConcentrations: readonly (readonly number[])[];
}

export interface SimulatedMixing {
  readonly sample: SimulatedVessel;
  /** Its `volume_mL` is not used: the volume added is given apart. */
  readonly titrant: SimulatedVessel;
  readonly extraWater_mL: number;
  /** Volume of titrant truly added, mL. */
  readonly volume_mL: number;
  readonly medium: SimulatedMedium;
}

interface Mixture {
  readonly cations_M: number;
  readonly anions_M: number;
  readonly systems: readonly SimulatedSystem[];
}

const LOWEST_PH = -2;
const HIGHEST_PH = 16;

function mix(sample: SimulatedVessel, titrant: SimulatedVessel, extraWater_mL: number, volume_mL: number): Mixture {
  const total = sample.volume_mL + extraWater_mL + volume_mL;
  const ofSample = sample.volume_mL / total;
  const ofTitrant = volume_mL / total;
  return {
    cations_M: sample.cations_M * ofSample + titrant.cations_M * ofTitrant,
    anions_M: sample.anions_M * ofSample + titrant.anions_M * ofTitrant,
    systems: [
      ...sample.systems.map((system) => ({ ...system, concentration_M: system.concentration_M * ofSample })),
      ...titrant.systems.map((system) => ({ ...system, concentration_M: system.concentration_M * ofTitrant })),
    ],
  };
}

/** A·f(I) of Davies (1962): −log10 γ of an ion of charge one; zero without activity correction. */
function daviesTerm(medium: SimulatedMedium, ionicStrength: number): number {
  if (medium.activity === 'none') return 0;
  const root = Math.sqrt(ionicStrength);
  return medium.debyeHueckelA * (root / (1 + root) - 0.3 * ionicStrength);
}

/** Concentrations of the forms of one system at a p[H⁺], from products of stepwise concentration constants. */
function formsOf(system: SimulatedSystem, pH: number, davies: number): number[] {
  // The weight of each form on a decadic log scale, relative to the fully protonated one.
  const logWeights = [0];
  for (let lost = 1; lost <= system.pKa.length; lost++) {
    const acidCharge = system.chargeFullyProtonated - (lost - 1);
    const baseCharge = acidCharge - 1;
    const pKc = system.pKa[lost - 1] - (1 + baseCharge ** 2 - acidCharge ** 2) * davies;
    logWeights.push(logWeights[lost - 1] + pH - pKc);
  }
  const largest = Math.max(...logWeights);
  const logSum = largest + Math.log10(logWeights.reduce((sum, weight) => sum + 10 ** (weight - largest), 0));
  return logWeights.map((weight) => system.concentration_M * 10 ** (weight - logSum));
}

interface Solved {
  readonly pH: number;
  readonly hydrogen_M: number;
  readonly hydroxide_M: number;
  readonly forms: readonly (readonly number[])[];
}

function speciesAt(mixture: Mixture, pH: number, pKw: number, davies: number): Solved {
  const pKwOfMedium = pKw - 2 * davies;
  return {
    pH,
    hydrogen_M: 10 ** -pH,
    hydroxide_M: 10 ** (pH - pKwOfMedium),
    forms: mixture.systems.map((system) => formsOf(system, pH, davies)),
  };
}

function netCharge(mixture: Mixture, solved: Solved): number {
  let charge = mixture.cations_M - mixture.anions_M + solved.hydrogen_M - solved.hydroxide_M;
  mixture.systems.forEach((system, s) => {
    solved.forms[s].forEach((concentration, lost) => {
      charge += (system.chargeFullyProtonated - lost) * concentration;
    });
  });
  return charge;
}

function ionicStrengthOf(mixture: Mixture, solved: Solved): number {
  let sum = mixture.cations_M + mixture.anions_M + solved.hydrogen_M + solved.hydroxide_M;
  mixture.systems.forEach((system, s) => {
    solved.forms[s].forEach((concentration, lost) => {
      sum += (system.chargeFullyProtonated - lost) ** 2 * concentration;
    });
  });
  return Math.max(0, sum / 2);
}

/** Plain bisection on p[H⁺]: net charge falls strictly as p[H⁺] rises. */
function solveAt(mixture: Mixture, pKw: number, davies: number): Solved {
  let low = LOWEST_PH;
  let high = HIGHEST_PH;
  if (
    netCharge(mixture, speciesAt(mixture, low, pKw, davies)) < 0 ||
    netCharge(mixture, speciesAt(mixture, high, pKw, davies)) > 0
  ) {
    throw new Error(`no p[H] between ${LOWEST_PH} and ${HIGHEST_PH} balances the charges of this mixture`);
  }
  while (high - low > 1e-13) {
    const middle = (low + high) / 2;
    // Beyond the last digit of a double there is nothing left to halve.
    if (middle === low || middle === high) break;
    if (netCharge(mixture, speciesAt(mixture, middle, pKw, davies)) > 0) low = middle;
    else high = middle;
  }
  return speciesAt(mixture, (low + high) / 2, pKw, davies);
}

/**
 * The composition of the mixture at one volume of titrant.
 *
 * Activity: Davies, log10 γ = −A z² (√I/(1+√I) − 0.3 I) for every ion and 1 for
 * neutral species (C. W. Davies, Ion Association, Butterworths 1962, p. 41,
 * from memory). The ionic strength is found by fixed-point iteration around
 * the charge balance, damped where the plain iteration swings.
 */
export function simulatePoint({ sample, titrant, extraWater_mL, volume_mL, medium }: SimulatedMixing): SimulatedPoint {
  const mixture = mix(sample, titrant, extraWater_mL, volume_mL);
  // A setting error can make the first volume, and with it the ions of the titrant, minutely negative.
  let ionicStrength = Math.max(0, (mixture.cations_M + mixture.anions_M) / 2);
  let solved = solveAt(mixture, medium.pKw, daviesTerm(medium, ionicStrength));
  let lastChange = Number.POSITIVE_INFINITY;
  let damping = 1;
  for (let iteration = 0; iteration < 500; iteration++) {
    const change = ionicStrengthOf(mixture, solved) - ionicStrength;
    ionicStrength += damping * change;
    // Rounding of the bisection keeps a change of some 1e-14 relative alive: no progress ends it too.
    if (Math.abs(change) < 1e-16 || (Math.abs(change) < 1e-13 && Math.abs(change) >= Math.abs(lastChange))) {
      return {
        pH_concentration: solved.pH,
        pH_activity: solved.pH + daviesTerm(medium, ionicStrength),
        ionicStrength,
        hydrogen_M: solved.hydrogen_M,
        hydroxide_M: solved.hydroxide_M,
        speciesConcentrations: solved.forms,
      };
    }
    if (Math.abs(change) > 0.5 * Math.abs(lastChange) && change * lastChange < 0) damping = Math.max(0.1, damping / 2);
    lastChange = change;
    solved = solveAt(mixture, medium.pKw, daviesTerm(medium, ionicStrength));
  }
  throw new Error('the ionic strength of this mixture did not settle');
}
