import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import { page } from 'vitest/browser';
import type { EsterwayPanel, LotEntry } from '../../src/index.js';
import { button, choose, click, controls, deep, enter, find, focused, hasField, input, nameOf, place, press, settled, words } from './tools/page.js';
import { figure, lot, run, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

const AMOUNT = en.fields.oilAmount;
const WATER = en.fields.waterContent;

const placePanel = (entry: LotEntry = lot({})) => place<EsterwayPanel>(html`<esterway-panel .entry=${entry}></esterway-panel>`);
const undo = (panel: Element) => click(button(panel, en.panel.undo));

describe('undo', () => {
  test('takes a field’s typing back as one step', async () => {
    const panel = await placePanel();
    expect(button(panel, en.panel.undo).disabled).toBe(true);
    input(panel, AMOUNT).focus();
    await press('900{Enter}21{Enter}0.08');
    expect(Object.keys(panel.entry.figures)).toEqual(['oilAmount', 'oilTemperature', 'waterContent']);
    await undo(panel);
    expect(panel.entry.figures).toEqual({ oilAmount: figure('900 kg'), oilTemperature: figure('21 °C') });
    expect(input(panel, WATER).value).toBe('');
    await undo(panel);
    await undo(panel);
    expect(panel.entry).toEqual(lot({}));
    expect(button(panel, en.panel.undo).disabled).toBe(true);
  });

  test('typing on in a field after a step back is a step of its own', async () => {
    const panel = await placePanel();
    await enter(panel, AMOUNT, '900');
    await enter(panel, WATER, '0.08');
    await undo(panel);
    await enter(panel, AMOUNT, '901');
    await undo(panel);
    expect(panel.entry.figures).toEqual({ oilAmount: figure('900 kg') });
  });

  test('takes back pasted rows at once, a run struck out, an option', async () => {
    const panel = await placePanel(sour);
    await choose(panel, fill(en.field.unitOf, { label: AMOUNT }), 't');
    await click(button(panel, fill(en.runs.strike, { run: '2' })));
    await click(button(panel, en.runs.otherReason));
    expect(panel.entry.runs[1]?.struck).toBe(en.runs.otherReason);
    await undo(panel);
    expect(panel.entry.runs).toEqual(sour.runs);
    await undo(panel);
    expect(panel.entry).toEqual(sour);
  });

  test('of a figure chosen among two meanings asks again', async () => {
    const panel = await placePanel();
    await enter(panel, AMOUNT, '1,500');
    await press('{Tab}');
    await click(button(panel, '1500'));
    await undo(panel);
    // choosing belongs to the typing of that field, so both go
    expect(panel.entry.figures['oilAmount']).not.toEqual(figure('1500 kg'));
  });

  test('begins anew with a lot that the page sets', async () => {
    const panel = await placePanel();
    await enter(panel, AMOUNT, '900');
    panel.entry = sour;
    await settled();
    expect(button(panel, en.panel.undo).disabled).toBe(true);
    // the same field as before is a new step all the same
    await enter(panel, AMOUNT, '901');
    await undo(panel);
    expect(panel.entry).toEqual(sour);
  });

  test('tells the page, and those who do not see it', async () => {
    const panel = await placePanel();
    await enter(panel, AMOUNT, '900');
    const entries: LotEntry[] = [];
    panel.addEventListener('esterway-change', ({ entry }) => entries.push(entry));
    await undo(panel);
    expect(entries).toEqual([lot({})]);
    const said = [...deep(panel)].filter((element) => element.getAttribute('role') === 'status').map(words);
    expect(said).toContain(en.panel.undone);
  });
});

describe('a new lot', () => {
  test('keeps titrant and method, and nothing of the oil', async () => {
    const panel = await placePanel({
      ...sour, options: { titrantAlkali: 'NaOH', blankPolicy: 'blank-subtracted' }, figures: { ...sour.figures, blank: figure('0.05 mL') },
      retestRuns: [run('5 g', '0', '1')],
    });
    await click(button(panel, en.panel.newLot));
    expect(panel.entry).toEqual({
      ...lot({ figures: { titrantStrength: '0.1023 mol/L', blank: '0.05 mL' } }), options: { titrantAlkali: 'NaOH', blankPolicy: 'blank-subtracted' },
    });
    expect(input(panel, en.lot.name).value).toBe('');
    expect(words(panel)).toContain(en.panel.newLotDone);
    expect(find(panel, 'esterway-titration').value).toBe('');
  });

  test('can be taken back', async () => {
    const panel = await placePanel(sour);
    await click(button(panel, en.panel.newLot));
    await undo(panel);
    expect(panel.entry).toEqual(sour);
    expect(find(panel, 'esterway-titration').value).toBe('4.29');
  });
});

describe('a lot that cannot be read', () => {
  const newer = { version: 9, figures: {}, surprise: true } as unknown as LotEntry;

  test('says why, and leaves it as it is', async () => {
    const panel = await placePanel(newer);
    await expect.element(page.getByRole('alert')).toHaveTextContent(fill(en.faults['newer-version'], { found: '9' }));
    expect(words(panel)).toContain(en.faults.title);
    expect(hasField(panel, AMOUNT)).toBe(false);
    expect(panel.entry).toBe(newer);
  });

  test('a new one can be begun, and that taken back', async () => {
    const panel = await placePanel(newer);
    await click(button(panel, en.panel.newLot));
    expect(panel.entry).toEqual(lot({}));
    await enter(panel, AMOUNT, '900');
    await undo(panel);
    await undo(panel);
    expect(panel.entry).toBe(newer);
    expect(words(panel)).toContain(en.faults.title);
  });

  test('the next lot from the page is shown as ever', async () => {
    const panel = await placePanel(newer);
    panel.entry = sour;
    await settled();
    expect(find(panel, 'esterway-titration').value).toBe('4.29');
  });

  test.each([
    ['an unknown key', { ...sour, figures: { oilAmonut: figure('9 kg') } }, fill(en.faults['unknown-key'], { path: 'figures.oilAmonut' })],
    ['no version', { figures: {} }, en.faults['unknown-version']],
    ['nothing at all', null, en.faults['not-an-object']],
    ['a word of the wrong kind', { ...sour, name: 417 }, fill(en.faults['wrong-type'], { path: 'name' })],
    ['an option that there is not', { ...sour, options: { catalyst: 'ash' } }, fill(en.faults['unknown-option'], { found: 'ash', path: 'options.catalyst' })],
  ])('%s is named', async (_, entry, sentence) => {
    expect(words(await placePanel(entry as LotEntry))).toContain(sentence);
  });

  test.each(['esterway-lot', 'esterway-titration', 'esterway-route', 'esterway-charge', 'esterway-working', 'esterway-site-values'] as const)('is said in a lone %s too', async (tag) => {
    const section = document.createElement(tag);
    section.entry = newer;
    document.body.append(section);
    await settled();
    expect(words(section)).toContain(fill(en.faults['newer-version'], { found: '9' }));
    section.entry = sour;
    await settled();
    expect(words(section)).not.toContain(en.faults.title);
    section.remove();
  });

  test('parts left out are no fault', async () => {
    const panel = await placePanel({ version: 1, runs: sour.runs } as unknown as LotEntry);
    expect(words(panel)).not.toContain(en.faults.title);
    await enter(panel, en.fields.titrantStrength, '0.1023');
    expect(find(panel, 'esterway-titration').value).toBe('4.29');
  });
});

describe('the lot’s own words', () => {
  test('name, source and date are kept as typed, and head the panel', async () => {
    const panel = await placePanel();
    input(panel, en.lot.name).focus();
    await press('HK-0421{Enter}03042026{Enter}Kitchen round north{Enter}');
    expect(panel.entry).toEqual({ ...lot({}), name: 'HK-0421', date: '2026-03-04', source: 'Kitchen round north' });
    expect(words(find(panel, 'esterway-lot'))).toContain('HK-0421');
    await enter(panel, en.lot.source, '');
    expect(panel.entry).not.toHaveProperty('source');
  });

  test('a date half corrected keeps its other half', async () => {
    const panel = await placePanel(sour);
    const date = input(panel, en.lot.date);
    date.focus();
    await press('{Backspace}');
    expect(panel.entry.date).toBeUndefined();
    await press('05');
    expect(date.value).toBe('2026-05-04');
    expect(panel.entry.date).toBe('2026-05-04');
  });
});

test('actions of the page stand beside the panel’s own', async () => {
  const panel = await place<EsterwayPanel>(html`<esterway-panel><button>Keep in the shift log</button></esterway-panel>`);
  const row = [...deep(panel)].find((element) => element.getAttribute('part') === 'actions')!;
  expect(words(row)).toContain('Keep in the shift log');
  expect(words(row)).toContain(en.panel.print);
});

test('it takes no focus of its own, and fires nothing for what the page sets', async () => {
  let told = 0;
  const count = () => told++;
  for (const type of ['esterway-change', 'esterway-site-change', 'esterway-open']) document.addEventListener(type, count);
  const panel = await placePanel(sour);
  panel.entry = lot({});
  panel.site = { version: 1, figures: {}, options: {} };
  panel.units = 'us';
  await settled();
  for (const type of ['esterway-change', 'esterway-site-change', 'esterway-open']) document.removeEventListener(type, count);
  expect(told).toBe(0);
  expect(focused()).toBe(document.body);
});

test('every control has a name', async () => {
  const panel = await placePanel(sour);
  find(panel, 'esterway-site-values').folded = false;
  await settled();
  for (const control of controls(panel)) expect(nameOf(control), control.outerHTML).not.toBe('');
});
