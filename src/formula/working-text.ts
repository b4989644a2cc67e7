import { Decimal } from './decimal.js';
import type { Constant, Expression, NodeOf } from './expression.js';
import { InfixNotation, RANK, write } from './notation.js';
import type { Printed } from './notation.js';
import type { Findings } from './plan.js';
import type { Quantity } from './quantity.js';
import { isKnown } from './reading.js';
import type { Sheet } from './sheet.js';
import { branch } from './trace.js';
import type { Unit } from './unit.js';
import { one, percent } from './units.js';

/** Writes a figure with its unit, in the manner of the page (decimal mark, digits). */
export type WriteFigure = (value: Decimal, unit: Unit, quantity?: Quantity) => string;

const SIGNS = {
  plus: ' + ', minus: ' − ', times: ' · ', per: ' / ', least: 'min', greatest: 'max', exponential: 'exp', logarithm: 'ln', rounded: 'round', median: 'median', separator: '; ',
} as const;

/** The general formula on one line: symbols, and figures for the constants. Choices show the branch taken. */
export function generalText(quantity: Quantity, sheet: Sheet, findings: Findings, figure: WriteFigure): string {
  if (!quantity.is) return quantity.symbol;
  return write(quantity.is, sheet, new WorkingText(sheet, findings, figure, false)).out;
}

/** The same formula with the figures put in; a figure that is not known stays as its symbol. */
export function figuresText(quantity: Quantity, sheet: Sheet, findings: Findings, figure: WriteFigure): string {
  if (!quantity.is) return quantity.symbol;
  return write(quantity.is, sheet, new WorkingText(sheet, findings, figure, true)).out;
}

class WorkingText extends InfixNotation {
  constructor(
    private readonly sheet: Sheet,
    private readonly findings: Findings,
    private readonly figure: WriteFigure,
    private readonly withFigures: boolean,
  ) {
    super(SIGNS);
  }

  override constant({ value, unit, symbol }: Constant): Printed<string> {
    if (symbol && !this.withFigures) return { out: symbol, rank: RANK.atom };
    return numberPart(this.figure(value, this.withFigures ? unit : one));
  }

  override named(key: string): Printed<string> {
    const quantity = this.sheet.quantity(key);
    const outcome = this.withFigures ? this.findings.outcome(key) : undefined;
    if (!outcome || !isKnown(outcome)) return { out: quantity.symbol, rank: RANK.atom };
    return numberPart(this.figure(outcome, quantity.unit, quantity));
  }

  protected override factor(figure: bigint, unit: Unit): Printed<string> {
    return { out: factorText(figure, unit, this.withFigures, this.figure), rank: RANK.atom };
  }

  override choice(by: string, cases: readonly (readonly [string, Printed<string>])[]): Printed<string> {
    return { out: `{${by}: ${cases.map(([option, part]) => `${option} → ${part.out}`).join(', ')}}`, rank: RANK.atom };
  }

  override threshold(left: Printed<string>, right: Printed<string>, below: Printed<string>, otherwise: Printed<string>): Printed<string> {
    return { out: `{${left.out} < ${right.out} → ${below.out}, else ${otherwise.out}}`, rank: RANK.atom };
  }

  override branch(node: NodeOf<'choice'> | NodeOf<'threshold'>): Expression | undefined {
    return settledBranch(node, this.sheet, this.findings);
  }
}

/** How tightly a printed figure binds. A negative one, like a sum, needs brackets inside a product; one with a unit needs them in a power. */
export function figureRank(text: string): number {
  if (/^[-−]/.test(text)) return RANK.choice;
  return text.includes(' ') ? RANK.power : RANK.atom;
}

/** A hundred between pure numbers comes from a per cent and is written as one beside figures with units: `9 kg / 90 % · 100 %`. */
export function factorText(figure: bigint, unit: Unit, withFigures: boolean, write: WriteFigure): string {
  return withFigures && figure === 100n && unit.isPure ? write(HUNDRED, percent) : figure.toString();
}

const HUNDRED = new Decimal(100);

const numberPart = (text: string): Printed<string> => ({ out: text, rank: figureRank(text) });

/** The branch taken, or undefined where it is not settled yet. */
export function settledBranch(node: NodeOf<'choice'> | NodeOf<'threshold'>, sheet: Sheet, findings: Findings): Expression | undefined {
  try {
    return branch(node, sheet, findings);
  } catch {
    return undefined;
  }
}
