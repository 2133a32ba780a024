import fc from 'fast-check';
import { debyeHueckelA } from '../../core/chemistry/debyeHueckel.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { celsius } from '../../core/units/temperature.ts';
import { buildAcidTitrant, buildBaseTitrant, buildSample, buildWeakTitrant } from '../simulator/buildVessels.ts';
import type { SimulatedVessel } from '../simulator/simulatedVessel.ts';
import type { SimulatedRunInput } from '../simulator/simulateRun.ts';

/** A random titration, once as a sheet and once for the independent simulator. */
export interface ArbitraryTitration {
  readonly sheet: SheetFile;
  readonly simulation: SimulatedRunInput;
  /** Junction terms, in the unit of the reading per mol/L of H⁺ and OH⁻; the simulator knows none. */
  readonly junctionHydrogen: number;
  readonly junctionHydroxide: number;
}

/** Millionths of the range: doubles drawn at will are mostly numbers like 1e-300, which no chemist declares. */
const real = (min: number, max: number) =>
  fc.integer({ min: 0, max: 1_000_000 }).map((part) => min + ((max - min) * part) / 1_000_000);

/** Either sign, or none at all; away from zero, where the reading has a kink. */
const signed = (smallest: number, largest: number) =>
  fc.option(
    fc.tuple(fc.boolean(), real(smallest, largest)).map(([negative, size]) => (negative ? -size : size)),
    { nil: 0 },
  );

interface CounterIon {
  readonly ratio: number;
  readonly chargeFullyProtonated: number;
  readonly protonsLostAsWeighed: number;
  readonly pKa: number[];
}

/** Sulfuric, maleic and ammonium-like counter-ions that take part themselves. */
const counterIon = fc.constantFrom<CounterIon[]>(
  { ratio: 0.5, chargeFullyProtonated: 0, protonsLostAsWeighed: 2, pKa: [-3, 1.99] },
  { ratio: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 1, pKa: [1.92, 6.27] },
  { ratio: 1, chargeFullyProtonated: 1, protonsLostAsWeighed: 0, pKa: [9.25] },
);

const analyte = fc
  .record({
    groups: fc.integer({ min: 1, max: 6 }),
    firstPKa: real(0, 6),
    gaps: fc.array(real(0.3, 3), { minLength: 5, maxLength: 5 }),
    spareCharge: fc.integer({ min: 0, max: 4 }),
    lostShare: real(0, 0.999),
    concentration: real(0.0005, 0.1),
  })
  .map(({ groups, firstPKa, gaps, spareCharge, lostShare, concentration }) => {
    const pKa = [firstPKa];
    for (let k = 1; k < groups; k++) pKa.push(pKa[k - 1] + gaps[k - 1]);
    // Charges from −4 to +3: beyond them, and beyond about 1 M, Davies has no single solution any more.
    const chargeFullyProtonated = Math.min(3, Math.max(-1, groups - 4) + spareCharge);
    return {
      pKa,
      chargeFullyProtonated,
      protonsLostAsWeighed: Math.floor(lostShare * (groups + 1)),
      concentration_M: concentration,
    };
  });

function addStrongIon(vessel: SimulatedVessel, strongIon_M: number): SimulatedVessel {
  return strongIon_M > 0
    ? { ...vessel, cations_M: vessel.cations_M + strongIon_M }
    : { ...vessel, anions_M: vessel.anions_M - strongIon_M };
}

interface WithCounterIon {
  readonly chargeFullyProtonated: number;
  readonly protonsLostAsWeighed: number;
  readonly concentration_M: number;
  readonly counterIon?: CounterIon;
}

/** Puts the counter-ion of an analyte in the place of the strong ions that its weighed form had brought. */
function addCounterIon(vessel: SimulatedVessel, analyte: WithCounterIon | undefined): SimulatedVessel {
  const counterIon = analyte?.counterIon;
  if (analyte === undefined || counterIon === undefined) return vessel;
  const c = analyte.concentration_M;
  const ownCharge = c * (analyte.chargeFullyProtonated - analyte.protonsLostAsWeighed);
  const counterCharge = counterIon.ratio * c * (counterIon.chargeFullyProtonated - counterIon.protonsLostAsWeighed);
  const { pKa, chargeFullyProtonated } = counterIon;
  return {
    ...vessel,
    cations_M: vessel.cations_M - Math.max(0, -ownCharge) + Math.max(0, -ownCharge - counterCharge),
    anions_M: vessel.anions_M - Math.max(0, ownCharge) + Math.max(0, ownCharge + counterCharge),
    systems: [...vessel.systems, { pKa, chargeFullyProtonated, concentration_M: counterIon.ratio * c }],
  };
}

/** Up to three analytes, a counter-ion that takes part, carbonate, strong ions and background in either vessel, every kind of titrant, both scales, pH and mV. */
export const arbitraryTitration: fc.Arbitrary<ArbitraryTitration> = fc
  .record({
    analytes: fc.array(analyte, { maxLength: 3 }),
    titrantKind: fc.constantFrom('base', 'acid', 'weak'),
    weak: analyte,
    strength: real(0.01, 0.3),
    strengthMeans: fc.constantFrom('hydroxide', 'toHydrogencarbonate', 'totalBase'),
    titrantCarbonate: fc.option(real(1e-5, 0.003), { nil: 0 }),
    sampleCarbonate: fc.option(real(1e-5, 0.02), { nil: 0 }),
    strongIon: signed(1e-4, 0.05),
    titrantStrongIon: signed(1e-4, 0.005),
    counterIon: fc.option(counterIon, { nil: undefined }),
    carbonicPKa: fc.tuple(real(6.2, 6.4), real(9.9, 10.4)),
    junctionHydrogen: fc.option(real(-0.5, 0.5), { nil: 0 }),
    junctionHydroxide: fc.option(real(-0.5, 0.5), { nil: 0 }),
    background: fc.constantFrom(0, 0.05, 0.15),
    // Whether the sample names its analytes, or its ions and systems one by one.
    inFull: fc.boolean(),
    sampleVolume: real(5, 100),
    extraWater: fc.constantFrom(0, 25),
    activity: fc.constantFrom('davies', 'none'),
    temperature: fc.constantFrom(15, 25, 37),
    pKw: real(13.4, 14.4),
    gain: real(0.99, 1.01),
    potential: fc.boolean(),
    scale: fc.constantFrom('activity', 'concentration'),
    zero: real(-0.1, 0.1),
    slope: real(0.95, 1.02),
    // To the microlitre, as a burette shows them.
    volumes: fc.array(
      fc.integer({ min: 1, max: 60_000 }).map((microlitres) => microlitres / 1000),
      { minLength: 4, maxLength: 12 },
    ),
  })
  .map((c) => {
    const activity = c.activity as 'davies' | 'none';
    const scale = c.scale as 'activity' | 'concentration';
    const words = { background_M: c.background, carbonicPKa: c.carbonicPKa };
    const titrantWords = { ...words, carbonate_M: c.titrantCarbonate };
    const strengthMeans = c.strengthMeans as 'hydroxide';
    const plainTitrant =
      c.titrantKind === 'base'
        ? buildBaseTitrant({ ...titrantWords, concentration_M: c.strength, strengthMeans })
        : c.titrantKind === 'acid'
          ? buildAcidTitrant({ ...titrantWords, concentration_M: c.strength })
          : buildWeakTitrant({ ...titrantWords, analytes: [c.weak] });
    const titrant = addStrongIon(plainTitrant, c.titrantStrongIon);
    // The first analyte brings the counter-ion, if there is one.
    const analytes = c.analytes.map((a, i) =>
      i === 0 && c.counterIon !== undefined ? { ...a, counterIon: c.counterIon } : a,
    );
    const bare = addCounterIon(buildSample({ volume_mL: c.sampleVolume, analytes: c.analytes }), analytes[0]);
    const perPH = c.potential ? 50 : 1;
    const junctionHydrogen = perPH * c.junctionHydrogen;
    const junctionHydroxide = perPH * c.junctionHydroxide;
    const reading = c.potential
      ? ({ kind: 'mV', scale, E0_mV: 400 + 100 * c.zero, slope: c.slope } as const)
      : ({ kind: 'pH', scale, offset: c.zero, slope: c.slope } as const);
    const weakCharge = c.weak.concentration_M * (c.weak.chargeFullyProtonated - c.weak.protonsLostAsWeighed);
    const sheet: SheetFile = {
      sheet: 1,
      sample: {
        volume_mL: c.sampleVolume,
        extraWater_mL: c.extraWater,
        strongIon_M: c.strongIon,
        carbonate_M: c.sampleCarbonate,
        background_M: c.background,
        ...(c.inFull
          ? {
              cations_M: bare.cations_M,
              anions_M: bare.anions_M,
              systems: bare.systems.map((system) => ({
                ...system,
                pKa: [...system.pKa],
                groups: system.pKa.length,
              })),
            }
          : { analytes: analytes.map((a) => ({ ...a, groups: a.pKa.length })) }),
      },
      titrant:
        c.titrantKind === 'weak'
          ? {
              kind: 'solution',
              strongIon_M: c.titrantStrongIon,
              carbonate_M: c.titrantCarbonate,
              background_M: c.background,
              cations_M: Math.max(0, -weakCharge),
              anions_M: Math.max(0, weakCharge),
              systems: [
                {
                  groups: c.weak.pKa.length,
                  pKa: c.weak.pKa,
                  chargeFullyProtonated: c.weak.chargeFullyProtonated,
                  concentration_M: c.weak.concentration_M,
                },
              ],
            }
          : {
              kind: c.titrantKind as 'base' | 'acid',
              concentration_M: c.strength,
              strengthMeans,
              strongIon_M: c.titrantStrongIon,
              carbonate_M: c.titrantCarbonate,
              background_M: c.background,
            },
      burette: { gain: c.gain },
      medium: {
        temperature_C: c.temperature,
        activity,
        pKw: c.pKw,
        carbonicPKa: c.carbonicPKa,
      },
      reading: { ...reading, junctionHydrogen, junctionHydroxide },
    };
    const simulation: SimulatedRunInput = {
      sample: addCounterIon(
        buildSample({
          ...words,
          volume_mL: c.sampleVolume,
          analytes: c.analytes,
          strongIon_M: c.strongIon,
          carbonate_M: c.sampleCarbonate,
        }),
        analytes[0],
      ),
      titrant,
      extraWater_mL: c.extraWater,
      medium: {
        temperature_C: c.temperature,
        activity,
        debyeHueckelA: debyeHueckelA(celsius(c.temperature)),
        pKw: c.pKw,
      },
      volumes_mL: [0, ...c.volumes].sort((a, b) => a - b),
      buretteGain: c.gain,
      reading,
    };
    return { sheet, simulation, junctionHydrogen, junctionHydroxide };
  });
