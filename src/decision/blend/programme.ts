import { solve } from 'yalps';
import type { Constraint } from 'yalps';

/** A sum over the columns, held between bounds. */
export interface Row {
  readonly of: readonly number[];
  readonly least?: number;
  readonly most?: number;
}

/** A linear programme: the columns' values that keep the bounds and rows and make the objective best. */
export interface Programme {
  readonly best: 'minimize' | 'maximize';
  readonly objective: readonly number[];
  readonly lower: readonly number[];
  /** `Infinity` for none. */
  readonly upper: readonly number[];
  readonly rows: readonly Row[];
}

export interface Solution {
  readonly values: readonly number[];
  readonly objective: number;
}
export type Solved = Solution | 'infeasible' | 'unbounded' | 'not-solved';

/** The solver's tolerance, on figures that are scaled to 1 here: a part in 10⁹ of the largest lot, far below any scale. */
const PRECISION = 1e-9;

/**
 * Solves a linear programme by the simplex method. Columns are counted from their lower bounds and scaled to the largest
 * bound, rows and objective to their largest coefficient, so that the solver's tolerance means the same for a can and a tank farm.
 */
export function solved(programme: Programme): Solved {
  const { lower, upper, objective } = programme;
  if (lower.some((low, i) => low > (upper[i] ?? Infinity))) return 'infeasible';
  const scale = largest([...lower, ...upper.filter(Number.isFinite)]);
  for (const backwards of [false, true]) {
    const { status, variables } = solve(modelOf(programme, scale, backwards), { precision: PRECISION });
    if (status === 'infeasible' || status === 'unbounded') return status;
    // a degenerate corner at which the solver turned round and round: from the other end it does not
    if (status !== 'optimal') continue;
    const moved = new Map(variables);
    const values = lower.map((low, i) => low + (moved.get(i) ?? 0) * scale);
    return { values, objective: sum(objective, values) };
  }
  return 'not-solved';
}

/** Keys of the constraints: rows by their place, and upper bounds behind them. */
type Key = number | 'objective';

function modelOf({ best, objective, lower, upper, rows }: Programme, scale: number, backwards: boolean): Parameters<typeof solve<number, Key>>[0] {
  const constraints: [Key, Constraint][] = [];
  const size = largest(objective);
  const variables = lower.map((_, i): [number, [Key, number][]] => [i, [['objective', (objective[i] ?? 0) / size]]]);
  rows.forEach(({ of, least, most }, at) => {
    const rowSize = largest(of);
    const fixed = sum(of, lower);
    const bound = (value: number): number => (value - fixed) / scale / rowSize;
    constraints.push([at, { ...(least !== undefined && { min: bound(least) }), ...(most !== undefined && { max: bound(most) }) }]);
    of.forEach((coefficient, i) => coefficient && variables[i]?.[1].push([at, coefficient / rowSize]));
  });
  upper.forEach((high, i) => {
    if (!Number.isFinite(high)) return;
    constraints.push([rows.length + i, { max: (high - (lower[i] ?? 0)) / scale }]);
    variables[i]?.[1].push([rows.length + i, 1]);
  });
  return { direction: best, objective: 'objective', constraints, variables: backwards ? variables.reverse() : variables };
}

const largest = (values: readonly number[]): number => values.reduce((most, value) => Math.max(most, Math.abs(value)), 0) || 1;
export const sum = (factors: readonly number[], values: readonly number[]): number => factors.reduce((total, factor, i) => total + factor * (values[i] ?? 0), 0);
