import { assumptions } from '../sheet/assumptions.ts';
import type { Sheet } from '../sheet/sheet.ts';

/**
 * What is declared about the noise of a run. The variance of a residual is
 * reading² + (setting · d reading/dV)², and dosing errors accumulate on top.
 */
export type NoiseDeclaration =
  /** All parts are known; nothing is estimated. */
  | { readonly kind: 'declared'; readonly reading: number; readonly setting_mL: number; readonly dose_mL: number }
  /** The volume parts are known, the reading noise is estimated. */
  | { readonly kind: 'reading-estimated'; readonly setting_mL: number; readonly dose_mL: number }
  /** Nothing is known: where the run cannot tell the parts apart, their ratio is taken for granted. */
  | { readonly kind: 'scale-estimated'; readonly settingToReading: number };

/** Noise of a run with its size. */
export interface Noise {
  /** In the unit of the reading. */
  readonly reading: number;
  /** Independent at each point. */
  readonly setting_mL: number;
  /** Of each dose, accumulating. */
  readonly dose_mL: number;
}

/** Reads the noise of a run from its sheet. */
export function declaredNoise(sheet: Sheet, nernstSlope_mV: number): NoiseDeclaration {
  const { settingUncertainty, doseUncertainty } = sheet.burette;
  const volumeParts = { setting_mL: settingUncertainty.value, dose_mL: doseUncertainty.value };
  const reading = sheet.reading.uncertainty;
  if (reading !== null) return { kind: 'declared', reading, ...volumeParts };
  if (!settingUncertainty.assumed || doseUncertainty.value > 0) return { kind: 'reading-estimated', ...volumeParts };
  const unitsPerPH = sheet.reading.kind === 'mV' ? nernstSlope_mV : 1;
  return { kind: 'scale-estimated', settingToReading: assumptions.settingToReading_mL / unitsPerPH };
}

/** The noise at a given size of its reading part; a declared size is not moved. */
export function noiseAt(declaration: NoiseDeclaration, reading: number): Noise {
  switch (declaration.kind) {
    case 'declared':
      return { reading: declaration.reading, setting_mL: declaration.setting_mL, dose_mL: declaration.dose_mL };
    case 'reading-estimated':
      return { reading, setting_mL: declaration.setting_mL, dose_mL: declaration.dose_mL };
    case 'scale-estimated':
      return { reading, setting_mL: declaration.settingToReading * reading, dose_mL: 0 };
  }
}
