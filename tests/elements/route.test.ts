import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import { page } from 'vitest/browser';
import type { EsterwayRoute, LotEntry, SiteProfile } from '../../src/index.js';
import { click, controls, deep, nameOf, place, words } from './tools/page.js';
import { certified, lot, run, site } from './tools/lots.js';
import { de, en, fill } from './tools/texts.js';

const placeRoute = (entry: LotEntry, profile: SiteProfile = site({}), lang = 'en') =>
  place<EsterwayRoute>(html`<esterway-route lang=${lang} .entry=${entry} .site=${profile}></esterway-route>`);

/** The verdict and its reasons, as they are announced. */
const said = (element: Element) => words([...deep(element)].find((part) => part.getAttribute('role') === 'status')!);

const dry = { figures: { waterContent: '0.05 %' } };
const noAcid = site({ options: { acidProofEquipment: 'no' } });

describe('the verdict', () => {
  test.each([
    ['direct', certified('1.20', dry), site({}), fill(en.reasons['at-or-below-direct-limit'], { ffa: '1.20', limit: '3.0' })],
    ['direct', certified('2.80', dry), site({}), fill(en.reasons['at-or-below-direct-limit'], { ffa: '2.80', limit: '3.0' })],
    ['direct', certified('0.30', dry), site({}), fill(en.reasons['extra-negligible'], { limit: '0.50' })],
    ['two-step', certified('4.30', dry), site({}), fill(en.reasons['above-direct-limit'], { ffa: '4.30', limit: '3.0' })],
    ['outside', certified('60', dry), site({}), fill(en.reasons['above-pretreatment-limit'], { ffa: '60.0', limit: '40' })],
    ['no-acid-step', certified('4.30', dry), noAcid, en.reasons['no-acid-proof-equipment']],
    ['not-known', lot({}), site({}), en.reasons['ffa-not-known']],
  ] as const)('%s', async (verdict, entry, profile, reason) => {
    const text = said(await placeRoute(entry, profile));
    expect(text).toContain(en.verdicts[verdict]);
    expect(text).toContain(reason);
    const others = Object.entries(en.verdicts).filter(([code]) => code !== verdict);
    for (const [, words] of others) expect(text).not.toContain(words);
  });

  test('follows the site’s own limits, written as the site wrote them', async () => {
    const strict = site({ figures: { directLimit: '1.00 %' } });
    const text = said(await placeRoute(certified('1.20', dry), strict));
    expect(text).toContain(en.verdicts['two-step']);
    expect(text).toContain(fill(en.reasons['above-direct-limit'], { ffa: '1.20', limit: '1.00' }));
  });

  test('just beyond a limit never shows two equal figures', async () => {
    const text = said(await placeRoute(certified('3.004', dry)));
    const [ffa, limit] = [...text.matchAll(/(\d+\.\d+) %/g)].map(([, figure]) => Number(figure));
    expect(ffa).toBeGreaterThan(limit!);
  });

  test('of an unknown lot says what is still to give', async () => {
    expect(said(await placeRoute(lot({})))).toContain('titrant strength');
  });

  test('that the acid step will not bring to the target says so', async () => {
    const hasty = site({ figures: { pretreatmentTime: '1 min' } });
    const text = said(await placeRoute(certified('35', dry), hasty));
    expect(text).toContain(en.verdicts['two-step']);
    expect(text).toMatch(new RegExp(fill(en.reasons['pretreatment-misses-target'], { passes: '3', left: '\\d+\\.\\d+', target: '1\\.0' })));
  });
});

describe('a close call', () => {
  const close = certified('3.0', dry); // ± 5 % of a certificate is ± 0.15 % here

  test('names the safe route, how likely either side is, and that no run would settle a certificate', async () => {
    const text = said(await placeRoute(close));
    expect(text).toContain(en.verdicts['too-close']);
    expect(text).toContain(en.verdicts['two-step']);
    expect(text).toContain(fill(en.route.odds, { limit: '3.0', below: '50', above: '50' }));
    expect(text).toContain(fill(en.reasons['no-runs-settle'], { source: en.quantities['u.certificate'] }));
  });

  test('of scattered runs tells how many more would do', async () => {
    // 2.90 % by two runs: r = 0.117 X leaves u = 0.086 % of scatter, a good burette hardly anything; four runs make it 0.061 %, 1.645 times that is 0.100 %
    const runs = [run('2.500 g', '0.00', '2.56'), run('2.500 g', '2.56', '5.12')];
    const good = site({ options: { burette: 'A-10' } });
    const text = said(await placeRoute(lot({ figures: { titrantStrength: '0.1000 mol/L', waterContent: '0.05 %', oilAmount: '900 kg' }, runs }), good));
    expect(text).toContain(en.verdicts['too-close']);
    expect(text).toContain(fill(en.reasons['more-runs-settle'], { runs: '2' }));
  });
});

describe('the water gate', () => {
  test.each([
    ['1.20', '0.25', 'dry-before-base-step', '0.10'],
    ['4.30', '0.80', 'dry-before-acid-step', '0.50'],
  ] as const)('at %s % FFA and %s % water', async (ffa, water, code, limit) => {
    const text = said(await placeRoute(certified(ffa, { figures: { waterContent: `${water} %` } })));
    expect(text).toContain(fill(en.reasons[code], { water, limit }));
  });

  test('is open to dry oil', async () => {
    const text = said(await placeRoute(certified('4.30', { figures: { waterContent: '0.50 %' } })));
    expect(text).not.toContain(en.reasons['dry-before-acid-step'].split('{')[0]);
    expect(text).not.toContain(en.reasons['water-not-measured'].split('{')[0]);
  });

  test('counts water in mg/kg too', async () => {
    const text = said(await placeRoute(certified('1.20', { figures: { waterContent: '2500 mg/kg' } })));
    expect(text).toContain(fill(en.reasons['dry-before-base-step'], { water: '0.25', limit: '0.10' }));
  });

  test('is not shut by water that nobody measured; it says so', async () => {
    expect(said(await placeRoute(certified('1.20')))).toContain(fill(en.reasons['water-not-measured'], { water: '0.10' }));
  });
});

describe('the burette scale', () => {
  const scale = (element: Element) => [...deep(element)].find((part) => part.localName === 'svg')!;
  const at = (element: Element, selector: string) => [...scale(element).querySelectorAll(selector)].map((part) => part.getBoundingClientRect().top);

  test('is told in words', async () => {
    await placeRoute(certified('4.30', dry));
    await expect.element(page.getByRole('img', { name: fill(en.route.scale, { ffa: '4.30 ± 0.25', most: '6', limit: '3.0' }) })).toBeVisible();
  });

  test('without a result, too', async () => {
    const element = await placeRoute(lot({}));
    await expect.element(page.getByRole('img', { name: fill(en.route.scaleEmpty, { most: '5', limit: '3.0' }) })).toBeVisible();
    expect(scale(element).querySelector('.meniscus')).toBeNull();
  });

  test('grows downwards from 0, the result below the limit that it exceeds', async () => {
    const above = await placeRoute(certified('4.30', dry));
    expect(at(above, '.meniscus')[0]).toBeGreaterThan(at(above, '.limit')[0]!);
    const below = await placeRoute(certified('1.20', dry));
    expect(at(below, '.meniscus')[0]).toBeLessThan(at(below, '.limit')[0]!);
    const numbers = [...scale(below).querySelectorAll('text:not(.limit-words)')];
    expect(numbers.map(({ textContent }) => parseFloat(textContent))).toEqual([0, 1, 2, 3, 4, 5]);
    const tops = numbers.map((text) => text.getBoundingClientRect().top);
    expect([...tops].sort((a, b) => a - b)).toEqual(tops);
  });

  test('has the limits as marks with words, the acid step’s where it comes into reach', async () => {
    const marks = (element: Element) => [...scale(element).querySelectorAll('.limit-words')].map(({ textContent }) => textContent).join(' ').trim();
    expect(marks(await placeRoute(certified('4.30', dry)))).toBe(en.route.directMark);
    expect(marks(await placeRoute(certified('60', dry)))).toBe(`${en.route.directMark} ${en.route.pretreatmentMark}`);
  });

  test('holds the result, however far it is', async () => {
    for (const ffa of ['0', '0.02', '3', '12.5', '39.9', '100']) {
      const element = await placeRoute(certified(ffa, dry));
      const glass = scale(element).querySelector('.glass')!.getBoundingClientRect();
      for (const top of [...at(element, '.meniscus'), ...at(element, '.limit')]) {
        expect(top).toBeGreaterThanOrEqual(glass.top);
        expect(top).toBeLessThanOrEqual(glass.bottom);
      }
    }
  });
});

describe('the ways not taken', () => {
  test('of a sour lot: direct all the same, and the blend; each figure opens', async () => {
    const element = await placeRoute(certified('4.30', dry));
    expect(words(element)).toContain(en.route.directAllTheSame);
    expect(words(element)).toContain(fill(en.route.blend, { limit: '3.0' }));
    expect(words(element)).toContain(fill(en.route.blendWith, { ffa: '0.5' }));
    const opened: string[] = [];
    element.addEventListener('esterway-open', ({ key }) => opened.push(key));
    for (const figure of controls(element).filter((control) => control.getAttribute('part') === 'figure')) await click(figure);
    expect(opened).toEqual(['direct.soap', 'blendOil']);
  });

  test('of a clean lot: two-step all the same, and no blend', async () => {
    const element = await placeRoute(certified('1.20', dry));
    expect(words(element)).toContain(en.route.twoStepAllTheSame);
    expect(words(element)).toContain(en.route.onePass);
    expect(words(element)).not.toContain(fill(en.route.blend, { limit: '3.0' }));
  });

  test('are not offered before the amount of oil is known', async () => {
    const element = await placeRoute({ ...certified('4.30'), figures: { certificateFfa: { text: '4.30', unit: '%' } } });
    expect(words(element)).not.toContain(en.route.directAllTheSame);
  });
});

test('the published limits can be looked up', async () => {
  const element = await placeRoute(lot({}));
  const summary = controls(element).find((control) => nameOf(control).startsWith(en.route.published))!;
  expect(words(element)).not.toContain(en.route.publishedList[0]);
  await click(summary);
  for (const line of en.route.publishedList) expect(words(element)).toContain(line);
});

test('in German, with German figures', async () => {
  const element = await placeRoute(certified('4.30', dry), site({}), 'de');
  expect(said(element)).toContain(de.verdicts['two-step']);
  expect(said(element)).toContain(fill(de.reasons['above-direct-limit'], { ffa: '4,30', limit: '3,0' }));
  await expect.element(page.getByRole('img', { name: fill(de.route.scale, { ffa: '4,30 ± 0,25', most: '6', limit: '3,0' }) })).toBeVisible();
});
