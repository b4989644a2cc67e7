import { decimal } from '../formula/decimal.js';
import type { Decimal } from '../formula/decimal.js';

/** A line of a method's table: up to this acid value, a portion of this mass. */
export interface Portion {
  /** Acid value, mg/g; none for the last line. */
  readonly upTo?: Decimal;
  /** g */
  readonly mass: Decimal;
}

const table = (...lines: readonly (readonly [mass: string, upTo?: string])[]): readonly Portion[] =>
  lines.map(([mass, upTo]) => ({ mass: decimal(mass), ...(upTo !== undefined && { upTo: decimal(upTo) }) }));

/** Portion by expected acid value, by method. */
export const PORTIONS = {
  /** ISO 660, table 1, and AOCS Cd 3d-63: same masses (Cd 3d-63 read in a preview, its last line from memory). */
  'iso-660': table(['20', '1'], ['10', '4'], ['2.5', '15'], ['0.5', '75'], ['0.1']),
  /** ASTM D664, method A (from memory). */
  'd664': table(['20', '1'], ['5', '5'], ['1', '20'], ['0.25', '100'], ['0.1']),
  /** ASTM D974 (from memory). */
  'd974': table(['20', '3'], ['2', '25'], ['0.2']),
} as const satisfies Readonly<Record<string, readonly Portion[]>>;

export type PortionTable = keyof typeof PORTIONS;

/** The table's mass for an acid value, g. */
export function portionFor(acidValue: Decimal, lines: readonly Portion[]): Decimal {
  const line = lines.find(({ upTo }) => upTo === undefined || acidValue.lte(upTo));
  if (!line) throw new RangeError('a table ends with a line for all that is left');
  return line.mass;
}

/** Nobody weighs out exactly the table's mass, and an acid value near the end of a line fits the next as well. */
const LEEWAY = decimal('2.5');
const NEAR = decimal('1.25');

/** Whether a portion fits the table for the acid value that it gave. */
export function portionFits(mass: Decimal, acidValue: Decimal, lines: readonly Portion[]): boolean {
  const about = [acidValue.div(NEAR), acidValue, acidValue.times(NEAR)].map((value) => portionFor(value, lines));
  return about.some((wanted) => mass.gte(wanted.div(LEEWAY)) && mass.lte(wanted.times(LEEWAY)));
}
