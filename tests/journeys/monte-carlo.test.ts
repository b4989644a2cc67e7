import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { join, relative, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Browser, Page } from 'playwright';
import { build } from 'vite';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { EMPTY_SITE } from '../../src/core.ts';
import { en } from '../../src/locales/en.ts';
import { enMonteCarlo } from '../../src/locales/en-monte-carlo.ts';
import { monteCarlo } from '../../src/lot/monte-carlo.ts';
import type { MonteCarloOrder, MonteCarloReport } from '../../src/lot/monte-carlo.ts';
import { lot, run } from '../lot/lot.ts';
import { built } from '../tools/built.ts';
import { openBrowser, openPage } from '../tools/chromium.ts';
import { startStatic } from '../tools/site-server.ts';
import type { Site } from '../tools/site-server.ts';

// Monte Carlo from the built files: the second file is fetched when it is asked for, and no sooner.

const strictly = (trusted: string): string =>
  ["default-src 'none'", "script-src 'self'", "style-src 'self'", "base-uri 'none'", "form-action 'none'", "require-trusted-types-for 'script'", `trusted-types ${trusted} 'allow-duplicates'`].join('; ');

const PAGE = 'tests/hostile/pages/strict.html';
const texts = enMonteCarlo;

let browser: Browser;
/** A page that trusts the address of the worker, and one that does not. */
let trusting: Site;
let wary: Site;
let page: Page;
let requests: string[];

beforeAll(async () => {
  built('dist/browser/esterway.min.js');
  built('dist/browser/esterway-worker.min.js');
  trusting = await startStatic({ folder: '.', headers: { 'Content-Security-Policy': strictly('lit-html esterway') } });
  wary = await startStatic({ folder: '.', headers: { 'Content-Security-Policy': strictly('lit-html') } });
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await trusting.close();
  await wary.close();
});

/** Types a lot and opens the working of its FFA. */
async function openFfa(url: string): Promise<void> {
  page = await openPage(browser);
  requests = [];
  page.on('request', (request) => requests.push(new URL(request.url()).pathname.split('/').at(-1) ?? ''));
  page.on('pageerror', (error) => {
    throw error;
  });
  await page.goto(url);
  await page.getByLabel('Amount of oil', { exact: true }).fill('900');
  await page.getByLabel('Titrant strength', { exact: true }).first().focus();
  await page.keyboard.type('0.1023\n2.504\n0.00\n3.72\n2.497\n3.72\n7.44\n');
  await page.getByRole('button', { name: '4.29 %' }).first().click();
  await page.getByText(en.budget.simulation, { exact: true }).click();
}
afterEach(() => page.context().close());

const press = (name: string) => page.getByRole('button', { name, exact: true }).click();
const agreed = () => page.getByText(texts.verdicts.agrees.split(':')[0]!).waitFor();
/** What both ways say of u, in per cent. */
const bothU = async () => {
  const row = page.locator('table.ways tbody tr').filter({ has: page.locator('th', { hasText: /^u$/ }) });
  return (await row.locator('td').allTextContents()).map(parseFloat);
};
const violations = () => page.evaluate(() => (window as unknown as { violations: string[] }).violations);

describe('under a strict policy', () => {
  test('the worker is fetched when asked for, and the page goes on while it draws', async () => {
    await openFfa(`${trusting.url}${PAGE}`);
    expect(requests).not.toContain('esterway-worker.min.js');
    // turns of the page's own thread, from the press of the button on
    await page.evaluate(() => {
      const counter = window as unknown as { turns: number };
      counter.turns = 0;
      const turn = (): void => {
        counter.turns++;
        setTimeout(turn, 5);
      };
      setTimeout(turn);
    });
    const counted = () => page.evaluate(() => (window as unknown as { turns: number }).turns);
    await press(texts.start);
    await page.waitForFunction((part) => {
      const inside = (root: Element | null | undefined, tag: string) => root?.shadowRoot?.querySelector(tag);
      const later = inside(inside(document.querySelector('esterway-panel'), 'esterway-working'), 'esterway-later');
      const progress = inside(inside(later, 'esterway-simulation'), 'progress') as HTMLProgressElement | null | undefined;
      return progress !== null && progress !== undefined && progress.value >= part;
    }, 20_000, { polling: 20 });
    const underWay = await counted();
    expect(underWay).toBeGreaterThan(0);
    await agreed();
    expect(await counted()).toBeGreaterThan(underWay + 5);
    expect(requests.filter((name) => name === 'esterway-worker.min.js')).toHaveLength(1);
    const [first, drawn] = await bothU();
    expect(Math.abs(drawn! - first!)).toBeLessThanOrEqual(0.0021);
    expect(await violations()).toEqual([]);
    await expect.poll(() => page.workers().length).toBe(0);
  });

  test('it can be stopped, which ends the worker', async () => {
    await openFfa(`${trusting.url}${PAGE}`);
    const started = page.waitForEvent('worker');
    await press(texts.start);
    await started;
    await press(texts.stop);
    await page.getByRole('button', { name: texts.start, exact: true }).waitFor();
    await expect.poll(() => page.workers().length).toBe(0);
    expect(await page.locator('table.ways').count()).toBe(0);
    expect(await violations()).toEqual([]);
  });
});

describe('where no worker may start, it is said, and the page draws by itself', () => {
  const inPage = async (): Promise<void> => {
    await press(texts.start);
    await page.getByText(texts.noWorker).waitFor();
    await press(texts.inPage);
    await agreed();
    const [first, drawn] = await bothU();
    expect(Math.abs(drawn! - first!)).toBeLessThanOrEqual(0.0021);
  };

  test('on a page that trusts no address of ours not even that part is fetched, and it says so', async () => {
    await openFfa(`${wary.url}${PAGE}`);
    await page.getByText(en.panel.partMissing).waitFor();
  });

  test('on a page opened from a file', async () => {
    await openFfa(pathToFileURL(built(PAGE)).href);
    await inPage();
  });
});

describe('the ES modules', () => {
  const entry = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('2.5 g', '0', '3.7')] });
  const order: MonteCarloOrder = { entry, site: EMPTY_SITE, keys: ['freeFattyAcid'], draws: 10_000, seed: 1 };
  const { mean, u } = monteCarlo(order)!.results['freeFattyAcid']!;

  /** What a worker makes of the order, started by a module of the page; as text, for the test runner would rewrite the import. */
  const drawnBy = (module: string) => page.evaluate<MonteCarloReport>(`import('${module}').then(({ startMonteCarlo }) => new Promise((resolve, reject) => {
    const worker = startMonteCarlo();
    worker.onerror = () => reject(new Error('the worker did not start'));
    worker.onmessage = ({ data }) => 'done' in data || resolve(data);
    worker.postMessage(${JSON.stringify(order)});
  }))`);
  const sameAsHere = expect.objectContaining({ result: expect.objectContaining({ results: { freeFattyAcid: expect.objectContaining({ mean, u }) } }) });
  let plain: Site | undefined;
  let folder: string | undefined;
  afterEach(async () => {
    await plain?.close();
    if (folder) rmSync(folder, { recursive: true });
    folder = undefined;
  });

  test('start the worker as they lie', async () => {
    page = await openPage(browser);
    plain = await startStatic({ folder: '.' });
    await page.goto(`${plain.url}tests/hostile/pages/frame.html`);
    expect(await drawnBy('/dist/esm/elements/parts/worker-place.js')).toEqual(sameAsHere);
  });

  test('and through the bundler of the page, which puts it where it likes', async () => {
    const cache = resolve(import.meta.dirname, '../../node_modules/.cache');
    mkdirSync(cache, { recursive: true });
    folder = mkdtempSync(join(cache, 'bundled-'));
    writeFileSync(join(folder, 'index.html'), '<!doctype html><title>bundled</title>');
    await build({
      configFile: false, root: folder, logLevel: 'error',
      build: {
        outDir: folder, emptyOutDir: false, write: true,
        rolldownOptions: { input: built('dist/esm/elements/parts/worker-place.js'), preserveEntrySignatures: 'strict', output: { entryFileNames: 'page.js' } },
      },
    });
    page = await openPage(browser);
    plain = await startStatic({ folder: relative(resolve(import.meta.dirname, '../..'), folder) });
    await page.goto(`${plain.url}index.html`);
    expect(await drawnBy('/page.js')).toEqual(sameAsHere);
  });
});
