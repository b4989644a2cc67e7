import { html } from 'lit';
import { expect, test } from 'vitest';
import type { FigureField } from '../../src/elements/parts/figure-field.js';
import { find, focused, input, place, press } from './tools/page.js';

test('what is typed stays as typed while typing', async () => {
  const panel = await place(html`<esterway-lot></esterway-lot>`);
  const field = input(panel, 'Amount of oil');
  field.focus();
  const seen: string[] = [];
  for (const key of '0012,50') {
    await press(key);
    seen.push(field.value);
  }
  expect(seen).toEqual(['0', '00', '001', '0012', '0012,', '0012,5', '0012,50']);
  expect(focused()).toBe(field);
  await press('{Home}{Delete}');
  expect([field.value, field.selectionStart]).toEqual(['012,50', 0]);
  void (find(panel, 'esterway-figure') as FigureField);
});
