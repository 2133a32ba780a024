import { carbonicChargeFullyProtonated } from '../chemistry/carbonicAcid.ts';
import { debyeHueckelA } from '../chemistry/debyeHueckel.ts';
import { anionsIndex, cationsIndex, firstSystem } from '../chemistry/mixture.ts';
import type { ProtonSystemShape } from '../chemistry/protonSystem.ts';
import type { ReadingKind } from '../run/run.ts';
import type { Declaration } from '../sheet/declaration.ts';
import type { Analyte, Sheet, StrengthMeaning, Vessel } from '../sheet/sheet.ts';
import { nernstSlope_mV } from '../units/nernstSlope.ts';
import type { ComponentTerm, Quantity, QuantityRole } from './quantity.ts';

/** One proton system of a run, with what the reader calls it. */
export interface DesignedSystem {
  readonly name: string;
  readonly shape: ProtonSystemShape;
  /** Position of its first group among all groups of the run. */
  readonly firstGroup: number;
  /** Prefix of its ids: "" for the first analyte, "analyte2." for the second, "titrant.system1." and so on. */
  readonly prefix: string;
  readonly role: 'analyte' | 'counterIon' | 'carbonate' | 'titrant';
  /** For analytes: protons lost by the weighed form; null where its ions are declared. */
  readonly protonsLostAsWeighed: number | null;
}

/** What the model of a run computes with: its systems and its quantities. */
export interface RunDesign {
  readonly systems: readonly DesignedSystem[];
  /** Debye–Hückel A in (L/mol)^½; 0 where constants are those of the medium. */
  readonly coefficientA: number;
  readonly readingKind: ReadingKind;
  readonly scale: 'activity' | 'concentration';
  /** mV per unit of pH. */
  readonly nernstSlope_mV: number;
  readonly titrantKind: 'base' | 'acid' | 'solution';
  readonly quantities: readonly Quantity[];
}

/** mol/L of strong cations and of carbonate per mol/L of carbonate in a base whose strength is held. */
const carbonateCations: Record<StrengthMeaning, number> = {
  // Strength counts OH⁻ alone: carbonate brings both its cations on top.
  hydroxide: 2,
  // Strength counts OH⁻ + CO₃²⁻: one of the two cations is already in it.
  toHydrogencarbonate: 1,
  // Strength counts OH⁻ + 2 CO₃²⁻: both are.
  totalBase: 0,
};

/** Lays out the systems and quantities of a run from its sheet. */
export function designRun(sheet: Sheet): RunDesign {
  const systems: DesignedSystem[] = [];
  const quantities: Quantity[] = [];
  let groupCount = 0;

  const add = (id: string, label: string, unit: string, role: QuantityRole, declaration: Declaration) =>
    quantities.push({ id, label, unit, role, declaration });

  /** Adds a system with its constants; returns its component. */
  const addSystem = (system: Omit<DesignedSystem, 'firstGroup'>, pKa: readonly Declaration[]): number => {
    systems.push({ ...system, firstGroup: groupCount });
    pKa.forEach((declaration, k) => {
      const of = system.role === 'analyte' && system.prefix === '' ? '' : ` of ${system.name}`;
      add(
        `${system.prefix}pKa${k + 1}`,
        `pKa${subscript(k + 1)}${of}`,
        '',
        { kind: 'acidity', group: groupCount + k },
        declaration,
      );
    });
    groupCount += pKa.length;
    return firstSystem + systems.length - 1;
  };

  const addAnalyte = (analyte: Analyte, prefix: string, vessel: 'sample' | 'titrant') => {
    const z0 = analyte.chargeFullyProtonated.value;
    const lost = analyte.protonsLostAsWeighed?.value ?? null;
    const component = addSystem(
      {
        name: analyte.name.value,
        shape: { groups: analyte.groups.value, chargeFullyProtonated: z0 },
        prefix,
        role: vessel === 'sample' ? 'analyte' : 'titrant',
        protonsLostAsWeighed: lost,
      },
      analyte.pKa,
    );
    const terms: ComponentTerm[] = [{ component, factor: 1 }];
    if (lost !== null) {
      let charge = z0 - lost;
      const counterIon = analyte.counterIon;
      if (counterIon !== null) {
        const counterComponent = addSystem(
          {
            name: counterIon.name,
            shape: { groups: counterIon.pKa.length, chargeFullyProtonated: counterIon.chargeFullyProtonated },
            prefix: `${prefix}counterIon.`,
            role: 'counterIon',
            protonsLostAsWeighed: counterIon.protonsLostAsWeighed,
          },
          counterIon.pKa,
        );
        terms.push({ component: counterComponent, factor: counterIon.ratio });
        charge += counterIon.ratio * (counterIon.chargeFullyProtonated - counterIon.protonsLostAsWeighed);
      }
      if (charge > 0) terms.push({ component: anionsIndex, factor: charge });
      if (charge < 0) terms.push({ component: cationsIndex, factor: -charge });
    }
    const of = prefix === '' ? '' : ` of ${analyte.name.value}`;
    add(
      `${prefix}concentration`,
      `concentration${of}`,
      'mol/L',
      { kind: 'amount', vessel, terms },
      analyte.concentration,
    );
  };

  sheet.sample.analytes.forEach((analyte, index) => {
    addAnalyte(analyte, index === 0 ? '' : `analyte${index + 1}.`, 'sample');
  });
  sheet.titrant.systems.forEach((system, index) => {
    addAnalyte(system, `titrant.system${index + 1}.`, 'titrant');
  });

  const { sample, titrant, medium, reading } = sheet;
  const carbonic =
    isPresent(sample.carbonate) || isPresent(titrant.carbonate)
      ? addSystem(
          {
            name: 'carbonate',
            shape: { groups: 2, chargeFullyProtonated: carbonicChargeFullyProtonated },
            prefix: 'carbonate.',
            role: 'carbonate',
            protonsLostAsWeighed: 2,
          },
          medium.carbonicPKa,
        )
      : null;

  if (titrant.concentration !== null) {
    const component = titrant.kind.value === 'acid' ? anionsIndex : cationsIndex;
    const role: QuantityRole = { kind: 'amount', vessel: 'titrant', terms: [{ component, factor: 1 }] };
    add('titrant.concentration', 'titrant concentration', 'mol/L', role, titrant.concentration);
  }
  const addVessel = (vessel: 'sample' | 'titrant', contents: Vessel, cationsPerCarbonate: number) => {
    const amount = (terms: readonly ComponentTerm[]): QuantityRole => ({ kind: 'amount', vessel, terms });
    const carbonateTerms =
      carbonic === null
        ? []
        : [
            { component: cationsIndex, factor: cationsPerCarbonate },
            { component: carbonic, factor: 1 },
          ];
    add(`${vessel}.carbonate`, `carbonate in the ${vessel}`, 'mol/L', amount(carbonateTerms), contents.carbonate);
    add(
      `${vessel}.strongIon`,
      `strong base (+) or acid (−) in the ${vessel}`,
      'mol/L',
      { kind: 'strongIon', vessel },
      contents.strongIon,
    );
    add(
      `${vessel}.background`,
      `background electrolyte in the ${vessel}`,
      'mol/L',
      amount([
        { component: cationsIndex, factor: 1 },
        { component: anionsIndex, factor: 1 },
      ]),
      contents.background,
    );
    if (contents.cations !== null)
      add(
        `${vessel}.cations`,
        `strong cations in the ${vessel}`,
        'mol/L',
        amount([{ component: cationsIndex, factor: 1 }]),
        contents.cations,
      );
    if (contents.anions !== null)
      add(
        `${vessel}.anions`,
        `strong anions in the ${vessel}`,
        'mol/L',
        amount([{ component: anionsIndex, factor: 1 }]),
        contents.anions,
      );
  };
  addVessel('titrant', titrant, titrant.kind.value === 'base' ? carbonateCations[titrant.strengthMeans.value] : 2);
  addVessel('sample', sample, 2);

  add('sample.volume', 'sample volume', 'mL', { kind: 'sampleVolume' }, sample.volume);
  add('sample.extraWater', 'extra water', 'mL', { kind: 'extraWater' }, sample.extraWater);
  add(
    'medium.pKw',
    medium.solvent === 'water' ? 'pKw' : 'autoprotolysis constant',
    '',
    { kind: 'ionProduct' },
    medium.pKw,
  );
  add('burette.gain', 'burette gain', '', { kind: 'buretteGain' }, sheet.burette.gain);
  if (reading.kind === 'pH') add('reading.offset', 'electrode offset at pH 7', '', { kind: 'offset' }, reading.offset);
  else add('reading.E0', 'standard potential E0', 'mV', { kind: 'standardPotential' }, reading.standardPotential);
  add('reading.slope', 'electrode slope', '', { kind: 'slope' }, reading.slope);
  if (isPresent(reading.junctionHydrogen))
    add(
      'reading.junctionHydrogen',
      'junction term of H⁺',
      'L/mol',
      { kind: 'junctionHydrogen' },
      reading.junctionHydrogen,
    );
  if (isPresent(reading.junctionHydroxide))
    add(
      'reading.junctionHydroxide',
      'junction term of OH⁻',
      'L/mol',
      { kind: 'junctionHydroxide' },
      reading.junctionHydroxide,
    );

  return {
    systems,
    coefficientA: medium.activity.value === 'davies' ? debyeHueckelA(medium.temperature.value) : 0,
    readingKind: reading.kind,
    scale: reading.scale.value,
    nernstSlope_mV: nernstSlope_mV(medium.temperature.value),
    titrantKind: titrant.kind.value,
    quantities,
  };
}

/** False only for a quantity fixed at nothing. */
function isPresent(declaration: Declaration): boolean {
  return declaration.state !== 'fixed' || declaration.value !== 0;
}

function subscript(digit: number): string {
  return '₀₁₂₃₄₅₆'[digit];
}
