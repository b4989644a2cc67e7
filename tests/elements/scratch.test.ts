import { html } from 'lit';
import { test } from 'vitest';
import { page, userEvent } from 'vitest/browser';
import { expect as chai } from '@open-wc/testing';
import { click, controls, deep, emulate, enter, find, focused, focusedName, input, nameOf, place, press, settled, words } from './tools/page.js';
import { clean, nonsense, outside, retested, sour } from './tools/lots.js';

const attempt = async (name: string, body: () => unknown): Promise<void> => {
  try { console.log(name, await body()); } catch (error) { console.log(name, 'THREW', String(error).slice(0, 1500)); }
};

test('form', async () => {
  const form = await place<HTMLFormElement>(html`<form><label>FFA <esterway-titration name="ffa" required></esterway-titration></label></form>`);
  const el = find(form, 'esterway-titration');
  console.log('valid', form.checkValidity(), new FormData(form).get('ffa'));
  form.reportValidity();
  console.log('focus after report', document.activeElement?.localName, focused()?.outerHTML.slice(0, 100));
  el.entry = sour; await settled();
  console.log('valid', form.checkValidity(), new FormData(form).get('ffa'), el.value);
  (document.activeElement as HTMLElement).blur();
  form.querySelector('label')!.click();
  console.log('focus after label', document.activeElement?.localName, focused()?.outerHTML.slice(0, 100));
  let changes = 0;
  el.addEventListener('esterway-change', () => changes++);
  form.reset(); await settled();
  console.log('reset', new FormData(form).get('ffa'), changes, form.checkValidity());
});

test('axe', async () => {
  for (const [name, entry] of Object.entries({ clean, sour, outside, nonsense, retested })) {
    const el = await place(html`<esterway-panel .entry=${entry}></esterway-panel>`);
    await attempt(`axe ${name}`, () => chai(el).to.be.accessible());
    el.remove();
  }
});

test('layout', async () => {
  for (const width of [270, 320, 400, 760, 1100]) {
    await page.viewport(width + 16, 900);
    for (const [name, entry] of Object.entries({ clean, sour, nonsense, retested })) for (const lang of ['en', 'de']) {
      const el = await place(html`<esterway-panel lang=${lang} .entry=${entry} style="inline-size: ${width}px"></esterway-panel>`);
      find(el, 'esterway-site-values').folded = false;
      await settled();
      const overflow = [...deep(el)].filter((e) => e.scrollWidth > e.clientWidth + 1 && e.clientWidth > 0 && !e.matches('.unseen, math *, select, option') && e.getBoundingClientRect().width > 1).map((e) => `${(e.getRootNode() as ShadowRoot).host.localName}>${e.localName}.${e.className} ${e.scrollWidth}>${e.clientWidth}`);
      console.log(width, name, lang, 'panel', el.scrollWidth, el.clientWidth, 'doc', document.documentElement.scrollWidth, document.documentElement.clientWidth, overflow.slice(0, 8));
      if (lang === 'en' && (name === 'sour' || name === 'nonsense') && width < 400) {
        const small = controls(el).filter((c) => { const b = c.getBoundingClientRect(); return (b.height < 44 || b.width < 44) && !c.matches('.open'); }).map((c) => `${c.localName} ${nameOf(c).slice(0, 30)} ${Math.round(c.getBoundingClientRect().width)}x${c.getBoundingClientRect().height}`);
        console.log(small);
      }
      el.remove();
    }
  }
});

test('words', async () => {
  const el = await place(html`<esterway-panel .entry=${retested}></esterway-panel>`);
  console.log(words(el));
  console.log(controls(el).map((c) => c.localName + ':' + nameOf(c)).join(' | '));
});
void [click, emulate, enter, focusedName, input, press, userEvent];
