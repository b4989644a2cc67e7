import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayTriage } from '../../src/intake.js';
import '../../src/intake.js';
import { deTriage } from '../../src/locales/de-triage.js';
import { enTriage } from '../../src/locales/en-triage.js';
import type { LotEntry, SiteProfile } from '../../src/index.js';
import { choose, click, controls, emulate, enter, find, openPart, place, press, words } from './tools/page.js';
import { certified, clean, lot, site } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

const placeTriage = (entry: LotEntry, profile: SiteProfile = site({}), lang = 'en') =>
  place<EsterwayTriage>(html`<esterway-triage lang=${lang} .entry=${entry} .site=${profile}></esterway-triage>`);
const unfold = (element: Element, line: string) => click(controls(element).find((control) => control.localName === 'summary' && words(control) === line)!);
const contract = site({ figures: { oilPrice: '600 ¤/t', 'settlement.baseFfa': '3 %', 'settlement.ffaRate': '12 ¤/t per %', certificateTolerance: '0 %' } });

describe('a delivery', () => {
  test('is judged in words, with reasons', async () => {
    const text = words(await placeTriage(certified('5'), contract));
    expect(text).toContain(enTriage.states['for-pretreatment']);
    expect(text).toContain(fill(enTriage.reasons['within-pretreatment-limit'], { ffa: '5.00', limit: '40' }));
    expect(text).toContain(enTriage.care);
  });

  test('before anything is titrated is not judged', async () => {
    expect(words(await placeTriage(lot({})))).toContain(enTriage.states['not-known']);
  });

  test('above the site’s water is held, with what to do, once the site sets its limit', async () => {
    const element = await placeTriage(certified('2', { figures: { waterContent: '1.5 %' } }), contract);
    const changed: SiteProfile[] = [];
    element.addEventListener('esterway-site-change', ({ site: profile }) => changed.push(profile));
    expect(words(element)).toContain(enTriage.states.accepted);
    await unfold(element, enTriage.asks);
    await enter(element, 'Highest water of a delivery', '1');
    expect(changed.at(-1)?.figures['acceptedWater']).toEqual({ text: '1', unit: '%' });
    expect(words(element)).toContain(enTriage.states['held-for-retest']);
    expect(words(element)).toContain(enTriage.how.water['treat-and-measure']);
    await choose(element, en.choices.waterAbove, 'decline');
    expect(words(element)).toContain(enTriage.states.declined);
  });

  test('a limit that takes no oil says so', async () => {
    const text = words(await placeTriage(certified('50'), site({ figures: { blendingLimit: '10 %' } })));
    expect(text).toContain(fill(enTriage.reasons['limit-out-of-order'], { which: 'blending', limit: '10', before: '40', beforeWhich: 'the acid step' }));
  });

  test('is settled by the contract, each deduction open to its working', async () => {
    const element = await placeTriage(certified('5'), contract);
    const opened: string[] = [];
    element.addEventListener('esterway-open', ({ key }) => opened.push(key));
    // 600 − 12·(5 − 3) = 576 ¤/t, of 1000 kg 576 ¤
    expect(words(element)).toMatch(/less for FFA − 24\.00 ¤\/t.*Price after deductions 576\.00 ¤\/t.*Payment 576\.00 ¤/);
    await click(controls(element).find((control) => words(control).startsWith('24.00'))!);
    expect(opened).toEqual(['settlement.ffaDeduction']);
  });

  test('whose deductions are more than the price says so', async () => {
    expect(words(await placeTriage(certified('70'), contract))).toContain(enTriage.negative);
  });

  test('names what the settlement still needs, and refuses a rate below zero at its field', async () => {
    const element = await placeTriage(certified('5'), site({ figures: { oilPrice: '600 ¤/t', 'settlement.ffaRate': '12 ¤/t per %' } }));
    expect(words(element)).toContain(fill(enTriage.unsettled, { fields: 'base FFA of the contract' }));
    await unfold(element, enTriage.rates);
    await enter(element, 'Deduction for each % of FFA', '-12');
    await press('{Tab}');
    expect(words(element)).toContain(en.problems.negative);
  });

  test('stands under the route, fetched when it is opened', async () => {
    const panel = await place(html`<esterway-panel .entry=${clean}></esterway-panel>`);
    await openPart(find(panel, 'esterway-route'), en.route.delivery);
    expect(words(find(panel, 'esterway-triage'))).toContain(enTriage.states.accepted);
  });

  test.each(['en', 'de'])('is accessible in %s, light and dark, and fits 270 pixels', async (lang) => {
    const element = await placeTriage(certified('70', { figures: { waterContent: '1.5 %' } }), contract, lang);
    expect(words(element)).toContain(lang === 'de' ? deTriage.states.declined : enTriage.states.declined);
    for (const line of [enTriage.asks, enTriage.rates, deTriage.asks, deTriage.rates]) if (words(element).includes(line)) await unfold(element, line);
    element.style.inlineSize = '270px';
    await element.updateComplete;
    expect(element.scrollWidth).toBeLessThanOrEqual(270);
    await expectPage(element).to.be.accessible();
    await emulate({ 'prefers-color-scheme': 'dark' });
    await expectPage(element).to.be.accessible();
    await emulate();
  });
});
