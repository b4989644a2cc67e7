import { describe, expect, it } from 'vitest';
import { cellFormula } from '../../src/formula/cell-formula.js';
import type { Decimal } from '../../src/formula/decimal.js';
import { sensitivities } from '../../src/formula/derivative.js';
import { doublesOf } from '../../src/formula/doubles.js';
import { nearest } from '../../src/formula/expression.js';
import { Plan } from '../../src/formula/plan.js';
import { quantity } from '../../src/formula/quantity.js';
import { Sheet } from '../../src/formula/sheet.js';
import { gram, kilogram } from '../../src/formula/units.js';
import { generalText } from '../../src/formula/working-text.js';
import { given, onlyDigits } from './given.js';
import { readCell, Wide } from './read-back.js';

const amount = quantity({ key: 'amount', symbol: 'm', unit: kilogram });
const step = quantity({ key: 'step', symbol: 's', unit: kilogram });
const charged = quantity({ key: 'charged', symbol: 'm_s', unit: kilogram, is: nearest(amount, step) });
const sheet = Sheet.define([amount, step, charged]);
const plan = new Plan(sheet, ['charged']);
const findings = (values: Readonly<Record<string, string>>) => plan.evaluate(given(values));

describe('the nearest multiple of a step', () => {
  // worked out by hand; a half goes up, as people round (ISO 80000-1, rule B)
  it.each([
    ['18.424', '0.1', '18.4'], ['18.45', '0.1', '18.5'], ['18.4', '0.5', '18.5'], ['0.2', '0.5', '0'], ['12', '5', '10'], ['12.5', '5', '15'], ['-12.5', '5', '-15'],
  ])('%s in steps of %s is %s', (value, by, expected) => {
    const found = findings({ amount: value, step: by });
    expect(String(found.outcome('charged') as Decimal)).toBe(expected);
    const out = new Float64Array(1);
    doublesOf(plan, found, ['charged'], []).draw(new Float64Array(0), out);
    expect(out[0]).toBeCloseTo(Number(expected), 12);
  });

  it('is refused where the step is nothing', () => {
    expect(findings({ amount: '1', step: '0' }).outcome('charged')).toMatchObject({ problem: { code: 'division-by-zero' } });
  });

  it('passes an error on as it is: rounding takes none of it away', () => {
    expect(String((sensitivities(plan, findings({ amount: '18.424', step: '0.1' }), 'charged') as ReadonlyMap<string, Decimal>).get('amount'))).toBe('1');
  });

  it('is written for a person and for a cell', () => {
    const found = findings({ amount: '18.424', step: '0.1' });
    expect(generalText(charged, sheet, found, onlyDigits)).toBe('round(m / s) · s');
    const cell = cellFormula(charged.is!, sheet, (key) => ({ amount: 'B1', step: 'B2' })[key]!);
    expect(cell).toBe('ROUND(B1/B2,0)*B2');
    expect(readCell(cell.replace('ROUND(B1/B2,0)', 'round(B1/B2,0)'), { B1: new Wide('18.424'), B2: new Wide('0.1') })?.toString()).toBe('18.4');
  });

  it('needs a pure number inside: kilograms in steps of grams do not balance', () => {
    expect(() => Sheet.define([amount, quantity({ key: 'grams', symbol: 's', unit: gram }), quantity({ key: 'x', symbol: 'x', unit: kilogram, is: nearest(amount, quantity({ key: 'grams', symbol: 's', unit: gram })) })])).toThrow();
  });
});
