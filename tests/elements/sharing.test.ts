import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayChangeEvent, EsterwayPanel, EsterwaySite, EsterwaySiteChangeEvent, EsterwayTitration } from '../../src/index.js';
import { button, choose, click, enter, find, input, place, settled, words } from './tools/page.js';
import { clean, figure, lot, site, sour } from './tools/lots.js';
import { en } from './tools/texts.js';

const AMOUNT = en.fields.oilAmount;

/** Sections scattered over a page, one of them in the shadow root of something else. */
async function placeScattered() {
  const holder = await place<EsterwaySite>(html`
    <esterway-site>
      <header><esterway-lot></esterway-lot></header>
      <main><p>Delivery note</p><esterway-titration></esterway-titration></main>
      <aside><div class="widget"></div></aside>
    </esterway-site>
  `);
  const widget = holder.querySelector('.widget')!.attachShadow({ mode: 'open' });
  widget.append(document.createElement('esterway-route'), document.createElement('esterway-charge'));
  await settled();
  return holder;
}

describe('sections under one site', () => {
  test('share one lot, wherever they stand', async () => {
    const holder = await placeScattered();
    holder.entry = sour;
    await settled();
    expect(find(holder, 'esterway-titration').value).toBe('4.29');
    expect(words(find(holder, 'esterway-route'))).toContain(en.verdicts['two-step']);
    expect(words(find(holder, 'esterway-charge'))).toContain('900 kg');
    for (const tag of ['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge'] as const) expect(find(holder, tag).entry).toBe(holder.entry);
  });

  test('an edit in one of them is read by all, and told once, by the site', async () => {
    const holder = await placeScattered();
    holder.entry = { ...sour, figures: {} };
    await settled();
    const told: EsterwayChangeEvent[] = [];
    holder.parentElement!.addEventListener('esterway-change', (event) => told.push(event));
    await enter(find(holder, 'esterway-titration'), en.fields.titrantStrength, '0.1023');
    await enter(find(holder, 'esterway-lot'), AMOUNT, '850');
    expect(told).toHaveLength(2);
    expect(told.map(({ target }) => target)).toEqual([holder, holder]);
    expect(told[1]?.entry).toBe(holder.entry);
    expect(words(find(holder, 'esterway-charge'))).toContain('850 kg');
    expect(words(find(holder, 'esterway-route'))).toContain('4.29');
  });

  test('a section that comes later finds the lot there', async () => {
    const holder = await placeScattered();
    holder.entry = sour;
    holder.append(document.createElement('esterway-working'));
    await settled();
    expect(find(holder, 'esterway-working').entry).toBe(holder.entry);
  });

  test('setting something on a section inside has no effect on the lot', async () => {
    const holder = await placeScattered();
    holder.entry = sour;
    find(holder, 'esterway-titration').entry = clean;
    await settled();
    expect(find(holder, 'esterway-titration').value).toBe('4.29');
    expect(holder.entry).toBe(sour);
  });
});

describe('a panel inside a site', () => {
  const placeBoth = async () => {
    const holder = await place<EsterwaySite>(html`<esterway-site .entry=${sour}><esterway-panel></esterway-panel><esterway-titration></esterway-titration></esterway-site>`);
    return { holder, panel: find(holder, 'esterway-panel'), beside: holder.querySelector(':scope > esterway-titration') as EsterwayTitration };
  };

  test('shows the lot of the site, and its edits go there', async () => {
    const { holder, panel, beside } = await placeBoth();
    expect(panel.entry).toBe(holder.entry);
    await enter(panel, AMOUNT, '700');
    expect(holder.entry.figures['oilAmount']).toEqual(figure('700 kg'));
    await enter(beside, en.fields.titrantStrength, '0.2');
    expect(input(find(panel, 'esterway-titration'), en.fields.titrantStrength).value).toBe('0.2');
  });

  test('undo and new lot work on the lot of the site', async () => {
    const { holder, panel, beside } = await placeBoth();
    await enter(beside, en.fields.titrantStrength, '0.2');
    await click(button(panel, en.panel.undo));
    expect(holder.entry).toEqual(sour);
    await click(button(panel, en.panel.newLot));
    expect(holder.entry).toEqual(lot({ figures: { titrantStrength: '0.1023 mol/L' } }));
    expect(beside.value).toBe('');
    await click(button(panel, en.panel.undo));
    expect(beside.value).toBe('4.29');
  });
});

describe('the site profile', () => {
  test('set by the page, all is worked out anew', async () => {
    const holder = await placeScattered();
    holder.entry = sour;
    await settled();
    holder.site = site({ figures: { directLimit: '5.0 %' }, options: { catalyst: 'NaOH' } });
    await settled();
    expect(words(find(holder, 'esterway-route'))).toContain(en.verdicts.direct);
    expect(words(find(holder, 'esterway-charge'))).toContain('Sodium hydroxide 98 %');
    expect(holder.entry).toBe(sour);
  });

  test('changed by a person, it is told with the whole profile, and the lot stays', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour} .site=${{ ...site({ figures: { carryOver: '8 %' } }), name: 'Harbour works' }}></esterway-panel>`);
    const changes: EsterwaySiteChangeEvent[] = [];
    let lots = 0;
    document.body.addEventListener('esterway-site-change', (event) => changes.push(event), { once: true });
    panel.addEventListener('esterway-change', () => lots++);
    const values = find(panel, 'esterway-site-values');
    values.folded = false;
    await settled();
    await enter(values, 'Direct limit, FFA', '5,0');
    expect(changes[0]?.target).toBe(panel);
    expect(changes[0]?.site).toEqual({ ...site({ figures: { carryOver: '8 %', directLimit: '5.0 %' } }), name: 'Harbour works' });
    expect(panel.site).toEqual(changes[0]?.site);
    expect(lots).toBe(0);
    expect(panel.entry).toBe(sour);
    expect(words(find(panel, 'esterway-route'))).toContain(en.verdicts.direct);
  });
});

describe('moved about the page', () => {
  test('into a site it shows the site’s lot, out of it its own again', async () => {
    const holder = await place<EsterwaySite>(html`<esterway-site .entry=${sour}></esterway-site>`);
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${clean}></esterway-panel>`);
    const home = panel.parentElement!;
    holder.append(panel);
    await settled();
    expect(find(panel, 'esterway-titration').value).toBe('4.29');
    await enter(panel, AMOUNT, '700');
    expect(holder.entry.figures['oilAmount']).toEqual(figure('700 kg'));

    home.append(panel);
    await settled();
    expect(panel.entry).toBe(clean);
    expect(find(panel, 'esterway-titration').value).toBe('1.12');
    await enter(panel, AMOUNT, '650');
    expect(panel.entry.figures['oilAmount']).toEqual(figure('650 kg'));
    expect(holder.entry.figures['oilAmount']).toEqual(figure('700 kg'));
    expect(words(find(panel, 'esterway-charge'))).toContain('650 kg');
  });

  test('from one site to another', async () => {
    const one = await place<EsterwaySite>(html`<esterway-site .entry=${sour}><esterway-titration></esterway-titration></esterway-site>`);
    const other = await place<EsterwaySite>(html`<esterway-site .entry=${clean}></esterway-site>`);
    const titration = find(one, 'esterway-titration');
    other.append(titration);
    await settled();
    expect(titration.value).toBe('1.12');
    one.entry = lot({});
    await settled();
    expect(titration.value).toBe('1.12');
    other.entry = sour;
    await settled();
    expect(titration.value).toBe('4.29');
  });

  test('into another shadow root it keeps its lot and goes on working', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
    const host = panel.parentElement!.appendChild(document.createElement('div'));
    host.attachShadow({ mode: 'open' }).append(panel);
    await settled();
    await enter(panel, AMOUNT, '640');
    expect(panel.entry.figures['oilAmount']).toEqual(figure('640 kg'));
    expect(words(find(panel, 'esterway-charge'))).toContain('640 kg');
    await click(button(panel, en.panel.undo));
    expect(panel.entry).toEqual(sour);
  });

  test('taken out and put back it has lost nothing', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
    await enter(panel, AMOUNT, '640');
    const home = panel.parentElement!;
    panel.remove();
    home.append(panel);
    await settled();
    expect(input(panel, AMOUNT).value).toBe('640');
    await click(button(panel, en.panel.undo));
    expect(panel.entry).toEqual(sour);
  });
});

test('two panels on a page are two lots', async () => {
  const both = await place(html`<div><esterway-panel .entry=${sour}></esterway-panel><esterway-panel .entry=${clean} units="us"></esterway-panel></div>`);
  const [one, other] = both.querySelectorAll('esterway-panel') as unknown as [EsterwayPanel, EsterwayPanel];
  await enter(one, AMOUNT, '700');
  expect(other.entry).toBe(clean);
  expect(button(other, en.panel.undo).disabled).toBe(true);
  expect([one.units, other.units]).toEqual(['metric', 'us']);
  one.site = site({ figures: { directLimit: '5.0 %' } });
  await settled();
  expect(other.site).toEqual(site({}));
  await click(button(find(other, 'esterway-titration'), '1.12 %'));
  expect(find(other, 'esterway-working').of).toBe('freeFattyAcid');
  expect(find(one, 'esterway-working').of).toBe('');
});

test('units of a site are those of all its sections; what was typed keeps its own', async () => {
  const holder = await placeScattered();
  holder.entry = sour;
  holder.setAttribute('units', 'us');
  await settled();
  expect(holder.units).toBe('us');
  expect(words(find(holder, 'esterway-charge'))).toContain('1984 lb');
  expect(input(holder, AMOUNT).value).toBe('900');
  await choose(holder, `Unit: ${AMOUNT}`, 'US gal');
  expect(holder.entry.figures['oilAmount']).toEqual({ text: '900', unit: 'US gal' });
  expect(words(find(holder, 'esterway-charge'))).toContain('900 US gal');
  holder.removeAttribute('units');
  await settled();
  expect(holder.units).toBe('metric');
});
