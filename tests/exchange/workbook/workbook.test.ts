import { read as readBook, utils } from '@e965/xlsx';
import type { WorkSheet } from '@e965/xlsx';
import { strFromU8, unzipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { EMPTY_LOT, EMPTY_SITE } from '../../../src/core.js';
import type { LotEntry, RunEntry } from '../../../src/core.js';
import { columnName } from '../../../src/exchange/workbook/cells.js';
import { cellText } from '../../../src/exchange/workbook/xml-text.js';
import { workbookOf } from '../../../src/exchange/workbook/workbook.js';
import { choiceName, rowName, workbookWords } from '../../../src/exchange/workbook/words.js';
import { deWorkbook } from '../../../src/locales/de-workbook.js';
import { enWorkbook } from '../../../src/locales/en-workbook.js';
import { isKnown } from '../../../src/formula/reading.js';
import { TYPED_UNITS } from '../../../src/formula/units.js';
import { lotRun } from '../../../src/lot/lot-run.js';
import { certified, lot, run } from '../../lot/lot.js';
import { PLANT, randomLots } from '../../outside/random-lots.js';

// Read back by another library (SheetJS), which knows nothing of how the file was made.

type CellValue = string | number | undefined;

interface Read { readonly names: readonly string[]; readonly sheets: Readonly<Record<string, WorkSheet>>; rows(name: string): CellValue[][] }

function readBack(bytes: Uint8Array): Read {
  const { SheetNames, Sheets } = readBook(bytes, { type: 'array', cellFormula: true });
  return { names: SheetNames, sheets: Sheets, rows: (name) => utils.sheet_to_json<CellValue[]>(Sheets[name]!, { header: 1, raw: true, blankrows: true }) };
}

/** The entry that the row of a lot holds, by its keys alone. */
function entryIn(keys: readonly string[], row: readonly CellValue[]): LotEntry {
  const figures: Record<string, object> = {};
  const options: Record<string, string> = {};
  const texts: Record<string, string> = {};
  const runs: Record<'runs' | 'retestRuns', Record<string, unknown>[]> = { runs: [], retestRuns: [] };
  keys.forEach((key, at) => {
    const value = row[at];
    if (value === undefined || key.endsWith('.unit')) return;
    const figure = { text: String(value), unit: String(row[at + 1] ?? '') };
    const [, retest, number, cell] = /^(retest\.)?run(\d+)\.(\w+)$/.exec(key) ?? [];
    if (cell) (runs[retest ? 'retestRuns' : 'runs'][Number(number) - 1] ??= {})[cell] = cell === 'struck' ? value : figure;
    else if (['name', 'source', 'date'].includes(key)) texts[key] = String(value);
    else if (keys[at + 1] === `${key}.unit`) figures[key] = figure;
    else options[key] = String(value);
  });
  return { ...EMPTY_LOT, ...texts, figures, options, runs: runs.runs, retestRuns: runs.retestRuns } as LotEntry;
}

/** The entry with each figure as the number it is, so that 8.40 and 8.4 are alike. */
const asNumbers = (entry: LotEntry): unknown => JSON.parse(JSON.stringify(entry), (key, value: unknown) => (key === 'text' ? Number(value) : value)) as unknown;

/** A key in which no word has been found for anything; one that is a word itself has no point or capital in it. */
const bare = (key: string): string => (/[.A-Z]/.test(key) ? key.toLowerCase() : '');

/** How many brackets stand inside each other. */
function deepest(formula: string): number {
  let depth = 0;
  let most = 0;
  for (const sign of formula) {
    if (sign === '(') most = Math.max(most, ++depth);
    if (sign === ')') depth--;
  }
  return most;
}

describe('a workbook of lots', () => {
  const lots = [...randomLots(8, 3), certified('18.4'), EMPTY_LOT];
  const book = readBack(workbookOf(lots, PLANT).bytes);

  it('holds what was typed, to be read back', () => {
    const [, keys = [], ...rows] = book.rows('Lots');
    expect(rows.map((row) => asNumbers(entryIn(keys as string[], row)))).toEqual(lots.slice(0, rows.length).map(asNumbers));
    // a lot of which nothing was typed leaves no cell
    expect(lots.length - rows.length).toBeLessThanOrEqual(1);
  });

  it('carries results with its formulas, for readers that do not compute', () => {
    const rows = book.rows('Working');
    let figures = 0;
    for (const [at, entry] of lots.entries()) {
      const { findings, sheet } = lotRun(entry, PLANT);
      for (const [row, cells] of rows.entries()) {
        const key = String(cells[1]);
        if (!row || !sheet.quantities.has(key)) continue;
        const outcome = findings.outcome(key);
        const cell = book.sheets['Working']![`${columnName(6 + at)}${row + 1}`] as { v: unknown; f?: string };
        expect([key, cell.v]).toEqual([key, isKnown(outcome) ? outcome.toNumber() : 'not known']);
        expect([key, cell.f]).toEqual([key, expect.stringMatching(/^IFERROR\(.+,"not known"\)$/) as unknown]);
        if (isKnown(outcome)) figures++;
      }
    }
    expect(figures).toBeGreaterThan(2_000);
  });

  it('has plain formulas only, short enough for every office suite, and each over cells above it', () => {
    const sheet = book.sheets['Working']!;
    const plain = new Set(['IFERROR', 'IF', 'ISNUMBER', 'NA', 'COUNT', 'EXP', 'LN', 'ROUND', 'MEDIAN', 'MIN', 'MAX']);
    const formulas = Object.entries(sheet).flatMap(([address, cell]) => {
      const { f } = cell as { f?: string };
      return address.startsWith('!') || f === undefined ? [] : [{ row: Number(/\d+$/.exec(address)![0]), f, outside: f.replace(/"(?:[^"]|"")*"/g, '""') }];
    });
    expect(formulas.length).toBeGreaterThan(4_000);
    // 8192 characters and 64 levels are the most that a cell takes (ECMA-376 and its users; from memory)
    expect(Math.max(...formulas.map(({ f }) => f.length))).toBeLessThan(8192);
    expect(Math.max(...formulas.map(({ outside }) => deepest(outside)))).toBeLessThan(64);
    // a power of ten is written with a capital in the file
    expect(formulas.filter(({ outside }) => /\de[-+\d]/.test(outside))).toEqual([]);
    expect([...new Set(formulas.flatMap(({ outside }) => outside.match(/[A-Z]+(?=\()/g) ?? []))].filter((name) => !plain.has(name))).toEqual([]);
    const below = formulas.filter(({ row, outside }) => [...outside.replace(/(?:Lots|Site)!\$?[A-Z]+\d+/g, '').matchAll(/(?<![A-Z])[A-Z]{1,3}(\d+)\b/g)].some(([, at]) => Number(at) > row));
    expect(below).toEqual([]);
  });

  it('names every quantity with its unit and source', () => {
    const row = book.rows('Working').find((cells) => cells[1] === 'acidValue')!;
    expect(row.slice(0, 4)).toEqual(['Acid value', 'acidValue', 'AV', 'mg/g']);
    expect(row[4]).toContain('ISO 660');
    const standing = book.rows('Site').find((cells) => cells[1] === 'NaOH.assay')!;
    expect(standing.slice(2, 5)).toEqual([98, '%', expect.stringContaining('recalled from the source')]);
    expect(book.rows('Site').find((cells) => cells[1] === 'KOH.assay')!.slice(2, 5)).toEqual([89.5, '%', 'set by the site']);
  });

  it('names every row in words', () => {
    for (const words of [workbookWords('en'), workbookWords('de')]) {
      const { quantities, choices } = lotRun(lots[0]!, PLANT).sheet;
      for (const key of quantities.keys()) expect(rowName(key, words).toLowerCase()).not.toBe(bare(key));
      for (const key of choices.keys()) expect(choiceName(key, words).toLowerCase()).not.toBe(bare(key));
    }
  });

  it('speaks German', () => {
    const german = readBack(workbookOf([certified('2')], EMPTY_SITE, { language: 'de-AT' }).bytes);
    expect(german.names).toEqual(['Hinweise', 'Partien', 'Betrieb', 'Rechenweg']);
    const [head] = german.rows('Rechenweg');
    expect(head).toContain('Partie 1');
    expect(german.rows('Rechenweg').flat()).toContain('nicht bekannt');
  });

  it('names its sheets so that formulas need no quotation marks, and no longer than 31 letters', () => {
    for (const { sheets } of [enWorkbook, deWorkbook]) for (const name of Object.values(sheets)) expect(name).toMatch(/^[A-Za-z]{1,31}$/);
  });

  it('tells units apart whatever their capitals, since sheets do not', () => {
    const units = [...TYPED_UNITS.values()];
    for (const unit of units) {
      expect(units.filter((other) => other.sameDimension(unit) && other.symbol.toLowerCase() === unit.symbol.toLowerCase())).toEqual([unit]);
    }
  });
});

describe('what a workbook cannot hold', () => {
  it('is said: no lots', () => {
    const book = readBack(workbookOf([]).bytes);
    expect(book.rows('Notes').flat()).toContain('No lots.');
    expect([book.rows('Working').length, book.rows('Lots').length]).toEqual([1, 2]);
  });

  it('is said: digits beyond the fifteenth', () => {
    const { bytes, shortened } = workbookOf([{ ...lot({ figures: { oilAmount: '800.12345678901234567 kg', waterContent: '0.10 %' } }), name: 'Long' }]);
    expect(shortened).toEqual([{ where: 'Long, Amount of oil', text: '800.12345678901234567' }]);
    expect(readBack(bytes).rows('Notes').flat().join('\n')).toContain('Long, Amount of oil, 800.12345678901234567');
  });

  it('is left out and named: a lot that cannot be read', () => {
    const long = { ...certified('2'), name: 'n'.repeat(40_000) };
    const unknown = { ...certified('2'), name: 'Odd', figures: { nothing: { text: '1', unit: 'kg' } } };
    const { bytes, leftOut } = workbookOf([long, certified('2'), unknown, null as unknown as LotEntry].slice(0, 3));
    expect(leftOut.map(({ lot: at, faults }) => [at, faults[0]!.code])).toEqual([[0, 'too-long'], [2, 'unknown-key']]);
    const book = readBack(bytes);
    expect(book.rows('Notes').flat().join('\n')).toContain('could not be read: Odd.');
    expect(book.rows('Lots')).toHaveLength(3);
  });

  it('is left out with a site that cannot be read', () => {
    const { leftOut } = workbookOf([certified('2')], { ...EMPTY_SITE, version: 9 as 1 });
    expect(leftOut[0]!.faults).toEqual([expect.objectContaining({ in: 'site', code: 'newer-version' })]);
  });

  it('stands as typed: figures that were refused or not understood', () => {
    const doubted = { ...EMPTY_LOT, figures: { oilAmount: { typed: '1,500', doubt: 'ambiguous', unit: 'kg' }, waterContent: { text: '1'.repeat(40), unit: '%' } }, runs: [run('5 g', '3', '1')] as readonly RunEntry[] };
    const book = readBack(workbookOf([doubted]).bytes);
    const [, keys = [], row = []] = book.rows('Lots');
    expect([row[keys.indexOf('oilAmount')], row[keys.indexOf('waterContent')]]).toEqual(['1,500', '1'.repeat(40)]);
    const titre = book.rows('Working').find((cells) => cells[1] === 'run1.titre')!;
    expect(titre[6]).toBe('not known');
  });
});

describe('a text in a cell', () => {
  it('is text in every sheet of the file, and never markup', () => {
    const name = '=cmd|\' /C calc\'!A0</t></is></c><c r="B9"><f>1+1</f></c>';
    const { bytes } = workbookOf([{ ...certified('2'), name, source: '=1+1' }]);
    const parts = unzipSync(bytes);
    for (const sheet of [1, 2, 3]) expect(strFromU8(parts[`xl/worksheets/sheet${sheet}.xml`]!)).not.toContain('<f>');
    const working = strFromU8(parts['xl/worksheets/sheet4.xml']!);
    expect(working).not.toContain('<f>1+1</f>');
    expect(readBack(bytes).rows('Working')[0]).toContain(name);
  });

  it('holds nothing that XML forbids, and is no longer than a cell', () => {
    expect(cellText('a\0b\u0008\ufffe\ud800c\udc00\t\n')).toBe('a\ufffdb\ufffd\ufffd\ufffdc\ufffd\t\n');
    expect(cellText('🛢️ مطعم \r')).toBe('🛢️ مطعم &#13;');
    expect(cellText('_x0041_')).toBe('_x005F_x0041_');
    expect(cellText('y'.repeat(40_000))).toBe(`${'y'.repeat(32_766)}…`);
  });

  it('columns are lettered as sheets letter them', () => {
    expect([0, 25, 26, 51, 52, 701, 702, 16_383].map(columnName)).toEqual(['A', 'Z', 'AA', 'AZ', 'BA', 'ZZ', 'AAA', 'XFD']);
  });

  it('the same lots give the same bytes', () => {
    expect(workbookOf([certified('2')]).bytes).toEqual(workbookOf([certified('2')]).bytes);
  });
});
