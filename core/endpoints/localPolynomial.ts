/** What a polynomial through a window of points says about one place in it. */
export interface LocalPolynomial {
  value: number;
  /** First derivative, reading per mL. */
  slope: number;
  /** Second derivative, reading per mL². */
  curvature: number;
  /** Standard deviation of the value for independent noise of one unit in each reading. */
  valueGain: number;
  /** Standard deviation of the slope for the same, 1/mL. */
  slopeGain: number;
}

/** The highest degree in use; polynomials of 0 to 3 need four of everything. */
const TERMS = 4;
const alpha = new Float64Array(TERMS);
const beta = new Float64Array(TERMS);
const norm = new Float64Array(TERMS);
const atCentre = new Float64Array(TERMS);
const slopeAtCentre = new Float64Array(TERMS);
const curvatureAtCentre = new Float64Array(TERMS);

/** Relative to a norm of order one: below it the points of a window are no more than `degree` distinct places. */
const DEGENERATE = 1e-12;

/**
 * Builds the polynomials orthogonal over the points first..last by the
 * three-term recurrence (G. E. Forsythe, J. SIAM 5 (1957) 74–88, from memory),
 * in t = (V − centre)/scale, with their values and derivatives at the centre.
 * Returns the scale, or 0 where the points do not determine the polynomial.
 */
function build(volumes: Float64Array, first: number, last: number, centre: number, degree: number): number {
  const scale = Math.max(centre - volumes[first], volumes[last] - centre);
  if (!(scale > 0) || last - first < degree) return 0;
  for (let r = 0; r <= degree; r++) {
    let sumSquares = 0;
    let sumMoments = 0;
    for (let j = first; j <= last; j++) {
      const t = (volumes[j] - centre) / scale;
      const p = term(r, t);
      sumSquares += p * p;
      sumMoments += t * p * p;
    }
    if (sumSquares < DEGENERATE) return 0;
    norm[r] = sumSquares;
    alpha[r] = sumMoments / sumSquares;
    beta[r] = r === 0 ? 0 : sumSquares / norm[r - 1];
    // p_r at t = 0 from p_r = (t − α)p − βp, and its derivatives by the product rule.
    const a = r > 0 ? alpha[r - 1] : 0;
    const b = r > 1 ? beta[r - 1] : 0;
    const p1 = r > 0 ? atCentre[r - 1] : 0;
    const p2 = r > 1 ? atCentre[r - 2] : 0;
    const d1 = r > 0 ? slopeAtCentre[r - 1] : 0;
    const d2 = r > 1 ? slopeAtCentre[r - 2] : 0;
    const c1 = r > 0 ? curvatureAtCentre[r - 1] : 0;
    const c2 = r > 1 ? curvatureAtCentre[r - 2] : 0;
    atCentre[r] = r === 0 ? 1 : -a * p1 - b * p2;
    slopeAtCentre[r] = r === 0 ? 0 : p1 - a * d1 - b * d2;
    curvatureAtCentre[r] = r === 0 ? 0 : 2 * d1 - a * c1 - b * c2;
  }
  return scale;
}

/** The orthogonal polynomial of degree r at t, from the recurrence found so far. */
function term(r: number, t: number): number {
  let before = 0;
  let p = 1;
  for (let s = 0; s < r; s++) {
    const next = (t - alpha[s]) * p - beta[s] * before;
    before = p;
    p = next;
  }
  return p;
}

/**
 * Least-squares polynomial through the points first..last (both included),
 * written into `out`.
 *
 * @param volumes strictly rising, mL
 * @param centre where value and derivatives are wanted, mL
 * @returns false, with `out` untouched, where the points do not determine it
 */
export function localPolynomial(
  volumes: Float64Array,
  readings: Float64Array,
  first: number,
  last: number,
  centre: number,
  degree: 1 | 2 | 3,
  out: LocalPolynomial,
): boolean {
  const scale = build(volumes, first, last, centre, degree);
  if (scale === 0) return false;
  let value = 0;
  let slope = 0;
  let curvature = 0;
  let valueGain = 0;
  let slopeGain = 0;
  for (let r = 0; r <= degree; r++) {
    let projection = 0;
    for (let j = first; j <= last; j++) projection += readings[j] * term(r, (volumes[j] - centre) / scale);
    const coefficient = projection / norm[r];
    value += coefficient * atCentre[r];
    slope += coefficient * slopeAtCentre[r];
    curvature += coefficient * curvatureAtCentre[r];
    valueGain += (atCentre[r] * atCentre[r]) / norm[r];
    slopeGain += (slopeAtCentre[r] * slopeAtCentre[r]) / norm[r];
  }
  // Volumes too near each other for doubles.
  if (!Number.isFinite(slope / scale + curvature / (scale * scale) + Math.sqrt(slopeGain) / scale)) return false;
  out.value = value;
  out.slope = slope / scale;
  out.curvature = curvature / (scale * scale);
  out.valueGain = Math.sqrt(valueGain);
  out.slopeGain = Math.sqrt(slopeGain) / scale;
  return true;
}

/**
 * Adds to `into[j]`, for the same polynomial, the derivative with respect to
 * reading j of slopeFactor × slope + curvatureFactor × curvature.
 */
export function addWeights(
  volumes: Float64Array,
  first: number,
  last: number,
  centre: number,
  degree: 1 | 2 | 3,
  slopeFactor: number,
  curvatureFactor: number,
  into: Float64Array,
): void {
  const scale = build(volumes, first, last, centre, degree);
  if (scale === 0) return;
  for (let j = first; j <= last; j++) {
    const t = (volumes[j] - centre) / scale;
    let weight = 0;
    for (let r = 1; r <= degree; r++) {
      const ofTerm = (slopeFactor * slopeAtCentre[r]) / scale + (curvatureFactor * curvatureAtCentre[r]) / scale ** 2;
      weight += (ofTerm * term(r, t)) / norm[r];
    }
    into[j] += weight;
  }
}
