import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { signalsIn } from '../../src/decision/run-rules.js';
import { Decimal } from '../../src/formula/decimal.js';

const lines = { centre: new Decimal(10), deviation: new Decimal(1) };
const at = (...values: number[]): readonly string[] => signalsIn(values.map((value) => new Decimal(value)), lines).map(({ rule, direction, from, to }) => `${rule} ${direction} ${from}-${to}`);

describe('a chart about 10, standard deviation 1', () => {
  it.each([
    // each rule on either side of where it begins
    [[10, 13, 10], []], [[10, 13.01, 10], ['beyond-limits up 1-1']], [[10, 6.99, 10], ['beyond-limits down 1-1']],
    [[10.2, 10.1, 10.3, 10.1, 10.2, 10.1, 10.3, 10.1], []], [[10.2, 10.1, 10.3, 10.1, 10.2, 10.1, 10.3, 10.1, 10.2], ['nine-on-one-side up 0-8']],
    [[9.8, 9.9, 9.7, 9.9, 10, 9.9, 9.7, 9.9, 9.8], []], [[9.8, 9.9, 9.7, 9.9, 9.8, 9.9, 9.7, 9.9, 9.8, 9.7], ['nine-on-one-side down 0-9']],
    [[9.5, 9.6, 9.8, 10.1, 10.3], []], [[9.5, 9.6, 9.8, 10.1, 10.3, 10.4], ['six-in-a-row up 0-5']], [[9.5, 9.6, 9.6, 10.1, 10.3, 10.4], []], [[10.5, 10.4, 10.2, 9.9, 9.8, 9.7, 10], ['six-in-a-row down 0-5']],
    [[10, 12.1, 10, 10, 12.1], []], [[10, 12.1, 10, 12.1], ['two-of-three up 1-3']], [[12.1, 12.1], ['two-of-three up 0-1']], [[12.1, 10, 7.9], []], [[12.1, 12.1, 10, 12.1, 10, 10, 12.1, 12.1], ['two-of-three up 0-3', 'two-of-three up 6-7']], [[12, 12, 12], []],
  ])('%j: %j', (values, expected) => {
    expect(at(...values)).toEqual(expected);
  });
});

it('a series without scatter signals nothing', () => {
  expect(signalsIn(Array.from({ length: 20 }, () => new Decimal(3)), { centre: new Decimal(3), deviation: new Decimal(0) })).toEqual([]);
});

it('turned upside down the same lots signal, the other way', () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: 60, max: 140 }), { minLength: 1, maxLength: 30 }), (tenths) => {
      const up = at(...tenths.map((value) => value / 10));
      const down = at(...tenths.map((value) => 20 - value / 10));
      expect(down).toEqual(up.map((text) => text.replace(/ (up|down) /, (_, direction: string) => (direction === 'up' ? ' down ' : ' up '))));
    }),
    { seed: 4 },
  );
});
