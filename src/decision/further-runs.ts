import type { Decimal } from '../formula/decimal.js';
import { GUARD_FACTOR } from './guard.js';

/** A result near a limit, and what its uncertainty is made of; all in the unit of the result. */
export interface CloseCall {
  /** From the result to the limit, either way. */
  readonly distance: Decimal;
  /** Variance that falls as runs are added, and the variance that stays. */
  readonly perRun: Decimal;
  readonly lasting: Decimal;
  /** Runs that count so far. */
  readonly runs: number;
}

/** More than this nobody runs for one delivery. */
export const MOST_RUNS = 12;

/**
 * How many further runs would put the result clear of the limit, if their mean stayed where it is: the
 * scatter's variance falls with their number, g = 1.645 · √(lasting + perRun · n/(n + k)).
 *
 * @returns `lasting` where what no run takes away is alone too much; `many` where it would take more than anyone runs
 */
export function furtherRuns({ distance, perRun, lasting, runs }: CloseCall): number | 'lasting' | 'many' {
  if (runs < 1 || perRun.isZero() || GUARD_FACTOR.times(lasting.sqrt()).gte(distance)) return 'lasting';
  for (let further = 1; runs + further <= MOST_RUNS; further++) {
    const u = lasting.plus(perRun.times(runs).div(runs + further)).sqrt();
    if (GUARD_FACTOR.times(u).lt(distance)) return further;
  }
  return 'many';
}
