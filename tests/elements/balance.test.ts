import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import type { LotEntry } from '../../src/index.js';
import { deBalance } from '../../src/locales/de-balance.js';
import { enBalance } from '../../src/locales/en-balance.js';
import '../../src/more.js';
import type { EsterwayBalance } from '../../src/more.js';
import { click, controls, emulate, find, place, settled, words } from './tools/page.js';
import { certified, clean, lot, outside, retested, site, sour } from './tools/lots.js';
import { de, en, plainSpaces } from './tools/texts.js';

afterEach(async () => {
  document.documentElement.style.colorScheme = '';
  await emulate();
});

const placed = async (entry: LotEntry, lang = 'en', width = 320, profile = site({})): Promise<EsterwayBalance> => {
  const home = await place(html`<div><esterway-balance lang=${lang} .entry=${entry} .site=${profile}></esterway-balance></div>`);
  home.style.inlineSize = `${width}px`;
  await settled();
  return find(home, 'esterway-balance');
};
const all = <T extends Element>(element: Element, selector: string): T[] => [...element.shadowRoot!.querySelectorAll<T>(selector)];
const flow = (element: Element): SVGSVGElement => all<SVGSVGElement>(element, 'svg.flow')[0]!;
const captions = (element: Element): string[] => all(element, 'caption').map(words);
/** Cells of a row of a step: substance, in, out. */
const row = (element: Element, step: string, name: string): string[] | undefined => {
  const table = all<HTMLTableElement>(element, 'table').find((one) => words(one.caption!) === step)!;
  const found = [...table.rows].find((one) => words(one.cells[0]!).replaceAll('\u00ad', '') === name);
  return found && [...found.cells].slice(1).map(words);
};

describe('the table', () => {
  test('has a part for each step of the route that the lot is charged by', async () => {
    expect(captions(await placed(clean))).toEqual([enBalance.steps.react, enBalance.steps.settle]);
    expect(captions(await placed(sour))).toEqual([enBalance.steps.pass, enBalance.steps.react, enBalance.steps.settle]);
    expect(captions(await placed(retested))).toEqual([enBalance.steps.pass, enBalance.steps.retest, enBalance.steps.react, enBalance.steps.settle]);
    expect(captions(await placed(outside))).toContain('Acid step, pass 2');
  });

  test('ends each step with nothing left over, but for what the retest changed', async () => {
    const element = await placed(retested);
    for (const step of [enBalance.steps.pass, enBalance.steps.react, enBalance.steps.settle]) expect(row(element, step, enBalance.difference)).toEqual(['0 kg']);
    expect(row(element, enBalance.steps.retest, enBalance.changed)?.[0]).toMatch(/^[\d.]+ k?g$/);
    expect(words(element)).toContain(enBalance.retested);
  });

  test('names the layer of each substance, and both layers by mass and volume', async () => {
    const element = await placed(clean);
    expect(row(element, enBalance.steps.settle, 'methanol')?.[1]).toMatch(/^[\d.]+ kg upper [\d.]+ kg lower$/);
    expect(row(element, enBalance.steps.settle, 'salt')).toEqual(['–', expect.stringMatching(/^[\d.]+ kg lower$/)]);
    expect(all(element, 'dt').map(words)).toEqual(['ester layer (upper)', 'glycerol layer (lower)']);
    expect(all(element, 'dd').map(words)).toEqual([/kg$/, /L$/, /kg$/, /L$/].map((unit) => expect.stringMatching(unit) as unknown));
  });

  test('shows no substance that there is none of', async () => {
    const names = all(await placed(clean), 'tbody th').map(words);
    expect(names).toContain(enBalance.components.soap);
    expect(names).not.toContain(enBalance.components.sulfate);
  });

  test('in US units', async () => {
    const element = await placed(clean);
    element.units = 'us';
    await settled();
    expect(row(element, enBalance.steps.react, enBalance.total)).toEqual([expect.stringMatching(/ lb$/), expect.stringMatching(/ lb$/)]);
    expect(all(element, 'dd').map(words)[1]).toMatch(/ US gal$/);
    expect(plainSpaces(flow(element).textContent)).toMatch(/ lb/);
  });
});

test('the other route can be looked at, and stands for this lot alone', async () => {
  const element = await placed(clean);
  await click(all<HTMLInputElement>(element, 'input[type=radio]')[1]!);
  expect(captions(element)[0]).toBe(enBalance.steps.pass);
  element.entry = { ...clean, name: 'another' };
  await settled();
  expect(captions(element)[0]).toBe(enBalance.steps.react);
});

test('a figure opens in the working, by its name', async () => {
  const panel = await place(html`<esterway-site .entry=${sour}><esterway-balance></esterway-balance><esterway-working></esterway-working></esterway-site>`);
  const figure = controls(find(panel, 'esterway-balance')).find((control) => control.matches('td .figure'))!;
  let opened = '';
  panel.addEventListener('esterway-open', (event) => (opened = (event as Event & { key: string }).key));
  await click(figure);
  expect(opened).toBe('balance.glycerides');
  const working = find(panel, 'esterway-working');
  working.of = opened;
  await settled();
  expect(words(working)).toContain('mass balance: glycerides in the oil');
  working.of = 'balance.pass1.methanolDrawn';
  await settled();
  expect(words(working)).toContain('mass balance, pass 1: methanol drawn off');
});

test('without a charge says what is still to give, and draws nothing', async () => {
  const element = await placed(lot({}));
  expect(words(element)).toContain(en.result.needs.split('{')[0]!);
  expect(all(element, 'svg, table, input')).toEqual([]);
});

describe('the flow', () => {
  test('says in words where the oil goes', async () => {
    const element = await placed(clean);
    const label = plainSpaces(flow(element).getAttribute('aria-label')!);
    expect(label).toMatch(/: 900 kg of oil come in, [\d.]+ kg leave as ester layer, [\d.]+ kg as glycerol layer\.$/);
    expect(all(element, '.flow .name').map(({ textContent }) => textContent)).toEqual(['oil', 'methanol', 'catalyst', enBalance.steps.react, 'acid', enBalance.steps.settle, 'glycerol layer', 'ester layer']);
  });

  test('is as wide at each place as there is mass', async () => {
    const element = await placed(clean);
    const [oil, , withMethanol] = all<SVGRectElement>(element, '.flow .inside').map((rect) => Number(rect.getAttribute('width')));
    const [oilMass, methanol] = [...flow(element).textContent.matchAll(/([\d.]+)\s*kg/g)].map(([, text]) => Number(text));
    expect(withMethanol! / oil!).toBeCloseTo((oilMass! + methanol!) / oilMass!, 2);
  });

  /** Boxes as they are on the screen. */
  const boxes = (element: Element): DOMRect[] => all(element, '.flow text').filter(({ textContent }) => textContent !== '').map((text) => text.getBoundingClientRect());
  const touching = (a: DOMRect, b: DOMRect): boolean => a.left < b.right && b.left < a.right && a.top < b.bottom - 0.5 && b.top < a.bottom - 0.5;

  const sourest = certified('38', { figures: { oilAmount: '125000 kg', waterContent: '0.4 %' } });
  test.each([['clean', clean], ['sour', sour], ['retested', retested], ['outside', outside], ['sourest', sourest]].flatMap(([name, entry]) => (['en', 'de'] as const).flatMap((lang) => [270, 320, 700].map((width) => [name as string, lang, width, entry as LotEntry] as const))))(
    'words keep clear of each other and of the edge: %s, %s, %d px', async (_, lang, width, entry) => {
      const element = await placed(entry, lang, width);
      const around = flow(element).getBoundingClientRect();
      const found = boxes(element);
      expect(found.length).toBeGreaterThan(10);
      for (const [i, box] of found.entries()) {
        expect(box.left).toBeGreaterThanOrEqual(around.left);
        expect(box.right).toBeLessThanOrEqual(around.right + 0.5);
        for (const other of found.slice(i + 1)) expect(touching(box, other)).toBe(false);
      }
      // drawn units as they come out on the screen
      const scale = around.width / flow(element).viewBox.baseVal.width;
      for (const text of all(element, '.flow text')) expect(parseFloat(getComputedStyle(text).fontSize) * scale).toBeGreaterThanOrEqual(11);
      expect(element.scrollWidth).toBeLessThanOrEqual(width);
      for (const cell of all(element, 'td')) expect(cell.scrollWidth).toBeLessThanOrEqual(Math.ceil(cell.getBoundingClientRect().width) + 1);
    },
  );

  test('words stand beside the streams, not on them', async () => {
    const element = await placed(certified('60', { figures: { waterContent: '0.4 %' } }), 'en', 270, site({ figures: { entrainedEster: '2 kg/kg' } }));
    await click(all<HTMLInputElement>(element, 'input[type=radio]')[0]!);
    const words = all(element, '.flow text:not(.middle)').map((text) => text.getBoundingClientRect());
    for (const shape of all(element, '.flow .joins, .flow .leaves, .flow .inside').map((one) => one.getBoundingClientRect())) for (const box of words) expect(touching(shape, box)).toBe(false);
  });

  test('is told by lines where colours are forced', async () => {
    await emulate({ 'forced-colors': 'active' });
    const element = await placed(sour);
    for (const shape of all(element, '.flow .joins, .flow .leaves, .flow .edge, .flow .step')) expect(getComputedStyle(shape).stroke).not.toBe('none');
    expect(getComputedStyle(all(element, '.flow .leaves')[0]!).strokeDasharray).not.toBe('none');
  });
});

describe('is accessible', () => {
  test.each(['en', 'de'])('in %s', async (lang) => {
    const element = await placed(retested, lang, 270);
    expect(words(element)).toContain(lang === 'de' ? deBalance.cautious : enBalance.cautious);
    expect(words(element)).toContain((lang === 'de' ? de : en).charge.twoStep);
    await expectPage(element).to.be.accessible();
  });

  test('in the dark', async () => {
    document.documentElement.style.colorScheme = 'light dark';
    await emulate({ 'prefers-color-scheme': 'dark' });
    await expectPage(await placed(clean)).to.be.accessible();
  });
});
