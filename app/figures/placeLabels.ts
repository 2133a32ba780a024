import type { Rectangle } from './rectangle.ts';

/** A line on the page as x0, y0, x1, y1 …, px. */
export type PixelLine = readonly number[];

/** A label and the places it could take, each with what it costs to take it. */
export interface LabelRequest {
  readonly width: number;
  readonly height: number;
  readonly candidates: readonly { readonly left: number; readonly top: number; readonly cost: number }[];
}

/** A line that labels should not stand on, and what it costs to do so, on the scale of the candidates' own costs. */
export interface LineToAvoid {
  readonly line: PixelLine;
  readonly cost: number;
}

/** Free room kept around each label, px. */
const MARGIN = 2;

/**
 * Chooses a place for each label, the first ones first: never over another
 * label, an obstacle or the edge of `bounds`, and over as few lines as
 * possible.
 *
 * @returns one entry per request; null where no candidate was free
 */
export function placeLabels(
  requests: readonly LabelRequest[],
  bounds: Rectangle,
  obstacles: readonly Rectangle[],
  lines: readonly LineToAvoid[],
): (Rectangle | null)[] {
  const taken = [...obstacles];
  return requests.map(({ width, height, candidates }) => {
    let best: Rectangle | null = null;
    let bestCost = Number.POSITIVE_INFINITY;
    for (const { left, top, cost } of candidates.toSorted((a, b) => a.cost - b.cost)) {
      if (cost >= bestCost) break;
      const box = { left, top, width, height };
      if (!liesWithin(box, bounds) || taken.some((other) => overlap(box, other))) continue;
      const total = lines.reduce((sum, other) => (crosses(other.line, box) ? sum + other.cost : sum), cost);
      if (total < bestCost) {
        bestCost = total;
        best = box;
      }
    }
    if (best !== null) taken.push(best);
    return best;
  });
}

function liesWithin(box: Rectangle, bounds: Rectangle): boolean {
  return (
    box.left >= bounds.left &&
    box.top >= bounds.top &&
    box.left + box.width <= bounds.left + bounds.width &&
    box.top + box.height <= bounds.top + bounds.height
  );
}

function overlap(a: Rectangle, b: Rectangle): boolean {
  return (
    a.left < b.left + b.width + MARGIN &&
    b.left < a.left + a.width + MARGIN &&
    a.top < b.top + b.height + MARGIN &&
    b.top < a.top + a.height + MARGIN
  );
}

function crosses(line: PixelLine, box: Rectangle): boolean {
  const right = box.left + box.width;
  const bottom = box.top + box.height;
  for (let i = 0; i + 3 < line.length; i += 2) {
    const [x0, y0, x1, y1] = [line[i], line[i + 1], line[i + 2], line[i + 3]];
    // Most segments lie to one side of the box altogether.
    if ((x0 < box.left && x1 < box.left) || (x0 > right && x1 > right)) continue;
    if ((y0 < box.top && y1 < box.top) || (y0 > bottom && y1 > bottom)) continue;
    if (segmentMeets(x0, y0, x1, y1, box)) return true;
  }
  return false;
}

/** Clips the segment to the box, side by side (Liang and Barsky 1984); true where something is left. */
function segmentMeets(x0: number, y0: number, x1: number, y1: number, box: Rectangle): boolean {
  let from = 0;
  let to = 1;
  const sides = [
    [x0 - x1, x0 - box.left],
    [x1 - x0, box.left + box.width - x0],
    [y0 - y1, y0 - box.top],
    [y1 - y0, box.top + box.height - y0],
  ];
  for (const [direction, distance] of sides) {
    if (direction === 0) {
      if (distance < 0) return false;
    } else if (direction < 0) from = Math.max(from, distance / direction);
    else to = Math.min(to, distance / direction);
  }
  return from <= to;
}
