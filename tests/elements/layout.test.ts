import { html } from 'lit';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { page } from 'vitest/browser';
import type { EsterwayPanel } from '../../src/index.js';
import { controls, deep, find, nameOf, place, settled } from './tools/page.js';
import { clean, nonsense, outside, retested } from './tools/lots.js';

const WIDTHS = [270, 320, 400, 760, 1100];
const LOTS = { clean, retested, outside, nonsense };
/** Least side of what a gloved hand is to hit, px. */
const TARGET = 44;

let before: [number, number];
beforeAll(() => {
  before = [innerWidth, innerHeight];
});
afterAll(() => page.viewport(...before));

/** A panel as wide as its page, with all that folds open, as many figures in sight as there can be. */
async function placeWhole(width: number, lang: string, entry: (typeof LOTS)[keyof typeof LOTS]): Promise<EsterwayPanel> {
  await page.viewport(width, 900);
  document.body.style.margin = '0';
  const panel = await place<EsterwayPanel>(html`<esterway-panel lang=${lang} .entry=${entry}></esterway-panel>`);
  for (const summary of controls(panel).filter(({ localName }) => localName === 'summary')) summary.click();
  find(panel, 'esterway-site-values').folded = false;
  find(panel, 'esterway-working').of = 'direct.catalyst';
  await settled();
  expect(panel.getBoundingClientRect().width).toBe(width);
  return panel;
}

const where = (element: Element) => `${((element.getRootNode() as ShadowRoot).host as Element | undefined)?.localName}: ${element.localName} ${nameOf(element).slice(0, 40)}`;

/** Text that only a screen reader meets, and what scrolls by itself on purpose. */
const unseen = (element: Element) => element.closest('.unseen, math, .formula, option') !== null;

function tooWide(panel: Element): string[] {
  const { right } = panel.getBoundingClientRect();
  return [...deep(panel)]
    .filter((element) => !unseen(element) && element.checkVisibility() && element.getBoundingClientRect().right > right + 0.5)
    .map(where);
}

describe.each(WIDTHS)('at %i px', (width) => {
  describe.each(['en', 'de'])('in %s', (lang) => {
    test.each(Object.keys(LOTS) as (keyof typeof LOTS)[])('a %s lot', async (name) => {
      const panel = await placeWhole(width, lang, LOTS[name]);
      const { documentElement: root } = document;
      expect(root.scrollWidth).toBeLessThanOrEqual(root.clientWidth);
      expect(panel.scrollWidth).toBeLessThanOrEqual(panel.clientWidth);
      expect(tooWide(panel)).toEqual([]);

      // targets: all that is typed in, chosen from or pressed, but for figures in running text
      const targets = controls(panel).filter((control) => !control.matches('.open, [type=radio]'));
      expect(targets.length).toBeGreaterThan(20);
      expect(targets.filter((target) => target.getBoundingClientRect().height < TARGET).map(where)).toEqual([]);
      expect(targets.filter((target) => target.matches('.action') && target.getBoundingClientRect().width < TARGET).map(where)).toEqual([]);
      const radios = controls(panel).filter((control) => control.matches('[type=radio]'));
      expect(radios).toHaveLength(2);
      for (const radio of radios) expect(radio.closest('label')!.getBoundingClientRect().height).toBeGreaterThanOrEqual(TARGET);
    });
  });
});

/** Fields whose text is wider than they are. */
const cut = (panel: Element) =>
  controls(panel).filter((control): control is HTMLInputElement => control.matches('input[inputmode=decimal]') && control.scrollWidth > control.clientWidth);

test.each(WIDTHS)('figures of a usual length are seen whole at %i px', async (width) => {
  for (const lang of ['en', 'de']) {
    const panel = await placeWhole(width, lang, retested);
    expect(cut(panel).map((field) => `${where(field)} ${field.value}`)).toEqual([]);
    panel.remove();
  }
});

test('wide, the sections stand side by side, in two and then three columns', async () => {
  const columns = async (width: number) => {
    await page.viewport(width, 900);
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${retested}></esterway-panel>`);
    const starts = new Set(['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge', 'esterway-working', 'esterway-site-values'].map(
      (tag) => find(panel, tag as 'esterway-lot').getBoundingClientRect().left,
    ));
    return starts.size;
  };
  expect(await columns(400)).toBe(1);
  expect(await columns(760)).toBe(2);
  expect(await columns(1100)).toBe(3);
});

test('it is as wide as its column, whatever the page around it', async () => {
  await page.viewport(1100, 900);
  const panel = await place<EsterwayPanel>(html`<div style="inline-size: 300px"><esterway-panel .entry=${retested}></esterway-panel></div>`);
  const inner = find(panel, 'esterway-panel');
  expect(inner.getBoundingClientRect().width).toBe(300);
  expect(tooWide(inner)).toEqual([]);
});

test('no figure is broken in two lines', async () => {
  const panel = await placeWhole(270, 'en', retested);
  const figures = [...deep(panel)].filter((element) => element.getAttribute('part') === 'figure' && element.checkVisibility());
  expect(figures.length).toBeGreaterThan(20);
  expect(figures.filter((figure) => figure.getClientRects().length > 1).map(where)).toEqual([]);
});
