import type { Decimal } from './decimal.js';

/** Where the middle of so many lies: one place in the sorted list, or two. */
export const middlePlaces = (count: number): readonly number[] => (count % 2 ? [(count - 1) / 2] : [count / 2 - 1, count / 2]);

/** The middle one of all in order of size, or the mean of the middle two. */
export function medianOf(values: readonly Decimal[]): Decimal {
  const sorted = [...values].sort((a, b) => a.cmp(b));
  const middle = middlePlaces(sorted.length).map((place) => sorted[place]!);
  return middle.reduce((sum, value) => sum.plus(value)).div(middle.length);
}
