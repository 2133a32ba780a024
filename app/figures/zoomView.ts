import type { FigureView } from './figureRun.ts';
import type { Range } from './pixelAxis.ts';

/** The view never gets smaller than this share of the whole. */
const SMALLEST = 1 / 500;

/** The view cut down to a range of volume, of reading, or both, within the whole; ends in either order. */
export function zoomView(
  whole: FigureView,
  view: FigureView,
  wanted: { readonly volume?: Range; readonly reading?: Range },
): FigureView {
  return {
    volume: wanted.volume === undefined ? view.volume : kept(whole.volume, wanted.volume),
    reading: wanted.reading === undefined ? view.reading : kept(whole.reading, wanted.reading),
  };
}

/** The view closer around a place (factor below 1) or wider (above 1). */
export function zoomAround(
  whole: FigureView,
  view: FigureView,
  centre: { readonly volume_mL: number; readonly reading: number },
  factor: number,
): FigureView {
  const around = (range: Range, at: number): Range => [at - factor * (at - range[0]), at + factor * (range[1] - at)];
  return zoomView(whole, view, {
    volume: around(view.volume, centre.volume_mL),
    reading: around(view.reading, centre.reading),
  });
}

/** The view moved just far enough to show a place. */
export function viewShowing(
  whole: FigureView,
  view: FigureView,
  place: { readonly volume_mL: number; readonly reading: number },
): FigureView {
  const volume = moved(view.volume, place.volume_mL);
  const reading = moved(view.reading, place.reading);
  return volume === view.volume && reading === view.reading ? view : zoomView(whole, view, { volume, reading });
}

function moved(range: Range, at: number): Range {
  if (at >= range[0] && at <= range[1]) return range;
  const room = 0.1 * (range[1] - range[0]);
  const shift = at < range[0] ? at - room - range[0] : at + room - range[1];
  return [range[0] + shift, range[1] + shift];
}

function kept(whole: Range, wanted: Range): Range {
  const least = SMALLEST * (whole[1] - whole[0]);
  let low = Math.max(whole[0], Math.min(wanted[0], wanted[1]));
  let high = Math.min(whole[1], Math.max(wanted[0], wanted[1]));
  if (high - low < least) {
    const centre = Math.max(whole[0] + least / 2, Math.min((low + high) / 2, whole[1] - least / 2));
    low = centre - least / 2;
    high = centre + least / 2;
  }
  return [low, high];
}
