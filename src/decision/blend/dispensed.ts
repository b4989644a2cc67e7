import { Decimal, decimal } from '../../formula/decimal.js';
import { hasAllPrices, rowsOf, sourOf } from './formulation.js';
import { keepsLimits, mixtureOf } from './mixture.js';
import { sum } from './programme.js';
import type { BlendItem, BlendTask } from './stock.js';

/** How near to a bound a mass of the programme is all there is, as part of the largest lot. */
const NEAR = 1e-7;

/**
 * Rounds the masses of a programme to whole steps. Few lots lie between their bounds (no more than there are limits), so every
 * way of rounding these up or down is tried, and the best of those kept that keep all limits; what is used up, or must go in, stays.
 * Undefined where no way does.
 */
export const dispensed = (task: BlendTask, values: readonly number[]): readonly Decimal[] | undefined =>
  bestRounding(task, values, false) ?? bestRounding(task, values, true);

function bestRounding(task: BlendTask, values: readonly number[], inwards: boolean): readonly Decimal[] | undefined {
  const { items, mass, step } = task;
  const near = NEAR * Math.max(...items.map(({ available }) => available.toNumber()));
  const choices = items.map((item, i) => roundings(item, values[i] ?? 0, step, near));
  if (inwards) for (const i of extremes(task, choices)) choices[i] = [...(choices[i] ?? []), ...besides(items[i], choices[i]?.[0], step)];
  // for a mass that is fixed, the largest part between its bounds takes what the others leave
  const last = mass?.rule === 'exactly' ? largestOpen(choices) : -1;
  let best: readonly Decimal[] | undefined;
  let bestRank: readonly Decimal[] = [];
  let bestRough = Infinity;
  const rows = rowsOf(task);
  const aim = roughAim(task);
  const slack = 1e-9 * sum(items.map(() => 1), items.map(({ available }) => available.toNumber()));
  const masses = choices.map(([first = decimal('0')]) => first);
  const open = choices.flatMap((ways, i) => (ways.length > 1 && i !== last ? [i] : [])).slice(0, MOST_OPEN);
  const tryAll = (at: number): void => {
    const i = open[at];
    if (i !== undefined) {
      for (const way of choices[i] ?? []) {
        masses[i] = way;
        tryAll(at + 1);
      }
      return;
    }
    if (mass && last >= 0) masses[last] = masses.reduce((left, one, other) => (other === last ? left : left.minus(one)), mass.of);
    // most ways are told apart by floating point; what is near is decided exactly
    const numbers = masses.map(Number);
    if (rows.some(({ of, least = -Infinity, most = Infinity }) => misses(sum(of, numbers), least, most, slack))) return;
    const rough = sum(aim, numbers);
    if (best && rough > bestRough + slack) return;
    if (!keepsLimits(task, masses)) return;
    const rank = rankOf(task, masses);
    if (best && !before(rank, bestRank)) return;
    best = [...masses];
    bestRank = rank;
    bestRough = rough;
  };
  tryAll(0);
  return best;
}

const misses = (value: number, least: number, most: number, slack: number): boolean => value < least - slack || value > most + slack;

/** What the goal counts, a kg of each item; less is better. */
const roughAim = (task: BlendTask): readonly number[] =>
  task.goal === 'least-cost' ? task.items.map(({ cost }) => cost?.toNumber() ?? 0) : sourOf(task).map((sour) => -Number(sour));

/** With four ways each, a thousand blends at the most. */
const MOST_OPEN = 5;

/** Ways to round a mass: all there is, or no more than must be, where it is that; else two whole steps on either side. */
function roundings({ least, available }: BlendItem, value: number, step: Decimal, near: number): readonly Decimal[] {
  for (const bound of [least, available]) if (Math.abs(value - bound.toNumber()) <= near) return [bound];
  const steps = new Decimal(String(value)).div(step);
  const ways = [steps.round(), steps.floor(), steps.floor().minus(1), steps.ceil(), steps.ceil().plus(1)].map((count) => count.times(step));
  return distinct([...ways.filter((way) => way.gte(least) && way.lte(available)), ...[least, available].filter((bound) => steps.times(step).minus(bound).abs().lt(step))]);
}

/** A step inwards of a bound, for where the bounds themselves miss a limit by a hair. */
function besides(item: BlendItem | undefined, bound: Decimal | undefined, step: Decimal): readonly Decimal[] {
  if (!item || !bound) return [];
  return [bound.minus(step), bound.plus(step)].filter((way) => way.gte(item.least) && way.lte(item.available));
}

/** Of the parts at their bounds, the sourest and the cleanest. */
function extremes({ items }: BlendTask, choices: readonly (readonly Decimal[])[]): readonly number[] {
  const fixed = items.flatMap((item, i) => (choices[i]?.length === 1 && !item.least.eq(item.available) ? [i] : []));
  const ffa = (i: number | undefined): Decimal => (i === undefined ? undefined : items[i]?.shares.freeFattyAcid) ?? decimal('0');
  const sorted = fixed.sort((a, b) => ffa(a).cmp(ffa(b)));
  return [...new Set([sorted[0], sorted.at(-1)])].filter((i) => i !== undefined);
}

function largestOpen(choices: readonly (readonly Decimal[])[]): number {
  const size = (i: number): Decimal => choices[i]?.[0] ?? decimal('0');
  return choices.flatMap((ways, i) => (ways.length > 1 ? [i] : [])).reduce((best, i) => (best < 0 || size(i).gt(size(best)) ? i : best), -1);
}

/** What makes one blend better than another, the weightiest first; less is better. */
function rankOf(task: BlendTask, masses: readonly Decimal[]): readonly Decimal[] {
  const { cost, sour, mass } = mixtureOf(task, masses);
  const money = hasAllPrices(task) && cost ? cost : mass.minus(sour);
  return task.goal === 'least-cost' ? [money] : [sour.neg(), money];
}

function before(rank: readonly Decimal[], other: readonly Decimal[]): boolean {
  for (const [i, value] of rank.entries()) {
    const compared = value.cmp(other[i] ?? Infinity);
    if (compared !== 0) return compared < 0;
  }
  return false;
}

const distinct = (values: readonly Decimal[]): readonly Decimal[] => values.filter((value, i) => values.findIndex((other) => other.eq(value)) === i);
