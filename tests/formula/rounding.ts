import { conversionFactor } from '../../src/formula/balance.js';
import type { BinaryOp, Expression } from '../../src/formula/expression.js';
import type { Findings } from '../../src/formula/plan.js';
import { isKnown } from '../../src/formula/reading.js';
import type { Sheet } from '../../src/formula/sheet.js';
import { branch } from '../../src/formula/trace.js';

/** How far a computed figure may be from the true one, and how near it came to a corner. */
export interface Rounding {
  readonly value: number;
  /** Bound of the error, in the figure's own unit; infinite where no bound is known. */
  readonly error: number;
  /** The smallest relative distance between two figures that were compared on the way. */
  readonly corner: number;
}

/** Above half a unit in the last of 34 digits. */
export const ROUND = 1e-33;

/**
 * Running error analysis: the rounding of every step, carried on to the result. It tells how many
 * digits two ways of computing may be asked to share when a formula subtracts near-equal figures.
 */
export class RoundingOf {
  readonly #known = new Map<string, Rounding>();

  constructor(
    private readonly sheet: Sheet,
    private readonly findings: Findings,
    /** Units of its last digit by which a figure given may be off already. */
    private readonly given = 0,
  ) {}

  quantity(key: string): Rounding {
    const known = this.#known.get(key);
    if (known) return known;
    const outcome = this.findings.outcome(key);
    const { is } = this.sheet.quantity(key);
    const found = !isKnown(outcome)
      ? { value: NaN, error: Infinity, corner: 0 }
      : is
        ? this.of(is)
        : this.leaf(outcome.toNumber());
    this.#known.set(key, found);
    return found;
  }

  private leaf(value: number): Rounding {
    return { value, error: this.given * ROUND * Math.abs(value), corner: Infinity };
  }

  private of(expression: Expression): Rounding {
    const { node } = expression;
    switch (node.op) {
      case 'named':
        return this.quantity(node.key);
      case 'constant':
        return this.leaf(node.constant.value.toNumber());
      case 'choice':
        return this.of(branch(node, this.sheet, this.findings));
      case 'threshold': {
        const left = this.of(node.left);
        const right = this.of(node.right);
        const taken = this.of(branch(node, this.sheet, this.findings));
        const corner = apart(left, right);
        // rounding could decide which branch is taken
        const tied = left.error + right.error > 0 && corner < 1e-12;
        return { ...taken, error: tied ? Infinity : taken.error, corner: Math.min(corner, left.corner, right.corner, taken.corner) };
      }
      case 'median': {
        const all = node.all.map((part) => this.of(part)).sort((a, b) => a.value - b.value);
        const middle = all.slice(Math.ceil(all.length / 2) - 1, Math.floor(all.length / 2) + 1);
        const near = all.slice(1).map((part, i) => apart(all[i]!, part));
        const mean = middle.reduce((sum, part) => added(sum.value + part.value, sum, part));
        // a figure beside the middle could take its place by its own rounding
        const close = all.filter((part) => part.error === Infinity || middle.some((one) => apart(one, part) < 1e-12));
        const error = Math.max(...close.map((part) => part.error)) + mean.error / middle.length;
        const value = mean.value / middle.length;
        return { value, error: Number.isFinite(error) ? error + ROUND * Math.abs(value) : error, corner: Math.min(...near, ...all.map(({ corner }) => corner)) };
      }
      case 'exponential': {
        const of = this.of(node.of);
        const value = Math.exp(of.value);
        return step(value, value * of.error, of);
      }
      case 'logarithm': {
        const of = this.of(node.of);
        return step(Math.log(of.value), of.error / (of.value - of.error), of);
      }
      case 'rounded': {
        const of = this.of(node.of);
        return { value: Math.round(of.value), error: Math.abs((of.value % 1) - 0.5) < 1e-6 ? Infinity : 0, corner: of.corner };
      }
      case 'converted': {
        const of = this.of(node.of);
        const { over, under } = conversionFactor(node, this.sheet.unitOf);
        const factor = Number(over) / Number(under);
        return step(of.value * factor, (of.error + ROUND * Math.abs(of.value)) * factor, of);
      }
      case 'power':
        return power(this.of(node.base), this.of(node.exponent));
      default:
        return binary(node.op, this.of(node.left), this.of(node.right));
    }
  }
}

function binary(op: BinaryOp, left: Rounding, right: Rounding): Rounding {
  switch (op) {
    case 'sum':
      return added(left.value + right.value, left, right);
    case 'difference':
      return added(left.value - right.value, left, right);
    case 'product': {
      const carried = Math.abs(left.value) * right.error + Math.abs(right.value) * left.error + left.error * right.error;
      return step(left.value * right.value, carried, left, right);
    }
    case 'quotient': {
      const value = left.value / right.value;
      const under = Math.abs(right.value) - right.error;
      return step(value, under > 0 ? (left.error + Math.abs(value) * right.error) / under : Infinity, left, right);
    }
    case 'least':
    case 'greatest': {
      const taken = (op === 'least') === left.value < right.value ? left : right;
      const near = apart(left, right);
      const error = near < 1e-12 ? Math.max(left.error, right.error) : taken.error;
      return { value: taken.value, error, corner: Math.min(near, left.corner, right.corner) };
    }
  }
}

/** Where nearly all digits cancel, these short figures no longer know what is left. */
function added(value: number, left: Rounding, right: Rounding): Rounding {
  const size = Math.max(Math.abs(left.value), Math.abs(right.value));
  return step(value, Math.abs(value) < 1e-9 * size ? Infinity : left.error + right.error, left, right);
}

function power(base: Rounding, exponent: Rounding): Rounding {
  const value = base.value ** exponent.value;
  if (base.value === 0) return step(value, base.error === 0 ? 0 : Infinity, base, exponent);
  const relative = base.error / Math.abs(base.value);
  const spread = 2 * Math.abs(exponent.value) * relative + Math.abs(Math.log(Math.abs(base.value))) * exponent.error;
  return step(value, relative > 0.1 ? Infinity : Math.abs(value) * (spread + 3 * ROUND), base, exponent);
}

/** One more step, with its own rounding; beyond the range of these short figures nothing is known. */
function step(value: number, carried: number, ...from: readonly Rounding[]): Rounding {
  const size = Math.abs(value);
  const known = Number.isFinite(carried) && (size === 0 ? carried === 0 : size > 1e-150 && size < 1e150);
  return { value, error: known ? carried + ROUND * size : Infinity, corner: Math.min(...from.map(({ corner }) => corner)) };
}

const apart = (left: Rounding, right: Rounding): number => {
  const size = Math.max(Math.abs(left.value), Math.abs(right.value));
  return size === 0 ? 0 : Math.abs(left.value - right.value) / size;
};
