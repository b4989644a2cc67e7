import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { EMPTY_SITE } from '../../src/core.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { directCharge, twoStepCharge } from '../../src/decision/charge.js';
import { Decimal } from '../../src/formula/decimal.js';
import { secondCheck } from '../../src/lot/second-check.js';
import type { Check } from '../../src/lot/second-check.js';
import { SLIP_CODES } from '../../src/lot/slips.js';
import type { SlipCode } from '../../src/lot/slips.js';
import { certified, figure, lot, numberIn, read, run, site, valueIn } from './lot.js';

const check = (entry: LotEntry, key: string, typed: string, profile = EMPTY_SITE): Check => secondCheck(entry, profile, key, figure(typed));
const unitOf = (entry: LotEntry, key: string, profile = EMPTY_SITE): string => read(entry, profile).readings[key]!.unit;

/** Names of the slips found, pairs joined, parameters behind. */
const slipsIn = (found: Check): string[] => {
  if (found.verdict !== 'differs') throw new Error(found.verdict);
  const words = ({ code, params }: { code: string; params: object }): string => [code, ...Object.values(params)].join(' ');
  return found.slips.map((slip) => words(slip) + (slip.and ? ` + ${words(slip.and)}` : ''));
};

// -- lots, and their figures as worked out with a calculator -------------------

// molar masses added up from the IUPAC conventional atomic weights: K 39.0983, Na 22.98977, O 15.999, H 1.008, C 12.011, S 32.06
const KOH = 56.1053;
const NAOH = 39.99677;
const KOCH3 = 70.1323;
const MEOH = 32.042;
const H2SO4 = 98.072;
const OLEIC = 18 * 12.011 + 34 * 1.008 + 2 * 15.999;

/** Blank, temperature, burette not set to zero; KOH of 90 %. */
const BENCH = lot({
  figures: { oilAmount: '800 kg', titrantStrength: '0.1023 mol/L', blank: '0.12 mL', titrationTemperature: '24 °C', oilTemperature: '40 °C', methanolTemperature: '28 °C' },
  options: { blankPolicy: 'blank-subtracted' },
  runs: [run('5.02 g', '0.40', '3.55'), run('4.98 g', '3.55', '6.52'), { ...run('5.00 g', '6.52', '10.02'), struck: 'spilt' }],
});
const f = 1 - 0.0011 * 4;
const titrated = (mL1: number, mL2: number, factor = f): [number, number] => [(0.1023 * mL1 * factor) / 5.02, (0.1023 * mL2 * factor) / 4.98];
const mean = (...values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
const b = mean(...titrated(3.15 - 0.12, 2.97 - 0.12));
const catalystFor = (content: number): number => (0.01 * 800 + (content * 800 * KOH) / 1000) / 0.9;
const rho40 = 920 - 0.64 * 25;
const glycerides = (800 * (190 - KOH * b)) / (3 * KOH);
const methanolFor = (moles: number): number => (6 * moles * MEOH) / 1000 / 0.999;
const rhoM = 0.7913 - 0.00094 * 8;

/** A titrant in g/L, portions by volume, oil by volume. */
const FIELD = lot({
  figures: { oilAmount: '1000 L', titrantStrength: '4 g/L', sampleDensity: '0.915 g/mL' },
  options: { titrantAlkali: 'NaOH', sampleTakenBy: 'volume', catalyst: 'NaOH' },
  runs: [run('10 mL', '0.00', '6.40'), run('10 mL', '0.00', '6.50')],
});
const bField = (gramsPerLitre: number, molarMass: number, density: number): number => ((gramsPerLitre / molarMass) * mean(6.4, 6.5)) / (10 * density);

/** Three runs that lie too far apart for their mean: the median stands. */
const APART = lot({
  figures: { titrantStrength: '0.1 mol/L' },
  runs: [run('5.00 g', '0', '5.00'), run('5.00 g', '0', '5.20'), run('5.00 g', '0', '7.50')],
});

/** 6 % FFA: the acid step first; a retest after it. */
const SOUR = certified('6', { figures: { oilAmount: '800 kg' } });
const bSour = 60 / 282;
const acidMass = (bSour * 800 * 282) / 1000;
const RETESTED: LotEntry = { ...SOUR, figures: { ...SOUR.figures, titrantStrength: figure('0.1 mol/L') }, retestRuns: [run('5.00 g', '0', '1.50'), run('5.00 g', '0', '1.54')] };
/** Wet, its glycerides worked out from what is left of the oil. */
const WET = certified('6', { figures: { oilAmount: '800 kg', waterContent: '1.2 %' }, options: { glyceridesBy: 'profile' } });
/** Sulfuric acid and methanol counted on the oil. */
const ON_OIL = certified('6', { options: { pretreatmentMethanolBasis: 'per-oil', pretreatmentAcidBasis: 'of-oil' }, figures: { oilAmount: '800 kg' } });
const sourGlycerides = (800 * (190 - KOH * bSour)) / (3 * KOH);

/** Potassium methoxide, 32 % in methanol. */
const SOLUTION = certified('1.5', { options: { catalyst: 'KOCH3-solution' } });
const solutionOf = (bSolution: number): number => (0.0065 * 1000 + (bSolution * 1000 * KOCH3) / 1000) / 0.32;

/** A titrant weighed out, with a label as well. */
const WEIGHED = site({ figures: { titrantWeighedMass: '6.60 g', titrantWeighedAssay: '85 %', titrantFlaskVolume: '1 L', titrantStrength: '0.1023 mol/L' }, options: { titrantKnownFrom: 'weighing' } });
const WITH_SITE_TITRANT = lot({ runs: [run('5.00 g', '0', '5.00')] });

interface Case {
  readonly code: SlipCode;
  readonly of?: string;
  readonly entry: LotEntry;
  readonly key: string;
  readonly byHand: number;
  readonly site?: SiteProfile;
}

const right = (entry: LotEntry, key: string): number => numberIn(read(entry), key);

const CASES: readonly Case[] = [
  { code: 'blank-left-out', entry: BENCH, key: 'acidValue', byHand: 56.1 * mean(...titrated(3.15, 2.97)) },
  { code: 'blank-left-out', entry: BENCH, key: 'direct.catalyst', byHand: catalystFor(mean(...titrated(3.15, 2.97))) },
  { code: 'blank-added', entry: BENCH, key: 'freeFattyAcid', byHand: 28.2 * mean(...titrated(3.27, 3.09)) },
  { code: 'blank-twice', entry: BENCH, key: 'acidValue', byHand: 56.1 * mean(...titrated(2.91, 2.73)) },
  { code: 'burette-start-ignored', entry: BENCH, key: 'acidValue', byHand: 56.1 * mean(...titrated(3.55 - 0.12, 6.52 - 0.12)) },
  { code: 'one-run', of: '1', entry: BENCH, key: 'acidValue', byHand: (56.1 * 0.1023 * 3.03 * f) / 5.02 },
  { code: 'one-run', of: '2', entry: BENCH, key: 'direct.catalyst', byHand: catalystFor((0.1023 * 2.85 * f) / 4.98) },
  { code: 'one-run', of: '2 retest', entry: RETESTED, key: 'retest.acidValue', byHand: (56.1 * 0.1 * 1.54) / 5 },
  { code: 'struck-run-counted', of: '3', entry: BENCH, key: 'acidValue', byHand: 56.1 * mean(...titrated(3.03, 2.85), (0.1023 * (3.5 - 0.12) * f) / 5) },
  { code: 'other-average', of: 'mean', entry: APART, key: 'acidValue', byHand: (56.1 * 0.1 * (5 + 5.2 + 7.5)) / 3 / 5 },
  { code: 'temperature-left-out', entry: BENCH, key: 'acidValue', byHand: 56.1 * mean(...titrated(3.03, 2.85, 1)) },
  { code: 'temperature-reversed', entry: BENCH, key: 'acidValue', byHand: 56.1 * mean(...titrated(3.03, 2.85, 1.0044)) },
  { code: 'volume-as-mass', entry: FIELD, key: 'acidValue', byHand: (56.1 * (4 / NAOH) * 6.45) / 10 },
  { code: 'mass-as-volume', entry: APART, key: 'acidValue', byHand: (56.1 * 0.1 * 5.2) / (5 * 0.917) },
  { code: 'strength-as-moles', entry: FIELD, key: 'direct.extraProduct', byHand: ((4 * 6.45) / 9.15 * (1000 * 0.9168) * NAOH) / 1000 / 0.98 },
  { code: 'strength-as-grams', entry: BENCH, key: 'acidValue', byHand: (56.1 * b) / KOH },
  { code: 'other-titrant-molar-mass', of: 'KOH', entry: FIELD, key: 'acidValue', byHand: 56.1 * bField(4, KOH, 0.915) },
  { code: 'label-strength', entry: WITH_SITE_TITRANT, site: WEIGHED, key: 'acidValue', byHand: (56.1 * 0.1023 * 5) / 5 },
  { code: 'titrant-assay-left-out', entry: WITH_SITE_TITRANT, site: WEIGHED, key: 'acidValue', byHand: 56.1 * (6.6 / KOH) },
  { code: 'ffa-as-acid-value', entry: BENCH, key: 'acidValue', byHand: 28.2 * b },
  { code: 'ffa-as-acid-value', entry: BENCH, key: 'direct.catalyst', byHand: catalystFor((28.2 * b) / 56.1) },
  { code: 'acid-value-as-ffa', entry: BENCH, key: 'freeFattyAcid', byHand: 56.1 * b },
  { code: 'acid-value-as-ffa', entry: SOUR, key: 'direct.extraPure', byHand: ((10 * 56.1 * bSour) / 282) * 800 * KOH / 1000 },
  { code: 'acid-value-as-sodium-hydroxide', entry: BENCH, key: 'acidValue', byHand: NAOH * b },
  { code: 'other-reference-acid', of: 'palmitic', entry: BENCH, key: 'freeFattyAcid', byHand: 25.6 * b },
  { code: 'other-reference-acid', of: 'lauric', entry: BENCH, key: 'freeFattyAcid', byHand: 20 * b },
  { code: 'exact-molar-mass', entry: BENCH, key: 'freeFattyAcid', byHand: (OLEIC / 10) * b },
  { code: 'litres-for-kilograms', entry: FIELD, key: 'direct.basePure', byHand: 0.006 * 1000 },
  { code: 'kilograms-for-litres', entry: BENCH, key: 'direct.basePure', byHand: (0.01 * 800 * rho40) / 1000 },
  { code: 'oil-density-left-out', entry: BENCH, key: 'direct.catalystPerLitre', byHand: (1000 * catalystFor(b)) / 800 },
  { code: 'oil-temperature-left-out', entry: BENCH, key: 'direct.catalystPerLitre', byHand: (1000 * catalystFor(b)) / (800 / 0.92) },
  { code: 'free-acid-not-deducted', entry: SOUR, key: 'direct.methanol', byHand: methanolFor((800 * 190) / (3 * KOH)) },
  { code: 'oil-water-left-out', entry: WET, key: 'direct.methanol', byHand: methanolFor((800_000 * (1 - (OLEIC * bSour) / 1000 - 0.0005)) / right(WET, 'glycerideMolarMass')) },
  { code: 'catalyst-assay-left-out', entry: BENCH, key: 'direct.catalyst', byHand: catalystFor(b) * 0.9 },
  { code: 'catalyst-assay-multiplied', entry: BENCH, key: 'direct.baseProduct', byHand: 8 * 0.9 },
  { code: 'catalyst-assay-twice', entry: BENCH, key: 'direct.catalyst', byHand: catalystFor(b) / 0.9 },
  { code: 'extra-without-assay', entry: SOUR, key: 'direct.catalyst', byHand: 8 / 0.9 + (bSour * 800 * KOH) / 1000 },
  { code: 'other-catalyst-molar-mass', of: 'NaOH', entry: SOUR, key: 'direct.catalyst', byHand: (8 + (bSour * 800 * NAOH) / 1000) / 0.9 },
  { code: 'other-catalyst-molar-mass', of: 'KOH', entry: SOLUTION, key: 'direct.catalyst', byHand: (6.5 + ((15 / 282) * 1000 * KOH) / 1000) / 0.32 },
  { code: 'other-base-load', of: 'NaOH', entry: BENCH, key: 'direct.basePure', byHand: 0.006 * 800 },
  { code: 'base-on-litres', entry: BENCH, key: 'direct.basePure', byHand: (0.01 * 800 * 1000) / rho40 },
  { code: 'base-left-out', entry: SOUR, key: 'direct.catalyst', byHand: (bSour * 800 * KOH) / 1000 / 0.9 },
  { code: 'extra-left-out', entry: BENCH, key: 'direct.catalyst', byHand: 8 / 0.9 },
  { code: 'mineral-left-out', entry: SOUR, key: 'twoStep.extraPure', byHand: (right(SOUR, 'pretreated.acidLeft') * KOH) / 1000 },
  { code: 'mineral-counted-once', entry: SOUR, key: 'twoStep.extraPure', byHand: ((right(SOUR, 'pretreated.acidLeft') + (right(SOUR, 'pretreated.sulfuricLeft') * 1000) / H2SO4) * KOH) / 1000 },
  { code: 'methanol-of-solution-left-out', entry: SOLUTION, key: 'direct.methanol', byHand: methanolFor((1000 * (190 - KOH * (15 / 282))) / (3 * KOH)) },
  { code: 'methanol-assay-left-out', entry: BENCH, site: site({ figures: { methanolAssay: '98 %' } }), key: 'direct.methanol', byHand: methanolFor(glycerides) * 0.999 },
  { code: 'methanol-assay-multiplied', entry: BENCH, site: site({ figures: { methanolAssay: '98 %' } }), key: 'direct.methanol', byHand: methanolFor(glycerides) * 0.999 * 0.98 },
  { code: 'methanol-on-acid', entry: SOUR, key: 'direct.methanol', byHand: methanolFor(bSour * 800) },
  { code: 'methanol-on-oil', entry: SOUR, key: 'pass1.methanol', byHand: (40 * sourGlycerides * MEOH) / 1000 / 0.999 },
  { code: 'other-methanol-basis', of: 'per-acid', entry: SOUR, key: 'pass1.methanol', byHand: (20 * bSour * 800 * MEOH) / 1000 / 0.999 },
  { code: 'other-methanol-basis', of: 'oil-volume', entry: ON_OIL, key: 'pass1.methanolVolume', byHand: (0.2 * 800) / 0.9168 },
  { code: 'sulfuric-assay-left-out', entry: SOUR, key: 'pass1.sulfuric', byHand: 0.1 * acidMass },
  { code: 'sulfuric-assay-multiplied', entry: SOUR, key: 'pass1.sulfuric', byHand: 0.1 * acidMass * 0.96 },
  { code: 'sulfuric-on-oil', entry: SOUR, key: 'pass1.sulfuric', byHand: (0.1 * 800) / 0.96 },
  { code: 'other-acid-basis', of: 'of-acid', entry: ON_OIL, key: 'pass1.sulfuric', byHand: (0.05 * acidMass) / 0.96 },
  { code: 'rule-of-other-acidity', entry: SOUR, key: 'pass1.sulfuric', byHand: (0.05 * acidMass) / 0.96 },
  { code: 'estimate-for-retest', entry: RETESTED, key: 'twoStep.catalyst', byHand: right(SOUR, 'twoStep.catalyst') },
  { code: 'untreated-acid', entry: RETESTED, key: 'twoStep.extraPure', byHand: (bSour * 800 * KOH) / 1000 },
  { code: 'untreated-mass', entry: RETESTED, key: 'twoStep.basePure', byHand: 8 },
  { code: 'density-left-out', of: 'methanolDensity', entry: BENCH, key: 'direct.methanolVolume', byHand: methanolFor(glycerides) },
  { code: 'density-left-out', of: 'KOCH3-solution.density', entry: SOLUTION, key: 'direct.catalystVolume', byHand: solutionOf(15 / 282) },
  { code: 'density-multiplied', of: 'methanolDensity', entry: BENCH, key: 'direct.methanolVolume', byHand: methanolFor(glycerides) * rhoM },
  { code: 'density-multiplied', of: 'sulfuricDensity', entry: SOUR, key: 'pass1.sulfuricVolume', byHand: ((0.1 * acidMass) / 0.96) * 1.8355 },
  { code: 'volume-for-mass', of: 'methanolDensity', entry: BENCH, key: 'direct.methanol', byHand: methanolFor(glycerides) / rhoM },
  { code: 'per-litre-for-per-kilogram', entry: BENCH, key: 'direct.catalystPerKilogram', byHand: (1000 * catalystFor(b)) / (800 / (rho40 / 1000)) },
  { code: 'other-route', entry: SOUR, key: 'twoStep.catalyst', byHand: catalystFor(bSour) },
  { code: 'per-cent-as-fraction', entry: BENCH, key: 'direct.basePure', byHand: 1 * 800 },
  { code: 'thousandfold', entry: BENCH, key: 'direct.catalyst', byHand: catalystFor(b) * 1000 },
  { code: 'tenfold', entry: BENCH, key: 'freeFattyAcid', byHand: 282 * b },
  { code: 'pounds-and-kilograms', entry: BENCH, key: 'direct.catalyst', byHand: catalystFor(b) / 0.45359237 },
  { code: 'gallons-and-litres', entry: BENCH, key: 'direct.methanolVolume', byHand: methanolFor(glycerides) / rhoM / 3.785411784 },
];

describe('a slip is found', () => {
  it.each(CASES.map((one) => [one.code, one.of ?? '', one.key, one] as const))('%s %s in %s', (code, of, key, { entry, byHand, site: profile = EMPTY_SITE }) => {
    const found = check(entry, key, `${byHand.toFixed(Math.max(0, 5 - Math.floor(Math.log10(byHand))))} ${unitOf(entry, key, profile)}`, profile);
    expect(slipsIn(found)).toContain(`${code} ${of}`.trim());
  });

  it('of every kind that there is', () => {
    expect([...new Set(CASES.map(({ code }) => code))].sort()).toEqual([...SLIP_CODES].sort());
  });
});

describe('a right figure', () => {
  it('agrees when it was rounded, to whatever digits', () => {
    // 19.9978… kg of product
    for (const typed of ['10', '12', '12.0', '11.99', '11.990']) {
      const kilograms = valueIn(read(BENCH), 'direct.catalyst');
      const exact = kilograms.toDecimalPlaces(typed.split('.')[1]?.length ?? 0, Decimal.ROUND_HALF_UP).toFixed();
      expect(check(BENCH, 'direct.catalyst', `${exact} kg`).verdict, exact).toBe('agrees');
    }
  });

  it('on the edge between two roundings agrees with both', () => {
    const half = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('10 g', '0', '0.25')] });
    // 0.1 · 0.25 / 10 · 282 / 10 = 0.0705 %
    expect([check(half, 'freeFattyAcid', '0.070 %').verdict, check(half, 'freeFattyAcid', '0.071 %').verdict]).toEqual(['agrees', 'agrees']);
    expect(check(half, 'freeFattyAcid', '0.072 %').verdict).toBe('differs');
  });

  it('may be rounded to three digits and filled up with zeros, but not to fewer', () => {
    const litre = certified('6', { figures: { oilAmount: '12345 L' } });
    const told = (typed: string): string => check(litre, 'oilVolume', `${typed} L`).verdict;
    expect([told('12300'), told('12345'), told('12340'), told('12350')]).toEqual(['agrees', 'agrees', 'agrees', 'agrees']);
    expect([told('12000'), told('12400'), told('12300.0'), told('12330')]).toEqual(['differs', 'differs', 'differs', 'differs']);
  });

  it('is close when constants were rounded on the way: 56.1 for 56.1053, 98.1 for 98.072', () => {
    const catalystBy = (koh: number): string => `${((8 + (bSour * 800 * koh) / 1000) / 0.9).toFixed(4)} kg`;
    expect(check(SOUR, 'direct.catalyst', catalystBy(56.1)).verdict).toBe('close');
    expect(check(SOUR, 'direct.catalyst', catalystBy(56.1053)).verdict).toBe('agrees');
    expect(check(SOUR, 'direct.catalyst', catalystBy(56.3)).verdict).toBe('differs');
  });

  it('agrees in another unit', () => {
    const kilograms = valueIn(read(SOUR), 'direct.catalyst');
    const litres = valueIn(read(SOUR), 'direct.methanolVolume');
    expect(check(SOUR, 'direct.catalyst', `${kilograms.times(1000).toFixed(0)} g`).verdict).toBe('agrees');
    expect(check(SOUR, 'direct.catalyst', `${kilograms.div('0.45359237').toFixed(2)} lb`).verdict).toBe('agrees');
    expect(check(SOUR, 'direct.methanolVolume', `${litres.div('3.785411784').toFixed(2)} US gal`).verdict).toBe('agrees');
    expect(check(SOUR, 'direct.methanolVolume', `${litres.times(1000).toFixed(0)} mL`).verdict).toBe('agrees');
    // and a slip is found in it: 0.1 lb are more than the 0.05 kg of the last digit would be
    expect(slipsIn(check(SOUR, 'direct.catalyst', `${((8 / 0.9) / 0.45359237).toFixed(3)} lb`))).toContain('extra-left-out');
  });

  it('says by how much it is off', () => {
    expect(check(BENCH, 'direct.basePure', '8.5 kg')).toMatchObject({ verdict: 'differs', value: '8', difference: '0.5' });
    expect(check(BENCH, 'direct.basePure', '7.5 kg')).toMatchObject({ difference: '-0.5' });
  });

  it('is never called a slip, in any lot, to any digits, in any unit', () => {
    const amount = (least: number, most: number, decimals: number) => fc.integer({ min: least, max: most }).map((n) => new Decimal(n).div(10 ** decimals).toFixed(decimals));
    const runs = fc.array(fc.tuple(amount(100, 900, 2), amount(0, 300, 2), amount(40, 900, 2)), { minLength: 1, maxLength: 4 });
    const lots = fc.record({
      runs, oil: amount(10, 99999, 1), volume: fc.boolean(), strength: amount(500, 2500, 4), blank: amount(0, 30, 2), subtracted: fc.boolean(),
      temperature: fc.option(amount(100, 350, 1)), catalyst: fc.constantFrom('KOH', 'NaOH', 'KOCH3', 'NaOCH3-solution'), certificate: fc.boolean(), ffa: amount(1, 4000, 2), retest: fc.boolean(),
    });
    fc.assert(
      fc.property(lots, fc.nat(), fc.integer({ min: 3, max: 8 }), fc.nat(), (of, pick, digits, unitPick) => {
        const titration = of.runs.map(([sample, start, titre]) => run(`${sample} g`, start, new Decimal(start).plus(titre).plus('0.3').toFixed()));
        const entry = lot({
          figures: {
            oilAmount: `${of.oil} ${of.volume ? 'L' : 'kg'}`, titrantStrength: `${of.strength} mol/L`, certificateFfa: `${of.ffa} %`,
            ...(of.subtracted && { blank: `${of.blank} mL` }), ...(of.temperature !== null && { titrationTemperature: `${of.temperature} °C` }),
          },
          options: { catalyst: of.catalyst, acidKnownFrom: of.certificate ? 'certificate-ffa' : 'titration', ...(of.subtracted && { blankPolicy: 'blank-subtracted' }) },
          runs: titration, retestRuns: of.retest ? [run('5.00 g', '0', '0.90')] : [],
        });
        const readings = read(entry).readings;
        const key = CHECKED[pick % CHECKED.length]!;
        const { value, unit = '' } = readings[key] ?? {};
        if (value === undefined) return;
        const units = { kg: ['kg', 'g', 'lb', 't'], L: ['L', 'mL', 'US gal', 'm³'] }[unit] ?? [unit];
        const typedUnit = units[unitPick % units.length]!;
        const factor = { g: '1000', t: '0.001', lb: new Decimal(1).div('0.45359237'), mL: '1000', 'US gal': new Decimal(1).div('3.785411784'), 'm³': '0.001' }[typedUnit] ?? '1';
        const typed = new Decimal(value).times(factor).toSignificantDigits(digits, Decimal.ROUND_HALF_UP).toFixed();
        expect(['agrees', 'close'], `${key} ${value}: ${typed} ${typedUnit}`).toContain(secondCheck(entry, EMPTY_SITE, key, { text: typed, unit: typedUnit }).verdict);
      }),
      { numRuns: 250, seed: 20260304 },
    );
  });
});

/** What is weighed or measured out, and what that follows from. */
const CHECKED = [
  'acidValue', 'freeFattyAcid', 'retest.acidValue', 'retest.freeFattyAcid',
  ...[...directCharge(), ...twoStepCharge(2)].flatMap(({ lines }) => lines.flatMap(({ mass, volume }) => [mass, volume].filter((key) => key !== undefined))),
  ...['direct', 'twoStep'].flatMap((route) => ['baseProduct', 'extraProduct', 'catalystPerLitre', 'catalystPerKilogram'].map((name) => `${route}.${name}`)),
];

describe('a wrong figure', () => {
  it('is told apart from a slip that it does not match to the digits typed', () => {
    const leftOut = 8 / 0.9; // 8.8889
    expect(slipsIn(check(BENCH, 'direct.catalyst', `${leftOut.toFixed(3)} kg`))).toEqual(['extra-left-out']);
    expect(slipsIn(check(BENCH, 'direct.catalyst', '8.88 kg'))).toEqual([]);
    expect(slipsIn(check(BENCH, 'direct.catalyst', '8.89 kg'))).toContain('extra-left-out');
  });

  it('needs three digits before a slip is named', () => {
    expect(check(BENCH, 'direct.catalyst', '8.9 kg')).toMatchObject({ slips: [], tooFewDigits: true });
    expect(check(BENCH, 'direct.catalyst', '0.0089 t')).toMatchObject({ slips: [], tooFewDigits: true });
    expect(check(BENCH, 'direct.catalyst', '8.89 kg')).toMatchObject({ tooFewDigits: false });
  });

  it('comes with every single slip that reproduces it', () => {
    // with oil by weight, half as much extra is what half the acid gives: FFA 1.41 % is oleic 282, palmitic 256
    const found = slipsIn(check(SOUR, 'pass1.sulfuric', `${((0.05 * acidMass) / 0.96).toFixed(4)} kg`));
    expect(found).toEqual(['other-acid-basis of-acid', 'rule-of-other-acidity']);
  });

  it('may be two slips at once, where no single one will do and four digits were typed', () => {
    const both = (mean(...titrated(3.15, 2.97)) * 800 * KOH) / 1000 + 8; // blank and assay left out
    expect(slipsIn(check(BENCH, 'direct.catalyst', `${both.toFixed(4)} kg`))).toEqual(['blank-left-out + catalyst-assay-left-out']);
    expect(slipsIn(check(BENCH, 'direct.catalyst', `${both.toFixed(1)} kg`))).toEqual([]);
  });

  it('of no known kind is only wrong', () => {
    expect(slipsIn(check(SOUR, 'direct.catalyst', '77.7 kg'))).toEqual([]);
    expect(slipsIn(check(SOUR, 'direct.catalyst', '-19.46 kg'))).toEqual([]);
    expect(slipsIn(check(SOUR, 'direct.catalyst', '0 kg'))).toEqual([]);
  });

  it('is no slip with what the lot does not have', () => {
    const plain = lot({ figures: { oilAmount: '800 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5.00 g', '0', '3.00')] });
    const fc200 = Array.from({ length: 200 }, (_, i) => slipsIn(check(plain, 'acidValue', `${(4 + i * 0.037).toFixed(2)} mg/g`))).flat();
    for (const code of ['blank', 'burette', 'one-run', 'struck', 'temperature', 'label', 'volume-as-mass']) expect(fc200.filter((slip) => slip.startsWith(code))).toEqual([]);
    expect(slipsIn(check(SOUR, 'direct.catalyst', '77.77 kg')).join()).not.toMatch(/run|blank|titrant|retest/);
  });
});

describe('what cannot be checked', () => {
  it('is not known: what is missing, or what was refused', () => {
    expect(check(lot({ runs: [run('5.00 g', '0', '3.00')] }), 'acidValue', '3.37 mg/g')).toEqual({ verdict: 'not-known', missing: ['titrantStrength'] });
    const refused = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('0 g', '0', '3.00')] });
    expect(check(refused, 'acidValue', '3.37 mg/g')).toMatchObject({ verdict: 'not-known', problem: { code: 'not-above-zero', quantity: 'run1.sample' } });
  });

  it('has a problem at the field: text, unit, doubt', () => {
    const code = (typed: Parameters<typeof secondCheck>[3]): unknown => {
      const found = secondCheck(SOUR, EMPTY_SITE, 'direct.catalyst', typed);
      return found.verdict === 'problem' && found.problem.code;
    };
    expect(code({ text: '1e5', unit: 'kg' })).toBe('not-a-number');
    expect(code({ text: '12.3', unit: 'L' })).toBe('unit-does-not-fit');
    expect(code({ text: '12.3', unit: 'stone' })).toBe('unknown-unit');
    expect(code({ typed: '1,500', doubt: 'ambiguous', unit: 'kg' })).toBe('ambiguous');
  });

  it('is asked under a key of no quantity: refused as a mistake of the program', () => {
    expect(() => check(SOUR, 'colour', '1 kg')).toThrow('colour');
  });
});

it('is plain data', () => {
  const found = check(BENCH, 'direct.catalyst', `${(8 / 0.9).toFixed(3)} kg`);
  expect(JSON.parse(JSON.stringify(found))).toEqual(found);
});
