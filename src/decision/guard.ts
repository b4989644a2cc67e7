import { errorFunction } from 'simple-statistics';
import type { Decimal } from '../formula/decimal.js';
import { decimal } from '../formula/decimal.js';

/** One-sided 95 % point of the normal distribution (Eurachem/CITAC, compliance assessment, Annex A; from memory). */
export const GUARD_FACTOR = decimal('1.645');

/**
 * Probability that the true value lies at or below a limit, Φ((limit − value)/u), for a normal
 * distribution about the result (JCGM 106, 7.2; from memory). 0 to 1; good to seven decimals.
 */
export function probabilityBelow(value: Decimal, u: Decimal, limit: Decimal): number {
  const distance = limit.minus(value);
  if (u.isZero()) return distance.lt(0) ? 0 : 1;
  return (1 + errorFunction(distance.div(u).toNumber() / Math.SQRT2)) / 2;
}
