import { Decimal, decimal } from '../../formula/decimal.js';
import { massBounds, programmeOf, sourOf } from './formulation.js';
import { solved, sum } from './programme.js';
import type { Programme, Row } from './programme.js';
import { SHARES } from './stock.js';
import type { BlendTask, Share } from './stock.js';

/**
 * A limit that a blend lies at, and what a practical step of it would bring: money saved, or kg more of sour oil taken up. Found
 * by solving again with the limit moved by that step, so it holds for the whole step, which a derivative at a corner need not.
 */
export type Binding = {
  /** `share`, `mass`: the limit is the blend's; `used-up`, `must-use`: there is no more of an item, or it must go in. */
  readonly code: 'share' | 'mass' | 'used-up' | 'must-use';
  readonly of?: Share;
  /** Place in the stock. */
  readonly item?: number;
  /** The step by which it is moved, in % or kg; below zero where it is lowered. */
  readonly step: Decimal;
  /** Undefined where the step moves nothing. */
  readonly worth: Decimal | undefined;
};

/** Steps that people speak in: % of a share, kg of a mass. */
const STEPS: Readonly<Record<Share | 'mass', string>> = { freeFattyAcid: '0.1', water: '0.01', insolubles: '0.01', mass: '100' };

/** The limits that a blend of the programme lies at, the most worth first. */
export function bindings(task: BlendTask, values: readonly number[], objective: number): readonly Binding[] {
  const { items, mass, limits, goal } = task;
  const sour = sourOf(task);
  const programme = programmeOf(task, sour);
  const total = sum(items.map(() => 1), values);
  const size = programme.upper.reduce((most, high) => Math.max(most, high), 1);
  const at = (value: number, bound: number): boolean => Math.abs(value - bound) <= 1e-7 * size;

  const worthOf = (change: Partial<Programme>): Decimal | undefined => {
    const found = solved({ ...programme, ...change });
    if (typeof found === 'string') return undefined;
    const gain = (found.objective - objective) * (goal === 'least-cost' ? -1 : 1);
    return gain > 1e-7 * Math.max(1, Math.abs(objective)) ? new Decimal(String(gain)) : undefined;
  };
  const rowMoved = (place: number, moved: (row: Row) => Row): Partial<Programme> => ({ rows: programme.rows.map((row, i) => (i === place ? moved(row) : row)) });
  const boundMoved = (bounds: readonly number[], item: number, by: number): readonly number[] => bounds.map((bound, i) => (i === item ? Math.max(0, bound + by) : bound));

  const found: Binding[] = [];
  SHARES.filter((share) => limits[share]).forEach((share, place) => {
    if (sum(programme.rows[place]?.of ?? [], values) < -1e-6 * Math.max(total, 1e-6 * size)) return;
    const step = decimal(STEPS[share]);
    found.push({ code: 'share', of: share, step, worth: worthOf(rowMoved(place, (row) => ({ ...row, of: row.of.map((excess) => excess - step.toNumber()) }))) });
  });
  if (mass && at(total, mass.of.toNumber())) {
    const step = decimal(STEPS.mass).times(mass.rule === 'at-most' || goal === 'use-sour' ? 1 : -1);
    const bounds = massBounds({ ...mass, of: Decimal.max(0, mass.of.plus(step)) });
    found.push({ code: 'mass', step, worth: worthOf(rowMoved(programme.rows.length - 1, ({ of }) => ({ of, ...bounds }))) });
  }
  const step = decimal(STEPS.mass);
  programme.upper.forEach((high, i) => {
    // that more sour oil would take up more sour oil is no news
    if (goal === 'use-sour' && sour[i]) return;
    const [value = 0, low = 0] = [values[i], programme.lower[i]];
    if (high > 0 && at(value, high)) found.push({ code: 'used-up', item: i, step, worth: worthOf({ upper: boundMoved(programme.upper, i, step.toNumber()) }) });
    else if (low > 0 && at(value, low)) found.push({ code: 'must-use', item: i, step: step.neg(), worth: worthOf({ lower: boundMoved(programme.lower, i, -step.toNumber()) }) });
  });
  return found.sort((a, b) => (b.worth ?? ZERO).cmp(a.worth ?? ZERO));
}

const ZERO = decimal('0');
