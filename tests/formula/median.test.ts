import { describe, expect, it } from 'vitest';
import { cellFormula } from '../../src/formula/cell-formula.js';
import type { Decimal } from '../../src/formula/decimal.js';
import { sensitivities } from '../../src/formula/derivative.js';
import { median } from '../../src/formula/expression.js';
import { Plan } from '../../src/formula/plan.js';
import { quantity } from '../../src/formula/quantity.js';
import { Missing, Refused } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import { Sheet } from '../../src/formula/sheet.js';
import { gram, kilogram, millilitre } from '../../src/formula/units.js';
import { figuresMath, mathMarkup } from '../../src/formula/working-mathml.js';
import { figuresText, generalText } from '../../src/formula/working-text.js';
import { evaluated, given, onlyDigits, told } from './given.js';
import { Wide, readCell } from './read-back.js';

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

  it('of one is it, and of two their mean', () => {
    const of = (count: number, values: Record<string, string>) => told(evaluated([...inputs, quantity({ key: 'y', symbol: 'y', unit: gram, is: median(inputs.slice(0, count)) })], values).findings.outcome('y'));
    expect([of(1, { a: '7' }), of(2, { a: '7', b: '4' })]).toEqual(['7', '5.5']);
  });

  it('of the same figures in any order is the same', () => {
    const orders = [['3', '1', '2', '10'], ['10', '2', '1', '3'], ['2', '10', '3', '1'], ['1', '3', '10', '2']];
    expect(new Set(orders.map((values) => text(found(...values).outcome('ofFour'))))).toEqual(new Set(['2.5']));
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

  it('is refused with any of them, and a refusal outweighs a gap, wherever it stands', () => {
    const refused = new Refused({ code: 'too-much', quantity: 'c' });
    const outcome = (values: Record<string, string | Outcome>): Outcome => plan.evaluate(given(values)).outcome('ofThree');
    expect(outcome({ a: '9', b: '1', c: refused })).toBe(refused);
    expect(outcome({ b: '1', c: refused })).toBe(refused);
    expect(outcome({ a: refused, b: '1' })).toBe(refused);
  });

  it('hands its slope on to the formula in the middle', () => {
    // 2a, b and 3c at 2, 9, 2 are 4, 9 and 6: the third
    const [a, b, c] = inputs;
    const run = evaluated([...inputs, quantity({ key: 'y', symbol: 'y', unit: gram, is: median([a!.times('2'), b!, c!.times('3')]) })], { a: '2', b: '9', c: '2' });
    expect([...(sensitivities(run.plan, run.findings, 'y') as ReadonlyMap<string, Decimal>)].map(([at, slope]) => [at, text(slope)])).toEqual([['c', '3']]);
  });

  it('is written for a person and for a cell', () => {
    const findings = found('3', '1', '2', '10');
    expect(generalText(ofThree, sheet, findings, onlyDigits)).toBe('median(a; b; c)');
    expect(figuresText(ofThree, sheet, findings, onlyDigits)).toBe('median(3; 1; 2)');
    expect(cellFormula(ofThree.is!, sheet, (key) => key.toUpperCase() + '1')).toBe('MEDIAN(A1,B1,C1)');
    expect(readCell('MEDIAN(A1,B1,C1)', { A1: new Wide(3), B1: new Wide(1), C1: new Wide(-4) })?.toString()).toBe('1');
    expect(mathMarkup(figuresMath(ofThree, sheet, findings, onlyDigits))).toContain(
      '<mrow><mi>median</mi><mo>(</mo><mn>3</mn><mo>;</mo><mn>1</mn><mo>;</mo><mn>2</mn><mo>)</mo></mrow>',
    );
  });

  it('needs figures of one unit', () => {
    const heavy = quantity({ key: 'heavy', symbol: 'h', unit: kilogram });
    expect(() => Sheet.define([...inputs, heavy, quantity({ key: 'z', symbol: 'z', unit: gram, is: median([...inputs, heavy]) })])).toThrow('median: g is 1/1000 kg');
    const volume = quantity({ key: 'volume', symbol: 'V', unit: millilitre });
    expect(() => Sheet.define([...inputs, volume, quantity({ key: 'z', symbol: 'z', unit: gram, is: median([...inputs, volume]) })])).toThrow('median: g against mL');
  });
});
