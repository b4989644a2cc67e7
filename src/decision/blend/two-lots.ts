import { Decimal, decimal } from '../../formula/decimal.js';
import { SHARES } from './stock.js';
import type { Share, Shares } from './stock.js';

/** How much of one oil another takes up. */
export interface TwoLots {
  /** Highest share of the first oil in the blend of both, % by mass, that keeps every limit. */
  readonly most: Decimal;
  /** The limit that sets it; undefined where the first oil keeps all of them by itself. */
  readonly by: Share | undefined;
}

/**
 * The highest share of one oil in a blend of two, in closed form. What mixes by mass mixes linearly: with x of the first,
 * x·a + (1 − x)·b ≤ limit, so x ≤ (limit − b) / (a − b) where a is above the limit and b below. 5 % and 1 % FFA against a limit
 * of 3 %: one half. Undefined where the second oil misses a limit itself and the first does not help all the same.
 */
export function twoLots(first: Shares, second: Shares, limits: Shares): TwoLots | undefined {
  let most = decimal('1');
  let least = decimal('0');
  let by: Share | undefined;
  for (const share of SHARES) {
    const [a, b, limit] = [first[share], second[share], limits[share]];
    if (!a || !b || !limit) continue;
    if (a.gt(limit) && b.gt(limit)) return undefined;
    if (a.lte(limit) && b.lte(limit)) continue;
    const even = limit.minus(b).div(a.minus(b));
    if (b.gt(limit)) least = Decimal.max(least, even);
    else if (even.lt(most)) [most, by] = [even, share];
  }
  return least.gt(most) ? undefined : { most: most.times(100), by };
}
