import type { BinaryOp, Constant, Expression, FunctionOp, NodeOf } from './expression.js';
import { RANK, write } from './notation.js';
import type { Notation, Printed } from './notation.js';
import type { Findings } from './plan.js';
import type { Quantity } from './quantity.js';
import type { Rational } from './rational.js';
import { isKnown } from './reading.js';
import type { Sheet } from './sheet.js';
import { factorText, figureRank, settledBranch } from './working-text.js';
import type { WriteFigure } from './working-text.js';
import type { Unit } from './unit.js';
import { one } from './units.js';

/** An element of MathML Core, as data: a tag and its contents. */
export interface MathNode {
  readonly tag: 'math' | 'mrow' | 'mi' | 'mn' | 'mo' | 'mtext' | 'mfrac' | 'msub' | 'msup';
  readonly content: string | readonly MathNode[];
}

/** The general formula as MathML: symbols, and figures for the constants. */
export function generalMath(quantity: Quantity, sheet: Sheet, findings: Findings, figure: WriteFigure): MathNode {
  return mathOf(quantity, new WorkingMath(sheet, findings, figure, false), sheet);
}

/** The same formula with the figures put in. */
export function figuresMath(quantity: Quantity, sheet: Sheet, findings: Findings, figure: WriteFigure): MathNode {
  return mathOf(quantity, new WorkingMath(sheet, findings, figure, true), sheet);
}

/** A symbol such as `V_0`, with its subscript set as one. */
export function symbolMath(symbol: string): MathNode {
  const [letter = '', subscript] = symbol.split('_');
  return subscript === undefined ? mi(letter) : { tag: 'msub', content: [mi(letter), { tag: 'mtext', content: subscript }] };
}

/** The tree as MathML markup, for a page without scripts or a file. */
export function mathMarkup(node: MathNode): string {
  const open = node.tag === 'math' ? '<math xmlns="http://www.w3.org/1998/Math/MathML">' : `<${node.tag}>`;
  const inside = typeof node.content === 'string' ? escapeText(node.content) : node.content.map(mathMarkup).join('');
  return `${open}${inside}</${node.tag}>`;
}

const escapeText = (text: string): string => text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;');

const mi = (content: string): MathNode => ({ tag: 'mi', content });
const mo = (content: string): MathNode => ({ tag: 'mo', content });
const mn = (content: string): MathNode => ({ tag: 'mn', content });
const row = (...content: readonly MathNode[]): MathNode => ({ tag: 'mrow', content });

function mathOf(quantity: Quantity, notation: WorkingMath, sheet: Sheet): MathNode {
  return { tag: 'math', content: [quantity.is ? write(quantity.is, sheet, notation).out : symbolMath(quantity.symbol)] };
}

type Part = Printed<MathNode>;

const OPERATORS = { sum: '+', difference: '−', product: '·' } as const;
const FUNCTIONS = { least: 'min', greatest: 'max', exponential: 'exp', logarithm: 'ln', rounded: 'round' } as const;

class WorkingMath implements Notation<MathNode> {
  constructor(
    private readonly sheet: Sheet,
    private readonly findings: Findings,
    private readonly figure: WriteFigure,
    private readonly withFigures: boolean,
  ) {}

  constant({ value, unit, symbol }: Constant): Part {
    if (symbol && !this.withFigures) return { out: symbolMath(symbol), rank: RANK.atom };
    return figurePart(this.figure(value, this.withFigures ? unit : one));
  }

  named(key: string): Part {
    const quantity = this.sheet.quantity(key);
    const outcome = this.withFigures ? this.findings.outcome(key) : undefined;
    if (!outcome || !isKnown(outcome)) return { out: symbolMath(quantity.symbol), rank: RANK.atom };
    return figurePart(this.figure(outcome, quantity.unit, quantity));
  }

  binary(op: BinaryOp, left: Part, right: Part): Part {
    switch (op) {
      case 'quotient':
        return { out: { tag: 'mfrac', content: [left.out, right.out] }, rank: RANK.product };
      case 'least':
      case 'greatest':
        return this.function(FUNCTIONS[op], left, right);
      default: {
        const rank = op === 'product' ? RANK.product : RANK.sum;
        const rightNeeds = op === 'difference' ? RANK.product : rank;
        return { out: row(fenced(left, rank), mo(OPERATORS[op]), fenced(right, rightNeeds)), rank };
      }
    }
  }

  power(base: Part, exponent: Part): Part {
    return { out: { tag: 'msup', content: [fenced(base, RANK.atom), exponent.out] }, rank: RANK.power };
  }

  call(name: FunctionOp, of: Part): Part {
    return this.function(FUNCTIONS[name], of);
  }

  median(all: readonly Part[]): Part {
    return this.function('median', ...all);
  }

  converted(of: Part, factor: Rational, unit: Unit): Part {
    const atom = (value: bigint): Part => figurePart(factorText(value, unit, this.withFigures, this.figure));
    const up = factor.over === 1n ? of : this.binary('product', of, atom(factor.over));
    return factor.under === 1n ? up : this.binary('quotient', up, atom(factor.under));
  }

  choice(by: string, cases: readonly (readonly [string, Part])[]): Part {
    const inside = cases.flatMap(([option, part]) => [{ tag: 'mtext', content: `${option}: ` } as const, part.out, mo(',')]);
    return { out: row({ tag: 'mtext', content: by }, mo('{'), ...inside.slice(0, -1), mo('}')), rank: RANK.atom };
  }

  threshold(left: Part, right: Part, below: Part, otherwise: Part): Part {
    const condition = [mo('{'), left.out, mo('<'), right.out, mo('→'), below.out, mo(','), mo('≥'), mo('→'), otherwise.out, mo('}')];
    return { out: row(...condition), rank: RANK.atom };
  }

  branch(node: NodeOf<'choice'> | NodeOf<'threshold'>): Expression | undefined {
    return settledBranch(node, this.sheet, this.findings);
  }

  private function(name: string, ...args: readonly Part[]): Part {
    const inside = args.flatMap((arg) => [arg.out, mo(';')]).slice(0, -1);
    return { out: row(mi(name), mo('('), ...inside, mo(')')), rank: RANK.atom };
  }
}

/** A figure with its unit: `0.1023 mol/L` becomes a number, a space and a text. */
function figurePart(text: string): Part {
  const at = text.indexOf(' ');
  const rank = figureRank(text);
  if (at < 0) return { out: mn(text), rank };
  return { out: row(mn(text.slice(0, at)), { tag: 'mtext', content: ` ${text.slice(at + 1)}` }), rank };
}

const fenced = (part: Part, needed: number): MathNode => (part.rank < needed ? row(mo('('), part.out, mo(')')) : part.out);
