import type { PointResult, RunResult } from '../../core/index.ts';
import { decimalsIn } from './formatNumber.ts';
import { type PHLink, pHLink, readingOfPH } from './pHLink.ts';
import type { Range } from './pixelAxis.ts';

/** The part of the run that the figure shows. */
export interface FigureView {
  /** mL, rising. */
  readonly volume: Range;
  /** In the unit of the run, rising. */
  readonly reading: Range;
}

/** What the figure needs to know of a run, worked out once for each result. */
export interface FigureRun {
  readonly result: RunResult;
  /** Every point, in order of volume; points of equal volume in the order of the file. */
  readonly points: readonly PointResult[];
  /** Null where the run is in mV and says nothing about pH. */
  readonly link: PHLink | null;
  /** Decimals with which volumes and readings are written. */
  readonly decimals: { readonly volume: number; readonly reading: number; readonly residual: number };
  /** The view that shows every point. */
  readonly whole: FigureView;
}

/** A constant this little outside the readings, pH, is still shown. */
const REACH_PH = 1;

export function figureRun(result: RunResult): FigureRun {
  const points = [...result.points].sort((a, b) => a.volume_mL - b.volume_mL);
  const link = result.points.length === 0 ? null : pHLink(result);
  const volumeDecimals = decimalsIn(
    points.map((point) => point.volume_mL),
    3,
  );
  const readingDecimals = decimalsIn(
    points.map((point) => point.reading),
    result.run.readingKind === 'mV' ? 2 : 3,
  );
  return {
    result,
    points,
    link,
    decimals: {
      volume: Math.max(2, volumeDecimals),
      reading: Math.max(result.run.readingKind === 'mV' ? 1 : 2, readingDecimals),
      residual: result.run.readingKind === 'mV' ? 2 : Math.max(3, readingDecimals + 1),
    },
    whole: wholeView(result, points, link),
  };
}

function wholeView(result: RunResult, points: readonly PointResult[], link: PHLink | null): FigureView {
  const { curve, speciation } = result;
  const volume = extent([...points.map((point) => point.volume_mL), ...(curve?.volume_mL ?? [])]);
  const reading = extent([...points.map((point) => point.reading), ...(curve?.reading ?? [])]);
  if (volume === null || reading === null) return { volume: [0, 1], reading: [0, 1] };
  const shown = padded(reading, 0.05);
  if (link === null || speciation === null) return { volume: padded(volume, 0.03), reading: shown };
  const reach = Math.abs(REACH_PH / link.slope);
  const crossings = speciation.systems
    .filter((system) => system.role === 'analyte')
    .flatMap((system) => system.crossings.map((crossing) => readingOfPH(link, crossing.pH)))
    .filter((value) => value > shown[0] - reach && value < shown[1] + reach);
  const room = 0.03 * (shown[1] - shown[0]);
  return {
    volume: padded(volume, 0.03),
    reading: [
      Math.min(shown[0], ...crossings.map((value) => value - room)),
      Math.max(shown[1], ...crossings.map((value) => value + room)),
    ],
  };
}

function extent(values: readonly number[]): Range | null {
  if (values.length === 0) return null;
  let [low, high] = [values[0], values[0]];
  for (const value of values) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return [low, high];
}

/** Room around the data; a single value gets half a unit on either side. */
function padded([low, high]: Range, share: number): Range {
  const room = high > low ? share * (high - low) : 0.5;
  return [low - room, high + room];
}
