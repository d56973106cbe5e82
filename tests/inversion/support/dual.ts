/** A number with its derivatives by all parameters: forward differentiation, exact to rounding, for models written in a test. */
export class Dual {
  constructor(
    readonly value: number,
    readonly by: readonly number[],
  ) {}

  private chain(value: number, slope: number): Dual {
    return new Dual(
      value,
      this.by.map((d) => d * slope),
    );
  }

  plus(other: Dual | number): Dual {
    if (typeof other === 'number') return new Dual(this.value + other, this.by);
    return new Dual(
      this.value + other.value,
      this.by.map((d, k) => d + other.by[k]!),
    );
  }

  minus(other: Dual | number): Dual {
    return typeof other === 'number' ? this.plus(-other) : this.plus(other.times(-1));
  }

  times(other: Dual | number): Dual {
    if (typeof other === 'number') return this.chain(this.value * other, other);
    return new Dual(
      this.value * other.value,
      this.by.map((d, k) => d * other.value + this.value * other.by[k]!),
    );
  }

  inverse(): Dual {
    return this.chain(1 / this.value, -1 / this.value ** 2);
  }

  over(other: Dual | number): Dual {
    return typeof other === 'number' ? this.times(1 / other) : this.times(other.inverse());
  }

  exp(): Dual {
    return this.chain(Math.exp(this.value), Math.exp(this.value));
  }

  log(): Dual {
    return this.chain(Math.log(this.value), 1 / this.value);
  }

  power(exponent: Dual | number): Dual {
    if (typeof exponent === 'number')
      return this.chain(this.value ** exponent, exponent * this.value ** (exponent - 1));
    return this.log().times(exponent).exp();
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
}

export function variables(values: ArrayLike<number>): Dual[] {
  const size = values.length;
  return Array.from(
    { length: size },
    (_, k) =>
      new Dual(
        values[k]!,
        Array.from({ length: size }, (__, l) => (k === l ? 1 : 0)),
      ),
  );
}
