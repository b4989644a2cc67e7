import type { Expression, NodeOf } from './expression.js';
import type { Rational } from './rational.js';
import { Unit } from './unit.js';
import { one } from './units.js';

/** Unit of a named quantity; undefined for an unknown name, which the sheet reports itself. */
export type UnitOf = (key: string) => Unit | undefined;

/** A formula whose units do not balance, with the place where it shows. */
export class UnitFault extends Error {}

/**
 * The unit a formula comes out in, proven from the units of its parts: sums and comparisons need
 * the same dimension **and** scale, functions a pure number of scale one.
 *
 * @throws UnitFault where they do not.
 */
export function balancedUnit(expression: Expression, unitOf: UnitOf): Unit {
  const { node } = expression;
  const unit = (part: Expression): Unit => balancedUnit(part, unitOf);
  switch (node.op) {
    case 'constant':
      return node.constant.unit;
    case 'named':
      return unitOf(node.key) ?? one;
    case 'product':
      return unit(node.left).times(unit(node.right));
    case 'quotient':
      return unit(node.left).per(unit(node.right));
    case 'sum':
    case 'difference':
    case 'least':
    case 'greatest':
      return same(unit(node.left), unit(node.right), node.op);
    case 'exponential':
    case 'logarithm':
    case 'rounded':
      same(unit(node.of), one, node.op);
      return one;
    case 'choice':
      return Object.values(node.cases).map(unit).reduce((a, b) => same(a, b, `choice by ${node.by}`));
    case 'median':
      return node.all.map(unit).reduce((a, b) => same(a, b, 'median'));
    case 'threshold':
      same(unit(node.left), unit(node.right), 'threshold');
      return same(unit(node.below), unit(node.otherwise), 'threshold');
    case 'converted': {
      const from = unit(node.of);
      if (!from.sameDimension(node.unit)) throw new UnitFault(`${from.symbol || 'a pure number'} cannot become ${node.unit.symbol || 'a pure number'}`);
      if (!from.zero.equals(node.unit.zero)) throw new UnitFault(`${from.symbol} and ${node.unit.symbol} have different zeros`);
      return node.unit;
    }
    case 'power':
      return powerUnit(node, unit);
  }
}

function powerUnit(node: NodeOf<'power'>, unit: (part: Expression) => Unit): Unit {
  same(unit(node.exponent), one, 'exponent');
  const base = unit(node.base);
  if (base.isPure) return same(base, one, 'power');
  const exponent = node.exponent.node;
  const by = exponent.op === 'constant' ? exponent.constant.value.toNumber() : NaN;
  if (Number.isInteger(by)) return base.power(by);
  if (by === 0.5 && base.dimension.every((e) => e % 2 === 0)) {
    const half = new Unit(`√(${base.symbol})`, base.dimension.map((e) => e / 2), base.scale);
    if (half.power(2).scale.equals(base.scale)) return half; // scale one
  }
  throw new UnitFault(`${base.symbol} cannot be raised to this power`);
}

function same(a: Unit, b: Unit, where: string): Unit {
  if (!a.sameDimension(b)) throw new UnitFault(`${where}: ${a.symbol || 'a pure number'} against ${b.symbol || 'a pure number'}`);
  if (!a.scale.equals(b.scale)) throw new UnitFault(`${where}: ${a.symbol} is ${a.ratioTo(b)} ${b.symbol || '(pure)'}`);
  return a;
}

/** The exact factor by which a conversion multiplies. */
export function conversionFactor(node: NodeOf<'converted'>, unitOf: UnitOf): Rational {
  return balancedUnit(node.of, unitOf).ratioTo(node.unit);
}

/** Throws a {@link UnitFault} unless the formula comes out in exactly `stated`. */
export function proveUnit(expression: Expression, stated: Unit, unitOf: UnitOf): void {
  same(balancedUnit(expression, unitOf), stated, 'result');
}
