import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayPanel, EsterwaySiteValues, SiteProfile } from '../../src/index.js';
import { choose, controls, deep, describedBy, enter, find, hasField, input, nameOf, place, press, select, settled, words } from './tools/page.js';
import { clean, figure, site } from './tools/lots.js';
import { en } from './tools/texts.js';

const DIRECT_LIMIT = 'Direct limit, FFA';

const placeValues = (profile: SiteProfile = site({})) => place<EsterwaySiteValues>(html`<esterway-site-values .site=${profile}></esterway-site-values>`);

test('shows the usual values as placeholders, with where each comes from', async () => {
  const element = await placeValues();
  expect(input(element, DIRECT_LIMIT).placeholder).toBe('3.0');
  expect(input(element, DIRECT_LIMIT).value).toBe('');
  expect(describedBy(input(element, DIRECT_LIMIT))).toContain(en.marks.found);
  expect(describedBy(input(element, 'Acid step limit, FFA'))).toBe(en.marks.practice);
  for (const group of Object.values(en.site.groups)) expect(words(element)).toContain(group);
});

test('a value typed replaces the usual one; emptied, it gives it back', async () => {
  const element = await placeValues();
  const told: SiteProfile[] = [];
  element.addEventListener('esterway-site-change', (event) => told.push(event.site));
  await enter(element, DIRECT_LIMIT, '2,50');
  expect(told.at(-1)).toEqual(site({ figures: { directLimit: '2.50 %' } }));
  await press('{Tab}');
  expect(input(element, DIRECT_LIMIT).value).toBe('2.50');
  await enter(element, DIRECT_LIMIT, '');
  expect(told.at(-1)).toEqual(site({}));
  expect(element.site).toEqual(site({}));
});

test('a choice is told in the same way', async () => {
  const element = await placeValues();
  await choose(element, en.choices.acidProofEquipment, 'no');
  expect(element.site.options).toEqual({ acidProofEquipment: 'no' });
  expect(select(element, en.choices.acidProofEquipment).value).toBe('no');
});

test('of the catalysts it shows the product in use', async () => {
  const element = await placeValues();
  expect(hasField(element, 'Assay of potassium hydroxide')).toBe(true);
  expect(controls(element).map(nameOf).join()).not.toMatch(/sodium/i);
  await choose(element, en.choices.catalyst, 'NaOCH3-solution');
  expect(input(element, 'Assay of sodium methoxide in methanol').placeholder).toBe('30');
  expect(input(element, 'Density of sodium methoxide in methanol').placeholder).toBe('0.97');
  expect(hasField(element, 'Assay of potassium hydroxide')).toBe(false);
});

describe('a value that cannot be', () => {
  test('is said at its field, and kept', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${clean}></esterway-panel>`);
    const values = find(panel, 'esterway-site-values');
    values.folded = false;
    await settled();
    await enter(values, 'Methanol per mol of oil', '2');
    await press('{Tab}');
    const field = input(values, 'Methanol per mol of oil');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(describedBy(field)).toContain('3');
    expect(field.value).toBe('2');
    expect(panel.site.figures['methanolRatio']).toEqual(figure('2 mol/mol'));
  });

  test('typed for the lot alone, it is no fault of the site', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${{ ...clean, figures: { ...clean.figures, waterContent: figure('180 %') } }}></esterway-panel>`);
    const values = find(panel, 'esterway-site-values');
    values.folded = false;
    await settled();
    expect(input(values, en.fields.waterContent).getAttribute('aria-invalid')).toBe('false');
    expect(input(find(panel, 'esterway-lot'), en.fields.waterContent).getAttribute('aria-invalid')).toBe('true');
  });
});

test('every field has a name of its own, and a value in its placeholder where there is a usual one', async () => {
  const element = await placeValues();
  const fields = controls(element).filter((control) => control.matches('[data-field]'));
  expect(fields.length).toBeGreaterThan(40);
  const names = fields.map(nameOf);
  expect(names).not.toContain('');
  expect(new Set(names).size).toBe(names.length);
  expect(fields.filter((field) => field instanceof HTMLInputElement && /undefined|NaN/.test(field.placeholder))).toEqual([]);
  expect([...deep(element)].filter(({ localName }) => localName === 'h3')).toHaveLength(Object.keys(en.site.groups).length);
});
