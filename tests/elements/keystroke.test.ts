import { html } from 'lit';
import { expect, test } from 'vitest';
import { find, input, place, select, settled, words } from './tools/page.js';
import { retested, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

// What is typed is read before the next picture is painted: results, route and charge together.

const nextFrame = () => new Promise(requestAnimationFrame);

const type = (field: HTMLInputElement, text: string) => {
  field.value = text;
  field.dispatchEvent(new InputEvent('input', { bubbles: true, composed: true }));
};

test('a keystroke is worked out within the next frame', async () => {
  const panel = await place(html`<esterway-panel .entry=${{ ...sour, runs: sour.runs.slice(0, 1) }}></esterway-panel>`);
  const end = input(panel, fill(en.field.cellOf, { run: '1', cell: en.fields.end }));
  expect(words(find(panel, 'esterway-route'))).toContain(en.verdicts['two-step']);
  type(end, '0.97');
  await nextFrame();
  expect(words(find(panel, 'esterway-titration'))).toContain('1.12 %');
  expect(words(find(panel, 'esterway-route'))).toContain(en.verdicts.direct);
  expect(words(find(panel, 'esterway-charge'))).not.toContain(en.charge.acidStep);
  type(end, '0.9');
  await nextFrame();
  expect(words(find(panel, 'esterway-titration'))).toContain('1.04 %');
});

test('so is one in the retest, and a choice', async () => {
  const panel = await place(html`<esterway-panel .entry=${retested}></esterway-panel>`);
  const retest = find(find(panel, 'esterway-charge'), 'esterway-titration');
  type(input(retest, fill(en.field.cellOf, { run: '2', cell: en.fields.end })), '2.25');
  await nextFrame();
  expect(words(retest)).toContain('0.65 %');
  const unit = select(panel, fill(en.field.unitOf, { label: en.fields.oilAmount }));
  unit.value = 'lb';
  unit.dispatchEvent(new Event('change', { bubbles: true }));
  await nextFrame();
  expect(words(find(panel, 'esterway-charge'))).toContain('408.2 kg');
  await settled();
});

test('while the working is open and all the site values too', async () => {
  const panel = await place(html`<esterway-panel .entry=${sour}></esterway-panel>`);
  find(panel, 'esterway-site-values').folded = false;
  find(panel, 'esterway-working').of = 'oilMass';
  await settled();
  type(input(panel, en.fields.oilAmount), '1234');
  await nextFrame();
  expect(words(find(panel, 'esterway-working'))).toContain('= 1234 kg');
  expect(words(find(panel, 'esterway-charge'))).toContain('1234 kg');
});
