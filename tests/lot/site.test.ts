import { describe, expect, it } from 'vitest';
import { lotFormulas } from '../../src/chemistry/lot-formulas.js';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS, readLot } from '../../src/core.js';
import { keeps, Quantity } from '../../src/formula/quantity.js';
import { isKnown } from '../../src/formula/reading.js';
import { readFigure } from '../../src/lot/figure.js';
import { KNOWN_KEYS } from '../../src/lot/keys.js';
import { certified, lot, read, run } from './lot.js';

const ONE = { runs: 1, counted: [0] };
const sheet = lotFormulas({ lot: ONE, retest: ONE, titrant: ONE });

describe('the default figures', () => {
  it.each(Object.entries(DEFAULT_FIGURES))('%s reads in the unit of its quantity and keeps its limits', (key, figure) => {
    const quantity = sheet.quantity(key);
    expect(quantity.is).toBeUndefined(); // an input
    expect(KNOWN_KEYS.figures.has(key)).toBe(true);
    expect(figure.unit).toBe(quantity.unit.symbol); // as it is shown, nothing to convert
    const outcome = readFigure(figure, quantity.unit, key);
    if (!isKnown(outcome)) throw new Error(JSON.stringify(outcome));
    for (const { is, bound } of quantity.limits) if (!(bound instanceof Quantity)) expect(keeps(is, outcome, bound)).toBe(true);
  });

  it.each(Object.entries(DEFAULT_FIGURES))('%s says where it comes from', (_, { source }) => {
    expect(source.title).not.toBe('');
    // what is common practice says so in words as well as in its mark
    expect(source.mark === 'practice').toBe(source.title === 'Common practice, no source');
  });

  it('leave only what belongs to a lot or is not always needed', () => {
    const without = [...KNOWN_KEYS.figures].filter((key) => !(key in DEFAULT_FIGURES)).sort();
    const money = /[pP]rice$|^(?:energy|hours|settlement\.)/; // only the site knows
    expect(without.filter((key) => !money.test(key))).toEqual([
      'KOCH3-solution.heatOfSolution', 'KOCH3.heatOfSolution', 'NaOCH3-solution.heatOfSolution', 'NaOCH3.heatOfSolution',
      'acceptedInsolubles', 'acceptedWater', 'arrivalTemperature', 'blank', 'blendingLimit', 'bromophenolTitre', 'buretteCapacityTyped', 'buretteToleranceTyped', 'catalystStep', 'certificateAcidValue', 'certificateFfa', 'expectedAcidValue', 'highestArrival', 'iodineValue', 'lowestArrival', 'measuredOilDensity', 'methanolStep', 'oilAmount',
      'otherAcidMolarMass', 'phenolphthaleinTitre', 'productAcidTyped', 'productSample', 'productTitre', 'retest.certificateAcidValue', 'retest.certificateFfa', 'soapSample', 'soapTitrantStrength', 'sulfuricStep', 'titrantFlaskVolume', 'titrantStrength', 'titrantWeighedMass',
      'titrationTemperature', 'vesselVolume',
    ]);
    expect([...KNOWN_KEYS.figures].filter((key) => money.test(key) && key in DEFAULT_FIGURES)).toEqual([]);
  });

  it('are enough to read a lot of which only the bench figures and the amount are known', () => {
    const reading = read(lot({ figures: { oilAmount: '1000 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '4')] }));
    expect(reading.problems).toEqual([]);
    expect(Object.entries(reading.readings).filter(([, { value }]) => value === undefined)).toEqual([]);
  });
});

describe('the default options', () => {
  it.each(Object.entries(DEFAULT_OPTIONS))('%s: %s is an option of it', (key, option) => {
    expect(KNOWN_KEYS.options.get(key)).toContain(option);
  });

  it('stand for every choice', () => {
    expect(Object.keys(DEFAULT_OPTIONS).sort()).toEqual([...KNOWN_KEYS.options.keys()].sort());
  });
});

describe('a site profile', () => {
  it('may hold every default, and then changes nothing but where figures come from', () => {
    const figures = Object.fromEntries(Object.entries(DEFAULT_FIGURES).map(([key, { text, unit }]) => [key, { text, unit }]));
    const entry = certified('7');
    const own = read(entry, { version: 1, figures, options: { ...DEFAULT_OPTIONS } });
    const standard = read(entry);
    for (const [key, { value, from }] of Object.entries(standard.readings)) {
      expect([key, own.readings[key]?.value]).toEqual([key, value]);
      expect([key, own.readings[key]?.from]).toEqual([key, from === 'default' ? 'site' : from]);
    }
  });

  it.each([...KNOWN_KEYS.options].flatMap(([key, options]) => options.map((option) => [key, option] as const)))('may choose %s: %s', (key, option) => {
    const result = readLot(certified('7'), { version: 1, options: { [key]: option } });
    expect('faults' in result).toBe(false);
  });

  it('may be empty, or left out', () => {
    expect(readLot(certified('7'), { version: 1 })).toEqual(readLot(certified('7')));
  });
});
