import { conversionFactor } from './balance.js';
import { Decimal } from './decimal.js';
import type { BinaryOp, Expression, NodeOf } from './expression.js';
import { medianOf } from './median.js';
import { Quantity, keeps } from './quantity.js';
import type { Limit } from './quantity.js';
import { Refused, isKnown, joinUnknown } from './reading.js';
import type { Outcome, Unknown } from './reading.js';
import { choicesIn, namesIn } from './sheet.js';
import type { Sheet } from './sheet.js';

/** Where a plan finds what was given. Each key is asked for once at most, when a formula first needs it. */
export interface Givens {
  /** The value of an input in its quantity's unit, or why it is not known. */
  input(key: string): Outcome;
  /**
   * The option taken, or why it is not known. A choice that is made on results (how many passes,
   * say) may look them up in the findings so far.
   */
  option(key: string, findings: Findings): string | Unknown;
}

/** What a plan finds from the givens, by key; each quantity is computed when first asked for, and once. */
export interface Findings {
  /** @throws RangeError for a key that the plan does not hold. */
  outcome(key: string): Outcome;
  option(key: string): string | Unknown;
  /** Keys of the quantities that have been computed so far, each after those its formula needed. */
  touched(): readonly string[];
}

/** What many readings share: filled by those that need it first. */
export interface Standing {
  /** By slot. */
  readonly varying: readonly boolean[];
  readonly varyingChoices: readonly boolean[];
  readonly slots: (Outcome | undefined)[];
  readonly options: (string | Unknown | undefined)[];
}

type Step = (run: Run) => Outcome;

/** What takes the place of a quantity's outcome, by key; it is given the outcome that its formula or input has. */
export type Replaced = ReadonlyMap<string, (normal: Outcome) => Outcome>;

/**
 * The asked-for quantities of a sheet and all they may rest on, compiled once: an order in which
 * each comes after what it names, integer slots, and one closure a formula. No code is generated as text.
 */
export class Plan {
  /** Keys, each after the keys its formula names. */
  readonly order: readonly string[];
  /** The choices that any formula of the plan turns on. */
  readonly choices: readonly string[];
  readonly #slot: ReadonlyMap<string, number>;
  readonly #choiceSlot: ReadonlyMap<string, number>;
  readonly #steps: readonly Step[];

  constructor(readonly sheet: Sheet, wanted: Iterable<string>) {
    const slot = new Map<string, number>();
    const visit = (key: string): void => {
      if (slot.has(key)) return;
      namesIn(sheet.quantity(key)).forEach(visit);
      slot.set(key, slot.size);
    };
    for (const key of wanted) visit(key);
    this.order = [...slot.keys()];
    this.#slot = slot;
    const choiceSlot = new Map<string, number>();
    const compiler = new Compiler(sheet, slot, choiceSlot);
    this.#steps = this.order.map((key) => compiler.quantity(sheet.quantity(key)));
    this.choices = [...choiceSlot.keys()];
    this.#choiceSlot = choiceSlot;
  }

  has(key: string): boolean {
    return this.#slot.has(key);
  }

  /**
   * Starts a reading of the givens. Never throws for bad figures: they are outcomes.
   *
   * @param replaced what some quantities are to come to instead, and all that rests on them with it; no limit is
   *   held against what is put in
   * @throws RangeError for a replaced key that the plan does not hold
   */
  evaluate(givens: Givens, replaced?: Replaced): Findings {
    return new Run(givens, this, replaced?.size ? this.#with(replaced) : this.#steps, this.#slot, this.#choiceSlot);
  }

  /**
   * The same for one of many readings that share some of their givens: what rests on nothing that varies is worked out once, by the
   * first that needs it.
   *
   * @param standing made by {@link Plan.standing} of this plan
   */
  evaluateOneOfMany(givens: Givens, standing: Standing): Findings {
    return new Run(givens, this, this.#steps, this.#slot, this.#choiceSlot, standing);
  }

  /** What does not vary among many readings, by which inputs and which choices do. */
  standing(varies: (input: string) => boolean, variesChoice: (choice: string) => boolean): Standing {
    const varying: boolean[] = [];
    for (const key of this.order) {
      const quantity = this.sheet.quantity(key);
      varying.push(
        quantity.is
          ? [...namesIn(quantity)].some((name) => varying[this.#slot.get(name)!]) || choicesIn(quantity).some(variesChoice)
          : varies(key) || [...namesIn(quantity)].some((name) => varying[this.#slot.get(name)!]),
      );
    }
    return { varying, varyingChoices: this.choices.map(variesChoice), slots: new Array<Outcome | undefined>(varying.length), options: new Array<string | Unknown | undefined>(this.choices.length) };
  }

  #with(replaced: Replaced): readonly Step[] {
    const steps = [...this.#steps];
    for (const [key, change] of replaced) {
      const slot = this.#slot.get(key);
      if (slot === undefined) throw new RangeError(`${key} is not in this plan`);
      const normal = this.#steps[slot]!;
      steps[slot] = (run) => finite(change(normal(run)), key);
    }
    return steps;
  }
}

class Run implements Findings {
  readonly #slots: (Outcome | undefined)[];
  readonly #options: (string | Unknown | undefined)[];

  constructor(
    readonly givens: Givens,
    readonly plan: Plan,
    readonly steps: readonly Step[],
    readonly slotOf: ReadonlyMap<string, number>,
    readonly choiceSlotOf: ReadonlyMap<string, number>,
    readonly standing?: Standing,
  ) {
    this.#slots = new Array<Outcome | undefined>(steps.length);
    this.#options = new Array<string | Unknown | undefined>(plan.choices.length);
  }

  outcome(key: string): Outcome {
    const slot = this.slotOf.get(key);
    if (slot === undefined) throw new RangeError(`${key} is not in this plan`);
    return this.at(slot);
  }

  option(key: string): string | Unknown {
    const slot = this.choiceSlotOf.get(key);
    return slot === undefined ? this.givens.option(key, this) : this.optionAt(slot);
  }

  touched(): readonly string[] {
    return this.plan.order.filter((_, slot) => this.#slots[slot] !== undefined);
  }

  at(slot: number): Outcome {
    const { standing } = this;
    if (!standing || standing.varying[slot]) return (this.#slots[slot] ??= this.steps[slot]!(this));
    return (this.#slots[slot] ??= standing.slots[slot] ??= this.steps[slot]!(this));
  }

  optionAt(slot: number): string | Unknown {
    const { standing } = this;
    if (!standing || standing.varyingChoices[slot]) return (this.#options[slot] ??= this.givens.option(this.plan.choices[slot]!, this));
    return (standing.options[slot] ??= this.givens.option(this.plan.choices[slot]!, this));
  }
}

/** Turns formulas into closures over slots. */
class Compiler {
  constructor(
    private readonly sheet: Sheet,
    private readonly slot: ReadonlyMap<string, number>,
    private readonly choiceSlot: Map<string, number>,
  ) {}

  quantity(quantity: Quantity): Step {
    const { key } = quantity;
    const step: Step = quantity.is ? this.step(quantity.is, key) : (run) => finite(run.givens.input(key), key);
    if (!quantity.limits.length) return step;
    const checks = quantity.limits.map((limit) => this.check(limit, quantity));
    return (run) => {
      const outcome = step(run);
      if (!isKnown(outcome)) return outcome;
      for (const check of checks) {
        const refused = check(outcome, run);
        if (refused) return refused;
      }
      return outcome;
    };
  }

  /** A bound that is itself not known refuses nothing. */
  private check({ is, bound, code, at }: Limit, quantity: Quantity): (value: Decimal, run: Run) => Refused | undefined {
    const boundIn: Step = bound instanceof Quantity ? this.step(bound, quantity.key) : () => bound;
    return (value, run) => {
      const limit = boundIn(run);
      if (!isKnown(limit) || keeps(is, value, limit)) return undefined;
      return refuse(code, at ?? quantity.key, { bound: limit.toString(), unit: quantity.unit.symbol });
    };
  }

  private step(expression: Expression, key: string): Step {
    const { node } = expression;
    switch (node.op) {
      case 'constant': {
        const { value } = node.constant;
        return () => value;
      }
      case 'named': {
        const slot = this.slot.get(node.key)!;
        return (run) => run.at(slot);
      }
      case 'choice':
        return this.choice(node, key);
      case 'threshold':
        return this.threshold(node, key);
      case 'median':
        return this.median(node.all, key);
      case 'converted': {
        const factor = conversionFactor(node, this.sheet.unitOf);
        return this.alone(node.of, key, (value) => factor.scale(value));
      }
      case 'power':
        return this.both(node.base, node.exponent, key, remembered((base, exponent) => raise(base, exponent, key)));
      case 'exponential':
        return this.alone(node.of, key, remembered((value) => value.exp()));
      case 'rounded':
        return this.alone(node.of, key, (value) => value.toDecimalPlaces(0, Decimal.ROUND_HALF_UP));
      case 'logarithm':
        return this.alone(node.of, key, remembered((value) => (value.gt(0) ? value.ln() : refuse('logarithm-of-nothing', key))));
      default:
        return this.both(node.left, node.right, key, operation(node.op, key));
    }
  }

  private both(left: Expression, right: Expression, key: string, combine: (a: Decimal, b: Decimal) => Outcome): Step {
    const first = this.step(left, key);
    const second = this.step(right, key);
    return (run) => {
      const a = first(run);
      const b = second(run);
      return isKnown(a) && isKnown(b) ? finite(combine(a, b), key) : joinUnknown(a, b);
    };
  }

  private median(all: readonly Expression[], key: string): Step {
    const steps = all.map((part) => this.step(part, key));
    return (run) => {
      const values = steps.map((step) => step(run));
      const unknown = values.find((value) => value instanceof Refused) ?? values.find((value) => !isKnown(value));
      return unknown ? values.reduce(joinUnknown, unknown) : finite(medianOf(values as Decimal[]), key);
    };
  }

  private alone(of: Expression, key: string, change: (value: Decimal) => Outcome): Step {
    const inner = this.step(of, key);
    return (run) => {
      const value = inner(run);
      return isKnown(value) ? finite(change(value), key) : value;
    };
  }

  private choice(node: NodeOf<'choice'>, key: string): Step {
    const known = this.choiceSlot.get(node.by);
    const slot = known ?? this.choiceSlot.size;
    if (known === undefined) this.choiceSlot.set(node.by, slot);
    const cases = new Map(Object.entries(node.cases).map(([option, part]) => [option, this.step(part, key)]));
    return (run) => {
      const option = run.optionAt(slot);
      if (typeof option !== 'string') return option;
      const step = cases.get(option);
      return step ? step(run) : refuse('unknown-option', node.by, { option });
    };
  }

  private threshold(node: NodeOf<'threshold'>, key: string): Step {
    const left = this.step(node.left, key);
    const right = this.step(node.right, key);
    const below = this.step(node.below, key);
    const otherwise = this.step(node.otherwise, key);
    return (run) => {
      const a = left(run);
      const b = right(run);
      if (!isKnown(a) || !isKnown(b)) return joinUnknown(a, b);
      return (a.lt(b) ? below : otherwise)(run);
    };
  }
}

function operation(op: BinaryOp, key: string): (a: Decimal, b: Decimal) => Outcome {
  switch (op) {
    case 'sum':
      return (a, b) => a.plus(b);
    case 'difference':
      return (a, b) => a.minus(b);
    case 'product':
      return (a, b) => a.times(b);
    case 'quotient':
      return (a, b) => (b.isZero() ? refuse('division-by-zero', key) : a.div(b));
    case 'least':
      return (a, b) => (b.lt(a) ? b : a);
    case 'greatest':
      return (a, b) => (b.gt(a) ? b : a);
  }
}

/** Results that are kept for each step of a formula: enough for typing on in one lot, and for a few settings in a long list. */
const MOST_REMEMBERED = 64;

/** Powers, exponentials and logarithms cost a hundred multiplications; the same figures come again with every key pressed. */
function remembered<Args extends readonly Decimal[]>(compute: (...args: Args) => Outcome): (...args: Args) => Outcome {
  const known = new Map<string, Outcome>();
  return (...args) => {
    const id = args.join('^');
    let outcome = known.get(id);
    if (!outcome) {
      if (known.size >= MOST_REMEMBERED) known.clear();
      known.set(id, (outcome = compute(...args)));
    }
    return outcome;
  };
}

const HALF = new Decimal('0.5');

function raise(base: Decimal, exponent: Decimal, key: string): Outcome {
  if (base.lt(0) && !exponent.isInteger()) return refuse('root-of-negative', key);
  if (base.isZero() && exponent.lt(0)) return refuse('division-by-zero', key);
  return exponent.eq(HALF) ? base.sqrt() : base.pow(exponent);
}

/** A figure too large for decimal arithmetic is refused where it arises: an infinity must not pass for a figure. */
const finite = (outcome: Outcome, key: string): Outcome =>
  isKnown(outcome) && !outcome.isFinite() ? refuse('not-finite', key) : outcome;

const refuse = (code: string, quantity: string, params?: Record<string, string>): Refused =>
  new Refused(params ? { code, quantity, params } : { code, quantity });

