import fc from 'fast-check';
import { Expression, constant, exponential, greatest, least, logarithm, median, whereBelow } from '../../src/formula/expression.js';
import type { Choice} from '../../src/formula/quantity.js';
import { Quantity, choice, quantity } from '../../src/formula/quantity.js';
import type { Unit } from '../../src/formula/unit.js';
import { cubicMetre, gram, kelvin, kilogram, millilitre, millimolePerGram, milligramPerGram, molePerLitre, one, percent } from '../../src/formula/units.js';

// Random sheets whose units balance. A shape is drawn first, without units, so that a failing one
// shrinks well; then it is grown into an expression that comes out in the unit asked for.

/** The bones of an expression, before units. */
type Shape = Leaf | Branch;
interface Leaf {
  readonly op: 'leaf';
  readonly pick: number;
  readonly digits: number;
  readonly places: number;
  readonly negative: boolean;
}
interface Branch {
  readonly op: Op;
  readonly pick: number;
  readonly parts: readonly Shape[];
}

const PAIRED = ['sum', 'difference', 'product', 'quotient', 'least', 'greatest', 'whole power', 'root', 'broken power'] as const;
const SINGLE = ['exponential', 'logarithm', 'converted'] as const;
type Op = (typeof PAIRED)[number] | (typeof SINGLE)[number] | 'choice' | 'threshold' | 'median';

const pick = fc.nat({ max: 1023 });
const leaf: fc.Arbitrary<Leaf> = fc.record({
  op: fc.constant('leaf' as const),
  pick,
  digits: fc.nat({ max: 99_999 }),
  places: fc.nat({ max: 4 }),
  negative: fc.boolean(),
});

const { shape } = fc.letrec<{ shape: Shape }>((tie) => {
  const part = tie('shape');
  const branch = (op: fc.Arbitrary<Op>, least: number, most = least): fc.Arbitrary<Shape> =>
    fc.record({ op, pick, parts: fc.array(part, { minLength: least, maxLength: most }) });
  return {
    shape: fc.oneof(
      { maxDepth: 4, depthSize: 'large' },
      { arbitrary: leaf, weight: 3 },
      { arbitrary: branch(fc.constantFrom(...PAIRED), 2), weight: 9 },
      { arbitrary: branch(fc.constantFrom(...SINGLE), 1), weight: 3 },
      { arbitrary: branch(fc.constant('choice'), 2, 3), weight: 1 },
      { arbitrary: branch(fc.constant('threshold'), 4), weight: 1 },
      { arbitrary: branch(fc.constant('median'), 1, 5), weight: 1 },
    ),
  };
});

/** A sheet as it is drawn, with what is given to it. */
export interface RandomSheet {
  readonly entries: readonly (Quantity | Choice)[];
  /** Keys of the quantities that have a formula, in order. */
  readonly results: readonly string[];
  /** Values of the inputs, as text, by key. */
  readonly values: Readonly<Record<string, string>>;
  readonly options: Readonly<Record<string, string>>;
  /** Digits of the constants that are shown by a symbol. */
  readonly symbols: Readonly<Record<string, string>>;
}

const TARGETS: readonly Unit[] = [one, gram, millimolePerGram, percent, molePerLitre, milligramPerGram, millilitre, kilogram];

/** One to four results, each in one of the trade's units; later ones may name earlier ones. */
export const randomSheet: fc.Arbitrary<RandomSheet> = fc
  .record({
    results: fc.array(fc.record({ shape, unit: fc.constantFrom(...TARGETS) }), { minLength: 1, maxLength: 4 }),
    options: fc.tuple(fc.nat({ max: 2 }), fc.nat({ max: 1 })),
  })
  .map(({ results, options }) => {
    const grower = new Grower(options);
    for (const { shape, unit } of results) grower.result(shape, unit);
    return grower;
  });

/** What a part must be: of any size, above zero, or small enough for an exponent. */
type Want = 'any' | 'positive' | 'tame';

const MOST_INPUTS = 6;
const BASES: readonly Unit[] = [gram, millilitre, one, molePerLitre, percent];
const WHOLE = ['2', '3', '-1', '-2'] as const;
/** Units that have a root of scale one, with it. */
const ROOTED: readonly (readonly [Unit, Unit])[] = [
  [one, one],
  [kilogram.power(2), kilogram],
  [kelvin.power(2), kelvin],
  [cubicMetre.power(2), cubicMetre],
];
const FACTORS = ['1000', '0.001', '0.01', '60', '0.45359237', '5/9', '3.785411784'] as const;
const ROUTES = ['acid', 'glycerol', 'blend'] as const;

class Grower implements RandomSheet {
  readonly entries: (Quantity | Choice)[];
  readonly results: string[] = [];
  readonly values: Record<string, string> = {};
  readonly options: Record<string, string>;
  readonly symbols: Record<string, string> = {};
  readonly #choices = [choice('route', ROUTES), choice('grade', ['A', 'b c'])] as const;
  #constants = 0;

  constructor([route, grade]: readonly [number, number]) {
    this.entries = [...this.#choices];
    this.options = { route: this.#choices[0].options[route]!, grade: this.#choices[1].options[grade]! };
  }

  result(shape: Shape, unit: Unit): void {
    const key = `result${this.results.length + 1}`;
    this.entries.push(quantity({ key, symbol: `y_${this.results.length + 1}`, unit, is: this.grow(shape, unit, 'any') }));
    this.results.push(key);
  }

  /** An expression of the shape that comes out in `unit`. */
  private grow(shape: Shape, unit: Unit, want: Want): Expression {
    if (shape.op === 'leaf') return this.leaf(shape, unit, want);
    if (want === 'tame') return this.tame(shape);
    const { op, pick, parts } = shape;
    const part = (at: number, its: Unit, wanted: Want = want): Expression => this.grow(parts[at % parts.length]!, its, wanted);
    const base = BASES[pick % BASES.length]!;
    switch (op) {
      case 'sum':
        return part(0, unit).plus(part(1, unit));
      case 'difference':
        return want === 'positive' ? part(0, unit).plus(part(1, unit)) : part(0, unit).minus(part(1, unit));
      case 'product':
        return part(0, unit.per(base)).times(part(1, base));
      case 'quotient':
        return part(0, unit.times(base)).per(part(1, base));
      case 'least':
        return least(part(0, unit), part(1, unit));
      case 'greatest':
        return greatest(part(0, unit), part(1, unit));
      case 'whole power': {
        const exponent = WHOLE[(pick >> 3) % WHOLE.length]!;
        const under = isOne(unit) ? one : base.isPure ? gram : base;
        return this.lifted(part(0, under).power(exponent), under.power(Number(exponent)), unit, part);
      }
      case 'root': {
        const [square, root] = isOne(unit) ? ROOTED[0]! : ROOTED[pick % ROOTED.length]!;
        return this.lifted(part(0, square, 'positive').power('0.5'), root, unit, part);
      }
      case 'broken power':
        return this.lifted(part(0, one, 'positive').power(part(1, one, 'tame')), one, unit, part);
      case 'exponential':
        return this.lifted(exponential(part(0, one, 'tame')), one, unit, part);
      case 'logarithm': {
        const grown = this.lifted(logarithm(part(0, one, 'positive')), one, unit, part);
        return want === 'positive' ? greatest(grown, constant('0.5', unit)) : grown;
      }
      case 'converted':
        return part(0, unit.scaled(FACTORS[pick % FACTORS.length]!, `${unit.symbol}′`)).in(unit);
      case 'choice': {
        const by = this.#choices[pick % 2]!;
        return (by as Choice).of(Object.fromEntries(by.options.map((option, at) => [option, part(at, unit)])));
      }
      case 'median':
        return median(parts.map((_, at) => part(at, unit)));
      case 'threshold':
        return whereBelow(part(0, base, 'any'), part(1, base, 'any'), part(2, unit), part(3, unit));
    }
  }

  /** A pure number from −3 to 3. */
  private tame(shape: Branch): Expression {
    const part = (at: number): Expression => this.grow(shape.parts[at % shape.parts.length]!, one, 'tame');
    switch (shape.op) {
      case 'sum':
        return part(0).plus(part(1)).per('2');
      case 'difference':
        return part(0).minus(part(1)).per('2');
      case 'product':
        return part(0).times(part(1)).per('3');
      case 'least':
        return least(part(0), part(1));
      case 'exponential':
        return exponential(part(0)).per('7');
      default:
        // whatever it is, it can be held
        return least(greatest(this.grow(shape, one, 'any'), '-3'), '3');
    }
  }

  /** What came out in `has`, brought to `unit` by one more factor. */
  private lifted(grown: Expression, has: Unit, unit: Unit, part: (at: number, its: Unit) => Expression): Expression {
    return has.sameDimension(unit) && has.scale.equals(unit.scale) ? grown : grown.times(part(1, unit.per(has)));
  }

  private leaf(leaf: Leaf, unit: Unit, want: Want): Expression {
    const known = this.entries.filter((entry): entry is Quantity => entry instanceof Quantity && this.fits(entry, unit, want));
    const inputs = Object.keys(this.values).length;
    if (known.length && (leaf.pick % 4 < 2 || inputs >= MOST_INPUTS)) return known[(leaf.pick >> 2) % known.length]!;
    const text = figure(leaf, want);
    if (leaf.pick % 4 === 3 || inputs >= MOST_INPUTS) return this.constant(text, unit, leaf.pick % 3 === 0);
    const key = `input${inputs + 1}`;
    this.values[key] = text;
    const input = quantity({ key, symbol: `x_${inputs + 1}`, unit });
    this.entries.push(input);
    return input;
  }

  private constant(text: string, unit: Unit, shown: boolean): Expression {
    if (!shown) return constant(text, unit);
    const symbol = `k_${++this.#constants}`;
    this.symbols[symbol] = text;
    return constant(text, unit, { symbol });
  }

  private fits({ key, unit }: Quantity, wanted: Unit, want: Want): boolean {
    if (!unit.sameDimension(wanted) || !unit.scale.equals(wanted.scale)) return false;
    if (want === 'any') return true;
    const value = Number(this.values[key]); // NaN for a result, whose size is not known yet
    return want === 'positive' ? value > 0 : Math.abs(value) <= 3;
  }
}

const isOne = (unit: Unit): boolean => unit.isPure && unit.scale.equals(one.scale);

/** The text of a figure: 0.0123, −42, 1.2e-3; within ±3 where it must be tame. */
function figure({ digits, places, negative, pick }: Leaf, want: Want): string {
  const sign = negative && want !== 'positive' ? '-' : '';
  if (want === 'tame') return `${sign}${((digits % 300) / 100).toFixed(2)}`;
  const mantissa = want === 'positive' && digits === 0 ? 1 : digits;
  if (pick % 16 === 7) return `${sign}${mantissa}e-${places}`;
  const text = mantissa.toString().padStart(places + 1, '0');
  return sign + (places ? `${text.slice(0, -places)}.${text.slice(-places)}` : text);
}

/**
 * The expression with its leaf number `at` exchanged. Leaves below a conversion are not counted: a
 * conversion takes any scale of its dimension.
 */
export function withLeaf(expression: Expression, at: number, exchange: (leaf: Expression) => Expression): Expression {
  let seen = 0;
  const change = (part: Expression): Expression => {
    const { node } = part;
    switch (node.op) {
      case 'constant':
      case 'named':
        return seen++ === at ? exchange(part) : part;
      case 'converted':
        return part;
      case 'exponential':
      case 'logarithm':
      case 'rounded':
        return new Expression({ ...node, of: change(node.of) });
      case 'power':
        return new Expression({ ...node, base: change(node.base), exponent: change(node.exponent) });
      case 'choice':
        return new Expression({ ...node, cases: Object.fromEntries(Object.entries(node.cases).map(([option, of]) => [option, change(of)])) });
      case 'median':
        return new Expression({ ...node, all: node.all.map(change) });
      case 'threshold':
        return new Expression({ ...node, left: change(node.left), right: change(node.right), below: change(node.below), otherwise: change(node.otherwise) });
      default:
        return new Expression({ ...node, left: change(node.left), right: change(node.right) });
    }
  };
  return change(expression);
}

/** How many leaves {@link withLeaf} counts. */
export function countLeaves(expression: Expression): number {
  let count = 0;
  for (let found = true; found; ) {
    found = false;
    withLeaf(expression, count, (leaf) => ((found = true), leaf));
    if (found) count++;
  }
  return count;
}
