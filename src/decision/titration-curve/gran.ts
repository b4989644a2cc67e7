import { linearRegression, rSquared } from 'simple-statistics';
import type { CurveRemark, GRAN_REFUSALS } from './codes.js';
import type { CurveKind, CurvePoint } from './points.js';
import type { Inflection } from './steps.js';

/**
 * Gran's straight line for the branch of the acid or of the base. Gran, G. (1952), Analyst 77:661 (from
 * memory). It holds where the electrode follows Nernst; in a solvent with little water it need not, so
 * it checks the inflection and does not replace it.
 */
export interface GranLine {
  /** Where the line reaches zero, mL. */
  readonly endPoint: number;
  /** Volumes of the first and the last point on the line, mL. */
  readonly from: number;
  readonly to: number;
  readonly points: number;
  readonly rSquared: number;
}

export type Gran = GranLine | { readonly refused: CurveRemark<(typeof GRAN_REFUSALS)[number]> };

export interface GranOptions {
  /** Of the solution, °C; 25 where nothing is said. */
  readonly temperature?: number;
  /** Of the solution before the titration, mL: the base is diluted as titrant is added. Left out, that is neglected. */
  readonly initialVolume?: number;
}

/** R ln 10/F in mV/K, of the exact constants of the SI: 59.16 mV at 25 °C. */
const NERNST = (8.31446261815324 / 96485.33212331) * Math.LN10 * 1000;

/** mV for a factor of ten in the activity of hydrogen ions. @param temperature °C */
export const nernstSlope = (temperature = 25): number => NERNST * (temperature + 273.15);

/** Fewer points make no line worth the name. */
const LEAST_POINTS = 4;
/** A range less straight than this is refused: common practice, no source. */
const LEAST_R_SQUARED = 0.98;
/** Where the line is looked for, widest first: shares of the way to the end point. Below, the acid dissociates; above, the solvent takes part. */
const BEFORE = [[0.2, 0.9], [0.4, 0.9], [0.5, 0.95]] as const;
const BEHIND = [[1.03, 1.5], [1.03, 1.2], [1.01, 1.1]] as const;

/**
 * The line of the weak acid before its end point: V · 10^(−pH) = K (V_e − V), V counted from the end of
 * the step before, where there is one. Dilution cancels.
 */
export function granOfAcid(points: readonly CurvePoint[], kind: CurveKind, end: Inflection, start: number, direction: 1 | -1, options: GranOptions): Gran {
  const fraction = activity(kind, end, direction, options);
  return straightest(points, BEFORE, start, end.volume, (point) => (point.volume - start) * fraction(point));
}

/** The line of the strong base behind the end point: (V₀ + V) · 10^(pH) is as V − V_e. */
export function granOfBase(points: readonly CurvePoint[], kind: CurveKind, end: Inflection, start: number, direction: 1 | -1, options: GranOptions): Gran {
  const fraction = activity(kind, end, direction, options);
  const { initialVolume } = options;
  return straightest(points, BEHIND, start, end.volume, (point) => (initialVolume === undefined ? 1 : initialVolume + point.volume) / fraction(point));
}

/** Activity of hydrogen ions against that at the end point. A potential may rise or fall with the pH: the curve shows which. */
function activity(kind: CurveKind, end: Inflection, direction: 1 | -1, { temperature }: GranOptions): (point: CurvePoint) => number {
  const decade = kind === 'pH' ? 1 : direction * nernstSlope(temperature);
  return ({ reading }) => 10 ** ((end.reading - reading) / decade);
}

function straightest(points: readonly CurvePoint[], ranges: readonly (readonly [number, number])[], start: number, end: number, made: (point: CurvePoint) => number): Gran {
  let [best, most]: [GranLine | undefined, number] = [undefined, 0];
  for (const [low, high] of ranges) {
    const at = (share: number): number => start + share * (end - start);
    const pairs = points.filter(({ volume }) => volume >= at(low) && volume <= at(high)).map((point) => [point.volume, made(point)]);
    most = Math.max(most, pairs.length);
    if (pairs.length < LEAST_POINTS) continue;
    const { m, b } = linearRegression(pairs);
    const straight = rSquared(pairs, (volume) => m * volume + b);
    if (best && straight <= best.rSquared) continue;
    best = { endPoint: -b / m, from: pairs[0]?.[0] ?? 0, to: pairs.at(-1)?.[0] ?? 0, points: pairs.length, rSquared: straight };
    if (straight >= 0.999) break;
  }
  if (!best) return { refused: { code: 'gran-few', params: { points: most, least: LEAST_POINTS } } };
  const { from, to, rSquared: straight, endPoint } = best;
  if (!(straight >= LEAST_R_SQUARED)) return { refused: { code: 'gran-not-straight', params: { from, to, rSquared: straight } } };
  if (!(endPoint > start && endPoint < 2 * end - start)) return { refused: { code: 'gran-outside', params: { from, to, endPoint } } };
  return best;
}
