import type { Decimal } from './decimal.js';
import { Rational } from './rational.js';

/** The independent dimensions a unit is made of, in the order of the exponents of a {@link Dimension}. */
export const BASE_DIMENSIONS = ['length', 'mass', 'time', 'amount', 'temperature', 'money'] as const;

/** Exponents over {@link BASE_DIMENSIONS}. */
export type Dimension = readonly number[];

/**
 * A unit of measure: a dimension and an exact scale to the coherent unit of that dimension
 * (metre, kilogram, second, mole, kelvin, one unit of money).
 */
export class Unit {
  constructor(
    /** As printed beside a figure, e.g. `mol/L`; empty for a pure number. */
    readonly symbol: string,
    readonly dimension: Dimension,
    /** One of this unit, in coherent units. */
    readonly scale: Rational,
    /** Where this unit's zero lies, in coherent units: only for °C and °F as typed. */
    readonly zero: Rational = Rational.zero,
  ) {}

  times(other: Unit, symbol = `${this.symbol}·${other.symbol}`): Unit {
    return new Unit(symbol, this.dimension.map((e, i) => e + (other.dimension[i] ?? 0)), this.scale.times(other.scale));
  }

  per(other: Unit, symbol = `${this.symbol}/${other.symbol}`): Unit {
    return new Unit(symbol, this.dimension.map((e, i) => e - (other.dimension[i] ?? 0)), this.scale.per(other.scale));
  }

  power(exponent: number, symbol = `${this.symbol}^${exponent}`): Unit {
    return new Unit(symbol, this.dimension.map((e) => e * exponent), this.scale.power(exponent));
  }

  /** The same dimension with a scale `factor` times as large, e.g. kilogram to tonne by `1000`. */
  scaled(factor: string, symbol: string): Unit {
    return new Unit(symbol, this.dimension, this.scale.times(Rational.of(factor)));
  }

  sameDimension(other: Unit): boolean {
    return this.dimension.every((e, i) => e === other.dimension[i]);
  }

  get isPure(): boolean {
    return this.dimension.every((e) => e === 0);
  }

  /** How many of `to` make one of this unit, exactly. */
  ratioTo(to: Unit): Rational {
    return this.scale.per(to.scale);
  }

  /**
   * A figure in this unit expressed in `to`, its zero point counted (20 °C is 68 °F).
   *
   * @throws RangeError for units of different dimensions
   */
  convert(figure: Decimal, to: Unit): Decimal {
    if (this === to) return figure;
    if (!this.sameDimension(to)) throw new RangeError(`${this.symbol} cannot become ${to.symbol}`);
    const ratio = this.ratioTo(to);
    const shift = this.zero.minus(to.zero).per(to.scale);
    if (shift.over === 0n) return ratio.scale(figure);
    // over one common denominator, with one division at the end: 68 °F is exactly 20 °C
    const under = ratio.under * shift.under;
    return figure
      .times((ratio.over * shift.under).toString())
      .plus((shift.over * ratio.under).toString())
      .div(under.toString());
  }
}
