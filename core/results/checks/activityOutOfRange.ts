import { daviesUpperIonicStrength } from '../../chemistry/davies.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Ionic strengths at which the Davies equation is not to be trusted. */
export function activityOutOfRange({ weighted }: Analysis): Doubt[] {
  if (weighted.run.design.coefficientA === 0) return [];
  const highest = weighted.model.ionicStrength.reduce((a, b) => Math.max(a, b), 0);
  if (highest <= daviesUpperIonicStrength) return [];
  return [
    {
      code: 'activity-out-of-range',
      seen: `The ionic strength reaches ${highest.toFixed(2)} mol/L; the Davies equation is trusted up to ${daviesUpperIonicStrength} mol/L.`,
      means: 'Thermodynamic constants carry an error of the activity model that no uncertainty here contains.',
      remedy: 'Dilute, or set the activity model to none and state the constants for this medium.',
      place: { quantity: 'medium.activity' },
    },
  ];
}
