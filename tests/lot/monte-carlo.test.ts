import { describe, expect, it } from 'vitest';
import { EMPTY_SITE } from '../../src/core.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { doublesOf } from '../../src/formula/doubles.js';
import { isKnown } from '../../src/formula/reading.js';
import { lotRun } from '../../src/lot/lot-run.js';
import { checkFirstOrder } from '../../src/lot/monte-carlo-check.js';
import { FEWEST_DRAWS, MOST_DRAWS, monteCarlo } from '../../src/lot/monte-carlo.js';
import type { MonteCarlo, Simulated } from '../../src/lot/monte-carlo.js';
import { uncertaintyOf } from '../../src/lot/uncertainty.js';
import { clean, outside, retested, sour } from '../elements/tools/lots.js';
import { certified, figure, lot, run, site } from './lot.js';

/** A standardised titrant, read at a temperature. */
const STANDARDISED: SiteProfile = {
  ...site({ figures: { titrationTemperature: '26 °C' }, options: { titrantKnownFrom: 'standardised' } }),
  titrantRuns: [run('0.5113 g', '0.00', '24.47'), run('0.5009 g', '0.00', '23.98')],
};
const byVolume = lot({
  figures: { oilAmount: '900 L', titrantStrength: '4.0 g/L' },
  options: { sampleTakenBy: 'volume' },
  runs: [run('1.0 mL', '0.0', '2.1'), run('1.0 mL', '2.1', '4.3'), run('1.0 mL', '4.3', '6.4')],
});
const { titrantStrength: _, ...untitrated } = sour.figures;

const LOTS: readonly (readonly [string, LotEntry, SiteProfile])[] = [
  ['clean', clean, EMPTY_SITE],
  ['sour', sour, EMPTY_SITE],
  ['retested', retested, EMPTY_SITE],
  ['outside', outside, EMPTY_SITE],
  ['certified', certified('8.0'), EMPTY_SITE],
  ['by volume', byVolume, EMPTY_SITE],
  ['on a standardised titrant', { ...sour, figures: untitrated }, STANDARDISED],
];

const simulate = (entry: LotEntry, keys: readonly string[], profile = EMPTY_SITE, draws = 50_000, seed = 1): MonteCarlo => monteCarlo({ entry, site: profile, keys, draws, seed })!;

describe.each(LOTS)('a lot, %s', (_name, entry, profile) => {
  it('computes in doubles what it computes in decimals, for every quantity', () => {
    const { plan, findings } = lotRun(entry, profile);
    const known = plan.order.filter((key) => isKnown(findings.outcome(key)));
    expect(known.length).toBeGreaterThan(150);
    const out = new Float64Array(known.length);
    // every quantity disturbed, by nothing: so none is taken from the decimals but the inputs
    doublesOf(plan, findings, known, known).draw(new Float64Array(known.length), out);
    const wrong = known.flatMap((key, at) => {
      const outcome = findings.outcome(key);
      const value = isKnown(outcome) ? outcome.toNumber() : NaN;
      return Math.abs(out[at]! - value) <= 1e-12 * Math.abs(value) ? [] : [`${key}: ${out[at]} is not ${value}`];
    });
    expect(wrong).toEqual([]);
  });

  it('has by Monte Carlo the u that it has to first order, where formulas are nearly straight', () => {
    const keys = ['freeFattyAcid', 'acidValue', 'direct.catalyst', 'direct.methanol', 'twoStep.catalyst', 'pass1.methanol', 'retest.freeFattyAcid'];
    const first = lotRun(entry, profile);
    const { results } = simulate(entry, keys, profile);
    expect(Object.keys(results).length).toBeGreaterThan(1);
    for (const [key, { mean, meanError, u, uError, draws }] of Object.entries(results)) {
      const uncertainty = uncertaintyOf(first, key);
      const outcome = first.findings.outcome(key);
      if (!('u' in uncertainty) || !isKnown(outcome)) expect.fail(`${key} is not known to first order`);
      const [value, byFirstOrder] = [outcome.toNumber(), uncertainty.u.toNumber()];
      // four standard errors, and what the terms of second order may add: about the square of the relative uncertainty
      const relative = byFirstOrder / value;
      expect([key, draws]).toEqual([key, 50_000]);
      expect([key, Math.abs(u - byFirstOrder) <= 4 * uError + 2 * relative * byFirstOrder]).toEqual([key, true]);
      expect([key, Math.abs(mean - value) <= 4 * meanError + 2 * relative ** 2 * value]).toEqual([key, true]);
    }
  });
});

describe('a lot on a certificate', () => {
  // one source, even over ± the tolerance of the certificate, so everything can be said without drawing
  const { results } = simulate(certified('8.0'), ['freeFattyAcid'], site({ figures: { directLimit: '8.1 %' } }), 200_000);
  const { mean, meanError, u, uError, symmetric, belowLimit, histogram } = results['freeFattyAcid']!;
  const half = uncertaintyU(certified('8.0')) * Math.sqrt(3);

  it('spreads as evenly as its source', () => {
    expect(Math.abs(mean - 8)).toBeLessThan(4 * meanError);
    expect(Math.abs(u - half / Math.sqrt(3))).toBeLessThan(4 * uError);
    // the places of order statistics scatter by √(p (1 − p)/n) of the whole width
    const scatter = 4 * 2 * half * Math.sqrt((0.025 * 0.975) / 200_000);
    expect(Math.abs(symmetric[0] - (8 - 0.95 * half))).toBeLessThan(scatter);
    expect(Math.abs(symmetric[1] - (8 + 0.95 * half))).toBeLessThan(scatter);
    expect(histogram.from).toBeGreaterThanOrEqual(8 - half);
    expect(histogram.to).toBeLessThanOrEqual(8 + half);
  });

  it('lies below a limit with the share of the width that does', () => {
    expect(belowLimit?.limit).toBe(8.1);
    expect(Math.abs(belowLimit!.share - (half + 0.1) / (2 * half))).toBeLessThan(4 * belowLimit!.error);
  });
});

function uncertaintyU(entry: LotEntry): number {
  const uncertainty = uncertaintyOf(lotRun(entry, EMPTY_SITE), 'freeFattyAcid');
  return 'u' in uncertainty ? uncertainty.u.toNumber() : NaN;
}

describe('a series', () => {
  it('is the same for the same seed and close for another', () => {
    const of = (seed: number): Simulated => simulate(sour, ['freeFattyAcid'], EMPTY_SITE, 20_000, seed).results['freeFattyAcid']!;
    expect(of(3)).toEqual(of(3));
    expect(of(4).mean).not.toBe(of(3).mean);
    expect(Math.abs(of(4).u - of(3).u)).toBeLessThan(4 * Math.SQRT2 * of(3).uError);
  });

  it('does not depend on what else is drawn from the same sources', () => {
    const alone = simulate(sour, ['acidValue'], EMPTY_SITE, 1000).results['acidValue'];
    expect(simulate(sour, ['acidValue', 'freeFattyAcid'], EMPTY_SITE, 1000).results['acidValue']).toEqual(alone);
  });

  it('leaves out what is not known, and keys that mean nothing', () => {
    expect(Object.keys(simulate(sour, ['acidValue', 'retest.acidValue', 'nothing'], EMPTY_SITE, 1000).results)).toEqual(['acidValue']);
    expect(simulate(lot({}), ['freeFattyAcid'], EMPTY_SITE, 1000).results).toEqual({});
    expect(simulate({ ...sour, figures: { ...sour.figures, titrantStrength: figure('-1 mol/L') } }, ['freeFattyAcid'], EMPTY_SITE, 1000).results).toEqual({});
  });

  it('is made in slices that are told and can be ended', () => {
    const told: number[] = [];
    const order = { entry: sour, site: EMPTY_SITE, keys: ['acidValue'], draws: 10_000, seed: 1 };
    expect(monteCarlo(order, (done) => told.push(done) > 0)?.draws).toBe(10_000);
    expect(told.length).toBeGreaterThan(3);
    expect(told).toEqual([...told].sort((a, b) => a - b));
    expect(told.at(-1)).toBe(10_000);
    expect(monteCarlo(order, () => false)).toBeUndefined();
  });

  it.each([0, FEWEST_DRAWS - 1, MOST_DRAWS + 1, 1000.5, NaN])('of %d draws is refused', (draws) => {
    expect(() => simulate(sour, ['acidValue'], EMPTY_SITE, draws)).toThrow(RangeError);
  });
});

describe('the verdict on the first order', () => {
  const drawn = (low: number, high: number): Simulated => ({ ...simulate(sour, ['acidValue'], EMPTY_SITE, 100).results['acidValue']!, symmetric: [low, high] });

  // JCGM 101, 7.9.2, example: u of 0.35 g is 4 · 10⁻¹ with one digit, so δ = 0.05 g; 0.96 is 1 · 10⁰, so δ = 0.5
  it.each([[0.35, 0.05], [0.96, 0.5], [2, 0.5], [0.0123, 0.005], [340, 50]])('u of %d: ends may lie %d apart', (u, tolerance) => {
    expect(checkFirstOrder(10, u, drawn(9, 11)).tolerance).toBeCloseTo(tolerance, 12);
  });

  it('agrees, is wider, or differs', () => {
    const verdict = (low: number, high: number): string => checkFirstOrder(10, 1, drawn(10 - low, 10 + high)).verdict;
    expect([verdict(1.96, 1.96), verdict(2.4, 1.5), verdict(1.4, 1.9), verdict(1.4, 2.1), verdict(1.9, 2.5)]).toEqual(['agrees', 'agrees', 'wider', 'differs', 'differs']);
  });
});
