import type { CurveRefusal, CurveRemark } from './codes.js';
import type { Slope } from './derivatives.js';
import { granOfAcid, granOfBase } from './gran.js';
import type { Gran, GranOptions } from './gran.js';
import { prepare } from './points.js';
import type { CurveKind, CurvePoint } from './points.js';
import { findSteps } from './steps.js';
import type { Inflection } from './steps.js';

/** The end point of a titration curve and what it rests on. Doubles: a curve holds no more than four digits. */
export interface CurveReading {
  /** Titrant at the end point of the total acid, mL: the last inflection. */
  readonly endPoint: number;
  readonly by: 'inflection';
  /** All steps, by rising volume. */
  readonly inflections: readonly Inflection[];
  /** A second estimate by Gran's method, from the acid before the end point and the base behind it; for an acid titrated with alkali. */
  readonly gran?: { readonly acid: Gran; readonly base: Gran };
  readonly remarks: readonly CurveRemark[];
  /** Points under each parabola of the smoothing. */
  readonly window: number;
  /** What was read, as prepared, and its smoothed derivative; both for drawing. */
  readonly points: readonly CurvePoint[];
  readonly slopes: readonly Slope[];
}

/** By more than this the two methods differ: mL, and a share of the end point. Common practice, no source. */
const DIFFERENCE = { volume: 0.1, share: 0.02 };
/** Steps between points wider than this share of the end point leave it coarse: common practice, no source. */
const COARSE = 0.05;

/**
 * Reads the end point of a titration curve: where it is steepest, at the zero of the second derivative.
 * Never throws for bad input.
 */
export function readCurve(given: readonly CurvePoint[], kind: CurveKind, options: GranOptions = {}): CurveReading | CurveRefusal {
  const prepared = prepare(given, kind);
  if ('refused' in prepared) return prepared;
  const { points } = prepared;
  const { inflections, window, slopes, direction, openEnd } = findSteps(points);
  const end = inflections.at(-1);
  // a further step that is not whole would be the total acid
  if (openEnd) return { refused: { code: 'at-edge', params: { last: points.at(-1)?.volume ?? 0 } } };
  if (!end) return { refused: { code: 'no-step', params: { window } } };

  const remarks = [...prepared.remarks];
  const before = inflections.at(-2);
  if (before) remarks.push({ code: inflections.length === 2 ? 'two-steps' : 'several-steps', params: { steps: inflections.length, first: before.volume, last: end.volume } });
  const next = points.findIndex(({ volume }) => volume > end.volume);
  const spacing = (points[next]?.volume ?? 0) - (points[next - 1]?.volume ?? 0);
  if (spacing > COARSE * end.volume) remarks.push({ code: 'coarse', params: { spacing } });

  const acidic = kind === 'potential' || direction > 0;
  if (!acidic) remarks.push({ code: 'falling', params: {} });
  const start = before?.volume ?? 0;
  const gran = acidic && { acid: granOfAcid(points, kind, end, start, direction, options), base: granOfBase(points, kind, end, start, direction, options) };
  if (gran && 'endPoint' in gran.acid) {
    const difference = Math.abs(gran.acid.endPoint - end.volume);
    if (difference > DIFFERENCE.volume || difference > DIFFERENCE.share * end.volume) remarks.push({ code: 'gran-differs', params: { gran: gran.acid.endPoint, difference } });
  }
  return { endPoint: end.volume, by: 'inflection', inflections, ...(gran && { gran }), remarks, window, points, slopes };
}
