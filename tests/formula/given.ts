import { Decimal } from '../../src/formula/decimal.js';
import type { Findings, Givens } from '../../src/formula/plan.js';
import { Plan } from '../../src/formula/plan.js';
import type { Quantity } from '../../src/formula/quantity.js';
import type { Choice } from '../../src/formula/quantity.js';
import { isKnown, Missing, Refused } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import { Sheet } from '../../src/formula/sheet.js';
import type { WriteFigure } from '../../src/formula/working-text.js';

/** Inputs as decimal text (or as outcomes), and options; what is left out is missing. */
export function given(values: Readonly<Record<string, string | Outcome>>, options: Readonly<Record<string, string>> = {}): Givens {
  return {
    input: (key) => {
      const value = values[key];
      if (value === undefined) return new Missing([key]);
      return typeof value === 'string' ? new Decimal(value) : value;
    },
    option: (key) => options[key] ?? new Missing([key]),
  };
}

/** Every quantity of the entries, evaluated. */
export function evaluated(
  entries: readonly (Quantity | Choice)[],
  values: Readonly<Record<string, string | Outcome>>,
  options: Readonly<Record<string, string>> = {},
): { sheet: Sheet; plan: Plan; findings: Findings } {
  const sheet = Sheet.define(entries);
  const plan = new Plan(sheet, sheet.quantities.keys());
  return { sheet, plan, findings: plan.evaluate(given(values, options)) };
}

/** An outcome as one readable line: a figure, `missing: …` or `refused: code at key`. */
export function told(outcome: Outcome): string {
  if (isKnown(outcome)) return outcome.toString();
  if (outcome instanceof Refused) return `refused: ${outcome.problem.code} at ${outcome.problem.quantity}`;
  return `missing: ${outcome.missing.join(', ')}`;
}

/** A figure as `0.1023 mol/L`, with a true minus sign. */
export const withUnit: WriteFigure = (value, unit) => `${value.toFixed().replace('-', '−')} ${unit.symbol}`.trimEnd();

/** Only the digits, all of them. */
export const onlyDigits: WriteFigure = (value) => value.toFixed().replace('-', '−');
