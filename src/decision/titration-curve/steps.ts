import { mean } from 'simple-statistics';
import { LEAST_WINDOW, noiseOf, slopes } from './derivatives.js';
import type { Slope } from './derivatives.js';
import type { CurvePoint } from './points.js';

/** A step of the curve, at the point where it bends over. */
export interface Inflection {
  /** mL. */
  readonly volume: number;
  /** The reading there. */
  readonly reading: number;
  /** How far the slope stands out above that beside the step, reading per mL. */
  readonly prominence: number;
  /** What the step adds to the reading beyond the slope beside it. */
  readonly height: number;
}

export interface Steps {
  /** By rising volume. */
  readonly inflections: readonly Inflection[];
  /** Points under each parabola of the smoothing. */
  readonly window: number;
  /** The smoothed derivative, positive in the direction in which the reading goes. */
  readonly slopes: readonly Slope[];
  /** 1 where the reading rises, −1 where it falls. */
  readonly direction: 1 | -1;
  /** The curve still steepens where it ends: a step lies further on. */
  readonly openEnd: boolean;
}

/** A slope this many of its standard deviations above those beside it is no noise. */
const SIGNIFICANT = 8;
/** A step this many standard deviations of a reading high is no noise. */
const LEAST_HEIGHT = 8;
/** A step as clear as this is not smoothed further, which would only flatten it. */
const CLEAR = 40;
/** A step of less than this share of the span of the readings is no end point: common practice, no source. */
const LEAST_SHARE = 0.04;

/** Finds the steps, with the narrowest smoothing that lifts the steepest of them clear of the noise. */
export function findSteps(points: readonly CurvePoint[]): Steps {
  const noise = noiseOf(points);
  const level = (some: readonly CurvePoint[]): number => mean(some.map(({ reading }) => reading));
  const direction = level(points.slice(-3)) < level(points.slice(0, 3)) ? -1 : 1;
  let best = smoothed(points, LEAST_WINDOW, noise, direction);
  for (let window = LEAST_WINDOW; best.clearness < CLEAR && window <= points.length / 3; window += 2 * Math.ceil(window / 8)) {
    const next = smoothed(points, window, noise, direction);
    if (next.clearness > best.clearness) best = next;
  }
  return best;
}

function smoothed(points: readonly CurvePoint[], window: number, noise: number, direction: 1 | -1): Steps & { readonly clearness: number } {
  const all = slopes(points, window, noise).map((one) => ({ ...one, slope: direction * one.slope, bend: direction * one.bend }));
  const half = (window - 1) / 2;
  const readings = points.map(({ reading }) => reading);
  const least = Math.max(LEAST_SHARE * (Math.max(...readings) - Math.min(...readings)), LEAST_HEIGHT * noise);

  const peaks = hills(all).map((hill) => ({ ...hill, height: heightOf(points, all, hill, direction) }));
  const steps = peaks.filter(({ clearness, height }) => clearness >= SIGNIFICANT && height >= least);
  const inside = steps.filter(({ top }) => top >= half && top < points.length - half);
  return {
    inflections: inside.map(({ top, prominence, height }) => ({ ...bendOver(points, all, top, half), prominence, height })),
    window,
    slopes: all,
    direction,
    openEnd: steps.some(({ top }) => top >= points.length - half),
    clearness: Math.max(0, ...steps.map(({ clearness }) => clearness)),
  };
}

/** A hill of the derivative: places in the list of its top and of the lowest slopes on either side up to where it is higher. */
interface Hill {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly prominence: number;
  /** The prominence as a multiple of its standard deviation. */
  readonly clearness: number;
}

/** Every hill, the ends of the curve among them where it is steepest there. */
function hills(all: readonly Slope[]): readonly Hill[] {
  const slope = (at: number): number => all[at]?.slope ?? -Infinity;
  const deviation = (at: number): number => all[at]?.deviation ?? 0;
  const lowest = (top: number, step: 1 | -1): number => {
    let low = top;
    for (let at = top + step; at >= 0 && at < all.length && slope(at) <= slope(top); at += step) if (slope(at) < slope(low)) low = at;
    return low;
  };
  return all.flatMap((_, top): Hill[] => {
    if (slope(top) <= slope(top - 1) || slope(top) < slope(top + 1)) return [];
    const [left, right] = [lowest(top, -1), lowest(top, 1)];
    // the end of the curve has no other side
    const saddle = left === top ? right : right === top || slope(left) > slope(right) ? left : right;
    const prominence = slope(top) - slope(saddle);
    return [{ left, top, right, prominence, clearness: prominence / (Math.hypot(deviation(top), deviation(saddle)) || Number.MIN_VALUE) }];
  });
}

/** What a step adds to the reading beyond the mean of the slopes at its feet; at an end of the curve it has one foot. */
function heightOf(points: readonly CurvePoint[], all: readonly Slope[], { left, top, right }: Hill, direction: 1 | -1): number {
  const [from, to] = [points[left], points[right]];
  const feet = [left, right].filter((foot) => foot !== top).map((foot) => Math.max(0, all[foot]?.slope ?? 0));
  return from && to && feet.length ? direction * (to.reading - from.reading) - mean(feet) * (to.volume - from.volume) : 0;
}

/** Where the second derivative passes through zero, next to the steepest point. */
function bendOver(points: readonly CurvePoint[], all: readonly Slope[], top: number, most: number): { volume: number; reading: number } {
  const bend = (at: number): number => all[at]?.bend ?? 0;
  const step = bend(top) > 0 ? 1 : -1;
  let at = top;
  while (Math.abs(at - top) < most && bend(at + step) * bend(top) > 0) at += step;
  const [near, far] = [points[at], points[at + step]] as [CurvePoint, CurvePoint];
  const share = bend(at) === bend(at + step) ? 0 : bend(at) / (bend(at) - bend(at + step));
  const between = (a: number, b: number): number => a + share * (b - a);
  return { volume: between(near.volume, far.volume), reading: between(near.reading, far.reading) };
}
