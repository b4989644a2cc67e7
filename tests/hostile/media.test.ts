import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import type { EsterwayPanel, LotEntry } from '../../src/index.js';
import { deep, emulate, find, input, place, select, settled, words } from '../elements/tools/page.js';
import { nonsense, retested, sour } from '../elements/tools/lots.js';
import { en } from '../elements/tools/texts.js';

afterEach(() => emulate());

const placePanel = (entry: LotEntry) => place<EsterwayPanel>(html`<esterway-panel .entry=${entry}></esterway-panel>`);
const style = (element: Element) => getComputedStyle(element);

describe('in forced colours', () => {
  const forced = () => emulate({ 'forced-colors': 'active' });

  /** A colour of the system, as the browser computes it. */
  function system(name: string): string {
    const probe = document.body.appendChild(document.createElement('div'));
    probe.style.cssText = `forced-color-adjust: none; color: ${name}`;
    const { color } = style(probe);
    probe.remove();
    return color;
  }

  test('the drawing is in the system’s colours, the result told apart', async () => {
    await forced();
    const panel = await placePanel(sour);
    const [svg] = [...deep(panel)].filter(({ localName }) => localName === 'svg');
    const part = (name: string) => style(svg!.querySelector(name)!);
    expect(part('.glass').stroke).toBe(system('CanvasText'));
    expect(part('.limit').stroke).toBe(system('CanvasText'));
    expect(part('.meniscus').stroke).toBe(system('Highlight'));
    expect(part('.oil').fill).toBe('none');
    expect(part('text').fill).toBe(system('CanvasText'));
  });

  test('the chosen route is outlined', async () => {
    await forced();
    const panel = await placePanel(sour);
    const label = (name: string) => style(input(panel, name).closest('label')!);
    expect(label(en.charge.twoStep).outlineStyle).toBe('solid');
    expect(label(en.charge.direct).outlineStyle).toBe('none');
  });

  test('a field that is wrong has another line than one that is right, and one with the focus is outlined', async () => {
    await forced();
    const panel = await placePanel(nonsense);
    const line = (label: string) => style(input(panel, label).closest('[part=line]')!);
    expect(line(en.fields.oilAmount).borderBottomStyle).toBe('double');
    expect(line(en.fields.oilTemperature).borderBottomStyle).toBe('double');
    expect(style(input(panel, en.lot.name).closest('.line')!).borderBottomStyle).toBe('solid');
    input(panel, en.fields.oilAmount).focus();
    expect(line(en.fields.oilAmount).outlineStyle).toBe('solid');
  });

  test('boxes and buttons keep a border', async () => {
    await forced();
    const panel = await placePanel(sour);
    for (const element of deep(panel)) {
      if (element.matches('.action, .care')) expect(style(element).borderTopStyle, element.outerHTML).toBe('solid');
      if (element.matches('.gate')) expect(style(element).borderInlineStartStyle).toBe('solid');
    }
  });
});

describe('with reduced motion', () => {
  const moving = (panel: Element) => [...deep(panel)].filter((element) => style(element).transitionDuration.split(', ').some((time) => time !== '0s') || style(element).animationName !== 'none');

  test('nothing moves', async () => {
    const panel = await placePanel(retested);
    expect(moving(panel).length).toBeGreaterThan(0);
    await emulate({ 'prefers-reduced-motion': 'reduce' });
    expect(moving(panel)).toEqual([]);
  });
});

describe('in print', () => {
  test('what is folded away is printed: the charge does not depend on what somebody left open', async () => {
    const panel = await placePanel(retested);
    const tags = ['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge'] as const;
    for (const tag of tags) find(panel, tag).folded = true;
    await settled();
    expect(words(panel)).not.toContain(en.charge.baseStep);
    await emulate({}, 'print');
    const text = words(panel);
    for (const part of [en.charge.acidStep, en.charge.baseStep, en.cautions.methanol, en.verdicts['two-step'], en.result.acidValue]) expect(text).toContain(part);
    expect(input(panel, en.fields.oilAmount).value).toBe('900');
  });

  test('what is only for the screen is left out', async () => {
    const panel = await placePanel(retested);
    find(panel, 'esterway-site-values').folded = false;
    find(panel, 'esterway-working').of = 'acidValue';
    await settled();
    await emulate({}, 'print');
    const text = words(panel);
    for (const part of [en.panel.newLot, en.panel.print, en.sections.working, en.sections.site, en.site.note, en.runs.hint, en.route.published]) expect(text).not.toContain(part);
  });

  test('it is black on white, whatever the page’s colours', async () => {
    document.documentElement.style.colorScheme = 'dark';
    const panel = await placePanel(retested);
    await emulate({}, 'print');
    for (const tag of ['esterway-lot', 'esterway-titration', 'esterway-charge'] as const) {
      expect(style(find(panel, tag)).color).toBe('rgb(0, 0, 0)');
      expect(style(find(panel, tag)).backgroundColor).toBe('rgb(255, 255, 255)');
    }
    document.documentElement.style.colorScheme = '';
  });

  test('it is one column, and steps and cautions are not torn apart', async () => {
    const panel = await placePanel(retested);
    panel.style.inlineSize = '1200px';
    await emulate({}, 'print');
    const left = (tag: 'esterway-lot' | 'esterway-charge') => find(panel, tag).getBoundingClientRect().left;
    expect(left('esterway-charge')).toBe(left('esterway-lot'));
    for (const element of deep(find(panel, 'esterway-charge'))) if (element.matches('li, .care')) expect(style(element).breakInside).toBe('avoid');
  });

  test('units stand beside their figures without an arrow to choose', async () => {
    const panel = await placePanel(retested);
    await emulate({}, 'print');
    expect(style(select(panel, en.field.unitOf.replace('{label}', en.fields.oilAmount))).appearance).toBe('none');
  });
});
