import { html } from 'lit';
import { test } from 'vitest';
import { page, userEvent } from 'vitest/browser';
import { expect as chai } from '@open-wc/testing';
import { button, click, controls, deep, emulate, enter, find, focused, focusedName, input, nameOf, place, press, settled, words } from './tools/page.js';
import { clean, nonsense, outside, retested, sour } from './tools/lots.js';

const attempt = async (name: string, body: () => unknown): Promise<void> => {
  try { console.log(name, await body()); } catch (error) { console.log(name, 'THREW', String((error as Error).stack ?? error).slice(0, 700)); }
};

test('bad entry', async () => {
  await attempt('newer in panel', async () => {
    const el = await place(html`<esterway-panel .entry=${{ version: 9 }}></esterway-panel>`);
    const text = words(el);
    await click(button(el, 'New lot'));
    return [text, words(el).slice(0, 200)];
  });
  for (const tag of ['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge', 'esterway-working', 'esterway-site-values'] as const) {
    await attempt(`newer in ${tag}`, async () => {
      const el = document.createElement(tag); document.body.append(el);
      el.entry = { version: 9 } as never;
      await settled();
      const text = words(el).slice(0, 200); el.remove(); return text;
    });
    await attempt(`short in ${tag}`, async () => {
      const el = document.createElement(tag); document.body.append(el);
      el.entry = { version: 1, figures: {} } as never;
      await settled();
      const text = words(el).slice(0, 100); el.remove(); return text;
    });
  }
});
test('undo after entry set', async () => {
  const el = await place<HTMLElementTagNameMap['esterway-panel']>(html`<esterway-panel></esterway-panel>`);
  await enter(el, 'Amount of oil', '900');
  el.entry = clean; await settled();
  await enter(el, 'Amount of oil', '901');
  console.log('undo enabled', !button(el, 'Undo').disabled);
});
test('date', async () => {
  const el = await place(html`<esterway-lot .entry=${sour}></esterway-lot>`);
  input(el, 'Date').focus();
  await press('{Backspace}');
  console.log('date after backspace', JSON.stringify(input(el, 'Date').value), input(el, 'Date').validity.badInput);
});
test('required later', async () => {
  const form = await place<HTMLFormElement>(html`<form><esterway-titration name="ffa"></esterway-titration></form>`);
  find(form, 'esterway-titration').toggleAttribute('required', true); await settled();
  console.log('required later', form.checkValidity());
});
test('chosen persists', async () => {
  const el = await place<HTMLElementTagNameMap['esterway-panel']>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
  await click(input(el, 'Direct').closest('label')!);
  await click(button(el, 'New lot'));
  el.entry = { ...sour, name: 'other' }; await settled();
  console.log('direct still chosen', input(el, 'Direct').checked);
});
test('adopted', async () => {
  const frame = document.createElement('iframe'); document.body.append(frame);
  const el = await place<HTMLElementTagNameMap['esterway-panel']>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
  await attempt('adopt', async () => {
    frame.contentDocument!.body.append(el);
    await settled(frame.contentDocument!);
    const lotEl = find(el, 'esterway-lot');
    console.log('sheets', el.shadowRoot!.adoptedStyleSheets.length, lotEl.shadowRoot!.adoptedStyleSheets.length, getComputedStyle(lotEl).display);
    await enter(el, 'Run 3, Sample', '2.5');
    return words(el).slice(0, 100);
  });
  frame.remove();
});
test('hostile css', async () => {
  const style = document.createElement('style'); document.head.append(style);
  for (const css of ['* { all: unset }', '* { all: initial !important }', 'div, button, input, select, label, p { all: unset !important; color: red !important }', 'body {letter-spacing: 5px; text-transform: uppercase; line-height: 4; text-align: right; font: 30px serif; color: red; white-space: nowrap; word-spacing: 9px; text-indent: 40px; direction: rtl; visibility: visible; cursor: wait; list-style: square; border-collapse: collapse; quotes: none; hyphens: auto; font-style: italic; font-variant: small-caps; font-stretch: condensed; text-shadow: 1px 1px red; word-break: break-all; tab-size: 9; text-decoration: underline; writing-mode: horizontal-tb; line-break: anywhere; overflow-wrap: anywhere; pointer-events: auto; user-select: none; accent-color: red; caret-color: red; font-feature-settings: "smcp"; font-kerning: none; -webkit-text-stroke: 2px red; text-emphasis: dot; font-synthesis: none; text-rendering: optimizeSpeed; word-wrap: normal; text-wrap: nowrap; text-align-last: right; paint-order: stroke; orphans: 9; color-scheme: dark; }']) {
    style.textContent = '';
    const before = await place(html`<div style="inline-size: 320px"><esterway-panel .entry=${sour}></esterway-panel></div>`);
    const el = find(before, 'esterway-panel');
    const props = (e: Element) => { const c = getComputedStyle(e); return Object.fromEntries([...c].map((p) => [p, c.getPropertyValue(p)])); };
    const probe = () => find(el, 'esterway-route').shadowRoot!.querySelector('.verdict')!;
    const a = props(probe()); const ha = el.getBoundingClientRect();
    style.textContent = css;
    const b = props(probe()); const hb = el.getBoundingClientRect();
    const diff = Object.keys(a).filter((k) => a[k] !== b[k]).map((k) => `${k}: ${a[k]} -> ${b[k]}`);
    console.log(css.slice(0, 50), ha.width, ha.height, '->', hb.width, hb.height, getComputedStyle(el).display, diff);
    before.remove();
  }
  style.remove();
});
test('axe dark', async () => {
  await emulate({ 'prefers-color-scheme': 'dark' });
  document.documentElement.style.colorScheme = 'light dark';
  for (const [name, entry] of Object.entries({ sour, nonsense, retested })) {
    const el = await place(html`<esterway-panel .entry=${entry}></esterway-panel>`);
    console.log(getComputedStyle(el).backgroundColor);
    find(el, 'esterway-site-values').folded = false; await settled();
    await attempt(`axe ${name}`, () => chai(el).to.be.accessible());
    el.remove();
  }
  document.documentElement.style.colorScheme = '';
  await emulate();
});
test('ambiguous cell', async () => {
  const el = await place(html`<esterway-titration></esterway-titration>`);
  await enter(el, 'Run 1, Sample', '2,504');
  await press('{Enter}');
  console.log(focusedName(), controls(el).map(nameOf).join('|'), words(el));
});
void [click, emulate, enter, focusedName, input, press, userEvent, outside, deep, focused, page];
