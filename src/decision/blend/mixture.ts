import { decimal } from '../../formula/decimal.js';
import type { Decimal } from '../../formula/decimal.js';
import { SHARES, isSour } from './stock.js';
import type { BlendItem, BlendTask, Share, Shares } from './stock.js';

/** What comes of masses put together: acid, water, insolubles and money add up. */
export interface Mixture {
  readonly mass: Decimal;
  /** %; known where it is known of every part. */
  readonly shares: Shares;
  /** In all; known where every part has a price. */
  readonly cost: Decimal | undefined;
  /** kg of it that were above the limit of free fatty acid. */
  readonly sour: Decimal;
}

const ZERO = decimal('0');
const total = (values: readonly Decimal[]): Decimal => values.reduce((sum, value) => sum.plus(value), ZERO);

/** Mixes kg of each item, exactly. */
export function mixtureOf({ items, limits }: BlendTask, masses: readonly Decimal[]): Mixture {
  const parts = items.map((item, i) => ({ item, mass: masses[i] ?? ZERO })).filter(({ mass }) => !mass.isZero());
  const mass = total(parts.map((part) => part.mass));
  const weighed = (of: (item: BlendItem) => Decimal | undefined): Decimal | undefined => {
    const amounts = parts.map((part) => of(part.item)?.times(part.mass));
    return amounts.every((amount) => amount !== undefined) ? total(amounts) : undefined;
  };
  const shares: Partial<Record<Share, Decimal>> = {};
  for (const share of SHARES) {
    const amount = mass.isZero() ? undefined : weighed(({ shares: of }) => of[share]);
    if (amount) shares[share] = amount.div(mass);
  }
  return { mass, shares, cost: weighed(({ cost }) => cost), sour: total(parts.filter(({ item }) => isSour(item, limits)).map((part) => part.mass)) };
}

/** How far masses stay below a limit, in kg × % of the whole blend; below zero where it is missed. Never rounded by a division. */
function roomBelow({ items, limits }: BlendTask, share: Share, masses: readonly Decimal[]): Decimal | undefined {
  const limit = limits[share];
  return limit && total(items.map(({ shares }, i) => limit.minus(shares[share] ?? Infinity).times(masses[i] ?? ZERO)));
}

/** Whether masses keep every limit, to the last digit. */
export function keepsLimits(task: BlendTask, masses: readonly Decimal[]): boolean {
  const { items, mass } = task;
  const all = total(masses);
  if (mass?.rule === 'at-least' && all.lt(mass.of)) return false;
  if (mass?.rule === 'at-most' && all.gt(mass.of)) return false;
  if (mass?.rule === 'exactly' && !all.eq(mass.of)) return false;
  return items.every(({ least, available }, i) => masses[i]?.gte(least) && masses[i].lte(available)) && SHARES.every((share) => !roomBelow(task, share, masses)?.isNegative());
}
