import type { BinaryOp, Constant, Expression, FunctionOp } from './expression.js';
import { InfixNotation, RANK, write } from './notation.js';
import type { Printed } from './notation.js';
import type { Sheet } from './sheet.js';

/** Where a quantity's figure or a choice's option stands in a workbook, e.g. `B7` or `Site!C4`. */
export type AddressOf = (key: string) => string;

const SIGNS = {
  plus: '+', minus: '-', times: '*', per: '/', least: 'MIN', greatest: 'MAX', exponential: 'EXP', logarithm: 'LN', rounded: 'ROUND', median: 'MEDIAN', separator: ',',
} as const;

/**
 * A formula as the text of a spreadsheet cell, without the leading equals sign, in the functions
 * that every spreadsheet shares (OpenFormula, small group). Choices become nested `IF`s over the
 * cell that holds the option; an option that is none of them gives `NA()`.
 */
export function cellFormula(expression: Expression, sheet: Sheet, addressOf: AddressOf): string {
  return write(expression, sheet, new CellNotation(addressOf)).out;
}

/**
 * The same for cells of which some hold a word instead of a figure that is not known: such a formula comes to an
 * error, never to a figure. Spreadsheets leave words out of `MIN`, `MAX` and `MEDIAN` and put them above every
 * figure; a word plus nothing is an error.
 */
export function strictCellFormula(expression: Expression, sheet: Sheet, addressOf: AddressOf): string {
  return write(expression, sheet, new StrictNotation(addressOf)).out;
}

class CellNotation extends InfixNotation {
  constructor(private readonly addressOf: AddressOf) {
    super(SIGNS);
  }

  override constant({ text }: Constant): Printed<string> {
    return { out: text, rank: text.startsWith('-') ? RANK.choice : RANK.atom };
  }

  override named(key: string): Printed<string> {
    return { out: this.addressOf(key), rank: RANK.atom };
  }

  override choice(by: string, cases: readonly (readonly [string, Printed<string>])[]): Printed<string> {
    const cell = this.addressOf(by);
    const out = cases.reduceRight((rest, [option, part]) => `IF(${cell}="${option.replace(/"/g, '""')}",${part.out},${rest})`, 'NA()');
    return { out, rank: RANK.atom };
  }

  override threshold(left: Printed<string>, right: Printed<string>, below: Printed<string>, otherwise: Printed<string>): Printed<string> {
    return { out: `IF(${left.out}<${right.out},${below.out},${otherwise.out})`, rank: RANK.atom };
  }

  override call(name: FunctionOp, of: Printed<string>): Printed<string> {
    return name === 'rounded' ? this.function('ROUND', of, { out: '0', rank: RANK.atom }) : super.call(name, of);
  }

  override branch(): undefined {
    return undefined;
  }
}

class StrictNotation extends CellNotation {
  override binary(op: BinaryOp, left: Printed<string>, right: Printed<string>): Printed<string> {
    return op === 'least' || op === 'greatest' ? super.binary(op, figure(left), figure(right)) : super.binary(op, left, right);
  }

  override median(all: readonly Printed<string>[]): Printed<string> {
    return super.median(all.map(figure));
  }

  override threshold(left: Printed<string>, right: Printed<string>, below: Printed<string>, otherwise: Printed<string>): Printed<string> {
    return super.threshold(figure(left), figure(right), below, otherwise);
  }
}

const figure = (part: Printed<string>): Printed<string> => (/^[\d.]+$/.test(part.out) ? part : { out: `${part.out}+0`, rank: RANK.sum });
