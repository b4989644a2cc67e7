import { html } from 'lit';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { EsterwayPanel, EsterwayTitration, defineEsterway } from '../../src/index.js';
import { button, click, enter, find, input, place, press, settled, words } from '../elements/tools/page.js';
import { figure, sour } from '../elements/tools/lots.js';
import { de, en } from '../elements/tools/texts.js';

afterEach(() => {
  vi.restoreAllMocks();
});

describe('registered twice', () => {
  test('the first stays, the second is told about in one line, and the page works', async () => {
    const warn = vi.spyOn(console, 'warn').mockReturnValue();
    const first = customElements.get('esterway-panel');
    expect(() => defineEsterway()).not.toThrow();
    expect(warn).toHaveBeenCalledOnce();
    expect(warn.mock.lastCall?.[0]).toContain('esterway-panel');
    expect(customElements.get('esterway-panel')).toBe(first);
    const panel = await place(html`<esterway-panel .entry=${sour}></esterway-panel>`);
    expect(words(panel)).toContain('4.29');
  });

  test('a tag that somebody else has taken stays theirs; the others are registered', () => {
    const warn = vi.spyOn(console, 'warn').mockReturnValue();
    const taken = new Map<string, CustomElementConstructor>([['esterway-lot', class extends HTMLElement {}]]);
    const theirs = taken.get('esterway-lot');
    const registry = {
      get: (tag: string) => taken.get(tag),
      define: (tag: string, element: CustomElementConstructor) => taken.set(tag, element),
    } as unknown as CustomElementRegistry;
    defineEsterway(registry);
    expect(taken.get('esterway-lot')).toBe(theirs);
    expect(taken.get('esterway-titration')).toBe(EsterwayTitration);
    expect(warn.mock.lastCall?.[0]).toContain('<esterway-lot>');
    expect(warn.mock.lastCall?.[0]).not.toContain('esterway-titration');
  });
});

describe('made in other ways', () => {
  test('by its class', async () => {
    const panel = new EsterwayPanel();
    panel.entry = sour;
    document.body.append(panel);
    await settled();
    expect(words(panel)).toContain('4.29');
    panel.remove();
  });

  test('with properties set before it was known', async () => {
    const waiting = document.createElement('esterway-panel-later') as EsterwayPanel;
    waiting.entry = sour;
    document.body.append(waiting);
    customElements.define('esterway-panel-later', class extends EsterwayPanel {});
    await settled();
    expect(words(waiting)).toContain('4.29');
    await enter(waiting, en.fields.oilAmount, '850');
    expect(waiting.entry.figures['oilAmount']).toEqual(figure('850 kg'));
    waiting.remove();
  });

  test('by markup alone', async () => {
    const page = await place(html`<div></div>`);
    page.innerHTML = '<esterway-site units="us" lang="de"><esterway-panel></esterway-panel></esterway-site>';
    await settled();
    find(page, 'esterway-site').entry = sour;
    await settled();
    expect(words(page)).toContain('1984 lb');
    expect(words(page)).toContain(de.verdicts['two-step']);
  });
});

describe('inside the shadow roots of others', () => {
  test.each(['open', 'closed'] as const)('%s ones: it follows the language, shares the lot, tells the page', async (mode) => {
    const page = await place(html`<esterway-site lang="de"><div></div></esterway-site>`);
    const outer = page.querySelector('div')!.attachShadow({ mode });
    outer.innerHTML = '<style>* { color: red !important; font: 50px serif !important } input { display: none !important }</style><section></section>';
    const inner = outer.querySelector('section')!.attachShadow({ mode });
    const panel = inner.appendChild(document.createElement('esterway-panel'));
    const site = find(page.parentElement!, 'esterway-site');
    site.entry = sour;
    await settled(page);
    await settled(panel);
    expect(words(panel)).toContain(de.verdicts['two-step']);
    expect(input(panel, de.fields.oilAmount).checkVisibility()).toBe(true);
    let told = 0;
    page.parentElement!.addEventListener('esterway-change', () => told++);
    input(panel, de.fields.oilAmount).focus();
    await press('{Control>}a{/Control}850{Enter}');
    await settled(panel);
    expect(site.entry.figures['oilAmount']).toEqual(figure('850 kg'));
    expect(told).toBeGreaterThan(0);
    expect(words(panel)).toContain('850 kg');
    // Enter went on within the panel
    expect(panel.shadowRoot!.activeElement).not.toBeNull();
  });

  test('a figure opens its working in the panel, not elsewhere', async () => {
    const page = await place(html`<div><div class="host"></div><esterway-working></esterway-working></div>`);
    const panel = page.querySelector('.host')!.attachShadow({ mode: 'open' }).appendChild(document.createElement('esterway-panel'));
    panel.entry = sour;
    await settled();
    await click(button(find(panel, 'esterway-titration'), '4.29 %'));
    expect(find(panel, 'esterway-working').of).toBe('freeFattyAcid');
    expect((page.querySelector(':scope > esterway-working') as HTMLElementTagNameMap['esterway-working']).of).toBe('');
  });
});

test('nothing is stored and nothing is asked of the network', async () => {
  const fetched = vi.spyOn(window, 'fetch');
  const before = [localStorage.length, sessionStorage.length, document.cookie, performance.getEntriesByType('resource').length];
  const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
  input(panel, en.fields.oilAmount).value = '850';
  input(panel, en.fields.oilAmount).dispatchEvent(new InputEvent('input', { bubbles: true, composed: true }));
  button(find(panel, 'esterway-titration'), '4.29 %').click();
  find(panel, 'esterway-site-values').folded = false;
  await settled();
  expect(fetched).not.toHaveBeenCalled();
  expect([localStorage.length, sessionStorage.length, document.cookie, performance.getEntriesByType('resource').length]).toEqual(before);
});
