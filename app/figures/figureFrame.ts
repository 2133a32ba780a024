import { constantMarks } from './constantMarks.ts';
import { type EquivalenceMark, equivalenceMarks } from './equivalenceMarks.ts';
import type { FigureRun, FigureView } from './figureRun.ts';
import { type Panels, panels } from './panels.ts';
import { pHOfReading } from './pHLink.ts';
import { contains, type PixelAxis } from './pixelAxis.ts';
import { residualRange } from './residualRange.ts';
import { textWidth } from './textWidth.ts';

/** Where everything stands: the panels and the axes that turn numbers into pixels and back. */
export interface FigureFrame {
  readonly run: FigureRun;
  readonly view: FigureView;
  readonly panels: Panels;
  readonly axes: {
    readonly volume: PixelAxis;
    readonly reading: PixelAxis;
    readonly residual: PixelAxis | null;
    /** Of the speciation: on the heights of the reading beside the curve, from left to right below it. */
    readonly pH: PixelAxis | null;
    /** Of the speciation, 0–1. */
    readonly fraction: PixelAxis | null;
  };
  /** Size of small type, px. */
  readonly labelSize: number;
}

/** @param width of the whole figure, px */
export function figureFrame(run: FigureRun, view: FigureView, width: number): FigureFrame {
  const labelSize = width < 500 ? 12 : 13;
  const { speciation } = run.result;
  const everySystem = new Set(speciation?.systems.map((system) => system.prefix));
  const constants = constantMarks(run, everySystem).map((mark) => textWidth(mark.label, labelSize));
  const residual = residualRange(run, view);
  const needs = {
    width,
    residuals: residual !== null,
    speciation: speciation !== null && run.link !== null,
    pHAxis: run.link?.separate === true,
    constantLabel: Math.max(44, ...constants),
  };
  const oneRow = panels({ ...needs, labelRows: 1 });
  const rows = labelRows(equivalenceMarks(run).rules, view, oneRow.curve.width, labelSize);
  const placed = rows === 1 ? oneRow : panels({ ...needs, labelRows: rows });
  const { curve, residuals, speciation: beside } = placed;
  const upwards = (panel: { top: number; height: number }) => [panel.top + panel.height, panel.top] as const;
  const sideways = (panel: { left: number; width: number }) => [panel.left, panel.left + panel.width] as const;
  const pHRange =
    run.link === null
      ? null
      : ([pHOfReading(run.link, view.reading[0]), pHOfReading(run.link, view.reading[1])] as const);
  const turned = placed.arrangement === 'below';
  return {
    run,
    view,
    panels: placed,
    axes: {
      volume: { range: view.volume, pixels: sideways(curve) },
      reading: { range: view.reading, pixels: upwards(curve) },
      residual: residual === null || residuals === null ? null : { range: residual, pixels: upwards(residuals) },
      pH:
        beside === null || pHRange === null
          ? null
          : turned
            ? { range: [Math.min(...pHRange), Math.max(...pHRange)], pixels: sideways(beside) }
            : { range: pHRange, pixels: upwards(beside) },
      fraction: beside === null ? null : { range: [0, 1], pixels: turned ? upwards(beside) : sideways(beside) },
    },
    labelSize,
  };
}

/** Labels that would crowd one row over the curve get two. */
function labelRows(marks: readonly EquivalenceMark[], view: FigureView, width: number, size: number): number {
  const shown = marks.filter((mark) => contains(view.volume, mark.volume_mL));
  const needed = shown.reduce((sum, mark) => sum + textWidth(mark.text, size) + 8, 0);
  return needed > width ? 2 : 1;
}
