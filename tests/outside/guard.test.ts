import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { furtherRuns } from '../../src/decision/further-runs.js';
import { GUARD_FACTOR, probabilityBelow } from '../../src/decision/guard.js';
import { decimal } from '../../src/formula/decimal.js';

const below = (value: string, u: string, limit: string): number => probabilityBelow(decimal(value), decimal(u), decimal(limit));

describe('the probability of keeping a limit', () => {
  it('JCGM 106, the example of a breakdown voltage: −5.47 V, u = 0.05 V, limit −5.40 V: Φ(1.40) = 0.919 (from memory)', () => {
    expect(below('-5.47', '0.05', '-5.40')).toBeCloseTo(0.9192, 4);
  });

  it('twice u inside the limit it is at least 0.977 (derived)', () => {
    expect(below('1.8', '0.1', '2.0')).toBeGreaterThanOrEqual(0.977);
  });

  it('is that of a statistics library', () => {
    for (let z = -5; z <= 5; z += 0.05) expect(Math.abs(below(String(3 - z / 8), '0.125', '3') - normalCdf(z, 0, 1))).toBeLessThan(2e-7);
  });

  it('without doubt is certain', () => {
    expect([below('2.99', '0', '3'), below('3', '0', '3'), below('3.01', '0', '3')]).toEqual([1, 1, 0]);
  });
});

it('the guard band of a limit of 2.0 with u = 0.10: accepted up to 1.8355 (Eurachem/CITAC, Annex A: 1.645 u; derived)', () => {
  expect(decimal('2.0').minus(GUARD_FACTOR.times('0.10')).toString()).toBe('1.8355');
});

describe('further runs', () => {
  const call = (distance: number, perRun: number, lasting: number, runs: number) =>
    furtherRuns({ distance: decimal(String(distance)), perRun: decimal(String(perRun)), lasting: decimal(String(lasting)), runs });

  it.each([
    // u² of two runs 0.0064, none of it lasting; 1.645 · 0.08 = 0.132. For 0.10 u must be below 0.0608: 0.0064 · 2/n < 0.0037, n > 3.46
    [0.1, 0.0064, 0, 2, 2],
    [0.131, 0.0064, 0, 2, 1],
    // what lasts is alone 1.645 · 0.07 = 0.115
    [0.1, 0.0064, 0.0049, 2, 'lasting'],
    [0.001, 0.0064, 0, 2, 'many'],
    [0.1, 0, 0.0001, 2, 'lasting'],
    [0.1, 0.0064, 0, 0, 'lasting'],
    [0, 0.0064, 0, 2, 'lasting'],
  ] as const)('%d away, %d a run, %d lasting, %i runs: %s', (distance, perRun, lasting, runs, expected) => {
    expect(call(distance, perRun, lasting, runs)).toBe(expected);
  });

  it('are the fewest that put the result clear of the limit', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1, noNaN: true }), fc.double({ min: 0.0001, max: 0.1, noNaN: true }), fc.double({ min: 0, max: 0.05, noNaN: true }), fc.integer({ min: 1, max: 6 }),
        (distance, perRun, lasting, runs) => {
          const u = (n: number): number => Math.sqrt(lasting + (perRun * runs) / n);
          const fewest = Array.from({ length: 12 - runs }, (_, i) => i + 1).find((more) => 1.645 * u(runs + more) < distance);
          const told = call(distance, perRun, lasting, runs);
          if (typeof told === 'number') expect(told).toBe(fewest);
          else expect(fewest).toBeUndefined();
        }),
      { numRuns: 300, seed: 20_260_302 },
    );
  });
});
