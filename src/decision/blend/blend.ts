import { Decimal, decimal } from '../../formula/decimal.js';
import { dispensed } from './dispensed.js';
import { bestOf, hasAllPrices, settled, sourOf } from './formulation.js';
import { mixtureOf } from './mixture.js';
import type { Mixture } from './mixture.js';
import { sum } from './programme.js';
import { remedies } from './remedies.js';
import type { Remedy } from './remedies.js';
import { SHARES, isSour } from './stock.js';
import type { BlendTask, Goal, Share } from './stock.js';
import { bindings } from './worth.js';
import type { Binding } from './worth.js';

/** Why there is no blend. */
export const REFUSALS = ['empty-stock', 'above-all', 'too-little', 'must-use-too-much', 'together', 'nothing-fits', 'nothing-is-cheapest', 'step-too-coarse', 'not-solved'] as const;
/**
 * - `empty-stock`: nothing with mass and acidity is in stock;
 * - `above-all`: every oil is above a limit; with it come the limit and the lowest there is;
 * - `too-little`: less in stock than is asked for;
 * - `must-use-too-much`: what must go in is more than is asked for;
 * - `together`: the limits cannot all be kept;
 * - `nothing-fits`: no sour oil can go in, and nothing else is asked for;
 * - `nothing-is-cheapest`: the cheapest is to blend nothing, for want of a mass that is asked for;
 * - `step-too-coarse`: the one blend there is cannot be weighed in whole steps;
 * - `not-solved`: the solver came to no end.
 */
export type RefusalCode = (typeof REFUSALS)[number];

/** What is to be said with a blend: prices missing, so the other goal was taken; finer steps than asked; no sour oil in stock. */
export const REMARKS = ['prices-missing', 'finer-step', 'none-sour'] as const;
export type RemarkCode = (typeof REMARKS)[number];

export interface Blended {
  readonly goal: Goal;
  /** kg of each item, in the order of the stock. */
  readonly masses: readonly Decimal[];
  readonly mixture: Mixture;
  readonly step: Decimal;
  readonly bindings: readonly Binding[];
  readonly remarks: readonly RemarkCode[];
}

export interface NoBlend {
  readonly refused: RefusalCode;
  readonly share?: Share;
  /** %, the lowest share there is in stock; or kg there are, or must go in. */
  readonly found?: Decimal;
  readonly remedies: readonly Remedy[];
}

/**
 * Chooses how much of each lot in stock to blend: a linear programme over the kg of each, since acid, water and insolubles mix by
 * mass. The masses are rounded to whole steps and then checked against every limit exactly; a blend that misses one is never given.
 */
export function blend(asked: BlendTask): Blended | NoBlend {
  if (!asked.items.some(({ available }) => available.gt(0))) return { refused: 'empty-stock', remedies: [] };
  const unpriced = asked.goal === 'least-cost' && !hasAllPrices(asked);
  const task: BlendTask = unpriced ? { ...asked, goal: 'use-sour' } : asked;
  const first = bestOf(task);
  if (first === 'infeasible') return { ...whyNot(task), remedies: remedies(task) };
  if (typeof first === 'string') return { refused: 'not-solved', remedies: [] };
  const { values } = settled(task, first);
  const found = weighable(task, values);
  if (!found) return { refused: 'step-too-coarse', remedies: [] };
  const mixture = mixtureOf(task, found.masses);
  if (mixture.mass.isZero()) return nothing(task);
  const remarks: RemarkCode[] = [
    ...(unpriced ? ['prices-missing' as const] : []), ...(found.step.lt(task.step) ? ['finer-step' as const] : []),
    ...(task.goal === 'use-sour' && !task.items.some((item) => isSour(item, task.limits)) ? ['none-sour' as const] : []),
  ];
  return { goal: task.goal, masses: found.masses, mixture, step: found.step, bindings: bindings(task, values, first.objective), remarks };
}

/** Masses that can be weighed and keep every limit to the last digit. */
interface Weighable {
  readonly masses: readonly Decimal[];
  /** kg; finer than asked where that was too coarse. */
  readonly step: Decimal;
}

/** How many steps of room the limits are given where the very best cannot be rounded. */
const ROOM = [1, 4];
/** How often a step is made ten times finer where no whole ones keep the limits. */
const FINER = 3;

/** The programme's masses in whole steps; where none keeps the limits, those of a blend a little inside them; else in finer steps. */
function weighable(asked: BlendTask, values: readonly number[]): Weighable | undefined {
  const kilograms = sum(values.map(() => 1), values);
  let task = asked;
  for (let finer = 0; finer <= FINER; finer++, task = { ...task, step: task.step.div(10) }) {
    for (const room of [0, ...ROOM]) {
      const inside = room ? inner(task, room, kilograms) : values;
      const masses = inside && dispensed(task, inside);
      if (masses) return { masses, step: task.step };
    }
  }
  return undefined;
}

/** The best of the limits narrowed by so many steps. */
function inner(task: BlendTask, steps: number, kilograms: number): readonly number[] | undefined {
  const narrower = narrowed(task, steps, kilograms);
  const found = bestOf(narrower, sourOf(task));
  return typeof found === 'string' ? undefined : settled(narrower, found, sourOf(task)).values;
}

/** Limits narrowed by what so many steps of the oil farthest from them can change. */
function narrowed(task: BlendTask, steps: number, kilograms: number): BlendTask {
  const { items, limits, mass, step } = task;
  const room = step.times(steps);
  const inside = SHARES.flatMap((share) => {
    const limit = limits[share];
    if (!limit || kilograms <= 0) return [];
    const farthest = items.reduce((most, { shares }) => Decimal.max(most, shares[share]?.minus(limit).abs() ?? 0), decimal('0'));
    return [[share, limit.minus(farthest.times(room).div(String(kilograms)))] as const];
  });
  const of = mass && { 'at-least': mass.of.plus(room), exactly: mass.of, 'at-most': mass.of.minus(room) }[mass.rule];
  return { ...task, limits: { ...limits, ...Object.fromEntries(inside) }, ...(mass && of && { mass: { ...mass, of } }) };
}

function whyNot(task: BlendTask): Omit<NoBlend, 'remedies'> {
  const { items, mass } = task;
  const share = SHARES.find((one) => aboveAll(task, one));
  if (share) return { refused: 'above-all', share, found: lowest(task, share) };
  const there = items.reduce((sum, { available }) => sum.plus(available), decimal('0'));
  if (mass && mass.rule !== 'at-most' && there.lt(mass.of)) return { refused: 'too-little', found: there };
  const must = items.reduce((sum, { least }) => sum.plus(least), decimal('0'));
  if (mass && mass.rule !== 'at-least' && must.gt(mass.of)) return { refused: 'must-use-too-much', found: must };
  return { refused: 'together' };
}

/** Nothing at all keeps every limit, and is best; what was missing is said. */
function nothing(task: BlendTask): NoBlend {
  if (task.goal === 'least-cost') return { refused: 'nothing-is-cheapest', remedies: [] };
  const share = SHARES.find((one) => aboveAll(task, one));
  if (!share) return { refused: task.items.some((item) => isSour(item, task.limits)) ? 'nothing-fits' : 'nothing-is-cheapest', remedies: [] };
  return { refused: 'above-all', share, found: lowest(task, share), remedies: [] };
}

const present = ({ items }: BlendTask): BlendTask['items'] => items.filter(({ available }) => available.gt(0));
const aboveAll = (task: BlendTask, share: Share): boolean => {
  const limit = task.limits[share];
  return !!limit && present(task).every(({ shares }) => shares[share]?.gt(limit));
};
const lowest = (task: BlendTask, share: Share): Decimal =>
  present(task).flatMap(({ shares }) => shares[share] ?? []).reduce((least, one) => (one.lt(least) ? one : least));
