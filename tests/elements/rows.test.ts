import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, describe, expect, test, vi } from 'vitest';
import type { ColumnMemory } from '../../src/exchange/table/columns.js';
import type { SheetBlock, SheetHost, SheetSelection } from '../../src/exchange/sheet-host/sheet-host.js';
import { deRows } from '../../src/locales/de-rows.js';
import { enGiving } from '../../src/locales/en-giving.js';
import { enRows } from '../../src/locales/en-rows.js';
import { enTriage } from '../../src/locales/en-triage.js';
import '../../src/sheets.js';
import type { EsterwayRows } from '../../src/sheets.js';
import { button, choose, click, emulate, find, input, openPart, paste, place, press, select, words } from './tools/page.js';
import { site, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

const SHEET = 'Lot\tSupplier\tDate\tOil kg\tFFA %\tQuality\nA1\tKitchen round\t2026-03-02\t900\t2.1\tgood\nA2\tSnack fryers\t2026-03-03\t1200\t5.4\tfair\n\t\t\t\t\t\nA3\tSnack fryers\tsoon\t800\tabc\tbad\n=cmd|\' /C calc\'!A0\tMill\t2026-03-04\t700\t1.0\t';

const placeRows = async (text = '', parts: Partial<Pick<EsterwayRows, 'host' | 'columnMemory'>> = {}, lang = 'en') => {
  const element = await place<EsterwayRows>(html`<esterway-rows lang=${lang} .site=${site({})} .host=${parts.host} .columnMemory=${parts.columnMemory}></esterway-rows>`);
  if (text) await paste(box(element), text);
  return element;
};
const box = (element: EsterwayRows): HTMLTextAreaElement => element.shadowRoot!.querySelector('#text')!;
const workOut = async (element: EsterwayRows, rows: number): Promise<void> => {
  await click(button(element, fill((element.lang === 'de' ? deRows : enRows).work, { rows: String(rows) })));
  await vi.waitFor(() => expect(words(element)).toContain((element.lang === 'de' ? deRows : enRows).results), { timeout: 15_000 });
  await element.updateComplete;
};

afterEach(async () => {
  await emulate();
});

describe('rows that are pasted', () => {
  test('are understood column by column and row by row, before anything is worked out', async () => {
    const element = await placeRows(SHEET);
    const text = words(element);
    expect(text).toContain(fill(enRows.size, { rows: '5', columns: '6' }));
    expect(select(element, '“FFA %”').value).toBe('certificateFfa');
    expect(select(element, '“Quality”').value).toBe('');
    expect(text).toContain('Row 2 is read as: lot A1, source Kitchen round, date 2026-03-02, amount of oil 900 kg, free fatty acid 2.1 %.');
    expect(text).toContain(fill(enRows.rowSays, { row: '5', what: `“Date”: ${fill(enRows.problems['not-a-date'], { typed: 'soon' })} “FFA %”: ${fill(en.problems['not-a-number'], { typed: 'abc' })}` }));
    expect(text).not.toContain(enRows.results);
  });

  test('are worked out: state, route, charge, and each bad row with its reason', async () => {
    const element = await placeRows(SHEET);
    await workOut(element, 5);
    const text = words(element);
    expect(text).toContain(fill(enRows.done, { rows: '5', empty: '1' }));
    expect(text).toMatch(/2 · A1 accepted.*FFA 2\.10 ± [\d.]+ % · 4\.2 mg\/g · direct · [\d.]+ kg of catalyst, [\d.]+ kg of methanol/);
    expect(text).toMatch(/3 · A2 for pretreatment/);
    expect(text).toMatch(/5 · A3 not judged yet.*abc/);
    // by state, and by problem
    expect(text).toContain(`${enTriage.shortStates.accepted} 2 ×`);
    // what looks like a formula is a name
    expect(text).toContain("=cmd|' /C calc'!A0");
  });

  test('show only those with a problem, when asked', async () => {
    const element = await placeRows(SHEET);
    await workOut(element, 5);
    await choose(element, enRows.filter, 'problems');
    expect(words(element)).not.toContain('2 · A1');
    expect(words(element)).toContain('5 · A3');
  });

  test('whose columns are corrected: at once, kept for the next sheet, and told', async () => {
    const element = await placeRows('Lot\tOil quality\nA\t4.2');
    const kept: ColumnMemory[] = [];
    element.addEventListener('esterway-columns-change', ({ columnMemory }) => kept.push(columnMemory));
    expect(words(element)).toContain(enRows.nothingToRead);
    await choose(element, '“Oil quality”', 'certificateFfa');
    expect(kept.at(-1)).toEqual({ version: 1, columns: { 'oil quality': { key: 'certificateFfa', unit: '%' } } });
    expect(words(element)).not.toContain(enRows.nothingToRead);
    await choose(element, fill(enRows.unit, { column: '“Oil quality”' }), 'mg/kg');
    expect(kept.at(-1)?.columns['oil quality']?.unit).toBe('mg/kg');
    const other = await placeRows('Oil quality\tLot\n42000\tB', { columnMemory: kept.at(-1) });
    expect(select(other, '“Oil quality”').value).toBe('certificateFfa');
  });

  test('with decimal commas in an English page, and with both marks', async () => {
    const commas = await placeRows('Lot;FFA\nA;2,1\nB;10,55');
    expect(select(commas, enRows.mark).value).toBe(',');
    expect(words(commas)).toContain(enRows.markFound);
    const mixed = await placeRows('Lot\tFFA\nA\t2.1\nB\t3,5');
    expect(words(mixed)).toContain(fill(enRows.markMixed, { point: '2', comma: '3' }));
  });

  test('with dates that could be either ask, and take the answer', async () => {
    const element = await placeRows('Lot\tDate\tFFA\nA\t3/2/2026\t2');
    expect(words(element)).toContain(fill(enRows.orderAsked, { date: '3/2/2026' }));
    await choose(element, enRows.order, 'month-first');
    expect(select(element, enRows.order).value).toBe('month-first');
  });

  test.each([
    ['PK\u0003\u0004', enRows.faults.binary], ['Lot,FFA\nA,"1', fill(enRows.faults['quote-never-closed'], { row: '2' })], [Array(1000).fill('x').join('\t'), fill(enRows.faults['too-many-columns'], { columns: '1000', most: '999' })],
  ])('%# that cannot be read say why, and stay', async (text, sentence) => {
    const element = await placeRows(text);
    expect(words(element)).toContain(sentence);
    expect(box(element).value).toBe(text);
  });

  test('with a heading twice, one column, or none at all say so', async () => {
    expect(words(await placeRows('Lot\tFFA\tFFA\nA\t1\t2'))).toContain(fill(enRows.warnings['header-twice'], { header: 'FFA' }));
    expect(words(await placeRows('FFA\n1\n2'))).toContain(enRows.warnings['one-column']);
    expect(words(await placeRows('A\t1\nB\t2'))).toContain(enRows.warnings['no-header']);
  });
});

test('a long sheet is worked out beside the page, row for row the same', async () => {
  const lines = Array.from({ length: 1200 }, (_, i) => `L${i}\t900\t${(0.5 + (i % 70) / 10).toFixed(1)}`);
  const element = await placeRows(`Lot\tOil kg\tFFA %\n${lines.join('\n')}`);
  expect(words(element)).toContain(fill(enRows.looked, { looked: '1000' }));
  await workOut(element, 1200);
  expect(words(element)).toContain(fill(enRows.page, { from: '1', to: '25', of: '1200' }));
  await click(button(element, enRows.next));
  expect(words(element)).toContain('27 · L25');
  expect(words(element)).toContain(fill(enRows.done, { rows: '1200', empty: '0' }));
});

test('work that is stopped keeps what is done', async () => {
  const lines = Array.from({ length: 450 }, (_, i) => `L${i}\t900\t2.${i % 10}`);
  const element = await placeRows(`Lot\tOil kg\tFFA %\n${lines.join('\n')}`);
  // at once, or it is done
  button(element, fill(enRows.work, { rows: '450' })).click();
  await element.updateComplete;
  button(element, enRows.stop).click();
  await element.updateComplete;
  expect(words(element)).toMatch(/Stopped after \d+ of 450 rows/);
});

describe('results', () => {
  test('are copied as text and as a table, with the mark that the sheet wants', async () => {
    const element = await placeRows(SHEET);
    await workOut(element, 5);
    const write = vi.spyOn(navigator.clipboard, 'write').mockResolvedValue();
    await choose(element, enGiving.target, ',');
    await click(button(element, enGiving.copy));
    await vi.waitFor(() => expect(write).toHaveBeenCalledOnce());
    const item = write.mock.calls[0]![0][0]!;
    const text = await (await item.getType('text/plain')).text();
    expect(text.split('\r\n')[0]).toBe('Row\tLot\tFFA [%]\tFFA ± [%]\tAcid value [mg/g]\tState\tRoute\tCatalyst [kg]\tMethanol [kg]\tProblem');
    expect(text).toMatch(/^2\tA1\t2,10\t0,\d+\t4,2\taccepted\tdirect\t/m);
    // a name that a sheet would run is guarded
    expect(text).toContain("'=cmd|' /C calc'!A0");
    expect(await (await item.getType('text/html')).text()).toContain('<table>');
    await vi.waitFor(() => expect(words(element)).toContain(fill(enGiving.copied, { rows: '4' })));
    write.mockRestore();
  });

  test('where the page may not write the clipboard stand in a box to copy from', async () => {
    const element = await placeRows(SHEET);
    await workOut(element, 5);
    const write = vi.spyOn(navigator.clipboard, 'write').mockRejectedValue(new Error('barred'));
    const command = vi.spyOn(document, 'execCommand').mockReturnValue(false);
    await click(button(element, enGiving.copy));
    await vi.waitFor(() => expect(words(element)).toContain(enGiving.copyByHand));
    expect(element.shadowRoot!.querySelector<HTMLTextAreaElement>('textarea[readonly]')!.value).toContain('A1\t2.10');
    write.mockRestore();
    command.mockRestore();
  });

  test('go into files: CSV and a workbook', async () => {
    const element = await placeRows(SHEET);
    await workOut(element, 5);
    const saved: { name: string; blob: Blob }[] = [];
    const blobs: Blob[] = [];
    const url = vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => {
      blobs.push(blob as Blob);
      return 'blob:none';
    });
    const clicked = vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (this: HTMLAnchorElement) {
      saved.push({ name: this.download, blob: blobs.at(-1)! });
    });
    await click(button(element, enGiving.csv));
    await click(button(element, enGiving.workbook));
    expect(saved.map(({ name }) => name)).toEqual(['esterway.csv', 'esterway.xlsx']);
    expect((await saved[0]!.blob.text()).replace('\ufeff', '')).toMatch(/^Row,Lot,FFA \[%\],/);
    expect(new Uint8Array(await saved[1]!.blob.arrayBuffer()).slice(0, 2)).toEqual(new Uint8Array([0x50, 0x4b]));
    url.mockRestore();
    clicked.mockRestore();
  });
});

describe('beside a sheet', () => {
  const sheetOf = (filled: number) => {
    const cells = SHEET.split('\n').map((line) => line.split('\t'));
    const written: { block: SheetBlock; over: string }[] = [];
    const host: SheetHost = {
      undo: 'one-step',
      read: () => Promise.resolve<SheetSelection>({ address: 'Deliveries!A1:F6', cells }),
      wouldOverwrite: () => Promise.resolve({ count: filled, first: filled ? [{ address: 'G2', text: 'mine' }] : [] }),
      write: (block, _, over) => {
        written.push({ block, over });
        return Promise.resolve({ address: 'Deliveries!G1:N6', cells: 40 });
      },
      follow: () => () => undefined,
    };
    return { host, written };
  };

  test('the selection is read, and the results stand beside their rows, headings too', async () => {
    const { host, written } = sheetOf(0);
    const element = await placeRows('', { host });
    await click(button(element, enRows.selection));
    await vi.waitFor(() => expect(words(element)).toContain(fill(enRows.fromSelection, { address: 'Deliveries!A1:F6', rows: '6', blank: '7' })));
    await workOut(element, 5);
    await click(button(element, enRows.beside));
    await vi.waitFor(() => expect(written).toHaveLength(1));
    const { block, over } = written[0]!;
    expect(over).toBe('blanks');
    expect(block).toHaveLength(6);
    expect(block[0]![0]).toBe('FFA [%]');
    expect(block[1]![0]).toBe('2.10');
    expect(block[3]!.every((cell) => cell === null)).toBe(true); // the empty row is left alone
    expect(words(element)).toContain(enRows.undoable);
  });

  test.each([['cancel', undefined], ['onlyBlanks', 'blanks'], ['replace', 'replace']] as const)('filled cells are asked about: %s', async (answer, over) => {
    const { host, written } = sheetOf(3);
    const element = await placeRows('', { host });
    await click(button(element, enRows.selection));
    await vi.waitFor(() => expect(words(element)).toContain('Deliveries!A1:F6'));
    await workOut(element, 5);
    await click(button(element, enRows.beside));
    await vi.waitFor(() => expect(words(element)).toContain(fill(enRows.filled, { count: '3', first: 'G2 “mine”' })));
    expect(written).toEqual([]);
    await click(button(element, enRows[answer]));
    await element.updateComplete;
    expect(written.map((one) => one.over)).toEqual(over ? [over] : []);
  });
});

test('a table of HTML is read where there is no text, or where the text is its source, and nothing of it runs', async () => {
  const source = '<table><tr><th>Lot</th><th>FFA&nbsp;[%]</th></tr><tr><td>A<script>document.title = "run"</script></td><td>2.1</td></tr><tr><td>B<img src="x" onerror="document.title = 1"></td><td>3.4</td></tr></table>';
  const element = await placeRows();
  const data = new DataTransfer();
  data.setData('text/html', source);
  box(element).dispatchEvent(new ClipboardEvent('paste', { clipboardData: data, bubbles: true, composed: true, cancelable: true }));
  await element.updateComplete;
  expect(select(element, '“FFA [%]”').value).toBe('certificateFfa');
  expect(words(element)).toContain(fill(enRows.size, { rows: '2', columns: '2' }));
  const other = await placeRows(source);
  expect(words(other)).toContain(fill(enRows.size, { rows: '2', columns: '2' }));
  expect(document.title).not.toMatch(/run|1/);
});

test('a file is read, whatever its letters are kept in', async () => {
  const element = await placeRows();
  const field = input(element, enRows.file);
  const transfer = new DataTransfer();
  transfer.items.add(new File([new Uint8Array([...'Partie;S'].map((letter) => letter.charCodeAt(0))), new Uint8Array([0xe4]), 'urezahl\nA;8,4'], 'eingang.csv'));
  field.files = transfer.files;
  field.dispatchEvent(new Event('change'));
  await vi.waitFor(() => expect(words(element)).toContain('eingang.csv'));
  expect(select(element, '“Säurezahl”').value).toBe('certificateAcidValue');
});

test('the lot on the bench is given as a row, and as a workbook, from the panel', async () => {
  const panel = await place(html`<esterway-panel .entry=${sour}></esterway-panel>`);
  await openPart(panel, en.panel.results);
  const results = find(panel, 'esterway-results');
  const write = vi.spyOn(navigator.clipboard, 'write').mockResolvedValue();
  await click(button(results, enGiving.copy));
  await vi.waitFor(() => expect(write).toHaveBeenCalledOnce());
  const [heads, row] = (await (await write.mock.calls[0]![0][0]!.getType('text/plain')).text()).split('\r\n').map((line) => line.split('\t'));
  expect(heads!.slice(0, 3)).toEqual(['Lot', 'Source', 'Date']);
  expect(row!.slice(0, 3)).toEqual(['HK-0417', 'Snack fryers', '2026-03-04']);
  expect(row![heads!.indexOf('Free fatty acid [%]')]).toMatch(/^4\.\d\d$/);
  expect(row![heads!.indexOf('Acid step 1: methanol [kg]')]).toMatch(/^\d+/);
  write.mockRestore();
  const empty = await place(html`<esterway-results></esterway-results>`);
  expect(words(empty)).toContain(enGiving.nothing);
});

test('stands in the panel, fetched when it is opened, and by the keyboard', async () => {
  const panel = await place(html`<esterway-panel></esterway-panel>`);
  await openPart(panel, en.panel.rows);
  const rows = find(panel, 'esterway-rows');
  box(rows).focus();
  await press('{Tab}');
  expect(rows.shadowRoot!.activeElement).toBe(button(rows, enRows.file));
});

test.each(['en', 'de'])('is accessible in %s, light and dark, and fits 270 pixels', async (lang) => {
  const element = await placeRows(SHEET, {}, lang);
  await workOut(element, 5);
  element.style.inlineSize = '270px';
  await element.updateComplete;
  expect(element.scrollWidth).toBeLessThanOrEqual(270);
  await expectPage(element).to.be.accessible();
  await emulate({ 'prefers-color-scheme': 'dark' });
  await expectPage(element).to.be.accessible();
});
