import { describe, expect, it } from 'vitest';
import { columnUse, recogniseColumns, remember, EMPTY_MEMORY } from '../../../src/exchange/table/columns.js';
import { dateOrderOf, readDate } from '../../../src/exchange/table/dates.js';
import { decimalMarkOf } from '../../../src/exchange/table/marks.js';
import { readTable } from '../../../src/exchange/table/read-table.js';
import { rowEntries } from '../../../src/exchange/table/row-entry.js';
import type { RowReading } from '../../../src/exchange/table/row-entry.js';
import type { Table } from '../../../src/exchange/table/table.js';
import { workedRows } from '../../../src/exchange/table/worked-rows.js';
import type { RowsSummary, WorkedRow } from '../../../src/exchange/table/worked-rows.js';
import { EMPTY_SITE } from '../../../src/lot/entry.js';
import { triage } from '../../../src/lot/triage.js';
import { read, shownIn, site } from '../../lot/lot.js';

function table(text: string): Table {
  const found = readTable(text);
  if ('fault' in found) throw new Error(JSON.stringify(found.fault));
  return found;
}
const keysOf = (text: string): readonly (readonly [string | undefined, string | undefined])[] => recogniseColumns(table(text)).map(({ key, unit }) => [key, unit] as const);
const entriesOf = (text: string, mark: '.' | ',' = '.'): readonly RowReading[] => [...rowEntries(table(text), recogniseColumns(table(text)), mark)];

describe('headings', () => {
  it.each([
    ['FFA [%]', 'certificateFfa', '%'], ['FFA (%)', 'certificateFfa', '%'], ['Free fatty acids, % m/m', 'certificateFfa', '%'], ['Freie Fettsäuren in %', 'certificateFfa', '%'], ['FFA', 'certificateFfa', '%'],
    ['AV mg KOH/g', 'certificateAcidValue', 'mg/g'], ['Säurezahl [mg KOH/g]', 'certificateAcidValue', 'mg/g'], ['Water ppm', 'waterContent', 'mg/kg'], ['Wassergehalt (mg/kg)', 'waterContent', 'mg/kg'],
    ['Oil [L]', 'oilAmount', 'L'], ['Menge t', 'oilAmount', 't'], ['Net weight (lbs)', 'oilAmount', 'lb'], ['Temp. °F', 'arrivalTemperature', '°F'], ['Titrant [N]', 'titrantStrength', 'mol/L'], ['KOH (g/l)', 'titrantStrength', 'g/L'],
    ['Lot No.', 'name', undefined], ['Partie-Nr.', 'name', undefined], ['Lieferant', 'source', undefined], ['Datum', 'date', undefined],
    ['Sample 2 [g]', 'run.2.sample', 'g'], ['Einwaage (g)', 'run.1.sample', 'g'], ['Run 2 end (mL)', 'run.2.end', 'mL'], ['Titre 1 ml', 'run.1.titre', 'mL'], ['Verbrauch [ml]', 'run.1.titre', 'mL'],
    ['Remarks', undefined, undefined], ['FFA [mol]', undefined, undefined],
  ])('%s', (heading, key, unit) => {
    expect(keysOf(`${heading}\tother\n1\t2`)[0]).toEqual([key, unit]);
  });

  it('a meaning is given once, to the first', () => {
    expect(keysOf('FFA\tFFA\n1\t2').map(([key]) => key)).toEqual(['certificateFfa', undefined]);
  });

  it('what a person made of a heading is kept for the next sheet, and left alone if so said', () => {
    const use = columnUse('Oil quality', 'certificateFfa', '%');
    let memory = remember(EMPTY_MEMORY, use);
    memory = remember(memory, columnUse('Water', undefined));
    expect(memory).toEqual({ version: 1, columns: { 'oil quality': { key: 'certificateFfa', unit: '%' }, water: { key: '' } } });
    expect(recogniseColumns(table('OIL-QUALITY\tWater\n1\t2'), memory).map(({ key }) => key)).toEqual(['certificateFfa', undefined]);
    expect(recogniseColumns(table('constructor\tLot\n1\t2'), memory).map(({ key }) => key)).toEqual([undefined, 'name']);
  });

  it('a unit that does not fit is not taken', () => {
    expect(columnUse('x', 'certificateFfa', 'kg').unit).toBe('%');
    expect(columnUse('x', 'run.1.sample', 'mL').unit).toBe('mL');
  });
});

describe('the mark of decimals', () => {
  const markOf = (...cells: string[]): unknown => {
    const sheet = table(`FFA\tLot\n${cells.map((cell) => `${cell}\tA`).join('\n')}`);
    return decimalMarkOf(sheet, recogniseColumns(sheet));
  };
  it.each([
    [['1.5', '2'], { mark: '.' }], [['1,5', '2'], { mark: ',' }], [['1.234,5'], { mark: ',' }], [['1,234.5'], { mark: '.' }], [['1.234.567'], { mark: ',' }], [['0.125'], { mark: '.' }], [['1234.567'], { mark: '.' }],
    [['1,234', '2'], {}], [['1', '2'], {}], [['1.5', '2,5'], { mixed: { point: 2, comma: 3 } }],
  ])('of %o', (cells, found) => {
    expect(markOf(...cells)).toEqual(found);
  });
});

describe('dates', () => {
  it.each([
    ['2026-03-02', 'day-first', '2026-03-02'], ['2.3.2026', 'month-first', '2026-03-02'], ['02.03.26', 'day-first', '2026-03-02'], ['3/2/2026', 'month-first', '2026-03-02'], ['3/2/2026', 'day-first', '2026-02-03'],
    ['13/2/2026', 'month-first', '2026-02-13'], ['2026-03-02T10:15:00Z', 'day-first', '2026-03-02'], ['2.3.2026 10:15', 'day-first', '2026-03-02'],
    // by the rule of the count: 2026-03-02 is day 46083 of it (from memory)
    ['46083', 'day-first', '2026-03-02'], ['46083.5', 'day-first', '2026-03-02'],
    ['31.2.2026', 'day-first', undefined], ['soon', 'day-first', undefined], ['123', 'day-first', undefined],
  ] as const)('%s, %s: %s', (cell, order, iso) => {
    expect(readDate(cell, order)).toBe(iso);
  });
  const orderOf = (...cells: string[]): unknown => {
    const sheet = table(`Date\tFFA\n${cells.map((cell) => `${cell}\t1`).join('\n')}`);
    return dateOrderOf(sheet, recogniseColumns(sheet));
  };
  it.each([
    [['1/2/2026', '13/2/2026'], { order: 'day-first' }], [['1/2/2026', '2/13/2026'], { order: 'month-first' }], [['1/2/2026'], { asked: '1/2/2026' }], [['2026-01-02'], {}], [['1.2.2026'], { order: 'day-first' }],
    [['13/2/2026', '2/13/2026'], { asked: '2/13/2026' }],
  ])('the order of %o', (cells, found) => {
    expect(orderOf(...cells)).toEqual(found);
  });
});

describe('rows as lots', () => {
  it('a titration with its runs, a blank and a source', () => {
    const [row] = entriesOf('Lot\tSupplier\tOil kg\tTitrant mol/L\tBlank\tSample 1\tStart 1\tEnd 1\tSample 2\tTitre 2\nA1\tKitchen round\t900\t0.1023\t0.05\t2.504\t0.00\t3.72\t2.497\t3.70');
    expect(row!.problems).toEqual([]);
    expect(row!.entry).toEqual({
      version: 1, name: 'A1', source: 'Kitchen round', options: { blankPolicy: 'blank-subtracted' }, retestRuns: [],
      figures: { oilAmount: { text: '900', unit: 'kg' }, titrantStrength: { text: '0.1023', unit: 'mol/L' }, blank: { text: '0.05', unit: 'mL' } },
      runs: [
        { sample: { text: '2.504', unit: 'g' }, start: { text: '0.00', unit: 'mL' }, end: { text: '3.72', unit: 'mL' } },
        { sample: { text: '2.497', unit: 'g' }, start: { text: '0', unit: 'mL' }, end: { text: '3.70', unit: 'mL' } },
      ],
    });
  });
  it('a certificate, where nothing was titrated', () => {
    expect(entriesOf('Lot\tFFA\nA\t4.2%')[0]!.entry).toMatchObject({ figures: { certificateFfa: { text: '4.2', unit: '%' } }, options: { acidKnownFrom: 'certificate-ffa' } });
    expect(entriesOf('Lot\tSäurezahl\nA\t8,4', ',')[0]!.entry).toMatchObject({ options: { acidKnownFrom: 'certificate-acid-value' } });
  });
  it('a portion by volume says so', () => {
    expect(entriesOf('Sample 1 [mL]\tTitre 1\n5\t2')[0]!.entry!.options).toEqual({ sampleTakenBy: 'volume' });
  });
  it('each bad cell has its own reason, and the rest goes on', () => {
    const rows = entriesOf('Lot\tDate\tFFA\tWater\nA\t2026-03-02\tabc\t0.1\n\t\t\t\nB\tyesterday\t1,500\t1e5\nC\t2026-03-03\t2.0\t0.05');
    expect(rows.map(({ row, entry, problems }) => [row, entry?.name, problems.map(({ code, column }) => `${code} ${column}`)])).toEqual([
      [2, 'A', ['not-a-number 2']], [3, undefined, []], [4, 'B', ['not-a-date 1', 'ambiguous 2', 'exponent 3']], [5, 'C', []],
    ]);
    expect(rows[2]!.entry!.figures['certificateFfa']).toEqual({ typed: '1,500', doubt: 'ambiguous', unit: '%' });
    expect(rows[2]!.entry!.date).toBe('yesterday');
  });
  it('a long number of a lot stays a text, digit by digit', () => {
    expect(entriesOf('Lot\tFFA\n000123456789012345\t2')[0]!.entry!.name).toBe('000123456789012345');
  });
  // the beginnings that OWASP lists for CSV injection, and what else turns up in cells
  it.each(['=cmd|\' /C calc\'!A0', '+1', '-1', '@SUM(A1)', '🛢️ oil', 'شركة الزيت', 'A\u202eB'])('%s stays a name, and is never run', (text) => {
    const [row] = entriesOf(`Lot\tFFA\n${text}\t2`);
    expect(row!.entry!.name).toBe(text);
  });
  it.each([['=1+1', 'not-a-number'], ['@1', 'not-a-number'], ['🛢️', 'not-a-number']])('%s is no figure: %s', (text, code) => {
    expect(entriesOf(`Lot\tFFA\nA\t${text}`)[0]!.problems).toMatchObject([{ code }]);
  });
  it('+1 and -1 are figures, and the second is refused where it is read', () => {
    expect(entriesOf('Lot\tFFA\nA\t+1\nB\t-1').map(({ entry }) => entry!.figures['certificateFfa'])).toEqual([{ text: '1', unit: '%' }, { text: '-1', unit: '%' }]);
  });
});

describe('a sheet worked out', () => {
  const worked = (text: string, profile = EMPTY_SITE): { rows: readonly WorkedRow[]; summary: RowsSummary } => {
    const sheet = table(text);
    const slices = workedRows({ table: sheet, columns: recogniseColumns(sheet), mark: '.', dates: 'day-first', site: profile });
    const rows: WorkedRow[] = [];
    for (;;) {
      const { done, value } = slices.next();
      if (done) return { rows, summary: value };
      rows.push(...value);
    }
  };

  it('gives what readLot and triage give, row by row', () => {
    const shares = Array.from({ length: 60 }, (_, i) => (i * 0.93 + 0.4).toFixed(2));
    const lines = shares.map((share, i) => (i % 3 ? `${i}\t900\t${share}\t\t\t\t` : `${i}\t800\t\t0.1\t5.00\t${(Number(share) * 50 / 28.2).toFixed(2)}\t${i % 2 ? '22' : ''}`));
    const text = `Lot\tOil\tFFA\tTitrant\tSample 1\tTitre 1\tTitration temperature\n${lines.join('\n')}`;
    const profile = site({ figures: { blendingLimit: '45 %' }, options: { acidProofEquipment: 'yes' } });
    const { rows, summary } = worked(text, profile);
    const sheet = table(text);
    for (const [i, { entry }] of [...rowEntries(sheet, recogniseColumns(sheet), '.')].entries()) {
      const [row, whole, judged] = [rows[i]!, read(entry, profile), triage(entry, profile)];
      if ('faults' in judged) throw new Error(JSON.stringify(judged.faults));
      expect([row.acidValue, row.freeFattyAcid, row.plusMinus]).toEqual([whole.readings['acidValue']!.shown, whole.readings['freeFattyAcid']!.shown, whole.uncertainties['freeFattyAcid']?.shown]);
      expect(row.state).toBe(judged.state);
      expect([row.catalyst, row.methanol]).toEqual([whole.readings[`${row.route!}.catalyst`]!.shown, whole.readings[`${row.route!}.methanol`]!.shown]);
      expect(shownIn(whole, `${row.route!}.catalyst`)).toBe(`${row.catalyst!} kg`);
    }
    expect(Object.values(summary.states).reduce((sum, count) => sum + count)).toBe(60);
  });

  it('sums up by state and by problem', () => {
    const { rows, summary } = worked('Lot\tOil\tFFA\nA\t900\t1\nB\t900\tabc\n\t\t\nC\t900\t120\nD\t900\t\nE\t-5\t2');
    expect(summary).toEqual({
      rows: 6, empty: 1, states: { accepted: 2, 'for-pretreatment': 0, 'for-blending': 0, 'held-for-retest': 0, declined: 0, 'not-known': 3 },
      problems: { 'not-a-number': 1, 'ffa-above-100': 1, missing: 1, 'not-above-zero': 1 },
    });
    expect(rows[2]).toEqual({ row: 4 });
    expect(rows[5]).toMatchObject({ state: 'accepted', problem: { quantity: 'oilAmount' } });
  });
});
