import { describe, expect, it } from 'vitest';
import { planTitration } from '../../src/lot/titration-plan.js';
import { lot, run, site } from '../lot/lot.js';

// Portions: AOCS Cd 3d-63 (found) and ISO 660, table 1 (from memory). Titres: V = AV · m / (56.1 · c), worked out by hand.

const titrant = { titrantStrength: '0.1 mol/L' };
const plan = (acidValue: string, profile = site({ options: { burette: 'A-10' } }), figures: Record<string, string> = titrant) =>
  planTitration(lot({ figures: { ...figures, expectedAcidValue: `${acidValue} mg/g` } }), profile);
const near = (text: string | undefined, digits = 2) => Number(Number(text).toPrecision(digits));

describe('a plan with 0.1 mol/L and a burette of 10 mL', () => {
  it.each([
    // acid value, portion of the table, titre: 1 · 20 / 5.61, 3.9 · 10 / 5.61, 4 · 2.5 / 5.61 is below 2 mL
    ['0.99', 20, 3.5],
    ['3.9', 10, 7.0],
    ['10', 2.5, 4.5],
    ['60', 0.5, 5.3],
  ])('acid value %s: %d g as the table has it, %d mL', (acidValue, portion, titre) => {
    const found = plan(acidValue);
    expect(near(found?.tablePortion)).toBe(portion);
    expect(near(found?.portion)).toBe(portion);
    expect(near(found?.titre)).toBe(titre);
    expect(found).toMatchObject({ keep: true, likeTable: true });
  });

  it('takes a little more than the table where the titre would be below 2 mL', () => {
    const found = plan('4');
    expect(near(found?.tablePortion)).toBe(2.5);
    expect(near(found?.titre)).toBe(2);
    expect(near(found?.portion)).toBe(2.8); // 2 · 5.61 / 4
    expect(found).toMatchObject({ keep: true, likeTable: true });
  });
});

describe('the titrant', () => {
  it('is kept where the table allows it, else the nearest usual strength is named', () => {
    // 0.01 mol/L and acid value 50: 8 mL are 0.09 g, far below the 0.5 g of the table; 0.05 mol/L takes 0.45 g
    const found = plan('50', site({ options: { burette: 'A-10' } }), { titrantStrength: '0.01 mol/L' });
    expect(found).toMatchObject({ keep: false, likeTable: true });
    expect(Number(found?.strength)).toBeGreaterThan(0.01);
    expect(Number(found?.titre)).toBeGreaterThanOrEqual(2);
    expect(Number(found?.titre)).toBeLessThanOrEqual(8);
  });

  it('follows the table that the site works by', () => {
    expect(near(plan('3', site({ options: { burette: 'A-10', portionTable: 'd664' } }))?.tablePortion)).toBe(5); // D664 A, from memory
    expect(near(plan('2.9', site({ options: { burette: 'A-50', portionTable: 'd974' } }))?.tablePortion)).toBe(20); // D974, from memory
  });
});

describe('what to expect', () => {
  it('is the ± that two such runs turn out to have', () => {
    const found = plan('10');
    // scatter alone, r = 0.117 X (ASTM D664, used oil): 2 · 0.117 · 10 / 2.8 / √2 is 0.591; burette, drop and titrant add to it
    expect(Number(found?.expanded)).toBeGreaterThan(0.591);
    expect(Number(found?.expanded)).toBeLessThan(0.62);
  });

  it('is the lot’s own acid value once a run gave one', () => {
    const entry = lot({ figures: titrant, runs: [run('2.5 g', '0.00', '4.46')] });
    expect(near(planTitration(entry, site({}))?.expected)).toBe(10);
  });

  it('cannot be said without an acid value or a titrant', () => {
    expect(planTitration(lot({ figures: titrant }), site({}))).toBeUndefined();
    expect(planTitration(lot({ figures: { expectedAcidValue: '5 mg/g' } }), site({}))).toBeUndefined();
    expect(plan('0')).toBeUndefined();
    expect(plan('1000')).toBeUndefined();
  });
});
