import { ChargeBalance } from './chargeBalance.ts';
import { daviesFunction } from './davies.ts';
import { anionsIndex, cationsIndex, firstSystem } from './mixture.ts';
import type { ProtonSystemShape } from './protonSystem.ts';

/** Stop when ln[H⁺] and ln I move by less than this: Newton is quadratic, so the error left is about its square. */
const stepTolerance = 1e-7;
/** Steps below this shrink quadratically, which two of them then show; the error that they leave may be this large. */
const quadraticRange = 0.1;
const errorTolerance = 1e-11;
/** Below this a step that no longer shrinks is rounding, not progress. */
const roundingStep = 1e-5;
const joinedIterations = 24;
/** Largest change of ln[H⁺] in one Newton step; more than two pH units at once is a leap in the dark. */
const largestStep = 5;
/** Range of ln[H⁺] searched when Newton fails: p[H⁺] from −1 to 16, all that water can show. */
const searchRange = { lowest: -16 * Math.LN10, highest: Math.LN10 } as const;
/** 17 decades halved this often are below the spacing of doubles. */
const searchHalvings = 60;
/** Smallest ionic strength handed to the root in the Davies function, mol/L. */
const smallestIonicStrength = 1e-14;
/** Ionic strength from which the bracketed search starts at every x, mol/L. */
const searchIonicStrength = 0.1;
const smallestDeterminant = 0.2;

/**
 * Solves charge balance and ionic strength of one mixture together, for
 * x = ln[H⁺] and I, and gives the exact derivatives of the solution with
 * respect to composition and constants by the implicit-function theorem.
 *
 * The Newton step is taken on the logarithm of the ratio of both sides of the
 * balance, which is nearly straight from one end of a titration to the other.
 */
export class Equilibrium {
  readonly balance: ChargeBalance;
  /** ln of [H⁺] in mol/L at the solution. */
  logHydrogen = 0;
  /** Ionic strength at the solution, mol/L. */
  ionicStrength = 0;
  /** Newton steps and bracketed searches since the instance was made, for the benchmark. */
  newtonSteps = 0;
  searches = 0;
  /** d(readout)/d(composition), L/mol; order as in the composition. Written by `differentiate`. */
  readonly byComposition: Float64Array;
  /** d(readout)/d(ln Ka), flat over systems and groups. Written by `differentiate`. */
  readonly byLogKa: Float64Array;
  /** d(readout)/d(ln Kw). Written by `differentiate`. */
  byLogKw = 0;

  /** @param coefficientA Debye–Hückel A in (L/mol)^½, or 0 where constants are those of the medium. */
  constructor(shapes: readonly ProtonSystemShape[], coefficientA: number) {
    this.balance = new ChargeBalance(shapes, coefficientA);
    this.byComposition = new Float64Array(firstSystem + shapes.length);
    this.byLogKa = new Float64Array(shapes.reduce((sum, shape) => sum + shape.groups, 0));
  }

  /**
   * Finds ln[H⁺] and I of a mixture; false when there is no solution.
   *
   * @param composition mol/L in the mixture: cations, anions, then every system
   * @param guessLogHydrogen ln[H⁺] to start from
   * @param guessIonicStrength mol/L to start from
   */
  solve(composition: Float64Array, guessLogHydrogen: number, guessIonicStrength: number): boolean {
    const balance = this.balance;
    let x = guessLogHydrogen;
    let ionic = Math.max(guessIonicStrength, smallestIonicStrength);
    let previous = Number.POSITIVE_INFINITY;
    for (let iteration = 0; iteration < joinedIterations; iteration++) {
      balance.evaluate(composition, x, ionic);
      this.newtonSteps++;
      if (!(balance.gained > 0 && balance.given > 0)) break;
      const determinant = this.ionicDeterminant();
      const coupling =
        (balance.chargeByL * balance.daviesSlope) / (Math.sqrt(balance.gained * balance.given) * determinant);
      const slope = balance.gainedByX / balance.gained - balance.givenByX / balance.given;
      const ionicMiss = balance.ionic - ionic;
      let step =
        -(Math.log(balance.gained / balance.given) + coupling * ionicMiss) / (slope + coupling * balance.ionicByX);
      if (!Number.isFinite(step)) break;
      if (step > largestStep) step = largestStep;
      else if (step < -largestStep) step = -largestStep;
      x += step;
      let size = Math.abs(step);
      if (balance.davies) {
        const before = ionic;
        const next = ionic + (ionicMiss + balance.ionicByX * step) / determinant;
        ionic = Math.max(next, 0.1 * before);
        size = Math.max(size, Math.abs(ionic - before) / ionic);
      } else ionic = balance.ionic;
      // Quadratic convergence: the next step would be about size · (size / previous)².
      const settled = previous < quadraticRange && size * (size / previous) ** 2 < errorTolerance;
      if (size < stepTolerance || settled || (size < roundingStep && size >= previous)) {
        this.logHydrogen = x;
        this.ionicStrength = ionic;
        return true;
      }
      previous = size;
    }
    return this.search(composition);
  }

  /** −log₁₀ of the activity of H⁺ at the solution; p[H⁺] where there is no activity model. */
  get negativeLogActivity(): number {
    const activityTerm = this.balance.davies ? this.balance.lnA * daviesFunction(this.ionicStrength) : 0;
    return (activityTerm - this.logHydrogen) / Math.LN10;
  }

  /**
   * Writes the derivatives of a readout whose own partial derivatives are
   * d(readout)/dx = `byX` and d(readout)/dI = `byIonicStrength`, for the
   * mixture solved last. Explicit dependence of the readout on Kw is the
   * caller's to add.
   */
  differentiate(composition: Float64Array, byX: number, byIonicStrength: number): void {
    const balance = this.balance;
    const { shapes, weights, inverseSum, meanLost, meanSquaredCharge } = balance;
    const determinant = 1 - balance.ionicByL * balance.daviesSlope;
    const coupling = (balance.chargeByL * balance.daviesSlope) / determinant;
    const slope = balance.gainedByX - balance.givenByX + coupling * balance.ionicByX;
    // d(readout) = perCharge · d(charge) + perIonic · d(ionic strength of the forms), both at fixed x and I.
    const perCharge = -(byX + (byIonicStrength * balance.ionicByX) / determinant) / slope;
    const perIonic = perCharge * coupling + byIonicStrength / determinant;

    this.byComposition[cationsIndex] = perCharge + 0.5 * perIonic;
    this.byComposition[anionsIndex] = 0.5 * perIonic - perCharge;
    this.byLogKw = balance.hydroxide * (0.5 * perIonic - perCharge);
    for (let s = 0, group = 0, form = 0; s < shapes.length; s++) {
      const { groups, chargeFullyProtonated: z0 } = shapes[s];
      const inverse = inverseSum[s];
      const lost = meanLost[s];
      const squared = meanSquaredCharge[s];
      const concentration = composition[firstSystem + s];
      this.byComposition[firstSystem + s] = perCharge * (z0 - lost) + 0.5 * perIonic * squared;
      // Raising Ka of group j raises the weights of all forms from j on.
      let tail = 0;
      let tailLost = 0;
      let tailSquared = 0;
      for (let k = groups; k >= 1; k--) {
        const fraction = weights[form + k] * inverse;
        tail += fraction;
        tailLost += k * fraction;
        tailSquared += (z0 - k) * (z0 - k) * fraction;
        this.byLogKa[group + k - 1] =
          concentration * (perCharge * (lost * tail - tailLost) + 0.5 * perIonic * (tailSquared - squared * tail));
      }
      group += groups;
      form += groups + 1;
    }
  }

  /** Bracketed search, for the rare mixture from which Newton leaps away. */
  private search(composition: Float64Array): boolean {
    this.searches++;
    let low: number = searchRange.lowest;
    let high: number = searchRange.highest;
    if (!(this.chargeAt(composition, low) < 0 && this.chargeAt(composition, high) > 0)) return false;
    for (let i = 0; i < searchHalvings; i++) {
      const middle = 0.5 * (low + high);
      if (this.chargeAt(composition, middle) > 0) high = middle;
      else low = middle;
    }
    this.logHydrogen = 0.5 * (low + high);
    this.chargeAt(composition, this.logHydrogen);
    return Number.isFinite(this.ionicStrength);
  }

  /**
   * 1 − d(ionic strength of the forms)/dI at fixed x, for the Newton step in I.
   * Where the forms respond so strongly that this nears zero, the plain
   * iteration I ← ionic strength of the forms is safer: 1.
   */
  private ionicDeterminant(): number {
    const determinant = 1 - this.balance.ionicByL * this.balance.daviesSlope;
    return determinant > smallestDeterminant ? determinant : 1;
  }

  /** Net charge at x, mol/L, with the ionic strength that belongs to it. */
  private chargeAt(composition: Float64Array, x: number): number {
    const balance = this.balance;
    let ionic = searchIonicStrength;
    for (let i = 0; i < searchHalvings; i++) {
      balance.evaluate(composition, x, ionic);
      const next = Math.max(0.1 * ionic, ionic + (balance.ionic - ionic) / this.ionicDeterminant());
      const done = !balance.davies || Math.abs(next - ionic) <= 1e-14 * next;
      ionic = next;
      if (done) break;
    }
    this.ionicStrength = ionic;
    return balance.gained - balance.given;
  }
}
