import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayCharge, LotEntry } from '../../src/index.js';
import { enResidual } from '../../src/locales/en-residual.js';
import { deResidual } from '../../src/locales/de-residual.js';
import { openPart, place, words } from './tools/page.js';
import { certified, site } from './tools/lots.js';
import { de, en } from './tools/texts.js';

const opened = async (entry: LotEntry, profile = site({}), lang = 'en'): Promise<EsterwayCharge> => {
  const charge = await place<EsterwayCharge>(html`<esterway-charge lang=${lang} .entry=${entry} .site=${profile}></esterway-charge>`);
  const { charge: texts } = lang === 'de' ? de : en;
  await openPart(charge, texts.overTime);
  return charge;
};

describe('the residual over time', () => {
  test('says in words what the plot shows, and when the target is met', async () => {
    const charge = await opened(certified('4.30'));
    const text = words(charge);
    // the same figures as the estimate of the charge
    const [, low, high] = /Expected (?:below )?([\d.]+) to ([\d.]+) % FFA/.exec(text)!;
    expect(text).toMatch(new RegExp(`from 4.30 % down to between [\\d.]+ and ${high} % after 60 min; the target is 1.0 %`));
    expect(Number(low)).toBeLessThan(Number(high));
    expect(text).toMatch(/The cautious end reaches the target after \d+ min/);
    expect(text).toContain(enResidual.estimate);
  });

  test('that does not reach the target says what would bring it nearer', async () => {
    expect(words(await opened(certified('35'), site({ figures: { pretreatmentTime: '2 min' } })))).toContain('does not reach the target in this time');
  });

  test.each(['en', 'de'])('is accessible in %s', async (lang) => {
    const charge = await opened(certified('12'), site({}), lang);
    expect(words(charge)).toContain(lang === 'de' ? deResidual.estimate : enResidual.estimate);
    await expectPage(charge).to.be.accessible();
  });
});
