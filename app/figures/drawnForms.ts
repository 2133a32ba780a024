import type { FigureFrame } from './figureFrame.ts';
import { formLabel } from './formLabel.ts';
import { type FormStroke, formStroke } from './formStroke.ts';
import type { RichText } from './richText.ts';

/** One form of one proton system, as the speciation shows it. */
export interface DrawnForm {
  readonly system: string;
  readonly label: RichText;
  readonly stroke: FormStroke;
  /** Place in the list of form colours. */
  readonly colour: number;
  /** False for a system that stays in the background. */
  readonly inFront: boolean;
  readonly pH: Float64Array;
  /** 0–1 */
  readonly fraction: Float64Array;
}

/** Every form of every system in the order of the result; colours and patterns run on from system to system. */
export function drawnForms(frame: FigureFrame, front: ReadonlySet<string>): DrawnForm[] {
  const { speciation } = frame.run.result;
  if (speciation === null || frame.axes.pH === null) return [];
  let index = 0;
  return speciation.systems.flatMap((system) =>
    system.forms.map((form, k) => {
      const place = index++;
      return {
        system: system.prefix,
        label: formLabel(speciation, system, k),
        stroke: formStroke(place),
        colour: place,
        inFront: front.has(system.prefix),
        pH: speciation.pH,
        fraction: form.fraction,
      };
    }),
  );
}
