import { describe, expect, it } from 'vitest';
import { lot, read, run, shownIn, valueIn } from '../lot/lot.js';

// AOCS Ca 5a-40, table of test portions, as ASTM D5555 prints it too (found: previews of 1995, 2011, 2017).
// The portions are 28.2 g and its multiples, so that mL × N reads as % FFA, or as a round multiple of it.
const TABLE = [
  { ffa: [0, 0.2], grams: '56.4', normality: '0.1', times: '0.5' },
  { ffa: [0.2, 1], grams: '28.2', normality: '0.1', times: '1' },
  { ffa: [1, 30], grams: '7.05', normality: '0.25', times: '4' },
  { ffa: [30, 50], grams: '7.05', normality: '0.25', times: '4' },
  { ffa: [30, 50], grams: '7.05', normality: '1.0', times: '4' },
  { ffa: [50, 100], grams: '3.525', normality: '1.0', times: '8' },
] as const;

const titrated = (grams: string, normality: string, millilitres: string) =>
  read(lot({ figures: { titrantStrength: `${normality} mol/L` }, runs: [run(`${grams} g`, '0.00', millilitres)] }));

describe('the test portions of AOCS Ca 5a-40', () => {
  it.each(TABLE)('$grams g with $normality N: $times · mL · N is % FFA', ({ grams, normality, times }) => {
    for (const millilitres of ['1.00', '3.35', '6.00', '12.45']) {
      const ffa = valueIn(titrated(grams, normality, millilitres), 'freeFattyAcid');
      const byTable = Number(times) * Number(millilitres) * Number(normality);
      expect(ffa.toNumber()).toBeCloseTo(byTable, 12);
    }
  });

  // the statement of the method itself: with 28.2 g, mL × N is % FFA
  it('28.2 g: 4.20 mL of 0.1 N is 0.420 %', () => {
    expect(shownIn(titrated('28.2', '0.1', '4.20'), 'freeFattyAcid')).toBe('0.42 %');
  });

  // 100 % as oleic acid takes 3.525 · 100 / 28.2 = 12.5 mL of 1.0 N: the largest titre the table can ask for
  it('never asks for more than 12.5 mL in its last row', () => {
    expect(valueIn(titrated('3.525', '1.0', '12.50'), 'freeFattyAcid').toNumber()).toBeCloseTo(100, 12);
  });
});

// Titres that the portions of ISO 660, table 1, give with 0.1 mol/L (derived: V = AV · m / 5.61)
describe('the test portions of ISO 660', () => {
  it.each([
    ['1', '20', 3.57], ['4', '10', 7.13], ['4', '2.5', 1.78], ['15', '2.5', 6.68], ['15', '0.5', 1.34], ['75', '0.5', 6.68],
  ] as const)('an acid value of %s at %s g takes %d mL of 0.1 mol/L', (acidValue, grams, millilitres) => {
    const reading = titrated(grams, '0.1', millilitres.toFixed(2));
    // the titre is printed to 0.01 mL, so the acid value comes back to that share of itself
    expect(Math.abs(valueIn(reading, 'acidValue').toNumber() / Number(acidValue) - 1)).toBeLessThan(0.006 / millilitres);
  });
});
