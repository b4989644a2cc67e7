import { describe, expect, it } from 'vitest';
import { PORTIONS } from '../../src/chemistry/titration-plan.js';
import { portionFits, portionFor } from '../../src/decision/portion-table.js';
import { decimal } from '../../src/formula/decimal.js';
import { planTitration } from '../../src/lot/titration-plan.js';
import { lot, site } from '../lot/lot.js';

// The tables of test portions, one line a row: from an acid value, to an acid value, g. `to` belongs to the line where the table says
// “above” of the next one.
const TABLES = {
  // AOCS Cd 3d-63 (found: preview; the last line partly illegible) and ISO 660, table 1 (from memory): below 1, 1–4, 4–15, 15–75, above 75
  'iso-660': [['0.05', '0.9999', '20'], ['1', '3.999', '10'], ['4', '14.99', '2.5'], ['15', '74.99', '0.5'], ['75.01', '200', '0.1']],
  // ASTM D664, method A (from memory): 0.05 to below 1, 1 to below 5, 5 to below 20, 20 to below 100, 100 to below 260
  d664: [['0.05', '0.999', '20'], ['1', '4.999', '5'], ['5', '19.99', '1'], ['20', '99.99', '0.25'], ['100', '259.9', '0.1']],
  // ASTM D974 (from memory): 0 to 3, above 3 to 25, above 25 to 250
  d974: [['0.05', '3', '20'], ['3.001', '25', '2'], ['25.01', '250', '0.2']],
} as const;

const rows = Object.entries(TABLES).flatMap(([table, lines]) => lines.map(([from, to, grams]) => ({ table: table as keyof typeof TABLES, from, to, grams })));

describe.each(rows)('$table, $from to $to: $grams g', ({ table, from, to, grams }) => {
  it.each([from, to])('at %s', (acidValue) => {
    expect(portionFor(decimal(acidValue), PORTIONS[table]).toString()).toBe(grams);
    const planned = planTitration(
      lot({ figures: { titrantStrength: '0.1 mol/L', expectedAcidValue: `${acidValue} mg/g` } }), site({ options: { portionTable: table } }),
    );
    expect(Number(planned?.tablePortion)).toBe(Number(grams));
  });

  it('fits what it was made for', () => {
    for (const acidValue of [from, to]) expect(portionFits(decimal(grams), decimal(acidValue), PORTIONS[table])).toBe(true);
  });
});

describe('ends of the lines of ISO 660 with 0.1 mol/L, V = AV · m / 5.61 (derived)', () => {
  // the burette of 50 mL takes a titre from 10 to 40 mL, that of 10 mL from 2 to 8 mL: the table’s portion stays where its titre does
  const burette = (name: string) => site({ options: { burette: name } });
  const planned = (acidValue: string, name = 'A-10') =>
    planTitration(lot({ figures: { titrantStrength: '0.1 mol/L', expectedAcidValue: `${acidValue} mg/g` } }), burette(name));

  it.each([
    ['0.9999', '20', 3.565], ['3.999', '10', 7.128], ['14.99', '2.5', 6.680], ['74.99', '0.5', 6.684],
  ])('just below %s: %s g take %d mL', (acidValue, grams, millilitres) => {
    const plan = planned(acidValue);
    expect(Number(plan?.portion)).toBe(Number(grams));
    expect(Number(plan?.titre)).toBeCloseTo(millilitres, 2);
  });

  it.each([['4', 1.78], ['15', 1.34]] as const)('from %s on the next portion would take %d mL, below a fifth of the burette: a little more is weighed in', (acidValue, millilitres) => {
    const plan = planned(acidValue);
    expect(Number(plan?.tablePortion) * Number(acidValue) / 5.61).toBeCloseTo(millilitres, 2);
    expect(Number(plan?.titre)).toBe(2);
    expect(Number(plan?.portion)).toBeCloseTo((2 * 5.61) / Number(acidValue), 2);
  });
});

describe('a portion unlike the table', () => {
  it.each([
    // acid value 8: 2.5 g; a quarter up or down it is still 2.5 g, and two and a half times 2.5 g is 6.25 g
    ['6.25', '8', true], ['6.26', '8', false], ['1', '8', true], ['0.99', '8', false],
    // acid value 14 is near the next line: 0.5 g and down to 0.2 g fit too
    ['0.2', '14', true], ['0.19', '14', false],
  ] as const)('%s g at acid value %s: %s', (grams, acidValue, fits) => {
    expect(portionFits(decimal(grams), decimal(acidValue), PORTIONS['iso-660'])).toBe(fits);
  });
});
