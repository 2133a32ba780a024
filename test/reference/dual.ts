/**
 * A number with its exact partial derivatives (forward-mode differentiation),
 * for models written down as formulas. Test equipment: clear, not fast.
 */
export class Dual {
  readonly value: number;
  readonly partials: readonly number[];

  constructor(value: number, partials: readonly number[]) {
    this.value = value;
    this.partials = partials;
  }

  /** The variables themselves: partial 1 for their own, 0 for all others. */
  static variables(values: ArrayLike<number>): Dual[] {
    const list = Array.from(values);
    return list.map(
      (value, j) =>
        new Dual(
          value,
          list.map((_, k) => (j === k ? 1 : 0)),
        ),
    );
  }

  plus(other: Dual | number): Dual {
    const right = this.lift(other);
    return this.combine(this.value + right.value, 1, right, 1);
  }

  minus(other: Dual | number): Dual {
    const right = this.lift(other);
    return this.combine(this.value - right.value, 1, right, -1);
  }

  times(other: Dual | number): Dual {
    const right = this.lift(other);
    return this.combine(this.value * right.value, right.value, right, this.value);
  }

  over(other: Dual | number): Dual {
    const right = this.lift(other);
    const quotient = this.value / right.value;
    return this.combine(quotient, 1 / right.value, right, -quotient / right.value);
  }

  /** Power of a positive base. */
  power(exponent: Dual | number): Dual {
    const right = this.lift(exponent);
    const power = this.value ** right.value;
    return this.combine(power, (right.value * power) / this.value, right, power * Math.log(this.value));
  }

  exp(): Dual {
    return this.chain(Math.exp(this.value), Math.exp(this.value));
  }

  sin(): Dual {
    return this.chain(Math.sin(this.value), Math.cos(this.value));
  }

  cos(): Dual {
    return this.chain(Math.cos(this.value), -Math.sin(this.value));
  }

  atan(): Dual {
    return this.chain(Math.atan(this.value), 1 / (1 + this.value ** 2));
  }

  private lift(other: Dual | number): Dual {
    return typeof other === 'number' ? new Dual(other, new Array(this.partials.length).fill(0)) : other;
  }

  private chain(value: number, slope: number): Dual {
    return new Dual(
      value,
      this.partials.map((partial) => slope * partial),
    );
  }

  private combine(value: number, ownSlope: number, other: Dual, otherSlope: number): Dual {
    return new Dual(
      value,
      // A constant adds nothing, even where the slope towards it is not finite.
      this.partials.map(
        (partial, j) => ownSlope * partial + (other.partials[j] === 0 ? 0 : otherSlope * other.partials[j]),
      ),
    );
  }
}
