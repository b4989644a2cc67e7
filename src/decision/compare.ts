import type { Decimal } from '../formula/decimal.js';

/** Digits that a comparison trusts; the last few of 34 hold what the steps before rounded away. */
const TRUSTED = 30;

/** Whether a result keeps a limit. FFA of 3.0 % by a certificate comes back as 3.000…001 % and still keeps a limit of 3.0 %. */
export const atOrBelow = (value: Decimal, limit: Decimal): boolean =>
  // rounding keeps the order, so only what lies above can still come out equal
  value.lte(limit) || value.toSignificantDigits(TRUSTED).lte(limit.toSignificantDigits(TRUSTED));
