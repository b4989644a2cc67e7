import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayPanel, EsterwaySiteChangeEvent, SiteProfile } from '../../src/index.js';
import { deTitrant } from '../../src/locales/de-titrant.js';
import { enTitrant } from '../../src/locales/en-titrant.js';
import type { EsterwayTitrant } from '../../src/more.js';
import '../../src/more.js';
import { choose, enter, hasField, input, openPart, place, words, find } from './tools/page.js';
import { run, site, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

const placeTitrant = (profile: SiteProfile = site({}), lang = 'en') =>
  place<EsterwayTitrant>(html`<esterway-titrant lang=${lang} .site=${profile}></esterway-titrant>`);
const cell = (row: number, what: 'sample' | 'start' | 'end') => fill(en.field.cellOf, { run: String(row), cell: en.fields[what] });

const STANDARDISED: SiteProfile = {
  ...site({ options: { titrantKnownFrom: 'standardised' } }),
  // 1000 · 0.5012 / (204.222 · 24.50) is 0.10017, 1000 · 0.4987 / (204.222 · 24.40) is 0.10008
  titrantRuns: [run('0.5012 g', '0.00', '24.50'), run('0.4987 g', '0.00', '24.40')],
  titrantDate: '2026-11-20',
};

describe('the strength', () => {
  test('from a label is typed', async () => {
    const element = await placeTitrant();
    await enter(element, en.fields.titrantStrength, '0.1003');
    expect(words(element)).toContain(`0.1003 mol/L ${enTitrant.result} ± 0.0006 mol/L`);
  });

  test('from weighing says that it was not standardised', async () => {
    const element = await placeTitrant(site({ options: { titrantKnownFrom: 'weighing' } }));
    await enter(element, 'Alkali weighed for the titrant', '6.601'); // 6.601 · 0.85 / (56.105 · 1) is 0.10001
    await enter(element, 'Volume the titrant was made up to', '1');
    expect(words(element)).toContain('0.1000 mol/L');
    expect(words(element)).toContain(en.notices['titrant-not-standardised']);
  });

  test('is the mean of standardisation runs, each shown', async () => {
    const element = await placeTitrant(STANDARDISED);
    expect(words(element)).toContain('0.1001 mol/L');
    expect(words(element)).toContain('0.10017');
    expect(words(element)).toContain('0.10008');
  });

  test('changes the site, not the lot, with every cell typed', async () => {
    const element = await placeTitrant(site({ options: { titrantKnownFrom: 'standardised' } }));
    const changes: EsterwaySiteChangeEvent[] = [];
    element.addEventListener('esterway-site-change', (event) => changes.push(event));
    await enter(element, cell(1, 'sample'), '0.5012');
    await enter(element, cell(1, 'start'), '0');
    await enter(element, cell(1, 'end'), '24.50');
    expect(changes.at(-1)?.site.titrantRuns).toEqual([{ sample: { text: '0.5012', unit: 'g' }, start: { text: '0', unit: 'mL' }, end: { text: '24.50', unit: 'mL' } }]);
    expect(element.entry.runs).toEqual([]);
    expect(words(element)).toContain('0.10017');
  });
});

describe('what is wrong', () => {
  test('stands at the cell, and what was typed stays', async () => {
    const element = await placeTitrant({ ...STANDARDISED, titrantRuns: [run('0.5012 g', '24.50', '0.00')] });
    expect(words(element)).toContain(en.problems['end-below-start']);
    expect(input(element, cell(1, 'start')).value).toBe('24.50');
  });

  test('a purity above 100 % is refused, one typed as a fraction is asked about', async () => {
    const pure = (text: string) => placeTitrant({ ...STANDARDISED, figures: { khpPurity: { text, unit: '%' } } });
    const above = await pure('100.2');
    expect(words(above)).toContain(fill(en.problems['above-100-percent'], {}));
    expect(words(above)).toContain(fill(en.result.blocked, { field: 'purity of the KHP' }));
    expect(input(above, 'Purity of the KHP').value).toBe('100.2');
    expect(words(await pure('0.9995'))).toContain(fill(en.notices['purity-as-fraction'], { meant: '99.95' }));
  });

  test('a standardisation of long ago, or of tomorrow', async () => {
    expect(words(await placeTitrant({ ...STANDARDISED, titrantDate: '2020-01-01' }))).toMatch(/standardised \d[\d,]* days before; this site allows 30/);
    expect(words(await placeTitrant({ ...STANDARDISED, titrantDate: '2999-01-01' }))).toContain(en.notices['date-in-future']);
    const { titrantDate: _, ...undated } = STANDARDISED;
    expect(words(await placeTitrant(undated))).toContain(en.notices['titrant-age-unknown']);
  });

  test('runs that lie too far apart', async () => {
    const element = await placeTitrant({ ...STANDARDISED, titrantRuns: [run('0.5012 g', '0.00', '24.50'), run('0.4987 g', '0.00', '23.40')] });
    expect(words(element)).toContain('Run another, or strike out');
  });
});

describe('in the panel', () => {
  test('serves every lot until it types a strength of its own', async () => {
    const { titrantStrength: _, ...figures } = sour.figures;
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${{ ...sour, figures }} .site=${STANDARDISED}></esterway-panel>`);
    const titration = find(panel, 'esterway-titration');
    expect(words(titration)).toContain(`${en.titrant.ofSite}: 0.1001 mol/L`);
    expect(titration.value).not.toBe('');
    await enter(titration, en.titrant.ownStrength, '0.2');
    expect(words(titration)).not.toContain(en.titrant.ofSite);
    expect(hasField(titration, en.fields.titrantStrength)).toBe(true);
  });

  test('can be standardised where the titration is done', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
    const titration = find(panel, 'esterway-titration');
    await openPart(titration, en.sections.titrant);
    await choose(find(titration, 'esterway-titrant'), en.choices.titrantKnownFrom, 'standardised');
    expect(panel.site.options['titrantKnownFrom']).toBe('standardised');
  });
});

test.each(['en', 'de'])('is accessible in %s', async (lang) => {
  const element = await placeTitrant(STANDARDISED, lang);
  expect(words(element)).toContain(lang === 'de' ? deTitrant.khp : enTitrant.khp);
  await expectPage(element).to.be.accessible();
});
