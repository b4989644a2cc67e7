import { describe, expect, it } from 'vitest';
import { named } from '../../src/formula/expression.js';
import { Plan } from '../../src/formula/plan.js';
import { limit, quantity } from '../../src/formula/quantity.js';
import type { Limit, Quantity } from '../../src/formula/quantity.js';
import { Refused } from '../../src/formula/reading.js';
import type { Outcome } from '../../src/formula/reading.js';
import { Sheet } from '../../src/formula/sheet.js';
import { millilitre } from '../../src/formula/units.js';
import { evaluated, told } from './given.js';

const refusedAt = (key: string): Refused => new Refused({ code: 'illegible', quantity: key });

describe('limits', () => {
  const limited = (...limits: readonly Limit[]): Quantity => quantity({ key: 'v', symbol: 'V', unit: millilitre, limits });
  const check = (limits: readonly Limit[], value: string): string => told(evaluated([limited(...limits)], { v: value }).findings.outcome('v'));

  it.each<[Limit['is'], string, string, string]>([
    ['above', '0.01', '0', '-1'],
    ['atLeast', '0', '-0.01', '-5'],
    ['below', '-0.01', '0', '1'],
    ['atMost', '0', '0.01', '7'],
  ])('%s', (is, kept, broken, alsoBroken) => {
    const limits = [limit(is, '0', 'beyond')];
    expect(check(limits, kept)).toBe(kept);
    expect(check(limits, broken)).toBe('refused: beyond at v');
    expect(check(limits, alsoBroken)).toBe('refused: beyond at v');
  });

  it('tell the bound and its unit', () => {
    const { findings } = evaluated([limited(limit('atMost', '50.0', 'burette'))], { v: '50.1' });
    expect(findings.outcome('v')).toEqual(new Refused({ code: 'burette', quantity: 'v', params: { bound: '50', unit: 'mL' } }));
  });

  it('of several, the first that is broken is told', () => {
    const limits = [limit('atLeast', '0', 'negative'), limit('atMost', '50', 'burette'), limit('atMost', '10', 'large')];
    expect(check(limits, '-1')).toBe('refused: negative at v');
    expect(check(limits, '51')).toBe('refused: burette at v');
    expect(check(limits, '11')).toBe('refused: large at v');
    expect(check(limits, '10')).toBe('10');
  });

  it('stand at another field where they say so, also those of a formula', () => {
    const v0 = quantity({ key: 'v0', symbol: 'V_0', unit: millilitre });
    const titre = quantity({
      key: 'titre', symbol: 'V_t', unit: millilitre, is: named('v').minus(v0), limits: [limit('atLeast', '0', 'blank-above-titre', 'v0')],
    });
    const beyond = quantity({ key: 'beyond', symbol: 'y', unit: millilitre, is: titre.times('2') });
    const { findings } = evaluated([limited(), v0, titre, beyond], { v: '1', v0: '2' });
    expect(told(findings.outcome('titre'))).toBe('refused: blank-above-titre at v0');
    expect(findings.outcome('beyond')).toBe(findings.outcome('titre'));
    expect(told(findings.outcome('v0'))).toBe('2');
  });

  it('may be another quantity; a bound that is not known refuses nothing', () => {
    const largest = quantity({ key: 'largest', symbol: 'V_max', unit: millilitre });
    const v = limited(limit('atMost', largest, 'burette'));
    const at = (values: Readonly<Record<string, string | Outcome>>): Outcome => evaluated([v, largest], values).findings.outcome('v');
    expect(told(at({ v: '25', largest: '25' }))).toBe('25');
    expect(at({ v: '26', largest: '25' })).toEqual(new Refused({ code: 'burette', quantity: 'v', params: { bound: '25', unit: 'mL' } }));
    expect(told(at({ v: '26' }))).toBe('26');
    expect(told(at({ v: '26', largest: refusedAt('largest') }))).toBe('26');
    expect(new Plan(Sheet.define([v, largest]), ['v']).order).toEqual(['largest', 'v']);
  });

  it('leave what is missing or refused as it is', () => {
    const v = limited(limit('above', '0', 'negative'));
    const refused = refusedAt('v');
    expect(evaluated([v], { v: refused }).findings.outcome('v')).toBe(refused);
    expect(told(evaluated([v], {}).findings.outcome('v'))).toBe('missing: v');
  });
});
