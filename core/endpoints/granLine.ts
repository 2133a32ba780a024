import { lineToZero } from './lineToZero.ts';

export interface GranLineInput {
  /** Strictly rising, mL; they decide which points are used. */
  readonly volumes: Float64Array;
  /** What the values are drawn against, mL. */
  readonly abscissa: Float64Array;
  /** The Gran function at each volume. */
  readonly values: Float64Array;
  /** Points from the first to the second of these volumes are used, mL. */
  readonly range: readonly [number, number];
  /** Where the line should lead, mL, and how wide its step is, mL. */
  readonly target: number;
  readonly width: number;
}

export type GranLine =
  | {
      readonly volume_mL: number;
      readonly u_mL: number;
      /** Change of the function per mL: of the strength of the titrant where the function counts free ions, in mol/L. */
      readonly slope: number;
      readonly range_mL: readonly [number, number];
      readonly pointsUsed: number;
      readonly rSquared: number;
      readonly relativeScatter: number;
    }
  | { readonly reason: 'too few points' | 'not straight' | 'meets zero elsewhere'; readonly pointsUsed: number };

const FEWEST_POINTS = 4;
/** Each half needs three points to show whether it leads to the same place. */
const FEWEST_FOR_HALVES = 6;
/** A line whose points scatter by more than this relative to their height (0.02 in pH) is not straight. */
const LARGEST_SCATTER = 0.045;
/** Nor is one whose halves lead to places apart by more than this share of the step, beyond noise. */
const LARGEST_BEND = 0.02;
/** A line must meet zero within this share of its step's width from the step. */
const LARGEST_MISS = 0.1;

/**
 * The line of a Gran function through the points of a range, and where it meets
 * zero; or the reason why there is none. The two halves of the range are also
 * drawn by themselves: what separates the places to which they lead, beyond
 * three times its noise, is added to the uncertainty, because the bend goes on
 * where the line leaves the points.
 */
export function granLine({ volumes, abscissa, values, range, target, width }: GranLineInput): GranLine {
  const x: number[] = [];
  const y: number[] = [];
  const used: number[] = [];
  for (let i = 0; i < volumes.length; i++) {
    if (volumes[i] < range[0] || volumes[i] > range[1] || !(values[i] > 0)) continue;
    x.push(abscissa[i]);
    y.push(values[i]);
    used.push(volumes[i]);
  }
  const pointsUsed = x.length;
  const line = pointsUsed < FEWEST_POINTS ? null : lineToZero(x, y);
  if (line === null) return { reason: 'too few points', pointsUsed };
  if (line.relativeScatter > LARGEST_SCATTER) return { reason: 'not straight', pointsUsed };
  const bend = bendOf(x, y);
  if (bend > LARGEST_BEND * width) return { reason: 'not straight', pointsUsed };
  if (Math.abs(line.zero - target) > LARGEST_MISS * width) return { reason: 'meets zero elsewhere', pointsUsed };
  return {
    volume_mL: line.zero,
    u_mL: Math.hypot(line.u, bend),
    slope: line.slope,
    range_mL: [used[0], used[pointsUsed - 1]],
    pointsUsed,
    rSquared: line.rSquared,
    relativeScatter: line.relativeScatter,
  };
}

/** Distance between the places to which both halves lead, less three times its standard uncertainty; at least zero. */
function bendOf(x: readonly number[], y: readonly number[]): number {
  if (x.length < FEWEST_FOR_HALVES) return 0;
  const half = Math.floor(x.length / 2);
  const lower = lineToZero(x.slice(0, half), y.slice(0, half));
  const upper = lineToZero(x.slice(-half), y.slice(-half));
  if (lower === null || upper === null) return 0;
  return Math.max(0, Math.abs(lower.zero - upper.zero) - 3 * Math.hypot(lower.u, upper.u));
}
