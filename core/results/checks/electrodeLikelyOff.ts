import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** An electrode whose offset or slope is not what is declared. */
export function electrodeLikelyOff({ causes, weighted }: Analysis): Doubt[] {
  const cause = causes.find(({ kind }) => kind === 'electrode');
  if (cause === undefined) return [];
  const quantity = weighted.run.design.quantities.find(({ id }) => id === cause.id);
  const unit = quantity === undefined || quantity.unit === '' ? '' : ` ${quantity.unit}`;
  const digits = cause.id === 'reading.E0' ? 1 : 3;
  return [
    {
      code: 'electrode-likely-off',
      seen: `The readings ask for an ${quantity?.label ?? cause.id} of about ${cause.wanted.toFixed(digits)}${unit} in place of ${cause.value.toFixed(digits)}${unit}, far beyond chance (${cause.strength.toFixed(1)} standard deviations).`.replace(
        'an standard',
        'a standard',
      ),
      means: 'Every constant moves with the electrode, and no residual shows by how much.',
      remedy: 'Calibrate again, or let it be fitted where the run reaches into strong acid or base.',
      place: { quantity: cause.id },
    },
  ];
}
