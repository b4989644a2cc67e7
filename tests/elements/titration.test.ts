import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayChangeEvent, EsterwayTitration, LotEntry } from '../../src/index.js';
import { button, choose, click, controls, describedBy, enter, hasField, input, nameOf, place, press, settled, words } from './tools/page.js';
import { certified, clean, figure, lot, retested, run, sour } from './tools/lots.js';
import { en, fill } from './tools/texts.js';

const placeTitration = (entry: LotEntry = lot({})) => place<EsterwayTitration>(html`<esterway-titration .entry=${entry}></esterway-titration>`);
const unfold = (element: Element) => click(controls(element).find((control) => control.localName === 'summary')!);
const firstCell = fill(en.field.cellOf, { run: '1', cell: en.fields.sample });

describe('the result', () => {
  test('is acid value and free fatty acid, with what it rests on', async () => {
    const text = words(await placeTitration(sour));
    expect(text).toContain(`8.5 mg/g ± 0.5 mg/g ${en.result.acidValue}`);
    expect(text).toContain(`4.29 % ± 0.27 % ${fill(en.result.ffa, { acid: en.options.referenceAcid.oleic })}`);
    expect(text).toContain(`Mean of 2 runs`);
    expect(text).toContain(fill(en.result.alkali, { alkali: 'KOH' }));
  });

  test('of one run says that no second has checked it', async () => {
    expect(words(await placeTitration({ ...sour, runs: sour.runs.slice(0, 1) }))).toContain(en.notices['one-run']);
  });

  test('stays while the next run is being typed', async () => {
    const element = await placeTitration({ ...sour, runs: [...sour.runs, { sample: figure('2.5 g') }] });
    expect(element.value).toBe('4.29');
    expect(words(element)).toContain(fill(en.notices['run-incomplete'], { run: '3' }));
  });

  test('opens its working', async () => {
    const element = await placeTitration(sour);
    const opened: string[] = [];
    element.addEventListener('esterway-open', ({ key }) => opened.push(key));
    await click(button(element, '8.5 mg/g'));
    await click(button(element, '4.29 %'));
    expect(opened).toEqual(['acidValue', 'freeFattyAcid']);
  });

  test('is announced as it changes', async () => {
    const element = await placeTitration(sour);
    const figures = controls(element).filter((control) => nameOf(control) === '4.29 %');
    expect(figures[0]?.closest('[role=status]')).not.toBeNull();
  });
});

describe('while something is missing', () => {
  test('the fields still to give are named in words', async () => {
    const text = words(await placeTitration());
    for (const field of ['titrantStrength', 'sample', 'start', 'end'] as const) expect(text.toLowerCase()).toContain(en.fields[field].toLowerCase());
    expect(text).not.toMatch(/titrantStrength|run1\.|undefined|NaN/);
  });

  test('one by one they go as they are given', async () => {
    const element = await placeTitration(lot({ runs: [run('2.504 g', '0.00', '3.72')] }));
    expect(words(element)).toContain(fill(en.result.needs, { fields: 'titrant strength' }));
    await enter(element, en.fields.titrantStrength, '0.1023');
    expect(words(element)).not.toContain(fill(en.result.needs, { fields: '' }).slice(0, 10));
    expect(element.value).toBe('4.29');
  });

  test('a figure that must be put right first is named', async () => {
    const element = await placeTitration(sour);
    await enter(element, en.fields.titrantStrength, 'tenth');
    await press('{Enter}');
    expect(words(element)).toContain(fill(en.result.blocked, { field: 'titrant strength' }));
    expect(element.value).toBe('');
  });
});

describe('the blank', () => {
  const withBlank = lot({ figures: { titrantStrength: '0.1023 mol/L', blank: '0.05 mL' }, runs: sour.runs });

  test('beside neutralised solvent is refused, with the way out', async () => {
    const element = await placeTitration(withBlank);
    expect(describedBy(input(element, en.fields.blank))).toBe(en.problems['blank-with-neutralised-solvent']);
    expect(element.value).toBe('');
    await enter(element, en.fields.blank, '');
    expect(element.value).toBe('4.29');
  });

  test('is subtracted where the solvent was titrated for itself', async () => {
    const element = await placeTitration(withBlank);
    await unfold(element);
    await choose(element, en.choices.blankPolicy, 'blank-subtracted');
    expect(describedBy(input(element, en.fields.blank))).toBe('');
    expect(element.value).toBe('4.23');
  });

  test('is not asked for with neutralised solvent', async () => {
    const element = await placeTitration(sour);
    expect(hasField(element, en.fields.blank)).toBe(false);
    await unfold(element);
    await choose(element, en.choices.blankPolicy, 'blank-subtracted');
    expect(hasField(element, en.fields.blank)).toBe(true);
    expect(words(element)).toContain(fill(en.result.needs, { fields: 'blank' }));
  });
});

describe('a certificate in place of a titration', () => {
  test('by acid value', async () => {
    const element = await placeTitration(sour);
    await unfold(element);
    await choose(element, en.choices.acidKnownFrom, 'certificate-acid-value');
    expect(hasField(element, firstCell)).toBe(false);
    expect(hasField(element, en.fields.titrantStrength)).toBe(false);
    await enter(element, en.fields.certificateAcidValue, '8,4');
    expect(words(element)).toContain(en.result.certificate);
    expect(element.value).toBe('4.22');
    // what was titrated is not lost
    await choose(element, en.choices.acidKnownFrom, 'titration');
    expect(element.value).toBe('4.29');
  });

  test('by free fatty acid', async () => {
    const element = await placeTitration(certified('4.30'));
    expect(input(element, en.fields.certificateFfa).value).toBe('4.30');
    expect(element.value).toBe('4.30');
    expect(words(element)).toContain(en.result.certificate);
  });
});

test('g/L and mol/L of the titrant are both understood', async () => {
  const element = await placeTitration(sour);
  await choose(element, fill(en.field.unitOf, { label: en.fields.titrantStrength }), 'g/L');
  expect(input(element, en.fields.titrantStrength).value).toBe('0.1023');
  await enter(element, en.fields.titrantStrength, '5.740');
  expect(element.value).toBe('4.29');
});

test('coconut counted on another acid is remarked', async () => {
  const coconut = { glyceridesBy: 'profile', fat: 'coconut' };
  expect(words(await placeTitration({ ...sour, options: coconut }))).toContain(en.notices['lauric-on-other-basis']);
  expect(words(await placeTitration({ ...sour, options: { ...coconut, referenceAcid: 'lauric' } }))).not.toContain(en.notices['lauric-on-other-basis']);
});

describe('standing alone', () => {
  test('it holds its own lot and says what a person changed', async () => {
    const element = await placeTitration();
    const events: EsterwayChangeEvent[] = [];
    document.body.addEventListener('esterway-change', (event) => events.push(event), { once: true });
    await enter(element, en.fields.titrantStrength, '0.1023');
    expect(events).toHaveLength(1);
    expect(events[0]?.target).toBe(element);
    expect(events[0]?.entry).toBe(element.entry);
    expect(events[0]?.entry).toEqual(lot({ figures: { titrantStrength: '0.1023 mol/L' } }));
    const { reading } = events[0]!;
    expect('faults' in reading ? reading.faults : reading.readings['titrantMolarity']?.value).toBe('0.1023');
  });

  test('setting the entry shows it and says nothing', async () => {
    const element = await placeTitration();
    let events = 0;
    element.addEventListener('esterway-change', () => events++);
    element.entry = sour;
    await settled();
    expect(element.value).toBe('4.29');
    expect(element.entry).toEqual(sour);
    expect(events).toBe(0);
  });

  test('it keeps nothing of a lot when the next is set', async () => {
    const element = await placeTitration(sour);
    await enter(element, en.fields.titrantStrength, '0.1');
    element.entry = clean;
    await settled();
    expect(input(element, en.fields.titrantStrength).value).toBe('0.1023');
    expect(element.value).toBe('1.12');
  });

  test('an entry with parts left out is read as if they were empty', async () => {
    const element = await placeTitration({ version: 1, figures: { titrantStrength: figure('0.1023 mol/L') } } as unknown as LotEntry);
    await enter(element, firstCell, '2.504');
    expect(element.entry).toEqual(lot({ figures: { titrantStrength: '0.1023 mol/L' }, runs: [{ sample: figure('2.504 g') }] }));
  });

  test('as retest it is the titration after the acid step', async () => {
    const element = await place<EsterwayTitration>(html`<esterway-titration retest .entry=${retested}></esterway-titration>`);
    expect(words(element)).toContain(en.charge.retestTitle);
    expect(element.value).toBe('0.36');
    await enter(element, firstCell, '4.000');
    expect(element.entry.retestRuns[0]?.sample).toEqual(figure('4.000 g'));
    expect(element.entry.runs).toEqual(sour.runs);
  });

  test('bare it has no heading', async () => {
    const element = await place<EsterwayTitration>(html`<esterway-titration bare .entry=${sour}></esterway-titration>`);
    expect(words(element)).not.toContain(en.sections.titration);
    expect(words(element)).toContain('4.29');
  });
});
