import { conversionFactor } from './balance.js';
import type { BinaryOp, Expression, NodeOf } from './expression.js';
import { middlePlaces } from './median.js';
import type { Findings, Plan } from './plan.js';
import { isKnown } from './reading.js';
import type { Sheet } from './sheet.js';
import { NotKnown, branch } from './trace.js';

/** Formulas compiled for a long series of draws, in doubles: fifteen digits, a thousand times as fast as decimals. */
export interface Doubles {
  /** Keys of all quantities that the wanted ones rest on, themselves among them. */
  readonly rests: ReadonlySet<string>;
  /**
   * Computes the wanted quantities once.
   *
   * @param errors what is added to the value of each disturbed quantity, in its unit and in their order
   * @param out takes the values of the wanted quantities, in their units and in their order; no finite number where a draw has no value
   */
  draw(errors: Float64Array, out: Float64Array): void;
}

/**
 * Compiles the wanted quantities, with an error to be added to the value of each disturbed one. Choices
 * stay at the option taken in the findings; thresholds, least, greatest and medians are decided anew in
 * every draw. A threshold's branch that rests on what is not known is not taken. Limits do not refuse.
 *
 * @throws NotKnown where a wanted quantity is not known
 */
export function doublesOf(plan: Plan, findings: Findings, wanted: readonly string[], disturbed: readonly string[]): Doubles {
  const compiler = new Compiler(plan.sheet, findings, disturbed);
  const results = wanted.map((key) => compiler.quantity(key));
  const { values, errors, steps, rests } = compiler;
  return {
    rests,
    draw(given, out) {
      errors.set(given);
      for (let at = 0; at < steps.length; at++) values[at] = steps[at]!();
      for (let at = 0; at < results.length; at++) out[at] = now(results[at]!);
    },
  };
}

/** A figure that no error moves, or how to compute it in a draw. */
type Step = number | (() => number);

const now = (step: Step): number => (typeof step === 'number' ? step : step());
const anew = (step: Step): (() => number) => (typeof step === 'number' ? () => step : step);

class Compiler {
  readonly rests = new Set<string>();
  readonly errors: Float64Array;
  /** Quantities that move, each after those it rests on; their values in the draw at hand. */
  readonly steps: (() => number)[] = [];
  readonly values: number[] = [];
  readonly #known = new Map<string, Step>();
  readonly #place: ReadonlyMap<string, number>;

  constructor(
    private readonly sheet: Sheet,
    private readonly findings: Findings,
    disturbed: readonly string[],
  ) {
    this.errors = new Float64Array(disturbed.length);
    this.#place = new Map(disturbed.map((key, at) => [key, at]));
  }

  quantity(key: string): Step {
    const known = this.#known.get(key);
    if (known !== undefined) return known;
    const outcome = this.findings.outcome(key);
    if (!isKnown(outcome)) throw new NotKnown(key);
    const { is } = this.sheet.quantity(key);
    const fixed = outcome.toNumber();
    const step = this.disturbed(key, is ? this.step(is) : fixed);
    const kept = typeof step === 'number' ? fixed : this.kept(step);
    this.rests.add(key);
    this.#known.set(key, kept);
    return kept;
  }

  private disturbed(key: string, step: Step): Step {
    const at = this.#place.get(key);
    if (at === undefined) return step;
    const { errors } = this;
    return typeof step === 'number' ? () => step + errors[at]! : () => step() + errors[at]!;
  }

  private kept(step: () => number): () => number {
    const { values } = this;
    const at = this.steps.push(step) - 1;
    values[at] = 0;
    return () => values[at]!;
  }

  private step(expression: Expression): Step {
    const { node } = expression;
    switch (node.op) {
      case 'constant':
        return node.constant.value.toNumber();
      case 'named':
        return this.quantity(node.key);
      case 'choice':
        return this.step(branch(node, this.sheet, this.findings));
      case 'threshold':
        return this.threshold(node);
      case 'median':
        return this.median(node.all.map((part) => this.step(part)));
      case 'converted': {
        const { over, under } = conversionFactor(node, this.sheet.unitOf);
        const factor = Number(over) / Number(under);
        return alone(this.step(node.of), (value) => value * factor);
      }
      case 'exponential':
        return alone(this.step(node.of), Math.exp);
      case 'rounded':
        return alone(this.step(node.of), (value) => Math.sign(value) * Math.round(Math.abs(value)));
      case 'logarithm':
        return alone(this.step(node.of), Math.log);
      case 'power':
        return both(this.step(node.base), this.step(node.exponent), Math.pow);
      default:
        return binary(node.op, this.step(node.left), this.step(node.right));
    }
  }

  private threshold(node: NodeOf<'threshold'>): Step {
    const left = this.step(node.left);
    const right = this.step(node.right);
    const taken = branch(node, this.sheet, this.findings);
    if (typeof left === 'number' && typeof right === 'number') return this.step(taken);
    const [a, b] = [anew(left), anew(right)];
    const below = anew(this.branchOr(node.below, taken));
    const otherwise = anew(this.branchOr(node.otherwise, taken));
    return () => (a() < b() ? below() : otherwise());
  }

  private branchOr(part: Expression, taken: Expression): Step {
    try {
      return this.step(part);
    } catch (unknown) {
      if (!(unknown instanceof NotKnown) || part === taken) throw unknown;
      return this.step(taken);
    }
  }

  private median(all: readonly Step[]): Step {
    const parts = all.map(anew);
    const sorted = new Float64Array(parts.length);
    const middle = middlePlaces(parts.length);
    const [first, last] = [middle[0]!, middle.at(-1)!];
    const draw = (): number => {
      for (let at = 0; at < parts.length; at++) sorted[at] = parts[at]!();
      sorted.sort();
      return (sorted[first]! + sorted[last]!) / 2;
    };
    return all.every((step) => typeof step === 'number') ? draw() : draw;
  }
}

function alone(of: Step, change: (value: number) => number): Step {
  return typeof of === 'number' ? change(of) : () => change(of());
}

function both(left: Step, right: Step, combine: (a: number, b: number) => number): Step {
  if (typeof left === 'number') return typeof right === 'number' ? combine(left, right) : () => combine(left, right());
  return typeof right === 'number' ? () => combine(left(), right) : () => combine(left(), right());
}

function binary(op: BinaryOp, left: Step, right: Step): Step {
  const step = operation(op, anew(left), anew(right));
  return typeof left === 'number' && typeof right === 'number' ? step() : step;
}

function operation(op: BinaryOp, a: () => number, b: () => number): () => number {
  switch (op) {
    case 'sum':
      return () => a() + b();
    case 'difference':
      return () => a() - b();
    case 'product':
      return () => a() * b();
    case 'quotient':
      return () => a() / b();
    case 'least':
      return () => Math.min(a(), b());
    case 'greatest':
      return () => Math.max(a(), b());
  }
}
