import { html } from 'lit';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import type { EsterwayPanel } from '../../src/index.js';
import { button, choose, click, deep, enter, find, hasField, input, nameOf, place, settled, words } from '../elements/tools/page.js';
import { sour } from '../elements/tools/lots.js';
import { en, fill } from '../elements/tools/texts.js';

// A page that moves the panel into a frame or a window of its own.

let frame: HTMLIFrameElement;
beforeEach(() => {
  frame = document.body.appendChild(document.createElement('iframe'));
});
afterEach(() => frame.remove());

/** Elements in a document without any of their styles: as they would stand there as bare boxes. */
const bare = (root: Element) => [root, ...deep(root)].filter((element) => element.shadowRoot?.adoptedStyleSheets.length === 0 && element.localName !== 'esterway-site');

const cell = (row: number) => fill(en.field.cellOf, { run: String(row), cell: en.fields.sample });

const placePanel = () => place<EsterwayPanel>(html`<esterway-panel .entry=${sour}></esterway-panel>`);

async function move(panel: Element, into: Document): Promise<void> {
  into.body.append(panel);
  await settled(panel);
}

describe('in another document', () => {
  test('the panel keeps its looks and its lot', async () => {
    const panel = await placePanel();
    const title = [...deep(panel)].find((element) => element.getAttribute('part') === 'verdict')!;
    const look = () => [getComputedStyle(title).fontSize, getComputedStyle(title).fontWeight, getComputedStyle(find(panel, 'esterway-lot')).display];
    const before = look();
    await move(panel, frame.contentDocument!);
    expect(panel.ownerDocument).toBe(frame.contentDocument);
    expect(bare(panel)).toEqual([]);
    expect(look()).toEqual(before);
    expect(words(find(panel, 'esterway-route'))).toContain(en.verdicts['two-step']);
  });

  test('it goes on working, with what it makes there', async () => {
    const panel = await placePanel();
    await move(panel, frame.contentDocument!);
    await enter(panel, cell(3), '2.5');
    expect(hasField(panel, cell(4))).toBe(true);
    await choose(panel, fill(en.field.unitOf, { label: en.fields.oilAmount }), 'lb');
    find(panel, 'esterway-site-values').folded = false;
    await settled(panel);
    expect(bare(panel)).toEqual([]);
    expect(panel.entry.figures['oilAmount']).toEqual({ text: '900', unit: 'lb' });
    button(find(panel, 'esterway-titration'), '4.29 %').click();
    await settled(panel);
    expect(words(find(panel, 'esterway-working'))).toContain(en.quantities.freeFattyAcid);
    for (const math of deep(panel)) if (math.localName === 'math') expect(math.ownerDocument).toBe(frame.contentDocument);
  });

  test('keys lead on there too', async () => {
    const panel = await placePanel();
    await move(panel, frame.contentDocument!);
    const field = input(panel, en.fields.oilAmount);
    field.focus();
    field.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter', bubbles: true, composed: true }));
    let at = frame.contentDocument!.activeElement;
    while (at?.shadowRoot?.activeElement) at = at.shadowRoot.activeElement;
    expect(nameOf(at!)).toBe(en.fields.oilTemperature);
  });

  test('made for it from the start, it is dressed as well', async () => {
    const panel = document.createElement('esterway-panel');
    panel.entry = sour;
    await move(panel, frame.contentDocument!);
    expect(bare(panel)).toEqual([]);
    expect(words(panel)).toContain('4.29');
  });

  test('and back again', async () => {
    const panel = await placePanel();
    const home = panel.parentElement!;
    await move(panel, frame.contentDocument!);
    home.append(panel);
    await settled();
    expect(bare(panel)).toEqual([]);
    await enter(panel, cell(3), '2.5');
    await click(button(panel, en.panel.undo));
    expect(panel.entry).toEqual(sour);
  });
});
