import { expect as expectPage } from '@open-wc/testing';
import { html } from 'lit';
import { describe, expect, test } from 'vitest';
import type { EsterwayTitration, LotEntry, SiteProfile } from '../../src/index.js';
import { enter, openPart, place, words } from './tools/page.js';
import { lot, run, site } from './tools/lots.js';
import { enPlan } from '../../src/locales/en-plan.js';
import { de, en, fill } from './tools/texts.js';

// With 0.1 mol/L and 2.5 g a millilitre is 2.244 mg/g (56.1 · 0.1 / 2.5). ASTM D664, used oil: two results may differ by 0.117 of their mean.

const placeRuns = (titres: readonly string[], profile: SiteProfile = site({}), lang = 'en') => {
  const entry: LotEntry = lot({ figures: { titrantStrength: '0.1000 mol/L' }, runs: titres.map((titre) => run('2.500 g', '0.00', titre)) });
  return place<EsterwayTitration>(html`<esterway-titration lang=${lang} .entry=${entry} .site=${profile}></esterway-titration>`);
};
const { next } = en.replicates;

describe('what is made of the runs', () => {
  test('one asks for a second', async () => {
    expect(words(await placeRuns(['4.00']))).toContain(`${en.notices['one-run']} ${next['second-run']}`);
  });

  test('two that agree make a mean', async () => {
    // 8.976 and 9.200: 0.22 apart, 0.117 · 9.09 is 1.06
    const text = words(await placeRuns(['4.00', '4.10']));
    expect(text).toContain(fill(en.replicates.agree, { runs: '2', range: '0.22', critical: '1.06' }));
    expect(text).not.toContain(next['two-more']);
  });

  test('equal runs make a mean, and still stand with the ± of the method', async () => {
    const text = words(await placeRuns(['4.00', '4.00']));
    expect(text).toContain(fill(en.replicates.agree, { runs: '2', range: '0.00', critical: '1.05' }));
    expect(text).toMatch(/9\.0 mg\/g ± 0\.[56]/);
  });

  test('two that differ are told what to do, once or twice where a run is dear', async () => {
    expect(words(await placeRuns(['4.00', '4.80']))).toContain(next['two-more']);
    expect(words(await placeRuns(['4.00', '4.80'], site({ options: { runsAreDear: 'yes' } })))).toContain(next['one-more']);
  });

  test('four within their range make a mean, else the median', async () => {
    // 8.98, 10.10, 9.20, 9.42: 1.12 apart, 3.6 / 2.8 · 0.117 · 9.42 is 1.42
    expect(words(await placeRuns(['4.00', '4.50', '4.10', '4.20']))).toContain('Mean of 4 runs');
    const scattered = words(await placeRuns(['4.00', '5.20', '4.10', '4.20']));
    expect(scattered).toContain('Median of 4 runs');
    expect(scattered).toContain(next['look-for-cause']);
    expect(scattered).toContain('9.3 mg/g'); // (9.200 + 9.425) / 2
  });

  test('runs of another order of size are asked about', async () => {
    expect(words(await placeRuns(['0.40', '4.00']))).toContain(en.notices['runs-tenfold']);
  });

  test('in German', async () => {
    expect(words(await placeRuns(['4.00', '4.80'], site({}), 'de'))).toContain(de.replicates.next['two-more']);
  });
});

describe('the plan', () => {
  const opened = async (element: EsterwayTitration): Promise<string> => {
    await openPart(element, en.titrant.plan);
    return words(element);
  };

  test('asks for the acid value to expect', async () => {
    expect(await opened(await placeRuns([]))).toContain(enPlan.none);
  });

  test('says portion, titre and the ± to expect', async () => {
    const element = await placeRuns([], site({ options: { burette: 'A-10' } }));
    await opened(element);
    await enter(element, 'Expected acid value', '10'); // 10 · 2.5 / 5.61 is 4.46 mL
    const text = words(element);
    expect(text).toContain(fill(enPlan.weigh, { portion: '2.5', titre: '4.5', strength: '0.100' }));
    expect(text).toMatch(/Two runs should leave ± 0\.\d+ mg\/g/);
    await expectPage(element).to.be.accessible();
  });
});
