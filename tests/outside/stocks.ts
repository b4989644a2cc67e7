import type { BlendTask } from '../../src/decision/blend/stock.js';
import { Decimal } from '../../src/formula/decimal.js';

// Invented stocks from a seed, many of them degenerate on purpose, and a second opinion on them.

/** Mulberry32: the same figures from the same seed on every machine. */
export function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Few different figures, so that lots tie, lie at the limit, are empty, cost nothing or bring money. */
export function stock(seed: number, most = 12): BlendTask {
  const random = seeded(seed);
  const pick = <T>(values: readonly T[]): T => values[Math.floor(random() * values.length)]!;
  const between = (low: number, high: number, decimals: number): Decimal => new Decimal((low + random() * (high - low)).toFixed(decimals));
  const ties = random() < 0.4;
  const count = 1 + Math.floor(random() * most);
  const wet = random() < 0.5;
  const dirty = random() < 0.3;
  const items = Array.from({ length: count }, (_, i) => {
    const available = ties ? new Decimal(pick(['0', '250', '1000', '1234.5'])) : between(0, 5000, 1);
    return {
      name: `L${i}`,
      available,
      least: random() < 0.15 ? (random() < 0.3 ? available : available.times(pick(['0.1', '0.5'])).toDecimalPlaces(0, Decimal.ROUND_DOWN)) : new Decimal(0),
      shares: {
        freeFattyAcid: ties ? new Decimal(pick(['0.5', '1', '3', '3', '5', '8'])) : between(0.1, 9, 2),
        water: ties ? new Decimal(pick(['0.05', '0.1', '0.4'])) : between(0, 0.3, 3),
        insolubles: between(0, 0.4, 2),
      },
      cost: ties ? new Decimal(pick(['-0.05', '0', '0.4', '0.4', '0.7'])) : between(-0.1, 1, 3),
    };
  });
  const rule = pick(['at-least', 'exactly', 'at-most', undefined] as const);
  return {
    items,
    limits: { freeFattyAcid: new Decimal(pick(['1', '2', '3', '3', '5'])), ...(wet && { water: new Decimal(pick(['0.1', '0.2'])) }), ...(dirty && { insolubles: new Decimal('0.2') }) },
    goal: pick(['use-sour', 'least-cost'] as const),
    step: new Decimal(pick(['1', '1', '0.5', '10'])),
    ...(rule && { mass: { rule, of: ties ? new Decimal(pick(['0', '500', '1000', '2000'])) : between(100, 6000, 0) } }),
  };
}

/** The task as text in the LP format, written straight from the figures: nothing scaled, nothing shifted. `sour`: which lots count as such. */
export function lpText(task: BlendTask, sour: readonly boolean[]): string {
  const { items, limits, goal, mass } = task;
  const terms = (of: (i: number) => Decimal): string => items.map((_, i) => `${of(i).isNegative() ? '-' : '+'} ${of(i).abs().toFixed()} m${i}`).join(' ');
  const rows = (['freeFattyAcid', 'water', 'insolubles'] as const).flatMap((share) => {
    const limit = limits[share];
    return limit ? [` ${share}: ${terms((i) => items[i]!.shares[share]!.minus(limit))} <= 0`] : [];
  });
  if (mass) rows.push(` mass: ${terms(() => new Decimal(1))} ${{ 'at-least': '>=', exactly: '=', 'at-most': '<=' }[mass.rule]} ${mass.of.toFixed()}`);
  const objective = goal === 'least-cost' ? `Minimize\n obj: ${terms((i) => items[i]!.cost!)}` : `Maximize\n obj: ${terms((i) => new Decimal(Number(sour[i])))}`;
  const bounds = items.map(({ least, available }, i) => ` ${least.toFixed()} <= m${i} <= ${available.toFixed()}`);
  return `${objective}\nSubject To\n${rows.join('\n')}\nBounds\n${bounds.join('\n')}\nEnd\n`;
}
