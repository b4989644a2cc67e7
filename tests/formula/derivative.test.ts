import { describe, expect, it } from 'vitest';
import { derivative, sensitivities } from '../../src/formula/derivative.js';
import type { Decimal } from '../../src/formula/decimal.js';
import { exponential, greatest, least, logarithm, whereBelow } from '../../src/formula/expression.js';
import type { Expression } from '../../src/formula/expression.js';
import { choice, quantity } from '../../src/formula/quantity.js';
import type { Quantity } from '../../src/formula/quantity.js';
import { Missing, Refused } from '../../src/formula/reading.js';
import type { Unknown } from '../../src/formula/reading.js';
import { gram, kilogram, milligram, millilitre, millimolePerGram, molePerLitre, one, percent } from '../../src/formula/units.js';
import { evaluated } from './given.js';

const x = quantity({ key: 'x', symbol: 'x', unit: one });
const z = quantity({ key: 'z', symbol: 'z', unit: one });
const route = choice('route', ['acid', 'base']);
const result = (is: Expression, key = 'y'): Quantity => quantity({ key, symbol: key, unit: one, is });

/** The sensitivities of y as text, by input. */
function slopes(entries: Parameters<typeof evaluated>[0], values: Record<string, string>, options: Record<string, string> = {}): Record<string, string> {
  const { plan, findings } = evaluated(entries, values, options);
  const found = sensitivities(plan, findings, 'y');
  return Object.fromEntries([...(found as ReadonlyMap<string, Decimal>)].map(([key, value]) => [key, value.toString()]));
}

const of = (is: Expression, values: Record<string, string>): Record<string, string> => slopes([x, z, result(is)], values);

describe('rules of differentiation', () => {
  it.each<[string, Expression, Record<string, string>]>([
    ['sum', x.plus(z), { x: '1', z: '1' }],
    ['difference', x.minus(z), { x: '1', z: '-1' }],
    ['product', x.times(z), { x: '5', z: '2' }],
    // d(x/z) = dx/z − x dz/z² = 0.2, −0.08
    ['quotient', x.per(z), { x: '0.2', z: '-0.08' }],
    ['constant factor', x.times('-3'), { x: '-3' }],
    ['square', x.power('2'), { x: '4' }],
    ['inverse square', x.power('-2'), { x: '-0.25' }],
    // d z^0.5 at 5 is 1/(2√5)
    ['root', z.power('0.5'), { z: '0.2236067977499789696409173668731276' }],
    // d x^z: z x^(z−1) = 80 and x^z ln x = 32 ln 2
    ['power', x.power(z), { x: '80', z: '22.18070977791824990135142788666165' }],
    ['logarithm', logarithm(z), { z: '0.2' }],
    ['exponential', exponential(x.minus('2')), { x: '1' }],
    ['an input named twice', x.times(x).plus(x), { x: '5' }],
    ['an input that cancels', x.minus(x).plus(z), { x: '0', z: '1' }],
  ])('%s', (_, is, expected) => {
    expect(of(is, { x: '2', z: '5' })).toEqual(expected);
  });

  it('runs through formulas over formulas, adding up all ways', () => {
    // y = u · v with u = x + z, v = x · z: dy/dx = v + u z, dy/dz = v + u x
    const u = result(x.plus(z), 'u');
    const v = result(x.times(z), 'v');
    expect(slopes([x, z, u, v, result(u.times(v))], { x: '2', z: '5' })).toEqual({ x: '45', z: '24' });
  });

  it('knows only inputs, and only those that the quantity rests on', () => {
    const { plan, findings } = evaluated([x, z, result(x.times('2')), result(z, 'other')], { x: '1', z: '1' });
    expect([...(sensitivities(plan, findings, 'y') as ReadonlyMap<string, Decimal>).keys()]).toEqual(['x']);
    expect((derivative(plan, findings, 'y', 'z') as Decimal).toString()).toBe('0');
    expect((derivative(plan, findings, 'y', 'x') as Decimal).toString()).toBe('2');
  });

  it('an input moves with itself', () => {
    const { plan, findings } = evaluated([x], { x: '7' });
    expect((derivative(plan, findings, 'x', 'x') as Decimal).toString()).toBe('1');
  });
});

describe('units', () => {
  it('is in the unit of the result per unit of the input', () => {
    // b = c (V − V0) / m with c = 0.1 mol/L, V = 5.37 mL, V0 = 0.12 mL, m = 2.5 g, so b = 0.21 mmol/g:
    // ∂b/∂c = 5.25/2.5, ∂b/∂V = 0.1/2.5, ∂b/∂m = −0.21/2.5
    const c = quantity({ key: 'c', symbol: 'c', unit: molePerLitre });
    const v = quantity({ key: 'v', symbol: 'V', unit: millilitre });
    const v0 = quantity({ key: 'v0', symbol: 'V_0', unit: millilitre });
    const m = quantity({ key: 'm', symbol: 'm', unit: gram });
    const y = quantity({ key: 'y', symbol: 'b', unit: millimolePerGram, is: c.times(v.minus(v0)).per(m) });
    expect(slopes([c, v, v0, m, y], { c: '0.1', v: '5.37', v0: '0.12', m: '2.5' })).toEqual({ c: '2.1', v: '0.04', v0: '-0.04', m: '-0.084' });
  });

  it('counts conversions', () => {
    const m = quantity({ key: 'm', symbol: 'm', unit: kilogram });
    const y = quantity({ key: 'y', symbol: 'y', unit: milligram, is: m.in(milligram) });
    expect(slopes([m, y], { m: '3' })).toEqual({ m: '1000000' });
    expect(slopes([x, z, quantity({ key: 'y', symbol: 'y', unit: percent, is: x.per(z).in(percent) })], { x: '1', z: '2' })).toEqual({ x: '50', z: '-25' });
  });
});

describe('branches', () => {
  it('follow the option that was taken', () => {
    const y = result(route.of({ acid: x.times('3'), base: z.power('2') }));
    expect(slopes([x, z, route, y], { x: '2', z: '5' }, { route: 'acid' })).toEqual({ x: '3' });
    expect(slopes([x, z, route, y], { x: '2', z: '5' }, { route: 'base' })).toEqual({ z: '10' });
    // the input of the other branch need not be known
    expect(slopes([x, z, route, y], { z: '5' }, { route: 'base' })).toEqual({ z: '10' });
  });

  it('follow the side of the threshold, and at the threshold the upper one', () => {
    const is = whereBelow(x, z, x.times('2'), x.times('7'));
    expect(of(is, { x: '1', z: '3' })).toEqual({ x: '2' });
    expect(of(is, { x: '3', z: '3' })).toEqual({ x: '7' });
    expect(of(is, { x: '4', z: '3' })).toEqual({ x: '7' });
  });

  it('follow the lesser and the greater, and of two equals the first', () => {
    expect(of(least(x, z), { x: '1', z: '3' })).toEqual({ x: '1' });
    expect(of(least(x, z), { x: '4', z: '3' })).toEqual({ z: '1' });
    expect(of(greatest(x, z), { x: '1', z: '3' })).toEqual({ z: '1' });
    expect(of(greatest(x, z), { x: '4', z: '3' })).toEqual({ x: '1' });
    expect(of(least(x, z), { x: '3', z: '3' })).toEqual({ x: '1' });
    expect(of(greatest(x, z), { x: '3', z: '3' })).toEqual({ x: '1' });
    expect(of(greatest(x.minus('10'), '0').times(z), { x: '1', z: '3' })).toEqual({ z: '0' });
  });
});

describe('flat places of powers', () => {
  it('a power of zero that is not zero has no slope of its own', () => {
    expect(of(x.power('2').plus(z), { x: '0', z: '1' })).toEqual({ x: '0', z: '1' });
    expect(of(x.power('1').plus(z), { x: '0', z: '1' })).toEqual({ x: '1', z: '1' });
  });

  it('x⁰ and 0ᵖ move with nothing', () => {
    for (const slope of Object.values(of(x.power('0').plus(x), { x: '0' }))) expect(slope).toBe('1');
    const found = of(x.power(z).plus(z), { x: '0', z: '2' });
    expect(found['z']).toBe('1');
    expect(found['x']).toBe('0');
  });
});

describe('what is not known', () => {
  const unknown = (is: Expression, values: Record<string, string>): unknown => {
    const { plan, findings } = evaluated([x, z, result(is)], values);
    const found = sensitivities(plan, findings, 'y');
    expect(derivative(plan, findings, 'y', 'x')).toBe(found as Unknown);
    return found;
  };

  it('has no slope but the reason', () => {
    expect(unknown(x.plus(z), { z: '1' })).toEqual(new Missing(['x']));
    expect(unknown(x.per(z), { x: '1', z: '0' })).toEqual(new Refused({ code: 'division-by-zero', quantity: 'y' }));
  });

  it('a quantity outside the plan is a mistake of the program', () => {
    const { plan, findings } = evaluated([x, result(x)], { x: '1' });
    expect(() => sensitivities(plan, findings, 'lost')).toThrow(RangeError);
  });
});
