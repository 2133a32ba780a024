import { daviesDerivative, daviesFunction } from './davies.ts';
import { anionsIndex, cationsIndex, firstSystem } from './mixture.ts';
import type { ProtonSystemShape } from './protonSystem.ts';

/**
 * Charge balance and ionic strength of a mixture at given x = ln[H⁺] and I,
 * with all partial derivatives.
 *
 * Each system is counted from the form that prevails, so that the balance
 * reads "protons taken up beyond those forms = protons given off": the large
 * terms that cancel at equivalence are never subtracted from each other.
 *
 * L stands for −ln γ of an ion of charge one; γ of charge z is then e^(−z² L)
 * (Davies), and every concentration constant is its thermodynamic value times
 * a whole power of e^(2L).
 *
 * One instance serves all points of a run; nothing is allocated per point.
 */
export class ChargeBalance {
  readonly shapes: readonly ProtonSystemShape[];
  /** Whether activity coefficients follow Davies; if not, L is 0. */
  readonly davies: boolean;
  /** A ln 10, in (L/mol)^½. */
  readonly lnA: number;
  /** Unnormalised weights of the forms, flat over systems; form 0 of each weighs 1. */
  readonly weights: Float64Array;
  /** Per system: 1 / sum of weights, mean number of protons lost, mean squared charge. */
  readonly inverseSum: Float64Array;
  readonly meanLost: Float64Array;
  readonly meanSquaredCharge: Float64Array;

  /** [H⁺] and [OH⁻], mol/L. */
  hydrogen = 0;
  hydroxide = 0;
  /** Both sides of the balance, mol/L, and their derivatives with respect to x at fixed I. */
  gained = 0;
  given = 0;
  gainedByX = 0;
  givenByX = 0;
  /** d(gained − given)/dL. */
  chargeByL = 0;
  /** Ionic strength that the forms add up to, mol/L, with derivatives with respect to x and L. */
  ionic = 0;
  ionicByX = 0;
  ionicByL = 0;
  /** dL/dI, L/mol. */
  daviesSlope = 0;

  private readonly acidityConstants: Float64Array;
  private waterConstant = 1e-14;
  private readonly powers: Float64Array;
  private readonly lowestPower: number;
  private readonly highestPower: number;

  /** @param coefficientA Debye–Hückel A in (L/mol)^½, or 0 where constants are those of the medium. */
  constructor(shapes: readonly ProtonSystemShape[], coefficientA: number) {
    this.shapes = shapes;
    this.davies = coefficientA > 0;
    this.lnA = coefficientA * Math.LN10;
    const groupCount = shapes.reduce((sum, shape) => sum + shape.groups, 0);
    this.acidityConstants = new Float64Array(groupCount);
    this.weights = new Float64Array(groupCount + shapes.length);
    this.inverseSum = new Float64Array(shapes.length);
    this.meanLost = new Float64Array(shapes.length);
    this.meanSquaredCharge = new Float64Array(shapes.length);
    this.lowestPower = Math.min(0, ...shapes.map((shape) => 1 - shape.chargeFullyProtonated));
    this.highestPower = Math.max(1, ...shapes.map((shape) => shape.groups - shape.chargeFullyProtonated));
    this.powers = new Float64Array(this.highestPower - this.lowestPower + 1).fill(1);
  }

  /** @param pKa constants flat over systems and groups; thermodynamic with Davies. */
  setConstants(pKa: ArrayLike<number>, pKw: number): void {
    for (let i = 0; i < this.acidityConstants.length; i++) this.acidityConstants[i] = Math.exp(-pKa[i] * Math.LN10);
    this.waterConstant = Math.exp(-pKw * Math.LN10);
  }

  /**
   * Evaluates everything at (x, I).
   *
   * @param composition mol/L in the mixture: cations, anions, then every system
   */
  evaluate(composition: Float64Array, x: number, ionicStrength: number): void {
    const hydrogen = Math.exp(x);
    const inverseHydrogen = 1 / hydrogen;
    let hydroxide = this.waterConstant * inverseHydrogen;
    const davies = this.davies;
    const powers = this.powers;
    const lowestPower = this.lowestPower;
    if (davies) {
      // L = −ln γ of a single charge; every constant scales with a whole power of e^(2L).
      const scale = Math.exp(2 * this.lnA * daviesFunction(ionicStrength));
      this.daviesSlope = this.lnA * daviesDerivative(ionicStrength);
      hydroxide *= scale;
      const inverseScale = 1 / scale;
      for (let power = 1, value = scale; power <= this.highestPower; power++, value *= scale)
        powers[power - lowestPower] = value;
      for (let power = -1, value = inverseScale; power >= lowestPower; power--, value *= inverseScale)
        powers[power - lowestPower] = value;
    }
    const cations = composition[cationsIndex];
    const anions = composition[anionsIndex];
    let excess = cations - anions;
    let gained = hydrogen;
    let given = hydroxide;
    let gainedByX = hydrogen;
    let givenByX = -hydroxide;
    let chargeByL = -2 * hydroxide;
    let ions = cations + anions + hydrogen + hydroxide;
    let ionsByX = hydrogen - hydroxide;
    let ionsByL = 2 * hydroxide;

    const weights = this.weights;
    for (let s = 0, group = 0, form = 0; s < this.shapes.length; s++) {
      const { groups, chargeFullyProtonated: z0 } = this.shapes[s];
      let weight = 1;
      let sum = 1;
      let sumLost = 0;
      let sumLostSquared = 0;
      let sumE = 0;
      let sumLostE = 0;
      let sumESquared = 0;
      weights[form] = 1;
      for (let k = 1; k <= groups; k++) {
        weight *= this.acidityConstants[group + k - 1] * inverseHydrogen * powers[k - z0 - lowestPower];
        weights[form + k] = weight;
        sum += weight;
        sumLost += k * weight;
        sumLostSquared += k * k * weight;
        if (davies) {
          // E_k: exponent of e^L in the weight of form k.
          const e = k * (k + 1 - 2 * z0);
          sumE += e * weight;
          sumLostE += k * e * weight;
          sumESquared += e * e * weight;
        }
      }
      const inverse = 1 / sum;
      const meanLost = sumLost * inverse;
      const variance = sumLostSquared * inverse - meanLost * meanLost;
      const concentration = composition[firstSystem + s];
      this.inverseSum[s] = inverse;
      this.meanLost[s] = meanLost;

      // Constants far off any scale overflow the weights: the balance is no number then, and must not become a loop.
      const overflows = !(meanLost <= groups);
      if (overflows) gained = Number.NaN;
      const reference = overflows ? 0 : Math.round(meanLost);
      excess += concentration * (z0 - reference);
      let taken = 0;
      let takenByX = 0;
      for (let k = 0; k < reference; k++) {
        const part = (reference - k) * weights[form + k];
        taken += part;
        takenByX += part * (meanLost - k);
      }
      let lost = 0;
      let lostByX = 0;
      for (let k = reference + 1; k <= groups; k++) {
        const part = (k - reference) * weights[form + k];
        lost += part;
        lostByX += part * (meanLost - k);
      }
      const scaled = concentration * inverse;
      gained += scaled * taken;
      gainedByX += scaled * takenByX;
      given += scaled * lost;
      givenByX += scaled * lostByX;

      if (davies) {
        const meanE = sumE * inverse;
        const covariance = sumLostE * inverse - meanLost * meanE;
        const squaredCharge = meanE + z0 * z0 - meanLost;
        this.meanSquaredCharge[s] = squaredCharge;
        chargeByL -= concentration * covariance;
        ions += concentration * squaredCharge;
        ionsByX += concentration * (variance - covariance);
        ionsByL += concentration * (sumESquared * inverse - meanE * meanE - covariance);
      } else {
        let squaredCharge = z0 * z0;
        for (let k = 1; k <= groups; k++) squaredCharge += weights[form + k] * inverse * k * (k - 2 * z0);
        this.meanSquaredCharge[s] = squaredCharge;
        ions += concentration * squaredCharge;
      }
      group += groups;
      form += groups + 1;
    }
    if (excess > 0) gained += excess;
    else given -= excess;

    this.hydrogen = hydrogen;
    this.hydroxide = hydroxide;
    this.gained = gained;
    this.given = given;
    this.gainedByX = gainedByX;
    this.givenByX = givenByX;
    this.chargeByL = chargeByL;
    this.ionic = 0.5 * ions;
    this.ionicByX = davies ? 0.5 * ionsByX : 0;
    this.ionicByL = davies ? 0.5 * ionsByL : 0;
  }
}
