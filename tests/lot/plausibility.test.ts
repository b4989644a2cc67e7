import { describe, expect, it } from 'vitest';
import { NOTICE_CODES } from '../../src/lot/lot-reading.js';
import type { NoticeCode } from '../../src/lot/lot-reading.js';
import { readLot } from '../../src/core.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { deliveries } from '../../demo/lots.js';
import { plant } from '../../demo/plant.js';
import { certified, lot, run, site } from './lot.js';

// For each remark a lot that raises it, and one just inside that does not.

interface Case {
  readonly entry: LotEntry;
  readonly site?: SiteProfile;
  /** Where it stands. */
  readonly at: string;
  readonly params?: Readonly<Record<string, string>>;
  /** The same without cause for the remark. */
  readonly inside: { readonly entry?: LotEntry; readonly site?: SiteProfile };
}

const TODAY = '2026-03-10';
const strength = { titrantStrength: '0.1 mol/L' };
/** Two runs of so much sample and titrant; 2.5 g and 4 mL are an acid value of 9. */
const titrated = (sample: string, titre: string, figures: Record<string, string> = strength, options = {}): LotEntry =>
  lot({ figures, options, runs: [run(`${sample} g`, '0', titre), run(`${sample} g`, '0', titre)] });
const usual = titrated('2.5', '4');
const dated = (entry: LotEntry, date: string): LotEntry => ({ ...entry, date });
/** 1000 · 0.5012 / (204.222 · 24.5) is 0.1002 mol/L. */
const standardised = (titrantDate: string | undefined, titres = ['24.50', '24.50'], figures: Record<string, string> = {}): SiteProfile => ({
  ...site({ figures, options: { titrantKnownFrom: 'standardised' } }),
  titrantRuns: titres.map((titre) => run('0.5012 g', '0', titre)),
  ...(titrantDate !== undefined && { titrantDate }),
});
const noStrength = titrated('2.5', '4', {});

/** An oil of 8 %, after the acid step of so much. */
const again = (ffa: string): LotEntry => certified('8', { figures: { 'retest.certificateFfa': `${ffa} %` }, options: { 'retest.acidKnownFrom': 'certificate-ffa' } });

const CASES: Readonly<Record<NoticeCode, Case>> = {
  'one-run': { entry: lot({ figures: strength, runs: [run('2.5 g', '0', '4')] }), at: 'acidValue', inside: { entry: usual } },
  'run-incomplete': { entry: { ...usual, runs: [...usual.runs, { sample: { text: '2.5', unit: 'g' } }] }, at: 'run3.start', params: { run: '3' }, inside: { entry: usual } },
  'runs-tenfold': {
    entry: lot({ figures: strength, runs: [run('2.5 g', '0', '4'), run('2.5 g', '0', '0.7')] }), at: 'acidValue',
    inside: { entry: lot({ figures: strength, runs: [run('2.5 g', '0', '4'), run('2.5 g', '0', '0.9')] }) },
  },
  'target-not-reached': { entry: certified('20'), site: site({ figures: { pretreatmentTarget: '0.001 %' } }), at: 'pretreatmentTarget', inside: { site: site({}) } },
  'lauric-on-other-basis': {
    entry: certified('2', { figures: { saponificationValue: '250 mg/g' } }), at: 'referenceAcid', inside: { entry: certified('2', { figures: { saponificationValue: '220 mg/g' } }) },
  },
  'titre-small': { entry: titrated('2.5', '0.99'), at: 'run1.end', params: { run: '1', titre: '0.99' }, inside: { entry: titrated('2.5', '1.00') } },
  'titre-above-burette': { entry: titrated('2.5', '25.1'), at: 'run1.end', params: { run: '1', capacity: '25' }, inside: { entry: titrated('2.5', '25.0') } },
  // acid value 9 takes 2.5 g; two and a half times as much is still near it
  'portion-unusual': { entry: titrated('6.4', '10.24'), at: 'run1.sample', inside: { entry: titrated('6.2', '9.92') } },
  'strength-perhaps-grams': { entry: titrated('2.5', '4', { titrantStrength: '5.61 mol/L' }), at: 'titrantStrength', inside: { entry: titrated('2.5', '4', { titrantStrength: '5.61 g/L' }) } },
  'strength-perhaps-moles': { entry: titrated('2.5', '4', { titrantStrength: '0.1 g/L' }), at: 'titrantStrength', inside: { entry: usual } },
  'strength-unlikely': { entry: titrated('2.5', '4', { titrantStrength: '0.0001 mol/L' }), at: 'titrantStrength', inside: { entry: titrated('2.5', '4', { titrantStrength: '0.01 mol/L' }) } },
  'blank-large': {
    entry: titrated('2.5', '4', { ...strength, blank: '0.41 mL' }, { blankPolicy: 'blank-subtracted' }), at: 'blank', params: { share: '10.25' },
    inside: { entry: titrated('2.5', '4', { ...strength, blank: '0.40 mL' }, { blankPolicy: 'blank-subtracted' }) },
  },
  'titrant-old': {
    entry: dated(noStrength, '2026-03-09'), site: standardised('2026-02-06'), at: 'titrantDate', params: { days: '31', limit: '30' }, inside: { site: standardised('2026-02-07') },
  },
  'titrant-age-unknown': { entry: noStrength, site: standardised(undefined), at: 'titrantDate', inside: { site: standardised('2026-03-01') } },
  'titrant-not-standardised': {
    entry: noStrength, site: site({ figures: { titrantWeighedMass: '6.6 g', titrantFlaskVolume: '1 L' }, options: { titrantKnownFrom: 'weighing' } }), at: 'titrantStrength',
    inside: { site: standardised('2026-03-01') },
  },
  // 2.8 · 0.2 % of 0.1 mol/L is 0.00056
  'standardisation-differs': { entry: noStrength, site: standardised('2026-03-01', ['24.50', '24.65']), at: 'titrantStrength', inside: { site: standardised('2026-03-01', ['24.50', '24.60']) } },
  'purity-as-fraction': {
    entry: noStrength, site: standardised('2026-03-01', undefined, { khpPurity: '0.9995 %' }), at: 'khpPurity', params: { meant: '99.95' },
    inside: { site: standardised('2026-03-01', undefined, { khpPurity: '99.95 %' }) },
  },
  'date-in-future': { entry: dated(usual, '2026-03-11'), at: 'date', params: { today: TODAY }, inside: { entry: dated(usual, TODAY) } },
  'temperature-not-corrected': {
    entry: titrated('2.5', '4', { ...strength, titrationTemperature: '23.1 °C' }), site: site({ options: { temperatureCorrected: 'no' } }), at: 'titrationTemperature', params: { gap: '3.1' },
    inside: { entry: titrated('2.5', '4', { ...strength, titrationTemperature: '23 °C' }) },
  },
  'batch-above-vessel': { entry: certified('2'), site: site({ figures: { vesselVolume: '1600 L' } }), at: 'direct.batchVolume', inside: { site: site({ figures: { vesselVolume: '1800 L' } }) } },
  // 2 % FFA takes about 14 kg of pure KOH in 270 L: 52 g/L
  'methanol-little-for-catalyst': { entry: certified('2'), site: site({ figures: { 'KOH.solubility': '60 g/L' } }), at: 'direct.catalyst', inside: { site: site({ figures: { 'KOH.solubility': '70 g/L' } }) } },
  'batch-too-wet': { entry: certified('2', { figures: { waterContent: '1.2 %' } }), at: 'direct.waterShare', inside: { entry: certified('2', { figures: { waterContent: '0.05 %' } }) } },
  'soap-above-limit': { entry: certified('4'), at: 'direct.soapShare', inside: { entry: certified('3') } },
  'retest-higher': { entry: again('8.01'), at: 'retest.acidValue', inside: { entry: again('8') } },
};

const noticesOf = (entry: LotEntry, profile: SiteProfile | undefined) => {
  const reading = readLot(entry, profile ?? site({}), { today: TODAY });
  if ('faults' in reading) throw new Error(JSON.stringify(reading.faults));
  return reading.notices;
};

describe.each(NOTICE_CODES)('%s', (code) => {
  const { entry, site: profile, at, params, inside } = CASES[code];

  it('is remarked where it stands', () => {
    const found = noticesOf(entry, profile).filter((notice) => notice.code === code);
    expect(found.map(({ quantity }) => quantity)).toContain(at);
    if (params) expect(found.find(({ quantity }) => quantity === at)?.params).toEqual(params);
  });

  it('is not remarked just inside', () => {
    expect(noticesOf(inside.entry ?? entry, inside.site ?? profile).filter((notice) => notice.code === code && notice.quantity === at)).toEqual([]);
  });
});

it('a date that is none is not judged, and neither is one without a day to compare', () => {
  for (const date of ['soon', '2026-13-40', '']) expect(noticesOf(dated(usual, date), undefined)).toEqual([]);
  const reading = readLot(dated(usual, '2999-01-01'));
  expect('notices' in reading && reading.notices).toEqual([]);
});

describe('a blank', () => {
  const blanked = (blank: string, options: Record<string, string> = { blankPolicy: 'blank-subtracted' }): LotEntry => titrated('2.5', '4', { ...strength, blank }, options);
  const share = (entry: LotEntry): string | undefined => noticesOf(entry, undefined).find(({ code }) => code === 'blank-large')?.params?.['share'];

  it('is held against the smallest titre that counts', () => {
    const small = run('2.5 g', '0', '3.5');
    expect(share({ ...blanked('0.38 mL'), runs: [run('2.5 g', '0', '4'), small] })).toMatch(/^10\.857/);
    expect(share({ ...blanked('0.38 mL'), runs: [{ ...small, struck: 'spilled' }, run('2.5 g', '0', '4')] })).toBeUndefined();
  });

  it('is held against the titres after the acid step as well, which are small', () => {
    expect(share({ ...blanked('0.2 mL'), retestRuns: [run('10 g', '0', '1.9'), run('10 g', '0', '2.0')] })).toMatch(/^10\.526/);
  });

  it('is as large at another temperature, for blank and titre shrink alike', () => {
    expect(share({ ...blanked('0.41 mL'), figures: { ...blanked('0.41 mL').figures, titrationTemperature: { text: '28', unit: '°C' } } })).toBe('10.25');
  });

  it('that is not subtracted does not matter', () => {
    expect(share(blanked('0.41 mL', {}))).toBeUndefined();
  });
});

it('a strength in the unit that it does not fit is told as it was typed', () => {
  const told = (titrantStrength: string): number => Number(noticesOf(titrated('2.5', '4', { titrantStrength }), undefined).find(({ code }) => code.startsWith('strength-perhaps'))?.params?.['strength']);
  expect(told('0.1 g/L')).toBeCloseTo(0.1, 12);
  expect(told('5.6 mol/L')).toBeCloseTo(5.6, 12);
});

it('a standardisation of tomorrow says so, and not that it is old', () => {
  expect(noticesOf(noStrength, standardised('2026-03-11')).map(({ code, quantity }) => [code, quantity])).toEqual([['date-in-future', 'titrantDate']]);
});

it('the plant’s own lots raise none but what is meant', () => {
  const codes = deliveries.map(({ id, entry }) => [id, noticesOf(entry, plant).map(({ code }) => code)]);
  // The sour lot is too acid for the direct route, whose soap and water say so.
  expect(codes).toEqual([['clean', []], ['borderline', []], ['sour', ['batch-too-wet', 'soap-above-limit']], ['nonsense', []]]);
});
