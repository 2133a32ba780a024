/**
 * The plain inputs of the simulator. Volumes in mL, concentrations in mol/L.
 *
 * The simulator is a second, deliberately different solver: nothing here may
 * import the code under test, and clarity goes before speed.
 */

/** One substance that takes up or gives off protons. */
export interface SimulatedSystem {
  /** Stepwise constants, from the first proton lost to the last. */
  readonly pKa: readonly number[];
  /** Charge of the form that still holds every proton. */
  readonly chargeFullyProtonated: number;
  readonly concentration_M: number;
}

/** One solution: strong ions of charge one, and proton systems. */
export interface SimulatedVessel {
  readonly volume_mL: number;
  readonly cations_M: number;
  readonly anions_M: number;
  readonly systems: readonly SimulatedSystem[];
}

/** What the two solutions are mixed in. */
export interface SimulatedMedium {
  readonly temperature_C: number;
  /** With 'davies' the constants are those at infinite dilution, with 'none' those of the medium. */
  readonly activity: 'davies' | 'none';
  /** Debye-Hückel A in (L/mol)^(1/2), decadic; not used with 'none'. */
  readonly debyeHueckelA: number;
  /** Thermodynamic with 'davies', of the medium with 'none'. */
  readonly pKw: number;
}
