import { html } from 'lit';
import { expect, test } from 'vitest';
import { userEvent } from 'vitest/browser';
import type { OptionField } from '../../src/elements/parts/option-field.js';
import type { EsterwayTitration } from '../../src/index.js';
import { click, controls, describedBy, focusedName, hasField, place, press, select, settled } from './tools/page.js';
import { en } from './tools/texts.js';

const WORDS = [['KOH', 'potassium hydroxide'], ['NaOH', 'sodium hydroxide']] as const;

const placeOption = (value = 'NaOH') => place<OptionField>(html`<esterway-option .label=${'Catalyst'} .options=${WORDS} .value=${value}></esterway-option>`);

test('offers the options in words, the value selected', async () => {
  const field = select(await placeOption(), 'Catalyst');
  expect(Array.from(field.options, ({ value, text }) => [value, text])).toEqual(WORDS);
  expect(field.value).toBe('NaOH');
});

test('says what a person chose, by its value', async () => {
  const element = await placeOption();
  const chosen: string[] = [];
  element.addEventListener('option-input', (event) => chosen.push(event.option));
  await userEvent.selectOptions(select(element, 'Catalyst'), 'potassium hydroxide');
  expect(chosen).toEqual(['KOH']);
});

test('follows its value without saying so', async () => {
  const element = await placeOption();
  const chosen: string[] = [];
  element.addEventListener('option-input', (event) => chosen.push(event.option));
  element.value = 'KOH';
  await settled();
  expect(select(element, 'Catalyst').value).toBe('KOH');
  expect(chosen).toEqual([]);
});

test('says what is wrong, tied to the field', async () => {
  const element = await placeOption();
  expect(describedBy(select(element, 'Catalyst'))).toBe('');
  element.note = 'common practice';
  await settled();
  expect(describedBy(select(element, 'Catalyst'))).toBe('common practice');
  element.problem = en.problems['unknown-option'];
  await settled();
  expect(describedBy(select(element, 'Catalyst'))).toBe(en.problems['unknown-option']);
});

test('in a section, keys choose, Enter goes on, Shift+Enter back, and the lot holds the choice', async () => {
  const section = await place<EsterwayTitration>(html`<esterway-titration></esterway-titration>`);
  await click(controls(section).find((control) => control.localName === 'summary')!);
  select(section, en.choices.titrantAlkali).focus();
  await press('{ArrowDown}');
  expect(section.entry.options).toEqual({ titrantAlkali: 'NaOH' });
  await press('{Enter}');
  expect(focusedName()).toBe(en.choices.titrantSolvent);
  await press('{Shift>}{Enter}{/Shift}{Shift>}{Enter}{/Shift}');
  expect(focusedName()).toBe(en.choices.acidKnownFrom);
});

test('an option that opens further fields brings them at once', async () => {
  const section = await place<EsterwayTitration>(html`<esterway-titration></esterway-titration>`);
  await click(controls(section).find((control) => control.localName === 'summary')!);
  expect(hasField(section, en.fields.otherAcidMolarMass)).toBe(false);
  await userEvent.selectOptions(select(section, en.choices.referenceAcid), en.options.referenceAcid.other);
  await settled();
  expect(hasField(section, en.fields.otherAcidMolarMass)).toBe(true);
});
