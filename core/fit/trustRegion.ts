import type { Linearisation } from './linearisation.ts';

/** The step's length may miss the trust radius by this part of it (Moré 1978, section 5). */
const RADIUS_SLACK = 0.1;

/** Newton's method on a convex function of one variable: in practice 2 to 8 rounds. */
const MAXIMUM_ROUNDS = 60;

/**
 * Damping λ ≥ 0 that keeps the step (S² + λ)⁻¹ S c within the trust radius, to
 * 10 %; 0 where the undamped step lies inside.
 *
 * Newton's method on 1/‖w(λ)‖ = 1/radius, which is nearly a straight line in λ
 * and is approached from below (Hebden 1973; Moré, "The Levenberg–Marquardt
 * algorithm: implementation and theory", Lecture Notes in Mathematics 630, 1978).
 */
export function chooseDamping({ singularValues, projected, rank }: Linearisation, radius: number): number {
  let damping = 0;
  for (let round = 0; round < MAXIMUM_ROUNDS; round++) {
    let squares = 0;
    let slope = 0;
    for (let k = 0; k < rank; k++) {
      const curvature = singularValues[k] ** 2 + damping;
      const square = ((singularValues[k] * projected[k]) / curvature) ** 2;
      squares += square;
      slope += square / curvature;
    }
    const length = Math.sqrt(squares);
    if (length <= (1 + RADIUS_SLACK) * radius) return damping;
    damping += ((length - radius) / radius) * (squares / slope);
  }
  return damping;
}

/** A trial step and what became of it. */
export interface Trial {
  /** Fall of the cost; negative where it rose; null where the model could not be computed. */
  readonly actual: number | null;
  /** Fall of the cost that the linear problem predicts; positive. */
  readonly predicted: number;
  /** −½ of the slope of the cost along the step; positive. */
  readonly descent: number;
  /** Length of the step in units of the column scales. */
  readonly length: number;
  readonly damped: boolean;
}

/** A step is taken if the cost falls by at least this part of the prediction (Moré 1978). */
const LEAST_GAIN = 1e-4;

export function isAcceptable({ actual, predicted }: Trial): boolean {
  return actual !== null && actual > 0 && actual >= LEAST_GAIN * predicted;
}

/**
 * Trust radius after a trial, by the rules of Moré (1978), section 6, save that
 * it never stays longer than a step that failed: the same step would be tried again.
 */
export function nextRadius(radius: number, trial: Trial): number {
  const { actual, predicted, descent, length, damped } = trial;
  // Nothing is known of the cost beyond the edge of the computable region.
  if (actual === null) return 0.25 * Math.min(radius, length);
  const gain = actual / predicted;
  if (gain <= 0.25) {
    // The lowest point of the parabola through cost, slope and trial cost.
    const parabola = actual >= 0 ? 0.5 : descent / (2 * descent - actual);
    return Math.min(0.5, Math.max(0.1, parabola)) * Math.min(radius, length);
  }
  if (gain >= 0.75 || !damped) return 2 * length;
  return radius;
}
