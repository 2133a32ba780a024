import { Equilibrium } from '../chemistry/equilibrium.ts';
import { anionsIndex, cationsIndex, firstSystem } from '../chemistry/mixture.ts';
import type { DesignedSystem, RunDesign } from './runDesign.ts';
import { Vessels } from './vessels.ts';

/** Rounds in which volume and forms present settle; forms are whole, so that few are needed. */
const mostRounds = 10;
/** Start of the charge balance where nothing is known: pH 7, 0.05 mol/L. */
const neutralLogHydrogen = -7 * Math.LN10;
const startIonicStrength = 0.05;

/** The volume at which the titrant has exactly supplied one proton step. */
export interface EquivalenceVolume {
  readonly analyte: string;
  /** Number of the step in the order of the titration, from 1; 0 for an excess of strong acid or base. */
  readonly step: number;
  /** Burette reading, mL. */
  readonly volume_mL: number;
  /** d volume / d quantity, in the order of the quantities of the run. */
  readonly gradient: Float64Array;
  /** Forms in which the other substances are counted, in words; empty where there are none. */
  readonly countedAs: string;
}

/**
 * Equivalence volumes of all steps that lie on the side of the titrant.
 *
 * At such a volume the strong ions, the analyte in the form wanted, and every
 * other substance in the form that prevails there carry no net charge; [H⁺] and
 * [OH⁻] count for nothing. Whole forms make this a linear equation in volume.
 */
export function equivalenceVolumes(design: RunDesign, values: Float64Array): EquivalenceVolume[] {
  const vessels = new Vessels(design);
  if (!vessels.take(values)) return [];
  const equilibrium = new Equilibrium(
    design.systems.map((system) => system.shape),
    design.coefficientA,
  );
  equilibrium.balance.setConstants(vessels.pKa, vessels.pKw);
  const mixture = new Float64Array(firstSystem + design.systems.length);
  const charges = new Float64Array(mixture.length);
  charges[cationsIndex] = 1;
  charges[anionsIndex] = -1;

  /** The volume for one analyte in one form; null where the titrant leads away from it. */
  const volumeFor = (target: number, form: number): { volume: number; countedAs: string } | null => {
    // From the sample on, so that of several volumes that agree with themselves the first one is found.
    let volume = 0;
    for (let round = 0; round < mostRounds; round++) {
      vessels.mix(volume, mixture);
      if (!equilibrium.solve(mixture, neutralLogHydrogen, startIonicStrength)) return null;
      design.systems.forEach((system, s) => {
        const lost = s === target ? form : Math.round(equilibrium.balance.meanLost[s]);
        charges[firstSystem + s] = system.shape.chargeFullyProtonated - lost;
      });
      const next = (-chargeOf(vessels.sample, charges) * vessels.sampleVolume) / chargeOf(vessels.titrant, charges);
      if (!(next > 0 && Number.isFinite(next))) return null;
      if (round > 0 && next === volume) break;
      volume = next;
    }
    return { volume, countedAs: describeForms(design, charges, target) };
  };

  const results: EquivalenceVolume[] = [];
  const add = (analyte: string, step: number, found: { volume: number; countedAs: string }) =>
    results.push({
      analyte,
      step,
      volume_mL: found.volume / vessels.gain,
      gradient: gradientOf(design, vessels, charges, found.volume),
      countedAs: found.countedAs,
    });

  const analytes = design.systems.flatMap((system, s) => (system.role === 'analyte' ? [{ system, s }] : []));
  for (const { system, s } of analytes) {
    const steps = [];
    for (let form = 0; form <= system.shape.groups; form++) {
      if (form === system.protonsLostAsWeighed) continue;
      const found = volumeFor(s, form);
      if (found !== null) steps.push({ form, volume: found.volume });
    }
    steps.sort((a, b) => a.volume - b.volume);
    steps.forEach(({ form }, index) => {
      // Once more, so that the charges belong to this form when the gradient is taken.
      const found = volumeFor(s, form);
      if (found !== null) add(system.name, index + 1, found);
    });
  }
  const excess = values[design.quantities.findIndex((quantity) => quantity.id === 'sample.strongIon')];
  if (excess !== 0 || analytes.length === 0) {
    const [first] = analytes;
    const found = first === undefined ? volumeFor(-1, 0) : volumeFor(first.s, startForm(first.system));
    if (found !== null) add(excess > 0 ? 'strong base' : 'strong acid', analytes.length === 0 ? 1 : 0, found);
  }
  return results;
}

function startForm(system: DesignedSystem): number {
  return system.protonsLostAsWeighed ?? Math.min(system.shape.groups, Math.max(0, system.shape.chargeFullyProtonated));
}

function chargeOf(vessel: Float64Array, charges: Float64Array): number {
  let sum = 0;
  for (let c = 0; c < vessel.length; c++) sum += vessel[c] * charges[c];
  return sum;
}

/** Derivatives of V = −Q_sample V₀ / (Q_titrant gain) with the forms held. */
function gradientOf(design: RunDesign, vessels: Vessels, charges: Float64Array, volume: number): Float64Array {
  const titrantCharge = chargeOf(vessels.titrant, charges);
  const perCharge = {
    sample: -vessels.sampleVolume / titrantCharge / vessels.gain,
    titrant: -volume / titrantCharge / vessels.gain,
  };
  return Float64Array.from(design.quantities, ({ role }) => {
    switch (role.kind) {
      case 'amount': {
        let charge = 0;
        for (const term of role.terms) charge += term.factor * charges[term.component];
        return perCharge[role.vessel] * charge;
      }
      case 'strongIon':
        return perCharge[role.vessel];
      case 'sampleVolume':
        return volume / vessels.sampleVolume / vessels.gain;
      case 'buretteGain':
        return -volume / vessels.gain ** 2;
      default:
        return 0;
    }
  });
}

/** Forms of carbonate by their protons. */
const carbonateForms = ['CO₃²⁻', 'HCO₃⁻', 'CO₂'];

/** Which form of every other substance was counted, for the remark beside the volume. */
function describeForms(design: RunDesign, charges: Float64Array, target: number): string {
  return design.systems
    .flatMap((system, s) => {
      if (s === target) return [];
      const charge = charges[firstSystem + s];
      const protons = system.shape.groups - (system.shape.chargeFullyProtonated - charge);
      if (system.role === 'carbonate') return [`carbonate counted as ${carbonateForms[protons]}`];
      return [`${system.name} counted with ${protons === 1 ? '1 proton' : `${protons} protons`} left`];
    })
    .join(', ');
}
