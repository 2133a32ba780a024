import { buildAcidTitrant, buildBaseTitrant, buildSample } from '../../simulator/buildVessels.ts';
import type { SimulatedMedium } from '../../simulator/simulatedVessel.ts';
import { type SimulatedErrors, type SimulatedRun, simulateRun } from '../../simulator/simulateRun.ts';

/** An ideal medium: readings are p[H⁺] and pKw is 14. */
const medium: SimulatedMedium = { temperature_C: 25, activity: 'none', debyeHueckelA: 0, pKw: 14 };

interface Curve {
  /** Of the free acid (base titrant), or of the salt that has lost every proton (acid titrant); empty for strong ones. */
  readonly pKa: readonly number[];
  readonly concentration_M: number;
  readonly volumes_mL: readonly number[];
  readonly titrant?: 'base' | 'acid';
  readonly mV?: boolean;
  readonly errors?: SimulatedErrors;
}

export const SAMPLE_VOLUME_ML = 25;
const TITRANT_M = 0.1;

export function evenVolumes(points: number, end_mL: number): number[] {
  return Array.from({ length: points }, (_, i) => (i * end_mL) / (points - 1));
}

/** 25 mL of an acid (or base) with 0.1 mol/L of strong base (or acid). */
export function curve({ pKa, concentration_M, volumes_mL, titrant = 'base', mV = false, errors }: Curve): SimulatedRun {
  const isBase = titrant === 'base';
  const sample = buildSample({
    volume_mL: SAMPLE_VOLUME_ML,
    strongIon_M: pKa.length > 0 ? 0 : isBase ? -concentration_M : concentration_M,
    analytes:
      pKa.length === 0
        ? []
        : [{ pKa, chargeFullyProtonated: 0, protonsLostAsWeighed: isBase ? 0 : pKa.length, concentration_M }],
  });
  return simulateRun({
    sample,
    titrant: isBase
      ? buildBaseTitrant({ concentration_M: TITRANT_M })
      : buildAcidTitrant({ concentration_M: TITRANT_M }),
    medium,
    volumes_mL,
    reading: mV ? { kind: 'mV', scale: 'concentration', E0_mV: 400 } : { kind: 'pH', scale: 'concentration' },
    ...(errors === undefined ? {} : { errors }),
  });
}

/** Phosphoric acid at infinite dilution, as in the reference curves; its third step is beyond water. */
export const PHOSPHORIC_PKA: readonly number[] = [2.148, 7.198, 12.35];
