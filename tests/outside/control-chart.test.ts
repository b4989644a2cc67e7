import { describe, expect, it } from 'vitest';
import { INDIVIDUALS_FACTOR, MEAN_RANGE_OF_TWO, RANGE_FACTOR } from '../../src/chemistry/control-chart.js';
import { sourceHistory } from '../../src/lot/history.js';

// The factors of a chart of individuals, from the distribution of the range of two normal figures: |x1 − x2| is half-normal with
// scale √2, so its mean is d2 = 2/√π and its standard deviation d3 = √(2 − 4/π); E2 = 3/d2, D4 = 1 + 3·d3/d2.
describe('the factors', () => {
  const d2 = 2 / Math.sqrt(Math.PI);
  const d3 = Math.sqrt(2 - 4 / Math.PI);
  it('d2 of two figures is 1.128', () => expect(d2.toFixed(3)).toBe(MEAN_RANGE_OF_TWO));
  it('E2 = 3/d2 is 2.66', () => expect((3 / d2).toFixed(2)).toBe(INDIVIDUALS_FACTOR));
  it('D4 is 3.267', () => {
    // the printed 3.267 comes of d3 and d2 rounded before: 1 + 3 · 0.853/1.128 is 3.269, exactly it is 3.2665
    expect(Math.abs(1 + (3 * d3) / d2 - Number(RANGE_FACTOR))).toBeLessThan(0.001);
  });
});

// NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.2, flow rate of ten batches (from memory): mean 50.81, mean moving range
// 1.8778, limits 50.81 ± 3 · 1.8778/1.128 = 45.8159 and 55.8041, all in control.
it('the handbook’s ten batches come to its limits', () => {
  const flow = ['49.6', '47.6', '49.9', '51.3', '47.8', '51.2', '52.6', '52.4', '53.6', '52.1'];
  const { limits, signals } = sourceHistory(flow.map((value, i) => ({ date: `2026-01-${String(i + 1).padStart(2, '0')}`, water: value })), 'water');
  expect(Number(limits!.centre)).toBeCloseTo(50.81, 10);
  expect(Number(limits!.meanRange)).toBeCloseTo(1.8778, 4);
  // 2.66 is 3/1.128 to three digits, so the limits agree to that
  expect(Math.abs(Number(limits!.upper) - 55.8041)).toBeLessThan(0.005);
  expect(Math.abs(Number(limits!.lower) - 45.8159)).toBeLessThan(0.005);
  expect(signals.filter(({ rule }) => rule === 'beyond-limits')).toEqual([]);
});
