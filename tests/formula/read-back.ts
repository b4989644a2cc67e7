import { all, create } from 'mathjs';
import type { BigNumber, MathJsInstance, MathNode as ParsedNode } from 'mathjs';
import { Decimal } from '../../src/formula/decimal.js';
import type { MathNode } from '../../src/formula/working-mathml.js';

// Reads written formulas back and computes them, with more digits than the project's own
// arithmetic and without any of its code, so that a wrong bracket or sign shows as a wrong figure.

/** Arithmetic to 64 digits. */
export const Wide = Decimal.clone({ precision: 64 });
export type Wide = Decimal;

/** What a name or a cell stands for: a figure or an option. */
export type Meaning = Wide | string;
export type MeaningOf = Readonly<Record<string, Meaning>>;

// comparisons are to be exact: by default figures count as equal when 12 digits agree
const math: MathJsInstance = create(all!, { number: 'BigNumber', precision: 64, relTol: 1e-60, absTol: 0 });

/** Computes only the branch that is taken, as a spreadsheet does. */
const lazyIf = ([condition, then, otherwise]: ParsedNode[], _: unknown, scope: Map<string, unknown>): unknown =>
  (condition!.evaluate(scope) ? then! : otherwise!).evaluate(scope);

math.import({
  IF: Object.assign(lazyIf, { rawArgs: true }),
  SAME: (left: unknown, right: unknown) => left === right,
  NA: () => 'n/a',
  EXP: (of: BigNumber) => math.exp(of),
  LN: (of: BigNumber) => math.log(of),
  MIN: (...all: BigNumber[]) => math.min(...all),
  MAX: (...all: BigNumber[]) => math.max(...all),
  MEDIAN: (...all: BigNumber[]) => math.median(...all),
  ln: (of: BigNumber) => math.log(of),
});

function computed(text: string, meaning: MeaningOf): Wide | undefined {
  const figures = Object.entries(meaning).map(([name, value]) => [name, typeof value === 'string' ? value : math.bignumber(value.toString())] as const);
  const result: unknown = math.evaluate(text, new Map<string, unknown>(figures));
  return math.isBigNumber(result) && result.isFinite() ? new Wide(result.toString()) : undefined;
}

/** The figure of a cell, or undefined for an error. In a cell `=` compares; here it would set a variable. */
export const readCell = (text: string, cells: MeaningOf): Wide | undefined =>
  computed(text.replace(/(\w+)=("(?:[^"]|"")*")/g, 'SAME($1,$2)'), cells);

/** The figure of a formula on one line, its signs brought to those of a programming language. */
export const readText = (text: string, names: MeaningOf): Wide | undefined =>
  computed(text.replace(/·/g, '*').replace(/−/g, '-').replace(/;/g, ','), names);

/**
 * The figure of a formula in MathML, read as the eye reads it: an `mrow` groups nothing that is
 * not in brackets, and an exponent belongs to the last sign before it.
 */
export function readMath(math: MathNode, names: Readonly<Record<string, Wide>>): Wide {
  const tokens: Token[] = [];
  const lay = ({ tag, content }: MathNode): void => {
    if (typeof content === 'string') {
      if (tag === 'mn') {
        const [, sign, digits] = /^(−?)(.*)$/.exec(content)!;
        if (sign) tokens.push(sign);
        tokens.push(new Wide(digits!));
      } else tokens.push(content);
      return;
    }
    const [first, second] = content;
    if (tag === 'mfrac') tokens.push(readMath(first!, names).div(readMath(second!, names)));
    else if (tag === 'msub') tokens.push(`${first!.content as string}_${second!.content as string}`);
    else if (tag === 'msup') {
      lay(first!);
      tokens.push('^', readMath(second!, names));
    } else content.forEach(lay);
  };
  lay(math);
  return new Reader(tokens, names).whole();
}

type Token = Wide | string;

/** The order of operations as taught at school. */
class Reader {
  #at = 0;

  constructor(
    private readonly tokens: readonly Token[],
    private readonly names: Readonly<Record<string, Wide>>,
  ) {}

  whole(): Wide {
    const value = this.sum();
    if (this.#at < this.tokens.length) throw new SyntaxError(`left over: ${this.tokens.slice(this.#at).join(' ')}`);
    return value;
  }

  private sum(): Wide {
    let value = this.product();
    for (;;) {
      if (this.takes('+')) value = value.plus(this.product());
      else if (this.takes('−')) value = value.minus(this.product());
      else return value;
    }
  }

  private product(): Wide {
    let value = this.signed();
    while (this.takes('·')) value = value.times(this.signed());
    return value;
  }

  private signed(): Wide {
    return this.takes('−') ? this.signed().neg() : this.power();
  }

  private power(): Wide {
    const base = this.atom();
    return this.takes('^') ? base.pow(this.atom()) : base;
  }

  private atom(): Wide {
    const token = this.tokens[this.#at++];
    if (token instanceof Wide) return token;
    if (token === '(') return this.inBrackets()[0]!;
    if (token === 'exp') return this.inBrackets(true)[0]!.exp();
    if (token === 'ln') return this.inBrackets(true)[0]!.ln();
    if (token === 'min') return Wide.min(...this.inBrackets(true));
    if (token === 'max') return Wide.max(...this.inBrackets(true));
    if (token === 'median') return new Wide(math.median(...this.inBrackets(true).map((value) => math.bignumber(value.toString()))).toString());
    const value = typeof token === 'string' ? this.names[token] : undefined;
    if (!value) throw new SyntaxError(`not a figure: ${String(token)}`);
    return value;
  }

  private inBrackets(opening = false): Wide[] {
    if (opening && !this.takes('(')) throw new SyntaxError('a function without its bracket');
    const values = [this.sum()];
    while (this.takes(';')) values.push(this.sum());
    if (!this.takes(')')) throw new SyntaxError('a bracket stays open');
    return values;
  }

  private takes(sign: string): boolean {
    if (this.tokens[this.#at] !== sign) return false;
    this.#at++;
    return true;
  }
}
