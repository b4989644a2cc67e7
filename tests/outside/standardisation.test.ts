import { describe, expect, it } from 'vitest';
import type { SiteProfile } from '../../src/core.js';
import { uncertainty } from '../../src/working.js';
import { lot, numberIn, read, run, site, valueIn } from '../lot/lot.js';

// Standardising NaOH with KHP: Eurachem/CITAC Guide (QUAM), example A2, Table A2.1 (found). The piston burette of 20 mL there is
// ±0.03 mL; the end point is taken by an instrument, so the drop is set to nothing.

const EXAMPLE: SiteProfile = {
  ...site({
    figures: {
      khpPurity: '100 %', khpPurityTolerance: '0.05 %', standardBalanceLinearity: '0.00015 g', buretteToleranceTyped: '0.03 mL', buretteCapacityTyped: '20 mL',
      temperatureSpread: '3 K', standardisationRepeatability: '0.05 %', dropVolume: '0.000000001 mL',
    },
    options: { titrantKnownFrom: 'standardised', titrantAlkali: 'NaOH', titrantSolvent: 'aqueous', burette: 'other' },
  }),
  titrantRuns: [run('0.3888 g', '0', '18.64')],
};
const any = lot({});
const one = (source: string): number => Number(uncertainty(any, EXAMPLE, 'titrantConcentration')!.budget.find((line) => line.source === source)!.u);
const C = 0.1021362; // recomputed from the table with M = 204.2212 g/mol

describe('QUAM, example A2', () => {
  it('the concentration: 0.10214 mol/L', () => {
    expect(valueIn(read(any, EXAMPLE), 'titrantConcentration').toFixed(5)).toBe('0.10214');
    // the example’s molar mass is 204.2212, IUPAC’s conventional weights of today make 204.2223: 5.4 parts in a million
    expect(Math.abs(numberIn(read(any, EXAMPLE), 'titrantConcentration') / C - 1)).toBeLessThan(6e-6);
  });

  it('its standard uncertainty: 0.00010 mol/L, expanded 0.0002; relative 0.00097 there, with parts rounded on the way', () => {
    const { u, expanded } = uncertainty(any, EXAMPLE, 'titrantConcentration')!;
    expect(Number(u).toFixed(5)).toBe('0.00010');
    // the volume’s 0.0136 mL is carried as 0.013 there, which makes 0.00096 of 0.00098
    expect(Math.abs(Number(u) / C - 0.00097)).toBeLessThan(0.00002);
    expect(Number(expanded).toFixed(4)).toBe('0.0002');
  });

  // relative contributions u(x)/x of Table A2.1, to the digits printed
  it.each([
    ['repeatability', 'u.khpRepeatability', '0.0005'],
    ['mass of KHP', 'u.khpBalance', '0.0003'], // 0.00033 in the text: 0.09 mg · √2 = 0.13 mg, of 388.8 mg
    ['purity', 'u.khpPurity', '0.0003'], // 0.00029
    ['molar mass', 'u.khpMolarMass', '0.0000'], // 0.000019
  ])('%s', (_, source, printed) => {
    expect((one(source) / C).toFixed(4)).toBe(printed);
  });

  it.each([
    ['u.khpBalance', 0.12247 / 388.8], // two weighings of 0.15/√3 mg: the guide rounds 0.0866 to 0.09 and comes to 0.13 mg
    ['u.khpPurity', 0.0005 / Math.sqrt(3)],
    ['u.khpMolarMass', 0.0038 / 204.2212],
    ['u.khpBurette', 0.03 / Math.sqrt(6) / 18.64], // 0.012 mL
    ['u.khpTemperature', (3 * 2.1e-4) / 1.96], // 0.006 mL of 19 mL
  ])('%s, worked out by hand', (source, relative) => {
    expect(one(source) / C / relative).toBeCloseTo(1, 4);
  });

  it('burette and temperature together make the volume’s 0.013 mL, 0.0007 of it', () => {
    const volume = Math.hypot(one('u.khpBurette'), one('u.khpTemperature')) / C;
    expect((volume * 18.64).toFixed(3)).toBe('0.014'); // 0.0122 and 0.0060 make 0.0136, which the guide prints as 0.013
    expect(volume.toFixed(4)).toBe('0.0007');
  });

  it('the volume is the largest, as the guide finds', () => {
    const [first, second] = uncertainty(any, EXAMPLE, 'titrantConcentration')!.budget;
    expect([first!.source, second!.source]).toEqual(['u.khpBurette', 'u.khpRepeatability']);
  });
});

describe('several runs', () => {
  // 1000 · 0.5012 / (204.2223 · 24.45) = 0.10037; 1000 · 0.4987 / (204.2223 · 24.35) = 0.10029
  const blanked: SiteProfile = {
    ...site({ figures: { khpBlank: '0.05 mL' }, options: { titrantKnownFrom: 'standardised' } }),
    titrantRuns: [run('0.5012 g', '0.00', '24.50'), run('0.4987 g', '0.00', '24.40'), { ...run('0.5100 g', '0.00', '20.00'), struck: 'spilled' }],
  };

  it('make a mean, the blank taken off each titre, a struck run left out', () => {
    const reading = read(any, blanked);
    expect(numberIn(reading, 'titrant.run1.concentration')).toBeCloseTo(501.2 / (204.2223 * 24.45), 8);
    expect(numberIn(reading, 'titrantConcentration')).toBeCloseTo((501.2 / 24.45 + 498.7 / 24.35) / 2 / 204.2223, 8);
  });

  it('scatter less together: 0.2 % of one run is 0.2 %/√2 of two', () => {
    const { budget } = uncertainty(any, blanked, 'titrantConcentration')!;
    const c = numberIn(read(any, blanked), 'titrantConcentration');
    expect(Number(budget.find(({ source }) => source === 'u.khpRepeatability')!.u) / c).toBeCloseTo(0.002 / Math.SQRT2, 8);
  });

  it('serve a lot that has no strength of its own', () => {
    const reading = read(lot({ runs: [run('2.5 g', '0.00', '4.00')] }), blanked);
    expect(numberIn(reading, 'acidValue')).toBeCloseTo((56.1 * numberIn(reading, 'titrantConcentration') * 4) / 2.5, 8);
    const own = read(lot({ figures: { titrantStrength: '0.2 mol/L' }, runs: [run('2.5 g', '0.00', '4.00')] }), blanked);
    expect(numberIn(own, 'acidValue')).toBeCloseTo((56.1 * 0.2 * 4) / 2.5, 8);
  });
});

it('a weighed titrant: c = m · w / (M · V)', () => {
  const weighed = site({ figures: { titrantWeighedMass: '6.60 g', titrantWeighedAssay: '85 %', titrantFlaskVolume: '1 L' }, options: { titrantKnownFrom: 'weighing' } });
  expect(numberIn(read(any, weighed), 'titrantConcentration')).toBeCloseTo((6.6 * 0.85) / 56.1053, 6);
});

it.each([['100.01 %', 'above-100-percent'], ['0 %', 'not-above-zero'], ['-1 %', 'not-above-zero']])('a purity of %s is refused at its field, and the lot’s own strength still serves', (khpPurity, code) => {
  const profile = { ...EXAMPLE, figures: { ...EXAMPLE.figures, ...site({ figures: { khpPurity } }).figures } };
  const reading = read(lot({ runs: [run('2.5 g', '0', '4')] }), profile);
  expect(reading.problems).toMatchObject([{ code, quantity: 'khpPurity' }]);
  expect(reading.readings['acidValue']?.value).toBeUndefined();
  expect(read(lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('2.5 g', '0', '4')] }), profile).readings['acidValue']?.value).toBeDefined();
});
