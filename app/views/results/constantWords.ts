import type { ConstantResult } from '../../../core/index.ts';
import { formatDecimals } from '../../widgets/formatQuantity.ts';

const meaning: Readonly<Record<ConstantResult['kind'], string>> = {
  thermodynamic: 'thermodynamic',
  concentration: 'concentration constant',
  mixed: 'mixed constant',
};

/** What a pKa is, at which temperature and ionic strength, and the other kinds beside it. */
export function constantWords(constant: ConstantResult, decimals: number): string {
  const { kind, temperature_C, ionicStrength_M } = constant;
  const at = `I\u00a0=\u00a0${formatDecimals(ionicStrength_M, 3)}\u00a0M`;
  const others = (['thermodynamic', 'concentration', 'mixed'] as const)
    .filter((other) => other !== kind && constant[other] !== null)
    .map((other) => `${other} ${formatDecimals(constant[other] ?? 0, decimals)}`);
  const isDilute = kind === 'thermodynamic';
  const head = `${meaning[kind]}, ${formatDecimals(temperature_C, 1)}\u00a0°C${isDilute ? '' : `, ${at}`}`;
  if (others.length === 0) return head;
  return `${head}; ${isDilute ? `at ${at}: ` : 'beside it '}${others.join(', ')}`;
}
