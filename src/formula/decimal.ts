import { Decimal as Shared } from 'decimal.js';

/**
 * The project's own decimal arithmetic: 34 significant digits (those of IEEE 754 decimal128),
 * rounding half to even. The shared `Decimal` of the library is never configured, because other
 * code on the same page may use it.
 */
export const Decimal = Shared.clone({
  precision: 34,
  rounding: Shared.ROUND_HALF_EVEN,
  toExpNeg: -40,
  toExpPos: 40,
  defaults: true,
});
export type Decimal = Shared;

/** The most significant digits a figure may carry; more would be lost with the first operation. */
export const MOST_DIGITS = 34;

const cache = new Map<string, Decimal>();

/** A decimal from literal text in the source, built once. Never for text that people type. */
export function decimal(text: string): Decimal {
  let value = cache.get(text);
  if (!value) cache.set(text, (value = new Decimal(text)));
  return value;
}
