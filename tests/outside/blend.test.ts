import highsLoader from 'highs';
import { describe, expect, it } from 'vitest';
import { blend } from '../../src/decision/blend/blend.js';
import { bestOf, sourOf } from '../../src/decision/blend/formulation.js';
import type { Remedy } from '../../src/decision/blend/remedies.js';
import { remedies } from '../../src/decision/blend/remedies.js';
import type { BlendItem, BlendTask } from '../../src/decision/blend/stock.js';
import { twoLots } from '../../src/decision/blend/two-lots.js';
import { Decimal } from '../../src/formula/decimal.js';
import { lpText, seeded, stock } from './stocks.ts';

// Against HiGHS 1.x (a dual simplex and interior point solver in C++, compiled to WebAssembly), given the same stocks as text.

const highs = await highsLoader();
const STOCKS = 400;

function secondOpinion(task: BlendTask, sour = sourOf(task)): number | 'infeasible' {
  const { Status, ObjectiveValue } = highs.solve(lpText(task, sour));
  if (Status === 'Infeasible') return 'infeasible';
  if (Status !== 'Optimal') throw new Error(Status);
  return ObjectiveValue;
}

const tasks = Array.from({ length: STOCKS }, (_, seed) => stock(seed + 1));
const near = (a: number, b: number, scale = Math.max(1, Math.abs(a), Math.abs(b))): boolean => Math.abs(a - b) <= 1e-6 * scale;

describe('the linear programme against a second solver', () => {
  it(`gives the same verdict and the same best of ${STOCKS} stocks`, () => {
    const seen = { infeasible: 0, optimal: 0 };
    const wrong = tasks.flatMap((task, seed): object[] => {
      const ours = bestOf(task);
      const theirs = secondOpinion(task);
      seen[theirs === 'infeasible' ? 'infeasible' : 'optimal']++;
      if (typeof ours === 'string' || theirs === 'infeasible') return ours === theirs ? [] : [{ seed, ours, theirs }];
      return near(ours.objective, theirs) ? [] : [{ seed, ours: ours.objective, theirs }];
    });
    expect(wrong).toEqual([]);
    // both kinds are there in numbers
    expect(Math.min(seen.infeasible, seen.optimal)).toBeGreaterThan(60);
  });

  it('with a hundred lots too', () => {
    for (let seed = 1; seed <= 10; seed++) {
      const task = stock(seed * 977, 160);
      const [ours, theirs] = [bestOf(task), secondOpinion(task)];
      if (typeof ours === 'string' || theirs === 'infeasible') expect([seed, ours]).toEqual([seed, theirs]);
      else expect([seed, near(ours.objective, theirs)]).toEqual([seed, true]);
    }
  });
});

describe('a blend that is given', () => {
  it('keeps every limit to the last digit, and acid, water, insolubles and money add up', () => {
    let given = 0;
    for (const task of tasks) {
      const found = blend(task);
      if ('refused' in found) continue;
      given++;
      const { masses, mixture } = found;
      const amount = (of: (item: BlendItem) => Decimal): Decimal => Decimal.sum(0, ...task.items.map((item, i) => of(item).times(masses[i]!)));
      expect(mixture.mass.eq(amount(() => new Decimal(1)))).toBe(true);
      expect(mixture.cost!.eq(amount(({ cost }) => cost!))).toBe(true);
      for (const share of ['freeFattyAcid', 'water', 'insolubles'] as const) {
        const carried = amount(({ shares }) => shares[share]!);
        expect(mixture.shares[share]!.times(mixture.mass).minus(carried).abs().lte(carried.times('1e-30'))).toBe(true);
        const limit = task.limits[share];
        if (limit) expect(carried.lte(limit.times(mixture.mass))).toBe(true);
      }
      task.items.forEach(({ least, available }, i) => expect(masses[i]!.gte(least) && masses[i]!.lte(available)).toBe(true));
      const { mass } = task;
      if (mass) expect({ 'at-least': mixture.mass.gte(mass.of), exactly: mixture.mass.eq(mass.of), 'at-most': mixture.mass.lte(mass.of) }[mass.rule]).toBe(true);
    }
    expect(given).toBeGreaterThan(150);
  });

  it('is never better than the best there is, and no more than a few steps worse', () => {
    for (const [seed, task] of tasks.entries()) {
      const found = blend(task);
      const best = secondOpinion(task);
      if ('refused' in found || best === 'infeasible') continue;
      const reached = (task.goal === 'least-cost' ? found.mixture.cost! : found.mixture.sour).toNumber();
      const short = task.goal === 'least-cost' ? reached - best : best - reached;
      const slack = 1e-6 * Math.max(1, Math.abs(best));
      // a step of each of the few lots between their bounds, and what these make necessary of a lot little cleaner than the limit
      const steps = 40 * task.step.toNumber();
      expect([seed, short >= -slack, short <= steps + slack]).toEqual([seed, true, true]);
    }
  });

  it('is there wherever the second solver finds one that is not nothing', () => {
    const without = tasks.flatMap((task, seed): object[] => {
      const found = blend(task);
      const best = secondOpinion(task);
      if (!('refused' in found)) return best === 'infeasible' ? [{ seed, best }] : [];
      if (best === 'infeasible') return ['empty-stock', 'above-all', 'too-little', 'must-use-too-much', 'together'].includes(found.refused) ? [] : [{ seed, refused: found.refused }];
      // best is to blend nothing, or nothing is in stock
      return ['nothing-is-cheapest', 'nothing-fits', 'above-all', 'empty-stock'].includes(found.refused) ? [] : [{ seed, refused: found.refused }];
    });
    expect(without).toEqual([]);
  });
});

it('what a limit is worth is what solving again with it moved brings', () => {
  let compared = 0;
  for (const [seed, task] of tasks.entries()) {
    const found = blend(task);
    const best = secondOpinion(task);
    if ('refused' in found || best === 'infeasible') continue;
    const sour = sourOf(task);
    for (const { code, of, item, step, worth } of found.bindings) {
      const items = task.items.map((one, i) => (i !== item ? one : code === 'used-up' ? { ...one, available: one.available.plus(step) } : { ...one, least: Decimal.max(0, one.least.plus(step)) }));
      const moved: BlendTask = {
        ...task, items,
        ...(of && { limits: { ...task.limits, [of]: task.limits[of]!.plus(step) } }),
        ...(code === 'mass' && { mass: { ...task.mass!, of: Decimal.max(0, task.mass!.of.plus(step)) } }),
      };
      const again = secondOpinion(moved, sour);
      const gain = again === 'infeasible' ? 0 : (again - best) * (task.goal === 'least-cost' ? -1 : 1);
      expect([seed, code, near(worth?.toNumber() ?? 0, Math.max(0, gain), Math.max(1, Math.abs(best)))]).toEqual([seed, code, true]);
      compared++;
    }
  }
  expect(compared).toBeGreaterThan(300);
});

describe('each remedy', () => {
  const nudge = (task: BlendTask, remedy: Remedy, short: boolean): BlendTask => {
    const item = 'item' in remedy ? remedy.item : -1;
    const withItem = (change: (one: BlendItem) => Partial<BlendItem>): BlendTask => ({ ...task, items: task.items.map((one, i) => (i === item ? { ...one, ...change(one) } : one)) });
    const steps = short ? task.step.times('1.01') : new Decimal(0);
    switch (remedy.code) {
      case 'raise-limit':
        return { ...task, limits: { ...task.limits, [remedy.of]: remedy.to.minus(short ? '0.0101' : 0) } };
      case 'less-mass':
        return { ...task, mass: { ...task.mass!, of: remedy.to.plus(steps) } };
      case 'more-mass':
        return { ...task, mass: { ...task.mass!, of: remedy.to.minus(steps) } };
      case 'less-of':
        return withItem(() => ({ least: remedy.to.plus(steps) }));
      case 'more-of':
        return withItem(({ available }) => ({ available: available.plus(remedy.by).minus(steps) }));
    }
  };

  it('is enough by itself, and a step less is not', () => {
    const counts: Record<string, number> = {};
    for (const [seed, task] of tasks.entries()) {
      if (bestOf(task) !== 'infeasible') continue;
      for (const remedy of remedies(task)) {
        counts[remedy.code] = (counts[remedy.code] ?? 0) + 1;
        expect([seed, remedy.code, secondOpinion(nudge(task, remedy, false)) !== 'infeasible']).toEqual([seed, remedy.code, true]);
        expect([seed, remedy.code, secondOpinion(nudge(task, remedy, true))]).toEqual([seed, remedy.code, 'infeasible']);
      }
    }
    expect(Object.keys(counts).sort()).toEqual(['less-mass', 'less-of', 'more-mass', 'more-of', 'raise-limit']);
  });
});

it('two lots by the programme are two lots in closed form', () => {
  const random = seeded(11);
  for (let i = 0; i < 60; i++) {
    const share = (low: number, high: number): Decimal => new Decimal((low + random() * (high - low)).toFixed(3));
    const first = { freeFattyAcid: share(3.01, 12), water: share(0, 0.3) };
    const second = { freeFattyAcid: share(0, 2.99), water: share(0, 0.09) };
    const limits = { freeFattyAcid: new Decimal(3), water: new Decimal('0.1') };
    const item = (shares: BlendItem['shares']): BlendItem => ({ name: '', available: new Decimal(100), least: new Decimal(0), shares });
    const found = bestOf({ items: [item(first), item(second)], limits, goal: 'use-sour', step: new Decimal(1), mass: { rule: 'exactly', of: new Decimal(100) } });
    if (typeof found === 'string') throw new Error(found);
    expect(near(found.objective, twoLots(first, second, limits)!.most.toNumber(), 100)).toBe(true);
  }
});
