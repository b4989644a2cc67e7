import type { Programme, Row, Solution, Solved } from './programme.js';
import { solved } from './programme.js';
import { SHARES, isSour } from './stock.js';
import type { BlendTask, Share } from './stock.js';

/** The limits of a task over the kg of each item. A share of the whole is linear: Σ mass · (share − limit) is at most zero. */
export function rowsOf({ items, limits, mass }: BlendTask, without?: Share | 'mass'): readonly Row[] {
  const rows: Row[] = SHARES.flatMap((share) => {
    const limit = limits[share];
    return limit && share !== without ? [{ of: items.map(({ shares }) => shares[share]?.minus(limit).toNumber() ?? 0), most: 0 }] : [];
  });
  if (mass && without !== 'mass') rows.push({ of: items.map(() => 1), ...massBounds(mass) });
  return rows;
}

export function massBounds({ rule, of }: NonNullable<BlendTask['mass']>): { readonly least?: number; readonly most?: number } {
  const bound = of.toNumber();
  return { ...(rule !== 'at-most' && { least: bound }), ...(rule !== 'at-least' && { most: bound }) };
}

/** The task as a programme whose objective is still to be said. */
export function ground(task: BlendTask): Omit<Programme, 'best' | 'objective'> {
  const { items } = task;
  return { lower: items.map(({ least }) => least.toNumber()), upper: items.map(({ available }) => available.toNumber()), rows: rowsOf(task) };
}

/** Which items count as sour: by the limit as it was set, also where it is moved to see what that would bring. */
export const sourOf = ({ items, limits }: BlendTask): readonly boolean[] => items.map((item) => isSour(item, limits));

type Aim = Pick<Programme, 'best' | 'objective'>;
export const hasAllPrices = ({ items }: BlendTask): boolean => items.every(({ cost }) => cost);

function leastCost({ items }: BlendTask): Aim {
  return { best: 'minimize', objective: items.map(({ cost }) => cost?.toNumber() ?? 0) };
}
const mostSour = (sour: readonly boolean[]): Aim => ({ best: 'maximize', objective: sour.map(Number) });
const leastClean = (sour: readonly boolean[]): Aim => ({ best: 'minimize', objective: sour.map((one) => Number(!one)) });

/** The task as a programme. */
export const programmeOf = (task: BlendTask, sour = sourOf(task)): Programme => ({ ...ground(task), ...(task.goal === 'least-cost' ? leastCost(task) : mostSour(sour)) });

/** The best that the goal itself can come to. */
export const bestOf = (task: BlendTask, sour = sourOf(task)): Solved => solved(programmeOf(task, sour));

/** Of two blends that take up as much sour oil, the cheaper; without all prices the one that needs less clean oil. */
export function settled(task: BlendTask, found: Solution, sour = sourOf(task)): Solution {
  if (task.goal === 'least-cost') return found;
  const programme = ground(task);
  // a hair below, or the solver's own rounding leaves nothing
  const held: Row = { of: sour.map(Number), least: found.objective * (1 - 1e-8) };
  const second = solved({ ...programme, rows: [...programme.rows, held], ...(hasAllPrices(task) ? leastCost(task) : leastClean(sour)) });
  return typeof second === 'string' ? found : second;
}
