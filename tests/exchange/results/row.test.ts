import { describe, expect, it } from 'vitest';
import { EMPTY_LOT, EMPTY_SITE, readLot } from '../../../src/core.js';
import type { LotEntry } from '../../../src/core.js';
import { resultColumns, resultHeads } from '../../../src/exchange/results/columns.js';
import type { ResultKind } from '../../../src/exchange/results/columns.js';
import { beyondSheet, columnsBeyondSheet, resultRow } from '../../../src/exchange/results/row.js';
import type { ResultCell, ResultOptions } from '../../../src/exchange/results/row.js';
import { deResults } from '../../../src/locales/de-results.js';
import { de } from '../../../src/locales/de.js';
import { enResults } from '../../../src/locales/en-results.js';
import { en } from '../../../src/locales/en.js';
import { certified, lot, read, run } from '../../lot/lot.js';

const words = { ...enResults, verdicts: en.verdicts };

function rowOf(entry: LotEntry, kind: ResultKind = 'batch', options: Partial<ResultOptions> = {}): Record<string, ResultCell> {
  const columns = resultColumns(kind);
  const row = resultRow(entry, { ...EMPTY_SITE, name: 'Shed 2' }, readLot(entry), columns, { words, ...options });
  return Object.fromEntries(columns.map(({ key }, at) => [key, row[at]!]));
}

const TITRATED: LotEntry = {
  ...lot({ figures: { oilAmount: '800 kg', titrantStrength: '0.1000 mol/L' }, runs: [run('5.02 g', '0.00', '3.10'), run('4.98 g', '3.10', '6.15')] }),
  name: 'Drum 4', source: 'Canteen', date: '2026-03-02',
};

describe('the row of a lot', () => {
  it('has what the panel shows, under headings with units', () => {
    const row = rowOf(TITRATED);
    const { readings, uncertainties } = read(TITRATED);
    expect(row['name']).toEqual({ kind: 'text', text: 'Drum 4' });
    expect(row['acidValue']).toEqual({ kind: 'number', text: readings['acidValue']!.shown });
    expect(row['acidValue.expanded']).toEqual({ kind: 'number', text: uncertainties['acidValue']!.shown });
    expect(row['base.catalyst']).toEqual({ kind: 'number', text: readings['direct.catalyst']!.shown });
    expect([row['route']!.text, row['state']!.text, row['site']!.text]).toEqual([en.verdicts.direct, 'complete', 'Shed 2']);
    expect(row['pass1.methanol']!.kind).toBe('empty');
    expect(resultHeads(resultColumns('acidity'), words)).toContain('Acid value as KOH [mg/g]');
    expect(resultHeads(resultColumns('batch'), { ...deResults })).toContain('Veresterung 2: Schwefelsäure [kg]');
  });

  it('of a two-step lot holds the passes it takes and the base step after them', () => {
    const entry = certified('18.4');
    const { readings, charges } = read(entry);
    const row = rowOf(entry);
    const passes = charges.twoStep.filter(({ step }) => step === 'acid').length;
    for (let pass = 1; pass <= 3; pass++) {
      expect(row[`pass${pass}.sulfuric`]).toEqual(pass <= passes ? { kind: 'number', text: readings[`pass${pass}.sulfuric`]!.shown } : { kind: 'empty', text: '' });
    }
    expect(row['base.methanol']!.text).toBe(readings['twoStep.methanol']!.shown);
  });

  it('charges nothing where no route follows', () => {
    const row = rowOf(certified('60'));
    expect(row['route']!.text).toBe(en.verdicts.outside);
    expect(['base.methanol', 'base.catalyst', 'pass1.methanol'].map((key) => row[key]!.kind)).toEqual(['empty', 'empty', 'empty']);
  });

  it('says what is missing, refused or unreadable, and leaves its cells empty', () => {
    const empty = rowOf(EMPTY_LOT);
    expect([empty['state']!.text, empty['acidValue']!.kind, empty['route']!.text]).toEqual(['figures are missing', 'empty', en.verdicts['not-known']]);
    const refused = rowOf(lot({ ...{ figures: { oilAmount: '-4 kg', titrantStrength: '0.1 mol/L' } }, runs: [run('5 g', '0', '3')] }));
    expect([refused['state']!.text, refused['oilMass']!.kind, refused['acidValue']!.kind]).toEqual(['a figure was refused', 'empty', 'number']);
    const unreadable = rowOf({ ...EMPTY_LOT, name: 'X', figures: { nothing: { text: '1', unit: 'kg' } } });
    expect([unreadable['state']!.text, unreadable['name']!.text, unreadable['route']!.kind]).toEqual(['cannot be read', 'X', 'empty']);
    // without the batch a lot that was only titrated is complete
    const titrated = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '3')] });
    expect([rowOf(titrated, 'acidity')['state']!.text, rowOf(titrated, 'batch')['state']!.text]).toEqual(['complete', 'figures are missing']);
  });

  it('gives every digit on request, and tells which a sheet would cut', () => {
    const full = rowOf(TITRATED, 'batch', { figures: 'full' });
    expect(full['acidValue']!.text).toBe(read(TITRATED).readings['acidValue']!.value);
    expect(beyondSheet(full['acidValue']!)).toBe(true);
    expect(Object.values(rowOf(TITRATED)).some(beyondSheet)).toBe(false);
    // a figure as typed is shown as typed, and can be longer than a sheet keeps
    const long = rowOf(lot({ figures: { oilAmount: '800.0000000000001234 kg' } }));
    expect([long['oilMass']!.text, beyondSheet(long['oilMass']!)]).toEqual(['800.0', false]);
    const columns = resultColumns('batch');
    const rows = [resultRow(TITRATED, EMPTY_SITE, read(TITRATED), columns, { words, figures: 'full' })];
    expect(columnsBeyondSheet(rows, columns).map(({ key }) => key)).toContain('acidValue');
    expect(beyondSheet({ kind: 'number', text: '123456789012345000000' })).toBe(false);
    expect(beyondSheet({ kind: 'number', text: '1234567890123456' })).toBe(true);
  });

  it('speaks German', () => {
    const columns = resultColumns('acidity');
    const row = resultRow(EMPTY_LOT, EMPTY_SITE, readLot(EMPTY_LOT), columns, { words: { ...deResults, verdicts: de.verdicts } });
    expect(row.at(-1)!.text).toBe('Werte fehlen');
  });
});
