import { Decimal, MOST_DIGITS } from '../formula/decimal.js';
import { Refused } from '../formula/reading.js';
import type { Outcome } from '../formula/reading.js';
import type { Unit } from '../formula/unit.js';
import { TYPED_UNITS } from '../formula/units.js';

/**
 * A figure as a person gave it: decimal text with a point, digits and trailing zeros kept, and its
 * unit. A figure that could not be understood keeps what was `typed` and the `doubt` about it.
 */
export type Figure =
  | { readonly text: string; readonly unit: string }
  | { readonly typed: string; readonly doubt: string; readonly unit: string };

const DECIMAL_TEXT = /^-?\d{1,200}(?:\.\d{1,200})?$/;

/**
 * The value of a figure in `unit`.
 *
 * @param field at which a problem stands: `not-a-number`, `too-many-digits`, `unknown-unit`,
 *   `unit-does-not-fit`, or the doubt that the figure itself carries
 */
export function readFigure(figure: Figure, unit: Unit, field: string): Outcome {
  const refuse = (code: string, params: Record<string, string>): Refused => new Refused({ code, quantity: field, params });
  if ('doubt' in figure) return refuse(figure.doubt, { typed: figure.typed });
  const { text } = figure;
  if (!DECIMAL_TEXT.test(text)) return refuse('not-a-number', { typed: text });
  if (text.length > MOST_DIGITS && significantDigits(text) > MOST_DIGITS) {
    return refuse('too-many-digits', { typed: text, digits: String(significantDigits(text)), most: String(MOST_DIGITS) });
  }
  const value = new Decimal(text);
  if (figure.unit === unit.symbol) return value;
  const given = TYPED_UNITS.get(figure.unit);
  if (!given) return refuse('unknown-unit', { unit: figure.unit });
  if (!given.sameDimension(unit)) return refuse('unit-does-not-fit', { unit: figure.unit, needed: unit.symbol });
  return given.convert(value, unit);
}

const significantDigits = (text: string): number => text.replace(/[-.]/g, '').replace(/^0+/, '').length;
