import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { describe, expect, test, vi } from 'vitest';
import type { EsterwayPanel, LotEntry } from '../../src/index.js';
import { enChargeSheet } from '../../src/locales/en-charge-sheet.js';
import '../../src/more.js';
import { button, click, find, place, words } from './tools/page.js';
import { clean, lot, nonsense, retested, site, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

const placeSheet = (entry: LotEntry, profile = site({}), lang = 'en') =>
  place(html`<esterway-charge-sheet lang=${lang} .entry=${entry} .site=${profile}></esterway-charge-sheet>`);
/** The frame that is printed from, held before it is printed. */
const held = (): Promise<HTMLIFrameElement> =>
  new Promise((resolve) => {
    const observer = new MutationObserver(() => {
      const frame = document.querySelector('iframe');
      if (!frame) return;
      observer.disconnect();
      frame.contentWindow!.print = () => resolve(frame);
    });
    observer.observe(document.body, { childList: true });
  });
const printed = (frame: HTMLIFrameElement) => frame.contentDocument!.querySelector('esterway-charge-sheet')!.shadowRoot!.textContent;

const pages = (element: Element) => [...element.shadowRoot!.querySelectorAll('.page')];

describe('the charge on paper', () => {
  test('is a page for each step, with the readings, the reason, amounts, cautions, formulas and room to sign', async () => {
    const element = await placeSheet(sour);
    const all = pages(element);
    expect(all.length).toBeGreaterThan(1);
    for (const page of all) {
      const text = words(page);
      expect(text).toContain('2.504 g: 0.00 – 3.72 mL');
      expect(text).toContain('4.29 % ± 0.27 %');
      expect(text).toContain(fill(en.reasons['above-direct-limit'], { ffa: '4.29', limit: '3.0' }));
      expect(text).toContain(en.cautions.methanol);
      expect(text).toContain(enChargeSheet.check);
      expect(text).toContain(enChargeSheet.checkedBy);
      expect(text).toContain(enChargeSheet.defer);
      expect(page.querySelectorAll('.box').length).toBe(page.querySelectorAll('tbody tr').length);
    }
    expect(words(all.at(-1)!)).toContain(en.cautions['caustic-into-methanol']);
  });

  test('asks for what scale and meter can give, with the exact amount beside it', async () => {
    const text = words(await placeSheet(sour, site({ figures: { methanolStep: '5 L', catalystStep: '100 g' } })));
    expect(text).toMatch(/\d+[05] L exactly [\d.]+ kg · [\d.]+ L/);
    expect(text).toMatch(/base load 1(\.\d+)? %/);
  });

  test('shows a struck run in brackets, and the retest where there is one', async () => {
    const struck: LotEntry = { ...sour, runs: [...sour.runs, { ...sour.runs[0]!, struck: 'overshot' }] };
    expect(words(await placeSheet(struck))).toContain('(2.504 g');
    expect(words(await placeSheet(retested))).toContain(en.charge.retestTitle);
  });

  test.each(['en', 'de'])('is accessible in %s', async (lang) => {
    await expectPage(await placeSheet(sour, site({}), lang)).to.be.accessible();
  });
});

describe('the panel prints', () => {
  test('it alone, from a frame that is taken away again', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${clean}></esterway-panel>`);
    const own = vi.spyOn(window, 'print').mockReturnValue();
    const printing = held();
    await click(button(panel, en.panel.print));
    const frame = await printing;
    expect(printed(frame)).toContain(enChargeSheet.defer);
    expect(frame.contentDocument!.title).toBe(`${enChargeSheet.title} ${clean.name ?? ''}`.trim());
    expect(frame.contentDocument!.documentElement.lang).toBe('en');
    frame.contentWindow!.dispatchEvent(new Event('afterprint'));
    expect(document.querySelector('iframe')).toBeNull();
    expect(own).not.toHaveBeenCalled();
    own.mockRestore();
  });

  test.each([['nothing typed', lot({})], ['nonsense', nonsense]])('the page as it stands where there is no charge: %s', async (_, entry) => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${entry}></esterway-panel>`);
    const own = vi.spyOn(window, 'print').mockReturnValue();
    await click(button(panel, en.panel.print));
    expect(own).toHaveBeenCalledOnce();
    own.mockRestore();
  });

  test('the route that a person looked at', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${clean}></esterway-panel>`);
    find(panel, 'esterway-charge').shadowRoot!.querySelectorAll<HTMLInputElement>('input[name=route]')[1]!.click();
    const printing = held();
    await click(button(panel, en.panel.print));
    const frame = await printing;
    expect(printed(frame)).toContain(en.charge.notThisRoute);
    frame.remove();
  });
});
