import * as Plotly from 'plotly.js/lib/core';
import type { Figure } from './figure.ts';

// The core holds the scatter trace, and nothing here draws anything else.
// By default the library offers a button that sends the data to its maker's server; no button, no server.
Plotly.setPlotConfig({ showSendToCloud: false, plotlyServerURL: '', displaylogo: false });

/** The figure is a picture: cursor, zoom and keys belong to the layer over it. */
const still = { staticPlot: true, displayModeBar: false, showSendToCloud: false, plotlyServerURL: '' } as const;

/** Draws the figure into the element, or brings what is there up to it. */
export async function drawFigure(element: HTMLElement, figure: Figure): Promise<void> {
  await Plotly.react(element, [...figure.data], figure.layout, still);
}

/** Frees what the library holds for the element. */
export function eraseFigure(element: HTMLElement): void {
  Plotly.purge(element);
}

/**
 * The figure as a picture that needs nothing but itself: the text of an SVG, or a PNG as a `data:` address.
 *
 * @param scale px of the PNG per px of the figure
 */
export async function pictureOfFigure(figure: Figure, format: 'svg' | 'png', scale = 1): Promise<string> {
  const { width, height } = figure.layout;
  const address = await Plotly.toImage(
    { data: [...figure.data], layout: figure.layout },
    { format, width, height, scale },
  );
  return format === 'svg' ? decodeURIComponent(address.slice(address.indexOf(',') + 1)) : address;
}
