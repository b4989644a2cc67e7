import type { PortionLine } from '../chemistry/titration-plan.js';
import { decimal } from '../formula/decimal.js';
import type { Decimal } from '../formula/decimal.js';

/** The table's mass for an acid value, g. */
export function portionFor(acidValue: Decimal, lines: readonly PortionLine[]): Decimal {
  const line = lines.find(([, end, included]) => end === undefined || (included ? acidValue.lte(end) : acidValue.lt(end)));
  if (!line) throw new RangeError('a table ends with a line for all that is left');
  return decimal(line[0]);
}

/** Nobody weighs out exactly the table's mass, and an acid value near the end of a line fits the next as well. */
const LEEWAY = decimal('2.5');
const NEAR = decimal('1.25');

/** Whether a portion fits the table for the acid value that it gave. */
export function portionFits(mass: Decimal, acidValue: Decimal, lines: readonly PortionLine[]): boolean {
  const about = [acidValue.div(NEAR), acidValue, acidValue.times(NEAR)].map((value) => portionFor(value, lines));
  return about.some((wanted) => mass.gte(wanted.div(LEEWAY)) && mass.lte(wanted.times(LEEWAY)));
}
