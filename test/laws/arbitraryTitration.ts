import fc from 'fast-check';
import { debyeHueckelA } from '../../core/chemistry/debyeHueckel.ts';
import type { SheetFile } from '../../core/sheet/sheetFile.ts';
import { celsius } from '../../core/units/temperature.ts';
import { buildAcidTitrant, buildBaseTitrant, buildSample, buildWeakTitrant } from '../simulator/buildVessels.ts';
import type { SimulatedRunInput } from '../simulator/simulateRun.ts';

/** A random titration, once as a sheet and once for the independent simulator. */
export interface ArbitraryTitration {
  readonly sheet: SheetFile;
  readonly simulation: SimulatedRunInput;
}

const carbonicPKa = [6.35, 10.33];

const analyte = fc
  .record({
    groups: fc.integer({ min: 1, max: 6 }),
    firstPKa: fc.double({ min: 0, max: 6, noNaN: true }),
    gaps: fc.array(fc.double({ min: 0.3, max: 3, noNaN: true }), { minLength: 5, maxLength: 5 }),
    spareCharge: fc.integer({ min: 0, max: 4 }),
    lostShare: fc.double({ min: 0, max: 0.999, noNaN: true }),
    concentration: fc.double({ min: 0.0005, max: 0.1, noNaN: true }),
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

/** Up to three analytes, carbonate, strong ions and background in either vessel, every kind of titrant, both scales, pH and mV. */
export const arbitraryTitration: fc.Arbitrary<ArbitraryTitration> = fc
  .record({
    analytes: fc.array(analyte, { maxLength: 3 }),
    titrantKind: fc.constantFrom('base', 'acid', 'weak'),
    weak: analyte,
    strength: fc.double({ min: 0.01, max: 0.3, noNaN: true }),
    strengthMeans: fc.constantFrom('hydroxide', 'toHydrogencarbonate', 'totalBase'),
    titrantCarbonate: fc.option(fc.double({ min: 1e-5, max: 0.003, noNaN: true }), { nil: 0 }),
    sampleCarbonate: fc.option(fc.double({ min: 1e-5, max: 0.02, noNaN: true }), { nil: 0 }),
    strongIon: fc.option(fc.double({ min: -0.05, max: 0.05, noNaN: true }), { nil: 0 }),
    background: fc.constantFrom(0, 0.05, 0.15),
    sampleVolume: fc.double({ min: 5, max: 100, noNaN: true }),
    extraWater: fc.constantFrom(0, 25),
    activity: fc.constantFrom('davies', 'none'),
    temperature: fc.constantFrom(15, 25, 37),
    pKw: fc.double({ min: 13.4, max: 14.4, noNaN: true }),
    gain: fc.double({ min: 0.99, max: 1.01, noNaN: true }),
    potential: fc.boolean(),
    scale: fc.constantFrom('activity', 'concentration'),
    zero: fc.double({ min: -0.1, max: 0.1, noNaN: true }),
    slope: fc.double({ min: 0.95, max: 1.02, noNaN: true }),
    volumes: fc.array(fc.double({ min: 0, max: 60, noNaN: true }), { minLength: 4, maxLength: 12 }),
  })
  .map((c) => {
    const activity = c.activity as 'davies' | 'none';
    const scale = c.scale as 'activity' | 'concentration';
    const words = { background_M: c.background, carbonicPKa };
    const titrantWords = { ...words, carbonate_M: c.titrantCarbonate };
    const strengthMeans = c.strengthMeans as 'hydroxide';
    const titrant =
      c.titrantKind === 'base'
        ? buildBaseTitrant({ ...titrantWords, concentration_M: c.strength, strengthMeans })
        : c.titrantKind === 'acid'
          ? buildAcidTitrant({ ...titrantWords, concentration_M: c.strength })
          : buildWeakTitrant({ ...titrantWords, analytes: [c.weak] });
    const weakCharge = c.weak.concentration_M * (c.weak.chargeFullyProtonated - c.weak.protonsLostAsWeighed);
    const sheet: SheetFile = {
      sheet: 1,
      sample: {
        volume_mL: c.sampleVolume,
        extraWater_mL: c.extraWater,
        strongIon_M: c.strongIon,
        carbonate_M: c.sampleCarbonate,
        background_M: c.background,
        analytes: c.analytes.map((a) => ({ ...a, groups: a.pKa.length })),
      },
      titrant:
        c.titrantKind === 'weak'
          ? {
              kind: 'solution',
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
              carbonate_M: c.titrantCarbonate,
              background_M: c.background,
            },
      burette: { gain: c.gain },
      medium: {
        temperature_C: c.temperature,
        activity,
        pKw: c.pKw,
        carbonicPKa: [carbonicPKa[0], carbonicPKa[1]],
      },
      reading: c.potential
        ? { kind: 'mV', scale, E0_mV: 400 + 100 * c.zero, slope: c.slope }
        : { kind: 'pH', scale, offset: c.zero, slope: c.slope },
    };
    const simulation: SimulatedRunInput = {
      sample: buildSample({
        ...words,
        volume_mL: c.sampleVolume,
        analytes: c.analytes,
        strongIon_M: c.strongIon,
        carbonate_M: c.sampleCarbonate,
      }),
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
      reading: c.potential
        ? { kind: 'mV', scale, E0_mV: 400 + 100 * c.zero, slope: c.slope }
        : { kind: 'pH', scale, offset: c.zero, slope: c.slope },
    };
    return { sheet, simulation };
  });
