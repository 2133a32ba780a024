import { type FigureFrame, figureFrame } from '../../../app/figures/figureFrame.ts';
import { type FigureView, figureRun } from '../../../app/figures/figureRun.ts';
import { exampleResult } from './exampleResult.ts';

/** The frame of an example run, all of it in view unless told otherwise. */
export function exampleFrame(
  wanted: Parameters<typeof exampleResult>[0] = {},
  width = 1200,
  view: Partial<FigureView> = {},
): FigureFrame {
  const run = figureRun(exampleResult(wanted));
  return figureFrame(run, { ...run.whole, ...view }, width);
}
