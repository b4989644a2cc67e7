import { doublesOf } from '../formula/doubles.js';
import { seededRandom } from '../formula/random.js';
import { isKnown } from '../formula/reading.js';
import { shareAtOrBelow, summedUp } from '../formula/sampled.js';
import type { Sampled } from '../formula/sampled.js';
import type { UncertaintySource } from '../formula/uncertainty-source.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { lotRun } from './lot-run.js';
import type { LotRun } from './lot-run.js';
import { uncertaintySources } from './uncertainty-sources.js';

/** What to draw; plain data, as a worker takes it. */
export interface MonteCarloOrder {
  readonly entry: LotEntry;
  readonly site: SiteProfile;
  /** Keys of the results wanted. */
  readonly keys: readonly string[];
  /** A whole number from {@link FEWEST_DRAWS} to {@link MOST_DRAWS}. */
  readonly draws: number;
  /** The same seed gives the same figures. */
  readonly seed: number;
}

/** A result as Monte Carlo knows it, in the unit of its quantity; doubles, since chance is coarser than they are. */
export interface Simulated extends Sampled {
  /** Draws that gave it a value. A draw in which a formula has none, such as the root of a negative figure, is left out. */
  readonly draws: number;
  /** Share of the draws at or below the direct limit, 0 to 1, with its standard error; for the FFA of the lot. */
  readonly belowLimit?: { readonly limit: number; readonly share: number; readonly error: number };
}

export interface MonteCarlo {
  readonly draws: number;
  readonly seed: number;
  /** By key; a result that is not known itself, or of which a source is not, is left out. */
  readonly results: Readonly<Record<string, Simulated>>;
}

/** What a worker says of an order. An error is a mistake of the program, or of the order. */
export type MonteCarloReport = { readonly done: number } | { readonly result: MonteCarlo } | { readonly error: string };

/** JCGM 101, 7.2.2: at least 10⁴ / (1 − p), for p = 95 %. */
export const USUAL_DRAWS = 200_000;
export const FEWEST_DRAWS = 100;
/** Each result keeps its draws until it is summed up, 8 bytes each. */
export const MOST_DRAWS = 1_000_000;

/** Draws between two reports: well below a twentieth of a second, so that a page that computes them itself stays alive. */
const SLICE = 2000;

/**
 * Propagates the distributions of all sources of uncertainty through the formulas themselves (JCGM 101,
 * Supplement 1 to the GUM): no linear approximation, and no normal result presumed. A source that moves
 * several figures moves them by the same error in each draw. Choices stay as they were made on the result
 * itself: a lot that takes two passes takes two in every draw.
 *
 * @returns a series of the number of draws made, and at its end the results
 * @throws RangeError for a number of draws that is not whole or out of range
 */
export function* monteCarloSlices({ entry, site, keys, draws, seed }: MonteCarloOrder): Generator<number, MonteCarlo, void> {
  if (!Number.isInteger(draws) || draws < FEWEST_DRAWS || draws > MOST_DRAWS) {
    throw new RangeError(`${draws} draws: a whole number from ${FEWEST_DRAWS} to ${MOST_DRAWS} is needed`);
  }
  const run = lotRun(entry, site);
  const sources = uncertaintySources(run.runs);
  const wanted = [...new Set(keys)].filter((key) => isWhollyKnown(run, sources, key));
  const series = wanted.map((key) => ({ key, values: new Float64Array(draws), count: 0 }));
  const out = new Float64Array(wanted.length);
  const draw = drawing(run, sources, wanted, seed, out);
  for (let done = 0; done < draws; done++) {
    if (done && done % SLICE === 0) yield done;
    draw();
    series.forEach((one, at) => {
      const value = out[at] ?? NaN;
      if (Number.isFinite(value)) one.values[one.count++] = value;
    });
  }
  yield draws;

  const results: Record<string, Simulated> = {};
  for (const { key, values, count } of series) {
    if (count < FEWEST_DRAWS) continue;
    const found = values.subarray(0, count);
    results[key] = { ...summedUp(found), draws: count, ...belowLimit(run, key, found) };
  }
  return { draws, seed, results };
}

/**
 * The same in one go.
 *
 * @param onSlice told the number of draws made, every now and then; false ends the series
 * @returns undefined where it was ended
 */
export function monteCarlo(order: MonteCarloOrder, onSlice?: (done: number) => boolean): MonteCarlo | undefined {
  const slices = monteCarloSlices(order);
  for (;;) {
    const { done, value } = slices.next();
    if (done) return value;
    if (onSlice?.(value) === false) return undefined;
  }
}

/** Whether a result is known, and with it how uncertain everything is that it rests on. */
function isWhollyKnown({ sheet, plan, findings }: LotRun, sources: readonly UncertaintySource[], key: string): boolean {
  if (!sheet.quantities.has(key) || !isKnown(findings.outcome(key))) return false;
  const { rests } = doublesOf(plan, findings, [key], []);
  return sources.every(({ key: u, at }) => !at.some((moved) => rests.has(moved)) || isKnown(findings.outcome(u)));
}

/** One draw of all sources, and of what follows from it, into `out`. */
function drawing({ plan, findings }: LotRun, sources: readonly UncertaintySource[], wanted: readonly string[], seed: number, out: Float64Array): () => void {
  const { rests } = doublesOf(plan, findings, wanted, []);
  const moved = sources.map((source) => ({ ...source, at: source.at.filter((key) => rests.has(key)) })).filter(({ at }) => at.length);
  const disturbed = [...new Set(moved.flatMap(({ at }) => at))];
  const errors = new Float64Array(disturbed.length);
  const drawn = moved.map(({ key, shape, at }) => {
    const u = findings.outcome(key);
    return { shape, u: isKnown(u) ? u.toNumber() : NaN, slots: at.map((one) => disturbed.indexOf(one)) };
  });
  const { draw } = doublesOf(plan, findings, wanted, disturbed);
  const random = seededRandom(seed);
  return () => {
    errors.fill(0);
    for (const { shape, u, slots } of drawn) {
      const error = u * random.error(shape);
      for (const slot of slots) errors[slot] = (errors[slot] ?? 0) + error;
    }
    draw(errors, out);
  };
}

function belowLimit({ findings }: LotRun, key: string, sorted: Float64Array): Pick<Simulated, 'belowLimit'> {
  const limit = key === 'freeFattyAcid' ? findings.outcome('directLimit') : undefined;
  if (!limit || !isKnown(limit)) return {};
  const share = shareAtOrBelow(sorted, limit.toNumber());
  return { belowLimit: { limit: limit.toNumber(), share, error: Math.sqrt((share * (1 - share)) / sorted.length) } };
}
