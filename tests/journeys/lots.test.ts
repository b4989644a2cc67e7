import type { Browser, Page } from 'playwright';
import { afterAll, afterEach, beforeAll, describe, expect, inject, it } from 'vitest';
import { readLot } from 'esterway/core';
import { deliveries } from '../../demo/lots.ts';
import { plant } from '../../demo/plant.ts';
import type { LotName } from '../../demo/lots.ts';
import { showNumber } from '../../src/exchange/number-format.js';
import { de } from '../../src/locales/de.js';
import { en } from '../../src/locales/en.js';
import { openBrowser, openPage } from '../tools/chromium.ts';

// Every lot of the demo, from the click on the delivery to the charge, in both languages.

let browser: Browser;
let page: Page;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());
afterEach(() => page.context().close());

const TEXTS = { en, de };
type Language = keyof typeof TEXTS;

/** The demo page with nothing loaded; complaints of the page and requests elsewhere fail the test. */
async function open(language: Language, more = ''): Promise<{ complaints: string[]; elsewhere: string[] }> {
  const url = inject('demoUrl');
  page = await openPage(browser, { viewport: { width: 1100, height: 900 } });
  const complaints: string[] = [];
  const elsewhere: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('console', (message) => message.type() === 'error' && complaints.push(message.text()));
  page.on('request', (request) => request.url().startsWith(url) || elsewhere.push(request.url()));
  await page.goto(`${url}?lang=${language}${more}`);
  await page.locator('esterway-panel').getByRole('button', { name: TEXTS[language].panel.print }).waitFor();
  return { complaints, elsewhere };
}

async function load(lot: LotName) {
  await page.locator(`[data-lot=${lot}]`).click();
  const entry = deliveries.find(({ id }) => id === lot)!.entry;
  await page.locator('esterway-panel').getByText(entry.name, { exact: true }).first().waitFor();
  const reading = readLot(entry, plant);
  if ('faults' in reading) throw new Error('the demo lot is no lot');
  return reading;
}

describe.each(['en', 'de'] as const)('in %s', (language) => {
  const texts = TEXTS[language];
  const shown = (text: string | undefined): string => showNumber(text ?? '', language);

  it.each([
    ['clean', 'direct', 'direct'],
    ['borderline', 'too-close', 'twoStep'],
    ['sour', 'two-step', 'twoStep'],
  ] as const)('the %s lot is %s and ends in that charge', async (lot, verdict, route) => {
    const { complaints, elsewhere } = await open(language);
    const reading = await load(lot);
    expect(reading.route.verdict).toBe(verdict);
    const panel = page.locator('esterway-panel');
    await panel.locator('esterway-route').getByText(texts.verdicts[verdict], { exact: true }).first().waitFor();
    const titration = page.locator('esterway-titration').first();
    await titration.getByRole('button', { name: shown(reading.readings['freeFattyAcid']?.shown) }).first().waitFor();
    const charge = page.locator('esterway-charge');
    await charge.getByRole('heading', { name: texts.charge.baseStep }).waitFor();
    expect(await charge.getByRole('heading', { name: texts.charge.acidStep }).count()).toBe(route === 'twoStep' ? reading.charges.twoStep.filter(({ step }) => step === 'acid').length : 0);
    const catalyst = Number(reading.readings[`${route}.catalyst`]?.shown).toString();
    await charge.getByRole('button', { name: `${shown(catalyst)} kg` }).first().waitFor();
    expect(await charge.getByRole('note').count()).toBe(reading.charges[route].length);
    expect({ complaints, elsewhere }).toEqual({ complaints: [], elsewhere: [] });
  });

  it('the nonsense lot says at each field what is wrong, and keeps what was typed', async () => {
    const { complaints } = await open(language);
    const reading = await load('nonsense');
    expect(reading.problems.length).toBeGreaterThan(3);
    const panel = page.locator('esterway-panel');
    await panel.locator('esterway-route').getByText(texts.verdicts['not-known'], { exact: true }).first().waitFor();
    expect(await panel.locator('input[aria-invalid=true]').count()).toBeGreaterThan(3);
    await panel.getByText(texts.problems['above-100-percent']).first().waitFor();
    await panel.getByText(texts.problems['end-below-start']).first().waitFor();
    expect(await page.locator('esterway-charge').getByRole('heading', { name: texts.charge.baseStep }).count()).toBe(0);
    expect(complaints).toEqual([]);
  });

  it('a retest of the sour lot replaces the estimate of the base step', async () => {
    await open(language, '&lot=sour');
    const charge = page.locator('esterway-charge');
    await charge.getByText(texts.charge.onEstimate).waitFor();
    const cells = charge.locator('esterway-titration esterway-figure[data-row="0"] input');
    const mark = language === 'de' ? ',' : '.';
    for (const [i, text] of ['10.02', '0.00', '1.35'].entries()) await cells.nth(i).fill(text.replace('.', mark));
    await charge.getByText(texts.charge.onRetest).waitFor();
    expect(await charge.getByText(texts.charge.onEstimate).count()).toBe(0);
  });

  it('prints: the page’s own content stays behind, the charge is on paper', async () => {
    await open(language, '&lot=sour');
    await page.emulateMedia({ media: 'print' });
    await page.locator('esterway-charge').getByRole('heading', { name: texts.charge.baseStep }).waitFor();
    expect(await page.locator('[data-lot=sour]').isVisible()).toBe(false);
    expect(await page.locator('esterway-working').isVisible()).toBe(false);
    expect((await page.pdf({ format: 'A4' })).subarray(0, 4).toString()).toBe('%PDF');
  });
});
