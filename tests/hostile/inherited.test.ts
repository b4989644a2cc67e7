import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import type { EsterwayPanel } from '../../src/index.js';
import { button, controls, deep, enter, find, input, place, settled, words } from '../elements/tools/page.js';
import { nonsense, sour } from '../elements/tools/lots.js';
import { en } from '../elements/tools/texts.js';

// What a page hands down, or throws at everything on it.

const style = document.head.appendChild(document.createElement('style'));
const root = document.documentElement;
afterEach(() => {
  style.textContent = '';
  root.removeAttribute('dir');
});

const placePanel = (entry = sour) => place(html`<div class="page" style="inline-size: 320px"><esterway-panel lang="en" .entry=${entry}></esterway-panel></div>`);

interface Look {
  readonly what: string;
  readonly box: readonly number[];
  readonly look: Readonly<Record<string, string>>;
}

/** What of an element's style a reader sees. */
const SEEN = [
  'color', 'background-color', 'font-family', 'font-size', 'font-style', 'font-variant', 'font-weight', 'letter-spacing', 'line-height', 'opacity',
  'text-align', 'text-align-last', 'text-decoration-line', 'text-emphasis-style', 'text-indent', 'text-shadow', 'text-transform', 'word-spacing', 'word-break', 'line-break',
  'white-space', 'visibility', 'caret-color', '-webkit-text-fill-color', '-webkit-text-stroke-width',
];

/** What is seen of a list item and of a table besides. */
const SEEN_OF: Readonly<Record<string, readonly string[]>> = { 'list-item': ['list-style-type', 'list-style-position'], table: ['border-collapse', 'border-spacing'] };

/** How all below a panel looks: sizes and styles, element by element. */
function looksOf(panel: Element): Look[] {
  return [...deep(panel)].map((element) => {
    const computed = getComputedStyle(element);
    const { width, height } = element.getBoundingClientRect();
    const what = `${element.localName}.${element.getAttribute('class') ?? ''}`;
    const seen = [...SEEN, ...(SEEN_OF[computed.display] ?? [])];
    return { what, box: [width, height], look: Object.fromEntries(seen.map((property) => [property, computed.getPropertyValue(property)])) };
  });
}

describe('a page that', () => {
  test.each([
    ['has a root font of 40 px', 'html { font-size: 40px }'],
    ['scales by 62.5 %', 'html { font-size: 62.5% }'],
    ['sets its own type on the body', 'body { font: italic small-caps 900 30px/4 serif; color: red; text-align: right; text-align-last: right }'],
    ['spaces its text', 'body { letter-spacing: 5px; word-spacing: 9px; text-indent: 40px; white-space: nowrap; word-break: break-all; line-break: anywhere; overflow-wrap: anywhere }'],
    ['shouts', 'body { text-transform: uppercase; text-shadow: 1px 1px red; text-emphasis: dot; -webkit-text-stroke: 2px red; -webkit-text-fill-color: red; caret-color: red }'],
    ['styles its tables and lists', 'body { border-collapse: separate; border-spacing: 9px; list-style: square inside; caption-side: bottom }'],
    ['colours every tag', 'div, span, p, button, input, select, label, table, td, h2, ol, li, section, svg, summary, details { all: unset !important; color: red !important }'],
    ['sizes every field', 'input, select, button { min-height: 100px !important; padding: 3em !important; border: 9px solid red !important; width: 100% !important }'],
    ['takes box sizes apart', '*, *::before, *::after { box-sizing: content-box !important }'],
  ])('%s changes nothing in the panel', async (_, css) => {
    const panel = find(await placePanel(), 'esterway-panel');
    const before = looksOf(panel);
    expect(before.length).toBeGreaterThan(300);
    // the panel keeps its column, whatever becomes of the element around it
    style.textContent = `${css}\n esterway-panel { inline-size: 320px; box-sizing: border-box !important }`;
    const after = looksOf(panel);
    const changed = after.filter((now, i) => JSON.stringify(now) !== JSON.stringify(before[i])).map((now) => {
      const then = before[after.indexOf(now)]!;
      const styles = Object.keys(now.look).filter((property) => now.look[property] !== then.look[property]).map((property) => `${property}: ${then.look[property]} → ${now.look[property]}`);
      return `${now.what} ${String(then.box)} → ${String(now.box)} ${styles.join('; ')}`;
    });
    expect(changed).toEqual([]);
  });

  test.each([
    ['unsets all', '.page * { all: unset }'],
    ['resets all, and means it', '.page * { all: initial !important }'],
    ['reverts what it unset', '*:where(:not(html, iframe, canvas, img, svg, video, audio):not(svg *, symbol *)) { all: unset; display: revert }'],
  ])('%s leaves a panel that works and can be read', async (_, css) => {
    style.textContent = css;
    const panel = find(await placePanel(), 'esterway-panel');
    await enter(panel, en.fields.oilAmount, '850');
    expect(words(find(panel, 'esterway-charge'))).toContain('850 kg');
    for (const tag of ['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge'] as const) {
      const look = getComputedStyle(find(panel, tag));
      expect([look.display, look.fontSize, look.color]).toEqual(['block', '14px', 'rgb(31, 44, 46)']);
    }
    expect(root.scrollWidth).toBeLessThanOrEqual(root.clientWidth);
    for (const field of controls(panel).filter((control) => control.matches('[data-field]'))) expect(field.getBoundingClientRect().height).toBeGreaterThanOrEqual(44);
  });

  test('hides a drawer by visibility hides the panel in it', async () => {
    style.textContent = '.drawer { visibility: hidden }';
    const drawer = await place(html`<div class="drawer"><esterway-panel .entry=${sour}></esterway-panel></div>`);
    const panel = find(drawer, 'esterway-panel');
    expect(words(panel)).toBe('');
    drawer.className = '';
    expect(words(panel)).toContain('4.29');
  });

  test('hides the panel, by attribute or style, has it hidden', async () => {
    const panel = find(await placePanel(), 'esterway-panel');
    panel.hidden = true;
    expect(panel.checkVisibility()).toBe(false);
    panel.hidden = false;
    style.textContent = 'esterway-panel { display: none }';
    expect(panel.checkVisibility()).toBe(false);
  });
});

test('the font size of the panel is its own property, and everything follows it', async () => {
  const panel = find(await placePanel(), 'esterway-panel');
  const title = () => parseFloat(getComputedStyle([...deep(panel)].find((element) => element.getAttribute('part') === 'verdict')!).fontSize);
  const before = title();
  panel.style.setProperty('--esterway-font-size', '28px');
  expect(title()).toBeCloseTo(2 * before, 3);
});

test('colours come from the public properties, and light or dark from the page', async () => {
  const panel = find(await placePanel(), 'esterway-panel');
  const paper = () => getComputedStyle(panel).backgroundColor;
  const light = paper();
  panel.parentElement!.style.colorScheme = 'dark';
  expect(paper()).not.toBe(light);
  panel.style.setProperty('--esterway-paper', 'rgb(1, 2, 3)');
  expect(paper()).toBe('rgb(1, 2, 3)');
});

describe('on a page that runs from right to left', () => {
  const placeRtl = async (entry = sour) => {
    root.dir = 'rtl';
    const panel: EsterwayPanel = find(await placePanel(entry), 'esterway-panel');
    await settled();
    return panel;
  };

  /** Where a text stands, by its first and its last character. */
  const ends = (text: Text) => [0, Math.max(0, text.data.trimEnd().length - 1)].map((at) => {
    const range = document.createRange();
    range.setStart(text, at);
    range.setEnd(text, at + 1);
    return range.getBoundingClientRect().left;
  });

  test('figures still run from left to right, their unit behind them', async () => {
    const panel = await placeRtl();
    const figures = [...deep(panel)].filter((element) => element.getAttribute('part') === 'figure' && element.checkVisibility());
    expect(figures.length).toBeGreaterThan(15);
    for (const figure of figures) {
      const number = [...figure.childNodes].find((node): node is Text => node instanceof Text && /\d/.test(node.data))!;
      const [first, last] = ends(number);
      expect(last).toBeGreaterThanOrEqual(first!);
      const unit = figure.querySelector('.unit');
      if (unit) expect(unit.getBoundingClientRect().left, words(figure)).toBeGreaterThan(last!);
    }
  });

  test('so do amounts in a sentence', async () => {
    const panel = await placeRtl();
    find(panel, 'esterway-charge').folded = true;
    await settled();
    const summary = [...deep(find(panel, 'esterway-charge'))].find((element) => element.className === 'summary')!;
    const [first, last] = ends([...summary.childNodes].find((node): node is Text => node instanceof Text && node.data.includes('900'))!);
    expect(last).toBeGreaterThan(first!);
  });

  test('and what is typed', async () => {
    const panel = await placeRtl();
    expect(getComputedStyle(input(panel, en.fields.titrantStrength)).direction).toBe('ltr');
    await enter(panel, en.fields.oilAmount, '-850');
    expect(input(panel, en.fields.oilAmount).value).toBe('-850');
  });

  test.each([270, 400, 760])('nothing sticks out at %i px', async (width) => {
    const panel = await placeRtl(nonsense);
    panel.parentElement!.style.inlineSize = `${width}px`;
    expect(panel.getBoundingClientRect().width).toBe(width);
    expect(panel.scrollWidth).toBeLessThanOrEqual(panel.clientWidth);
    expect(button(panel, en.panel.newLot)).toBeDefined();
  });
});
