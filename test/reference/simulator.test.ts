import { describe, expect, it } from 'vitest';
import { buildAcidTitrant, buildBaseTitrant, buildSample, CARBONIC_PKA_25C } from '../simulator/buildVessels.ts';
import { seededNoise } from '../simulator/seededNoise.ts';
import type { SimulatedMedium, SimulatedVessel } from '../simulator/simulatedVessel.ts';
import { simulatePoint } from '../simulator/simulatePoint.ts';
import { nernstSlope_mV, simulateRun } from '../simulator/simulateRun.ts';
import handbook from './pka-handbook.json';
import titrations from './worked-titrations.json';

function idealMedium(pKw: number): SimulatedMedium {
  return { temperature_C: 25, activity: 'none', debyeHueckelA: 0, pKw };
}

function pHAt(sample: SimulatedVessel, titrant: SimulatedVessel, volume_mL: number, pKw: number): number {
  return simulatePoint({ sample, titrant, extraWater_mL: 0, volume_mL, medium: idealMedium(pKw) }).pH_concentration;
}

/** A free acid without counter-ions. */
function freeAcid(pKa: number[], concentration_M: number) {
  return { pKa, chargeFullyProtonated: 0, protonsLostAsWeighed: 0, concentration_M };
}

describe('textbook tables (each with its source in worked-titrations.json)', () => {
  const pKaOfWeakAcids: Record<string, number> = {
    'openstax-acetic': -Math.log10(1.8e-5),
    'openstax-exercise-formic': -Math.log10(1.8e-4),
    'harvey-acetic': 4.757,
    'skoog-acetic-0p1': -Math.log10(1.75e-5),
  };
  // Half a unit of the second decimal, unless the book's own step-by-step
  // approximation is known to leave more: then what exact algebra leaves.
  // The openstax answers use the square-root formula for the first point of a
  // weak acid; the other three tables are from memory.
  const tolerances: Record<string, number> = {
    'openstax-acetic': 0.0053,
    'openstax-exercise-formic': 0.012,
    'harvey-acetic': 0.008,
    'harris-koh-hbr': 0.0105,
    'skoog-acetic-0p1': 0.0065,
  };

  for (const table of titrations.tables) {
    if (table.id === 'glycine-hcl-henderson') continue;
    it(`${table.id} within the printed precision`, () => {
      const { V_mL, c_M } = table.analyte;
      const pKa = pKaOfWeakAcids[table.id];
      const isBase = table.id === 'harris-koh-hbr';
      const analytes = pKa === undefined ? [] : [freeAcid([pKa], c_M)];
      const strongIon_M = pKa !== undefined ? 0 : isBase ? c_M : -c_M;
      const sample = buildSample({ volume_mL: V_mL, analytes, strongIon_M });
      const titrant = isBase
        ? buildAcidTitrant({ concentration_M: table.titrant.c_M })
        : buildBaseTitrant({ concentration_M: table.titrant.c_M });
      const exact: number[] = table.recomputed.pH ?? [];
      expect(exact.length).toBe(table.volume_mL.length);
      table.volume_mL.forEach((volume, i) => {
        const pH = pHAt(sample, titrant, volume, table.pKw);
        expect(Math.abs(pH - table.pH[i])).toBeLessThan((tolerances[table.id] ?? 0.005) + 1e-4);
        // The exact values are kept with four decimals; those of the basic table follow from the
        // unrounded Kw = 1.01e-14 of that book, of which the entry gives pKw with three decimals.
        const pKwOfExact = isBase ? -Math.log10(1.01e-14) : table.pKw;
        expect(Math.abs(pHAt(sample, titrant, volume, pKwOfExact) - exact[i])).toBeLessThan(1.01e-4);
      });
    });
  }

  it('glycine hydrochloride: the exact volume for pH 2.73, where the printed answer neglects free H⁺', () => {
    const table = titrations.tables.find((entry) => entry.id === 'glycine-hcl-henderson');
    if (table === undefined) throw new Error('the table is missing');
    const sample = buildSample({
      volume_mL: 125,
      analytes: [{ pKa: [2.35, 9.778], chargeFullyProtonated: 1, protonsLostAsWeighed: 0, concentration_M: 0.028 }],
    });
    const titrant = buildBaseTitrant({ concentration_M: 0.2 });
    // Kept with three decimals: 0.0005 mL, or 0.0005 in pH.
    expect(pHAt(sample, titrant, 11.084, table.pKw)).toBeCloseTo(2.73, 3);
    // The printed 12.4 mL is the rounded 17.5 mL / (1 + 10^(2.35 − 2.73)).
    const neglecting = 17.5 / (1 + 10 ** (2.35 - 2.73));
    expect(neglecting).toBeCloseTo(12.4, 1);
    expect(Math.abs(pHAt(sample, titrant, neglecting, table.pKw) - 2.853)).toBeLessThan(0.00051);
  });
});

describe('curves computed by a separate program', () => {
  for (const curve of titrations.computed_reference_curves) {
    it(curve.id, () => {
      const sample: SimulatedVessel = {
        volume_mL: curve.V0_mL,
        cations_M: curve.strong_cation_M,
        anions_M: curve.strong_anion_M,
        systems: curve.components.map((component) => ({
          pKa: component.pKa,
          chargeFullyProtonated: component.charge_fully_protonated,
          concentration_M: component.c_M,
        })),
      };
      const titrant: SimulatedVessel = {
        volume_mL: 0,
        cations_M: curve.titrant_strong_base_M ?? 0,
        anions_M: curve.titrant_strong_acid_M ?? 0,
        systems: [],
      };
      curve.volume_mL.forEach((volume, i) => {
        // Printed with six decimals.
        expect(Math.abs(pHAt(sample, titrant, volume, curve.pKw) - curve.pH[i])).toBeLessThan(1e-6);
      });
    });
  }
});

describe('activity', () => {
  const medium: SimulatedMedium = { temperature_C: 25, activity: 'davies', debyeHueckelA: 0.5116, pKw: 13.9976 };
  const sample = buildSample({
    volume_mL: 20,
    background_M: 0.05,
    carbonate_M: 0.001,
    analytes: [
      { pKa: [2.148, 7.198, 12.35], chargeFullyProtonated: 0, protonsLostAsWeighed: 1, concentration_M: 0.02 },
      { pKa: [9.244], chargeFullyProtonated: 1, protonsLostAsWeighed: 0, concentration_M: 0.01 },
    ],
  });
  const titrant = buildBaseTitrant({ concentration_M: 0.1, carbonate_M: 0.002, background_M: 0.1 });

  it('the composition satisfies mass action in activities, mass balance, charge balance and the sum of ionic strength', () => {
    for (const volume_mL of [0, 1.5, 4, 9.999, 17]) {
      const point = simulatePoint({ sample, titrant, extraWater_mL: 5, volume_mL, medium });
      const total = 25 + volume_mL;
      const root = Math.sqrt(point.ionicStrength);
      const logGamma = (z: number) => -0.5116 * z * z * (root / (1 + root) - 0.3 * point.ionicStrength);
      const logHydrogen = Math.log10(point.hydrogen_M) + logGamma(1);
      expect(logHydrogen).toBeCloseTo(-point.pH_activity, 12);
      expect(logHydrogen + Math.log10(point.hydroxide_M) + logGamma(1)).toBeCloseTo(-13.9976, 12);

      const systems = [...sample.systems, ...titrant.systems];
      const totals = [0.02 * 20, 0.01 * 20, 0.001 * 20, 0.002 * volume_mL].map((amount) => amount / total);
      const cations = ((0.05 + 0.02 + 0.002) * 20 + (0.1 + 0.004 + 0.1) * volume_mL) / total;
      const anions = ((0.05 + 0.01) * 20 + 0.1 * volume_mL) / total;
      let charge = cations - anions + point.hydrogen_M - point.hydroxide_M;
      let strength = cations + anions + point.hydrogen_M + point.hydroxide_M;
      systems.forEach((system, s) => {
        const forms = point.speciesConcentrations[s];
        // Relative rounding of a sum of four doubles.
        expect(Math.abs(forms.reduce((a, b) => a + b, 0) - totals[s])).toBeLessThan(1e-15);
        forms.forEach((form, lost) => {
          const z = system.chargeFullyProtonated - lost;
          charge += z * form;
          strength += z * z * form;
          if (lost === 0 || totals[s] === 0) return;
          const quotient = logHydrogen + Math.log10(form) + logGamma(z) - Math.log10(forms[lost - 1]) - logGamma(z + 1);
          expect(quotient).toBeCloseTo(-system.pKa[lost - 1], 10);
        });
      });
      // 1e-13 of p[H] in a buffer of 0.1 mol/L is 2e-14 mol/L of charge.
      expect(Math.abs(charge)).toBeLessThan(5e-14);
      expect(Math.abs(strength / 2 - point.ionicStrength)).toBeLessThan(1e-13);
    }
  });

  it('changes nothing but the scale where no ion is about', () => {
    const water = buildSample({ volume_mL: 10, analytes: [] });
    const point = simulatePoint({ sample: water, titrant, extraWater_mL: 0, volume_mL: 0, medium });
    // Davies at I = 1e-7 is 1.6e-4 in log γ, on each side of neutrality: pH stays at half pKw.
    expect(point.pH_activity).toBeCloseTo(13.9976 / 2, 10);
    expect(point.ionicStrength).toBeCloseTo(point.hydrogen_M, 14);
  });
});

describe('from words to vessels', () => {
  const glycine = { pKa: [2.35, 9.778], chargeFullyProtonated: 1, concentration_M: 0.03 };

  it('gives each weighed form its counter-ions', () => {
    const ions = [0, 1, 2].map((protonsLostAsWeighed) => {
      const vessel = buildSample({ volume_mL: 1, analytes: [{ ...glycine, protonsLostAsWeighed }] });
      return [vessel.cations_M, vessel.anions_M];
    });
    expect(ions).toEqual([
      [0, 0.03],
      [0, 0],
      [0.03, 0],
    ]);
  });

  it('takes strong ions as base or acid, carbonate as its sodium salt and a background as both ions', () => {
    expect(buildSample({ volume_mL: 1, analytes: [], strongIon_M: 0.1 }).cations_M).toBe(0.1);
    expect(buildSample({ volume_mL: 1, analytes: [], strongIon_M: -0.1 }).anions_M).toBe(0.1);
    const vessel = buildSample({ volume_mL: 1, analytes: [], carbonate_M: 0.02, background_M: 0.5 });
    expect(vessel).toEqual({
      volume_mL: 1,
      cations_M: 0.54,
      anions_M: 0.5,
      systems: [{ pKa: CARBONIC_PKA_25C, chargeFullyProtonated: 0, concentration_M: 0.02 }],
    });
    expect(handbook.acids.find((acid) => acid.name.startsWith('carbonic'))?.pKa).toEqual(CARBONIC_PKA_25C);
  });

  it('counts the carbonate of a base by what its strength means', () => {
    // The hydroxide left once carbonate has its two cations, in units of 0.01 mol/L.
    const hydroxide = (['hydroxide', 'toHydrogencarbonate', 'totalBase'] as const).map((strengthMeans) => {
      const vessel = buildBaseTitrant({ concentration_M: 0.1, carbonate_M: 0.01, strengthMeans });
      return Math.round(100 * (vessel.cations_M - 2 * vessel.systems[0].concentration_M));
    });
    expect(hydroxide).toEqual([10, 9, 8]);
  });
});

describe('a simulated run', () => {
  const sample = buildSample({ volume_mL: 25, analytes: [freeAcid([4.756], 0.02)] });
  const titrant = buildBaseTitrant({ concentration_M: 0.1 });
  const volumes_mL = Array.from({ length: 13 }, (_, i) => 0.5 * i);
  const common = { sample, titrant, volumes_mL, medium: idealMedium(14) };

  it('reads pH through offset and slope about pH 7, and millivolts falling as pH rises', () => {
    const plain = simulateRun({ ...common, reading: { kind: 'pH', scale: 'concentration' } });
    const worn = simulateRun({
      ...common,
      reading: { kind: 'pH', scale: 'concentration', offset: 0.03, slope: 0.98 },
    });
    const electrode = simulateRun({ ...common, reading: { kind: 'mV', scale: 'concentration', E0_mV: 410 } });
    plain.readings.forEach((pH, i) => {
      expect(worn.readings[i]).toBeCloseTo(7.03 + 0.98 * (pH - 7), 12);
      // 59.16 mV per pH at 25 °C, a figure of every electrode manual (from memory).
      expect(Math.abs((410 - electrode.readings[i]) / pH - 59.16)).toBeLessThan(0.005);
    });
    expect(nernstSlope_mV(25)).toBeCloseTo(59.159, 3);
  });

  it('lets the true volume follow the gain of the burette', () => {
    const run = simulateRun({ ...common, buretteGain: 1.01, reading: { kind: 'pH', scale: 'concentration' } });
    expect(run.trueVolumes_mL[12]).toBeCloseTo(6.06, 12);
    expect(run.readings[12]).toBe(pHAt(sample, titrant, run.trueVolumes_mL[12], 14));
  });

  it('draws the same errors from the same seed, each kind by itself', () => {
    const reading = { kind: 'pH', scale: 'concentration' } as const;
    const errors = { seed: 7, uReading: 0.005, uSetting_mL: 0.003, uDose_mL: 0.001 };
    const first = simulateRun({ ...common, reading, errors });
    expect(simulateRun({ ...common, reading, errors }).readings).toEqual(first.readings);
    expect(simulateRun({ ...common, reading, errors: { ...errors, seed: 8 } }).readings).not.toEqual(first.readings);
    const withoutReadingNoise = simulateRun({ ...common, reading, errors: { ...errors, uReading: 0 } });
    expect(withoutReadingNoise.trueVolumes_mL).toEqual(first.trueVolumes_mL);
  });

  it('has setting errors of constant and dose errors of growing variance', () => {
    const seeds = Array.from({ length: 400 }, (_, i) => i + 1);
    const reading = { kind: 'pH', scale: 'concentration' } as const;
    const spread = (errors: { uSetting_mL?: number; uDose_mL?: number }, point: number) => {
      const squares = seeds.map((seed) => {
        const run = simulateRun({ ...common, volumes_mL: [0, 1, 2, 3, 4], reading, errors: { seed, ...errors } });
        return (run.trueVolumes_mL[point] - point) ** 2;
      });
      return Math.sqrt(squares.reduce((a, b) => a + b, 0) / squares.length);
    };
    // A standard deviation from 400 draws has a relative standard error of 3.5 %: four of them.
    expect(Math.abs(spread({ uSetting_mL: 0.01 }, 0) / 0.01 - 1)).toBeLessThan(0.14);
    expect(Math.abs(spread({ uSetting_mL: 0.01 }, 4) / 0.01 - 1)).toBeLessThan(0.14);
    expect(spread({ uDose_mL: 0.01 }, 0)).toBe(0);
    expect(Math.abs(spread({ uDose_mL: 0.01 }, 1) / 0.01 - 1)).toBeLessThan(0.14);
    expect(Math.abs(spread({ uDose_mL: 0.01 }, 4) / 0.02 - 1)).toBeLessThan(0.14);
  });
});

describe('seeded noise', () => {
  it('is normal, and neighbouring seeds are unrelated', () => {
    const count = 4000;
    const one = seededNoise(1);
    const two = seededNoise(2);
    let sum = 0;
    let squares = 0;
    let products = 0;
    for (let i = 0; i < count; i++) {
      const a = one.normal();
      sum += a;
      squares += a * a;
      products += a * two.normal();
    }
    // Standard errors 1/√n, √(2/n) and 1/√n; four of each.
    expect(Math.abs(sum / count)).toBeLessThan(4 / Math.sqrt(count));
    expect(Math.abs(squares / count - 1)).toBeLessThan(4 * Math.sqrt(2 / count));
    expect(Math.abs(products / count)).toBeLessThan(4 / Math.sqrt(count));
    // First draws of 200 neighbouring seeds: their mean has a standard error of 1/√200.
    const firstDraws = Array.from({ length: 200 }, (_, seed) => seededNoise(seed).normal());
    expect(Math.abs(firstDraws.reduce((a, b) => a + b, 0) / 200)).toBeLessThan(4 / Math.sqrt(200));
  });

  it('draws whole and real numbers within their limits', () => {
    const noise = seededNoise(3);
    const seen = new Set<number>();
    for (let i = 0; i < 200; i++) {
      seen.add(noise.integer(1, 3));
      const real = noise.uniform(-2, 5);
      expect(real).toBeGreaterThanOrEqual(-2);
      expect(real).toBeLessThan(5);
    }
    expect([...seen].sort()).toEqual([1, 2, 3]);
  });
});
