import { quantileSorted, sampleStandardDeviation } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { seededRandom } from '../../src/formula/random.js';
import { shareAtOrBelow, summedUp } from '../../src/formula/sampled.js';

const drawn = (count: number, seed: number, make: (random: ReturnType<typeof seededRandom>) => number): Float64Array => {
  const random = seededRandom(seed);
  return Float64Array.from({ length: count }, () => make(random));
};
const normal = (count: number, seed: number) => drawn(count, seed, (random) => random.error('normal'));
/** Skewed, with known quantiles: −ln(1 − p). */
const exponential = (count: number, seed: number) => drawn(count, seed, (random) => -Math.log(random.uniform()));

describe('draws summed up', () => {
  it('mean and standard deviation are those of a statistics library', () => {
    const values = exponential(5000, 1);
    const { mean, u } = summedUp(values.slice());
    expect(mean).toBeCloseTo(values.reduce((sum, value) => sum + value, 0) / 5000, 12);
    expect(u).toBeCloseTo(sampleStandardDeviation([...values]), 12);
  });

  it('the intervals hold 95 of 100 places: the middle ones, or the shortest stretch', () => {
    // JCGM 101, 7.7 with M = 100: q = 95, r = int((M − q + 1)/2) = 3, so y(3) to y(98)
    const values = Float64Array.from({ length: 100 }, (_, i) => (100 - i) ** 2);
    const { symmetric, shortest } = summedUp(values);
    expect(symmetric).toEqual([3 ** 2, 98 ** 2]);
    expect(shortest).toEqual([1, 96 ** 2]);
  });

  it('of a skewed distribution they come near its own', () => {
    const values = exponential(200_000, 2);
    const { symmetric, shortest } = summedUp(values);
    // −ln 0.975 to −ln 0.025, and 0 to −ln 0.05; the order statistics scatter by √(p (1 − p)/n) over the density there
    const scatter = (p: number) => (4 * Math.sqrt((p * (1 - p)) / 200_000)) / (1 - p);
    expect(Math.abs(symmetric[0] + Math.log(0.975))).toBeLessThan(scatter(0.025));
    expect(Math.abs(symmetric[1] + Math.log(0.025))).toBeLessThan(scatter(0.975));
    expect(shortest[1] - shortest[0]).toBeLessThan(-Math.log(0.05) + scatter(0.95));
    expect(shortest[0]).toBeLessThan(0.01);
    expect(symmetric[1]).toBeCloseTo(quantileSorted([...values.slice().sort()], 0.975), 3);
  });

  it('the standard errors are the scatter of many series', () => {
    for (const make of [normal, exponential]) {
      const many = Array.from({ length: 400 }, (_, seed) => summedUp(make(2000, 100 + seed)));
      for (const [value, error] of [['mean', 'meanError'], ['u', 'uError']] as const) {
        const seen = sampleStandardDeviation(many.map((one) => one[value]));
        const said = many.reduce((sum, one) => sum + one[error], 0) / many.length;
        // a standard deviation of 400 figures is itself sure to 1/√(2 · 399), 3.5 %
        expect([value, Math.abs(seen / said - 1) < 4 * 0.0354]).toEqual([value, true]);
      }
    }
  });

  it('for normal draws the standard error of u is u/√(2 (n − 1))', () => {
    const { u, uError } = summedUp(normal(200_000, 4));
    expect(uError / (u / Math.sqrt(2 * 199_999))).toBeCloseTo(1, 1);
  });

  it('the bins hold every draw', () => {
    const values = exponential(1000, 5);
    const { histogram } = summedUp(values);
    expect(histogram.counts.reduce((sum, count) => sum + count)).toBe(1000);
    expect([histogram.from, histogram.to]).toEqual([values[0], values[999]]);
    const edge = histogram.from + (histogram.to - histogram.from) * 0.25;
    expect(histogram.counts.slice(0, 10).reduce((sum, count) => sum + count)).toBe([...values].filter((value) => value < edge).length);
  });

  it('draws that are all alike have no spread', () => {
    const { mean, u, uError, symmetric, shortest, histogram } = summedUp(new Float64Array(200).fill(3));
    expect([mean, u, uError, symmetric, shortest]).toEqual([3, 0, 0, [3, 3], [3, 3]]);
    expect(histogram.counts[0]).toBe(200);
  });

  it('the share at or below a figure', () => {
    const sorted = Float64Array.of(1, 2, 2, 3);
    expect([0, 1, 1.5, 2, 2.5, 3, 9].map((figure) => shareAtOrBelow(sorted, figure))).toEqual([0, 0.25, 0.25, 0.75, 0.75, 1, 1]);
  });
});
