/** Where a straight line meets zero. */
export interface LineToZero {
  readonly zero: number;
  /** Standard uncertainty of `zero`, from the scatter about the line. */
  readonly u: number;
  readonly slope: number;
  /** Weighted share of the variance that the line explains. */
  readonly rSquared: number;
  /** Root mean square of the relative distances from the line, with n − 2 degrees of freedom. */
  readonly relativeScatter: number;
}

/**
 * Weighted least-squares line y = slope (x − zero), for values whose *relative*
 * error is the same everywhere, and its intersection with the x axis. The
 * uncertainty of the intersection is of first order.
 *
 * @param x, y as many values each, y not zero
 * @returns null with fewer than three points or a level line
 */
export function lineToZero(x: ArrayLike<number>, y: ArrayLike<number>): LineToZero | null {
  const n = x.length;
  if (n < 3) return null;
  let weights = 0;
  let meanX = 0;
  let meanY = 0;
  for (let i = 0; i < n; i++) {
    const weight = 1 / (y[i] * y[i]);
    weights += weight;
    meanX += weight * x[i];
    meanY += weight * y[i];
  }
  meanX /= weights;
  meanY /= weights;
  let xx = 0;
  let xy = 0;
  let yy = 0;
  for (let i = 0; i < n; i++) {
    const weight = 1 / (y[i] * y[i]);
    xx += weight * (x[i] - meanX) ** 2;
    xy += weight * (x[i] - meanX) * (y[i] - meanY);
    yy += weight * (y[i] - meanY) ** 2;
  }
  if (!(xx > 0) || xy === 0) return null;
  const slope = xy / xx;
  let squares = 0;
  for (let i = 0; i < n; i++) {
    const distance = (y[i] - meanY - slope * (x[i] - meanX)) / y[i];
    squares += distance * distance;
  }
  const variance = squares / (n - 2);
  const zero = meanX - meanY / slope;
  return {
    zero,
    u: Math.sqrt(variance * (1 / weights + (zero - meanX) ** 2 / xx)) / Math.abs(slope),
    slope,
    rSquared: Math.max(0, 1 - squares / yy),
    relativeScatter: Math.sqrt(variance),
  };
}
