import { html } from 'lit';
import { beforeEach, describe, expect, test } from 'vitest';
import type { EsterwayPanel } from '../../src/index.js';
import { button, click, controls, deep, find, focused, focusedName, input, place, press, settled, words } from './tools/page.js';
import { site, sour } from './tools/lots.js';
import { en } from './tools/texts.js';

const SECTIONS = {
  'esterway-lot': { heading: 'HK-0417', folded: ['Snack fryers', '900', '0.08'] },
  'esterway-titration': { heading: en.sections.titration, folded: ['8.5', '4.29'] },
  'esterway-route': { heading: en.sections.route, folded: [en.verdicts['two-step']] },
  'esterway-charge': { heading: en.sections.charge, folded: ['900'] },
  'esterway-working': { heading: en.sections.working, folded: [en.quantities.acidValue] },
  'esterway-site-values': { heading: en.sections.site, folded: ['Harbour works'] },
} as const;
const TAGS = Object.keys(SECTIONS) as (keyof typeof SECTIONS)[];

/** The button that folds a section. */
const heading = (section: Element) => controls(section).find((control) => control.hasAttribute('aria-expanded') && control.closest('h2')) as HTMLElement;

describe('a section', () => {
  let panel: EsterwayPanel;
  beforeEach(async () => {
    panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour} .site=${{ ...site({}), name: 'Harbour works' }}></esterway-panel>`);
    find(panel, 'esterway-working').of = 'acidValue';
    for (const tag of TAGS) find(panel, tag).folded = false;
    await settled();
  });

  test.each(TAGS)('%s folds and unfolds by keys', async (tag) => {
    const section = find(panel, tag);
    const fold = heading(section);
    const body = (fold.getRootNode() as ShadowRoot).getElementById(fold.getAttribute('aria-controls')!)!;
    fold.focus();
    expect(fold.getAttribute('aria-expanded')).toBe('true');
    expect(body.checkVisibility()).toBe(true);
    await press('{Enter}');
    expect(fold.getAttribute('aria-expanded')).toBe('false');
    expect(body.checkVisibility()).toBe(false);
    expect(section.hasAttribute('folded')).toBe(true);
    expect(focused()).toBe(fold);
    await press(' ');
    expect(fold.getAttribute('aria-expanded')).toBe('true');
    expect(body.checkVisibility()).toBe(true);
    expect(section.hasAttribute('folded')).toBe(false);
  });

  test.each(TAGS)('%s folded tells on one line what it knows', async (tag) => {
    const section = find(panel, tag);
    await click(heading(section));
    const text = words(section);
    expect(text).toContain(SECTIONS[tag].heading);
    for (const known of SECTIONS[tag].folded) expect(text).toContain(known);
    // nothing of its body is left to reach
    expect(controls(section)).toEqual([heading(section)]);
  });

  test('is named by its heading', () => {
    for (const tag of TAGS) {
      const group = [...deep(find(panel, tag))].find((element) => element.getAttribute('part') === 'section')!;
      const named = (group.getRootNode() as ShadowRoot).getElementById(group.getAttribute('aria-labelledby')!);
      expect(named?.textContent).toBe(SECTIONS[tag].heading);
    }
  });

  test('folded away is passed over by Enter', async () => {
    find(panel, 'esterway-titration').folded = true;
    await settled();
    const before = controls(find(panel, 'esterway-lot')).findLast((control) => control.hasAttribute('data-field'))!;
    before.focus();
    await press('{Enter}');
    expect(focused()).not.toBe(before);
    expect(focusedName()).not.toBe(en.fields.titrantStrength);
    find(panel, 'esterway-titration').folded = false;
    await settled();
    before.focus();
    await press('{Enter}');
    expect(focused()).toBe(input(panel, en.fields.titrantStrength));
  });
});

test('a section can be folded from the start', async () => {
  const section = await place(html`<esterway-titration folded></esterway-titration>`);
  expect(controls(section)).toHaveLength(1);
  expect(words(section)).toContain(en.result.notKnown);
  await click(button(section, `${en.sections.titration} ${en.result.notKnown}`));
  expect(controls(section).length).toBeGreaterThan(5);
});
