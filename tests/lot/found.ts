import { Decimal } from '../../src/formula/decimal.js';
import type { Outcome } from '../../src/formula/reading.js';
import { EMPTY_SITE } from '../../src/core.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { lotRun } from '../../src/lot/lot-run.js';

// Quantities that are not read for every lot, asked for by key.

export const outcome = (entry: LotEntry, key: string, profile: SiteProfile = EMPTY_SITE): Outcome => lotRun(entry, profile).findings.outcome(key);

/** The value; a test that asks for one which is not known fails with the reason. */
export function found(entry: LotEntry, key: string, profile: SiteProfile = EMPTY_SITE): Decimal {
  const value = outcome(entry, key, profile);
  if (!(value instanceof Decimal)) throw new Error(`${key}: ${JSON.stringify(value)}`);
  return value;
}

/** Several values of one lot, as short numbers. */
export function numbers(entry: LotEntry, profile: SiteProfile = EMPTY_SITE): (key: string) => number {
  return (key) => found(entry, key, profile).toNumber();
}
