import type { QuantityResult } from '../../../core/index.ts';
import { formatDecimals, formatSignificant } from '../../widgets/formatQuantity.ts';

/** Digits of a bound that is no pKa. */
const digits = 3;
/** Decimals of a bound of a pKa. */
const decimals = 2;

/** "< 2.13" or "> 11.90": rounded outwards, so that the statement stays true; null where the quantity has no bound. */
export function boundWords({ interval95, whyNoU, unit, value }: QuantityResult): string | null {
  if (whyNoU !== 'bound' || interval95 === null || value !== null) return null;
  const [low, high] = interval95;
  if (high !== null && low === null) return `< ${outwards(high, unit, Math.ceil)}`;
  return low !== null && high === null ? `> ${outwards(low, unit, Math.floor)}` : null;
}

function outwards(end: number, unit: string, round: (value: number) => number): string {
  if (unit === '') return formatDecimals(round(end * 10 ** decimals) / 10 ** decimals, decimals);
  if (end === 0) return '0';
  const place = 10 ** (digits - 1 - Math.floor(Math.log10(Math.abs(end))));
  return formatSignificant(round(end * place) / place, digits);
}
