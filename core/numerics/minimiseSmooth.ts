/** Rounds of Newton's method; each takes about (n+1)(n+2)/2 evaluations. */
const mostRounds = 12;
/** Largest step in any coordinate; they are logarithms, so that this is a factor of e. */
const largestStep = 1;
const stepTolerance = 1e-4;

/** A minimum of a smooth function of one or two variables. */
export interface SmoothMinimum {
  readonly at: readonly number[];
  readonly value: number;
  /** Second derivatives there, row by row; null where they are not positive definite. */
  readonly hessian: readonly number[] | null;
  readonly converged: boolean;
}

/**
 * Minimises a smooth function of one or two variables of order one by Newton's
 * method with central differences of width `width`. Meant for logarithms of
 * variances, where a likelihood is nearly a parabola.
 */
export function minimiseSmooth(
  value: (at: readonly number[]) => number,
  start: readonly number[],
  width: number,
): SmoothMinimum {
  let at = [...start];
  let here = value(at);
  let hessian: number[] | null = null;
  for (let round = 0; round < mostRounds; round++) {
    const local = differences(value, at, here, width);
    hessian = isPositive(local.hessian) ? local.hessian : null;
    let step = newtonStep(local.gradient, local.hessian).map((s) => Math.max(-largestStep, Math.min(largestStep, s)));
    let next = at.map((x, k) => x + step[k]);
    let there = value(next);
    for (let halving = 0; halving < 6 && !(there <= here); halving++) {
      step = step.map((s) => 0.25 * s);
      next = at.map((x, k) => x + step[k]);
      there = value(next);
    }
    if (!(there <= here)) return { at, value: here, hessian, converged: hessian !== null };
    const length = Math.max(...step.map(Math.abs));
    at = next;
    here = there;
    if (length < stepTolerance) return { at, value: here, hessian, converged: hessian !== null };
  }
  return { at, value: here, hessian, converged: false };
}

function differences(value: (at: readonly number[]) => number, at: readonly number[], here: number, width: number) {
  const n = at.length;
  const shifted = (...moves: readonly (readonly [number, number])[]) => {
    const point = [...at];
    for (const [k, by] of moves) point[k] += by;
    return value(point);
  };
  const above = at.map((_, k) => shifted([k, width]));
  const below = at.map((_, k) => shifted([k, -width]));
  const gradient = at.map((_, k) => (above[k] - below[k]) / (2 * width));
  const hessian = new Array<number>(n * n);
  for (let a = 0; a < n; a++) {
    hessian[a * n + a] = (above[a] - 2 * here + below[a]) / width ** 2;
    for (let b = 0; b < a; b++) {
      const mixed = shifted([a, width], [b, width]) - above[a] - above[b] + here;
      const mirrored = shifted([a, -width], [b, -width]) - below[a] - below[b] + here;
      hessian[a * n + b] = (mixed + mirrored) / (2 * width ** 2);
      hessian[b * n + a] = hessian[a * n + b];
    }
  }
  return { gradient, hessian };
}

function isPositive(hessian: readonly number[]): boolean {
  if (hessian.length === 1) return hessian[0] > 0;
  return hessian[0] > 0 && hessian[0] * hessian[3] - hessian[1] * hessian[2] > 0;
}

/** −H⁻¹g, or downhill by the diagonal alone where H is not positive definite. */
function newtonStep(gradient: readonly number[], hessian: readonly number[]): number[] {
  const n = gradient.length;
  if (n === 2 && isPositive(hessian)) {
    const determinant = hessian[0] * hessian[3] - hessian[1] * hessian[2];
    return [
      -(hessian[3] * gradient[0] - hessian[1] * gradient[1]) / determinant,
      -(hessian[0] * gradient[1] - hessian[2] * gradient[0]) / determinant,
    ];
  }
  return gradient.map((g, k) => {
    const curvature = hessian[k * n + k];
    return curvature > 0 ? -g / curvature : -Math.sign(g) * largestStep;
  });
}
