import { crossedFigure, type FrontSystems } from '../../figures/crossedFigure.ts';
import { figureFrame } from '../../figures/figureFrame.ts';
import type { FigureRun, FigureView } from '../../figures/figureRun.ts';
import { paperStyle } from '../../figures/paperStyle.ts';
import { pictureOfFigure } from '../../figures/plotly.ts';

/** Width of a saved figure, px: type of 13 px is then about 8 points on a page 170 mm wide. */
const SAVED_WIDTH = 1000;
/** A PNG has this many px per px of the figure: some 450 dots per inch on that page. */
const PNG_SCALE = 3;

/** Hands the person what the figure shows now as a file, dark on white. */
export async function saveFigure(
  run: FigureRun,
  view: FigureView,
  front: FrontSystems,
  format: 'svg' | 'png',
): Promise<void> {
  const figure = crossedFigure(figureFrame(run, view, SAVED_WIDTH), front, paperStyle);
  const picture = await pictureOfFigure(figure, format, PNG_SCALE);
  const link = document.createElement('a');
  link.download = `${run.result.run.name.replace(/\.\w+$/, '').replaceAll(/[\\/:*?"<>|]/g, '-')}.${format}`;
  if (format === 'png') {
    link.href = picture;
    link.click();
    return;
  }
  link.href = URL.createObjectURL(new Blob([picture], { type: 'image/svg+xml' }));
  link.click();
  // The browser reads the address after this turn of its event loop.
  setTimeout(() => URL.revokeObjectURL(link.href), 1000);
}
