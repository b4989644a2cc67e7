import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { UnitFault, balancedUnit } from '../../src/formula/balance.js';
import { cellFormula } from '../../src/formula/cell-formula.js';
import type { Decimal } from '../../src/formula/decimal.js';
import { sensitivities } from '../../src/formula/derivative.js';
import { median } from '../../src/formula/expression.js';
import type { Expression } from '../../src/formula/expression.js';
import { quantity } from '../../src/formula/quantity.js';
import type { Quantity } from '../../src/formula/quantity.js';
import { Refused } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import { Sheet, SheetFault } from '../../src/formula/sheet.js';
import { gram, kilogram, millilitre, one } from '../../src/formula/units.js';
import { figuresMath, mathMarkup } from '../../src/formula/working-mathml.js';
import { figuresText, generalText } from '../../src/formula/working-text.js';
import { evaluated, onlyDigits, told } from './given.js';
import { Wide, readCell } from './read-back.js';

const input = (key: string): Quantity => quantity({ key, symbol: key, unit: gram });
const [a, b, c] = [input('a'), input('b'), input('c')] as const;
const inputs = [a, b, c, input('d')];
const middle = (of: readonly Expression[]): Quantity => quantity({ key: 'y', symbol: 'y', unit: gram, is: median(of) });

function of(values: readonly (string | Outcome | undefined)[]) {
  const typed = Object.fromEntries(values.flatMap((value, i) => (value === undefined ? [] : [['abcd'[i]!, value]])));
  return evaluated([...inputs, middle(inputs.slice(0, values.length))], typed);
}
const outcome = (...values: readonly (string | Outcome | undefined)[]): string => told(of(values).findings.outcome('y'));

describe('the middle of several figures', () => {
  it.each([
    [['7'], '7'],
    [['7', '4'], '5.5'],
    [['9', '1', '4'], '4'],
    [['9', '1', '4', '5'], '4.5'],
    [['4', '4', '9'], '4'],
    [['-3', '0', '-5'], '-3'],
    // by size, not by their digits
    [['10', '9', '100'], '10'],
  ])('of %j is %s', (values, expected) => {
    expect(outcome(...values)).toBe(expected);
  });

  it('of any order is the same', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -1000, max: 1000 }), { minLength: 1, maxLength: 4 }).chain((all) => fc.tuple(fc.constant(all), fc.shuffledSubarray(all, { minLength: all.length }))),
        ([all, shuffled]) => {
          expect(outcome(...all.map(String))).toBe(outcome(...shuffled.map(String)));
        }),
      { numRuns: 60, seed: 20_260_311 },
    );
  });

  it('is missing with any of them, even one that would not be in the middle', () => {
    expect(outcome('9', undefined, '4')).toBe('missing: b');
    expect(outcome(undefined, '1', undefined)).toBe('missing: a, c');
  });

  it('is refused with any of them, and a refusal outweighs a gap, wherever it stands', () => {
    const refused = new Refused({ code: 'too-much', quantity: 'c' });
    expect(of(['9', '1', refused]).findings.outcome('y')).toBe(refused);
    expect(of([undefined, '1', refused]).findings.outcome('y')).toBe(refused);
    expect(of([refused, '1', undefined]).findings.outcome('y')).toBe(refused);
  });
});

describe('its slope', () => {
  const slopes = (...values: readonly string[]): Record<string, string> => {
    const { plan, findings } = of(values);
    return Object.fromEntries([...(sensitivities(plan, findings, 'y') as ReadonlyMap<string, Decimal>)].map(([key, slope]) => [key, slope.toString()]));
  };

  it('is that of the one in the middle, or half that of either', () => {
    expect(slopes('9', '1', '4')).toEqual({ c: '1' });
    expect(slopes('9', '1', '4', '5')).toEqual({ c: '0.5', d: '0.5' });
    expect(slopes('7')).toEqual({ a: '1' });
  });

  it('runs on through formulas', () => {
    // median of 2a, b and 3c at 2, 9, 2: 4, 9, 6, so 3c
    const { plan, findings } = evaluated([...inputs, middle([a.times('2'), b, c.times('3')])], { a: '2', b: '9', c: '2' });
    expect(String((sensitivities(plan, findings, 'y') as ReadonlyMap<string, Decimal>).get('c'))).toBe('3');
  });
});

describe('written', () => {
  const { sheet, findings } = of(['9', '1', '-4']);
  const y = sheet.quantity('y');

  it('as text', () => {
    expect(generalText(y, sheet, findings, onlyDigits)).toBe('median(a; b; c)');
    expect(figuresText(y, sheet, findings, onlyDigits)).toBe('median(9; 1; −4)');
  });

  it('as MathML', () => {
    expect(mathMarkup(figuresMath(y, sheet, findings, onlyDigits)).replace(/^<math[^>]*>|<\/math>$/g, '')).toBe(
      '<mrow><mi>median</mi><mo>(</mo><mn>9</mn><mo>;</mo><mn>1</mn><mo>;</mo><mn>−4</mn><mo>)</mo></mrow>',
    );
  });

  it('for a cell, where a spreadsheet takes the same middle', () => {
    const cell = cellFormula(y.is!, sheet, (key) => `${key.toUpperCase()}1`);
    expect(cell).toBe('MEDIAN(A1,B1,C1)');
    expect(readCell(cell, { A1: new Wide(9), B1: new Wide(1), C1: new Wide(-4) })?.toString()).toBe('1');
  });
});

describe('its unit', () => {
  it('is that of all of them', () => {
    expect(balancedUnit(median(inputs), () => gram).symbol).toBe('g');
  });

  it('is none where they differ, in dimension or in scale', () => {
    const other = (unit: typeof gram) => [quantity({ key: 'o', symbol: 'o', unit }), ...inputs];
    for (const unit of [millilitre, kilogram, one]) {
      const [odd] = other(unit);
      expect(() => balancedUnit(median([a, odd!]), (key) => (key === 'o' ? unit : gram))).toThrow(UnitFault);
      expect(() => Sheet.define([...other(unit), middle([a, b, odd!])])).toThrow(SheetFault);
    }
  });
});
