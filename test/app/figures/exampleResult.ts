import { completeSheet, type PointResult, type RunResult, type SpeciationResult } from '../../../core/index.ts';
import { buildBaseTitrant, buildSample } from '../../simulator/buildVessels.ts';
import { seededNoise } from '../../simulator/seededNoise.ts';
import type { SimulatedMedium } from '../../simulator/simulatedVessel.ts';
import { nernstSlope_mV, type SimulatedReading, type SimulatedRun, simulateRun } from '../../simulator/simulateRun.ts';

/** An ideal medium: every scale of pH is the same, and forms meet exactly at their constants. */
const medium: SimulatedMedium = { temperature_C: 25, activity: 'none', debyeHueckelA: 0, pKw: 14 };
const CONCENTRATION_M = 0.02;
const SAMPLE_ML = 25;
const TITRANT_M = 0.1;
const E0_MV = 400;
const GRID_POINTS = 161;
/** Curves already simulated, by their design: many tests look at the same one. */
const grids = new Map<string, SimulatedRun>();
const U_READING = { pH: 0.005, mV: 0.3 };

interface Wanted {
  readonly kind?: 'pH' | 'mV';
  readonly points?: number;
  readonly pKa?: readonly number[];
  readonly chargeFullyProtonated?: number;
  /** Offset of the electrode, pH. */
  readonly offset?: number;
  /** A carbonic system beside the analyte in the speciation. */
  readonly carbonate?: boolean;
  /** False for a run without curve, residuals and speciation. */
  readonly fitted?: boolean;
  /** False for a run with a curve and no proton system. */
  readonly speciation?: boolean;
  /** Source lines left out of the fit; the first point stands in line 2. */
  readonly excluded?: readonly number[];
  /** Source lines that a robust fit does not believe. */
  readonly distrusted?: readonly number[];
}

/** The result of a simulated run as a perfect fit would give it, noise of the readings included. */
export function exampleResult(wanted: Wanted = {}): RunResult {
  const { kind = 'pH', points = 60, pKa = [3, 6, 9.5], chargeFullyProtonated = 1, fitted = true } = wanted;
  const equivalence_mL = (SAMPLE_ML * CONCENTRATION_M) / TITRANT_M;
  const end_mL = equivalence_mL * (pKa.length + 0.6);
  const reading: SimulatedReading =
    kind === 'mV' ? { kind, scale: 'activity', E0_mV: E0_MV } : { kind, scale: 'activity', offset: wanted.offset ?? 0 };
  const design = {
    sample: buildSample({
      volume_mL: SAMPLE_ML,
      analytes: [{ pKa, chargeFullyProtonated, protonsLostAsWeighed: 0, concentration_M: CONCENTRATION_M }],
    }),
    titrant: buildBaseTitrant({ concentration_M: TITRANT_M }),
    medium,
    reading,
  };
  const key = JSON.stringify(design);
  const grid = grids.get(key) ?? simulateRun({ ...design, volumes_mL: evenly(GRID_POINTS, end_mL) });
  grids.set(key, grid);
  const noise = seededNoise(11);
  const rows = evenly(points, end_mL).map((volume_mL, i) => {
    const residual = U_READING[kind] * noise.normal();
    // On the curve as it is drawn: the figure compares nothing finer, and thousands of points cost nothing.
    const at = (volume_mL / end_mL) * (GRID_POINTS - 1);
    const before = Math.min(Math.floor(at), GRID_POINTS - 2);
    const [low, high] = [grid.readings[before], grid.readings[before + 1]];
    return {
      line: i + 2,
      volume_mL,
      reading: low + (at - before) * (high - low) + residual,
      residual,
      use: !(wanted.excluded ?? []).includes(i + 2),
    };
  });
  const pHOf = (value: number) =>
    kind === 'mV' ? (E0_MV - value) / nernstSlope_mV(medium.temperature_C) : value - (wanted.offset ?? 0);
  const sheet = completeSheet({ sheet: 1 }, { readingKind: kind, titrantKind: 'base', groupsIfOpen: pKa.length });
  if (!sheet.ok) throw new Error('an empty sheet is always complete');
  return {
    run: {
      name: 'example',
      file: 'example.csv',
      readingKind: kind,
      rows: rows.map(({ line, volume_mL, reading: value, use }) => ({
        line,
        volume_mL,
        reading: value,
        decision: use ? { use: 'used' } : { use: 'excluded', by: 'person', why: 'bubble' },
      })),
      notAccepted: [],
      doubts: [],
    },
    sheet: sheet.value,
    ending: fitted ? { code: 'fitted', message: 'Fitted.' } : { code: 'not-converged', message: 'Not fitted.' },
    quantities: [],
    equivalence: pKa.flatMap((_, k) => [
      ...(fitted
        ? [{ ...step(k), volume_mL: (k + 1) * equivalence_mL, u: 0.004, by: 'fit' as const, shares: [], remark: '' }]
        : []),
      { ...step(k), volume_mL: (k + 1) * equivalence_mL + 0.03, u: null, by: 'derivative', shares: [], remark: '' },
    ]),
    noise: null,
    doubts: [],
    ladder: null,
    correlation: { ids: [], matrix: [] },
    robust: {
      distrusted: rows
        .filter(({ line }) => wanted.distrusted?.includes(line))
        .map(({ line, volume_mL }) => ({ line, volume_mL, weight: 0 })),
      moves: [],
    },
    curve: fitted
      ? {
          volume_mL: grid.volumes_mL,
          reading: grid.readings,
          pH: grid.readings.map(pHOf),
          ionicStrength_M: grid.readings.map(() => 0.02),
        }
      : null,
    points: rows.map(
      ({ line, volume_mL, reading: value, residual, use }): PointResult => ({
        line,
        volume_mL,
        reading: value,
        pH: pHOf(value),
        used: use,
        residual: fitted ? residual : null,
        u: fitted ? U_READING[kind] : null,
      }),
    ),
    speciation:
      fitted && wanted.speciation !== false
        ? speciationOf(pKa, chargeFullyProtonated, wanted.carbonate === true)
        : null,
  };
}

function step(k: number) {
  return { analyte: 'example acid', step: k + 1 };
}

function evenly(points: number, end_mL: number): number[] {
  return Array.from({ length: points }, (_, i) => (i * end_mL) / (points - 1));
}

function speciationOf(pKa: readonly number[], charge: number, carbonate: boolean): SpeciationResult {
  const pH = Float64Array.from({ length: 601 }, (_, i) => 1 + 0.02 * i);
  const analyte = systemOf('example acid', '', 'analyte', pKa, charge, pH);
  return {
    pH,
    systems: carbonate ? [analyte, systemOf('carbonate', 'carbonate.', 'carbonate', [6.35, 10.33], 0, pH)] : [analyte],
  };
}

function systemOf(
  name: string,
  prefix: string,
  role: 'analyte' | 'carbonate',
  pKa: readonly number[],
  charge: number,
  pH: Float64Array,
): SpeciationResult['systems'][number] {
  const shares = Array.from(pH, (value) => {
    const weights = [1];
    pKa.forEach((constant, k) => void weights.push(weights[k] * 10 ** (value - constant)));
    const sum = weights.reduce((a, b) => a + b, 0);
    return weights.map((weight) => weight / sum);
  });
  return {
    name,
    prefix,
    role,
    forms: [0, ...pKa].map((_, lost) => ({
      charge: charge - lost,
      protons: pKa.length - lost,
      fraction: Float64Array.from(shares, (share) => share[lost]),
    })),
    crossings: pKa.map((constant, k) => ({ quantityId: `${prefix}pKa${k + 1}`, group: k, pH: constant })),
    isoelectricPoint: null,
  };
}
