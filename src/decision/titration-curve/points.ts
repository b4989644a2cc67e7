import type { CurveCode, CurveRemark, CurveRefusal } from './codes.js';

/** What the electrode reads: pH, or a potential in mV. */
export type CurveKind = 'pH' | 'potential';

export interface CurvePoint {
  /** Titrant added, mL. */
  readonly volume: number;
  /** pH, or mV. */
  readonly reading: number;
}

/** Fewer hold no step: the smoothing takes five, and a point on either side must tell it from an edge. */
export const LEAST_POINTS = 7;
/** More are averaged in groups; a drawing and a step show no more. */
export const MOST_POINTS = 2000;
/** A change of the reading that is too small for an end point: common practice, no source. */
export const LEAST_SPAN: Readonly<Record<CurveKind, number>> = { pH: 0.5, potential: 20 };

/** No volume and no reading is larger: what is, was no figure of a titration. */
const LARGEST = 1e6;
/** Volumes nearer to each other than this are one, mL: no burette tells them apart. */
const FINEST = 1e-6;

export interface Prepared {
  /** At least {@link LEAST_POINTS}, by rising volume, no two alike. */
  readonly points: readonly CurvePoint[];
  readonly remarks: readonly CurveRemark[];
}

/** Makes points fit for reading: numbers, in order, one a volume, not too many; what was done to them is said. Refuses what holds no step. */
export function prepare(given: readonly CurvePoint[], kind: CurveKind): Prepared | CurveRefusal {
  const remarks: CurveRemark[] = [];
  const say = (code: CurveCode, params: Readonly<Record<string, number>>): void => void remarks.push({ code, params });

  const usable = given.filter(({ volume, reading }) => volume >= 0 && volume <= LARGEST && Math.abs(reading) <= LARGEST);
  if (given.length && !usable.length) return { refused: { code: 'not-finite', params: { points: given.length } } };
  if (usable.length < given.length) say('left-out', { points: given.length - usable.length });

  if (usable.some(({ volume }, i) => volume < (usable[i - 1]?.volume ?? 0))) {
    usable.sort((a, b) => a.volume - b.volume);
    say('sorted', {});
  }
  const single = averagedAlike(usable);
  if (single.length < usable.length) say('averaged', { points: usable.length - single.length });
  if (single.length < LEAST_POINTS) return { refused: { code: 'too-few', params: { points: single.length, least: LEAST_POINTS } } };

  const width = Math.ceil(single.length / MOST_POINTS);
  const points = width > 1 ? inGroups(single, (_, at) => at % width === 0) : single;
  if (points.length < single.length) say('thinned', { points: single.length, groups: points.length });

  const readings = points.map(({ reading }) => reading);
  const span = Math.max(...readings) - Math.min(...readings);
  if (span < LEAST_SPAN[kind]) return { refused: { code: 'flat', params: { span, least: LEAST_SPAN[kind] } } };
  return { points, remarks };
}

const averagedAlike = (points: readonly CurvePoint[]): readonly CurvePoint[] =>
  inGroups(points, ({ volume }, _, before) => !before || Math.round(volume / FINEST) !== Math.round(before.volume / FINEST));

/** The mean of each group of neighbours. */
function inGroups(points: readonly CurvePoint[], begins: (point: CurvePoint, at: number, before: CurvePoint | undefined) => boolean): readonly CurvePoint[] {
  const groups: { count: number; volume: number; reading: number }[] = [];
  let group = { count: 0, volume: 0, reading: 0 };
  points.forEach((point, at) => {
    if (begins(point, at, points[at - 1])) groups.push((group = { count: 0, volume: 0, reading: 0 }));
    group.count++;
    group.volume += point.volume;
    group.reading += point.reading;
  });
  return groups.map(({ count, volume, reading }) => ({ volume: volume / count, reading: reading / count }));
}
