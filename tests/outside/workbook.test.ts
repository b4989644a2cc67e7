import { read as readBook, utils } from '@e965/xlsx';
import { beforeAll, describe, expect, it } from 'vitest';
import { EMPTY_LOT, EMPTY_SITE, readLot } from '../../src/core.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { workbookOf } from '../../src/exchange/workbook/workbook.js';
import { Decimal } from '../../src/formula/decimal.js';
import { isKnown } from '../../src/formula/reading.js';
import { lotRun } from '../../src/lot/lot-run.js';
import { lot, run } from '../lot/lot.js';
import { hasOffice, recalculated, withCell } from './office.js';
import { PLANT, randomLots } from './random-lots.js';

const office = hasOffice();
if (!office) process.stdout.write('The workbooks are not worked out anew: soffice is not on this machine.\n');

const MADE: readonly (readonly [lots: readonly LotEntry[], site: SiteProfile])[] = [
  [randomLots(26, 11), EMPTY_SITE],
  [randomLots(24, 12), PLANT],
  [[
    // figures missing, refused, of another kind; runs that lie apart
    EMPTY_LOT,
    lot({ figures: { oilAmount: '-4 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '3')] }),
    lot({ figures: { oilAmount: '4 mL', waterContent: '4 kg', titrantStrength: '0.1 mol/L', blank: '0.2 mL' }, runs: [run('5 g', '0', '3')] }),
    lot({ figures: { oilAmount: '100 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '3', '1')] }),
    lot({ figures: { oilAmount: '100 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '3'), run('5 g', '0', '5'), run('5 g', '0', '3.1')] }),
    { ...EMPTY_LOT, figures: { oilAmount: { typed: '1,500', doubt: 'ambiguous', unit: 'kg' } }, runs: [{ sample: { text: '5', unit: 'g' } }] },
  ], EMPTY_SITE],
];

interface Row { readonly key: string; readonly values: readonly unknown[] }

/** The rows of the working by key, and the lots' values in order. */
function workingIn(bytes: Uint8Array): Row[] {
  const { Sheets } = readBook(bytes, { type: 'array' });
  const rows = utils.sheet_to_json<unknown[]>(Sheets['Working']!, { header: 1, raw: true, blankrows: true });
  return rows.slice(1).map((row) => ({ key: String(row[1]), values: row.slice(6) }));
}

const DIGITS = 12;

/** Whether a figure of a sheet agrees with an exact one. */
function agrees(found: unknown, exact: Decimal): boolean {
  if (typeof found !== 'number') return false;
  return new Decimal(found).minus(exact).abs().lte(exact.abs().times(`1e-${DIGITS}`));
}

const TYPED = lot({
  figures: { oilAmount: '1500 lb', titrantStrength: '0.1000 mol/L', oilPrice: '400 ¤/t' }, options: { catalyst: 'KOH' }, runs: [run('5.02 g', '0.00', '3.10'), run('4.98 g', '3.10', '6.15')],
});
/** What a person makes of it: another unit, another catalyst, another titrant, a longer titre, more methanol for the site. */
const CHANGED = lot({
  figures: { oilAmount: '1500 kg', titrantStrength: '5.6 g/L', oilPrice: '400 ¤/t' }, options: { catalyst: 'NaOCH3-solution' }, runs: [run('5.02 g', '0.00', '3.10'), run('4.98 g', '3.10', '16.15')],
});
const CHANGED_SITE: SiteProfile = { ...EMPTY_SITE, figures: { methanolRatio: { text: '7.5', unit: 'mol/mol' } } };

function typedOver(): Uint8Array {
  const { bytes } = workbookOf([TYPED]);
  const { Sheets } = readBook(bytes, { type: 'array' });
  const lots = utils.sheet_to_json<string[]>(Sheets['Lots']!, { header: 1 });
  const cell = (key: string): string => utils.encode_cell({ c: lots[1]!.indexOf(key), r: 2 });
  const ratio = utils.sheet_to_json<string[]>(Sheets['Site']!, { header: 1, blankrows: true }).findIndex((row) => row[1] === 'methanolRatio');
  const over: readonly (readonly [sheet: number, address: string, value: string | number])[] = [
    [2, cell('oilAmount.unit'), 'kg'], [2, cell('catalyst'), 'NaOCH3-solution'], [2, cell('titrantStrength'), 5.6], [2, cell('titrantStrength.unit'), 'g/L'], [2, cell('run2.end'), 16.15],
    [3, utils.encode_cell({ c: 2, r: ratio }), 7.5],
  ];
  return over.reduce((book, [sheet, address, value]) => withCell(book, sheet, address, value), bytes);
}

/** Names as a careless or a malicious hand gives them, and how a sheet shows them. */
const HOSTILE = [
  '=cmd|\' /C calc\'!A0', '+1', '-1', '@SUM(A1)', '=1+1', '🛢️ Fässer', 'زيت مستعمل', 'a\u0000b\u0007c', '_x0041_', '<b>&amp;"', ' two  blanks ', '\ud83d', 'line\nbreak', 'x'.repeat(9_999),
].map((name) => ({ entry: { ...lot({ figures: { oilAmount: '800.5 kg' } }), name }, shown: name.replace(/[\0\x07]|\ud83d(?![\udc00-\udfff])/g, '\ufffd') }));

describe.skipIf(!office)('a workbook worked out by LibreOffice', () => {
  let worked: readonly Uint8Array[] = [];
  beforeAll(() => {
    worked = recalculated([...MADE.map(([lots, site]) => workbookOf(lots, site).bytes), typedOver(), workbookOf(HOSTILE.map(({ entry }) => entry)).bytes]);
  }, 120_000);

  it(`comes to the readings of every lot, to ${DIGITS} digits, and shows no error`, () => {
    const differing: string[] = [];
    const workings = worked.slice(0, MADE.length).map(workingIn);
    let compared = 0;
    let figures = 0;
    MADE.forEach(([lots, site], book) => lots.forEach((entry, at) => {
      const reading = readLot(entry, site);
      if ('faults' in reading) throw new Error(JSON.stringify(reading.faults));
      const { findings, sheet } = lotRun(entry, site);
      const rows = workings[book]!;
      for (const { key, values } of rows) {
        const found = values[at];
        const where = `${book}.${at} ${key}: ${String(found)}`;
        if (sheet.choices.has(key) && (!/averageBy|runsAgree/.test(key) || sheet.quantities.has(key.replace(/averageBy|runsAgree/, 'runRange')))) {
          const option = findings.option(key);
          const expected = typeof option === 'string' ? option : 'not known';
          if (found !== expected) differing.push(`${where}, not ${expected}`);
          continue;
        }
        if (!sheet.quantities.has(key)) {
          if (found !== undefined) differing.push(`${where}, not empty`);
          continue;
        }
        // what no reading has is in the sheet all the same
        const value = reading.readings[key]?.value;
        const outcome = value === undefined ? findings.outcome(key) : new Decimal(value);
        compared++;
        if (isKnown(outcome)) figures++;
        if (isKnown(outcome) ? !agrees(found, outcome) : found !== 'not known') differing.push(`${where}, not ${isKnown(outcome) ? outcome.toString() : JSON.stringify(outcome)}`);
      }
      // nothing that was read is left out of the sheet
      const keys = new Set(rows.map(({ key }) => key));
      for (const key of Object.keys(reading.readings)) if (!keys.has(key)) differing.push(`${book}.${at} ${key} has no row`);
    }));
    expect(differing.slice(0, 40)).toEqual([]);
    expect(compared).toBeGreaterThan(20_000);
    expect(figures).toBeGreaterThan(15_000);
  });

  it('has lots of every kind among them', () => {
    const all = MADE.flatMap(([lots, site]) => lots.map((entry) => ({ entry, reading: readLot(entry, site), ...lotRun(entry, site) })));
    const kinds = (of: (one: (typeof all)[number]) => unknown): unknown[] => [...new Set(all.map(of))].filter((kind) => typeof kind === 'string').sort();
    const option = (key: string) => kinds(({ findings, sheet }) => sheet.choices.has(key) && findings.option(key));
    expect(option('catalyst')).toEqual(['KOCH3', 'KOCH3-solution', 'KOH', 'NaOCH3', 'NaOCH3-solution', 'NaOH']);
    expect(option('passes')).toEqual(['1', '2', '3']);
    expect(option('baseStepAcidFrom')).toEqual(['estimate', 'retest']);
    expect(option('titrantKnownFrom')).toEqual(['label', 'standardised']);
    expect(option('blankPolicy')).toEqual(['blank-subtracted', 'solvent-neutralised']);
    expect(kinds(({ runs, findings }) => runs.lot.counted.length > 2 && findings.option('averageBy'))).toEqual(['mean', 'median']);
    expect(kinds(({ entry }) => entry.figures['oilAmount']?.unit)).toEqual(['L', 'US gal', 'kg', 'lb', 'mL', 't']);
    expect(kinds(({ reading }) => 'route' in reading && reading.route.verdict)).toEqual(expect.arrayContaining(['direct', 'two-step', 'not-known']));
  });

  it('follows what is typed over in its cells, as the panel does', () => {
    const rows = workingIn(worked.at(-2)!);
    const after = readLot(CHANGED, CHANGED_SITE);
    if ('faults' in after) throw new Error(JSON.stringify(after.faults));
    for (const key of ['oilMass', 'acidValue', 'freeFattyAcid', 'direct.catalyst', 'direct.methanol', 'twoStep.catalyst', 'pass1.sulfuric', 'direct.ester', 'cost.direct.oil']) {
      const [found] = rows.find((row) => row.key === key)!.values;
      const exact = lotRun(CHANGED, CHANGED_SITE).findings.outcome(key);
      expect([key, found, isKnown(exact) && agrees(found, exact)]).toEqual([key, found, true]);
    }
    const before = lotRun(TYPED, EMPTY_SITE).findings.outcome('direct.catalyst');
    expect(isKnown(before) && agrees(rows.find(({ key }) => key === 'direct.catalyst')!.values[0], before)).toBe(false);
  });

  it('gives back what was typed, hostile names too', () => {
    const { Sheets } = readBook(worked.at(-1)!, { type: 'array' });
    const [, keys = [], ...rows] = utils.sheet_to_json<unknown[]>(Sheets['Lots']!, { header: 1, raw: true });
    expect(rows.map((row) => row[keys.indexOf('name')])).toEqual(HOSTILE.map(({ shown }) => shown));
    expect(rows.map((row) => row[keys.indexOf('oilAmount')])).toEqual(HOSTILE.map(() => 800.5));
    for (const [address, cell] of Object.entries(Sheets['Lots']!)) if (!address.startsWith('!')) expect((cell as { f?: string }).f).toBeUndefined();
  });
}, 120_000);
