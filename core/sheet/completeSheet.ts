import { carbonicConstants } from '../chemistry/carbonicAcid.ts';
import { type ConstantScale, constantInMedium, ionProductInMedium } from '../chemistry/constantInMedium.ts';
import { debyeHueckelA } from '../chemistry/debyeHueckel.ts';
import { waterIonProduct } from '../chemistry/waterIonProduct.ts';
import type { Outcome } from '../notice/outcome.ts';
import type { Refusal } from '../notice/refusal.ts';
import { nernstSlope_mV } from '../units/nernstSlope.ts';
import { celsius } from '../units/temperature.ts';
import { assumedCalibration, assumedTitrant, assumptions } from './assumptions.ts';
import { completeAnalyte } from './completeAnalyte.ts';
import type { Declaration } from './declaration.ts';
import { readDeclaration } from './readDeclaration.ts';
import type { RunFacts } from './runFacts.ts';
import type { Choice, Sheet, TitrantKind, Vessel } from './sheet.ts';
import type { QuantityFile, SheetFile } from './sheetFile.ts';
import { sheetInconsistencies } from './sheetInconsistencies.ts';

function choose<Value>(declared: Value | undefined, assumed: Value): Choice<Value> {
  return declared === undefined ? { value: assumed, assumed: true } : { value: declared, assumed: false };
}

function orFixed(declared: QuantityFile | undefined, value: number): Declaration {
  return declared === undefined ? { state: 'fixed', value, assumed: true } : readDeclaration(declared);
}

function orKnown(
  declared: QuantityFile | undefined,
  assumed: { readonly value: number; readonly u: number; readonly source: string | null },
): Declaration {
  return declared === undefined ? { state: 'known', ...assumed, assumed: true } : readDeclaration(declared);
}

/** A quantity that hardly ever occurs: left out means absent, which is not an assumption about the run. */
function orAbsent(declared: QuantityFile | undefined): Declaration {
  return declared === undefined ? { state: 'fixed', value: 0, assumed: false } : readDeclaration(declared);
}

type VesselFile = NonNullable<SheetFile['sample']> | NonNullable<SheetFile['titrant']>;

function completeVessel(file: VesselFile, inFull: boolean): Vessel {
  return {
    strongIon: orFixed(file.strongIon_M, assumptions.strongIon_M),
    carbonate: orFixed(file.carbonate_M, assumptions.carbonate_M),
    background: orFixed(file.background_M, assumptions.background_M),
    cations: inFull ? orFixed(file.cations_M, 0) : null,
    anions: inFull ? orFixed(file.anions_M, 0) : null,
  };
}

/** Fills in what a sheet leaves out; every value filled in is marked as assumed. */
export function completeSheet(file: SheetFile, facts: RunFacts): Outcome<Sheet> {
  const refusals: readonly Refusal[] = sheetInconsistencies(file, facts);
  if (refusals.length > 0) return { ok: false, refusals };

  const sample = file.sample ?? {};
  const titrant = file.titrant ?? {};
  const reading = file.reading ?? {};
  const medium = file.medium ?? {};
  const kind: Choice<TitrantKind> = choose(titrant.kind, facts.titrantKind);
  const sampleInFull = sample.cations_M !== undefined || sample.anions_M !== undefined || sample.systems !== undefined;
  const titrantInFull = kind.value === 'solution';

  const sampleVessel = completeVessel(sample, sampleInFull);
  const declaredAnalytes = sample.analytes ?? (sampleInFull ? [] : [{}]);
  const analytes = [
    ...declaredAnalytes.map((analyte) => completeAnalyte(analyte, facts, false)),
    ...(sample.systems ?? []).map((system) => completeAnalyte(system, facts, true)),
  ].filter((analyte) => analyte.groups.value > 0);
  // Without any system the only thing a run can tell is the strong acid or base in the sample.
  const strongOnly = analytes.length === 0 && sample.strongIon_M === undefined && !sampleInFull;

  const temperature = choose(medium.temperature_C, assumptions.temperature_C);
  const t = celsius(temperature.value);
  const activity = choose(medium.activity, assumptions.activity as 'davies' | 'none');
  const scale = choose(reading.scale, assumptions.scale as 'activity' | 'concentration');
  const constantScale: ConstantScale = scale.value === 'activity' ? 'mixed' : 'concentration';
  const background = sampleVessel.background;
  const backgroundValue = background.state === 'fitted' ? (background.start ?? 0) : background.value;
  const coefficientA = debyeHueckelA(t);
  // Without an activity model the defaults must hold in this medium; with Davies the model converts them.
  const inMedium = activity.value === 'none' && backgroundValue > 0;
  const pKw = waterIonProduct(t);
  const [carbonic1, carbonic2] = carbonicConstants(t);
  const defaultPKw = inMedium ? ionProductInMedium(pKw, backgroundValue, coefficientA, constantScale) : pKw;
  const defaultCarbonic = [carbonic1, carbonic2].map((pKa, group) =>
    inMedium ? constantInMedium(pKa, -group, backgroundValue, coefficientA, constantScale) : pKa,
  );

  const nernst = nernstSlope_mV(t);
  const readingKind = reading.kind ?? facts.readingKind;
  const offset: Declaration =
    reading.offset !== undefined
      ? readDeclaration(reading.offset)
      : {
          state: 'known',
          value: assumptions.offset,
          u: assumptions.offsetUncertainty,
          source: assumedCalibration,
          assumed: true,
        };
  const standardPotential: Declaration =
    reading.E0_mV !== undefined
      ? readDeclaration(reading.E0_mV)
      : {
          state: 'known',
          value: assumptions.pHAtZero * nernst,
          u: assumptions.pHAtZeroUncertainty * nernst,
          source: assumedCalibration,
          assumed: true,
        };

  return {
    ok: true,
    value: {
      sample: {
        ...sampleVessel,
        strongIon: strongOnly ? { state: 'fitted', start: null, assumed: false } : sampleVessel.strongIon,
        volume: orFixed(sample.volume_mL, assumptions.sampleVolume_mL),
        extraWater: orFixed(sample.extraWater_mL, assumptions.extraWater_mL),
        analytes,
      },
      titrant: {
        ...completeVessel(titrant, titrantInFull),
        strongIon: orAbsent(titrant.strongIon_M),
        kind,
        name: titrant.name ?? null,
        concentration: titrantInFull
          ? null
          : orKnown(titrant.concentration_M, {
              value: assumptions.titrantConcentration_M,
              u: assumptions.titrantConcentrationUncertainty_M,
              source: assumedTitrant,
            }),
        strengthMeans: choose(titrant.strengthMeans, assumptions.strengthMeans as 'hydroxide'),
        systems: (titrant.systems ?? []).map((system) => completeAnalyte(system, facts, true)),
      },
      burette: {
        gain: orFixed(file.burette?.gain, assumptions.buretteGain),
        settingUncertainty: choose(file.burette?.uSetting_mL, assumptions.settingUncertainty_mL),
        doseUncertainty: choose(file.burette?.uDose_mL, assumptions.doseUncertainty_mL),
      },
      medium: {
        solvent: medium.solvent ?? 'water',
        temperature: { value: t, assumed: temperature.assumed },
        activity,
        pKw: orFixed(medium.pKw, defaultPKw),
        carbonicPKa: [
          medium.carbonicPKa === undefined
            ? { state: 'fixed', value: defaultCarbonic[0], assumed: false }
            : readDeclaration(medium.carbonicPKa[0]),
          medium.carbonicPKa === undefined
            ? { state: 'fixed', value: defaultCarbonic[1], assumed: false }
            : readDeclaration(medium.carbonicPKa[1]),
        ],
      },
      reading: {
        kind: readingKind,
        scale,
        offset,
        slope: orFixed(reading.slope, assumptions.slope),
        standardPotential,
        junctionHydrogen: orAbsent(reading.junctionHydrogen),
        junctionHydroxide: orAbsent(reading.junctionHydroxide),
        uncertainty: reading.u ?? null,
      },
    },
  };
}
