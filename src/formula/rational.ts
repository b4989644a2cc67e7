import type { Decimal } from './decimal.js';

/** An exact fraction, in lowest terms with a positive denominator. Scales of units are such fractions. */
export class Rational {
  readonly over: bigint;
  readonly under: bigint;

  private constructor(over: bigint, under: bigint) {
    if (under === 0n) throw new RangeError('a fraction over zero');
    const sign = under < 0n ? -1n : 1n;
    const common = gcd(over < 0n ? -over : over, under * sign);
    this.over = (sign * over) / common;
    this.under = (sign * under) / common;
  }

  static readonly one = new Rational(1n, 1n);
  static readonly zero = new Rational(0n, 1n);

  /** Reads `3`, `0.45359237`, `5/9` or `-1e-3`. */
  static of(text: string): Rational {
    const [over, under, ...more] = text.split('/');
    if (more.length) throw new SyntaxError(`not a fraction: ${text}`);
    const read = (part: string): Rational => {
      const match = /^(-?\d+)(?:\.(\d+))?(?:e(-?\d+))?$/.exec(part.trim());
      if (!match) throw new SyntaxError(`not a fraction: ${text}`);
      const [, whole = '0', rest = '', exponent = '0'] = match;
      const shift = Number(exponent) - rest.length;
      const digits = BigInt(whole + rest);
      return shift >= 0
        ? new Rational(digits * 10n ** BigInt(shift), 1n)
        : new Rational(digits, 10n ** BigInt(-shift));
    };
    return under === undefined ? read(over ?? '') : read(over ?? '').per(read(under));
  }

  plus(other: Rational): Rational {
    return new Rational(this.over * other.under + other.over * this.under, this.under * other.under);
  }

  minus(other: Rational): Rational {
    return new Rational(this.over * other.under - other.over * this.under, this.under * other.under);
  }

  times(other: Rational): Rational {
    return new Rational(this.over * other.over, this.under * other.under);
  }

  per(other: Rational): Rational {
    return new Rational(this.over * other.under, this.under * other.over);
  }

  power(exponent: number): Rational {
    let result = Rational.one;
    for (let i = Math.abs(exponent); i > 0; i--) result = result.times(this);
    return exponent < 0 ? Rational.one.per(result) : result;
  }

  equals(other: Rational): boolean {
    return this.over === other.over && this.under === other.under;
  }

  /** `value` times this fraction; exact but for the roundings of one product and one quotient. */
  scale(value: Decimal): Decimal {
    const product = this.over === 1n ? value : value.times(this.over.toString());
    return this.under === 1n ? product : product.div(this.under.toString());
  }

  toString(): string {
    return this.under === 1n ? `${this.over}` : `${this.over}/${this.under}`;
  }
}

function gcd(a: bigint, b: bigint): bigint {
  while (b) [a, b] = [b, a % b];
  return a || 1n;
}
