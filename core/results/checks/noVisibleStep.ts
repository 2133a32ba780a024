import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Substances of which an amount is fitted though none of their equivalence volumes shows as a step of the readings. */
export function noVisibleStep({ equivalence, weighted, quantities, points }: Analysis): Doubt[] {
  const isFitted = (id: string) => quantities.some((quantity) => quantity.id === id && quantity.state === 'fitted');
  const titrantFitted = isFitted('titrant.concentration');
  const volumes = points.filter((point) => point.used).map((point) => point.volume_mL);
  const last = Math.max(...volumes);
  const shown = new Set(equivalence.flatMap(({ by, analyte }) => (by === 'derivative' ? [analyte] : [])));
  return weighted.run.design.systems.flatMap(({ name, prefix, role }): Doubt[] => {
    if (role !== 'analyte' || shown.has(name) || !(titrantFitted || isFitted(`${prefix}concentration`))) return [];
    const steps = equivalence.filter(
      ({ by, analyte, volume_mL }) => by === 'fit' && analyte === name && volume_mL !== null,
    );
    const inside = steps.filter(({ volume_mL }) => (volume_mL ?? 0) <= last);
    const step = inside.at(-1) ?? steps[0];
    if (step === undefined) return [];
    const volume = step.volume_mL ?? 0;
    return [
      {
        code: 'no-visible-step',
        seen:
          inside.length > 0
            ? `The readings show no step at the equivalence volume of ${name}, ${volume.toFixed(3)} mL.`
            : `The run ends at ${last.toFixed(3)} mL, before the first equivalence volume of ${name} at ${volume.toFixed(3)} mL.`,
        means:
          'The amount follows from the shape of the buffer region alone, and leans on the model, the constants and the electrode.',
        remedy:
          inside.length > 0
            ? 'Declare the amount from the weighing, or titrate a more concentrated sample.'
            : 'Titrate on beyond the step, or declare the amount from the weighing.',
        place: { volume_mL: Math.min(volume, last) },
      },
    ];
  });
}
