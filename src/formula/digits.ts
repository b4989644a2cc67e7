import { Decimal } from './decimal.js';
import type { Digits } from './quantity.js';

/**
 * A value as it is reported: rounded to its digits, halves away from zero as people round by hand
 * (ISO 80000-1, rule B). The full value is always kept beside it.
 */
export function shownText(value: Decimal, digits: Digits): string {
  // the last of 34 digits hold what the steps before rounded away: 5.8499…98 is 5.85, and rounds up
  return withoutLoneSign(roundedText(value.toSignificantDigits(TRUSTED, Decimal.ROUND_HALF_UP), digits));
}

/** Digits of a result that can be trusted. */
const TRUSTED = 30;

function roundedText(value: Decimal, digits: Digits): string {
  if ('significant' in digits) return significantText(value, digits.significant);
  if ('decimals' in digits) return value.toFixed(digits.decimals, Decimal.ROUND_HALF_UP);
  const size = value.abs();
  const band = digits.bands.find(({ below }) => below === undefined || size.lt(below));
  return value.toFixed(band?.decimals ?? 0, Decimal.ROUND_HALF_UP);
}

/** Plain decimal text of so many significant digits; whole digits are never rounded away. */
function significantText(value: Decimal, significant: number): string {
  if (value.isZero()) return '0';
  // 9.9996 becomes 10.00: the rounding may add a digit before the point
  const { e } = value.toSignificantDigits(significant, Decimal.ROUND_HALF_UP);
  const decimals = Math.max(0, significant - 1 - e);
  return value.toFixed(Math.min(decimals, 30), Decimal.ROUND_HALF_UP);
}

/** `-0.00` would be read as a misprint. */
const withoutLoneSign = (text: string): string => text.replace(/^-(?=0(?:\.0*)?$)/, '');
