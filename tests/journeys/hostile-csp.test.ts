import type { Browser, ConsoleMessage, Frame, Page } from 'playwright';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { built } from '../tools/built.ts';
import { openBrowser, openPage } from '../tools/chromium.ts';
import { startStatic } from '../tools/site-server.ts';
import type { Site } from '../tools/site-server.ts';

// The script file as it is shipped, on a page whose policy allows next to nothing, and no network at all.

const POLICY = [
  "default-src 'none'", "script-src 'self'", "style-src 'self'", "base-uri 'none'", "form-action 'none'", "require-trusted-types-for 'script'",
  // each copy of Lit makes the policy that its templates go through
  "trusted-types lit-html 'allow-duplicates'",
].join('; ');

let browser: Browser;
let strict: Site;
let plain: Site;
let page: Page;
let requests: string[];
let said: ConsoleMessage[];

beforeAll(async () => {
  built('dist/browser/esterway.min.js');
  strict = await startStatic({ folder: '.', headers: { 'Content-Security-Policy': POLICY } });
  plain = await startStatic({ folder: '.' });
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await strict.close();
  await plain.close();
});

async function open(url: string): Promise<void> {
  page = await openPage(browser);
  requests = [];
  said = [];
  page.on('request', (request) => requests.push(request.url()));
  page.on('console', (message) => said.push(message));
  page.on('pageerror', (error) => {
    throw error;
  });
  await page.goto(url);
}
afterEach(() => page.context().close());

const violations = (frame: Frame | Page) => frame.evaluate(() => (window as unknown as { violations: string[] }).violations);

/** The job, as a person does it: with keys. */
async function doTheJob(frame: Frame | Page): Promise<void> {
  await frame.getByLabel('Amount of oil', { exact: true }).focus();
  await page.keyboard.type('900');
  await frame.getByLabel('Titrant strength', { exact: true }).focus();
  await page.keyboard.type('0.1023\n2.504\n0.00\n3.72\n2.497\n3.72\n7.44\n');
  await frame.getByRole('button', { name: '4.29 %' }).first().click();
  await frame.getByText('Two-step: esterify the acid first').waitFor();
  await frame.getByRole('paragraph').filter({ hasText: /^free fatty acid$/ }).waitFor();
  expect(await frame.locator('math').count()).toBe(1);
}

describe('under a strict policy, with trusted types', () => {
  test('the panel does its whole job, asks the network for nothing and breaks no rule', async () => {
    await open(`${strict.url}tests/hostile/pages/strict.html`);
    await doTheJob(page);
    await page.getByRole('button', { name: 'Site values' }).click();
    await page.getByLabel('Direct limit, FFA', { exact: true }).fill('5,0');
    await page.getByText('Direct: straight to the base step').waitFor();
    expect(await violations(page)).toEqual([]);
    expect(said.map((message) => `${message.type()}: ${message.text()}`)).toEqual([]);
    const asked = requests.map((url) => new URL(url).pathname.split('/').pop());
    expect(asked).toEqual(['strict.html', 'strict-report.js', 'esterway.min.js', 'strict.css']);
  });

  test('it is dressed: styles come without a style attribute or tag', async () => {
    await open(`${strict.url}tests/hostile/pages/strict.html`);
    const panel = page.locator('esterway-panel');
    const look = await panel.evaluate((element) => {
      const { display, fontSize, backgroundColor } = getComputedStyle(element);
      return { display, fontSize, backgroundColor };
    });
    expect(look).toEqual({ display: 'block', fontSize: '14px', backgroundColor: 'rgb(251, 250, 245)' });
    const inline = await panel.evaluate((element) => {
      const found: string[] = [];
      const walk = (root: ParentNode): void => {
        for (const child of root.children) {
          if (child.hasAttribute('style') || child.localName === 'style') found.push(child.outerHTML.slice(0, 80));
          if (child.shadowRoot) walk(child.shadowRoot);
          walk(child);
        }
      };
      walk(element.shadowRoot!);
      return found;
    });
    expect(inline).toEqual([]);
  });

  test('the policy does refuse what it should: the test would see it', async () => {
    await open(`${strict.url}tests/hostile/pages/strict.html`);
    await page.evaluate(() => {
      const box = document.createElement('div');
      box.setAttribute('style', 'color: red');
      document.body.append(box);
    });
    expect(await violations(page)).not.toEqual([]);
  });

  test('in a frame of a page from elsewhere', async () => {
    await open(`${plain.url}tests/hostile/pages/frame.html`);
    await page.evaluate((url) => {
      const frame = document.createElement('iframe');
      frame.width = '320';
      frame.height = '900';
      frame.src = url;
      document.body.append(frame);
    }, `${strict.url}tests/hostile/pages/strict.html`);
    await page.frameLocator('iframe').getByLabel('Amount of oil').first().waitFor();
    const frame = page.frames()[1]!;
    await doTheJob(frame);
    expect(await violations(frame)).toEqual([]);
    expect(await frame.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)).toBe(0);
    expect(requests.filter((url) => !url.startsWith(strict.url))).toEqual([`${plain.url}tests/hostile/pages/frame.html`]);
  });
});

describe('two copies of the script on one page', () => {
  test('the second says so once and does no harm', async () => {
    await open(`${strict.url}tests/hostile/pages/twice.html`);
    const warnings = said.filter((message) => message.type() === 'warning').map((message) => message.text());
    expect(warnings).toHaveLength(1);
    expect(warnings[0]).toContain('esterway-panel');
    expect(said.filter((message) => message.type() === 'error').map((message) => message.text())).toEqual([]);

    const lone = page.locator('esterway-site');
    await lone.getByLabel('Maßlösung', { exact: true }).focus();
    await page.keyboard.type('0,1023\n2,504\n0,00\n3,72\n');
    await lone.getByText('Zweistufig: erst die Säure verestern').waitFor();
    await page.locator('esterway-panel').getByLabel('Ölmenge', { exact: true }).fill('900');
    expect(await page.locator('esterway-site').evaluate((element) => Object.keys((element as HTMLElement & { entry: { figures: object } }).entry.figures))).toEqual(['titrantStrength']);
    expect(await violations(page)).toEqual([]);
  });
});
