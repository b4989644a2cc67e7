import { html } from 'lit';
import { expect, test } from 'vitest';
import { find, focused, focusedName, place, press, words } from './tools/page.js';
import { figure, run } from './tools/lots.js';
import { de, en, fill } from './tools/texts.js';
import type { Texts } from './tools/texts.js';

// The whole job, by one who never leaves the keyboard.

/** Presses a key until the focus is where it should be; a test that never gets there says where it went. */
async function until(reached: () => boolean, key: string): Promise<void> {
  const seen: string[] = [];
  while (!reached()) {
    await press(key);
    seen.push(focusedName());
    if (seen.length > 80) throw new Error(`not reached by ${key}: ${seen.join(' | ')}`);
  }
}

const isOn = (name: string) => () => focusedName() === name;
const isIn = (element: Element) => () => {
  for (let at: Node | null | undefined = focused(); at; at = at instanceof ShadowRoot ? at.host : at.parentNode) if (at === element) return true;
  return false;
};

async function doTheJob(lang: 'en' | 'de', texts: Texts, decimals: (text: string) => string) {
  const page = await place(html`<div><button>before</button><esterway-panel lang=${lang}></esterway-panel></div>`);
  const panel = find(page, 'esterway-panel');
  page.querySelector('button')!.focus();
  await until(isOn(texts.lot.name), '{Tab}');
  await press('HK-0417{Enter}');

  // from here on Enter leads the way
  await until(isOn(texts.fields.oilAmount), '{Enter}');
  await press('900{Enter}');
  await until(isOn(texts.fields.waterContent), '{Enter}');
  await press(decimals('0.08{Enter}'));
  await until(isOn(texts.fields.titrantStrength), '{Enter}');
  await press(decimals('0.1023{Enter}'));
  expect(focusedName()).toBe(fill(texts.field.cellOf, { run: '1', cell: texts.fields.sample }));
  await press(decimals('2.504{Enter}0.00{Enter}3.72{Enter}'));
  await press(decimals('2.497{Enter}3.72{Enter}7.44{Enter}'));
  const titration = find(panel, 'esterway-titration');
  expect(isIn(titration)()).toBe(true);
  await press('{Enter}');
  expect(isIn(titration)()).toBe(false);

  expect(panel.entry).toEqual({
    version: 1, name: 'HK-0417', options: {}, retestRuns: [],
    figures: { oilAmount: figure('900 kg'), waterContent: figure('0.08 %'), titrantStrength: figure('0.1023 mol/L') },
    runs: [run('2.504 g', '0.00', '3.72'), run('2.497 g', '3.72', '7.44')],
  });
  expect(words(titration)).toContain(decimals('4.29 %'));
  expect(words(find(panel, 'esterway-route'))).toContain(texts.verdicts['two-step']);
  expect(words(find(panel, 'esterway-charge'))).toContain('900 kg');
  return panel;
}

test('from the first field to the charge, its working, and back', async () => {
  const panel = await doTheJob('en', en, (text) => text);
  const charge = find(panel, 'esterway-charge');
  const working = find(panel, 'esterway-working');

  // the retest: Enter leads there, since it is what is typed next
  const retest = find(charge, 'esterway-titration');
  await until(isIn(retest), '{Enter}');
  await until(isOn(fill(en.field.cellOf, { run: '1', cell: en.fields.sample })), '{Enter}');
  expect(isIn(retest)()).toBe(true);
  await press('5.012{Enter}0.00{Enter}0.62{Enter}');
  expect(words(retest)).toContain('0.36 %');
  expect(words(charge)).toContain(en.charge.onRetest);

  // a figure of the charge opens by Enter or the space bar
  await until(() => focusedName().startsWith('10.') && focusedName().endsWith('kg'), '{Tab}');
  expect(isIn(charge)()).toBe(true);
  await press('{Enter}');
  expect(isIn(working)()).toBe(true);
  expect(working.of).toMatch(/^twoStep\./);
  await until(() => focused()?.localName === 'button' && isIn(working)(), '{Tab}');
  const rest = focusedName();
  await press(' ');
  expect(words(working)).toContain(rest);

  // and out of the panel again: no place keeps the focus
  await until(() => document.activeElement !== panel, '{Tab}');
});

test('in German, with commas', async () => {
  await doTheJob('de', de, (text) => text.replaceAll('.', ','));
});

test('Shift+Tab goes all the way back', async () => {
  const page = await place(html`<div><button>before</button><esterway-panel></esterway-panel></div>`);
  const panel = find(page, 'esterway-panel');
  page.querySelector('button')!.focus();
  await until(isOn(en.panel.newLot), '{Tab}');
  await until(() => document.activeElement !== panel, '{Shift>}{Tab}{/Shift}');
  expect(focusedName()).toBe('before');
});
