import type { Expression } from '../../src/formula/expression.js';
import type { Findings } from '../../src/formula/plan.js';
import { isKnown } from '../../src/formula/reading.js';
import type { Sheet } from '../../src/formula/sheet.js';
import { branch, valueOf } from '../../src/formula/trace.js';

/** How far a computed figure may be from the true one, and how near it came to a corner. */
export interface Rounding {
  readonly value: number;
  /** Bound of the error, in the figure's own unit; infinite where no bound is known. */
  readonly error: number;
  /** The smallest relative distance between two figures that were compared on the way. */
  readonly corner: number;
}

/** Above half a unit in the last of 34 digits. */
const ROUND = 1e-33;

/**
 * Running error analysis: the rounding of every step, carried on to the result. It tells how many
 * digits two ways of computing may be asked to share when a formula subtracts near-equal figures.
 */
export class RoundingOf {
  readonly #known = new Map<string, Rounding>();

  constructor(
    private readonly sheet: Sheet,
    private readonly findings: Findings,
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
        : { value: outcome.toNumber(), error: 0, corner: Infinity };
    this.#known.set(key, found);
    return found;
  }

  private of(expression: Expression): Rounding {
    const { node } = expression;
    if (node.op === 'named') return this.quantity(node.key);
    if (node.op === 'choice') return this.of(branch(node, this.sheet, this.findings));
    const value = valueOf(expression, this.sheet, this.findings).toNumber();
    const round = ROUND * Math.abs(value);
    const made = (error: number, ...from: readonly Rounding[]): Rounding => ({
      value,
      // below the range of this analysis nothing is known
      error: Math.abs(value) < 1e-150 || Math.abs(value) > 1e150 || Number.isNaN(error) ? (value === 0 && error < 1e-150 ? error : Infinity) : error + round,
      corner: Math.min(...from.map(({ corner }) => corner)),
    });
    switch (node.op) {
      case 'constant':
        return { value, error: 0, corner: Infinity };
      case 'exponential': {
        const of = this.of(node.of);
        return made(Math.abs(value) * of.error, of);
      }
      case 'logarithm': {
        const of = this.of(node.of);
        return made(of.error / (of.value - of.error), of);
      }
      case 'converted': {
        const of = this.of(node.of);
        return made(Math.abs(of.value === 0 ? 0 : value / of.value) * of.error + round, of);
      }
      case 'power': {
        const base = this.of(node.base);
        const exponent = this.of(node.exponent);
        if (base.value === 0) return made(base.error === 0 ? 0 : Infinity, base, exponent);
        const relative = base.error / Math.abs(base.value);
        const spread = 2 * Math.abs(exponent.value) * relative + Math.abs(Math.log(Math.abs(base.value))) * exponent.error;
        return made(relative > 0.1 ? Infinity : Math.abs(value) * spread + 3 * round, base, exponent);
      }
      case 'threshold': {
        const left = this.of(node.left);
        const right = this.of(node.right);
        const taken = this.of(branch(node, this.sheet, this.findings));
        const corner = apart(left, right);
        // rounding could decide which branch is taken
        const tied = left.error + right.error > 0 && corner < 1e-20;
        return { value, error: tied ? Infinity : taken.error, corner: Math.min(corner, left.corner, right.corner, taken.corner) };
      }
    }
    const left = this.of(node.left);
    const right = this.of(node.right);
    switch (node.op) {
      case 'sum':
      case 'difference':
        return made(left.error + right.error, left, right);
      case 'product':
        return made(Math.abs(left.value) * right.error + Math.abs(right.value) * left.error + left.error * right.error, left, right);
      case 'quotient': {
        const under = Math.abs(right.value) - right.error;
        return made(under > 0 ? (left.error + Math.abs(value) * right.error) / under : Infinity, left, right);
      }
      case 'least':
      case 'greatest':
        return { value, error: Math.max(left.error, right.error), corner: Math.min(apart(left, right), left.corner, right.corner) };
    }
  }
}

const apart = (left: Rounding, right: Rounding): number => {
  const size = Math.max(Math.abs(left.value), Math.abs(right.value));
  return size === 0 ? 0 : Math.abs(left.value - right.value) / size;
};
