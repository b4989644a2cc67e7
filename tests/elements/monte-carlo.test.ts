import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { afterEach, describe, expect, test } from 'vitest';
import { EMPTY_SITE } from '../../src/core.js';
import type { EsterwayWorking, LotEntry } from '../../src/index.js';
import { SectionElement } from '../../src/elements/parts/section.js';
import { monteCarlo } from '../../src/lot/monte-carlo.js';
import type { MonteCarloOrder, MonteCarloReport } from '../../src/lot/monte-carlo.js';
import { deMonteCarlo } from '../../src/locales/de-monte-carlo.js';
import { enMonteCarlo } from '../../src/locales/en-monte-carlo.js';
import { MonteCarloCheck } from '../../src/elements/working/monte-carlo.js';
import { button, click, controls, deep, emulate, find, focused, nameOf, openPart, place, settled, words } from './tools/page.js';
import { certified, clean, lot, run, site, sour } from './tools/lots.js';
import { en, fill, plainSpaces } from './tools/texts.js';

/** A section with nothing in it but the check. */
@customElement('check-section')
class CheckSection extends SectionElement {
  static override styles = [...SectionElement.styles, ...MonteCarloCheck.styles];
  @property() of = 'freeFattyAcid';
  readonly #check = new MonteCarloCheck(this, {
    entry: () => this.desk.entry, site: () => this.desk.site, texts: () => this.textsOf({ en: enMonteCarlo, de: deMonteCarlo }), number: (text) => this.number(text),
  });
  protected override heading = 'Check';
  protected override body = () => this.#check.render(this.of);
}

const placeCheck = (entry: LotEntry, of = 'freeFattyAcid', lang = 'en', profile = EMPTY_SITE) =>
  place<CheckSection>(html`<check-section lang=${lang} of=${of} .site=${profile} .entry=${entry}></check-section>`);

/** Waits until the words of the section, as it renders anew, hold a text. */
async function said(element: Element, text: string): Promise<void> {
  await expect.poll(() => words(element), { timeout: 15_000 }).toContain(text);
  await settled();
}

const texts = enMonteCarlo;
const agreed = texts.verdicts.agrees.split(':')[0]!;
const svg = (element: Element) => [...deep(element)].find(({ localName }) => localName === 'svg')!;
const cells = (element: Element) => [...deep(element)].filter((one) => one.matches('tbody tr')).map((row) => [...row.children].map((cell) => cell.textContent.replace(/\s/g, ' ')));

const original = globalThis.Worker;
afterEach(async () => {
  globalThis.Worker = original;
  await emulate();
});

describe('a check', () => {
  test('draws beside the page when asked, and sets both ways side by side', async () => {
    const element = await placeCheck(sour);
    expect(controls(element).map(nameOf)).toContain(texts.start);
    expect(words(element)).not.toContain(texts.firstOrder);
    await click(button(element, texts.start));
    await said(element, agreed);
    const rows = cells(element);
    expect(rows.map(([name]) => name)).toEqual([texts.mean, texts.u, texts.interval, texts.shortest, fill(texts.below, { limit: '3 %' })]);
    const [first, drawn] = rows[1]!.slice(1).map(parseFloat);
    // the u of 200 000 draws is sure to 0.2 % of itself, 0.0002 %, and the two are shown to a digit of 0.001 %
    expect(Math.abs(first! - drawn!)).toBeLessThanOrEqual(0.0021);
    expect(rows[4]!.slice(1)).toEqual(['0.0 %', '0.0 %']);
    expect(words(element)).toContain(fill(texts.how, { draws: '200 000', seed: '1', error: '0.0002 %' }));
    expect(button(element, texts.again)).toBe(focused());
  });

  test('is void once the lot is another', async () => {
    const element = await placeCheck(sour);
    await click(button(element, texts.start));
    await said(element, agreed);
    element.entry = clean;
    await settled();
    expect(words(element)).not.toContain(agreed);
    expect(controls(element).map(nameOf)).toContain(texts.start);
  });

  test('drawn again takes the next seed and gives nearly the same', async () => {
    const element = await placeCheck(sour);
    await click(button(element, texts.start));
    await said(element, fill(texts.how.split(':')[0]!, { draws: '200 000', seed: '1' }));
    const before = cells(element);
    await click(button(element, texts.again));
    await said(element, fill(texts.how.split(':')[0]!, { draws: '200 000', seed: '2' }));
    const [u, again] = [before, cells(element)].map((rows) => parseFloat(rows[1]![2]!));
    expect(Math.abs(again! - u!)).toBeLessThanOrEqual(0.0021);
  });

  test('says what it draws: progress with words, and can be stopped', async () => {
    const silent = new Blob(['']);
    globalThis.Worker = class extends original {
      constructor() {
        super(URL.createObjectURL(silent));
      }
    };
    const element = await placeCheck(sour);
    await click(button(element, texts.start));
    expect(words(element)).toContain(fill(texts.done, { done: '0', draws: '200 000' }));
    const progress = [...deep(element)].find(({ localName }) => localName === 'progress')!;
    expect(progress.getAttribute('aria-label')).toBe(texts.progress);
    expect(focused()).toBe(button(element, texts.stop));
    await click(button(element, texts.stop));
    expect(words(element)).not.toContain(fill(texts.done, { done: '0', draws: '200 000' }));
    expect(focused()).toBe(button(element, texts.start));
  });

  test('near a limit gives the share of the draws below it, and draws the limit', async () => {
    const element = await placeCheck(sour, 'freeFattyAcid', 'en', site({ figures: { directLimit: '4.3 %' } }));
    await click(button(element, texts.start));
    await said(element, agreed);
    const [first, drawn] = cells(element)[4]!.slice(1).map(parseFloat);
    expect(first).toBeGreaterThan(50);
    expect(Math.abs(first! - drawn!)).toBeLessThan(1.5);
    expect(svg(element).querySelector('.limit')).not.toBeNull();
    const limit = fill(texts.limitIn, { limit: '4.3 %' });
    expect(plainSpaces(svg(element).getAttribute('aria-label')!)).toContain(limit);
    expect(words(element)).toContain(limit);
  });

  test('in German', async () => {
    const element = await placeCheck(sour, 'acidValue', 'de');
    await click(button(element, deMonteCarlo.start));
    await said(element, deMonteCarlo.verdicts.agrees.split(':')[0]!);
    expect(words(element)).toContain('mg/g');
    expect(cells(element)[1]![1]).toMatch(/^0,\d{3} mg\/g$/);
  });

  test('that finds a narrower interval than the first order says so', async () => {
    // one rectangular source and nothing else: its 95 % interval ends at 0.95 √3 u, not at 1.96 u
    const element = await placeCheck(certified('8.0'));
    await click(button(element, texts.start));
    await said(element, texts.verdicts.wider.split(':')[0]!);
  });
});

describe('what the worker says', () => {
  /** A worker that answers every order with one report. */
  const answering = (report: (order: MonteCarloOrder) => MonteCarloReport): void => {
    globalThis.Worker = class extends EventTarget {
      postMessage(order: MonteCarloOrder): void {
        this.dispatchEvent(new MessageEvent('message', { data: report(order) }));
      }
      terminate(): void {
        // nothing runs
      }
    } as unknown as typeof Worker;
  };

  test('of an interval that the first order misses stands in a box, with what to go by', async () => {
    answering((order) => {
      const made = monteCarlo({ ...order, draws: 1000 })!;
      const ffa = made.results['freeFattyAcid']!;
      return { result: { ...made, draws: 1010, results: { freeFattyAcid: { ...ffa, symmetric: [ffa.symmetric[0] - 1, ffa.symmetric[1]] } } } };
    });
    const element = await placeCheck(sour);
    await click(button(element, texts.start));
    const box = [...deep(element)].find((one) => one.matches('[role=status] > .gate'))!;
    expect(words(box)).toMatch(/^The two ways differ: the ends of their intervals lie up to \d(\.\d)? % apart, .* 0\.05 %/);
    expect(words(element)).toContain(fill(texts.valueless, { count: '199 000' }));
  });

  test('of an error is told, and it can be tried again', async () => {
    answering(() => ({ error: 'RangeError: too much' }));
    const element = await placeCheck(sour);
    await click(button(element, texts.start));
    expect(words(element)).toContain(fill(texts.failed, { error: 'RangeError: too much' }));
    globalThis.Worker = original;
    await click(button(element, texts.again));
    await said(element, agreed);
  });
});

describe('where the page allows no worker', () => {
  const refusing = [
    ['at once', () => {
      globalThis.Worker = function refuse() {
        throw new DOMException('not from a file', 'SecurityError');
      } as unknown as typeof Worker;
    }],
    ['later', () => {
      globalThis.Worker = class extends original {
        constructor() {
          super('/nothing/here.js');
        }
      };
    }],
  ] as const;

  test.each(refusing)('%s, it is said, and the draws are made in the page', async (_, refuse) => {
    refuse();
    const element = await placeCheck(lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('2.5 g', '0', '3.7')] }));
    await click(button(element, texts.start));
    await said(element, texts.noWorker);
    const offer = button(element, texts.inPage);
    expect(focused()).toBe(offer);
    await click(offer);
    await said(element, agreed);
    // the same seed, so the same figures as in a worker
    const drawn = cells(element);
    globalThis.Worker = original;
    const other = await placeCheck(element.entry);
    await click(button(other, texts.start));
    await said(other, agreed);
    expect(cells(other)).toEqual(drawn);
  });
});

test('a result of which too little is known is not drawn', async () => {
  const element = await placeCheck(lot({}));
  await click(button(element, texts.start));
  await said(element, texts.notKnown);
});

test('axe finds nothing, neither under way nor at the end, in the light or in the dark', async () => {
  for (const scheme of ['light', 'dark']) {
    document.documentElement.style.colorScheme = scheme;
    const element = await placeCheck(sour);
    button(element, texts.start).click();
    await settled();
    await expectPage(element).to.be.accessible();
    await said(element, agreed);
    await expectPage(element).to.be.accessible();
  }
  document.documentElement.style.colorScheme = '';
});

test('in forced colours the drawing is in the system’s, and its parts are told apart', async () => {
  await emulate({ 'forced-colors': 'active' });
  const element = await placeCheck(sour, 'freeFattyAcid', 'en', site({ figures: { directLimit: '4.3 %' } }));
  await click(button(element, texts.start));
  await said(element, agreed);
  const style = (selector: string) => getComputedStyle(svg(element).querySelector(selector)!);
  expect(style('.beyond').fill).toBe('none');
  expect(style('.pile:not(.beyond)').fill).not.toBe('none');
  expect(style('.limit').stroke).not.toBe(style('.end').stroke);
});

test('under an opened figure, at 270 pixels, nothing is cut off', async () => {
  const element = await place<EsterwayWorking>(html`<esterway-working of="direct.methanol" .entry=${sour}></esterway-working>`);
  element.style.inlineSize = '270px';
  await openPart(element, en.budget.simulation);
  await click(button(element, texts.start));
  await said(element, texts.verdicts.wider.split(':')[0]!);
  const right = element.getBoundingClientRect().right;
  const check = find(element, 'esterway-simulation').shadowRoot!.querySelector('.check')!;
  expect(svg(check).getBoundingClientRect().width).toBeGreaterThan(180);
  for (const part of deep(check)) expect(part.getBoundingClientRect().right, part.outerHTML.slice(0, 80)).toBeLessThanOrEqual(right);
});
