import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import { userEvent } from 'vitest/browser';
import type { EsterwayLot } from '../../src/index.js';
import { EsterwayUndoEvent } from '../../src/elements/parts/events.js';
import type { FigureField, FigurePasteEvent } from '../../src/elements/parts/figure-field.js';
import { button, choose, click, controls, describedBy, enter, find, focused, focusedName, input, nameOf, paste, place, press, select, settled } from './tools/page.js';
import { lot, site } from './tools/lots.js';
import { de, en } from './tools/texts.js';

const AMOUNT = en.fields.oilAmount;
const TEMPERATURE = en.fields.oilTemperature;
const WATER = en.fields.waterContent;

const placeLot = (lang = 'en') => place<EsterwayLot>(html`<esterway-lot lang=${lang}></esterway-lot>`);
const leave = () => press('{Tab}');

describe('a figure as typed', () => {
  test.each([
    // language, typed, understood, shown after leaving
    ['en', '8.40', '8.40', '8.40'],
    ['en', '8,40', '8.40', '8.40'],
    ['en', '1.500', '1.500', '1.500'],
    ['en', '0,500', '0.500', '0.500'],
    ['en', '900.00', '900.00', '900.00'],
    ['de', '8,40', '8.40', '8,40'],
    ['de', '8.40', '8.40', '8,40'],
    ['de', '1,500', '1.500', '1,500'],
    ['de', '1.234,5', '1234.5', '1234,5'],
  ])('%s: %s is %s', async (lang, typed, text, shown) => {
    const element = await placeLot(lang);
    const label = (lang === 'de' ? de : en).fields.oilAmount;
    await enter(element, label, typed);
    expect(element.entry.figures['oilAmount']).toEqual({ text, unit: 'kg' });
    expect(input(element, label).value).toBe(typed);
    await leave();
    expect(input(element, label).value).toBe(shown);
    expect(input(element, label).getAttribute('aria-invalid')).toBe('false');
  });

  test('stays as typed while typing, the caret where it was', async () => {
    const element = await placeLot();
    const field = input(element, AMOUNT);
    field.focus();
    const seen = new Array<string>();
    for (const key of '0012,50') {
      await press(key);
      seen.push(field.value);
    }
    expect(seen).toEqual(['0', '00', '001', '0012', '0012,', '0012,5', '0012,50']);
    expect(focused()).toBe(field);
    await press('{Home}{Delete}');
    expect([field.value, field.selectionStart]).toEqual(['012,50', 0]);
    expect(element.entry.figures['oilAmount']).toEqual({ text: '12.50', unit: 'kg' });
  });

  test('is gone when the field is emptied', async () => {
    const element = await placeLot();
    await enter(element, AMOUNT, '900');
    await enter(element, AMOUNT, ' ');
    expect(element.entry.figures).toEqual({});
  });

  test('keeps its text when the unit changes', async () => {
    const element = await placeLot();
    await enter(element, AMOUNT, '25,0');
    await choose(element, en.field.unitOf.replace('{label}', AMOUNT), 't');
    expect(element.entry.figures['oilAmount']).toEqual({ text: '25.0', unit: 't' });
    await leave();
    expect(input(element, AMOUNT).value).toBe('25.0');
  });

  test('takes the unit that was chosen before it', async () => {
    const element = await placeLot();
    await choose(element, en.field.unitOf.replace('{label}', AMOUNT), 'US gal');
    expect(element.entry.figures).toEqual({});
    await enter(element, AMOUNT, '240');
    expect(element.entry.figures['oilAmount']).toEqual({ text: '240', unit: 'US gal' });
  });

  test('is not changed by the wheel or the arrow keys', async () => {
    const element = await placeLot();
    await enter(element, AMOUNT, '900');
    await userEvent.wheel(input(element, AMOUNT), { delta: { y: 240 } });
    await press('{ArrowUp}{ArrowDown}');
    expect(input(element, AMOUNT).value).toBe('900');
    expect(element.entry.figures['oilAmount']).toEqual({ text: '900', unit: 'kg' });
  });
});

describe('a figure that can mean two things', () => {
  test.each([
    ['en', '1,500', '1.500', { text: '1.500', unit: 'kg' }],
    ['en', '1,500', '1500', { text: '1500', unit: 'kg' }],
    ['de', '1.500', '1,500', { text: '1.500', unit: 'kg' }],
    ['de', '12.500', '12 500', { text: '12500', unit: 'kg' }],
  ])('%s: of %s, %s is chosen', async (lang, typed, choice, figure) => {
    const element = await placeLot(lang);
    const label = (lang === 'de' ? de : en).fields.oilAmount;
    await enter(element, label, typed);
    expect(element.entry.figures['oilAmount']).toEqual({ typed, doubt: 'ambiguous', unit: 'kg' });
    await leave();
    const field = find(element, 'esterway-figure');
    expect(describedBy(input(element, label))).toContain(typed);
    expect(controls(field).filter((control) => control.localName === 'button')).toHaveLength(2);
    await click(button(element, choice));
    expect(element.entry.figures['oilAmount']).toEqual(figure);
    expect(controls(field).filter((control) => control.localName === 'button')).toEqual([]);
    expect(describedBy(input(element, label))).toBe('');
  });

  test('is chosen by keys alone', async () => {
    const element = await placeLot();
    input(element, AMOUNT).focus();
    await press('1,500{Tab}');
    await press('{Tab}{Tab}{Enter}');
    expect(element.entry.figures['oilAmount']).toEqual({ text: '1500', unit: 'kg' });
  });
});

describe('an error', () => {
  test('is said on leaving, not while typing, and leaves what was typed', async () => {
    const element = await placeLot();
    const field = input(element, AMOUNT);
    field.focus();
    await press('9oo');
    expect(field.getAttribute('aria-invalid')).toBe('false');
    expect(describedBy(field)).toBe('');
    await leave();
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(describedBy(field)).toContain('9oo');
    expect(field.value).toBe('9oo');
    field.focus();
    await press('{End}{Backspace}');
    expect(field.value).toBe('9o');
    expect(field.getAttribute('aria-invalid')).toBe('false');
  });

  test('goes when the figure is put right', async () => {
    const element = await placeLot();
    await enter(element, AMOUNT, '-900');
    await leave();
    expect(describedBy(input(element, AMOUNT))).toBe(en.problems['not-above-zero']);
    await enter(element, AMOUNT, '900');
    await leave();
    expect(describedBy(input(element, AMOUNT))).toBe('');
    expect(input(element, AMOUNT).getAttribute('aria-invalid')).toBe('false');
  });

  test('of a unit that does not fit names the unit that is needed', async () => {
    const element = await placeLot();
    element.entry = lot({ figures: { oilAmount: '900 °C' } });
    await settled();
    expect(describedBy(input(element, AMOUNT))).toContain('°C');
    // the unit that came with the figure is offered too: it is not changed in silence
    expect(select(element, en.field.unitOf.replace('{label}', AMOUNT)).value).toBe('°C');
  });
});

test('Enter goes on and Shift+Enter back, with what is there selected', async () => {
  const element = await placeLot();
  await enter(element, TEMPERATURE, '21');
  input(element, AMOUNT).focus();
  await press('900{Enter}');
  expect(focusedName()).toBe(TEMPERATURE);
  await press('22');
  expect(element.entry.figures['oilTemperature']).toEqual({ text: '22', unit: '°C' });
  await press('{Enter}');
  expect(focusedName()).toBe(WATER);
  await press('{Shift>}{Enter}{/Shift}');
  expect(focusedName()).toBe(TEMPERATURE);
});

test('Enter at the last field stays there', async () => {
  const element = await placeLot();
  const last = controls(element).findLast((control) => control.hasAttribute('data-field')) as HTMLElement;
  last.focus();
  await press('{Enter}');
  expect(focused()).toBe(last);
});

test('while it is empty the site’s figure stands in it, as a placeholder in the page’s language', async () => {
  const element = await placeLot('de');
  expect(input(element, de.fields.waterContent).placeholder).toBe('0,10');
  element.site = site({ figures: { waterContent: '0.250 %' } });
  await settled();
  expect(input(element, de.fields.waterContent).placeholder).toBe('0,250');
  expect(input(element, de.fields.waterContent).value).toBe('');
});

test('a step taken back from outside drops what was being typed', async () => {
  const element = await placeLot();
  await enter(element, AMOUNT, '900');
  await enter(element, WATER, '0,08');
  element.dispatchEvent(new EsterwayUndoEvent());
  await settled();
  expect(input(element, WATER).value).toBe('');
  await enter(element, AMOUNT, '9oo');
  element.entry = lot({ figures: { oilAmount: '850.0 kg' } });
  await settled();
  expect(input(element, AMOUNT).value).toBe('850.0');
});

describe('rows pasted from a sheet', () => {
  const listened = async () => {
    const field = await place<FigureField>(html`<esterway-figure .label=${'Sample'}></esterway-figure>`);
    const pasted: FigurePasteEvent['rows'][] = [];
    field.addEventListener('figure-paste', (event) => {
      pasted.push(event.rows);
      event.preventDefault();
    });
    return { field, pasted };
  };

  test('come as rows and cells, whatever ends the lines', async () => {
    const { field, pasted } = await listened();
    const left = await paste(input(field, 'Sample'), '2.504\t0,00\t3.72\r\n2.497\t3.72\t7.44\r\n');
    expect(pasted).toEqual([[['2.504', '0,00', '3.72'], ['2.497', '3.72', '7.44']]]);
    expect(left).toBe(false);
  });

  test('a single figure is pasted as any text', async () => {
    const { field, pasted } = await listened();
    const left = await paste(input(field, 'Sample'), '2.504\r\n');
    expect(pasted).toEqual([]);
    expect(left).toBe(true);
  });
});

test('every field of a lot has a name, and no two have the same', async () => {
  const names = controls(await placeLot()).map(nameOf);
  expect(names).not.toContain('');
  expect(new Set(names).size).toBe(names.length);
});
