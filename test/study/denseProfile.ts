import { solveLeastSquares } from '../../core/fit/leastSquares.ts';
import { HeldProblem } from '../../core/inference/heldProblem.ts';
import type { FrozenMinimum } from '../../core/inference/profileInterval.ts';

/**
 * The end of a profile by plain scanning: the parameter is moved in small even
 * steps and everything else is fitted anew at each, from the end of the last
 * step and from the minimum; the first crossing of the threshold counts. Null
 * where there is none within reach.
 */
export function denseProfileEnd(
  minimum: FrozenMinimum,
  parameter: number,
  threshold: number,
  direction: 1 | -1,
  step: number,
  reach: number,
): number | null {
  const held = new HeldProblem(minimum.problem, parameter);
  const estimate = minimum.parameters[parameter];
  const fromMinimum = held.narrowed(minimum.parameters);
  let last = { distance: 0, rise: 0, parameters: fromMinimum };
  for (let distance = step; distance <= reach; distance += step) {
    held.hold(estimate + direction * distance);
    const results = [last.parameters, fromMinimum].map((start) => solveLeastSquares(held, start));
    const [best] = results.filter(({ cost }) => cost !== null).sort((a, b) => (a.cost ?? 0) - (b.cost ?? 0));
    if (best === undefined) return null;
    const rise = (best.cost ?? 0) - minimum.cost;
    if (rise >= threshold) {
      const share = (threshold - last.rise) / (rise - last.rise);
      return estimate + direction * (last.distance + share * (distance - last.distance));
    }
    last = { distance, rise, parameters: best.parameters };
  }
  return null;
}
