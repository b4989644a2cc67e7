import { describe, expect, it } from 'vitest';
import { DEFAULT_FIGURES } from '../../src/core.js';
import { Missing } from '../../src/formula/reading.js';
import { found, numbers, outcome } from '../lot/found.js';
import { certified, site } from '../lot/lot.js';

describe('heats of solution', () => {
  // in water at infinite dilution (from memory): NaOH 44.5 kJ/mol or 1.11 kJ/g, KOH 57.6 or 1.03, H2SO4 95 or 0.97
  it.each([['NaOH.heatOfSolution', 44.5, 39.997, 1.11], ['KOH.heatOfSolution', 57.6, 56.105, 1.03], ['sulfuricHeat', 95, 98.072, 0.97]])('%s', (key, perMole, molarMass, perGram) => {
    const { text, source } = DEFAULT_FIGURES[key]!;
    expect(Number(text)).toBe(perMole);
    expect(Number(text) / molarMass).toBeCloseTo(perGram, 2);
    expect(source.mark).toBe('memory');
    expect(source.title).toContain('in water');
    expect(source.title).toContain('marker for methanol');
  });

  // no figure for them is published, so there is none
  it.each(['NaOCH3', 'KOCH3', 'NaOCH3-solution', 'KOCH3-solution'])('%s: not known until the site gives its own', (catalyst) => {
    const entry = certified('2', { options: { catalyst } });
    for (const name of ['heat', 'rise', 'reached', 'margin']) expect(outcome(entry, `heat.direct.${name}`)).toEqual(new Missing([`${catalyst}.heatOfSolution`]));
    const own = site({ figures: { [`${catalyst}.heatOfSolution`]: '70 kJ/mol' } });
    expect(found(entry, 'heat.direct.heat', own).div(found(entry, 'direct.catalystAmount')).toNumber()).toBeCloseTo(70, 12);
  });
});

describe('dissolving the catalyst, nothing cooled', () => {
  // a tonne of neat oil, NaOH of 98 %: 6 kg pure are 150.01 mol and give 6675.5 kJ; the product weighs 6.122 kg. ΔT = Q / (m · 2.53) by hand
  it('NaOH in the methanol of neat oil', () => {
    const value = numbers(certified('0.0000001', { options: { catalyst: 'NaOH' } }));
    expect(value('heat.direct.heat')).toBeCloseTo(6675.5, 0);
    const mixture = value('direct.methanol') + 6.1224;
    expect(value('heat.direct.rise')).toBeCloseTo(6675.5 / (mixture * 2.53), 2);
    expect(value('heat.direct.rise')).toBeCloseTo(11.8, 0);
    expect(value('heat.direct.reached')).toBeCloseTo(20 + value('heat.direct.rise'), 10);
  });

  it('starts from the temperature of the methanol', () => {
    const warm = site({ figures: { methanolTemperature: '35 °C' } });
    const value = numbers(certified('1'), warm);
    expect(value('heat.direct.reached')).toBeCloseTo(35 + value('heat.direct.rise'), 10);
  });

  // methanol boils at 64.7 °C (from memory; 65 °C in a safety summary, found)
  it('says how far the boiling point is, and goes below zero where it is reached', () => {
    expect(found(certified('1'), 'methanolBoilingPoint').toString()).toBe('64.7');
    const margins = ['0.5', '3', '7', '9', '20'].map((ffa) => found(certified(ffa), 'heat.direct.margin').toNumber());
    expect([...margins].sort((a, b) => b - a)).toEqual(margins);
    expect(margins.map((margin) => margin > 0)).toEqual([true, true, true, false, false]);
    const value = numbers(certified('9'));
    expect(value('heat.direct.margin')).toBeCloseTo(64.7 - value('heat.direct.reached'), 10);
  });

  it('of the base step after the acid step is that of a sweet oil', () => {
    expect(found(certified('20'), 'heat.twoStep.rise').lt(found(certified('20'), 'heat.direct.rise'))).toBe(true);
  });
});

describe('sulfuric acid of a pass', () => {
  // FFA 20 %: 5 % of 200 kg is 10 kg of H2SO4, 101.97 mol, 9687 kJ (95 kJ/mol); as 96 % it weighs 10.417 kg (by hand)
  it('into the methanol alone, and into oil and methanol', () => {
    const value = numbers(certified('20'));
    expect(value('heat.pass1.heat')).toBeCloseTo(9687, 0);
    const methanol = value('pass1.methanol');
    expect(value('heat.pass1.riseInMethanol')).toBeCloseTo(9686.8 / ((methanol + 10.4167) * 2.53), 2);
    expect(value('heat.pass1.riseInBatch')).toBeCloseTo(9686.8 / ((methanol + 10.4167) * 2.53 + 1000 * 2.0), 2);
    expect(value('heat.pass1.riseInBatch')).toBeLessThan(value('heat.pass1.riseInMethanol'));
    expect(value('heat.pass1.margin')).toBeCloseTo(64.7 - 20 - value('heat.pass1.riseInMethanol'), 10);
  });

  it('by another heat, where a site gives one', () => {
    const own = site({ figures: { sulfuricHeat: '50 kJ/mol' } });
    expect(found(certified('20'), 'heat.pass1.heat', own).div(found(certified('20'), 'heat.pass1.heat')).toNumber()).toBeCloseTo(50 / 95, 12);
  });
});
