import { describe, expect, it } from 'vitest';
import { certified, numberIn, read } from '../lot/lot.js';

const M_KOH = 56.105; // derived from atomic weights

/** Saponification value of a fat's glycerides by its preset profile: three KOH a triglyceride, mg/g. */
const byProfile = (fat: string): number =>
  (3 * M_KOH * 1000) / numberIn(read(certified('0.1', { options: { glyceridesBy: 'profile', fat } })), 'glycerideMolarMass');

// Codex CXS 210, table 2, and CXS 211 for lard and tallow: ranges of the saponification value, mg/g. All from memory; the
// tables themselves were not reached. A preset is a handbook mean (from memory too) of acids that add up to 96 to 100 %.
const CODEX = {
  rapeseed: [182, 193], sunflower: [188, 194], 'high-oleic-sunflower': [182, 194], soya: [189, 195], maize: [187, 195], cottonseed: [189, 198],
  peanut: [187, 196], palm: [190, 209], 'palm-olein': [194, 202], tallow: [190, 202], lard: [192, 203], coconut: [248, 265],
} as const;

describe('saponification values of the preset fats', () => {
  it.each(Object.entries(CODEX))('%s is within %j', (fat, [least, most]) => {
    expect(byProfile(fat)).toBeGreaterThanOrEqual(least);
    expect(byProfile(fat)).toBeLessThanOrEqual(most);
  });

  it('has a range for every preset', async () => {
    const { FATS } = await import('../../src/chemistry/fats.js');
    expect([...FATS].sort()).toEqual(Object.keys(CODEX).sort());
  });
});

describe('saponification values of pure triglycerides', () => {
  // triolein 190.1, tripalmitin 208.5, trilinolein 191.4 (derived: 3 · 56 105 / M)
  it.each([['190.1', 885.45], ['208.5', 807.3], ['191.4', 879.4]] as const)('%s mg/g is a molar mass of %d', (sv, molarMass) => {
    const neat = { saponificationValue: `${sv} mg/g`, waterContent: '0 %', insolubles: '0 %' };
    const reading = read(certified('0.0000001', { figures: neat }));
    expect(Math.abs(numberIn(reading, 'glycerideMolarMass') / molarMass - 1)).toBeLessThan(0.05 / Number(sv) + 1e-4);
  });

  // mean molar mass by 3 · 56 105 / (SV − AV) (from memory) holds for an oil that is glyceride throughout. Jatropha of SV 185,
  // AV 10.586: 965 g/mol by the formula, where its authors state 870 (found); the acid and the rest of the oil weigh too,
  // and here only the glycerides' own mass is divided: 965 · (1 − 0.0532) = 913, near the 910 without any subtraction.
  it('counts only the mass of the glycerides', () => {
    const figures = { saponificationValue: '185 mg/g', certificateAcidValue: '10.586 mg/g', waterContent: '0 %', insolubles: '0 %' };
    const reading = read(certified('1', { figures, options: { acidKnownFrom: 'certificate-acid-value' } }));
    const whole = 1000 / numberIn(reading, 'glycerideContent');
    expect(whole).toBeCloseTo((3 * 56105) / (185 - 10.586), 0);
    expect(numberIn(reading, 'glycerideMolarMass') / whole).toBeCloseTo(1 - (10.586 / 56.1) * 0.282468, 6);
  });
});
