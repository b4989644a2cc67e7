import { describe, expect, it } from 'vitest';
import { expectedOf, sourceHistory } from '../../src/lot/history.js';
import type { HistoryPoint } from '../../src/lot/history.js';

const series = (...values: (number | undefined)[]): readonly HistoryPoint[] =>
  values.map((value, i) => ({ date: `2026-0${1 + Math.floor(i / 28)}-${String((i % 28) + 1).padStart(2, '0')}`, id: String(i), ...(value !== undefined && { acidValue: String(value), freeFattyAcid: String(value / 2) }) }));

describe('the history of a source', () => {
  it('stands in order of time; lots of one day in theirs; those without a date at the end, and counted', () => {
    const { points, undated, without } = sourceHistory([
      { date: '', freeFattyAcid: '9' }, { date: '2026-02-01', freeFattyAcid: '2', id: 'a' }, { date: '2026-02-01', freeFattyAcid: '3', id: 'b' }, { date: '2026-01-31', freeFattyAcid: '1' }, { date: '2026-01-30' }, { date: '2026-01-30', freeFattyAcid: 'x' },
    ], 'freeFattyAcid');
    expect(points.map(({ value }) => value)).toEqual(['1', '2', '3', '9']);
    expect([undated, without]).toEqual([1, 2]);
  });
  it('has limits from eight lots on', () => {
    expect(sourceHistory(series(1, 2, 1, 2, 1, 2, 1), 'acidValue').limits).toBeUndefined();
    expect(sourceHistory(series(1, 2, 1, 2, 1, 2, 1, 2), 'acidValue').limits).toMatchObject({ centre: '1.5', meanRange: '1', upper: '4.16', lower: '0', rangeUpper: '3.267' });
  });
  it('of one lot, or none, is no chart', () => {
    expect(sourceHistory([], 'water')).toMatchObject({ points: [], signals: [] });
    expect(sourceHistory(series(3), 'acidValue').points).toHaveLength(1);
  });
  it('shows the last sixty', () => {
    expect(sourceHistory(series(...Array.from({ length: 80 }, (_, i) => i)), 'acidValue').points[0]!.value).toBe('20');
  });
});

describe('what the next lot is expected to have', () => {
  it('is the mean of the last ten', () => {
    expect(expectedOf(series(100, 8, 9, 8, 9, 8, 9, 8, 9, 8, 9))).toEqual({ acidValue: '8.5', lots: 10 });
    expect(expectedOf(series(8.44))).toEqual({ acidValue: '8.4', lots: 1 });
    expect(expectedOf(series(undefined))).toBeUndefined();
  });
  it('begins anew where the source has shifted', () => {
    // nine lots about 20 after nine about 4: the mean of all lies between, and only the last nine tell of the next
    const low = [4, 5, 4, 5, 4, 5, 4, 5, 4];
    expect(expectedOf(series(...low, ...low.map((value) => value + 16)))).toEqual({ acidValue: '20', lots: 9 });
  });
  it('follows a source that rises', () => {
    expect(expectedOf(series(5, 6, 5, 6, 5, 6, 7, 8, 9, 10, 11))).toEqual({ acidValue: '10', lots: 3 });
  });
});
