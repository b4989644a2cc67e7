import type { Decimal } from './decimal.js';
import { decimal } from './decimal.js';
import type { Source } from './source.js';
import type { Unit } from './unit.js';
import { one } from './units.js';

/** A fixed figure in a formula, such as a molar mass or a method's factor. */
export interface Constant {
  readonly value: Decimal;
  /** The digits as the source prints them. */
  readonly text: string;
  readonly unit: Unit;
  /** Shown instead of the figure in the general formula, e.g. `M_KOH`. */
  readonly symbol?: string | undefined;
  readonly source?: Source | undefined;
}

/** What an {@link Expression} is made of. The interpreters switch on `op`. */
export type Node =
  | { readonly op: 'constant'; readonly constant: Constant }
  | { readonly op: 'named'; readonly key: string }
  | { readonly op: BinaryOp; readonly left: Expression; readonly right: Expression }
  | { readonly op: 'power'; readonly base: Expression; readonly exponent: Expression }
  | { readonly op: FunctionOp; readonly of: Expression }
  | { readonly op: 'choice'; readonly by: string; readonly cases: Readonly<Record<string, Expression>> }
  | {
      readonly op: 'threshold';
      readonly left: Expression;
      readonly right: Expression;
      readonly below: Expression;
      readonly otherwise: Expression;
    }
  | { readonly op: 'median'; readonly all: readonly Expression[] }
  | { readonly op: 'converted'; readonly of: Expression; readonly unit: Unit };

/** The kind of {@link Node} with the given `op`. */
export type NodeOf<Op extends Node['op']> = Node extends infer N ? (N extends { op: Node['op'] } ? ([Op] extends [N['op']] ? N : never) : never) : never;

/** Functions of one pure number. `rounded` is to the nearest whole number, halves away from zero. */
export type FunctionOp = 'exponential' | 'logarithm' | 'rounded';

export type BinaryOp = 'sum' | 'difference' | 'product' | 'quotient' | 'least' | 'greatest';

/** An operand: an expression, or the digits of a pure number. */
export type Operand = Expression | string;

/**
 * A formula as data. It is written once, as a handbook prints it, and the interpreters of this
 * folder evaluate it, differentiate it, print it and check its units.
 */
export class Expression {
  constructor(readonly node: Node) {}

  plus(other: Operand): Expression {
    return binary('sum', this, other);
  }

  minus(other: Operand): Expression {
    return binary('difference', this, other);
  }

  times(other: Operand): Expression {
    return binary('product', this, other);
  }

  per(other: Operand): Expression {
    return binary('quotient', this, other);
  }

  /** To a pure exponent. A base with a dimension takes a whole constant exponent, or 0.5. */
  power(exponent: Operand): Expression {
    return new Expression({ op: 'power', base: this, exponent: operand(exponent) });
  }

  /**
   * The same amount in another unit of its dimension. The factor is exact and is printed as a
   * handbook prints it (`· 1000`, `/ 10`).
   */
  in(unit: Unit): Expression {
    return new Expression({ op: 'converted', of: this, unit });
  }
}

export const least = (left: Operand, right: Operand): Expression => binary('least', operand(left), right);
export const greatest = (left: Operand, right: Operand): Expression => binary('greatest', operand(left), right);
export const exponential = (of: Operand): Expression => new Expression({ op: 'exponential', of: operand(of) });
/** The natural logarithm. */
export const logarithm = (of: Operand): Expression => new Expression({ op: 'logarithm', of: operand(of) });

/** The middle one of all, or the mean of the middle two. */
export const median = (all: readonly Operand[]): Expression => new Expression({ op: 'median', all: all.map(operand) });

/** The nearest whole multiple of a step, as a scale or a meter gives it. */
export const nearest = (of: Expression, step: Expression): Expression => new Expression({ op: 'rounded', of: of.per(step) }).times(step);

/** `below` where `left < right`, else `otherwise`. */
export function whereBelow(left: Operand, right: Operand, below: Operand, otherwise: Operand): Expression {
  return new Expression({
    op: 'threshold', left: operand(left), right: operand(right), below: operand(below), otherwise: operand(otherwise),
  });
}

/** A quantity by its key, for formulas written before the quantity they name. */
export const named = (key: string): Expression => new Expression({ op: 'named', key });

/** A constant with its unit and source; `text` keeps the digits as the source prints them. */
export function constant(text: string, unit: Unit = one, about: { symbol?: string; source?: Source } = {}): Expression {
  return new Expression({
    op: 'constant',
    constant: { value: decimal(text), text, unit, symbol: about.symbol, source: about.source },
  });
}

export const operand = (value: Operand): Expression => (typeof value === 'string' ? constant(value) : value);

const binary = (op: BinaryOp, left: Expression, right: Operand): Expression =>
  new Expression({ op, left, right: operand(right) });

/** The parts of a node, in reading order. */
export function parts(node: Node): readonly Expression[] {
  switch (node.op) {
    case 'constant':
    case 'named':
      return [];
    case 'power':
      return [node.base, node.exponent];
    case 'exponential':
    case 'logarithm':
    case 'rounded':
    case 'converted':
      return [node.of];
    case 'choice':
      return Object.values(node.cases);
    case 'median':
      return node.all;
    case 'threshold':
      return [node.left, node.right, node.below, node.otherwise];
    default:
      return [node.left, node.right];
  }
}

/** Calls `visit` for the expression and every part of it. */
export function walk(expression: Expression, visit: (node: Node) => void): void {
  visit(expression.node);
  for (const part of parts(expression.node)) walk(part, visit);
}
