import type { Interval } from '../formula/sampled.js';
import type { Simulated } from './monte-carlo.js';

/** How far the first-order uncertainty of a result can be relied on (JCGM 101, clause 8). */
export interface FirstOrderCheck {
  /** 95 % interval of a normal distribution about the result. */
  readonly interval: Interval;
  /** Largest distance of its ends from those by Monte Carlo. */
  readonly apart: number;
  /** Half a unit in the first digit of u: the most that the ends may lie apart. */
  readonly tolerance: number;
  /** `wider`: the first-order interval holds the one by Monte Carlo and more, so it errs on the safe side. */
  readonly verdict: 'agrees' | 'wider' | 'differs';
}

/** 97.5 % point of the normal distribution. */
const COVERAGE_95 = 1.959964;

/**
 * Sets the first-order result beside the draws: its interval counts as confirmed where both ends lie within
 * the numerical tolerance δ = ½ · 10^l, u being written as c · 10^l with one digit c (JCGM 101, 7.9.2 and 8.1; from memory).
 *
 * @param value the result, and `u` its standard uncertainty to first order, above zero
 */
export function checkFirstOrder(value: number, u: number, { symmetric }: Simulated): FirstOrderCheck {
  const interval = [value - COVERAGE_95 * u, value + COVERAGE_95 * u] as const;
  const apart = Math.max(Math.abs(interval[0] - symmetric[0]), Math.abs(interval[1] - symmetric[1]));
  const place = Number(u.toExponential(0).split('e')[1]);
  const tolerance = 10 ** place / 2;
  const holds = interval[0] <= symmetric[0] && interval[1] >= symmetric[1];
  return { interval, apart, tolerance, verdict: apart <= tolerance ? 'agrees' : holds ? 'wider' : 'differs' };
}
