import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import { TYPED_UNITS } from '../../src/formula/units.js';
import type { LotEntry, SiteProfile } from '../../src/index.js';
import { deAfter } from '../../src/locales/de-after.js';
import { deCost } from '../../src/locales/de-cost.js';
import { enAfter } from '../../src/locales/en-after.js';
import { enCost } from '../../src/locales/en-cost.js';
import '../../src/more.js';
import { fieldName } from '../../src/locales/quantity-name.js';
import type { EsterwayAfter, EsterwayCost } from '../../src/more.js';
import { choose, click, controls, enter, find, openPart, place, select, words } from './tools/page.js';
import { certified, clean, lot, site, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

const placeAfter = (entry: LotEntry, lang = 'en', profile = site({})) =>
  place<EsterwayAfter>(html`<esterway-after lang=${lang} .entry=${entry} .site=${profile}></esterway-after>`);
const placeCost = (entry: LotEntry, profile: SiteProfile, lang = 'en') => place<EsterwayCost>(html`<esterway-cost lang=${lang} .entry=${entry} .site=${profile}></esterway-cost>`);

const unfold = (element: Element, line: string) => click(controls(element).find((control) => control.localName === 'summary' && words(control) === line)!);

describe('after the reaction', () => {
  test('tells hold, acid to neutralise with, soap apart, layers, and the care to take', async () => {
    const text = words(await placeAfter(certified('2')));
    expect(text).toContain(fill(enAfter.hold, { temperature: '60 °C', time: '60 min', settling: '24 h' }));
    expect(text).toContain(enAfter.neutralise);
    expect(text).toContain(enAfter.split);
    expect(text).toContain(enAfter.care);
    expect(text).toMatch(/Dissolving the catalyst (warms|could warm) the methanol by \d+ °C/);
  });

  test('of 10 kg of KOH base load takes 10 · 60.05/56.105 kg of acetic acid', async () => {
    const element = await placeAfter(certified('2'));
    await choose(element, en.choices.neutralisingAcid, 'acetic');
    expect(words(element)).toMatch(/glacial acetic acid 10\.[67]\d* kg/);
  });

  test('a product above its limit says what to do', async () => {
    const element = await placeAfter({ ...clean, options: { ...clean.options, productAcidFrom: 'typed' } });
    await unfold(element, enAfter.product);
    await enter(element, 'Acid value of the product, as given', '0.8');
    expect(words(element)).toContain(fill(enAfter.productBad, { value: '0.80 mg/g', limit: '0.50 mg/g' }));
    await enter(element, 'Acid value of the product, as given', '0.5');
    expect(words(element)).toContain(fill(enAfter.productGood, { value: '0.50 mg/g', limit: '0.50 mg/g' }));
  });

  test('without a charge says what is still to give', async () => {
    expect(words(await placeAfter(lot({})))).toContain(en.result.needs.split('{')[0]!);
  });

  test.each(['en', 'de'])('is accessible in %s', async (lang) => {
    const element = await placeAfter(sour, lang);
    expect(words(element)).toContain(lang === 'de' ? deAfter.care : enAfter.care);
    await expectPage(element).to.be.accessible();
  });
});

const priced = site({
  figures: {
    oilPrice: '600 ¤/t', esterPrice: '1000 ¤/t', methanolPrice: '0.5 ¤/kg', 'KOH.price': '1.2 ¤/kg', sulfuricPrice: '0.3 ¤/kg', 'phosphoric.price': '1.5 ¤/kg',
    drawnOffPrice: '100 ¤/t', lowerLayerPrice: '20 ¤/t', energyPrice: '0.2 ¤/kWh', energyBaseStep: '50 kWh/t', energyAcidPass: '40 kWh/t', hourPrice: '40 ¤/h', hoursBaseStep: '4 h',
    hoursAcidPass: '5 h',
  },
});

describe('cost of both routes', () => {
  test('the site’s money has the name that the site gives it, in fields, table, sentences and plot', async () => {
    const element = await placeCost(certified('2'), priced);
    const changed: SiteProfile[] = [];
    element.addEventListener('esterway-site-change', ({ site: profile }) => changed.push(profile));
    await unfold(element, enCost.prices);
    expect(words(element)).toContain('¤');
    await enter(element, en.fields.currency, '€');
    expect(changed.at(-1)).toMatchObject({ currency: '€', figures: priced.figures });
    expect(words(element)).not.toContain('¤');
    expect(words(element)).toMatch(/Two-step costs [\d,. ]+ € (more|less) a tonne of oil than direct/);
    expect(words(element)).toContain('€/kg');
    await enter(element, en.fields.currency, '');
    expect(changed.at(-1)).not.toHaveProperty('currency');
    expect(words(element)).toContain('¤');
  });

  test('names every price that the totals leave out', async () => {
    const left = /Without a price, and left out: ([^.]*)\./.exec(words(await placeCost(sour, site({ figures: { oilPrice: '600 ¤/t' } }))))?.[1] ?? '';
    for (const field of ['methanolPrice', 'KOH.price', 'sulfuricPrice', 'energyPrice', 'esterPrice']) expect(left).toContain(fieldName(field, en));
    expect(left).not.toContain(fieldName('oilPrice', en));
  });

  test('is told part by part, with the difference and where it changes sign', async () => {
    const element = await placeCost(certified('4'), priced);
    const text = words(element);
    expect(text).toMatch(/Two-step costs [\d,. ]+ ¤ (more|less) a tonne of oil than direct/);
    expect(text).toMatch(/Up to [\d.]+ % FFA|From 0.1 to 40 % FFA/);
    expect(element.shadowRoot!.querySelector('svg[role=img]')?.getAttribute('aria-label')?.replaceAll('\u00a0', ' ')).toBe(fill(enCost.plot, { ffa: '4.00' }));
    expect(element.shadowRoot!.querySelectorAll('tbody tr').length).toBeGreaterThan(8);
  });

  test('leaves out what has no price, and says so', async () => {
    const text = words(await placeCost(certified('4'), site({ figures: { methanolPrice: '0.5 ¤/kg' } })));
    expect(text).toContain(enCost.unpriced.split('{')[0]!);
    expect(text).toContain('price of the ester');
  });

  test('asks for a price where there is none, and takes one that is typed', async () => {
    const element = await placeCost(certified('4'), site({}));
    expect(words(element)).toContain(enCost.none);
    await unfold(element, enCost.prices);
    await enter(element, 'Price of methanol', '0.5');
    expect(words(element)).not.toContain(enCost.none);
    expect(element.site.figures['methanolPrice']).toEqual({ text: '0.5', unit: '¤/kg' });
  });

  test('offers units that are known', async () => {
    const element = await placeCost(certified('4'), priced);
    await unfold(element, enCost.prices);
    const units = [...select(element, fill(en.field.unitOf, { label: 'Price of the oil' })).options].map(({ value }) => value);
    expect(units.filter((unit) => !TYPED_UNITS.has(unit))).toEqual([]);
    expect(units.length).toBeGreaterThan(2);
  });

  test.each(['en', 'de'])('is accessible in %s', async (lang) => {
    const element = await placeCost(certified('4'), priced, lang);
    expect(words(element)).toContain(lang === 'de' ? deCost.part : enCost.part);
    await expectPage(element).to.be.accessible();
  });
});

test('both stand in the charge, and their figures open in the working', async () => {
  const panel = await place(html`<esterway-panel .entry=${certified('2')} .site=${priced}></esterway-panel>`);
  const charge = find(panel, 'esterway-charge');
  await openPart(charge, en.charge.cost);
  await openPart(charge, en.charge.after);
  const after = find(charge, 'esterway-after');
  await click(controls(after).find((control) => control.matches('.open.figure'))!);
  expect(find(panel, 'esterway-working').of).toBe('after.direct.acid');
  expect(words(find(panel, 'esterway-working'))).toContain('neutralising acid to weigh');
});
