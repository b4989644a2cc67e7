import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayTitration, LotEntry } from '../../src/index.js';
import { controls, enter, find, focused, place, settled } from './tools/page.js';
import { lot, nonsense, run, sour } from './tools/lots.js';
import { de, en } from './tools/texts.js';

async function placeForm(entry: LotEntry = lot({}), { required = false, lang = 'en' } = {}) {
  const form = await place<HTMLFormElement>(html`
    <form lang=${lang}>
      <label>Free fatty acid of the load <esterway-titration name="ffa" ?required=${required} .entry=${entry}></esterway-titration></label>
      <button>Send</button>
    </form>
  `);
  return { form, titration: find(form, 'esterway-titration') };
}

const sent = (form: HTMLFormElement) => [...new FormData(form)];

describe('as a field of a form', () => {
  test('it sends the free fatty acid with a point, in any language', async () => {
    expect(sent((await placeForm(sour)).form)).toEqual([['ffa', '4.29']]);
    expect(sent((await placeForm(sour, { lang: 'de' })).form)).toEqual([['ffa', '4.29']]);
  });

  test('it sends nothing while the figure is not known, and follows what is typed', async () => {
    const { form, titration } = await placeForm(lot({ runs: sour.runs }));
    expect(sent(form)).toEqual([]);
    await enter(titration, en.fields.titrantStrength, '0.1023');
    expect(sent(form)).toEqual([['ffa', '4.29']]);
    await enter(titration, en.fields.titrantStrength, '');
    expect(sent(form)).toEqual([]);
  });

  test('it knows its form', async () => {
    const { form, titration } = await placeForm();
    expect(titration.form).toBe(form);
    expect([...form.elements]).toContain(titration);
  });

  test('none of its buttons sends the form', async () => {
    const { form, titration } = await placeForm(sour);
    let submits = 0;
    form.addEventListener('submit', (event) => {
      event.preventDefault();
      submits++;
    });
    for (const control of controls(titration)) if (control.localName === 'button') control.click();
    await settled();
    expect(submits).toBe(0);
    form.requestSubmit();
    expect(submits).toBe(1);
  });

  test('the label around it leads into it', async () => {
    const { form, titration } = await placeForm(sour);
    form.querySelector('label')!.click();
    expect(document.activeElement).toBe(titration);
    expect(focused()).not.toBe(titration);
  });
});

describe('its validity', () => {
  test('required, it is missing until the figure is known', async () => {
    const { form, titration } = await placeForm(lot({ runs: sour.runs }), { required: true });
    const invalid: EventTarget[] = [];
    form.addEventListener('invalid', (event) => invalid.push(event.target!), { capture: true });
    expect(titration.matches(':invalid')).toBe(true);
    expect(form.checkValidity()).toBe(false);
    expect(invalid).toEqual([titration]);
    await enter(titration, en.fields.titrantStrength, '0.1023');
    expect(titration.matches(':valid')).toBe(true);
    expect(form.checkValidity()).toBe(true);
  });

  test('not required, it may stay empty', async () => {
    const { form } = await placeForm();
    expect(form.checkValidity()).toBe(true);
  });

  test('required or not can change', async () => {
    const { form, titration } = await placeForm();
    titration.toggleAttribute('required', true);
    await settled();
    expect(form.checkValidity()).toBe(false);
    titration.removeAttribute('required');
    await settled();
    expect(form.checkValidity()).toBe(true);
  });

  test('a figure that cannot be used makes it invalid, required or not', async () => {
    const { form, titration } = await placeForm({ ...sour, runs: [run('2.504 g', '9.00', '3.72')] });
    expect(form.checkValidity()).toBe(false);
    titration.entry = sour;
    await settled();
    expect(form.checkValidity()).toBe(true);
    titration.entry = nonsense;
    await settled();
    expect(form.checkValidity()).toBe(false);
  });

  test('asked to report, it can take the focus, so that a browser shows where', async () => {
    const { form, titration } = await placeForm(lot({}), { required: true });
    expect(form.reportValidity()).toBe(false);
    expect(document.activeElement).toBe(titration);
  });

  test('moved out of the form, it holds it up no longer', async () => {
    const { form, titration } = await placeForm(lot({}), { required: true });
    document.body.append(titration);
    expect(form.checkValidity()).toBe(true);
    expect(titration.form).toBeNull();
    titration.remove();
  });
});

test('resetting the form gives back what the page had set', async () => {
  const { form, titration } = await placeForm(sour);
  await enter(titration, en.fields.titrantStrength, '0.2');
  expect(sent(form)).not.toEqual([['ffa', '4.29']]);
  form.reset();
  await settled();
  expect(titration.entry).toEqual(sour);
  expect(sent(form)).toEqual([['ffa', '4.29']]);
});

test('two of them are two fields', async () => {
  const form = await place<HTMLFormElement>(html`
    <form>
      <esterway-titration name="intake" .entry=${sour}></esterway-titration>
      <esterway-titration name="second" lang="de"></esterway-titration>
    </form>
  `);
  const second = form.querySelectorAll('esterway-titration')[1] as EsterwayTitration;
  second.entry = { ...lot({ figures: { titrantStrength: '0.1023 mol/L' } }), runs: [run('2.504 g', '0.00', '4.72')] };
  await settled();
  expect(sent(form)).toEqual([['intake', '4.29'], ['second', '5.44']]);
  await enter(second, de.fields.titrantStrength, '');
  expect(sent(form)).toEqual([['intake', '4.29']]);
});
