import type { NoiseResult } from '../../../core/index.ts';
import { formatDecimals, formatSignificant } from '../../widgets/formatQuantity.ts';

/** How much the readings scatter, and how that is known. */
export function noiseWords(noise: NoiseResult): string {
  const unit = noise.unit === 'mV' ? 'mV' : 'in pH';
  const parts = [`u of a reading ${formatSignificant(noise.reading, 2)} ${unit}`];
  if (noise.setting_mL > 0) parts.push(`of a set volume ${formatSignificant(noise.setting_mL, 2)} mL`);
  if (noise.dose_mL > 0) parts.push(`of a dose ${formatSignificant(noise.dose_mL, 2)} mL`);
  const degrees = formatDecimals(noise.degreesOfFreedom, Number.isInteger(noise.degreesOfFreedom) ? 0 : 1);
  const how = noise.declared ? 'as declared' : `estimated from the run`;
  const chi =
    noise.reducedChiSquare === null
      ? 'no degree of freedom is left'
      : `reduced χ² ${noise.reducedChiSquare < 100 ? formatDecimals(noise.reducedChiSquare, 2) : formatSignificant(noise.reducedChiSquare, 3)} on ${degrees} degrees of freedom`;
  return `${parts.join(', ')}, ${how}; ${chi}.`;
}
