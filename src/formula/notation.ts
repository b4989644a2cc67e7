import { conversionFactor } from './balance.js';
import type { BinaryOp, Constant, Expression, FunctionOp, NodeOf } from './expression.js';
import type { Rational } from './rational.js';
import type { Sheet } from './sheet.js';
import type { Unit } from './unit.js';

/** How tightly a printed part binds; a looser part inside a tighter one needs brackets. */
export const RANK = { choice: 0, sum: 1, product: 2, power: 3, atom: 4 } as const;

/** A printed part of a formula. */
export interface Printed<Out> {
  readonly out: Out;
  readonly rank: number;
}

/** What a way of writing formulas must know; {@link write} walks the formula. */
export interface Notation<Out> {
  constant(constant: Constant): Printed<Out>;
  named(key: string): Printed<Out>;
  binary(op: BinaryOp, left: Printed<Out>, right: Printed<Out>): Printed<Out>;
  power(base: Printed<Out>, exponent: Printed<Out>): Printed<Out>;
  call(name: FunctionOp, of: Printed<Out>): Printed<Out>;
  median(all: readonly Printed<Out>[]): Printed<Out>;
  /** A change of unit by an exact factor. */
  converted(of: Printed<Out>, factor: Rational, unit: Unit): Printed<Out>;
  /** Called only where {@link branch} does not settle it. */
  choice(by: string, cases: readonly (readonly [option: string, Printed<Out>])[]): Printed<Out>;
  threshold(left: Printed<Out>, right: Printed<Out>, below: Printed<Out>, otherwise: Printed<Out>): Printed<Out>;
  /** The branch to write in place of the whole choice, if only one is to be written. */
  branch(node: NodeOf<'choice'> | NodeOf<'threshold'>): Expression | undefined;
}

/** Writes a formula in a notation. */
export function write<Out>(expression: Expression, sheet: Sheet, notation: Notation<Out>): Printed<Out> {
  const { node } = expression;
  const printed = (part: Expression): Printed<Out> => write(part, sheet, notation);
  switch (node.op) {
    case 'constant':
      return notation.constant(node.constant);
    case 'named':
      return notation.named(node.key);
    case 'power':
      return notation.power(printed(node.base), printed(node.exponent));
    case 'exponential':
    case 'logarithm':
    case 'rounded':
      return notation.call(node.op, printed(node.of));
    case 'median':
      return notation.median(node.all.map(printed));
    case 'converted':
      return notation.converted(printed(node.of), conversionFactor(node, sheet.unitOf), node.unit);
    case 'choice': {
      const taken = notation.branch(node);
      if (taken) return printed(taken);
      return notation.choice(node.by, Object.entries(node.cases).map(([option, part]) => [option, printed(part)] as const));
    }
    case 'threshold': {
      const taken = notation.branch(node);
      if (taken) return printed(taken);
      return notation.threshold(printed(node.left), printed(node.right), printed(node.below), printed(node.otherwise));
    }
    default:
      return notation.binary(node.op, printed(node.left), printed(node.right));
  }
}

/** The written signs of an infix notation; see {@link InfixNotation}. */
export interface Signs {
  readonly plus: string;
  readonly minus: string;
  readonly times: string;
  readonly per: string;
  readonly least: string;
  readonly greatest: string;
  readonly exponential: string;
  readonly logarithm: string;
  readonly rounded: string;
  readonly median: string;
  /** Between the arguments of a function. */
  readonly separator: string;
}

/** Formulas on one line, with brackets only where the order of operations needs them. */
export abstract class InfixNotation implements Notation<string> {
  constructor(protected readonly signs: Signs) {}

  abstract constant(constant: Constant): Printed<string>;
  abstract named(key: string): Printed<string>;
  abstract choice(by: string, cases: readonly (readonly [string, Printed<string>])[]): Printed<string>;
  abstract threshold(left: Printed<string>, right: Printed<string>, below: Printed<string>, otherwise: Printed<string>): Printed<string>;
  abstract branch(node: NodeOf<'choice'> | NodeOf<'threshold'>): Expression | undefined;

  binary(op: BinaryOp, left: Printed<string>, right: Printed<string>): Printed<string> {
    const { signs } = this;
    switch (op) {
      case 'sum':
        return this.infix(left, signs.plus, right, RANK.sum, RANK.sum);
      case 'difference':
        return this.infix(left, signs.minus, right, RANK.sum, RANK.product);
      case 'product':
        return this.infix(left, signs.times, right, RANK.product, RANK.product);
      case 'quotient':
        return this.infix(left, signs.per, right, RANK.product, RANK.power);
      case 'least':
        return this.function(signs.least, left, right);
      case 'greatest':
        return this.function(signs.greatest, left, right);
    }
  }

  /** Always with brackets round a compound part: spreadsheets and people differ on `-2^2` and `2^3^2`. */
  power(base: Printed<string>, exponent: Printed<string>): Printed<string> {
    return { out: `${bracketed(base, RANK.atom)}^${bracketed(exponent, RANK.atom)}`, rank: RANK.power };
  }

  call(name: FunctionOp, of: Printed<string>): Printed<string> {
    return this.function(this.signs[name], of);
  }

  median(all: readonly Printed<string>[]): Printed<string> {
    return this.function(this.signs.median, ...all);
  }

  converted(of: Printed<string>, factor: Rational, unit: Unit): Printed<string> {
    const up = factor.over === 1n ? of : this.binary('product', of, this.factor(factor.over, unit));
    return factor.under === 1n ? up : this.binary('quotient', up, this.factor(factor.under, unit));
  }

  /** The figure of a change to `_unit`. */
  protected factor(figure: bigint, _unit: Unit): Printed<string> {
    return { out: figure.toString(), rank: RANK.atom };
  }

  protected function(name: string, ...args: readonly Printed<string>[]): Printed<string> {
    return { out: `${name}(${args.map((arg) => arg.out).join(this.signs.separator)})`, rank: RANK.atom };
  }

  private infix(left: Printed<string>, sign: string, right: Printed<string>, rank: number, rightNeeds: number): Printed<string> {
    return { out: bracketed(left, rank) + sign + bracketed(right, rightNeeds), rank };
  }
}

const bracketed = (part: Printed<string>, needed: number): string =>
  part.rank < needed ? `(${part.out})` : part.out;
