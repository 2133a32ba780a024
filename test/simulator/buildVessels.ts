import type { SimulatedSystem, SimulatedVessel } from './simulatedVessel.ts';

/** Constants of carbonic acid at 25 °C and infinite dilution; source in test/reference/SOURCES.md (pka-handbook). */
export const CARBONIC_PKA_25C: readonly number[] = [6.351, 10.329];

/** A substance as a chemist weighs it. */
export interface WeighedAnalyte {
  readonly pKa: readonly number[];
  readonly chargeFullyProtonated: number;
  /** Protons that the weighed form lacks: 0 for a free acid or a hydrochloride with every proton, and so on. */
  readonly protonsLostAsWeighed: number;
  readonly concentration_M: number;
}

interface Additions {
  /** mol/L of carbonate, as Na₂CO₃. */
  readonly carbonate_M?: number;
  /** mol/L of a salt of two ions of charge one. */
  readonly background_M?: number;
  /** Defaults to the values at 25 °C; to be given for another temperature or a medium of constant ionic strength. */
  readonly carbonicPKa?: readonly number[];
}

export interface SampleInWords extends Additions {
  readonly volume_mL: number;
  readonly analytes: readonly WeighedAnalyte[];
  /** Strong base if positive, strong acid if negative, mol/L. */
  readonly strongIon_M?: number;
}

/** The sample vessel: every weighed form brings counter-ions of charge −C(z₀ − j). */
export function buildSample(words: SampleInWords): SimulatedVessel {
  let cations_M = 0;
  let anions_M = 0;
  const systems: SimulatedSystem[] = [];
  for (const analyte of words.analytes) {
    const counterCharge = -analyte.concentration_M * (analyte.chargeFullyProtonated - analyte.protonsLostAsWeighed);
    if (counterCharge > 0) cations_M += counterCharge;
    else anions_M -= counterCharge;
    systems.push({
      pKa: analyte.pKa,
      chargeFullyProtonated: analyte.chargeFullyProtonated,
      concentration_M: analyte.concentration_M,
    });
  }
  const strongIon = words.strongIon_M ?? 0;
  if (strongIon > 0) cations_M += strongIon;
  else anions_M -= strongIon;
  return withAdditions({ volume_mL: words.volume_mL, cations_M, anions_M, systems }, words, 2);
}

/**
 * What the strength c of a base that holds carbonate x counts: hydroxide alone,
 * hydroxide + carbonate (titrated to hydrogencarbonate), or hydroxide + twice
 * the carbonate.
 */
export type StrengthMeaning = 'hydroxide' | 'toHydrogencarbonate' | 'totalBase';

export interface BaseInWords extends Additions {
  readonly concentration_M: number;
  readonly strengthMeans?: StrengthMeaning;
}

/** A strong base. */
export function buildBaseTitrant(words: BaseInWords): SimulatedVessel {
  const cationsPerCarbonate = { hydroxide: 2, toHydrogencarbonate: 1, totalBase: 0 }[
    words.strengthMeans ?? 'hydroxide'
  ];
  return withAdditions(
    { volume_mL: 0, cations_M: words.concentration_M, anions_M: 0, systems: [] },
    words,
    cationsPerCarbonate,
  );
}

export interface AcidInWords extends Additions {
  readonly concentration_M: number;
}

/** A strong acid of one proton. */
export function buildAcidTitrant(words: AcidInWords): SimulatedVessel {
  return withAdditions({ volume_mL: 0, cations_M: 0, anions_M: words.concentration_M, systems: [] }, words, 2);
}

/** A titrant that is itself an analyte: a weak acid or base, or a buffer. */
export function buildWeakTitrant(words: Omit<SampleInWords, 'volume_mL'>): SimulatedVessel {
  return buildSample({ ...words, volume_mL: 0 });
}

function withAdditions(vessel: SimulatedVessel, additions: Additions, cationsPerCarbonate: number): SimulatedVessel {
  const carbonate = additions.carbonate_M ?? 0;
  const background = additions.background_M ?? 0;
  const carbonic: SimulatedSystem = {
    pKa: additions.carbonicPKa ?? CARBONIC_PKA_25C,
    chargeFullyProtonated: 0,
    concentration_M: carbonate,
  };
  return {
    volume_mL: vessel.volume_mL,
    cations_M: vessel.cations_M + cationsPerCarbonate * carbonate + background,
    anions_M: vessel.anions_M + background,
    systems: carbonate === 0 ? vessel.systems : [...vessel.systems, carbonic],
  };
}
