import { describe, expect, it } from 'vitest';
import { balancedUnit } from '../../src/formula/balance.js';
import { constant, exponential, greatest, least, logarithm, named, whereBelow } from '../../src/formula/expression.js';
import type { Expression } from '../../src/formula/expression.js';
import { choice, limit, quantity } from '../../src/formula/quantity.js';
import type { Choice , Quantity} from '../../src/formula/quantity.js';
import { Sheet, SheetFault, namesIn } from '../../src/formula/sheet.js';
import type { Unit } from '../../src/formula/unit.js';
import {
  cubicMetre, degreeCelsius, gram, gramPerHundredGram, gramPerMole, kelvin, kilogram, litre, millilitre,
  milligramPerGram, millimole, millimolePerGram, mole, molePerLitre, one, percent,
} from '../../src/formula/units.js';

/** The faults of a sheet; none when it is sound. */
function faultsOf(...entries: readonly (Quantity | Choice)[]): readonly string[] {
  try {
    Sheet.define(entries);
    return [];
  } catch (fault) {
    if (fault instanceof SheetFault) return fault.faults;
    throw fault;
  }
}

const input = (key: string, unit: Unit = one): Quantity => quantity({ key, symbol: key, unit });
const result = (key: string, is: Expression, unit: Unit = one): Quantity => quantity({ key, symbol: key, unit, is });

const mass = input('mass', gram);
const volume = input('volume', millilitre);
const strength = input('strength', molePerLitre);
const x = input('x');
const route = choice('route', ['acid', 'base']);

describe('a sheet is closed', () => {
  it('takes formulas whose names are all in it, in any order, and an entry that is listed again', () => {
    const amount = result('amount', volume.times(strength), millimole);
    const content = result('content', named('amount').per(mass), millimolePerGram);
    const sheet = Sheet.define([content, amount, mass, volume, strength, route, mass, route]);
    expect([...sheet.quantities.keys()]).toEqual(['content', 'amount', 'mass', 'volume', 'strength']);
    expect([...sheet.choices.keys()]).toEqual(['route']);
    expect(sheet.quantity('amount')).toBe(amount);
    expect(sheet.unitOf('amount')).toBe(millimole);
    expect(sheet.unitOf('nothing')).toBeUndefined();
    expect(() => sheet.quantity('nothing')).toThrow(SheetFault);
  });

  it('refuses an unknown name, wherever in the formula it stands', () => {
    const lost = named('lost');
    for (const is of [
      lost, x.plus(lost), lost.times(x), x.power(lost), exponential(lost), logarithm(x.per(lost)), lost.in(percent).in(one),
      least(x, lost), route.of({ acid: x, base: lost }), whereBelow(x, lost, '1', '2'), whereBelow(x, '1', '2', lost),
    ]) {
      expect(faultsOf(x, route, result('y', is))).toEqual(['y: names lost, which is not in the sheet']);
    }
  });

  it('refuses an unknown name as the bound of a limit, and a bound in another unit', () => {
    const bounded = (bound: Quantity): Quantity => quantity({ key: 'y', symbol: 'y', unit: one, limits: [limit('below', bound, 'too-much')] });
    expect(faultsOf(bounded(x))).toEqual(['y: names x, which is not in the sheet']);
    expect(faultsOf(x, bounded(x))).toEqual([]);
    expect(faultsOf(mass, bounded(mass))).toEqual(['y: result: g against a pure number']);
  });

  it('refuses a key that is defined twice, as a quantity or as a choice', () => {
    expect(faultsOf(x, input('x'))).toEqual(['x: defined twice']);
    expect(faultsOf(route, choice('route', ['acid']))).toEqual(['route: defined twice']);
    expect(faultsOf(route, input('route'))).toEqual(['route: defined twice']);
  });

  it('refuses a cycle and names the way round', () => {
    expect(faultsOf(result('a', named('a')))).toEqual(['a cycle: a → a']);
    expect(faultsOf(result('start', named('a')), result('a', named('b')), result('b', x.plus(named('c'))), result('c', named('a')), x)).toEqual([
      'a cycle: a → b → c → a',
    ]);
  });

  it('finds each of two cycles, one behind the other', () => {
    expect(faultsOf(result('a', named('b').plus(named('c'))), result('b', named('a')), result('c', named('a')))).toEqual([
      'a cycle: a → b → a',
      'a cycle: a → c → a',
    ]);
  });

  it('finds a cycle that runs through a branch or a bound', () => {
    expect(faultsOf(route, x, result('a', route.of({ acid: x, base: named('b') })), result('b', named('a')))).toEqual(['a cycle: a → b → a']);
    const bound = result('b', named('a'));
    const a = quantity({ key: 'a', symbol: 'a', unit: one, limits: [limit('below', bound, 'too-much')] });
    expect(faultsOf(a, bound)).toEqual(['a cycle: a → b → a']);
  });

  it('a quantity that many formulas name is no cycle', () => {
    expect(faultsOf(x, result('a', x.plus(x)), result('b', named('a').times(x)), result('c', named('a').plus(named('b'))))).toEqual([]);
  });
});

describe('choices', () => {
  it('needs a case for every option, and none beside', () => {
    const cases = (of: Record<string, string>): Expression => (route as Choice).of(of);
    expect(faultsOf(route, result('y', cases({ base: '1', acid: '2' })))).toEqual([]);
    for (const of of [{ acid: '1' }, {}, { acid: '1', base: '2', both: '3' }, { acid: '1', bases: '2' }]) {
      expect(faultsOf(route, result('y', cases(of as Record<string, string>)))).toEqual(['y: its cases are not the options of route']);
    }
  });

  it('refuses a choice that is not in the sheet, also inside another choice', () => {
    const inner = choice('grade', ['A', 'B']).of({ A: '1', B: '2' });
    expect(faultsOf(route, result('y', route.of({ acid: inner, base: '3' })))).toEqual(['y: chosen by grade, which is not in the sheet']);
  });

  it('a quantity is no choice, and a choice no quantity', () => {
    expect(faultsOf(x, result('y', choice('x', ['a']).of({ a: '1' })))).toEqual(['y: chosen by x, which is not in the sheet']);
    expect(faultsOf(route, result('y', named('route')))).toEqual(['y: names route, which is not in the sheet']);
  });
});

describe('units balance', () => {
  const sound = (is: Expression, unit: Unit = one): readonly string[] => faultsOf(x, mass, volume, strength, route, input('kilos', kilogram), result('y', is, unit));
  const kilos = named('kilos');

  it('in dimension', () => {
    expect(sound(mass, gram)).toEqual([]);
    expect(sound(mass, millilitre)).toEqual(['y: result: g against mL']);
    expect(sound(mass.plus(volume), gram)).toEqual(['y: sum: g against mL']);
    expect(sound(mass.minus(x), gram)).toEqual(['y: difference: g against a pure number']);
    expect(sound(least(mass, volume), gram)).toEqual(['y: least: g against mL']);
    expect(sound(greatest('1', volume))).toEqual(['y: greatest: a pure number against mL']);
    expect(sound(volume.times(strength).per(mass), millimole)).toEqual(['y: result: mL·mol/L/g against mmol']);
  });

  it('in scale: a gram is no kilogram, a percentage no mg/g', () => {
    expect(sound(mass.plus(kilos), gram)).toEqual(['y: sum: g is 1/1000 kg']);
    expect(sound(mass, kilogram)).toEqual(['y: result: g is 1/1000 kg']);
    expect(sound(mass.per(mass), percent)).toEqual(['y: result: g/g is 100 %']);
    const acidValue = constant('2', milligramPerGram);
    expect(sound(acidValue, percent)).toEqual(['y: result: mg/g is 1/10 %']);
    expect(sound(acidValue.in(percent), percent)).toEqual([]);
    // two names of one scale
    expect(sound(constant('2', gramPerHundredGram), percent)).toEqual([]);
  });

  it('a conversion keeps the dimension', () => {
    expect(sound(mass.in(kilogram).plus(kilos), kilogram)).toEqual([]);
    expect(sound(mass.in(litre), litre)).toEqual(['y: g cannot become L']);
    expect(sound(x.in(gram), gram)).toEqual(['y: a pure number cannot become g']);
    expect(sound(mass.in(one))).toEqual(['y: g cannot become a pure number']);
  });

  it('functions take pure numbers of scale one', () => {
    expect(sound(exponential(x))).toEqual([]);
    expect(sound(exponential(mass))).toEqual(['y: exponential: g against a pure number']);
    expect(sound(logarithm(mass.per(kilos)))).toEqual(['y: logarithm: g/kg is 1/1000 (pure)']);
    expect(sound(logarithm(constant('3', percent)))).toEqual(['y: logarithm: % is 1/100 (pure)']);
  });

  it('all branches come out alike', () => {
    expect(sound(route.of({ acid: mass, base: constant('2', gram) }), gram)).toEqual([]);
    expect(sound(route.of({ acid: mass, base: kilos }), gram)).toEqual(['y: choice by route: g is 1/1000 kg']);
    expect(sound(whereBelow(mass, constant('5', gram), x, '2'))).toEqual([]);
    expect(sound(whereBelow(mass, '5', x, '2'))).toEqual(['y: threshold: g against a pure number']);
    expect(sound(whereBelow(mass, kilos, x, '2'))).toEqual(['y: threshold: g is 1/1000 kg']);
    expect(sound(whereBelow(x, '5', x, mass))).toEqual(['y: threshold: a pure number against g']);
  });

  it('whole powers and square roots of units', () => {
    expect(sound(mass.power('2'), gram.power(2))).toEqual([]);
    expect(sound(mass.power('-1').times(mass))).toEqual([]);
    expect(sound(mass.power('0'))).toEqual([]);
    expect(sound(kilos.times(kilos).power('0.5'), kilogram)).toEqual([]);
    expect(sound(x.power('0.5').times(x.power('-1.7')))).toEqual([]);
    expect(sound(x.power(x))).toEqual([]);
    expect(sound(kilos.power('0.5'))).toEqual(['y: kg cannot be raised to this power']);
    expect(sound(mass.power('1.5'))).toEqual(['y: g cannot be raised to this power']);
    expect(sound(mass.power(x))).toEqual(['y: g cannot be raised to this power']);
    // g² is 10⁻⁶ kg²: the root of its scale is not kept
    expect(sound(mass.times(mass).power('0.5'), gram)).toEqual(['y: g·g cannot be raised to this power']);
    expect(sound(constant('9', percent).power('2'))).toEqual(['y: power: % is 1/100 (pure)']);
    expect(sound(x.power(mass))).toEqual(['y: exponent: g against a pure number']);
    expect(sound(x.power(constant('50', percent)))).toEqual(['y: exponent: % is 1/100 (pure)']);
  });

  it('a degree Celsius is a kelvin as a difference', () => {
    expect(sound(constant('3', degreeCelsius).minus(constant('1', degreeCelsius)), kelvin)).toEqual([]);
  });

  it('gives the unit of any part of a formula', () => {
    const sheet = Sheet.define([mass, volume, strength]);
    const unit = balancedUnit(volume.times(strength).times(constant('56.1', gramPerMole)).per(mass), sheet.unitOf);
    expect(unit.ratioTo(milligramPerGram).toString()).toBe('1');
    expect(balancedUnit(volume.power('3').per(constant('1', cubicMetre)), sheet.unitOf).dimension[0]).toBe(6);
    expect(balancedUnit(constant('1', mole), sheet.unitOf)).toBe(mole);
  });
});

describe('faults', () => {
  it('are all listed, each with the quantity it concerns', () => {
    const faults = faultsOf(
      x, input('x'), result('a', named('lost').plus(named('gone'))), result('b', named('c')), result('c', named('b')),
      result('d', (route as Choice).of({ acid: '1' })),
    );
    expect([...faults].sort()).toEqual([
      'a cycle: b → c → b',
      'a: names gone, which is not in the sheet',
      'a: names lost, which is not in the sheet',
      'd: chosen by route, which is not in the sheet',
      'x: defined twice',
    ]);
    expect(faultsOf(mass, x, result('a', mass), result('b', mass.plus(x)), result('c', exponential(mass)))).toEqual([
      'a: result: g against a pure number',
      'b: sum: g against a pure number',
      'c: exponential: g against a pure number',
    ]);
  });

  it('are the message of the error, one a line', () => {
    expect(() => Sheet.define([x, input('x'), route, input('route')])).toThrow('x: defined twice\nroute: defined twice');
  });
});

describe('names', () => {
  it('of a formula and its limits, each once', () => {
    const bound = input('bound');
    const y = quantity({ key: 'y', symbol: 'y', unit: one, is: x.plus(x).times(exponential(named('z'))), limits: [limit('atMost', bound, 'too-much')] });
    expect([...namesIn(y)].sort()).toEqual(['bound', 'x', 'z']);
    expect([...namesIn(x)]).toEqual([]);
  });
});
