import { describe, expect, it } from 'vitest';
import { EMPTY_SITE } from '../../src/core.js';
import { residualSeries } from '../../src/lot/residual-series.js';
import { certified, lot, numberIn, read, site } from './lot.js';

describe('the residual over time', () => {
  it('begins at what the oil has and ends at what the charge expects', () => {
    const entry = certified('4.3');
    const [first] = residualSeries(entry, EMPTY_SITE)!;
    expect(first?.points[0]?.slow).toBeCloseTo(4.3, 4);
    expect(first?.points.at(-1)).toEqual({
      minutes: 60, slow: numberIn(read(entry), 'pass1.ffaLeft.slow'), fast: numberIn(read(entry), 'pass1.ffaLeft.fast'),
    });
  });

  it('falls all the way, the cautious end above the hopeful one', () => {
    for (const { points } of residualSeries(certified('20'), EMPTY_SITE)!) {
      points.forEach(({ slow, fast }, i) => {
        expect(slow).toBeGreaterThanOrEqual(fast - 1e-9);
        if (i) expect(slow).toBeLessThan(points[i - 1]!.slow);
      });
    }
  });

  it('is first order towards the equilibrium: 1 − exp(−k t / x_eq), worked out by hand', () => {
    const entry = certified('4.3');
    const reading = read(entry);
    const k = numberIn(reading, 'pass1.rate.slow');
    const most = numberIn(reading, 'pass1.equilibrium.slow');
    for (const { minutes, slow } of residualSeries(entry, EMPTY_SITE)![0]!.points) {
      expect(slow).toBeCloseTo(4.3 * (1 - most * (1 - Math.exp((-k * minutes) / most))), 3);
    }
  });

  it('goes on from pass to pass', () => {
    const series = residualSeries(certified('35'), EMPTY_SITE)!;
    expect(series.length).toBeGreaterThan(1);
    for (const [i, { points }] of series.entries()) {
      if (i) expect(points[0]?.slow).toBeCloseTo(series[i - 1]!.points.at(-1)!.slow, 4);
    }
  });

  it('is not known without oil, titration or time', () => {
    expect(residualSeries(lot({}), EMPTY_SITE)).toBeUndefined();
    expect(residualSeries(certified('4.3'), site({ figures: { pretreatmentTime: '0 min' } }))).toBeUndefined();
    expect(residualSeries(certified('4.3'), site({ figures: { pretreatmentTemperature: '70 °C' } }))).toBeUndefined();
  });
});
