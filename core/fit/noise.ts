import { assumptions } from '../sheet/assumptions.ts';
import type { Sheet } from '../sheet/sheet.ts';

/**
 * What is declared about the noise of a run. The variance of a residual is
 * reading² + (setting · d reading/dV)².
 */
export type NoiseDeclaration =
  /** Both parts are known; nothing is estimated. */
  | { readonly kind: 'declared'; readonly reading: number; readonly setting_mL: number }
  /** The setting error is known, the reading noise is estimated. */
  | { readonly kind: 'reading-estimated'; readonly setting_mL: number }
  /** Only the ratio of both is taken for granted; their size is estimated. */
  | { readonly kind: 'scale-estimated'; readonly settingToReading: number };

/** Noise of a run with its size, in the unit of the reading and in mL. */
export interface Noise {
  readonly reading: number;
  readonly setting_mL: number;
}

/** Reads the noise of a run from its sheet. */
export function declaredNoise(sheet: Sheet, nernstSlope_mV: number): NoiseDeclaration {
  const { settingUncertainty } = sheet.burette;
  const reading = sheet.reading.uncertainty;
  if (reading !== null) return { kind: 'declared', reading, setting_mL: settingUncertainty.value };
  if (!settingUncertainty.assumed) return { kind: 'reading-estimated', setting_mL: settingUncertainty.value };
  const unitsPerPH = sheet.reading.kind === 'mV' ? nernstSlope_mV : 1;
  return { kind: 'scale-estimated', settingToReading: assumptions.settingToReading_mL / unitsPerPH };
}

/** The noise at a given size of its reading part; a declared size is not moved. */
export function noiseAt(declaration: NoiseDeclaration, reading: number): Noise {
  switch (declaration.kind) {
    case 'declared':
      return { reading: declaration.reading, setting_mL: declaration.setting_mL };
    case 'reading-estimated':
      return { reading, setting_mL: declaration.setting_mL };
    case 'scale-estimated':
      return { reading, setting_mL: declaration.settingToReading * reading };
  }
}

/** Writes the standard uncertainty of every residual. Slopes in unit/mL. */
export function writeSigma(noise: Noise, slopes: Float64Array, sigma: Float64Array): void {
  for (let i = 0; i < sigma.length; i++) sigma[i] = Math.hypot(noise.reading, noise.setting_mL * slopes[i]);
}
