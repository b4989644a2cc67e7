import { conversionFactor } from './balance.js';
import { Decimal } from './decimal.js';
import type { Expression, NodeOf } from './expression.js';
import type { Findings } from './plan.js';
import { medianOf } from './median.js';
import { isKnown } from './reading.js';
import type { Sheet } from './sheet.js';

/** A part of a formula was asked for although what it rests on is not known. */
export class NotKnown extends Error {}

/**
 * The value of any part of a formula that has been evaluated, from the findings.
 *
 * @throws NotKnown where a quantity it names is not known, or a step of it has no value, such as a division by zero.
 */
export function valueOf(expression: Expression, sheet: Sheet, findings: Findings): Decimal {
  const value = computed(expression, sheet, findings);
  if (!value.isFinite()) throw new NotKnown(expression.node.op);
  return value;
}

function computed(expression: Expression, sheet: Sheet, findings: Findings): Decimal {
  const { node } = expression;
  const value = (part: Expression): Decimal => valueOf(part, sheet, findings);
  switch (node.op) {
    case 'constant':
      return node.constant.value;
    case 'named': {
      const outcome = findings.outcome(node.key);
      if (!isKnown(outcome)) throw new NotKnown(node.key);
      return outcome;
    }
    case 'sum':
      return value(node.left).plus(value(node.right));
    case 'difference':
      return value(node.left).minus(value(node.right));
    case 'product':
      return value(node.left).times(value(node.right));
    case 'quotient':
      return value(node.left).div(value(node.right));
    case 'least':
      return Decimal.min(value(node.left), value(node.right));
    case 'greatest':
      return Decimal.max(value(node.left), value(node.right));
    case 'median':
      return medianOf(node.all.map(value));
    case 'power':
      return value(node.base).pow(value(node.exponent));
    case 'exponential':
      return value(node.of).exp();
    case 'rounded':
      return value(node.of).toDecimalPlaces(0, Decimal.ROUND_HALF_UP);
    case 'logarithm':
      return value(node.of).ln();
    case 'converted':
      return conversionFactor(node, sheet.unitOf).scale(value(node.of));
    case 'choice':
    case 'threshold':
      return value(branch(node, sheet, findings));
  }
}

/**
 * The branch that a choice or a threshold takes with what is given.
 *
 * @throws NotKnown where that is not settled.
 */
export function branch(node: NodeOf<'choice'> | NodeOf<'threshold'>, sheet: Sheet, findings: Findings): Expression {
  if (node.op === 'threshold') {
    return valueOf(node.left, sheet, findings).lt(valueOf(node.right, sheet, findings)) ? node.below : node.otherwise;
  }
  const option = findings.option(node.by);
  const taken = typeof option === 'string' && Object.hasOwn(node.cases, option) ? node.cases[option] : undefined;
  if (!taken) throw new NotKnown(node.by);
  return taken;
}
