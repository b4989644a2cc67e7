import { describe, expect, it } from 'vitest';
import { cellFormula, strictCellFormula } from '../../src/formula/cell-formula.js';
import { constant, exponential, greatest, least, logarithm, median, whereBelow } from '../../src/formula/expression.js';
import type { Expression } from '../../src/formula/expression.js';
import { choice, quantity } from '../../src/formula/quantity.js';
import { Sheet } from '../../src/formula/sheet.js';
import type { Unit } from '../../src/formula/unit.js';
import { gram, gramPerMole, kilogram, milligram, milligramPerGram, millilitre, millimolePerGram, molePerLitre, one, percent, pound } from '../../src/formula/units.js';
import { Wide, readCell } from './read-back.js';

const x = quantity({ key: 'x', symbol: 'x', unit: one });
const z = quantity({ key: 'z', symbol: 'z', unit: one });
const mass = quantity({ key: 'mass', symbol: 'm', unit: gram });
const route = choice('route', ['acid', 'base']);
const ADDRESSES: Readonly<Record<string, string>> = { x: 'B1', z: 'B2', route: 'B3', mass: 'B4' };
const address = (key: string): string => ADDRESSES[key]!;

function cell(is: Expression, unit: Unit = one): string {
  return cellFormula(is, Sheet.define([x, z, route, mass, quantity({ key: 'y', symbol: 'y', unit, is })]), address);
}

describe('a formula in a cell', () => {
  it('of a titration, over the cells of another sheet', () => {
    const c = quantity({ key: 'c', symbol: 'c', unit: molePerLitre });
    const v = quantity({ key: 'v', symbol: 'V', unit: millilitre });
    const v0 = quantity({ key: 'v0', symbol: 'V_0', unit: millilitre });
    const b = quantity({ key: 'b', symbol: 'b', unit: millimolePerGram, is: c.times(v.minus(v0)).per(mass) });
    const acidValue = quantity({ key: 'av', symbol: 'AV', unit: milligramPerGram, is: b.times(constant('56.10', gramPerMole, { symbol: 'M_KOH' })) });
    const sheet = Sheet.define([c, v, v0, mass, b, acidValue]);
    expect(cellFormula(b.is!, sheet, (key) => `Lot!${key}`)).toBe('Lot!c*(Lot!v-Lot!v0)/Lot!mass');
    // a constant is written with its digits, never as a symbol
    expect(cellFormula(acidValue.is!, sheet, (key) => `Lot!${key}`)).toBe('Lot!b*56.10');
  });

  it.each<[string, Expression, string]>([
    ['sum and difference', x.minus(z.plus('1')), 'B1-(B2+1)'],
    ['difference of differences', x.minus(z.minus('1')), 'B1-(B2-1)'],
    ['product and quotient', x.times('2').per(z.times(x)), 'B1*2/(B2*B1)'],
    ['product of sums', x.plus(z).times(x.minus(z)), '(B1+B2)*(B1-B2)'],
    ['functions', least(exponential(x), greatest(logarithm(z), '0')), 'MIN(EXP(B1),MAX(LN(B2),0))'],
    ['root', x.power('0.5'), 'B1^0.5'],
    // spreadsheets take -2^2 for 4 and 2^3^2 for 64, mathematics for −4 and 512: brackets leave no doubt
    ['negative base', constant('-2').power('2'), '(-2)^2'],
    ['negative exponent', x.power('-2'), 'B1^(-2)'],
    ['power of a power', x.power('2').power('3'), '(B1^2)^3'],
    ['power to a power', x.power(z.power('2')), 'B1^(B2^2)'],
    ['power of a product', x.times(z).power('2'), '(B1*B2)^2'],
    ['power under a quotient', x.per(z.power('2')), 'B1/B2^2'],
    ['negative constant', x.plus('-0.50'), 'B1+(-0.50)'],
    ['negative constant in front', constant('-1').times(x), '(-1)*B1'],
    ['small constant', x.times('1.5e-3'), 'B1*1.5e-3'],
  ])('%s', (_, is, formula) => {
    expect(cell(is)).toBe(formula);
  });

  it('converts by whole factors', () => {
    expect(cell(mass.in(milligram), milligram)).toBe('B4*1000');
    expect(cell(mass.plus(mass).in(kilogram), kilogram)).toBe('(B4+B4)/1000');
    expect(cell(x.per(z).in(percent), percent)).toBe('B1/B2*100');
    expect(cell(constant('3', pound).in(kilogram), kilogram)).toBe('3*45359237/100000000');
  });

  it('asks for the option in its cell, and knows no figure for another', () => {
    const is = route.of({ acid: x.plus('1'), base: z });
    expect(cell(is.times('2'))).toBe('IF(B3="acid",B1+1,IF(B3="base",B2,NA()))*2');
    const at = (option: string): string | undefined => readCell(cell(is), { B1: new Wide(4), B2: new Wide(7), B3: option })?.toString();
    expect([at('acid'), at('base'), at('both')]).toEqual(['5', '7', undefined]);
  });

  it('doubles the quotation marks of an option', () => {
    const inch = choice('route', ['1"', 'other']);
    const y = quantity({ key: 'y', symbol: 'y', unit: one, is: inch.of({ '1"': '1', other: '2' }) });
    expect(cellFormula(y.is!, Sheet.define([inch, y]), address)).toBe('IF(B3="1""",1,IF(B3="other",2,NA()))');
  });

  it('comes to an error over a word, where it is asked to: sheets leave words out of MIN, MAX and MEDIAN and put them above figures', () => {
    const strict = (is: Expression): string => strictCellFormula(is, Sheet.define([x, z, quantity({ key: 'y', symbol: 'y', unit: one, is })]), address);
    expect(strict(least(x, greatest(z.times('2'), '0.5')))).toBe('MIN(B1+0,MAX(B2*2+0,0.5)+0)');
    expect(strict(median([x, z, '3']))).toBe('MEDIAN(B1+0,B2+0,3)');
    expect(strict(whereBelow(x, '3', z, x.per(z)))).toBe('IF(B1+0<3,B2,B1/B2)');
    expect(strict(x.minus(z))).toBe('B1-B2');
  });

  it('compares strictly', () => {
    const formula = cell(whereBelow(x.plus('1'), z, '1', x.per(z)));
    expect(formula).toBe('IF(B1+1<B2,1,B1/B2)');
    const at = (first: string, second: string): string | undefined => readCell(formula, { B1: new Wide(first), B2: new Wide(second) })?.toString();
    expect([at('1', '2.5'), at('1', '2'), at('8', '2')]).toEqual(['1', '0.5', '4']);
  });
});
