import type { ReadingKind } from '../run/run.ts';
import type { Celsius } from '../units/temperature.ts';
import type { Declaration } from './declaration.ts';

/** A choice of the chemist that is not a number with an uncertainty. */
export interface Choice<Value> {
  readonly value: Value;
  /** True where nobody has confirmed it. */
  readonly assumed: boolean;
}

/** Which form of the base a titrant's strength counts; see the model of the titrant. */
export type StrengthMeaning = 'hydroxide' | 'toHydrogencarbonate' | 'totalBase';

export type TitrantKind = 'base' | 'acid' | 'solution';

/** A counter-ion that takes part in proton transfer itself, at a fixed ratio to its analyte. */
export interface CounterIon {
  readonly name: string;
  readonly ratio: number;
  readonly chargeFullyProtonated: number;
  readonly protonsLostAsWeighed: number;
  readonly pKa: readonly Declaration[];
}

/** A substance with ionisable groups in either vessel. */
export interface Analyte {
  readonly name: Choice<string>;
  /** Number of ionisable groups, 0–6; equal to the length of `pKa`. */
  readonly groups: Choice<number>;
  readonly chargeFullyProtonated: Choice<number>;
  /** Protons that the weighed form has lost, from which its counter-ions follow; null where those are declared as strong ions. */
  readonly protonsLostAsWeighed: Choice<number> | null;
  readonly counterIon: CounterIon | null;
  /** mol/L in its own vessel. */
  readonly concentration: Declaration;
  readonly pKa: readonly Declaration[];
}

/** What both vessels hold beside their analytes, mol/L. */
export interface Vessel {
  readonly strongIon: Declaration;
  readonly carbonate: Declaration;
  readonly background: Declaration;
  /** Explicit strong ions; null where the vessel is not written in full. */
  readonly cations: Declaration | null;
  readonly anions: Declaration | null;
}

/** Everything declared about a run, complete: what was left out is filled in and marked as assumed. */
export interface Sheet {
  readonly sample: Vessel & {
    /** mL */
    readonly volume: Declaration;
    /** mL */
    readonly extraWater: Declaration;
    readonly analytes: readonly Analyte[];
  };
  readonly titrant: Vessel & {
    readonly kind: Choice<TitrantKind>;
    readonly name: string | null;
    /** mol/L; null for a titrant written as a solution. */
    readonly concentration: Declaration | null;
    readonly strengthMeans: Choice<StrengthMeaning>;
    readonly systems: readonly Analyte[];
  };
  readonly burette: {
    readonly gain: Declaration;
    /** Standard uncertainties in mL. */
    readonly settingUncertainty: Choice<number>;
    readonly doseUncertainty: Choice<number>;
  };
  readonly medium: {
    readonly solvent: string;
    readonly temperature: Choice<Celsius>;
    readonly activity: Choice<'davies' | 'none'>;
    /** At infinite dilution with Davies, of the medium without. */
    readonly pKw: Declaration;
    readonly carbonicPKa: readonly [Declaration, Declaration];
  };
  readonly reading: {
    readonly kind: ReadingKind;
    readonly scale: Choice<'activity' | 'concentration'>;
    /** For pH: deviation at pH 7. */
    readonly offset: Declaration;
    readonly slope: Declaration;
    /** For mV. */
    readonly standardPotential: Declaration;
    readonly junctionHydrogen: Declaration;
    readonly junctionHydroxide: Declaration;
    /** Standard uncertainty of a reading in its own unit; null: estimated from the run. */
    readonly uncertainty: number | null;
  };
}
