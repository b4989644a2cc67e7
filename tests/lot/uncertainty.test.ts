import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Decimal } from '../../src/formula/decimal.js';
import { slopes } from '../../src/formula/derivative.js';
import { doublesOf } from '../../src/formula/doubles.js';
import { isKnown } from '../../src/formula/reading.js';
import { SheetFault } from '../../src/formula/sheet.js';
import { lotRun } from '../../src/lot/lot-run.js';
import type { LotEntry, RunEntry, SiteProfile } from '../../src/core.js';
import { uncertainties, uncertainty } from '../../src/working.js';
import { certified, lot, numberIn, read, run, site } from './lot.js';
import { modelled } from './titration-model.js';
import type { Bench } from './titration-model.js';

const number = (low: number, high: number, decimals: number): fc.Arbitrary<number> =>
  fc.integer({ min: Math.round(low * 10 ** decimals), max: Math.round(high * 10 ** decimals) }).map((whole) => Number((whole / 10 ** decimals).toFixed(decimals)));

const standardisation = fc.tuple(number(0.49, 0.52, 4), fc.array(number(0.99, 1.01, 3), { minLength: 1, maxLength: 3 })).map(([sample, near]) =>
  near.map((part) => ({ sample, titre: Number(((1000 * sample * part) / (204.2223 * 0.1)).toFixed(2)) })));

const randomBench: fc.Arbitrary<Bench> = fc.record({
  runs: fc.tuple(number(0.5, 5, 3), number(1.5, 20, 2), fc.array(number(0.85, 1.15, 2), { minLength: 1, maxLength: 4 })).map(([sample, titre, near]) =>
    near.map((part) => ({ sample, titre: Number((titre * part + 0.2).toFixed(2)) }))),
  byVolume: fc.boolean(),
  strength: fc.oneof(fc.constantFrom(0.02, 0.1), standardisation),
  blank: fc.option(number(0.05, 0.3, 2), { nil: undefined }),
  temperature: fc.option(number(12, 28, 1), { nil: undefined }),
  khpBlank: fc.constantFrom(0, 0.04),
  repeatability: fc.constantFrom(0.05, 0.117),
});

const text = (value: number): string => String(value);
function written({ runs, byVolume, strength, blank, temperature, khpBlank, repeatability }: Bench): { entry: LotEntry; profile: SiteProfile } {
  const entry = lot({
    figures: {
      ...(typeof strength === 'number' && { titrantStrength: `${strength} mol/L` }), ...(blank !== undefined && { blank: `${blank} mL` }),
      ...(temperature !== undefined && { titrationTemperature: `${temperature} °C` }),
    },
    options: { sampleTakenBy: byVolume ? 'volume' : 'weighing', blankPolicy: blank === undefined ? 'solvent-neutralised' : 'blank-subtracted' },
    runs: runs.map(({ sample, titre }) => run(`${sample} ${byVolume ? 'mL' : 'g'}`, '0', text(titre))),
  });
  const standards: RunEntry[] = typeof strength === 'number' ? [] : strength.map(({ sample, titre }) => run(`${sample} g`, '0', text(titre)));
  const profile = site({ figures: { khpBlank: `${khpBlank} mL`, repeatabilityShare: `${100 * repeatability} %` }, options: { repeatabilityBy: 'typed-share', titrantKnownFrom: standards.length ? 'standardised' : 'label' } });
  return { entry, profile: { ...profile, titrantRuns: standards } };
}

describe('the budget of a titration', () => {
  it('is that of the same titration in plain numbers, by quotients of differences, source by source, on 200 random ones', () => {
    const seen = new Map<string, number>();
    let medians = 0;
    fc.assert(
      fc.property(randomBench, (bench) => {
        const { entry, profile } = written(bench);
        const model = modelled(bench);
        if (model.acidValue > 190) return; // more than pure acid is refused
        if (new Set(bench.runs.map(({ titre }) => titre)).size < bench.runs.length) return; // a median has no slope where two runs are equal
        const reading = read(entry, profile);
        expect(numberIn(reading, 'acidValue') / model.acidValue).toBeCloseTo(1, 6);
        if (reading.replicates.lot.average === 'median') medians++;
        const { budget, u } = uncertainty(entry, profile, 'acidValue')!;
        expect(budget.map(({ source }) => source).sort()).toEqual([...model.budget.keys()].sort());
        for (const line of budget) {
          // of several standardisations with titres within 1 % the temperature moves each by its own volume, which differs from the mean by that
          const allowed = line.source === 'u.khpTemperature' ? 1e-3 : 1e-4;
          const expected = model.budget.get(line.source)!;
          if (Math.abs(Number(line.u) / expected - 1) > allowed) expect.fail(`${line.source}: ${line.u}, in plain numbers ${expected}`);
          seen.set(line.source, (seen.get(line.source) ?? 0) + 1);
        }
        expect(Number(u) / Math.hypot(...model.budget.values())).toBeCloseTo(1, 4);
        expect(budget.reduce((sum, { share }) => sum + Number(share), 0)).toBeCloseTo(1, 12);
        for (const [i, { share }] of budget.entries()) if (i) expect(Number(share)).toBeLessThanOrEqual(Number(budget[i - 1]!.share));
      }),
      { numRuns: 200, seed: 20_260_313 },
    );
    expect(seen.size).toBe(17); // nine at the titration, eight at the standardisation
    expect(medians).toBeGreaterThan(10);
    expect(Math.min(...seen.values())).toBeGreaterThan(20);
  });
});

describe('what the batch adds', () => {
  // 1000 kg of a certified 2 % FFA, KOH of 90 %; SV 190, 6 mol of methanol of 99.9 % a mole of oil
  const entry = certified('2');
  const part = (key: string, source: string, from = entry): number => Number(uncertainty(from, site({}), key)!.budget.find((line) => line.source === source)?.u ?? 0);

  it('to the methanol: n = (SV − AV)/(3 · 56.1053) mol/kg, six of them, 32.042 g/mol', () => {
    const kilograms = (saponifiable: number): number => (((6 * saponifiable) / (3 * 56.1053)) * 32.042) / 0.999;
    const acidValue = ((2 * 10) / 282) * 56.1053; // doses start from the acid content, not from the method’s 56.1
    expect(numberIn(read(entry), 'direct.methanol')).toBeCloseTo(kilograms(190 - acidValue), 6);
    expect(part('direct.methanol', 'u.saponification')).toBeCloseTo(kilograms(5 / Math.sqrt(3)), 6);
    expect(part('direct.methanol', 'u.certificate')).toBeCloseTo(kilograms((acidValue * 0.05) / Math.sqrt(3)), 6);
    expect(part('direct.methanol', 'u.oilMass')).toBeCloseTo((kilograms(190 - acidValue) * 0.005) / Math.sqrt(3), 6);
  });

  it('to the catalyst: (10 kg + n · 56.1053)/0.9', () => {
    const extra = (ffa: number): number => ((ffa / 100) * 1000 * 56.1053) / 282;
    const total = (10 + extra(2)) / 0.9;
    expect(part('direct.catalyst', 'u.catalystAssay')).toBeCloseTo((total * (1 / Math.sqrt(3))) / 90, 6);
    expect(part('direct.catalyst', 'u.certificate')).toBeCloseTo(extra((2 * 0.05) / Math.sqrt(3)) / 0.9, 6);
    expect(part('direct.catalyst', 'u.oilMass')).toBeCloseTo((total * 0.005) / Math.sqrt(3), 6);
  });

  it('to the sulfuric acid of the acid step: 10 % of 20 kg of acid, by 96 %', () => {
    expect(part('pass1.sulfuric', 'u.sulfuricAssay')).toBeCloseTo((2 / 0.96) * (0.5 / Math.sqrt(3) / 96), 8);
  });

  it('by the tank’s volume as by the scale', () => {
    const tank = certified('2', { figures: { oilAmount: '1000 L' } });
    expect(part('direct.catalyst', 'u.oilMass', tank)).toBe(0);
    expect(part('direct.catalyst', 'u.oilVolume', tank) / numberIn(read(tank), 'direct.catalyst')).toBeCloseTo(0.005 / Math.sqrt(3), 9);
  });
});

describe('a retest', () => {
  const figures = { oilAmount: '1000 kg', certificateFfa: '10 %', titrantStrength: '0.1 mol/L' };
  const entry = lot({ figures, options: { acidKnownFrom: 'certificate-ffa' }, retestRuns: [run('10 g', '0', '5.0'), run('10 g', '5', '10.1')] });

  it('has the sources of its own runs, and the second base step rests on it, no longer on the first result', () => {
    const sources = (key: string) => uncertainty(entry, site({}), key)!.budget.map(({ source }) => source);
    expect(sources('retest.acidValue').sort()).toEqual(['retest.u.repeatability', 'u.balance', 'u.burette', 'u.endPoint', 'u.temperature', 'u.titrant']);
    expect(sources('twoStep.catalyst')).toContain('retest.u.repeatability');
    expect(Object.keys(read(entry).uncertainties).sort()).toEqual(['acidValue', 'freeFattyAcid', 'retest.acidValue', 'retest.freeFattyAcid', 'titrantConcentration']);
  });

  it('by a certificate carries that certificate’s tolerance', () => {
    const certificate = lot({ figures: { ...figures, 'retest.certificateAcidValue': '2 mg/g' }, options: { acidKnownFrom: 'certificate-ffa', 'retest.acidKnownFrom': 'certificate-acid-value' } });
    const { budget, u } = uncertainty(certificate, site({}), 'retest.acidValue')!;
    expect(budget.map(({ source }) => source)).toEqual(['retest.u.certificate']);
    expect(Number(u)).toBeCloseTo((2 * 0.05) / Math.sqrt(3), 9);
  });
});

describe('a run by itself', () => {
  const entry = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('2.5 g', '0', '4'), { ...run('2.5 g', '0', '4.2'), struck: 'overshot' }, run('2.5 g', '4', '8.1')] });
  // r = 0.117 · 9.0882 mg/g, a run r/2.8
  const deviation = (0.117 * 9.0882) / 2.8;
  const part = (key: string, source: string, profile = site({}), from = entry): number => Number(uncertainty(from, profile, key)!.budget.find((line) => line.source === source)?.u ?? 0);

  it('has the whole scatter of a run, struck or not, and so is less well known than the result', () => {
    for (const index of [1, 2, 3]) {
      expect(part(`run${index}.acidValue`, 'u.runAcidValue')).toBeCloseTo(deviation, 6);
      expect(part(`run${index}.freeFattyAcid`, 'u.runFreeFattyAcid')).toBeCloseTo((deviation * 282) / 561, 6);
    }
    const [alone, together] = ['run1.acidValue', 'acidValue'].map((key) => Number(uncertainty(entry, site({}), key)!.u));
    expect(alone).toBeGreaterThan(together!);
  });

  it('puts its scatter into the mean by the root of their number, and once', () => {
    expect(part('meanAcidValue', 'u.meanAcidValue')).toBeCloseTo(deviation / Math.SQRT2, 6);
    expect(Number(uncertainty(entry, site({}), 'meanAcidValue')!.u)).toBeCloseTo(Number(uncertainty(entry, site({}), 'acidValue')!.u), 9);
    expect(part('acidValue', 'u.runAcidValue') + part('acidValue', 'u.meanAcidValue')).toBe(0);
  });

  it('that is the only one is as well known as the result', () => {
    const single = { ...entry, runs: entry.runs.slice(0, 1) };
    expect(Number(uncertainty(single, site({}), 'run1.acidValue')!.u)).toBeCloseTo(Number(uncertainty(single, site({}), 'acidValue')!.u), 12);
  });

  it('of the titrant has the whole scatter of a standardisation', () => {
    const standard: SiteProfile = { ...site({ options: { titrantKnownFrom: 'standardised' } }), titrantRuns: [run('0.5012 g', '0', '24.5'), run('0.5012 g', '0', '24.5')] };
    const c = numberIn(read(entry, standard), 'titrantConcentration');
    const own = { ...entry, figures: {} };
    expect(part('titrant.run1.concentration', 'u.khpRepeatability', standard, own)).toBeCloseTo(0.002 * 0.1001736, 6);
    expect(part('titrantConcentration', 'u.khpRepeatability', standard, own)).toBeCloseTo((0.002 * 0.1001736) / Math.SQRT2, 6);
    expect(c).toBe(0.1);
  });
});

describe('shown', () => {
  const shown = (ffa: string, tolerance: string): string | undefined =>
    uncertainty(certified(ffa), site({ figures: { certificateTolerance: tolerance } }), 'freeFattyAcid')?.shown;

  it('to the decimals of its result, a half going up', () => {
    // 2 · 3 · 0.05 / √3 = 0.1732; of 12 %, shown as 12.0, 0.693
    expect([shown('3', '5 %'), shown('12', '5 %')]).toEqual(['0.17', '0.7']);
  });

  it('and never as nothing: to its first digit where those decimals would hide it', () => {
    // 2 · 3 · 0.001 / √3 = 0.00346
    expect([shown('3', '0.1 %'), shown('3', '0.00001 %')]).toEqual(['0.003', '0.0000003']);
  });

  it('for several at once, as for each alone', () => {
    const all = uncertainties(certified('3'), site({}), ['freeFattyAcid', 'direct.catalyst', 'retest.acidValue']);
    expect(Object.keys(all)).toEqual(['freeFattyAcid', 'direct.catalyst']);
    for (const [key, found] of Object.entries(all)) expect(uncertainty(certified('3'), site({}), key)).toMatchObject(found);
  });
});

describe('what is not known', () => {
  const weighed = lot({ figures: { oilAmount: '1000 kg', titrantStrength: '0.1 mol/L', titrationTemperature: '22 °C' }, runs: [run('2.5 g', '0', '4'), run('2.5 g', '4', '8.1')] });
  const { titrationTemperature: _, ...unread } = weighed.figures;
  const byVolume = { ...weighed, options: { sampleTakenBy: 'volume' }, runs: [run('2.7 mL', '0', '4'), run('2.7 mL', '4', '8.1')] };
  const standard = site({ options: { titrantKnownFrom: 'standardised' } });
  const standardised = { entry: { ...weighed, figures: {} }, profile: { ...standard, titrantRuns: [run('0.5012 g', '0', '24.5')] } };
  const weighedOut = site({ figures: { titrantWeighedMass: '6.6 g', titrantFlaskVolume: '1 L' }, options: { titrantKnownFrom: 'weighing' } });

  it.each<[string, string, LotEntry, SiteProfile, string?]>([
    ['dropVolume', 'mL', weighed, site({})],
    ['balanceLinearity', 'g', weighed, site({})],
    ['thermometerTolerance', 'K', weighed, site({})],
    ['temperatureSpread', 'K', { ...weighed, figures: unread }, site({})],
    ['titrantLabelTolerance', '%', weighed, site({})],
    ['titrantWeighingTolerance', '%', { ...weighed, figures: {} }, weighedOut],
    ['buretteToleranceTyped', 'mL', weighed, site({ figures: { buretteToleranceTyped: '0.05 mL', buretteCapacityTyped: '25 mL' }, options: { burette: 'other' } })],
    ['sampleVolumeTolerance', 'mL', byVolume, site({})],
    ['sampleDensityTolerance', 'g/mL', byVolume, site({})],
    ['repeatabilityTyped', 'mg/g', weighed, site({ options: { repeatabilityBy: 'typed' } })],
    ['repeatabilityShare', '%', weighed, site({ options: { repeatabilityBy: 'typed-share' } })],
    ['standardBalanceLinearity', 'g', standardised.entry, standardised.profile],
    ['khpPurityTolerance', '%', standardised.entry, standardised.profile],
    ['standardisationRepeatability', '%', standardised.entry, standardised.profile],
    ['certificateTolerance', '%', certified('3'), site({})],
    ['oilAmountTolerance', '%', weighed, site({}), 'direct.catalyst'],
    ['catalystAssayTolerance', '%', weighed, site({}), 'direct.catalyst'],
    ['saponificationTolerance', 'mg/g', weighed, site({}), 'direct.methanol'],
    ['sulfuricAssayTolerance', '%', weighed, site({}), 'pass1.sulfuric'],
  ])('%s of nothing or less is refused at its field; the result stands, its ± does not', (key, unit, entry, profile, result = 'acidValue') => {
    expect(uncertainty(entry, profile, result)).toBeDefined();
    for (const value of ['0', '-0.1']) {
      const refused = { ...profile, figures: { ...profile.figures, [key]: { text: value, unit } } };
      const asked = read(entry, refused);
      expect(numberIn(asked, result)).toBe(numberIn(read(entry, profile), result));
      expect(numberIn(asked, 'freeFattyAcid')).toBe(numberIn(read(entry, profile), 'freeFattyAcid'));
      expect(uncertainty(entry, refused, result)).toBeUndefined();
      // a tolerance that only the batch rests on is read when its uncertainty is asked for
      if (result === 'acidValue') expect(asked.problems).toMatchObject([{ code: 'not-above-zero', quantity: key }]);
    }
  });

  it('a source that does not come in may be refused', () => {
    const reading = read(weighed, site({ figures: { sampleVolumeTolerance: '0 mL' } }));
    expect(reading.uncertainties['acidValue']).toBeDefined();
  });

  it('a result that is not known has none, and what is no figure is a mistake of the program', () => {
    expect(uncertainty(lot({}), site({}), 'acidValue')).toBeUndefined();
    expect(uncertainty(weighed, site({}), 'retest.acidValue')).toBeUndefined();
    expect(() => uncertainty(weighed, site({}), 'nothing')).toThrow(SheetFault);
  });
});

describe('slopes', () => {
  const volume = lot({
    figures: { oilAmount: '900 L', titrantStrength: '4.0 g/L', blank: '0.05 mL', titrationTemperature: '27 °C' },
    options: { sampleTakenBy: 'volume', blankPolicy: 'blank-subtracted', catalyst: 'NaOCH3-solution' },
    runs: [run('1.0 mL', '0.0', '1.1'), run('1.0 mL', '1.1', '2.3'), run('1.0 mL', '2.3', '3.3')],
  });
  const weighed = lot({ figures: { oilAmount: '1000 kg' }, runs: [run('0.5 g', '0', '4'), run('0.52 g', '4', '8.1'), run('0.5 g', '8.1', '14'), run('0.5 g', '0', '5')] });
  const titrant: SiteProfile = { ...site({ figures: { khpBlank: '0.05 mL' }, options: { titrantKnownFrom: 'standardised' } }), titrantRuns: [run('0.5113 g', '0', '24.47'), run('0.5009 g', '0', '23.98')] };

  it.each<[string, LotEntry, SiteProfile]>([
    ['by volume, with blank and temperature', volume, site({})],
    ['a median on a standardised titrant', weighed, titrant],
    ['a certificate', certified('8'), site({})],
  ])('of every quantity on the way are quotients of differences: %s', (_, entry, profile) => {
    const { plan, findings } = lotRun(entry, profile);
    let compared = 0;
    for (const key of ['acidValue', 'direct.catalyst', 'direct.methanol', 'pass1.methanol', 'pass1.ffaLeft.slow', 'twoStep.catalyst']) {
      const found = slopes(plan, findings, key);
      if (!(found instanceof Map)) expect.fail(`${key} has no slopes`);
      const out = new Float64Array(1);
      const value = findings.outcome(key) as Decimal;
      for (const [at, slope] of found as ReadonlyMap<string, Decimal>) {
        const outcome = findings.outcome(at);
        if (!isKnown(outcome)) expect.fail(`${at} is not known`);
        const step = outcome.isZero() ? 1e-6 : Math.abs(outcome.toNumber()) * 1e-6;
        const { draw } = doublesOf(plan, findings, [key], [at]);
        const moved = (by: number): number => (draw(Float64Array.of(by), out), out[0]!);
        const quotient = (moved(step) - moved(-step)) / (2 * step);
        // what curvature leaves of so small a step, and the last digits of a double over the step
        const allowed = 1e-7 * Math.abs(slope.toNumber()) + (1e-14 * Math.abs(value.toNumber())) / step;
        if (Math.abs(quotient - slope.toNumber()) > allowed) expect.fail(`d ${key} / d ${at} is ${slope}, but ${quotient} by differences`);
        compared++;
      }
    }
    expect(compared).toBeGreaterThan(150);
  });
});
