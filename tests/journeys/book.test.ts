import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, relative, resolve } from 'node:path';
import type { Browser, BrowserContext, Page } from 'playwright';
import { build } from 'vite';
import { afterAll, beforeAll, beforeEach, afterEach, expect, test } from 'vitest';
import { enBook } from '../../src/locales/en-book.ts';
import type { EsterwayBook } from '../../src/elements/book/book.ts';
import type { EsterwaySite } from '../../src/index.ts';
import { openBrowser, openPage } from '../tools/chromium.ts';
import { startStatic } from '../tools/site-server.ts';
import type { Site } from '../tools/site-server.ts';

// The intake book in real tabs of one browser, on a page with a strict policy.

const STRICT = "default-src 'none'; script-src 'self'; style-src 'self'; require-trusted-types-for 'script'; trusted-types lit-html esterway";
const root = resolve(import.meta.dirname, '../..');
let folder: string;
let site: Site;
let browser: Browser;
let context: BrowserContext;
let faults: string[];

beforeAll(async () => {
  mkdirSync(join(root, 'node_modules/.cache/journeys'), { recursive: true });
  folder = mkdtempSync(join(root, 'node_modules/.cache/journeys/book-'));
  writeFileSync(join(folder, 'entry.js'), "import '../../../../src/define.ts';\nimport { defineBook } from '../../../../src/elements/define-book.ts';\ndefineBook();\n");
  writeFileSync(join(folder, 'index.html'), '<!doctype html><html lang="en"><title>Intake</title><script type="module" src="book.js"></script><esterway-site><esterway-book></esterway-book></esterway-site></html>');
  await build({
    configFile: false, root, logLevel: 'error', publicDir: false,
    build: { outDir: folder, emptyOutDir: false, minify: false, lib: { entry: join(folder, 'entry.js'), formats: ['es'], fileName: () => 'book.js' }, rolldownOptions: { output: { codeSplitting: false } } },
  });
  site = await startStatic({ folder: relative(root, folder), headers: { 'Content-Security-Policy': STRICT } });
  browser = await openBrowser();
}, 120_000);
afterAll(async () => {
  await browser.close();
  await site.close();
  rmSync(folder, { recursive: true });
});

beforeEach(async () => {
  faults = [];
  context = (await openPage(browser)).context();
});
afterEach(async () => {
  await context.close();
  expect(faults).toEqual([]);
});

async function openTab(): Promise<Page> {
  const tab = await context.newPage();
  tab.on('pageerror', ({ message }) => faults.push(message));
  tab.on('console', (message) => message.type() === 'error' && faults.push(message.text()));
  await tab.goto(`${site.url}index.html`);
  await tab.getByRole('button', { name: enBook.keep }).waitFor();
  return tab;
}

const layOnBench = (tab: Page, name: string): Promise<void> =>
  tab.evaluate((of) => {
    const entry = { version: 1, name: of, figures: { oilAmount: { text: '900', unit: 'kg' } }, options: {}, runs: [], retestRuns: [] } as const;
    document.querySelector<EsterwaySite>('esterway-site')!.entry = entry;
  }, name);
const keep = (tab: Page): Promise<void> => tab.getByRole('button', { name: enBook.keep }).click();
const names = (tab: Page): Promise<string[]> => tab.locator('.row b').allInnerTexts();

test('what one tab keeps the other shows, and exports', async () => {
  const [first, second] = [await openTab(), await openTab()];
  await layOnBench(first, 'HK-1');
  await keep(first);
  await second.getByRole('button', { name: 'HK-1' }).waitFor();
  await second.getByText(enBook.whole).click();
  const [file] = await Promise.all([second.waitForEvent('download'), second.getByRole('button', { name: enBook.export }).click()]);
  expect(file.suggestedFilename()).toMatch(/^esterway-book-\d{4}-\d\d-\d\d\.json$/);
  const { records } = JSON.parse(readFileSync(await file.path(), 'utf8')) as { records: readonly { readonly entry: { readonly name: string } }[] };
  expect(records.map(({ entry }) => entry.name)).toEqual(['HK-1']);
});

test('of tabs closed while they write, each lot is there as a whole or not at all', async () => {
  const first = await openTab();
  await layOnBench(first, 'HK-1');
  await keep(first);
  await first.getByRole('button', { name: 'HK-1' }).waitFor();
  for (let turns = 0; turns < 8; turns++) {
    const tab = await openTab();
    await layOnBench(tab, `X-${turns}`);
    // closed a few frames later in each
    await tab.evaluate(async ([label, frames]) => {
      const book = document.querySelector<EsterwayBook>('esterway-book')!.shadowRoot!;
      [...book.querySelectorAll('button')].find((one) => one.textContent === label)!.click();
      for (let i = 0; i < frames; i++) await new Promise(requestAnimationFrame);
    }, [enBook.keep, turns] as const);
    await tab.close();
  }
  await first.reload();
  await first.getByRole('button', { name: 'HK-1' }).waitFor();
  const there = await names(first);
  expect(there).toContain('HK-1');
  for (const name of there) {
    const row = first.getByRole('button', { name });
    await row.click();
    await first.getByRole('list', { name: name }).waitFor();
    await row.click();
  }
});
