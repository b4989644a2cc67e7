import { describe, expect, it } from 'vitest';
import { CYCLES, seededRandom } from '../../src/formula/random.js';
import type { ErrorShape } from '../../src/formula/uncertainty-source.js';

const COUNT = 200_000;

describe('the four cycles', () => {
  const power = (base: bigint, exponent: bigint, modulus: bigint): bigint => {
    let result = 1n;
    for (let [square, left] = [base % modulus, exponent]; left > 0n; left >>= 1n, square = (square * square) % modulus) if (left & 1n) result = (result * square) % modulus;
    return result;
  };
  const primeFactors = (number: bigint): bigint[] => {
    const found = new Set<bigint>();
    for (let by = 2n; by * by <= number; by++) for (; number % by === 0n; number /= by) found.add(by);
    return [...found, ...(number > 1n ? [number] : [])];
  };

  it.each(CYCLES)('$multiplier mod $modulus runs through every figure but 0', ({ multiplier, modulus }) => {
    const [a, m] = [BigInt(multiplier), BigInt(modulus)];
    expect(primeFactors(m)).toEqual([m]);
    // the length of the cycle divides m − 1; it is no less unless one of these powers is 1 (primitive root, any book on numbers)
    for (const factor of primeFactors(m - 1n)) expect(power(a, (m - 1n) / factor, m)).not.toBe(1n);
  });

  it('the short way of multiplying gives what long numbers give', () => {
    const random = seededRandom(7);
    const states = statesOf(7);
    for (let step = 0; step < 1000; step++) {
      for (const [at, { multiplier, modulus }] of CYCLES.entries()) states[at] = (states[at]! * BigInt(multiplier)) % BigInt(modulus);
      const sum = states.reduce((all, state, at) => all + Number(state) / CYCLES[at]!.modulus, 0);
      expect(random.uniform()).toBe(sum - Math.floor(sum));
    }
  });

  /** MurmurHash3's last steps on seed and place, in long numbers. */
  function statesOf(seed: number): bigint[] {
    const low = (value: bigint): bigint => value & 0xffffffffn;
    return CYCLES.map(({ modulus }, at) => {
      let mixed = low(BigInt(seed + at + 1) * 0x9e3779b1n);
      mixed = low((mixed ^ (mixed >> 16n)) * 0x85ebca6bn);
      mixed = low((mixed ^ (mixed >> 13n)) * 0xc2b2ae35n);
      return 1n + ((mixed ^ (mixed >> 16n)) % BigInt(modulus - 1));
    });
  }
});

describe('draws', () => {
  const series = (seed: number, make: (random: ReturnType<typeof seededRandom>) => number, count = COUNT): number[] => {
    const random = seededRandom(seed);
    return Array.from({ length: count }, () => make(random));
  };
  const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
  /** How many of its own standard errors a mean lies from what it should be. */
  const surprise = (values: readonly number[], expected: number): number => {
    const m = mean(values);
    return Math.abs(m - expected) / Math.sqrt(mean(values.map((value) => (value - m) ** 2)) / values.length);
  };

  it('the same seed, the same draws; another seed, others', () => {
    const of = (seed: number) => series(seed, (random) => random.error('normal'), 50);
    expect(of(1)).toEqual(of(1));
    expect(of(1)).not.toEqual(of(2));
    expect(of(0)).not.toEqual(of(2 ** 32 - 1));
  });

  it('lie between 0 and 1, as many in each twentieth, and do not remember the one before', () => {
    const values = series(3, (random) => random.uniform());
    expect(values.every((value) => value > 0 && value < 1)).toBe(true);
    const bins = new Array<number>(20).fill(0);
    for (const value of values) bins[Math.floor(value * 20)]!++;
    const chiSquared = bins.reduce((sum, count) => sum + (count - COUNT / 20) ** 2 / (COUNT / 20), 0);
    expect(chiSquared).toBeLessThan(43.8); // 99.9 % point of χ² with 19 degrees of freedom (tables, from memory)
    expect(surprise(values.slice(1).map((value, i) => (value - 0.5) * (values[i]! - 0.5)), 0)).toBeLessThan(4);
  });

  // moments about zero of distributions of standard deviation 1: the fourth is 3, 9/5 and 12/5 (any table of distributions)
  it.each<[ErrorShape, number, number]>([
    ['normal', 3, Infinity],
    ['rectangular', 9 / 5, Math.sqrt(3)],
    ['triangular', 12 / 5, Math.sqrt(6)],
  ])('%s errors have the moments of their distribution, and its bounds', (shape, fourth, bound) => {
    const values = series(11, (random) => random.error(shape));
    for (const [power, expected] of [[1, 0], [2, 1], [3, 0], [4, fourth]] as const) {
      expect([power, surprise(values.map((value) => value ** power), expected) < 4]).toEqual([power, true]);
    }
    const most = values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    expect(most).toBeLessThan(bound);
    expect(most).toBeGreaterThan(Math.min(4, 0.98 * bound));
  });

  it('both of a normal pair are independent', () => {
    const values = series(5, (random) => random.error('normal'));
    const pairs = values.filter((_, i) => i % 2 === 0).map((value, i) => value * values[2 * i + 1]!);
    expect(surprise(pairs, 0)).toBeLessThan(4);
    // and so are their squares
    expect(surprise(pairs.map((product) => product ** 2), 1)).toBeLessThan(4);
  });
});
