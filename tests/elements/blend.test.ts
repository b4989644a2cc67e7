import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import { deBlend } from '../../src/locales/de-blend.js';
import { enBlend } from '../../src/locales/en-blend.js';
import type { BlendStock, EsterwayBlend, EsterwaySite, EsterwayStockChangeEvent, LotEntry } from '../../src/index.js';
import '../../src/intake.js';
import { button, choose, click, controls, deep, emulate, enter, find, focused, focusedName, hasField, input, paste, place, press, settled, words } from './tools/page.js';
import { figure, lot, sour } from './tools/lots.js';
import { de, en, fill } from './tools/texts.js';

type Item = BlendStock['items'][number];
const item = (name: string, mass: string, ffa: string, cost = ''): Item => ({
  name, mass: figure(`${mass} kg`), freeFattyAcid: figure(`${ffa} %`), ...(cost && { cost: figure(`${cost} ¤/kg`) }),
});
const FRYERS = item('Fryers', '900', '5', '0.30');
const TANK = item('Tank 2', '1200', '1', '0.60');
const stock = (items: readonly Item[], more: Partial<BlendStock> = {}): BlendStock => ({ version: 1, items, limits: {}, goal: 'use-sour', ...more });

const placeBlend = async (of?: BlendStock, lang = 'en', entry: LotEntry = lot({})) => {
  const element = await place<EsterwayBlend>(html`<esterway-blend lang=${lang} .entry=${entry}></esterway-blend>`);
  if (of) element.stock = of;
  await settled();
  return element;
};
const cell = (row: number, column: keyof typeof enBlend.columns) => fill(enBlend.cell, { row: String(row), column: enBlend.columns[column] });
const told = (element: EsterwayBlend): readonly BlendStock[] => {
  const stocks: BlendStock[] = [];
  element.addEventListener('esterway-stock-change', (event: EsterwayStockChangeEvent) => void stocks.push(event.stock));
  return stocks;
};
const passes = (element: Element) => expectPage(element).to.be.accessible();

afterEach(async () => {
  document.documentElement.style.colorScheme = '';
  await emulate();
});

describe('typing the stock', () => {
  test('Enter goes from cell to cell and on to the next row; each change is told, nothing else', async () => {
    const element = await placeBlend();
    const stocks = told(element);
    input(element, cell(1, 'name')).focus();
    await press('Fryers{Enter}900{Enter}5.0{Enter}0.30{Enter}{Enter}{Enter}{Enter}');
    expect(focusedName()).toBe(cell(2, 'name'));
    expect(element.stock).toEqual(stock([{ name: 'Fryers', mass: figure('900 kg'), freeFattyAcid: figure('5.0 %'), cost: figure('0.30 ¤/kg') }]));
    expect(stocks.at(-1)).toEqual(element.stock);
    // set from the page: no event
    const before = stocks.length;
    element.stock = stock([TANK]);
    await settled();
    expect(stocks).toHaveLength(before);
    expect(input(element, cell(1, 'name')).value).toBe('Tank 2');
  });

  test('the arrows change the row, and Enter in the empty one leaves the table', async () => {
    const element = await placeBlend(stock([FRYERS, TANK]));
    input(element, cell(1, 'freeFattyAcid')).focus();
    await press('{ArrowDown}');
    expect(focusedName()).toBe(cell(2, 'freeFattyAcid'));
    await press('{ArrowDown}{ArrowDown}');
    expect(focusedName()).toBe(cell(3, 'freeFattyAcid'));
    await press('{Enter}');
    expect(focusedName()).toBe(enBlend.limit.freeFattyAcid);
    expect(focused()!.hasAttribute('data-field')).toBe(true);
    input(element, cell(2, 'name')).focus();
    await press('{Shift>}{Enter}{/Shift}');
    expect(focusedName()).toBe(cell(1, 'leastMass'));
  });

  test('rows pasted from a sheet, heading and all', async () => {
    const element = await placeBlend();
    await paste(input(element, cell(1, 'name')), 'Lot\tkg\tFFA\tPrice\nFryers\t900\t5.0\t0.30\nTank 2\t1200\t1.0\t0.60\t0.05\n');
    expect(element.stock.items).toEqual([
      { name: 'Fryers', mass: figure('900 kg'), freeFattyAcid: figure('5.0 %'), cost: figure('0.30 ¤/kg') },
      { name: 'Tank 2', mass: figure('1200 kg'), freeFattyAcid: figure('1.0 %'), cost: figure('0.60 ¤/kg'), water: figure('0.05 %') },
    ]);
    await paste(input(element, cell(2, 'mass')), '1000\t1.2\n700\t0.4');
    expect(element.stock.items.map(({ mass }) => mass)).toEqual([figure('900 kg'), figure('1000 kg'), figure('700 kg')]);
  });

  test('a figure that means two things is asked about, one that is wrong is said, one that is missing when the row is left', async () => {
    const element = await placeBlend(stock([FRYERS]));
    await enter(element, cell(2, 'mass'), '1,500');
    input(element, enBlend.limit.water).focus();
    await settled();
    expect(words(element)).toContain(fill(en.problems.ambiguous, { typed: '1,500' }));
    expect(words(element)).toContain(fill(enBlend.problems.needed, { field: enBlend.columns.freeFattyAcid }));
    expect(words(element)).toContain(fill(enBlend.leftOut, { rows: 'Row 2' }));
    await click(button(element, '1500'));
    expect(element.stock.items[1]).toEqual({ mass: figure('1500 kg') });
    await enter(element, cell(2, 'freeFattyAcid'), '120');
    input(element, enBlend.limit.water).focus();
    await settled();
    expect(words(element)).toContain(en.problems['above-100-percent']);
    expect(input(element, cell(2, 'freeFattyAcid')).value).toBe('120');
  });

  test('a lot is removed by two presses and put back by one', async () => {
    const element = await placeBlend(stock([FRYERS, TANK]));
    await click(button(element, fill(enBlend.open, { row: '1' })));
    await click(button(element, enBlend.remove));
    expect(element.stock.items).toEqual([TANK]);
    expect(words(element)).toContain(fill(enBlend.removed, { row: '1' }));
    await click(button(element, enBlend.putBack));
    expect(element.stock.items).toEqual([FRYERS, TANK]);
    expect(controls(element).some((one) => words(one) === enBlend.putBack)).toBe(false);
  });

  test('the lot on the bench is added as it is known', async () => {
    const element = await placeBlend(stock([TANK]), 'en', sour);
    await click(button(element, enBlend.fromBench));
    expect(element.stock.items[1]).toMatchObject({ name: 'HK-0417', mass: figure('900 kg'), water: figure('0.08 %') });
    expect(words(element)).not.toContain(enBlend.benchEmpty);
    element.entry = lot({});
    await settled();
    await click(button(element, enBlend.fromBench));
    expect(element.stock.items).toHaveLength(2);
    expect(words(element)).toContain(enBlend.benchEmpty);
  });

  test('figures of other units are shown in those of the column, and a page in US units asks for pounds', async () => {
    const element = await placeBlend(stock([{ name: 'T', mass: figure('1.2 t'), freeFattyAcid: figure('1 %') }]));
    expect(input(element, cell(1, 'mass')).value).toBe('1200');
    element.units = 'us';
    element.stock = stock([{ name: 'T', mass: figure('1000 lb'), freeFattyAcid: figure('1 %') }, { name: 'S', mass: figure('1000 lb'), freeFattyAcid: figure('6 %') }]);
    await settled();
    expect(input(element, cell(1, 'mass')).value).toBe('1000');
    // 3 above and 2 below: two thirds of the clean oil, in whole pounds
    expect(words(element)).toContain('666 lb');
  });
});

describe('the blend', () => {
  test('as a sentence, a table with bars, and against its limits', async () => {
    const element = await placeBlend(stock([FRYERS, TANK]));
    expect(words(element)).toContain(fill(enBlend.found['use-sour'], { mass: '1800 kg', sour: '900 kg', sourThere: '900 kg', ffa: '3.00' }));
    const [masses, properties] = [...deep(element)].filter((one) => one.matches('table.parts')).map(words);
    expect(masses).toBe('Lot Take % of the blend Fryers 900 kg all of it 50.0 Tank 2 900 kg of 1200 kg 50.0');
    expect(properties).toBe('Property Blend Limit FFA 3.00 % 3.0 % Amount 1800 kg – Cost 810.00 ¤ –');
    const bars = [...deep(element)].filter((one) => one.matches('svg.bar')).map((bar) => [...bar.querySelectorAll('rect')].map((rect) => rect.getAttribute('width')));
    expect(bars).toEqual([['75.00', '75.00'], ['75.00', '100.00']]);
    expect(words(element)).toContain(fill(enBlend.pair, { lot: 'Fryers', most: '50.0', limit: 'FFA' }));
  });

  test('by least cost, with what each limit is worth', async () => {
    const element = await placeBlend(stock([FRYERS, TANK], { limits: { mass: figure('1000 kg'), massRule: 'exactly' } }));
    await choose(element, enBlend.goal, 'least-cost');
    expect(element.stock.goal).toBe('least-cost');
    const text = words(element);
    expect(text).toContain(fill(enBlend.found['least-cost'], { mass: '1000 kg', cost: '450.00', perMass: '0.450', unit: '¤/kg', ffa: '3.00' }));
    expect(text).toContain('0.1 % more FFA allowed would save 7.50 ¤.');
    expect(text).toContain('100 kg less to be blended would save 45.00 ¤.');
  });

  test('that cannot be: which limits stand against it, and what would free each', async () => {
    const element = await placeBlend(stock([FRYERS, item('Tank 3', '300', '1')], { limits: { mass: figure('1 t') } }));
    const text = words(element);
    expect(text).toContain(enBlend.refused.together);
    for (const remedy of ['allow 3.8 % FFA', 'blend 600 kg, no more', '200 kg more of Tank 3']) expect(text).toContain(remedy);
    expect(controls(element).some((one) => words(one) === enBlend.use)).toBe(false);
    element.stock = stock([FRYERS]);
    await settled();
    expect(words(element)).toContain(fill(enBlend.refused['above-all'], { limit: '3.0', share: 'FFA', found: '5' }));
  });

  test('without prices falls back and says so; with a wrong limit waits for it', async () => {
    const element = await placeBlend(stock([FRYERS, item('Tank 2', '1200', '1')], { goal: 'least-cost' }));
    expect(words(element)).toContain(enBlend.remarks['prices-missing']);
    await enter(element, enBlend.limit.freeFattyAcid, 'three');
    expect(words(element)).toContain(enBlend.putRight);
    input(element, enBlend.limit.water).focus();
    await settled();
    expect(words(element)).toContain(fill(en.problems['not-a-number'], { typed: 'three' }));
    expect(element.stock.limits.freeFattyAcid).toEqual({ typed: 'three', doubt: 'not-a-number', unit: '%' });
  });

  test('follows the direct limit of the site around it', async () => {
    const page = await place<EsterwaySite>(html`<esterway-site><esterway-blend></esterway-blend></esterway-site>`);
    const element = find(page, 'esterway-blend');
    element.stock = stock([FRYERS, TANK]);
    page.site = { version: 1, figures: { directLimit: figure('2 %') }, options: {} };
    await settled();
    expect(words(element)).toContain(fill(enBlend.found['use-sour'], { mass: '1600 kg', sour: '400 kg', sourThere: '900 kg', ffa: '2.00' }));
  });

  test('becomes the lot; undo brings the lot before back', async () => {
    const page = await place<EsterwaySite>(html`<esterway-site .entry=${sour}><esterway-lot></esterway-lot><esterway-blend></esterway-blend></esterway-site>`);
    const element = find(page, 'esterway-blend');
    element.stock = stock([FRYERS, TANK]);
    await settled();
    const changes: LotEntry[] = [];
    page.addEventListener('esterway-change', (event) => void changes.push(event.entry));
    await click(button(element, enBlend.use));
    expect(page.entry.name).toBe('Fryers + Tank 2');
    expect(page.entry.figures).toMatchObject({ oilAmount: figure('1800 kg'), certificateFfa: figure('3 %'), titrantStrength: figure('0.1023 mol/L') });
    expect(input(find(page, 'esterway-lot'), en.lot.name).value).toBe('Fryers + Tank 2');
    expect(words(element)).toContain(enBlend.used);
    await click(button(element, enBlend.undo));
    expect(page.entry).toEqual(sour);
    expect(changes).toHaveLength(2);
    expect(words(element)).not.toContain(enBlend.used);
  });

  test('of a document that cannot be read: what is wrong with it', async () => {
    const element = await placeBlend({ version: 1, items: [{ ffa: 1 }] } as unknown as BlendStock);
    expect(words(element)).toContain(enBlend.unreadable);
    expect(words(element)).toContain(fill(en.faults['unknown-key'], { path: 'items.0.ffa' }));
    element.stock = stock([FRYERS, TANK]);
    await settled();
    expect(words(element)).not.toContain(enBlend.unreadable);
  });

  test('in German, with commas', async () => {
    const element = await placeBlend(stock([FRYERS, TANK]), 'de');
    expect(words(element)).toContain(fill(deBlend.found['use-sour'], { mass: '1800 kg', sour: '900 kg', sourThere: '900 kg', ffa: '3,00' }));
    expect(input(element, fill(deBlend.cell, { row: '1', column: deBlend.columns.cost })).value).toBe('0,30');
    expect(hasField(element, deBlend.goal)).toBe(true);
    await enter(element, deBlend.limit.water, 'x');
    input(element, deBlend.limit.mass).focus();
    await settled();
    expect(words(element)).toContain(fill(de.problems['not-a-number'], { typed: 'x' }));
  });
});

describe('on every page', () => {
  const full = stock([FRYERS, TANK, { name: 'Half known', mass: { typed: '1,500', doubt: 'ambiguous', unit: 'kg' } }], { limits: { mass: figure('1000 kg') } });

  test.each([['a blend', full], ['none', stock([FRYERS])], ['nothing', stock([])], ['nonsense', { version: 9 } as unknown as BlendStock]])('axe finds nothing: %s', async (_, of) => {
    await passes(await placeBlend(of));
  });

  test('nor in the dark, in German', async () => {
    document.documentElement.style.colorScheme = 'light dark';
    await emulate({ 'prefers-color-scheme': 'dark' });
    await passes(await placeBlend(full, 'de'));
  });

  test.each([270, 340, 560, 900])('nothing is wider than %i px, and targets keep 44 px', async (width) => {
    const element = await placeBlend(full, 'de');
    element.style.inlineSize = `${width}px`;
    await settled();
    const { left, right } = element.getBoundingClientRect();
    for (const one of deep(element)) {
      if (one.closest('.unseen, thead, svg') || !one.checkVisibility()) continue;
      const box = one.getBoundingClientRect();
      if (box.width === 0) continue;
      expect([one.localName, one.className, box.right <= right + 0.5 && box.left >= left - 0.5]).toEqual([one.localName, one.className, true]);
    }
    for (const one of controls(element)) expect([one.localName, one.textContent, one.getBoundingClientRect().height >= 43.5]).toEqual([one.localName, one.textContent, true]);
  });

  test('the bars stand out in forced colours, and paper shows no buttons', async () => {
    const element = await placeBlend(full);
    await emulate({ 'forced-colors': 'active' });
    const fills = [...deep(element)].filter((one) => one.matches('.bar .taken, .bar .there')).map((one) => getComputedStyle(one).fill);
    expect(new Set(fills).size).toBe(2);
    await emulate({}, 'print');
    expect(controls(element).filter((one) => one.matches('.action'))).toEqual([]);
    expect(words(element)).toContain('Fryers');
  });
});
