import type { Browser } from 'playwright';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readLot } from 'esterway/core';
import { deliveries } from '../../demo/lots.ts';
import { plant } from '../../demo/plant.ts';
import { deChargeSheet } from '../../src/locales/de-charge-sheet.ts';
import { enChargeSheet } from '../../src/locales/en-charge-sheet.ts';
import { built } from '../tools/built.ts';
import { openBrowser, openPage } from '../tools/chromium.ts';

// The charge on paper, from the PDF that Chromium makes of it: one page a step, whatever the lot, the language and the paper.

const TEXTS = { en: enChargeSheet, de: deChargeSheet };
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

/** Pages of a PDF: each has an object of its own, which Chromium does not compress. */
const pagesOf = (pdf: Buffer): number => pdf.toString('latin1').match(/\/Type\s*\/Page(?!s)/g)?.length ?? 0;

describe.each(['A4', 'Letter'] as const)('on %s', (format) => {
  describe.each(['en', 'de'] as const)('in %s', (lang) => {
    it.each(deliveries.filter(({ id }) => id !== 'nonsense').map(({ id, entry }) => [id, entry] as const))('the %s lot has a page for each step', async (_, entry) => {
      const reading = readLot(entry, plant);
      if ('faults' in reading) throw new Error('the demo lot is no lot');
      const page = await openPage(browser);
      await page.setContent(`<!doctype html><html lang="${lang}"><head><style>@page{margin:12mm}body{margin:0}</style></head><body></body></html>`);
      await page.addScriptTag({ path: built('dist/browser/esterway.min.js') });
      for (const file of ['shared', 'more']) await page.addScriptTag({ path: built(`dist/browser/esterway-${file}.min.js`) });
      await page.evaluate(([lot, site]) => {
        const sheet = document.createElement('esterway-charge-sheet');
        document.body.append(Object.assign(sheet, { entry: lot, site }));
      }, [entry, plant] as const);
      await page.getByText(TEXTS[lang].defer).first().waitFor();
      const route = reading.route.verdict === 'direct' ? 'direct' : 'twoStep';
      expect(pagesOf(await page.pdf({ format, preferCSSPageSize: false }))).toBe(reading.charges[route].length);
      await page.context().close();
    });
  });
});
