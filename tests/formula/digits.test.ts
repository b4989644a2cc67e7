import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Decimal, decimal } from '../../src/formula/decimal.js';
import { shownText } from '../../src/formula/digits.js';
import type { Digits } from '../../src/formula/quantity.js';

const shown = (value: string, digits: Digits): string => shownText(new Decimal(value), digits);

describe('a value as it is reported', () => {
  it.each([
    ['1.005', 2, '1.01'],
    ['2.5', 0, '3'],
    ['3.5', 0, '4'],
    ['-2.5', 0, '-3'],
    ['0.12499999999999999999', 2, '0.12'],
    ['7', 3, '7.000'],
    ['99.995', 2, '100.00'],
  ])('%s to %i decimals', (value, decimals, text) => {
    expect(shown(value, { decimals })).toBe(text);
  });

  it.each([
    ['1.23456', 4, '1.235'],
    ['0.0012345', 3, '0.00123'],
    ['0.00012345', 4, '0.0001235'],
    ['2', 4, '2.000'],
    ['123456', 4, '123456'],
    ['1234.5', 4, '1235'],
    ['-56.1056', 4, '-56.11'],
    ['0', 4, '0'],
    // rounding that adds a digit before the point takes one behind it
    ['9.9996', 4, '10.00'],
    ['0.099996', 4, '0.1000'],
    ['-99.996', 4, '-100.0'],
    ['999.96', 4, '1000'],
    ['99999.6', 4, '100000'],
  ])('%s to %i significant digits', (value, significant, text) => {
    expect(shown(value, { significant })).toBe(text);
  });

  it('never shows fewer or more digits than it is asked for', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: 1n, max: 10n ** 12n }), fc.integer({ min: 0, max: 20 }), fc.integer({ min: 1, max: 8 }), (digits, places, significant) => {
        const value = new Decimal(`${digits}e-${places}`);
        const text = shownText(value, { significant });
        const count = text.replace('.', '').replace(/^0+/, '').length;
        if (text.includes('.')) expect(count).toBe(significant);
        else expect(count).toBeGreaterThanOrEqual(significant);
        // off by half of the last digit at most
        const last = new Decimal(10).pow(-(text.split('.')[1] ?? '').length);
        expect(value.minus(text).abs().times(2).lte(last)).toBe(true);
      }),
      { seed: 80_000, numRuns: 400 },
    );
  });

  it('takes its decimals from the band its size falls in', () => {
    // as a method may prescribe: two decimals below 1, one below 10, none above
    const digits: Digits = { bands: [{ below: '1', decimals: 2 }, { below: '10', decimals: 1 }, { decimals: 0 }] };
    expect(['0.456', '-0.456', '1', '5.55', '10', '-123.4'].map((value) => shown(value, digits))).toEqual(['0.46', '-0.46', '1.0', '5.6', '10', '-123']);
  });
});

describe('decimals', () => {
  it('are the project’s own and leave the shared ones alone', async () => {
    const { Decimal: Shared } = await import('decimal.js');
    expect(Decimal.precision).toBe(34);
    expect(Decimal.rounding).toBe(Shared.ROUND_HALF_EVEN);
    expect([Shared.precision, Shared.rounding]).toEqual([20, Shared.ROUND_HALF_UP]);
    expect(new Decimal(1).div(3).toString()).toBe(`0.${'3'.repeat(34)}`);
    expect(new Shared(1).div(3).toString()).toBe(`0.${'3'.repeat(20)}`);
  });

  it('of literal text are made once', () => {
    expect(decimal('56.1056')).toBe(decimal('56.1056'));
    expect(decimal('56.1056').toString()).toBe('56.1056');
    expect(() => decimal('56,1')).toThrow();
  });
});
