import { describe, expect, it } from 'vitest';
import { Decimal } from '../../src/formula/decimal.js';
import { Plan } from '../../src/formula/plan.js';
import type { Findings, Givens } from '../../src/formula/plan.js';
import { choice, limit, quantity } from '../../src/formula/quantity.js';
import { Missing, Refused, isKnown } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import { Sheet } from '../../src/formula/sheet.js';
import { one } from '../../src/formula/units.js';
import { given, told } from './given.js';

// y = (a + b) · b where a = 2 x; z chooses between y and a; worked by hand beside each expectation
const x = quantity({ key: 'x', symbol: 'x', unit: one, limits: [limit('atMost', '10', 'too-much')] });
const b = quantity({ key: 'b', symbol: 'b', unit: one });
const a = quantity({ key: 'a', symbol: 'a', unit: one, is: x.times('2'), limits: [limit('atMost', '10', 'too-much')] });
const y = quantity({ key: 'y', symbol: 'y', unit: one, is: a.plus(b).times(b) });
const by = choice('by', ['large', 'small']);
const z = quantity({ key: 'z', symbol: 'z', unit: one, is: by.of({ large: y, small: a }) });
const sheet = Sheet.define([x, a, b, y, by, z]);
const plan = new Plan(sheet, sheet.quantities.keys());
const givens = given({ x: '3', b: '4' }, { by: 'large' });

const to = (value: string | Outcome) => (): Outcome => (typeof value === 'string' ? new Decimal(value) : value);
const evaluate = (replaced: Record<string, (normal: Outcome) => Outcome>, from: Givens = givens): Findings => plan.evaluate(from, new Map(Object.entries(replaced)));
const tell = (findings: Findings, ...keys: string[]): string[] => keys.map((key) => told(findings.outcome(key)));

describe('a replaced quantity', () => {
  it('takes what rests on it along, and nothing else', () => {
    expect(tell(evaluate({ a: to('1') }), 'x', 'a', 'b', 'y', 'z')).toEqual(['3', '1', '4', '20', '20']); // (1 + 4) · 4
    expect(tell(evaluate({ b: to('5') }), 'a', 'y')).toEqual(['6', '55']); // (6 + 5) · 5
    expect(tell(evaluate({ y: to('7') }), 'a', 'b', 'z')).toEqual(['6', '4', '7']);
  });

  it('is given what it would have been', () => {
    const doubled = (normal: Outcome): Outcome => (isKnown(normal) ? normal.times(2) : normal);
    expect(tell(evaluate({ a: doubled, b: doubled }), 'a', 'b', 'y')).toEqual(['12', '8', '160']); // (12 + 8) · 8
    expect(tell(evaluate({ x: doubled, a: doubled }, given({ x: '2', b: '4' })), 'x', 'a')).toEqual(['4', '16']);
  });

  it('is changed once, however many rest on it, and not at all while none does', () => {
    let times = 0;
    const findings = evaluate({ b: (normal) => (times++, normal) });
    expect(times).toBe(0);
    tell(findings, 'a');
    expect(times).toBe(0);
    tell(findings, 'y', 'z', 'b');
    expect(times).toBe(1);
  });

  it('may be an input that nobody gave, or one that was refused', () => {
    expect(tell(evaluate({ b: to('1') }, given({ x: '3' })), 'y')).toEqual(['7']);
    expect(tell(evaluate({ x: to('5') }, given({ x: '11', b: '1' })), 'a', 'y')).toEqual(['10', '11']);
  });

  it('may become unknown', () => {
    expect(tell(evaluate({ a: to(new Missing(['w'])) }), 'y')).toEqual(['missing: w']);
    expect(tell(evaluate({ a: to(new Refused({ code: 'no', quantity: 'a' })) }), 'z')).toEqual(['refused: no at a']);
  });

  it('keeps no limit of its own, but what rests on it keeps its own', () => {
    expect(tell(evaluate({ a: to('99') }), 'a', 'y')).toEqual(['99', '412']); // (99 + 4) · 4
    expect(tell(evaluate({ x: to('99') }), 'x', 'a')).toEqual(['99', 'refused: too-much at a']);
  });

  it('may not be infinite', () => {
    expect(tell(evaluate({ a: to('Infinity') }), 'y')).toEqual(['refused: not-finite at a']);
    expect(tell(evaluate({ b: to('NaN') }), 'y')).toEqual(['refused: not-finite at b']);
  });

  it('is seen by a choice that is made on results', () => {
    const onResults: Givens = { input: givens.input, option: (_, findings) => (told(findings.outcome('a')) === '6' ? 'large' : 'small') };
    expect(tell(evaluate({}, onResults), 'z')).toEqual(['40']);
    expect(tell(evaluate({ a: to('1') }, onResults), 'z')).toEqual(['1']);
  });

  it('leaves other evaluations of the plan as they are', () => {
    const before = plan.evaluate(givens);
    evaluate({ a: to('1') }).outcome('y');
    expect(tell(before, 'y')).toEqual(['40']);
    expect(tell(plan.evaluate(givens, new Map()), 'y')).toEqual(['40']);
  });

  it('must be in the plan', () => {
    expect(() => evaluate({ lost: to('1') })).toThrow(RangeError);
  });
});
