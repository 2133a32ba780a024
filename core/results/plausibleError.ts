import type { Quantity } from '../model/quantity.ts';

/**
 * How wrong a value may well be that nobody has declared, in the unit of the
 * quantity. Used only to say what a result rests on, never as an uncertainty:
 * rough figures of common practice.
 */
export function plausibleError({ id, role }: Quantity, value: number): number {
  switch (role.kind) {
    case 'sampleVolume':
      return 0.5 * value;
    case 'extraWater':
      return 10;
    case 'buretteGain':
      return 0.002;
    case 'ionProduct':
      return 0.02;
    case 'slope':
      return 0.01;
    case 'offset':
      return 0.05;
    case 'standardPotential':
      return 3;
    case 'strongIon':
      return 5e-4;
    case 'amount':
      if (id === 'titrant.concentration') return 0.02 * value;
      if (id.endsWith('.carbonate')) return 5e-4;
      if (id.endsWith('.background')) return 0.1;
      return Math.max(0.02 * Math.abs(value), 1e-4);
    default:
      return 0.05;
  }
}
