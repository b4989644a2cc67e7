// What a long series of draws says of the value it was drawn for. Doubles, since chance is coarser.

/** A coverage interval: from, to. */
export type Interval = readonly [number, number];

export interface Histogram {
  /** Smallest and largest draw: the outer edges of the bins, which are equally wide. */
  readonly from: number;
  readonly to: number;
  readonly counts: readonly number[];
}

/** The distribution of the draws, summed up after JCGM 101, 7.6 and 7.7. */
export interface Sampled {
  readonly mean: number;
  /** Standard deviation: the standard uncertainty of the value. */
  readonly u: number;
  /** Standard errors of mean and u: how far another series of as many draws would lie from this. */
  readonly meanError: number;
  readonly uError: number;
  /** As many draws below as above. */
  readonly symmetric: Interval;
  readonly shortest: Interval;
  readonly histogram: Histogram;
}

const BINS = 40;

/**
 * Sums up the draws, which it sorts in place. The standard error of s² is √((μ₄ − σ⁴ (n − 3)/(n − 1))/n)
 * (Mood, Graybill, Boes, Introduction to the Theory of Statistics, VI.2.3; from memory), that of s the
 * same over 2 s, to first order; for normal draws it is s/√(2 (n − 1)).
 *
 * @param draws at least two
 * @param coverage share of the draws that the intervals hold
 */
export function summedUp(draws: Float64Array, coverage = 0.95): Sampled {
  draws.sort();
  const count = draws.length;
  const mean = moment(draws, 0, 1);
  const second = moment(draws, mean, 2);
  const fourth = moment(draws, mean, 4);
  const variance = (second * count) / (count - 1);
  const u = Math.sqrt(variance);
  const ofVariance = Math.sqrt(Math.max(0, fourth - (second * second * (count - 3)) / (count - 1)) / count);
  return {
    mean,
    u,
    meanError: u / Math.sqrt(count),
    uError: u === 0 ? 0 : ofVariance / (2 * u),
    symmetric: symmetricInterval(draws, coverage),
    shortest: shortestInterval(draws, coverage),
    histogram: histogramOf(draws, BINS),
  };
}

/** The share of the sorted draws at or below a figure. Its standard error is √(p (1 − p)/n). */
export function shareAtOrBelow(sorted: Float64Array, figure: number): number {
  let [low, high] = [0, sorted.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sorted.at(middle)! <= figure) low = middle + 1;
    else high = middle;
  }
  return low / sorted.length;
}

function moment(draws: Float64Array, about: number, order: number): number {
  let sum = 0;
  for (const draw of draws) sum += (draw - about) ** order;
  return sum / draws.length;
}

// JCGM 101, 7.7: y(r) to y(r + q) with q = p M; the places count from 1 there.

function symmetricInterval(sorted: Float64Array, coverage: number): Interval {
  const width = Math.round(coverage * sorted.length);
  const first = Math.max(1, Math.ceil((sorted.length - width) / 2)) - 1;
  return [sorted[first]!, sorted[Math.min(first + width, sorted.length - 1)]!];
}

function shortestInterval(sorted: Float64Array, coverage: number): Interval {
  const width = Math.min(Math.round(coverage * sorted.length), sorted.length - 1);
  let best = 0;
  for (let first = 1; first + width < sorted.length; first++) {
    if (sorted[first + width]! - sorted[first]! < sorted[best + width]! - sorted[best]!) best = first;
  }
  return [sorted[best]!, sorted[best + width]!];
}

function histogramOf(sorted: Float64Array, bins: number): Histogram {
  const [from, to] = [sorted[0]!, sorted.at(-1)!];
  const counts = new Array<number>(bins).fill(0);
  for (const draw of sorted) counts[to > from ? Math.min(bins - 1, Math.floor(((draw - from) / (to - from)) * bins)) : 0]!++;
  return { from, to, counts };
}
