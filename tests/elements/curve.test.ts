import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { afterEach, describe, expect, test } from 'vitest';
import { deCurve } from '../../src/locales/de-curve.js';
import { enCurve } from '../../src/locales/en-curve.js';
import type { EsterwayCurve, EsterwayPanel, LotEntry } from '../../src/index.js';
import '../../src/more.js';
import { evenSteps, titratedPH } from '../outside/titrated.ts';
import type { Titrated } from '../outside/titrated.ts';
import { button, choose, click, controls, deep, emulate, find, hasField, place, settled, words } from './tools/page.js';
import { lot, sour } from './tools/lots.js';
import { en, fill, plainSpaces } from './tools/texts.js';

/** Takes 4.20 mL. */
const OIL: Titrated = { weak: 0.0042, pKa: 4.8, volume: 100, base: 0.1 };
/** 2.00 mL for the strong acid, 6.00 mL in all. */
const MIXED: Titrated = { strong: 0.002, weak: 0.004, pKa: 6.5, volume: 100, base: 0.1 };

const rows = (titrated: Titrated, last = 6, steps = 120) => evenSteps(last, steps).map((volume) => `${volume.toFixed(3)}\t${titratedPH(titrated, volume).toFixed(2)}`);
const placeCurve = (entry: LotEntry = lot({}), lang = 'en', retest = false) =>
  place<EsterwayCurve>(html`<esterway-curve lang=${lang} .entry=${entry} ?retest=${retest}></esterway-curve>`);
const area = (element: Element) => [...deep(element)].find((one) => one.localName === 'textarea') as HTMLTextAreaElement;
const plot = (element: Element) => [...deep(element)].find((one) => one.matches('svg.curve'));

async function pasted(element: EsterwayCurve, lines: readonly string[]): Promise<string> {
  area(element).value = lines.join('\n');
  area(element).dispatchEvent(new InputEvent('input', { bubbles: true, composed: true }));
  await settled(element);
  return words(element);
}

afterEach(() => emulate());

describe('a pasted curve', () => {
  test('gives its end point in a sentence, and the plot says the same', async () => {
    const element = await placeCurve();
    expect(plot(element)).toBeUndefined();
    expect(await pasted(element, rows(OIL))).toContain('End point 4.20 mL, at pH 8');
    const label = plainSpaces(plot(element)!.getAttribute('aria-label')!);
    expect(label).toMatch(/^Curve of 121 points, 0\.00 to 6\.00 mL and pH 3\.60 to pH 11\.\d\d\. The end point is at 4\.20 mL\.$/);
    expect(words(element)).toContain(enCurve.granNote);
    expect(words(element)).toMatch(/Gran, from the acid before: 4\.2\d mL/);
    expect(plot(element)!.querySelectorAll('.gran')).toHaveLength(2);
  });

  test('of two steps names both', async () => {
    const element = await placeCurve();
    expect(await pasted(element, rows(MIXED, 9))).toMatch(/Two steps\. The first, at (1\.99|2\.0\d) mL, is mineral acid/);
    expect(plot(element)!.querySelectorAll('.step')).toHaveLength(1);
  });

  test('is read as the heading has it, or as chosen', async () => {
    const element = await placeCurve();
    const potential = rows(OIL).map((row) => row.replace(/\t(.*)/, (_, pH: string) => `\t${(59.16 * (7 - Number(pH)) - 20).toFixed(1)}`));
    expect(await pasted(element, ['mL\tmV', ...potential])).toMatch(/End point 4\.20 mL, at −\d+ mV/);
    await choose(element, enCurve.kind, 'pH');
    expect(words(element)).toMatch(/End point 4\.20 mL, at pH −/);
  });

  test('in German, with commas', async () => {
    const element = await placeCurve(lot({}), 'de');
    const text = await pasted(element, ['Volumen;pH', ...rows(OIL).map((row) => row.replace('\t', ';').replaceAll('.', ','))]);
    expect(text).toContain('Endpunkt 4,20 mL, bei pH 8,');
    expect(text).toContain(deCurve.granNote);
    expect(hasField(element, deCurve.kind)).toBe(true);
  });

  test('dropped as a file', async () => {
    const element = await placeCurve();
    const dataTransfer = new DataTransfer();
    dataTransfer.items.add(new File([rows(OIL).join('\n')], 'curve.txt'));
    area(element).dispatchEvent(new DragEvent('dragover', { dataTransfer, bubbles: true, cancelable: true }));
    const left = area(element).dispatchEvent(new DragEvent('drop', { dataTransfer, bubbles: true, cancelable: true }));
    expect(left).toBe(false);
    await expect.poll(() => words(element)).toContain('End point 4.20 mL');
    expect(area(element).value).toBe(rows(OIL).join('\n'));
  });

  test('dropped as a file beyond all measure is refused, and what was there stays', async () => {
    const element = await placeCurve();
    await pasted(element, rows(OIL));
    const dataTransfer = new DataTransfer();
    dataTransfer.items.add(new File([new Uint8Array(5_000_001)], 'film.bin'));
    area(element).dispatchEvent(new DragEvent('drop', { dataTransfer, bubbles: true, cancelable: true }));
    await settled(element);
    expect(words(element)).toContain(fill(enCurve.tooLarge, { most: '5' }));
    expect(words(element)).toContain('End point 4.20 mL');
  });
});

describe('what cannot be read', () => {
  test('is said at its line, and the rest is used', async () => {
    const element = await placeCurve();
    const text = await pasted(element, ['0.001\tNaN', 'x\t7', ...rows(OIL)]);
    expect(text).toContain(fill(enCurve.line, { line: '1', problem: fill(en.problems['not-a-number'], { typed: 'NaN' }) }));
    expect(text).toContain(enCurve.otherLines);
    expect(text).toContain('End point 4.20 mL');
  });

  test('line by line up to five, then counted', async () => {
    const element = await placeCurve();
    const text = await pasted(element, Array.from({ length: 9 }, () => 'some words here'));
    expect(text).toContain(fill(enCurve.moreLines, { lines: '4' }));
    expect(text).not.toContain(enCurve.otherLines);
  });

  test.each([
    ['three points', rows(OIL).slice(0, 3), fill(enCurve.refused['too-few'], { points: '3', least: '7' })],
    ['a curve too short', rows(OIL, 4.2), fill(enCurve.refused['at-edge'], { last: '4.20' })],
    ['a flat one', evenSteps(6, 20).map((volume) => `${volume}\t7.00`), fill(enCurve.refused.flat, { span: '0.00', least: '0.50' })],
    ['noise', [3, 9, 4, 8, 2, 9, 5, 7, 3, 8, 4, 9, 2, 8].map((reading, at) => `${at}\t${reading}`), enCurve.refused['no-step']],
  ])('%s: refused with the remedy, and nothing is lost', async (_, lines, sentence) => {
    const element = await placeCurve();
    expect(await pasted(element, lines)).toContain(sentence);
    expect(area(element).value).toBe(lines.join('\n'));
    expect(controls(element).some((control) => control.matches('.action'))).toBe(false);
    expect(plot(element)).toBeUndefined();
  });

  test('points out of order are sorted, 100 000 thinned, both said', async () => {
    const element = await placeCurve();
    expect(await pasted(element, rows(OIL).toReversed())).toContain(enCurve.remarks.sorted);
    const text = await pasted(element, rows(OIL, 6, 99_999));
    expect(text).toContain('groups of the');
    expect(text).toContain('End point 4.20 mL');
  });
});

describe('the end of a run', () => {
  test('is the end point, and the start is zero where there was none', async () => {
    const element = await placeCurve();
    await pasted(element, rows(OIL));
    const changes: LotEntry[] = [];
    element.addEventListener('esterway-change', ({ entry }) => changes.push(entry));
    await click(button(element, fill(enCurve.use, { run: '1' })));
    expect(changes.map(({ runs }) => runs)).toEqual([[{ start: { text: '0.00', unit: 'mL' }, end: { text: '4.20', unit: 'mL' } }]]);
    expect(words(element)).toContain(fill(enCurve.used, { run: '1', end: '4.20' }));
  });

  test('goes to the first run without one, to the one chosen, and says what it takes the place of', async () => {
    const element = await placeCurve(sour);
    await pasted(element, rows(OIL));
    expect(button(element, fill(enCurve.use, { run: '3' }))).toBeDefined();
    await choose(element, enCurve.run, '0');
    expect(words(element)).toContain(fill(enCurve.replaces, { before: '3.72' }));
    await click(button(element, fill(enCurve.use, { run: '1' })));
    expect(element.entry.runs[0]).toEqual({ ...sour.runs[0], end: { text: '4.20', unit: 'mL' } });
    expect(element.entry.runs[1]).toEqual(sour.runs[1]);
  });

  test('counts on from a start above the curve’s, and is the reading itself where the curve begins there', async () => {
    const element = await placeCurve(sour);
    await pasted(element, rows(OIL));
    await choose(element, enCurve.run, '1'); // starts at 3.72 mL
    expect(words(element)).toContain(fill(enCurve.willBe, { run: '2', start: '3.72', end: '7.92' }));
    await pasted(element, rows(OIL).map((row) => row.replace(/^[\d.]+/, (volume) => (Number(volume) + 3.72).toFixed(2))));
    expect(words(element)).toContain(fill(enCurve.willBe, { run: '2', start: '3.72', end: '7.92' }));
  });

  test('can be taken back in one step', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour}><esterway-curve></esterway-curve></esterway-panel>`);
    const element = find(panel, 'esterway-curve');
    await pasted(element, rows(OIL));
    await choose(element, enCurve.run, '0');
    await click(button(element, fill(enCurve.use, { run: '1' })));
    expect(panel.entry.runs[0]!.end).toEqual({ text: '4.20', unit: 'mL' });
    expect(words(element)).toContain(fill(enCurve.used, { run: '1', end: '4.20' }));
    await click(button(panel, en.panel.undo));
    expect(panel.entry.runs).toEqual(sour.runs);
    expect(words(element)).not.toContain(fill(enCurve.used, { run: '1', end: '4.20' }));
  });

  test('of the retest is that of the retest', async () => {
    const element = await placeCurve(sour, 'en', true);
    expect(words(element)).toContain(enCurve.ofRetest);
    await pasted(element, rows(OIL));
    await click(button(element, fill(enCurve.use, { run: '1' })));
    expect(element.entry.retestRuns).toHaveLength(1);
    expect(element.entry.runs).toEqual(sour.runs);
  });
});

describe('the section', () => {
  test.each(['en', 'de'])('is accessible in %s, with a curve, with faults, and refused', async (lang) => {
    const element = await placeCurve(lot({}), lang);
    await pasted(element, ['NaN\t3', ...rows(MIXED, 9)]);
    await expectPage(element).to.be.accessible();
    await pasted(element, rows(OIL, 4));
    await expectPage(element).to.be.accessible();
  });

  test.each(['en', 'de'])('at 270 pixels nothing is cut off, in %s', async (lang) => {
    const element = await placeCurve(sour, lang);
    element.style.inlineSize = '270px';
    await pasted(element, [`NaN\t${'long'.repeat(30)}`, ...rows(MIXED, 9).map((row) => row.replace(/\t(.*)/, (_, pH: string) => `\t${Math.round(59 * (7 - Number(pH)) - 700)}`))]);
    expect(plot(element)).toBeDefined();
    const { right } = element.getBoundingClientRect();
    for (const part of deep(element)) expect(part.getBoundingClientRect().right, part.outerHTML.slice(0, 80)).toBeLessThanOrEqual(right);
    for (const control of controls(element)) expect(control.getBoundingClientRect().height).toBeGreaterThanOrEqual(44);
  });

  test('in forced colours the parts of the plot are the system’s, and told apart', async () => {
    await emulate({ 'forced-colors': 'active' });
    const element = await placeCurve();
    await pasted(element, rows(OIL));
    const style = (selector: string) => getComputedStyle(plot(element)!.querySelector(selector)!);
    expect(style('.readings').stroke).toBe(style('.axis').stroke);
    expect(style('.end').stroke).not.toBe(style('.readings').stroke);
    expect(style('.hill').fillOpacity).toBe('0.25');
    expect(style('.gran').strokeDasharray).not.toBe('none');
  });

  test('printed keeps plot and sentences, not what was pasted nor the button', async () => {
    const element = await placeCurve();
    await pasted(element, rows(OIL));
    await emulate({}, 'print');
    expect(area(element).checkVisibility()).toBe(false);
    expect(button.bind(undefined, element, fill(enCurve.use, { run: '1' }))).toThrow();
    expect(plot(element)!.checkVisibility()).toBe(true);
    expect(words(element)).toContain('End point 4.20 mL');
  });

  test('folded says its end point, or that there is none', async () => {
    const element = await placeCurve(lot({}), 'de');
    await pasted(element, rows(OIL));
    element.folded = true;
    await settled(element);
    expect(words(element)).toContain(fill(deCurve.summary, { end: '4,20' }));
    await pasted(element, rows(OIL).slice(0, 3));
    expect(words(element)).toContain(deCurve.none);
    expect(words(element)).not.toContain(deCurve.points);
  });
});
