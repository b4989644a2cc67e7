import { describe, expect, it } from 'vitest';
import { Decimal } from '../../src/formula/decimal.js';
import { constant, exponential, greatest, least, logarithm, named, whereBelow } from '../../src/formula/expression.js';
import type { Expression } from '../../src/formula/expression.js';
import { Plan } from '../../src/formula/plan.js';
import type { Givens } from '../../src/formula/plan.js';
import { choice, quantity } from '../../src/formula/quantity.js';
import type { Quantity } from '../../src/formula/quantity.js';
import { Missing, Refused, isKnown, joinUnknown } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import { Sheet, SheetFault } from '../../src/formula/sheet.js';
import { gram, milligram, millilitre, millimole, millimolePerGram, molePerLitre, one, percent } from '../../src/formula/units.js';
import { evaluated, given, told } from './given.js';

const x = quantity({ key: 'x', symbol: 'x', unit: one });
const z = quantity({ key: 'z', symbol: 'z', unit: one });
const route = choice('route', ['acid', 'base']);
const result = (is: Expression, key = 'y'): Quantity => quantity({ key, symbol: key, unit: one, is });
const refusedAt = (key: string, code = 'illegible'): Refused => new Refused({ code, quantity: key });

/** What comes out of one formula over x, z and the route. */
function outcome(is: Expression, values: Readonly<Record<string, string | Outcome>> = {}, options: Readonly<Record<string, string>> = {}): string {
  return told(evaluated([x, z, route, result(is)], values, options).findings.outcome('y'));
}

describe('the plan', () => {
  const a = quantity({ key: 'a', symbol: 'a', unit: one, is: named('b').plus(named('c')) });
  const b = quantity({ key: 'b', symbol: 'b', unit: one, is: named('c').times(x) });
  const c = quantity({ key: 'c', symbol: 'c', unit: one, is: route.of({ acid: x, base: z }) });
  const aside = quantity({ key: 'aside', symbol: 'd', unit: one, is: named('w').times(z) });
  const w = quantity({ key: 'w', symbol: 'w', unit: one });
  const sheet = Sheet.define([a, aside, b, c, w, x, z, route]);

  it('puts each quantity after all that its formula names', () => {
    const { order } = new Plan(sheet, sheet.quantities.keys());
    expect([...order].sort()).toEqual(['a', 'aside', 'b', 'c', 'w', 'x', 'z']);
    const before = (first: string, then: string): void => expect(order.indexOf(first)).toBeLessThan(order.indexOf(then));
    before('x', 'c');
    before('z', 'c');
    before('c', 'b');
    before('x', 'b');
    before('b', 'a');
    before('c', 'a');
    before('w', 'aside');
  });

  it('holds the asked-for quantities, what they rest on, and nothing else', () => {
    const plan = new Plan(sheet, ['b']);
    expect([...plan.order].sort()).toEqual(['b', 'c', 'x', 'z']);
    expect(plan.choices).toEqual(['route']);
    expect(plan.has('c')).toBe(true);
    expect(plan.has('a')).toBe(false);
    expect(() => plan.evaluate(given({})).outcome('a')).toThrow(RangeError);
    expect(new Plan(sheet, ['w', 'aside']).choices).toEqual([]);
    expect(new Plan(sheet, []).order).toEqual([]);
  });

  it('is refused for a quantity that the sheet does not have', () => {
    expect(() => new Plan(sheet, ['b', 'lost'])).toThrow(SheetFault);
  });

  it('can be evaluated again and again, each time from other givens', () => {
    const plan = new Plan(sheet, ['a']);
    const first = plan.evaluate(given({ x: '2', z: '5' }, { route: 'acid' }));
    const second = plan.evaluate(given({ x: '2', z: '5' }, { route: 'base' }));
    expect(told(first.outcome('a'))).toBe('6');
    expect(told(second.outcome('a'))).toBe('15');
    expect(told(first.outcome('a'))).toBe('6');
    expect([first.option('route'), second.option('route')]).toEqual(['acid', 'base']);
  });

  it('asks for no more than the asked-for figure needs, and once', () => {
    const asked: string[] = [];
    const spy: Givens = {
      input: (key) => (asked.push(key), new Decimal(3)),
      option: (key) => (asked.push(key), 'acid'),
    };
    const findings = new Plan(sheet, sheet.quantities.keys()).evaluate(spy);
    expect(asked).toEqual([]);
    expect(told(findings.outcome('a'))).toBe('12');
    findings.outcome('b');
    findings.option('route');
    // z stands in the branch that was not taken
    expect([...asked].sort()).toEqual(['route', 'x']);
  });

  it('lets an option rest on figures found so far', () => {
    const passes = choice('passes', ['one', 'two']);
    const total = result(passes.of({ one: x, two: x.plus(z) }), 'total');
    const plan = new Plan(Sheet.define([x, z, passes, total]), ['total']);
    const chosen = (values: Record<string, string>): string =>
      told(
        plan
          .evaluate({
            ...given(values),
            option: (_, findings) => {
              const found = findings.outcome('x');
              return isKnown(found) ? (found.lt(10) ? 'one' : 'two') : found;
            },
          })
          .outcome('total'),
      );
    expect(chosen({ x: '9' })).toBe('9');
    expect(chosen({ x: '10', z: '1' })).toBe('11');
    expect(chosen({ z: '1' })).toBe('missing: x');
  });
});

describe('figures', () => {
  it('a titration, worked by hand', () => {
    // 0.1 mol/L, 5.37 mL less a blank of 0.12 mL, 2.5 g: 0.1 · 5.25 / 2.5 = 0.21 mmol/g
    const c = quantity({ key: 'c', symbol: 'c', unit: molePerLitre });
    const v = quantity({ key: 'v', symbol: 'V', unit: millilitre });
    const v0 = quantity({ key: 'v0', symbol: 'V_0', unit: millilitre });
    const m = quantity({ key: 'm', symbol: 'm', unit: gram });
    const b = quantity({ key: 'b', symbol: 'b', unit: millimolePerGram, is: c.times(v.minus(v0)).per(m) });
    const n = quantity({ key: 'n', symbol: 'n', unit: millimole, is: b.times(m) });
    const { findings } = evaluated([c, v, v0, m, b, n], { c: '0.1', v: '5.37', v0: '0.12', m: '2.5' });
    expect(told(findings.outcome('b'))).toBe('0.21');
    expect(told(findings.outcome('n'))).toBe('0.525');
  });

  it('have 34 digits, and the last is rounded half to even', () => {
    expect(outcome(x.per('3'), { x: '1' })).toBe('0.3333333333333333333333333333333333');
    expect(outcome(x.per('3'), { x: '2' })).toBe('0.6666666666666666666666666666666667');
    expect(outcome(x.plus('0.5'), { x: '1000000000000000000000000000000002' })).toBe('1000000000000000000000000000000002');
    expect(outcome(x.plus('0.5'), { x: '1000000000000000000000000000000003' })).toBe('1000000000000000000000000000000004');
    expect(outcome(x.plus(z), { x: '0.1', z: '0.2' })).toBe('0.3');
  });

  it.each<[string, Expression, string]>([
    ['sum', x.plus(z), '1'],
    ['difference', x.minus(z), '7'],
    ['product', x.times(z), '-12'],
    ['quotient', x.per(z), '-1.333333333333333333333333333333333'],
    ['least', least(x, z), '-3'],
    ['least, the other way', least(z, x), '-3'],
    ['greatest', greatest(x, z), '4'],
    ['greatest, the other way', greatest(z, x), '4'],
    ['square', z.power('2'), '9'],
    ['cube of a negative', z.power('3'), '-27'],
    ['power of a negative to a named whole exponent', z.power(x), '81'],
    ['inverse', x.power('-1'), '0.25'],
    ['root', x.power('0.5'), '2'],
    ['broken power', x.power('1.5'), '8'],
    ['power zero', z.power('0'), '1'],
    // e and ln 2 to 34 digits, as any table of constants prints them
    ['exponential', exponential('1'), '2.718281828459045235360287471352662'],
    ['logarithm', logarithm('2'), '0.6931471805599453094172321214581766'],
    ['constant', constant('-0.50'), '-0.5'],
  ])('%s', (_, is, figure) => {
    expect(outcome(is, { x: '4', z: '-3' })).toBe(figure);
  });

  it('roots of zero and of negative zero are zero', () => {
    expect(outcome(x.power('0.5'), { x: '0' })).toBe('0');
    expect(outcome(x.power('0.5'), { x: '-0' })).toMatch(/^-?0$/);
    expect(outcome(x.power('1.5'), { x: '0' })).toBe('0');
  });

  it('converts by the exact factor', () => {
    const m = quantity({ key: 'm', symbol: 'm', unit: gram });
    const inMilligrams = quantity({ key: 'y', symbol: 'y', unit: milligram, is: m.in(milligram) });
    expect(told(evaluated([m, inMilligrams], { m: '1.25' }).findings.outcome('y'))).toBe('1250');
    const share = quantity({ key: 'y', symbol: 'y', unit: percent, is: x.per(z).in(percent) });
    expect(told(evaluated([x, z, share], { x: '1', z: '8' }).findings.outcome('y'))).toBe('12.5');
  });
});

describe('what is not known', () => {
  it('names every missing input, each once', () => {
    expect(outcome(x.plus(z).times(x))).toBe('missing: x, z');
    expect(outcome(x.plus(z).times(x), { x: '1' })).toBe('missing: z');
    expect(outcome(exponential(x.power(z)), { z: '1' })).toBe('missing: x');
    expect(outcome(least(x, z), { z: '1' })).toBe('missing: x');
    expect(outcome(x.minus(x).in(percent).in(one))).toBe('missing: x');
  });

  it('passes through formulas over formulas', () => {
    const middle = result(x.plus(z), 'middle');
    const { findings } = evaluated([x, z, middle, result(middle.times(middle).per(z))], { z: '0' });
    expect(told(findings.outcome('middle'))).toBe('missing: x');
    expect(told(findings.outcome('y'))).toBe('missing: x');
  });

  it('a refused input outweighs a missing one, on either side, and is passed on as it is', () => {
    const refused = refusedAt('x');
    for (const is of [x.plus(z), z.plus(x), z.times(x).per(z), least(z, exponential(x)), whereBelow(z, x, '1', '2'), z.power(x)]) {
      expect(evaluated([x, z, result(is)], { x: refused }).findings.outcome('y')).toBe(refused);
    }
  });

  it('of two refusals the first is told', () => {
    expect(outcome(x.plus(z), { x: refusedAt('x', 'one'), z: refusedAt('z', 'two') })).toBe('refused: one at x');
    expect(outcome(z.plus(x), { x: refusedAt('x', 'one'), z: refusedAt('z', 'two') })).toBe('refused: two at z');
  });

  it('joins two unknowns', () => {
    const figure = new Decimal(1);
    const gap = new Missing(['x', 'z']);
    expect(joinUnknown(figure, gap)).toBe(gap);
    expect(joinUnknown(gap, figure)).toBe(gap);
    expect(joinUnknown(gap, new Missing(['w', 'x']))).toEqual(new Missing(['x', 'z', 'w']));
  });

  it('an untaken branch may be unknown', () => {
    const is = route.of({ acid: x, base: z });
    expect(outcome(is, { x: '1' }, { route: 'acid' })).toBe('1');
    expect(outcome(is, { x: '1' }, { route: 'base' })).toBe('missing: z');
    expect(outcome(is, { x: '1', z: refusedAt('z') }, { route: 'acid' })).toBe('1');
    expect(outcome(route.of({ acid: x, base: x.per('0') }), { x: '1' }, { route: 'acid' })).toBe('1');
    expect(outcome(whereBelow(x, '5', x, z), { x: '1' })).toBe('1');
    expect(outcome(whereBelow(x, '5', z, x), { x: '1' })).toBe('missing: z');
  });

  it('a choice that is not made is missing itself', () => {
    expect(outcome(route.of({ acid: x, base: z }), { x: '1', z: '2' })).toBe('missing: route');
    expect(outcome(route.of({ acid: '1', base: '2' }).plus(x))).toBe('missing: route, x');
  });

  it('an option that the choice does not have is refused at the choice', () => {
    for (const option of ['both', '', 'Acid', 'constructor', '__proto__']) {
      expect(evaluated([route, result(route.of({ acid: '1', base: '2' }))], {}, { route: option }).findings.outcome('y')).toEqual(
        new Refused({ code: 'unknown-option', quantity: 'route', params: { option } }),
      );
    }
  });
});

describe('thresholds', () => {
  const is = whereBelow(x, z, '1', '2');

  it('are strictly below', () => {
    expect(outcome(is, { x: '4.99', z: '5' })).toBe('1');
    expect(outcome(is, { x: '5', z: '5.00' })).toBe('2');
    expect(outcome(is, { x: '5.01', z: '5' })).toBe('2');
    expect(outcome(is, { x: '-0', z: '0' })).toBe('2');
  });

  it('need both sides', () => {
    expect(outcome(is, { x: '1' })).toBe('missing: z');
    expect(outcome(is)).toBe('missing: x, z');
  });
});

describe('figures without a value are refused at their quantity, never thrown', () => {
  it.each<[string, Expression, string]>([
    ['over zero', x.per(z), 'division-by-zero'],
    ['zero over zero', z.per(z), 'division-by-zero'],
    ['zero inverted', z.power('-1'), 'division-by-zero'],
    ['zero to a broken negative power', z.power('-0.5'), 'division-by-zero'],
    ['logarithm of zero', logarithm(z), 'logarithm-of-nothing'],
    ['logarithm of a negative', logarithm(x), 'logarithm-of-nothing'],
    ['root of a negative', x.power('0.5'), 'root-of-negative'],
    ['broken power of a negative', x.power('0.3'), 'root-of-negative'],
    ['negative to a named broken power', x.power(z.plus('1.5')), 'root-of-negative'],
    ['exponential beyond all bounds', exponential(x.times('-1e30')), 'not-finite'],
    ['power beyond all bounds', x.power('1e30'), 'not-finite'],
  ])('%s', (_, is, code) => {
    expect(outcome(is, { x: '-4', z: '0' })).toBe(`refused: ${code} at y`);
  });

  it('and what rests on them tells that refusal', () => {
    const middle = result(x.per(z), 'middle');
    const { findings } = evaluated([x, z, middle, result(exponential(middle.plus(x)))], { x: '1', z: '0' });
    expect(told(findings.outcome('y'))).toBe('refused: division-by-zero at middle');
    expect(told(findings.outcome('z'))).toBe('0');
  });

  it('an exponential that vanishes is zero, and over it is refused', () => {
    expect(outcome(exponential(x), { x: '-1e30' })).toBe('0');
    expect(outcome(z.per(exponential(x)), { x: '-1e30', z: '1' })).toBe('refused: division-by-zero at y');
  });

  it('an infinite figure is refused at its input, wherever it would vanish again', () => {
    for (const value of ['Infinity', '-Infinity', 'NaN']) {
      expect(outcome(x, { x: value })).toBe('refused: not-finite at x');
      expect(outcome(z.per(x), { x: value, z: '1' })).toBe('refused: not-finite at x');
      expect(outcome(least(z, x), { x: value, z: '1' })).toBe('refused: not-finite at x');
    }
  });
});
