import { Decimal } from '../../formula/decimal.js';
import { ground, massBounds, rowsOf } from './formulation.js';
import { solved, sum } from './programme.js';
import type { Row } from './programme.js';
import { SHARES } from './stock.js';
import type { BlendTask, Share } from './stock.js';

/** One change that alone makes a blend possible, the least of its kind. */
export type Remedy =
  /** The limit of a share raised to so many %. */
  | { readonly code: 'raise-limit'; readonly of: Share; readonly to: Decimal }
  /** So many kg asked for, in place of more, or of less. */
  | { readonly code: 'less-mass' | 'more-mass'; readonly to: Decimal }
  /** No more than so many kg of an item that must go in. */
  | { readonly code: 'less-of'; readonly item: number; readonly to: Decimal }
  /** So many kg more of an item. */
  | { readonly code: 'more-of'; readonly item: number; readonly by: Decimal };

/** Decimals to which a share's new limit is given; rounded up, so that it is enough. */
const DECIMALS = 2;

/**
 * What would free a stock that no blend can be made of: each limit in turn is let go as far as needed while all others stay
 * (elastic relaxation). Empty where no single change is enough.
 */
export function remedies(task: BlendTask): readonly Remedy[] {
  return [...SHARES.map((share) => raisedLimit(task, share)), ...otherMass(task), ...lessOf(task), moreOfOne(task)].filter((remedy) => remedy !== undefined);
}

/**
 * The lowest share that a blend can have while everything else holds. A share is a quotient of two sums; with the parts counted
 * per kg of blend (y) and the reciprocal of its mass (t) as columns it becomes linear (Charnes and Cooper 1962, from memory).
 */
function raisedLimit(task: BlendTask, share: Share): Remedy | undefined {
  const { items, limits } = task;
  if (!limits[share]) return undefined;
  const { lower, upper } = ground(task);
  const size = Math.max(...upper, 1);
  const unit = (i: number): number[] => items.map((_, other) => Number(other === i));
  const rows: Row[] = rowsOf(task, share).map(({ of, least, most }) => {
    // Σ of·m ≥ least for m = y/t is Σ of·y − least·t ≥ 0; of the rows only that of the mass has both bounds, and its own two rows
    if (least !== undefined && most === undefined) return { of: [...of, -least / size], least: 0 };
    return { of: [...of, -(most ?? 0) / size], most: 0 };
  });
  if (task.mass?.rule === 'exactly') rows.push({ of: [...items.map(() => 1), -(massBounds(task.mass).least ?? 0) / size], least: 0 });
  items.forEach((_, i) => {
    rows.push({ of: [...unit(i), -(upper[i] ?? 0) / size], most: 0 });
    if (lower[i]) rows.push({ of: [...unit(i), -(lower[i] ?? 0) / size], least: 0 });
  });
  rows.push({ of: [...items.map(() => 1), 0], least: 1, most: 1 });
  const found = solved({
    best: 'minimize', objective: [...items.map(({ shares }) => shares[share]?.toNumber() ?? 0), 0], lower: [...items.map(() => 0), 0], upper: [...items.map(() => Infinity), Infinity], rows,
  });
  if (typeof found === 'string') return undefined;
  return { code: 'raise-limit', of: share, to: new Decimal(String(found.objective)).minus('1e-8').toDecimalPlaces(DECIMALS, Decimal.ROUND_CEIL) };
}

/** The mass that the other limits allow: most of it where too much was asked for, least where what must go in is more. */
function otherMass(task: BlendTask): readonly (Remedy | undefined)[] {
  const { mass, items, step } = task;
  if (!mass) return [];
  const { lower, upper } = ground(task);
  const found = (best: 'minimize' | 'maximize'): number | undefined => {
    const extreme = solved({ best, objective: items.map(() => 1), lower, upper, rows: rowsOf(task, 'mass') });
    return typeof extreme === 'string' ? undefined : extreme.objective;
  };
  const { least, most } = massBounds(mass);
  const highest = least === undefined ? undefined : found('maximize');
  const lowest = most === undefined ? undefined : found('minimize');
  const down = (value: number): Decimal => whole(value, step).floor().times(step);
  return [
    highest === undefined || least === undefined || highest >= least || down(highest).lte(0) ? undefined : { code: 'less-mass', to: down(highest) },
    lowest === undefined || most === undefined || lowest <= most ? undefined : { code: 'more-mass', to: whole(lowest, step).ceil().times(step) },
  ];
}

/** How much of an item that must go in can. */
function lessOf(task: BlendTask): readonly (Remedy | undefined)[] {
  const { items, step } = task;
  const programme = ground(task);
  return items.map(({ least }, item) => {
    if (!least.gt(0)) return undefined;
    const lower = programme.lower.map((low, i) => (i === item ? 0 : low));
    const found = solved({ ...programme, best: 'maximize', objective: items.map((_, i) => Number(i === item)), lower, upper: programme.upper.map((high, i) => (i === item ? Math.min(high, least.toNumber()) : high)) });
    if (typeof found === 'string') return undefined;
    return { code: 'less-of', item, to: whole(Math.max(0, found.objective), step).floor().times(step) };
  });
}

/** Of the oils that keep every limit themselves, the one of which the fewest kg more are enough. */
function moreOfOne(task: BlendTask): Remedy | undefined {
  const { items, limits, step } = task;
  const programme = ground(task);
  const clean = items.flatMap(({ shares }, i) => (SHARES.every((share) => !limits[share] || shares[share]?.lte(limits[share])) ? [i] : []));
  let best: { readonly item: number; readonly by: number } | undefined;
  for (const item of clean) {
    const rows: Row[] = programme.rows.map((row) => ({ ...row, of: [...row.of, 0] }));
    // what is used beyond what there is, as a column of its own
    const beyond = [...items.map((_, i) => Number(i === item)), -1];
    rows.push({ of: beyond, most: programme.upper[item] ?? 0 });
    const found = solved({
      best: 'minimize', objective: [...items.map(() => 0), 1], lower: [...programme.lower, 0], upper: [...programme.upper.map((high, i) => (i === item ? Infinity : high)), Infinity], rows,
    });
    if (typeof found === 'string') continue;
    const by = sum([...items.map(() => 0), 1], found.values);
    if (!best || by < best.by) best = { item, by };
  }
  return best && { code: 'more-of', item: best.item, by: whole(best.by, step).ceil().times(step) };
}

/** So many steps; what the solver leaves behind the eighth digit makes no step more or less. */
const whole = (value: number, step: Decimal): Decimal => new Decimal(String(value)).toSignificantDigits(8).div(step).toDecimalPlaces(6);
