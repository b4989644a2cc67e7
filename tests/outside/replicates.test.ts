import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import studentizedRangeQuantile from '@stdlib/stats-base-dists-studentized-range-quantile';
import { describe, expect, it } from 'vitest';
import { MEAN_RANGES, RANGE_FACTORS } from '../../src/chemistry/replicates.js';
import { GUARD_FACTOR } from '../../src/decision/guard.js';
import type { SiteProfile } from '../../src/core.js';
import { seededRandom } from '../../src/formula/random.js';
import { lot, numberIn, read, run, site } from '../lot/lot.js';

// Replicates by ISO 5725-6:1994, 5.2.2 (from memory), and its factors against a statistics library.

describe('the factors', () => {
  // f(n) is the 95 % point of the studentised range with infinitely many degrees of freedom, to one decimal
  it.each(RANGE_FACTORS.map((printed, i) => [i + 2, printed] as const))('critical range of %i results: %s', (n, printed) => {
    expect(studentizedRangeQuantile(0.95, n, Infinity).toFixed(1)).toBe(printed);
  });

  it('the repeatability limit is 2.8 standard deviations of a run: 1.96 · √2', () => {
    expect(normalQuantile(0.975, 0, 1) * Math.SQRT2).toBeCloseTo(2.77, 2);
    expect(RANGE_FACTORS[0]).toBe('2.8');
  });

  it('1.645 and 1.96 are points of the normal distribution', () => {
    expect(normalQuantile(0.95, 0, 1).toFixed(3)).toBe(GUARD_FACTOR.toFixed(3));
    expect(normalQuantile(0.975, 0, 1).toFixed(2)).toBe('1.96');
  });

  // d2 = ∫ (1 − Φ(x)ⁿ − (1 − Φ(x))ⁿ) dx, summed up here with Φ from its own series
  const phi = (x: number): number => {
    let sum = x;
    let term = x;
    for (let k = 1; k < 200; k++) sum += term *= (x * x) / (2 * k + 1);
    return 0.5 + (sum * Math.exp((-x * x) / 2)) / Math.sqrt(2 * Math.PI);
  };
  it.each(MEAN_RANGES.map((printed, i) => [i + 2, printed] as const))('mean range of %i results: %s', (n, printed) => {
    let sum = 0;
    const step = 0.01;
    for (let x = -7; x <= 7; x += step) sum += (1 - phi(x) ** n - (1 - phi(x)) ** n) * step;
    expect(sum.toFixed(3)).toBe(printed);
  });
});

// with 0.1 mol/L and 2.5 g a millilitre is 56.1 · 0.1 / 2.5 = 2.244 mg/g
const PER_ML = 2.244;
const titrated = (titres: readonly string[], profile: SiteProfile = site({})) =>
  read(lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: titres.map((titre) => run('2.5 g', '0', titre)) }), profile);

describe('the repeatability limit', () => {
  it('ASTM D664, used oils: 0.117 · X; a mean of 3.00 has 0.351 (found)', () => {
    const reading = titrated([String(3 / PER_ML), String(3 / PER_ML)].map((text) => Number(text).toFixed(6)));
    expect(numberIn(reading, 'criticalRange')).toBeCloseTo(0.351, 5);
  });

  it('ASTM D664, fresh oils: 0.044 · (X + 1) (found)', () => {
    const reading = titrated(['2', '2'], site({ options: { repeatabilityBy: 'd664-fresh' } }));
    expect(numberIn(reading, 'criticalRange')).toBeCloseTo(0.044 * (2 * PER_ML + 1), 9);
  });

  it('the site’s own, as a figure or as a share', () => {
    expect(numberIn(titrated(['2', '2'], site({ figures: { repeatabilityTyped: '0.25 mg/g' }, options: { repeatabilityBy: 'typed' } })), 'criticalRange')).toBe(0.25);
    expect(numberIn(titrated(['2', '2'], site({ figures: { repeatabilityShare: '4 %' }, options: { repeatabilityBy: 'typed-share' } })), 'criticalRange')).toBeCloseTo(0.04 * 2 * PER_ML, 9);
  });
});

describe('the scheme', () => {
  const typed = site({ figures: { repeatabilityTyped: '1 mg/g' }, options: { repeatabilityBy: 'typed' } });
  const dear = site({ figures: { repeatabilityTyped: '1 mg/g' }, options: { repeatabilityBy: 'typed', runsAreDear: 'yes' } });
  const ml = (value: number): string => (value / PER_ML).toFixed(6);

  it.each([
    // acid values, state, average, next, result
    ['one run', [6], typed, 'one', 'mean', 'second-run', 6],
    ['two within r', [6, 6.9], typed, 'agree', 'mean', 'nothing', 6.45],
    ['two that are equal', [6, 6], typed, 'agree', 'mean', 'nothing', 6],
    ['two beyond r', [6, 7.1], typed, 'differ', 'mean', 'two-more', 6.55],
    ['two beyond r, where a run is dear', [6, 7.1], dear, 'differ', 'mean', 'one-more', 6.55],
    ['three within 3.3/2.8 r = 1.18', [6, 7.1, 6.5], dear, 'agree', 'mean', 'nothing', 6.5333],
    ['three beyond', [6, 7.3, 6.5], dear, 'differ', 'median', 'one-more', 6.5],
    ['four within 3.6/2.8 r = 1.29', [6, 7.2, 6.5, 6.6], typed, 'agree', 'mean', 'nothing', 6.575],
    ['four beyond', [6, 7.4, 6.5, 6.7], typed, 'differ', 'median', 'look-for-cause', 6.6],
    ['five within 3.9/2.8 r = 1.39', [6, 7.3, 6.5, 6.6, 6.6], typed, 'agree', 'mean', 'nothing', 6.6],
    ['five beyond', [6, 7.5, 6.5, 6.8, 6.6], typed, 'differ', 'median', 'look-for-cause', 6.6],
    ['runs that differ tenfold', [0.8, 8], typed, 'differ', 'mean', 'two-more', 4.4],
  ] as const)('%s', (_, values, profile, state, average, next, result) => {
    const reading = titrated(values.map(ml), profile);
    expect(reading.replicates.lot).toMatchObject({ state, average, next, runs: values.length });
    expect(numberIn(reading, 'acidValue')).toBeCloseTo(result, 3);
  });

  it('a struck run takes no part', () => {
    const entry = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('2.5 g', '0', ml(6)), { ...run('2.5 g', '0', ml(9)), struck: 'overshot' }, run('2.5 g', '0', ml(6.5))] });
    expect(read(entry, typed).replicates.lot).toMatchObject({ state: 'agree', runs: 2 });
    expect(numberIn(read(entry, typed), 'acidValue')).toBeCloseTo(6.25, 4);
  });

  it('a certificate has no runs to judge', () => {
    const reading = read(lot({ figures: { certificateFfa: '3 %' }, options: { acidKnownFrom: 'certificate-ffa' } }));
    expect(reading.replicates.lot).toEqual({ state: 'none', runs: 0, average: 'mean', next: 'nothing' });
  });
});

describe('the scatter of a result', () => {
  const typed = site({ figures: { repeatabilityTyped: '1 mg/g' }, options: { repeatabilityBy: 'typed' } });
  const ml = (value: number): string => (value / PER_ML).toFixed(6);
  const inAcidValue = (titres: readonly number[]): number => numberIn(titrated(titres.map(ml), typed), 'u.repeatability') * 56.1;

  it('falls with the root of the runs: r/2.8/√n', () => {
    expect(inAcidValue([6])).toBeCloseTo(1 / 2.8, 4);
    expect(inAcidValue([6, 6.2])).toBeCloseTo(1 / 2.8 / Math.SQRT2, 4);
    expect(inAcidValue([6, 6.2, 6.1, 6.3])).toBeCloseTo(1 / 2.8 / 2, 4);
  });

  it('of runs too far apart is what they show: range/d2, and for a median √(π/2) times that of a mean', () => {
    // 1.4 / 2.059 = 0.680 of four runs, above 1/2.8
    expect(inAcidValue([6, 7.4, 6.5, 6.7])).toBeCloseTo(((1.4 / 2.059) * 1.2533) / 2, 3);
    expect(1.2533).toBeCloseTo(Math.sqrt(Math.PI / 2), 4);
    // r/2.8 = 0.357 of a run is less than 1.1/1.128 of these two
    expect(inAcidValue([6, 7.1])).toBeCloseTo(1.1 / 1.128 / Math.SQRT2, 3);
  });

  // √(π/2) holds for many results. Of few, the median of normal ones spreads 1.16 (three), 1.09 (four), 1.20 (five) times as wide as the
  // mean (variances 0.449, 0.298, 0.287: tables of order statistics, from memory): the ± that is told is a little wide, never too narrow
  it.each([[3, 1.16], [4, 1.092], [5, 1.198]])('of the median of %i runs is on the safe side', (n, times) => {
    const random = seededRandom(n);
    const middle = (): number => {
      const sorted = Array.from({ length: n }, () => random.error('normal')).sort((a, b) => a - b);
      return (sorted[Math.floor((n - 1) / 2)]! + sorted[Math.ceil((n - 1) / 2)]!) / 2;
    };
    const draws = 40_000;
    let squares = 0;
    for (let i = 0; i < draws; i++) squares += middle() ** 2;
    const spread = Math.sqrt((squares / draws) * n);
    expect(Math.abs(spread / times - 1)).toBeLessThan(4 / Math.sqrt(2 * draws));
    expect(spread).toBeLessThan(1.2533);
  });
});
