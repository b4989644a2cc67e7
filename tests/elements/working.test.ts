import { html } from 'lit';
import { beforeEach, describe, expect, test } from 'vitest';
import { quantityName } from '../../src/locales/quantity-name.js';
import { en as english } from '../../src/locales/en.js';
import type { EsterwayPanel, EsterwayWorking } from '../../src/index.js';
import { button, choose, click, controls, deep, find, focused, nameOf, place, press, select, settled, words } from './tools/page.js';
import { lot, read, retested, site, sour } from './tools/lots.js';
import { de, en, plainSpaces } from './tools/texts.js';

const MATHML = 'http://www.w3.org/1998/Math/MathML';

const byPart = (element: Element, part: string) => [...deep(element)].find((found) => found.getAttribute('part') === part);
const mathIn = (element: Element) => [...deep(element)].filter((found) => found.localName === 'math');
const nameIn = (key: string) => plainSpaces(quantityName(key, english));

describe('in a panel', () => {
  let panel: EsterwayPanel;
  let working: EsterwayWorking;
  beforeEach(async () => {
    panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${retested}></esterway-panel>`);
    working = find(panel, 'esterway-working');
  });

  test('a figure pressed anywhere opens, unfolds the section and takes the focus', async () => {
    working.folded = true;
    await settled();
    await click(button(find(panel, 'esterway-titration'), '4.29 %'));
    expect(working.of).toBe('freeFattyAcid');
    expect(working.folded).toBe(false);
    expect(words(working)).toContain(nameIn('freeFattyAcid'));
    expect(focused()?.contains(byPart(working, 'formula')!)).toBe(true);
  });

  test('every figure button of the panel opens one', async () => {
    const figures = controls(panel).filter((control) => control.getAttribute('part') === 'figure');
    expect(figures.length).toBeGreaterThan(20);
    const opened = new Set<string>();
    for (const figure of figures) {
      figure.click();
      await settled();
      expect(words(working)).toContain(nameIn(working.of));
      // the figure as reported is what the working comes to
      const shown = parseFloat(nameOf(figure).replace(/\s/g, ''));
      expect(shown).toBeGreaterThan(0);
      opened.add(working.of);
    }
    expect(opened.size).toBeGreaterThan(18);
  });

  test('by keys: from the figure to what it rests on, and back', async () => {
    button(find(panel, 'esterway-titration'), '8.5 mg/g').focus();
    await press('{Enter}');
    expect(working.of).toBe('acidValue');
    const rest = controls(working).find((control) => nameOf(control) === nameIn('acidContent'))!;
    rest.focus();
    await press('{Enter}');
    expect(working.of).toBe('acidContent');
    expect(words(working)).toContain(nameIn('acidContent'));
    button(working, en.working.back).focus();
    await press('{Enter}');
    expect(working.of).toBe('acidValue');
    expect(controls(working).map(nameOf)).not.toContain(en.working.back);
  });

  test('the event goes out to the page as well', async () => {
    const keys: string[] = [];
    document.body.addEventListener('esterway-open', ({ key }) => keys.push(key), { once: true });
    await click(button(find(panel, 'esterway-titration'), '8.5 mg/g'));
    expect(keys).toEqual(['acidValue']);
  });
});

const placeWorking = (of = '', lang = 'en') => place<EsterwayWorking>(html`<esterway-working lang=${lang} of=${of} .entry=${sour}></esterway-working>`);

describe('an open figure', () => {
  test('is its formula as MathML, named for those who hear it, and the figures in it', async () => {
    const element = await placeWorking('run1.sampleMass');
    element.of = 'acidValue';
    await settled();
    const [math] = mathIn(element);
    for (const part of [math!, ...math!.querySelectorAll('*')]) expect(part.namespaceURI).toBe(MATHML);
    expect(math!.querySelectorAll('mi').length).toBeGreaterThan(0);
    expect(byPart(element, 'formula')?.getAttribute('aria-label')).toMatch(/=/);
    const figures = words(byPart(element, 'figures')!);
    expect(figures).toMatch(/\d/);
    expect(figures).not.toMatch(/undefined|NaN|\[object/);
    expect(words(element)).toMatch(/= 8\.5\d* mg\/g/);
  });

  test('can be checked by hand: run 1, (3.72 − 0.00) mL', async () => {
    const text = words(await placeWorking('run1.titre'));
    expect(text).toContain('3.72');
    expect(text).toContain('= 3.72 mL');
  });

  test('has its full value where it was rounded', async () => {
    const element = await placeWorking('acidValue');
    const { value } = read(sour).readings['acidValue']!;
    expect(words(element)).not.toContain(value);
    await click(controls(element).find((control) => control.localName === 'summary')!);
    expect(words(element)).toContain(value);
  });

  test('names its source and what kind of source it is', async () => {
    expect(words(await placeWorking('acidValue'))).toMatch(new RegExp(`${en.working.source}: .*\\((${Object.values(en.marks).join('|')})\\)`));
    expect(words(await placeWorking('directLimit'))).toContain(en.marks.found);
  });

  test.each([
    ['oilMass', en.quantities.oilMass],
    ['titrantMolarity', en.working.givenFrom.entry],
    ['directLimit', en.working.givenFrom.default],
    ['methanolRatio', en.working.givenFrom.default],
  ])('says of %s where it comes from', async (key, words_) => {
    expect(words(await placeWorking(key))).toContain(words_);
  });

  test('of the site says so', async () => {
    const element = await placeWorking('directLimit');
    element.site = site({ figures: { directLimit: '2.00 %' } });
    await settled();
    expect(words(element)).toContain(en.working.givenFrom.site);
    expect(words(element)).toContain('= 2 %');
  });

  test('follows the lot', async () => {
    const element = await placeWorking('run1.titre');
    element.entry = { ...sour, runs: [{ ...sour.runs[0], end: { text: '4.00', unit: 'mL' } }] };
    await settled();
    expect(words(element)).toContain('= 4 mL');
  });

  test('that is not known says why', async () => {
    const element = await placeWorking('acidValue');
    element.entry = lot({});
    await settled();
    expect(words(element)).toContain('titrant strength');
    expect(words(element)).not.toMatch(/undefined|NaN/);
  });

  test('is in German figures on a German page, in the formula too', async () => {
    const element = await placeWorking('run1.acidValue', 'de');
    expect(words(byPart(element, 'figures')!)).toMatch(/\d,\d/);
    expect(words(byPart(element, 'figures')!)).not.toMatch(/\d\.\d/);
    for (const number of deep(element)) if (number.localName === 'mn') expect(number.textContent).not.toContain('.');
    expect(words(element)).toContain(de.working.rests);
  });
});

describe('choosing a figure', () => {
  test('offers all that is worked out, by name', async () => {
    const element = await placeWorking();
    const field = select(element, en.working.choose);
    const options = [...field.options].map(({ value }) => value).filter(Boolean);
    const formulas = Object.entries(read(sour).readings).filter(([, { from }]) => from === 'formula').map(([key]) => key);
    expect(options.toSorted()).toEqual(formulas.toSorted());
    expect([...field.options].slice(1).map(({ text }) => text.trim())).not.toContain('');
    await choose(element, en.working.choose, 'direct.catalyst');
    expect(element.of).toBe('direct.catalyst');
    expect(words(element)).toContain(nameIn('direct.catalyst'));
  });

  test('none is open at first, nor for a key that there is not', async () => {
    for (const of of ['', 'no.such.key', 'constructor', '__proto__']) expect(words(await placeWorking(of))).toContain(en.working.none);
  });
});

test('every reading of a full lot opens', async () => {
  const element = await place<EsterwayWorking>(html`<esterway-working .entry=${retested}></esterway-working>`);
  const keys = Object.entries(read(retested).readings);
  expect(keys.length).toBeGreaterThan(120);
  for (const [key, { from }] of keys) {
    element.of = key;
    await settled(element);
    const text = words(element);
    expect(text, key).toContain(nameIn(key));
    expect(text, key).not.toMatch(/undefined|NaN|\[object|\{\w+\}/);
    expect(mathIn(element), key).toHaveLength(from === 'formula' ? 1 : 0);
  }
});
