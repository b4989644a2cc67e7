import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import type { EsterwayPanel, LotEntry } from '../../src/index.js';
import { button, click, controls, emulate, enter, find, place, press, settled } from './tools/page.js';
import { certified, clean, lot, nonsense, outside, retested, site, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

afterEach(async () => {
  document.documentElement.style.colorScheme = '';
  await emulate();
});

const placePanel = (entry: LotEntry, lang = 'en') => place<EsterwayPanel>(html`<esterway-panel lang=${lang} .entry=${entry}></esterway-panel>`);
const passes = (element: Element) => expectPage(element).to.be.accessible();

describe('axe finds nothing in a panel', () => {
  test.each([
    ['with nothing typed', lot({})],
    ['of a clean lot', clean],
    ['of a sour lot', sour],
    ['outside both routes', outside],
    ['of nonsense', nonsense],
    ['that cannot be read', { version: 9 } as unknown as LotEntry],
  ])('%s', async (_, entry) => {
    await passes(await placePanel(entry));
  });

  test('whose site has no acid-proof equipment, of wet oil', async () => {
    const panel = await placePanel(certified('4.30', { figures: { waterContent: '2 %' } }));
    panel.site = site({ options: { acidProofEquipment: 'no' } });
    await settled();
    await passes(panel);
  });

  test.each([['sour', sour], ['nonsense', nonsense]])('in German: %s', async (_, entry) => {
    await passes(await placePanel(entry, 'de'));
  });

  test.each([['sour', sour], ['nonsense', nonsense], ['clean', clean]])('in the dark: %s', async (_, entry) => {
    document.documentElement.style.colorScheme = 'light dark';
    await emulate({ 'prefers-color-scheme': 'dark' });
    const panel = await placePanel(entry);
    const light = (color: string) => Math.max(...color.match(/\d+/g)!.map(Number));
    expect(light(getComputedStyle(panel).backgroundColor)).toBeLessThan(80);
    await passes(panel);
  });

  test('with the retest titrated and all that folds open', async () => {
    const panel = await placePanel(retested);
    for (const summary of controls(panel).filter(({ localName }) => localName === 'summary')) summary.click();
    find(panel, 'esterway-site-values').folded = false;
    await settled();
    await passes(panel);
  });

  test('with a figure open to its working', async () => {
    const panel = await placePanel(sour);
    await click(button(find(panel, 'esterway-titration'), '4.29 %'));
    await passes(panel);
  });

  test('while a run is struck out and a figure is asked about', async () => {
    const panel = await placePanel(sour);
    await click(button(panel, fill(en.runs.strike, { run: '1' })));
    await click(button(panel, en.runs.strikeReasons[0]!));
    await click(button(panel, fill(en.runs.strike, { run: '2' })));
    await enter(panel, en.fields.oilAmount, '1,500');
    await press('{Tab}');
    await passes(panel);
  });

  test('with every section folded', async () => {
    const panel = await placePanel(sour);
    for (const tag of ['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge', 'esterway-working'] as const) find(panel, tag).folded = true;
    await settled();
    await passes(panel);
  });
});

test.each(['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge', 'esterway-working', 'esterway-site-values'] as const)('axe finds nothing in a lone %s', async (tag) => {
  const home = await place(html`<div></div>`);
  const section = home.appendChild(document.createElement(tag));
  section.entry = sour;
  await settled();
  await passes(section);
});

test('axe would find ink that is as pale as the paper', async () => {
  const panel = await placePanel(sour);
  panel.style.setProperty('--esterway-quiet', '#ddd');
  await expect(passes(panel)).rejects.toThrow('color-contrast');
});
