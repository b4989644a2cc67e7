import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import '../../src/intake-book.js';
import type { EsterwayHistory } from '../../src/intake-book.js';
import { deHistory } from '../../src/locales/de-history.js';
import { enHistory } from '../../src/locales/en-history.js';
import type { HistoryPoint } from '../../src/lot/history.js';
import { button, choose, click, emulate, place, words } from './tools/page.js';
import { fill } from './tools/texts.js';

const series = (...values: number[]): readonly HistoryPoint[] =>
  values.map((value, i) => ({ date: `2026-03-${String(i + 1).padStart(2, '0')}`, id: String(i), name: `L${i + 1}`, freeFattyAcid: String(value), acidValue: String(value * 2), water: '0.1' }));
const STEADY = [4, 5, 4.5, 4, 5, 4.2, 4.8, 4.5, 4.1, 5];
const placeHistory = (points: readonly HistoryPoint[], lang = 'en') => place<EsterwayHistory>(html`<esterway-history lang=${lang} source="Kitchen round" .points=${points}></esterway-history>`);
const drawn = (element: EsterwayHistory): readonly Element[] => [...element.shadowRoot!.querySelectorAll('svg[role=img]')];

afterEach(async () => {
  await emulate();
});

describe('the history of a source', () => {
  test('is told in words and drawn, individuals and moving range', async () => {
    const element = await placeHistory(series(...STEADY));
    expect(words(element)).toContain(enHistory.steady);
    expect(words(element)).toMatch(/Mean of 10 lots 4\.51 %; a lot between 2\.\d\d and 6\.\d\d %/);
    expect(drawn(element)).toHaveLength(2);
    expect(drawn(element)[0]!.querySelectorAll('.lot')).toHaveLength(10);
  });

  test('marks the lots that signal by shape, and says which and what to do', async () => {
    const element = await placeHistory(series(...STEADY, 12));
    expect(words(element)).toContain('above the upper limit');
    expect(words(element)).toContain(enHistory.ask);
    // the last lot stands out; it also draws the mean above the ten before it, which is said, too
    expect(drawn(element)[0]!.querySelectorAll('.lot, rect.out')[10]!.localName).toBe('rect');
    expect(words(element)).toContain('nine lots or more in a row below the mean');
  });

  test('of water, when asked', async () => {
    const element = await placeHistory(series(...STEADY));
    await choose(element, enHistory.figure, 'water');
    expect(words(element)).toContain('Mean of 10 lots 0.10 %');
  });

  test('of few lots has no limits yet, of none says so', async () => {
    expect(words(await placeHistory(series(4, 5)))).toContain(fill(enHistory.few, { lots: '2', fewest: '8' }));
    expect(words(await placeHistory([]))).toContain(enHistory.empty);
  });

  test('gives the acid value to plan the next titration with', async () => {
    const element = await placeHistory(series(...STEADY));
    await click(button(element, fill(enHistory.plan, { value: '9.0' })));
    expect(element.entry.figures['expectedAcidValue']).toEqual({ text: '9.0', unit: 'mg/g' });
    expect(words(element)).toContain(fill(enHistory.planned, { value: '9.0' }));
    expect(button(element, fill(enHistory.plan, { value: '9.0' })).disabled).toBe(true);
  });

  test.each(['en', 'de'])('is accessible in %s, light and dark, and fits 270 pixels', async (lang) => {
    const element = await placeHistory(series(...STEADY, 12), lang);
    expect(words(element)).toContain(lang === 'de' ? deHistory.ask : enHistory.ask);
    element.style.inlineSize = '270px';
    await element.updateComplete;
    expect(element.scrollWidth).toBeLessThanOrEqual(270);
    await expectPage(element).to.be.accessible();
    await emulate({ 'prefers-color-scheme': 'dark' });
    await expectPage(element).to.be.accessible();
  });
});
