import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayPanel, EsterwayTitration } from '../../src/index.js';
import { button, choose, click, controls, describedBy, enter, find, focused, focusedName, hasField, input, nameOf, paste, place, press, words } from './tools/page.js';
import { clean, figure, run, sour } from './tools/lots.js';
import { de, en, fill } from './tools/texts.js';
import type { Texts } from './tools/texts.js';

const cell = (row: number, of: 'sample' | 'start' | 'end', texts: Texts = en) => fill(texts.field.cellOf, { run: String(row), cell: texts.fields[of] });

const placeRuns = (lang = 'en', entry?: unknown) =>
  place<EsterwayTitration>(entry ? html`<esterway-titration lang=${lang} .entry=${entry}></esterway-titration>` : html`<esterway-titration lang=${lang}></esterway-titration>`);

describe('typing runs', () => {
  test('the next row appears as the one before it is begun', async () => {
    const element = await placeRuns();
    expect(hasField(element, cell(1, 'sample'))).toBe(true);
    expect(hasField(element, cell(2, 'sample'))).toBe(false);
    await enter(element, cell(1, 'sample'), '2.504');
    expect(hasField(element, cell(2, 'sample'))).toBe(true);
    expect(focusedName()).toBe(cell(1, 'sample'));
  });

  test('a row emptied again goes, and the focus stays', async () => {
    const element = await placeRuns();
    await enter(element, cell(1, 'sample'), '2.504');
    await enter(element, cell(1, 'sample'), '');
    expect(hasField(element, cell(2, 'sample'))).toBe(false);
    expect(focusedName()).toBe(cell(1, 'sample'));
    expect(element.entry.runs).toEqual([]);
  });

  test('Enter goes from cell to cell and from row to row, and keeps trailing zeros', async () => {
    const element = await placeRuns();
    input(element, cell(1, 'sample')).focus();
    await press('2.500{Enter}0.00{Enter}3.70{Enter}');
    expect(focusedName()).toBe(cell(2, 'sample'));
    await press('2.50{Enter}');
    expect(focusedName()).toBe(cell(2, 'start'));
    expect(element.entry.runs).toEqual([run('2.500 g', '0.00', '3.70'), { sample: figure('2.50 g') }]);
    expect(input(element, cell(1, 'start')).value).toBe('0.00');
  });

  test('commas are decimals on a German page, and are shown so', async () => {
    const element = await placeRuns('de', { ...clean, runs: [] });
    input(element, cell(1, 'sample', de)).focus();
    await press('2,504{Enter}0,00{Enter}3,72{Enter}');
    expect(element.entry.runs).toEqual([run('2.504 g', '0.00', '3.72')]);
    expect(input(element, cell(1, 'end', de)).value).toBe('3,72');
    expect(element.value).toBe('4.29');
    expect(words(element)).toContain('4,29');
  });

  test('the arrows change the run and stay in the column', async () => {
    const element = await placeRuns('en', sour);
    input(element, cell(1, 'start')).focus();
    await press('{ArrowDown}');
    expect(focusedName()).toBe(cell(2, 'start'));
    await press('{ArrowDown}');
    expect(focusedName()).toBe(cell(3, 'start'));
    await press('{ArrowDown}');
    expect(focusedName()).toBe(cell(3, 'start'));
    await press('{ArrowUp}{ArrowUp}{ArrowUp}');
    expect(focusedName()).toBe(cell(1, 'start'));
    expect(element.entry).toEqual(sour);
  });

  test('Enter in the empty row at the end leaves the table', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${sour}></esterway-panel>`);
    const table = find(panel, 'table');
    input(panel, cell(3, 'sample')).focus();
    await press('{Enter}');
    const next = focused() as HTMLElement;
    expect(next.hasAttribute('data-field')).toBe(true);
    expect(controls(table)).not.toContain(next);
    await press('{Shift>}{Enter}{/Shift}');
    expect(focusedName()).toBe(cell(3, 'end'));
  });
});

describe('rows from a sheet', () => {
  const rows = '2.504\t0.00\t3.72\r\n2.497\t3.72\t7.44\r\n2.510\t7.44\t11.17\r\n';
  const three = [run('2.504 g', '0.00', '3.72'), run('2.497 g', '3.72', '7.44'), run('2.510 g', '7.44', '11.17')];

  test('three of them fill three runs', async () => {
    const element = await placeRuns('en', { ...clean, runs: [] });
    expect(await paste(input(element, cell(1, 'sample')), rows)).toBe(false);
    expect(element.entry.runs).toEqual(three);
    expect(words(element)).toContain(`Mean of 3 runs`);
    expect(input(element, cell(3, 'end')).value).toBe('11.17');
    expect(hasField(element, cell(4, 'sample'))).toBe(true);
  });

  test('with decimal commas, on a German page', async () => {
    const element = await placeRuns('de');
    await paste(input(element, cell(1, 'sample', de)), rows.replaceAll('.', ','));
    expect(element.entry.runs).toEqual(three);
  });

  test('begin at the cell they are pasted into; what stands to the right of the table is left out', async () => {
    const element = await placeRuns('en', { ...clean, runs: [run('2.504 g', '0.00', '9.99'), run('2.497 g', '9.99', '9.99')] });
    await paste(input(element, cell(1, 'start')), '0.00\t3.72\tby J.\n3.72\t7.44\tby J.');
    expect(element.entry.runs).toEqual(three.slice(0, 2));
  });

  test('a cell that is no figure is kept and said', async () => {
    const element = await placeRuns();
    await paste(input(element, cell(1, 'sample')), '2.504\t0.00\tlost\n');
    expect(element.entry.runs[0]?.end).toEqual({ typed: 'lost', doubt: 'not-a-number', unit: 'mL' });
    expect(input(element, cell(1, 'end')).value).toBe('lost');
    expect(words(find(element, 'table'))).toContain('“lost”');
  });

  test('more than the table holds are cut off at its last run', async () => {
    const element = await placeRuns();
    await paste(input(element, cell(1, 'sample')), '2.504\t0.00\t3.72\n'.repeat(30));
    expect(element.entry.runs).toHaveLength(20);
    expect(hasField(element, cell(20, 'end'))).toBe(true);
    expect(hasField(element, cell(21, 'sample'))).toBe(false);
  });
});

describe('striking out', () => {
  const strike = (n: number) => fill(en.runs.strike, { run: String(n) });
  const restore = (n: number) => fill(en.runs.restore, { run: String(n) });

  test('takes a reason, keeps the run in sight, and can be taken back', async () => {
    const element = await placeRuns('en', { ...sour, runs: [...sour.runs, run('2.501 g', '7.44', '12.00')] });
    const mean = element.value;
    expect(button(element, strike(3)).getAttribute('aria-expanded')).toBe('false');
    await click(button(element, strike(3)));
    expect(button(element, strike(3)).getAttribute('aria-expanded')).toBe('true');
    expect(element.entry.runs[2]?.struck).toBeUndefined();
    await click(button(element, en.runs.strikeReasons[0]!));
    expect(element.entry.runs[2]?.struck).toBe(en.runs.strikeReasons[0]);
    expect(element.value).toBe('4.29');
    expect(element.value).not.toBe(mean);
    expect(input(element, cell(3, 'end')).value).toBe('12.00');
    expect(words(element)).toContain(fill(en.runs.struck, { reason: en.runs.strikeReasons[0]! }));
    expect(words(element)).toContain(`Mean of 2 runs`);

    await click(button(element, restore(3)));
    expect(element.entry.runs[2]).toEqual(run('2.501 g', '7.44', '12.00'));
    expect(element.value).toBe(mean);
  });

  test('by keys', async () => {
    const element = await placeRuns('en', sour);
    button(element, strike(2)).focus();
    await press('{Enter}');
    const reasons = [...en.runs.strikeReasons, en.runs.otherReason];
    expect(controls(element).map(nameOf).filter((name) => reasons.includes(name))).toEqual(reasons);
    button(element, en.runs.otherReason).focus();
    await press(' ');
    expect(element.entry.runs.map(({ struck }) => struck)).toEqual([undefined, en.runs.otherReason]);
  });

  test('of every run leaves no result', async () => {
    const element = await placeRuns('en', { ...sour, runs: [{ ...sour.runs[0], struck: 'spilled' }] });
    expect(element.value).toBe('');
    expect(words(element)).toContain('spilled');
  });

  test('is not offered in the empty row', async () => {
    const element = await placeRuns('en', sour);
    expect(controls(element).map(nameOf)).not.toContain(strike(3));
  });
});

describe('what is wrong in a run', () => {
  test('is said below it when the cell is left, not while typing', async () => {
    const element = await placeRuns('en', { ...sour, runs: [{ sample: figure('2.504 g'), start: figure('3.72 mL') }] });
    const field = input(element, cell(1, 'end'));
    field.focus();
    await press('2');
    expect(words(element)).not.toContain(en.problems['end-below-start']);
    expect(field.getAttribute('aria-invalid')).toBe('false');
    await press('{Enter}');
    expect(words(element)).toContain(en.problems['end-below-start']);
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(describedBy(field)).toBe(en.problems['end-below-start']);
    expect(field.value).toBe('2');
  });

  test('does not touch the runs beside it', async () => {
    const element = await placeRuns('en', { ...sour, runs: [...sour.runs, run('2.5 g', '9', '3')] });
    expect(input(element, cell(3, 'end')).getAttribute('aria-invalid')).toBe('true');
    expect(input(element, cell(2, 'end')).getAttribute('aria-invalid')).toBe('false');
  });

  test('a figure that can mean two things is asked about there', async () => {
    const element = await placeRuns();
    await enter(element, cell(1, 'sample'), '2,504');
    await press('{Enter}');
    expect(words(element)).toContain(fill(en.problems.ambiguous, { typed: '2,504' }));
    await click(button(element, '2.504'));
    expect(element.entry.runs).toEqual([{ sample: figure('2.504 g') }]);
    expect(words(element)).not.toContain('2,504');
  });
});

test('a portion by volume is in mL, what was typed stays', async () => {
  const element = await placeRuns('en', sour);
  await click(controls(element).find((control) => control.localName === 'summary')!);
  await choose(element, en.choices.sampleTakenBy, 'volume');
  expect(element.entry.runs[0]?.sample).toEqual({ text: '2.504', unit: 'mL' });
  expect(hasField(element, en.fields.sampleDensity)).toBe(true);
  await enter(element, cell(3, 'sample'), '2.7');
  expect(element.entry.runs[2]?.sample).toEqual({ text: '2.7', unit: 'mL' });
});

test('each run shows its own acid value, which opens its working', async () => {
  const element = await placeRuns('en', { ...sour, runs: [run('2.504 g', '0.00', '3.72'), run('2.497 g', '0.00', '4.72')] });
  const opened: string[] = [];
  element.addEventListener('esterway-open', ({ key }) => opened.push(key));
  const values = controls(find(element, 'table')).filter((control) => control.getAttribute('part') === 'figure');
  expect(values.map(nameOf)).toEqual(['8.5', '10.8']);
  await click(values[1]!);
  expect(opened).toEqual(['run2.acidValue']);
});
