import { mean } from 'simple-statistics';
import { middlePlaces } from '../../formula/median.js';
import type { CurvePoint } from './points.js';

/** A point of the smoothed curve. */
export interface Slope {
  readonly volume: number;
  /** First derivative, reading per mL, and its standard deviation. */
  readonly slope: number;
  readonly deviation: number;
  /** Second derivative, reading per mL². */
  readonly bend: number;
}

/** A parabola has three coefficients; five points leave two to smooth with. */
export const LEAST_WINDOW = 5;

/**
 * First and second derivative by a parabola laid through the points around each one by least squares
 * (Savitzky and Golay 1964, Anal. Chem. 36:1627; from memory), here at the volumes as they are: a
 * titration takes small steps near the end, and weights for even steps would see an end point where
 * the steps change. Near the ends of the curve the parabola is that of the last whole window.
 *
 * @param window points under each parabola, odd, from {@link LEAST_WINDOW} to their number
 * @param noise standard deviation of a reading
 */
export function slopes(points: readonly CurvePoint[], window: number, noise: number): readonly Slope[] {
  const half = (window - 1) / 2;
  return points.map((point, at) => {
    const from = Math.min(Math.max(at - half, 0), points.length - window);
    return { volume: point.volume, ...parabolaAt(point, points.slice(from, from + window), noise) };
  });
}

function parabolaAt({ volume: origin, reading: level }: CurvePoint, around: readonly CurvePoint[], noise: number): Omit<Slope, 'volume'> {
  // scales the equations: no power is far from 1
  const reach = Math.max(origin - (around[0]?.volume ?? 0), (around.at(-1)?.volume ?? 0) - origin);
  let [s1, s2, s3, s4, t0, t1, t2] = [0, 0, 0, 0, 0, 0, 0];
  for (const { volume, reading } of around) {
    const u = (volume - origin) / reach;
    const r = reading - level;
    s1 += u;
    s2 += u * u;
    s3 += u * u * u;
    s4 += u * u * u * u;
    t0 += r;
    t1 += u * r;
    t2 += u * u * r;
  }
  // the normal equations, by Cramer's rule
  const s0 = around.length;
  const determinant = s0 * (s2 * s4 - s3 * s3) - s1 * (s1 * s4 - s2 * s3) + s2 * (s1 * s3 - s2 * s2);
  const middle = s0 * s4 - s2 * s2;
  const slope = (t1 * middle - t0 * (s1 * s4 - s2 * s3) - t2 * (s0 * s3 - s1 * s2)) / determinant;
  const bend = (t0 * (s1 * s3 - s2 * s2) - t1 * (s0 * s3 - s1 * s2) + t2 * (s0 * s2 - s1 * s1)) / determinant;
  return { slope: slope / reach, deviation: (noise * Math.sqrt(middle / determinant)) / reach, bend: (2 * bend) / reach ** 2 };
}

/** Median of the absolute values of normal draws of standard deviation 1. */
const NORMAL_MEDIAN = 0.6745;

/**
 * Standard deviation of a reading, from how far each lies off the line through the two beside it or off
 * the cubic through the four, whichever follows the curve better; at least that of rounding, where
 * readings come in steps (a rectangular distribution, width/√12).
 */
export function noiseOf(points: readonly CurvePoint[]): number {
  const off = (reach: number): number =>
    middle(points.slice(reach, -reach).map((point, at) => offNeighbours(point, [...points.slice(at, at + reach), ...points.slice(at + reach + 1, at + 2 * reach + 1)])));
  const levels = points.map(({ reading }) => reading).sort((a, b) => a - b);
  const rounding = Math.min(...levels.map((level, at) => level - (levels[at - 1] ?? -Infinity)).filter((step) => step > 0));
  return Math.max(Math.min(off(1), off(2)) / NORMAL_MEDIAN, rounding / Math.sqrt(12));
}

function middle(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return mean(middlePlaces(sorted.length).map((place) => sorted[place] ?? 0));
}

/** Distance of a reading from Lagrange's polynomial through its neighbours, against the scatter that such a distance has for a scatter of 1. */
function offNeighbours({ volume, reading }: CurvePoint, others: readonly CurvePoint[]): number {
  let [sum, squares] = [reading, 1];
  for (const one of others) {
    const weight = others.reduce((product, other) => (other === one ? product : (product * (volume - other.volume)) / (one.volume - other.volume)), 1);
    sum -= weight * one.reading;
    squares += weight * weight;
  }
  return Math.abs(sum) / Math.sqrt(squares);
}
