import type { FigureRun } from './figureRun.ts';
import { formLabel } from './formLabel.ts';
import { interpolate } from './interpolate.ts';
import type { RichText } from './richText.ts';

/** A form and its share at one pH, 0–1. */
export interface FormShare {
  readonly label: RichText;
  readonly share: number;
}

/** Forms with less than this are not worth naming at a cursor. */
const LEAST_SHARE = 0.01;

/** The two largest shares of each system in front at a pH, the largest first. */
export function formShares(run: FigureRun, front: ReadonlySet<string>, pH: number): FormShare[][] {
  const { speciation } = run.result;
  if (speciation === null) return [];
  return speciation.systems
    .filter((system) => front.has(system.prefix))
    .map((system) =>
      system.forms
        .flatMap((form, k) => {
          const share = interpolate(speciation.pH, form.fraction, pH);
          return share === null || share < LEAST_SHARE ? [] : [{ label: formLabel(speciation, system, k), share }];
        })
        .sort((a, b) => b.share - a.share)
        .slice(0, 2),
    );
}
