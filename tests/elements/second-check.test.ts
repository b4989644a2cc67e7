import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import type { EsterwayWorking, LotEntry } from '../../src/index.js';
import { enSecondCheck } from '../../src/locales/en-second-check.js';
import { deSecondCheck } from '../../src/locales/de-second-check.js';
import type { CheckSheetElement } from '../../src/elements/working/check-sheet.js';
import { button, choose, click, controls, deep, emulate, enter, hasField, input, nameOf, openPart, place, press, settled, words } from './tools/page.js';
import { clean, lot, retested, site, sour } from './tools/lots.js';
import { de, en, fill, plainSpaces } from './tools/texts.js';

const opened = async (of: string, entry: LotEntry = clean, lang = 'en'): Promise<EsterwayWorking> => {
  const working = await place<EsterwayWorking>(html`<esterway-working lang=${lang} of=${of} .entry=${entry}></esterway-working>`);
  await openPart(working, lang === 'de' ? de.working.secondCheck : en.working.secondCheck);
  return working;
};
const said = (element: Element): string => words([...deep(element)].find((one) => one.getAttribute('role') === 'status' && one.className === 'said')!);
const extraLeftOut = plainSpaces(enSecondCheck.slips['extra-left-out']);

afterEach(() => emulate());

describe('an own figure', () => {
  // 1 % of 900 kg, by an assay of 90 %: 10 kg of the 12.23 kg
  test('with a known slip: how far off, the slip, and what to do', async () => {
    const working = await opened('direct.catalyst');
    await enter(working, enSecondCheck.own, '10.00');
    await click(button(working, enSecondCheck.check));
    expect(said(working)).toBe(`Does not agree: 2.23 kg too low. ${enSecondCheck.oneSlip} ${extraLeftOut}`);
  });

  // (9 kg + 0.1023 · (0.97 / 2.504 + 0.97 / 2.497) / 2 · 900 · 56.1053 / 1000) / 0.9 = 12.22651 kg
  test('that agrees, nearly agrees, has too few digits, or comes from nothing known', async () => {
    const working = await opened('direct.catalyst');
    for (const [typed, sentence] of [
      ['12.23', enSecondCheck.agrees], ['12.2200', 'Nearly agrees: 0.00651 kg off'], ['7', enSecondCheck.tooFewDigits], ['7.77', enSecondCheck.noSlip],
    ] as const) {
      await enter(working, enSecondCheck.own, typed);
      await click(button(working, enSecondCheck.check));
      expect(said(working)).toContain(plainSpaces(sentence));
    }
  });

  test('is checked on leaving the field as well, and what was said goes as soon as it is changed', async () => {
    const working = await opened('direct.catalyst');
    await enter(working, enSecondCheck.own, '12.23');
    expect(said(working)).toBe('');
    await press('{Enter}');
    expect(said(working)).toBe(plainSpaces(enSecondCheck.agrees));
    await enter(working, enSecondCheck.own, '12.5');
    expect(said(working)).toBe('');
  });

  test('may be in another unit', async () => {
    const working = await opened('direct.catalyst');
    await choose(working, en.field.unitOf.replace('{label}', enSecondCheck.own), 'g');
    await enter(working, enSecondCheck.own, '10000.0');
    await click(button(working, enSecondCheck.check));
    expect(said(working)).toContain(extraLeftOut);
  });

  test('that cannot be read says so at its field', async () => {
    const working = await opened('direct.catalyst');
    await enter(working, enSecondCheck.own, 'twelve');
    await click(button(working, enSecondCheck.check));
    expect(words(working)).toContain('“twelve” is not a figure');
    expect(input(working, enSecondCheck.own).value).toBe('twelve');
    expect(said(working)).toBe('');
  });

  test('stays while the same figure is open, folded or not, and what was said goes when the lot changes', async () => {
    const working = await opened('direct.catalyst');
    await enter(working, enSecondCheck.own, '10.00');
    await click(button(working, enSecondCheck.check));
    await openPart(working, en.working.secondCheck);
    expect(hasField(working, enSecondCheck.own)).toBe(false);
    await openPart(working, en.working.secondCheck);
    expect(input(working, enSecondCheck.own).value).toBe('10.00');
    working.site = site({ figures: { 'KOH.assay': '85 %' } });
    await settled();
    expect(input(working, enSecondCheck.own).value).toBe('10.00');
    expect(said(working)).toBe('');
    working.of = 'acidValue';
    await settled();
    expect(input(working, enSecondCheck.own).value).toBe('');
  });

  test('in German, with a decimal comma', async () => {
    const working = await opened('direct.catalyst', clean, 'de');
    await enter(working, deSecondCheck.own, '10,00');
    await click(button(working, deSecondCheck.check));
    expect(said(working)).toBe(`Stimmt nicht überein: 2,23 kg zu niedrig. ${plainSpaces(deSecondCheck.oneSlip)} ${plainSpaces(deSecondCheck.slips['extra-left-out'])}`);
  });

  test('names runs, substances and two slips together', async () => {
    const working = await opened('freeFattyAcid', sour);
    await enter(working, enSecondCheck.own, '3.896'); // as palmitic acid: 4.2918 · 256 / 282
    await click(button(working, enSecondCheck.check));
    expect(said(working)).toContain('It was counted on another acid: palmitic acid.');
    working.of = 'direct.catalyst';
    await settled();
    // as pure product, with NaOH's molar mass: 9 kg + 0.152192 mmol/g · 900 kg · 39.99677 g/mol
    await enter(working, enSecondCheck.own, '14.478');
    await click(button(working, enSecondCheck.check));
    const pair = fill(enSecondCheck.pair, { first: enSecondCheck.slips['catalyst-assay-left-out'], second: fill(enSecondCheck.slips['other-catalyst-molar-mass'], { taken: en.options.catalyst.NaOH }) });
    expect(said(working)).toContain(plainSpaces(pair));
  });

  test.each(['en', 'de'])('is accessible in %s', async (lang) => {
    const working = await opened('direct.catalyst', clean, lang);
    const texts = lang === 'de' ? deSecondCheck : enSecondCheck;
    await expectPage(working).to.be.accessible();
    await enter(working, texts.own, '10.00');
    await click(button(working, texts.check));
    await expectPage(working).to.be.accessible();
  });

  test('is asked for no given figure, nor for one that is not known', async () => {
    expect(hasField(await opened('KOH.assay'), enSecondCheck.own)).toBe(false);
    expect(hasField(await opened(''), enSecondCheck.own)).toBe(false);
    const unknown = await opened('acidValue', lot({}));
    expect(hasField(unknown, enSecondCheck.own)).toBe(false);
    expect(words(unknown)).toContain('There is nothing to check against yet.');
    expect(controls(unknown).map(nameOf)).not.toContain(enSecondCheck.sheet.print);
  });
});

describe('the check sheet', () => {
  /** Prints with a printer that only notes what it was given. */
  async function printed(working: EsterwayWorking, name: string = enSecondCheck.sheet.print): Promise<{ sheet: CheckSheetElement; view: Window; calls: number }> {
    let calls = 0;
    const noted = new MutationObserver((records) => {
      for (const node of records.flatMap(({ addedNodes }) => [...addedNodes])) {
        if (node instanceof HTMLIFrameElement && node.contentWindow) node.contentWindow.print = () => void calls++;
      }
    });
    noted.observe(document.body, { childList: true });
    button(working, name).click();
    await expect.poll(() => calls).toBe(1);
    noted.disconnect();
    const view = document.querySelector<HTMLIFrameElement>('body > iframe')!.contentWindow!;
    await settled();
    return { sheet: view.document.querySelector('esterway-check-sheet')!, view, calls };
  }
  afterEach(() => document.querySelector('body > iframe')?.remove());

  test('is printed apart from the page, and its frame is taken away afterwards', async () => {
    const { sheet, view } = await printed(await opened('direct.catalyst'));
    expect(view.document.title).toBe('Check sheet HK-0412');
    expect(sheet.shadowRoot!.adoptedStyleSheets.length).toBeGreaterThan(0);
    view.dispatchEvent(new Event('afterprint'));
    expect(document.querySelector('body > iframe')).toBeNull();
  });

  test('has lot, formulas, figures, empty lines, place for the second person, and what comes before it', async () => {
    const { sheet } = await printed(await opened('direct.catalyst'));
    const text = words(sheet.shadowRoot!);
    for (const part of ['HK-0412', '2026-03-02', 'direct: catalyst to weigh', enSecondCheck.sheet.checkedBy, enSecondCheck.sheet.signature, en.cautions.defer]) expect(text).toContain(plainSpaces(part));
    expect(sheet.shadowRoot!.querySelectorAll('.blank')).toHaveLength(10);
    expect(sheet.shadowRoot!.querySelectorAll('.amount math').length).toBeGreaterThan(9);
    // neither the catalyst nor the acid value
    expect(text).not.toMatch(/12\.2265|12\.23|2\.2263/);
    expect(text).not.toMatch(/undefined|NaN|\[object/);
  });

  test('is for the route that follows, or the one chosen', async () => {
    const working = await opened('acidValue', sour);
    expect((await printed(working)).sheet.route).toBe('twoStep');
    document.querySelector('body > iframe')!.remove();
    await choose(working, enSecondCheck.sheet.route, 'direct');
    expect((await printed(working)).sheet.route).toBe('direct');
  });

  test('is in German on a German page', async () => {
    const { sheet, view } = await printed(await opened('acidValue', retested, 'de'), deSecondCheck.sheet.print);
    expect(view.document.documentElement.lang).toBe('de');
    const text = words(sheet.shadowRoot!);
    expect(text).toContain('0,1023 mol/L');
    expect(text).toContain('Nachtitration: Säurezahl');
    expect(text).not.toMatch(/\d\.\d/);
  });
});
