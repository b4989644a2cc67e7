import type { Browser, Locator, Page } from 'playwright';
import { afterAll, afterEach, beforeAll, beforeEach, expect, inject, it } from 'vitest';
import { sheetRows } from '../../demo/sheet-rows.ts';
import { enRows } from '../../src/locales/en-rows.js';
import { fill } from '../../src/locales/fill.js';
import { openBrowser, openPage } from '../tools/chromium.ts';

// The office's job: rows selected in a sheet, understood, worked out, and the results written beside them as one step.

let browser: Browser;
let page: Page;
let rows: Locator;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());
beforeEach(async () => {
  page = await openPage(browser, { viewport: { width: 1280, height: 900 } });
  await page.goto(`${inject('demoUrl')}sheet.html`);
  await page.locator('html[data-ready=yes]').waitFor();
  rows = page.locator('esterway-rows');
});
afterEach(() => page.context().close());

const press = (name: string): Promise<void> => rows.getByRole('button', { name }).click();
const cell = async (row: number, column: string): Promise<string> => (await page.locator(`#grid .tabulator-row:nth-child(${row}) [tabulator-field=${column}]`).innerText()).trim();

async function workedOut(): Promise<void> {
  await press(enRows.selection);
  await rows.getByText(fill(enRows.fromSelection, { address: 'Deliveries!A1:G41', rows: '41', blank: '7' })).waitFor();
  await press(fill(enRows.work, { rows: '40' }));
  await rows.getByText(fill(enRows.done, { rows: '40', empty: '1' })).waitFor();
}

it('the selection is read, with what raises a question told first', async () => {
  await press(enRows.selection);
  for (const said of [/^Row 9: “FFA \[%\]”: “see note” is not a figure/, /a point in row 2, a comma in row 24/, /^Row 33: “Date”: “Thursday” is no date/]) {
    await rows.getByText(said).first().waitFor();
  }
});

it('results are written beside the rows, in blank cells, and taken back as one step', async () => {
  await workedOut();
  await press(enRows.beside);
  await rows.getByText(enRows.undoable).waitFor();
  expect(await cell(1, 'H')).toBe('FFA [%]');
  expect(await cell(2, 'H')).toBe(sheetRows[1]![4]);
  expect(await cell(2, 'K')).toBe('accepted');
  expect(await cell(9, 'K')).toBe('not judged yet');
  expect(await cell(17, 'K')).toBe(''); // an empty row is left alone
  await page.getByRole('button', { name: 'Take the last block back' }).click();
  for (const column of ['H', 'K', 'O']) expect(await cell(2, column)).toBe('');
});

it('filled cells are asked about, and kept unless they may be written over', async () => {
  await workedOut();
  await press(enRows.beside);
  await rows.getByText(enRows.undoable).waitFor();
  await press(enRows.beside);
  await rows.getByRole('alertdialog').waitFor();
  expect(await rows.getByRole('alertdialog').innerText()).toContain('H1 “FFA [%]”');
  await press(enRows.cancel);
  expect(await rows.getByRole('alertdialog').count()).toBe(0);
});
