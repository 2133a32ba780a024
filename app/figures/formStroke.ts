import type { FigureDash } from './figure.ts';

/** Dash pattern and width in px, as the plotting library takes them. */
export interface FormStroke {
  readonly dash: FigureDash;
  readonly width: number;
}

const STROKES = [
  { dash: 'solid', width: 2 },
  { dash: '8px,4px', width: 1.8 },
  { dash: '2px,3px', width: 2 },
  { dash: '15px,7px', width: 2.2 },
  { dash: '10px,3px,2px,3px', width: 1.8 },
  { dash: '4px,6px', width: 2.4 },
  { dash: '14px,3px,2px,3px,2px,3px', width: 1.6 },
  { dash: 'solid', width: 1.1 },
] as const;

/** Patterns tell forms apart where colour is lost; the `index` runs over all forms of a run and starts again after eight. */
export function formStroke(index: number): FormStroke {
  const { dash, width } = STROKES[index % STROKES.length];
  return { dash: dash as FigureDash, width };
}
