import { describe, expect, it } from 'vitest';
import { cellFormula } from '../../src/formula/cell-formula.js';
import type { Decimal } from '../../src/formula/decimal.js';
import { sensitivities } from '../../src/formula/derivative.js';
import { median } from '../../src/formula/expression.js';
import { Plan } from '../../src/formula/plan.js';
import { quantity } from '../../src/formula/quantity.js';
import { Missing } from '../../src/formula/reading.js';
import { Sheet } from '../../src/formula/sheet.js';
import { gram, kilogram } from '../../src/formula/units.js';
import { figuresText, generalText } from '../../src/formula/working-text.js';
import { given, onlyDigits } from './given.js';

const inputs = ['a', 'b', 'c', 'd'].map((key) => quantity({ key, symbol: key, unit: gram }));
const ofThree = quantity({ key: 'ofThree', symbol: 'x', unit: gram, is: median(inputs.slice(0, 3)) });
const ofFour = quantity({ key: 'ofFour', symbol: 'y', unit: gram, is: median(inputs) });
const sheet = Sheet.define([...inputs, ofThree, ofFour]);
const plan = new Plan(sheet, ['ofThree', 'ofFour']);
const found = (...values: readonly string[]) => plan.evaluate(given(Object.fromEntries(values.map((value, i) => [['a', 'b', 'c', 'd'][i]!, value]))));
const text = (outcome: unknown): string => String(outcome);

describe('the median', () => {
  it.each([
    [['3', '1', '2', '10'], '2', '2.5'],
    [['1', '1', '5', '0'], '1', '1'],
    [['-4', '7', '0', '8'], '0', '3.5'],
  ])('of %j: %s of the first three, %s of all four', (values, three, four) => {
    expect(text(found(...values).outcome('ofThree'))).toBe(three);
    expect(text(found(...values).outcome('ofFour'))).toBe(four);
  });

  it('moves with the middle ones alone', () => {
    const slopes = (key: string) => Object.fromEntries([...(sensitivities(plan, found('3', '1', '2', '10'), key) as ReadonlyMap<string, Decimal>)].map(([at, slope]) => [at, text(slope)]));
    expect(slopes('ofThree')).toEqual({ c: '1' });
    expect(slopes('ofFour')).toEqual({ a: '0.5', c: '0.5' });
  });

  it('of what is not all known names every gap', () => {
    const outcome = found('3', '1').outcome('ofFour');
    expect(outcome).toBeInstanceOf(Missing);
    expect((outcome as Missing).missing).toEqual(['c', 'd']);
  });

  it('is written for a person and for a cell', () => {
    const findings = found('3', '1', '2', '10');
    expect(generalText(ofThree, sheet, findings, onlyDigits)).toBe('median(a; b; c)');
    expect(figuresText(ofThree, sheet, findings, onlyDigits)).toBe('median(3; 1; 2)');
    expect(cellFormula(ofThree.is!, sheet, (key) => key.toUpperCase() + '1')).toBe('MEDIAN(A1,B1,C1)');
  });

  it('needs figures of one unit', () => {
    const heavy = quantity({ key: 'heavy', symbol: 'h', unit: kilogram });
    expect(() => Sheet.define([...inputs, heavy, quantity({ key: 'z', symbol: 'z', unit: gram, is: median([...inputs, heavy]) })])).toThrow('median: g is 1/1000 kg');
  });
});
