import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import { amountIn } from '../../src/exchange/amount.js';
import { showNumber } from '../../src/exchange/number-format.js';
import type { EsterwayCharge, EsterwayPanel, LotEntry, SiteProfile } from '../../src/index.js';
import { button, choose, click, controls, deep, enter, find, focused, focusedName, input, place, press, settled, words } from './tools/page.js';
import { certified, clean, figure, lot, outside, read, retested, run, site, sour } from './tools/lots.js';
import { en, fill, plainSpaces } from './tools/texts.js';

const placeCharge = (entry: LotEntry, profile: SiteProfile = site({}), units = 'metric') =>
  place<EsterwayCharge>(html`<esterway-charge units=${units} .entry=${entry} .site=${profile}></esterway-charge>`);

const byPart = (element: Element, part: string) => [...deep(element)].filter((found) => found.getAttribute('part') === part);
const steps = (element: Element) => byPart(element, 'step');
const names = (element: Element) => steps(element).map((step) => step.getAttribute('aria-label'));
/** What a step says to weigh or do, line by line. */
const lines = (step: Element | undefined) => [...(step?.querySelectorAll(':scope > ol > li') ?? [])].map(words);
const radio = (element: Element, name: string) => input(element, name);

/** An amount as the charge writes it. */
function amount(entry: LotEntry, key: string, profile?: SiteProfile, units: 'metric' | 'us' = 'metric'): string {
  const reading = read(entry, profile).readings[key];
  if (reading?.value === undefined || reading.shown === undefined) throw new Error(`${key} is not known`);
  const { text, unit } = amountIn(reading.value, reading.shown, reading.unit, units);
  return plainSpaces(`${showNumber(text, 'en')} ${unit}`);
}

describe('the direct route', () => {
  test('is one step: oil, methanol, catalyst, and how to bring them together', async () => {
    const element = await placeCharge(clean);
    expect(names(element)).toEqual([en.charge.baseStep]);
    const [oil, methanol, catalyst, mix, ...rest] = lines(steps(element)[0]);
    expect(rest).toEqual([]);
    expect(oil).toContain(`${en.charge.forRun['oil-direct']} ${amount(clean, 'oilMass')}`);
    expect(methanol).toContain(amount(clean, 'direct.methanol'));
    expect(methanol).toContain(fill(en.charge.methanolBasis.base, { ratio: '6' }));
    expect(catalyst).toContain(`Potassium hydroxide 90 % ${amount(clean, 'direct.catalyst')}`);
    expect(mix).toBe(en.charge.forRun['mix-methoxide']);
  });

  test('gives a volume where one can be measured, not for a solid', async () => {
    const [oil, methanol, catalyst] = lines(steps(await placeCharge(clean))[0]);
    expect(oil).toContain(amount(clean, 'oilVolume'));
    expect(methanol).toContain(amount(clean, 'direct.methanolVolume'));
    expect(catalyst).not.toMatch(/\d m?L\b/);
  });

  test('shows base and extra apart, and together they are the whole', async () => {
    const [, , catalyst] = lines(steps(await placeCharge(clean))[0]);
    expect(catalyst).toContain(fill(en.charge.parts, { base: amount(clean, 'direct.baseProduct'), extra: amount(clean, 'direct.extraProduct') }));
    const value = (key: string) => Number(read(clean).readings[key]?.value);
    expect(value('direct.baseProduct') + value('direct.extraProduct')).toBeCloseTo(value('direct.catalyst'), 12);
    expect(catalyst).toContain(fill(en.charge.perLitre, { perLitre: read(clean).readings['direct.catalystPerLitre']!.shown!, perKilogram: read(clean).readings['direct.catalystPerKilogram']!.shown! }));
  });

  test('says what to expect', async () => {
    const text = words(await placeCharge(clean));
    for (const key of ['waterShare', 'soap', 'oilLost', 'ester', 'glycerol']) expect(text).toContain(amount(clean, `direct.${key}`));
  });

  test('every amount opens its working', async () => {
    const element = await placeCharge(clean);
    const opened: string[] = [];
    element.addEventListener('esterway-open', ({ key }) => opened.push(key));
    for (const shown of byPart(steps(element)[0]!, 'figure')) (shown as HTMLElement).click();
    expect(opened.slice(0, 5)).toEqual(['oilMass', 'oilVolume', 'direct.methanol', 'direct.methanolVolume', 'direct.catalyst']);
    expect(opened).toEqual(expect.arrayContaining(['direct.baseProduct', 'direct.extraProduct']));
  });
});

describe('a solution of the catalyst', () => {
  const solution = site({ options: { catalyst: 'NaOCH3-solution' } });

  test('has a volume, and its methanol is counted', async () => {
    const element = await placeCharge(clean, solution);
    const [, methanol, catalyst] = lines(steps(element)[0]);
    expect(catalyst).toContain('Sodium methoxide in methanol 30 %');
    expect(catalyst).toContain(amount(clean, 'direct.catalystVolume', solution));
    expect(methanol).toContain(fill(en.charge.methanolCredit, { mass: amount(clean, 'direct.methanolFromCatalyst', solution) }));
  });

  test('too weak, it brings more methanol than is needed, and the charge says so', async () => {
    const weak = site({ options: { catalyst: 'NaOCH3-solution' }, figures: { 'NaOCH3-solution.assay': '1 %' } });
    const [, methanol] = lines(steps(await placeCharge(clean, weak))[0]);
    expect(methanol).toContain(fill(en.charge.methanolExceeds, { mass: amount(clean, 'direct.methanolFromCatalyst', weak) }));
  });

  test('can be chosen for one lot', async () => {
    const element = await placeCharge(clean);
    await click(controls(element).find((control) => control.localName === 'summary')!);
    await choose(element, en.choices.catalyst, 'NaOCH3-solution');
    expect(element.entry.options).toEqual({ catalyst: 'NaOCH3-solution' });
    expect(lines(steps(element)[0])[2]).toContain('Sodium methoxide in methanol 30 %');
  });
});

describe('the two-step route', () => {
  test('is the acid step, the retest and the base step, in order', async () => {
    const element = await placeCharge(sour);
    expect(names(element)).toEqual([en.charge.acidStep, en.charge.baseStep]);
    const [acid, base] = steps(element);
    const [oil, methanol, sulfuric, settle, ...rest] = lines(acid);
    expect(rest).toEqual([]);
    expect(oil).toContain(amount(sour, 'oilMass'));
    expect(methanol).toContain(`${amount(sour, 'pass1.methanol')} `);
    expect(methanol).toContain(amount(sour, 'pass1.methanolVolume'));
    expect(sulfuric).toContain(amount(sour, 'pass1.sulfuric'));
    expect(sulfuric).toContain(amount(sour, 'pass1.sulfuricVolume'));
    expect(settle).toContain('60 °C');
    const [pretreated, more, catalyst] = lines(base);
    expect(pretreated).toContain(amount(sour, 'pretreated.mass'));
    expect(more).toContain(amount(sour, 'twoStep.methanol'));
    expect(catalyst).toContain(amount(sour, 'twoStep.catalyst'));
    const retest = find(element, 'esterway-titration');
    expect(acid!.contains(retest)).toBe(true);
    expect(retest.compareDocumentPosition(base!) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy();
  });

  test('counts the sulfuric acid left in the oil', async () => {
    const [, base] = steps(await placeCharge(sour));
    expect(lines(base)[2]).toContain(fill(en.charge.mineral, { mass: amount(sour, 'twoStep.mineralProduct') }));
  });

  test('takes as many passes as it needs, each a step of its own', async () => {
    const entry = certified('35', { figures: { waterContent: '0.05 %' } });
    const hasty = site({ figures: { pretreatmentTime: '1 min' } });
    const element = await placeCharge(entry, hasty);
    const pass = (n: number) => fill(en.charge.acidStepPass, { pass: String(n), passes: '3' });
    expect(names(element)).toEqual([pass(1), pass(2), pass(3), en.charge.baseStep]);
    const passes = steps(element).slice(0, 3);
    passes.forEach((step, i) => {
      expect(words(step)).toContain(amount(entry, `pass${i + 1}.methanol`, hasty));
      expect(words(step)).toContain(amount(entry, `pass${i + 1}.sulfuric`, hasty));
    });
    // the oil is charged once, and titrated again after the last pass alone
    expect(lines(passes[1]).join(' ')).not.toContain(amount(entry, 'oilMass', hasty));
    expect(passes.map((step) => step.querySelectorAll('esterway-titration').length)).toEqual([0, 0, 1]);
  });

  test('names the basis that the site counts on', async () => {
    const perOil = site({ options: { pretreatmentMethanolBasis: 'per-oil', pretreatmentAcidBasis: 'of-oil' } });
    const [, methanol, sulfuric] = lines(steps(await placeCharge(sour, perOil))[0]);
    expect(methanol).toContain(fill(en.charge.methanolBasis['per-oil'], { ratio: '6' }));
    expect(sulfuric).toContain(fill(en.charge.acidBasis['of-oil'], { share: '1' }));
  });
});

describe('the retest inside the charge', () => {
  const cell = (name: 'sample' | 'start' | 'end') => fill(en.field.cellOf, { run: '1', cell: en.fields[name] });

  test('replaces the estimate', async () => {
    const element = await placeCharge(sour);
    const base = () => steps(element)[1]!;
    expect(words(base())).toContain(en.charge.onEstimate);
    expect(words(base())).toContain(amount(sour, 'twoStep.catalyst'));
    const retest = find(element, 'esterway-titration');
    expect(words(retest)).toContain(en.charge.retestNone);
    await enter(retest, cell('sample'), '5.012');
    await enter(retest, cell('start'), '0.00');
    await enter(retest, cell('end'), '0.62');
    expect(element.entry.retestRuns).toEqual([run('5.012 g', '0.00', '0.62')]);
    expect(words(base())).toContain(en.charge.onRetest);
    expect(words(base())).not.toContain(en.charge.onEstimate);
    const after = { ...sour, retestRuns: [run('5.012 g', '0.00', '0.62')] };
    expect(amount(after, 'twoStep.catalyst')).not.toBe(amount(sour, 'twoStep.catalyst'));
    expect(words(base())).toContain(amount(after, 'twoStep.catalyst'));
    expect(words(retest)).toContain('0.36');
  });

  test('keeps its fields and the focus whatever is typed in it', async () => {
    const element = await placeCharge(sour);
    const retest = find(element, 'esterway-titration');
    input(retest, cell('sample')).focus();
    await press('5.012{Enter}9.50{Enter}9');
    expect(focusedName()).toBe(cell('end'));
    expect((focused() as HTMLInputElement).value).toBe('9');
    await press('.x');
    expect(focusedName()).toBe(cell('end'));
    await press('{Tab}');
    expect(words(find(element, 'esterway-titration'))).toContain('“9.x”');
    await enter(find(element, 'esterway-titration'), cell('end'), '10.12');
    expect(words(steps(element)[1]!)).toContain(en.charge.onRetest);
  });

  test('can be given by a certificate', async () => {
    const element = await placeCharge(sour);
    const retest = find(element, 'esterway-titration');
    await choose(retest, en.choices['retest.acidKnownFrom'], 'certificate-ffa');
    await enter(retest, en.fields['retest.certificateFfa'], '0.4');
    expect(element.entry.figures['retest.certificateFfa']).toEqual(figure('0.4 %'));
    expect(words(steps(element)[1]!)).toContain(en.charge.onRetest);
  });

  test('belongs to the lot of the panel around it', async () => {
    const panel = await place<EsterwayPanel>(html`<esterway-panel .entry=${retested}></esterway-panel>`);
    const retest = find(find(panel, 'esterway-charge'), 'esterway-titration');
    expect(retest.value).toBe('0.36');
    await enter(retest, cell('sample'), '5.000');
    expect(panel.entry.retestRuns[0]?.sample).toEqual(figure('5.000 g'));
  });
});

describe('the route to look at', () => {
  test('is the recommended one, until a person looks at the other', async () => {
    const element = await placeCharge(sour);
    expect(radio(element, en.charge.twoStep).checked).toBe(true);
    await click(radio(element, en.charge.direct).closest('label')!);
    expect(names(element)).toEqual([en.charge.baseStep]);
    expect(words(element)).toContain(amount(sour, 'direct.catalyst'));
    expect(words(element)).toContain(en.charge.notThisRoute);
    await click(radio(element, en.charge.twoStep).closest('label')!);
    expect(words(element)).not.toContain(en.charge.notThisRoute);
    expect(names(element)).toHaveLength(2);
  });

  test('is changed by the arrow keys', async () => {
    const element = await placeCharge(clean);
    radio(element, en.charge.direct).focus();
    await press('{ArrowRight}');
    expect(focused()).toBe(radio(element, en.charge.twoStep));
    expect(names(element)).toEqual([en.charge.acidStep, en.charge.baseStep]);
  });

  test('follows the verdict', async () => {
    const element = await placeCharge(clean);
    expect(radio(element, en.charge.direct).checked).toBe(true);
    element.entry = sour;
    await settled();
    expect(radio(element, en.charge.twoStep).checked).toBe(true);
  });

  test('of a lot outside both routes is not shown without its verdict', async () => {
    expect(words(await placeCharge(outside))).toContain(en.verdicts.outside);
    expect(words(await placeCharge(sour, site({ options: { acidProofEquipment: 'no' } })))).toContain(en.verdicts['no-acid-step']);
  });

  test('chosen for one lot does not stand for the next', async () => {
    const element = await placeCharge(sour);
    await click(radio(element, en.charge.direct).closest('label')!);
    element.entry = { ...sour, name: 'HK-0418' };
    await settled();
    expect(radio(element, en.charge.twoStep).checked).toBe(true);
  });
});

describe('cautions', () => {
  test.each([['direct', clean], ['twoStep', sour]] as const)('of the %s route stand at each step', async (route, entry) => {
    const element = await placeCharge(entry);
    const shown = steps(element);
    const charges = read(entry).charges[route];
    expect(shown).toHaveLength(charges.length);
    charges.forEach(({ cautions }, i) => {
      expect(cautions.length).toBeGreaterThan(2);
      const note = shown[i]!.querySelector('[role=note]')!;
      for (const code of cautions) expect(words(note)).toContain(en.cautions[code]);
    });
  });
});

describe('while something is missing', () => {
  test('it says what, and shows no step', async () => {
    const element = await placeCharge(lot({ figures: { titrantStrength: '0.1023 mol/L' }, runs: sour.runs }));
    expect(steps(element)).toEqual([]);
    expect(words(element)).toContain(fill(en.result.needs, { fields: 'amount of oil' }));
  });

  test('a figure that cannot be used is named', async () => {
    const element = await placeCharge({ ...sour, figures: { ...sour.figures, oilAmount: figure('-900 kg') } });
    expect(words(element)).toContain(fill(en.result.blocked, { field: 'amount of oil' }));
    expect(words(element)).not.toMatch(/NaN|undefined|Infinity/);
  });
});

test('in US units amounts are in pounds and gallons, small ones in grams', async () => {
  const element = await placeCharge(sour, site({}), 'us');
  const text = words(element);
  for (const key of ['oilMass', 'oilVolume', 'pass1.methanol', 'pass1.methanolVolume', 'pass1.sulfuric']) expect(text).toContain(amount(sour, key, undefined, 'us'));
  expect(text).toMatch(/lb/);
  expect(text).toMatch(/US gal/);
  expect(text).toContain('140 °F');
  expect(button(element, amount(sour, 'oilMass', undefined, 'us'))).toBeDefined();
});
