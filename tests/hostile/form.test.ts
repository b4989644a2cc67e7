import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import { button, click, controls, find, focused, focusedName, input, place, press } from '../elements/tools/page.js';
import { sour } from '../elements/tools/lots.js';
import { en } from '../elements/tools/texts.js';

// A panel that somebody has put inside a form, and inside a label.

async function placeInForm() {
  let submits = 0;
  const form = await place<HTMLFormElement>(html`
    <form @submit=${(event: Event) => {
      event.preventDefault();
      submits++;
    }}>
      <label>Delivery <input name="delivery" value="17" />
        <esterway-panel .entry=${sour}></esterway-panel>
      </label>
      <button>Send</button>
    </form>
  `);
  return { form, panel: find(form, 'esterway-panel'), submits: () => submits };
}

describe('inside a form and a label', () => {
  test('Enter in a field goes on and does not send the form', async () => {
    const { panel, submits } = await placeInForm();
    input(panel, en.fields.oilAmount).focus();
    await press('850{Enter}');
    expect(focusedName()).not.toBe(en.fields.oilAmount);
    input(panel, en.lot.name).focus();
    await press('{Enter}');
    expect(submits()).toBe(0);
  });

  test('no button sends it', async () => {
    const { panel, submits } = await placeInForm();
    for (const control of controls(panel)) if (control instanceof HTMLButtonElement && control.getAttribute('part') !== 'action') control.click();
    await click(button(panel, en.panel.newLot));
    await click(button(panel, en.panel.undo));
    expect(submits()).toBe(0);
  });

  test('nothing of the panel is sent', async () => {
    const { form } = await placeInForm();
    expect([...new FormData(form)]).toEqual([['delivery', '17']]);
  });

  test('a click on a field of the panel leaves the focus there', async () => {
    const { panel } = await placeInForm();
    await click(input(panel, en.fields.oilAmount));
    expect(focused()).toBe(input(panel, en.fields.oilAmount));
  });

  test('a click folds once', async () => {
    const { panel } = await placeInForm();
    const fold = controls(find(panel, 'esterway-route')).find((control) => control.hasAttribute('aria-expanded'))!;
    await click(fold);
    expect(find(panel, 'esterway-route').folded).toBe(true);
  });

  test('a choice of the route is one', async () => {
    const { panel } = await placeInForm();
    await click(input(panel, en.charge.direct).closest('label')!);
    expect(input(panel, en.charge.direct).checked).toBe(true);
    expect(input(panel, en.charge.twoStep).checked).toBe(false);
  });
});

test('radio buttons of the page with the same name are left alone', async () => {
  const page = await place(html`<form><input type="radio" name="route" checked /><esterway-panel .entry=${sour}></esterway-panel></form>`);
  await click(input(find(page, 'esterway-panel'), en.charge.direct).closest('label')!);
  expect(page.querySelector('input')!.checked).toBe(true);
});
