import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import type { EsterwayPanel } from '../../src/index.js';
import { click, controls, enter, find, input, nameOf, place, press, settled, words } from './tools/page.js';
import { figure, sour } from './tools/lots.js';
import { de, en } from './tools/texts.js';

const root = document.documentElement;
const langBefore = root.lang;
afterEach(() => {
  root.lang = langBefore;
});

/** Sets a language on an element around the panel and waits for all to follow. */
async function speak(element: Element, lang: string): Promise<void> {
  element.setAttribute('lang', lang);
  // observers are told in a microtask of their own
  await Promise.resolve();
  await settled();
}

describe('the language around it', () => {
  test('is followed live, figures and all', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
    expect(words(find(panel, 'esterway-route'))).toContain(en.verdicts['two-step']);
    await speak(root, 'de');
    const text = words(panel);
    expect(words(find(panel, 'esterway-route'))).toContain(de.verdicts['two-step']);
    expect(text).toContain('4,29 %');
    expect(text).not.toContain('4.29');
    expect(input(panel, de.fields.titrantStrength).value).toBe('0,1023');
    expect(input(panel, de.fields.oilTemperature).placeholder).toBe('20');
    expect(panel.entry).toBe(sour);
    await speak(root, 'en');
    expect(words(panel)).toContain('4.29 %');
    expect(input(panel, en.fields.titrantStrength).value).toBe('0.1023');
  });

  test('of the nearest element counts, through shadow roots', async () => {
    await speak(root, 'de');
    const outer = await place(html`<div lang="en"><div class="widget"></div></div>`);
    const widget = outer.querySelector('.widget')!.attachShadow({ mode: 'open' });
    const titration = document.createElement('esterway-titration');
    titration.entry = sour;
    widget.append(titration);
    await settled();
    expect(words(titration)).toContain(en.sections.titration);
    await speak(outer, 'de-AT');
    expect(words(titration)).toContain(de.result.acidValue);
    expect(words(titration)).toContain('4,29');
    await speak(titration, 'en');
    expect(words(titration)).toContain(en.result.acidValue);
  });

  test('is that of the new place after moving', async () => {
    const page = await place(html`<div><div lang="de" class="german"></div><div lang="en"><esterway-titration .entry=${sour}></esterway-titration></div></div>`);
    const titration = find(page, 'esterway-titration');
    page.querySelector('.german')!.append(titration);
    await settled();
    expect(words(titration)).toContain(de.result.acidValue);
  });

  test.each(['DE', 'de-AT-1996', 'de_DE', 'de-DE@euro'])('“%s” is German', async (lang) => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel lang=${lang} .entry=${sour}></esterway-panel>`);
    expect(words(find(panel, 'esterway-route'))).toContain(de.verdicts['two-step']);
    expect(words(panel)).toContain('8,5');
  });

  test.each(['', 'xx', 'en-US@posix', 'zh-Hant', '@', 'e', 'constructor'])('“%s” is none that is spoken: English, and nothing breaks', async (lang) => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel lang=${lang} .entry=${sour}></esterway-panel>`);
    expect(words(find(panel, 'esterway-route'))).toContain(en.verdicts['two-step']);
    await enter(panel, en.fields.oilAmount, '850.5');
    expect(panel.entry.figures['oilAmount']).toEqual(figure('850.5 kg'));
  });

  test('changes nothing of what is being typed', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel></esterway-panel>`);
    input(panel, en.fields.oilAmount).focus();
    await press('850.');
    await speak(panel, 'de');
    expect(input(panel, de.fields.oilAmount).value).toBe('850.');
    await press('5{Enter}');
    expect(input(panel, de.fields.oilAmount).value).toBe('850,5');
    expect(panel.entry.figures['oilAmount']).toEqual(figure('850.5 kg'));
  });
});

test('a German page is German throughout', async () => {
  const panel = await place<EsterwayPanel>(html`<esterway-panel lang="de" .entry=${sour}></esterway-panel>`);
  find(panel, 'esterway-site-values').folded = false;
  await settled();
  for (const summary of controls(panel).filter(({ localName }) => localName === 'summary')) await click(summary);
  const text = `${words(panel)} ${controls(panel).map(nameOf).join(' ')}`;
  const english = [
    ...Object.values(en.sections), ...Object.values(en.fields), ...Object.values(en.choices), ...Object.values(en.reasons), ...Object.values(en.cautions),
    ...Object.values(en.charge.forRun), ...Object.values(en.verdicts), ...Object.values(en.result),
  ];
  // some words are the same in both languages
  const german = JSON.stringify(de);
  const foreign = english.filter((sentence) => sentence.length > 7 && !sentence.includes('{') && !german.includes(sentence));
  expect(foreign.length).toBeGreaterThan(50);
  expect(foreign.filter((sentence) => text.includes(sentence))).toEqual([]);
});

test('a date is written by the language', async () => {
  const lot = await place(html`<esterway-lot folded .entry=${sour}></esterway-lot>`);
  expect(words(lot)).toMatch(/Mar 4|4 Mar/);
  await speak(lot, 'de');
  expect(words(lot)).toMatch(/4\. März/);
});
