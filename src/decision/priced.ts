import { Missing, joinUnknown } from '../formula/reading.js';
import type { Outcome, Unknown } from '../formula/reading.js';

/** Whether a cost counts: where its price was not given it is left out. A price that is refused counts, so that it is seen. */
export const isPriced = (rate: Outcome): 'yes' | 'no' => (rate instanceof Missing ? 'no' : 'yes');

/** Whether any cost of a route has a price: a total of nothing is no total, and misses the prices. */
export function anyPriced(rates: readonly Outcome[]): string | Unknown {
  const [first, ...others] = rates;
  if (!first || rates.some((rate) => isPriced(rate) === 'yes')) return 'yes';
  return others.reduce<Outcome>(joinUnknown, first) as Unknown;
}
