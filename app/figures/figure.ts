import type { Annotation, Layout, ScatterData, Shape } from 'plotly.js/lib/core';

/** A finished figure as plain data: what the plotting library is to draw, and nothing it has to decide. */
export interface Figure {
  readonly data: FigureTrace[];
  readonly layout: FigureLayout;
}

/** The library draws patterns such as `8px,4px` too; its types know only the named ones. */
export type FigureDash = NonNullable<NonNullable<ScatterData['line']>['dash']>;

export type FigureTrace = Partial<ScatterData> & { readonly type: 'scatter'; readonly name: string };
export type FigureShape = Partial<Shape>;
export type FigureAnnotation = Partial<Annotation>;
export type FigureLayout = Partial<Layout> & { readonly width: number; readonly height: number };
