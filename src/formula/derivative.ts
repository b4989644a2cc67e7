import { conversionFactor } from './balance.js';
import { Decimal } from './decimal.js';
import type { BinaryOp, Expression, NodeOf } from './expression.js';
import { middlePlaces } from './median.js';
import type { Findings, Plan } from './plan.js';
import { Refused, isKnown } from './reading.js';
import type { Unknown } from './reading.js';
import type { Sheet } from './sheet.js';
import { branch, valueOf } from './trace.js';

/**
 * How much a quantity moves with each input it rests on: its partial derivatives, in its unit per
 * unit of the input, found by carrying adjoints backwards through the formulas (reverse-mode
 * automatic differentiation). At a corner (least, greatest, a threshold) it is the derivative of
 * the branch that was taken.
 *
 * @returns a figure for every input that the evaluated formulas touch, or why the quantity itself is not known;
 *   `no-slope` where the formula has a kink or a pole
 */
export function sensitivities(plan: Plan, findings: Findings, key: string): ReadonlyMap<string, Decimal> | Unknown {
  const all = slopes(plan, findings, key);
  if (!(all instanceof Map)) return all;
  return new Map([...(all as ReadonlyMap<string, Decimal>)].filter(([at]) => !plan.sheet.quantity(at).is));
}

/**
 * The same for every quantity on the way, inputs and results alike: how much `key` moves with an
 * error that is added to the value of each.
 */
export function slopes(plan: Plan, findings: Findings, key: string): ReadonlyMap<string, Decimal> | Unknown {
  const value = findings.outcome(key);
  if (!isKnown(value)) return value;
  const gradients = gradientsOf(plan, findings);
  const found = new Map<string, Decimal>([[key, ONE]]);
  for (let i = plan.order.length - 1; i >= 0; i--) {
    const at = plan.order[i]!;
    const adjoint = found.get(at);
    if (!adjoint) continue;
    for (const [named, slope] of gradients(at)) {
      const part = adjoint.times(slope);
      const sum = found.get(named);
      found.set(named, sum ? sum.plus(part) : part);
    }
  }
  const finite = [...found.values()].every((slope) => slope.isFinite());
  return finite ? found : new Refused({ code: 'no-slope', quantity: key });
}

/** How a quantity moves with those that its formula names. Worked out once for an evaluation, however many quantities are asked about. */
function gradientsOf({ sheet }: Plan, findings: Findings): (key: string) => ReadonlyMap<string, Decimal> {
  let known = GRADIENTS.get(findings);
  if (!known) GRADIENTS.set(findings, (known = new Map()));
  const gradients = known;
  return (key) => {
    let gradient = gradients.get(key);
    if (!gradient) {
      const { is } = sheet.quantity(key);
      const walker = new Adjoints(sheet, findings);
      if (is) walker.spread(is, ONE);
      gradients.set(key, (gradient = walker.sums));
    }
    return gradient;
  };
}

const GRADIENTS = new WeakMap<Findings, Map<string, ReadonlyMap<string, Decimal>>>();

/** Derivative of one quantity with respect to one input; zero when it does not rest on it. */
export function derivative(plan: Plan, findings: Findings, key: string, input: string): Decimal | Unknown {
  const all = sensitivities(plan, findings, key);
  return all instanceof Map ? ((all.get(input) as Decimal | undefined) ?? ZERO) : (all as Unknown);
}

const ZERO = new Decimal(0);
const ONE = new Decimal(1);

type BinaryNode = NodeOf<BinaryOp>;

/** A constant has no error to hand on, so its part need not be worked out. */
const moves = ({ node }: Expression): boolean => node.op !== 'constant';

class Adjoints {
  readonly sums = new Map<string, Decimal>();

  constructor(
    private readonly sheet: Sheet,
    private readonly findings: Findings,
  ) {}

  add(key: string, adjoint: Decimal): void {
    const sum = this.sums.get(key);
    this.sums.set(key, sum ? sum.plus(adjoint) : adjoint);
  }

  /** Hands the adjoint of an expression on to the quantities it names. */
  spread(expression: Expression, adjoint: Decimal): void {
    const { node } = expression;
    switch (node.op) {
      case 'constant':
        return;
      case 'named':
        return this.add(node.key, adjoint);
      case 'choice':
      case 'threshold':
        return this.spread(branch(node, this.sheet, this.findings), adjoint);
      case 'converted':
        return this.spread(node.of, conversionFactor(node, this.sheet.unitOf).scale(adjoint));
      case 'exponential':
        return this.spread(node.of, adjoint.times(this.value(expression)));
      case 'rounded':
        // a staircase: what counts is the slope of the ramp along it, for an error is not rounded away
        return this.spread(node.of, adjoint);
      case 'logarithm':
        return this.spread(node.of, adjoint.div(this.value(node.of)));
      case 'power':
        return this.power(node, adjoint);
      case 'median':
        return this.median(node, adjoint);
      default:
        return this.binary(node, adjoint);
    }
  }

  private binary(node: BinaryNode, adjoint: Decimal): void {
    switch (node.op) {
      case 'sum':
        this.spread(node.left, adjoint);
        return this.spread(node.right, adjoint);
      case 'difference':
        this.spread(node.left, adjoint);
        return this.spread(node.right, adjoint.neg());
      case 'product':
        if (moves(node.left)) this.spread(node.left, adjoint.times(this.value(node.right)));
        if (moves(node.right)) this.spread(node.right, adjoint.times(this.value(node.left)));
        return;
      case 'quotient': {
        const under = this.value(node.right);
        const share = adjoint.div(under);
        if (moves(node.left)) this.spread(node.left, share);
        if (moves(node.right)) this.spread(node.right, share.times(this.value(node.left)).div(under).neg());
        return;
      }
      default: {
        const right = this.value(node.right);
        const left = this.value(node.left);
        const rightTaken = node.op === 'least' ? right.lt(left) : right.gt(left);
        return this.spread(rightTaken ? node.right : node.left, adjoint);
      }
    }
  }

  /** Only those in the middle move it. */
  private median({ all }: NodeOf<'median'>, adjoint: Decimal): void {
    const sorted = all.map((part) => ({ part, value: this.value(part) })).sort((a, b) => a.value.cmp(b.value));
    const middle = middlePlaces(all.length);
    for (const place of middle) this.spread(sorted[place]!.part, adjoint.div(middle.length));
  }

  private power(node: NodeOf<'power'>, adjoint: Decimal): void {
    const base = this.value(node.base);
    const exponent = this.value(node.exponent);
    // x⁰ is 1 everywhere, and 0ᵖ is 0 for every p > 0: both are flat where the rule would give 0 · ∞
    if (!exponent.isZero()) this.spread(node.base, adjoint.times(exponent).times(base.pow(exponent.minus(1))));
    if (node.exponent.node.op !== 'constant' && !base.isZero()) this.spread(node.exponent, adjoint.times(base.pow(exponent)).times(base.ln()));
  }

  private value(expression: Expression): Decimal {
    return valueOf(expression, this.sheet, this.findings);
  }
}
