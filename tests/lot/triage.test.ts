import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { STATES } from '../../src/decision/triage.js';
import { triage } from '../../src/lot/triage.js';
import type { Triage } from '../../src/lot/triage.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { certified, lot, run, site } from './lot.js';

function judged(entry: unknown, profile: unknown = site({})): Triage {
  const found = triage(entry, profile);
  if ('faults' in found) throw new Error(JSON.stringify(found.faults));
  return found;
}
const codes = ({ reasons }: Triage): readonly string[] => reasons.map(({ code }) => code);
/** A certificate that is taken as exact, so that a limit is met to the digit. */
const exact = { certificateTolerance: '0 %' };
const of = (ffa: string, asked: Readonly<Record<string, string>> = {}, options: Readonly<Record<string, string>> = {}, figures: Readonly<Record<string, string>> = {}): Triage =>
  judged(certified(ffa, { figures }), site({ figures: { ...exact, ...asked }, options }));

describe('the state of a delivery', () => {
  // limits of the site: direct 3 %, acid step 40 % (defaults), blending as said
  it.each([
    ['3.0', {}, {}, 'accepted', ['within-direct-limit']],
    ['3.01', {}, {}, 'for-pretreatment', ['within-pretreatment-limit']],
    ['40', {}, {}, 'for-pretreatment', ['within-pretreatment-limit']],
    ['40.1', {}, {}, 'declined', ['above-all-limits']],
    ['40.1', { blendingLimit: '60 %' }, {}, 'for-blending', ['within-blending-limit']],
    ['60', { blendingLimit: '60 %' }, {}, 'for-blending', ['within-blending-limit']],
    ['60.1', { blendingLimit: '60 %' }, {}, 'declined', ['above-all-limits']],
    ['3.01', {}, { acidProofEquipment: 'no' }, 'declined', ['above-all-limits', 'no-acid-proof-equipment']],
    ['3.01', { blendingLimit: '8 %' }, { acidProofEquipment: 'no' }, 'for-blending', ['within-blending-limit', 'no-acid-proof-equipment']],
    ['8.01', { blendingLimit: '8 %' }, { acidProofEquipment: 'no' }, 'declined', ['above-all-limits', 'no-acid-proof-equipment']],
    ['2', {}, { takesCertificate: 'no' }, 'held-for-retest', ['within-direct-limit', 'certificate-only']],
  ] as const)('of %s %% FFA, asked %o %o: %s', (ffa, asked, options, state, expected) => {
    const found = of(ffa, asked, options);
    expect(found.state).toBe(state);
    expect(codes(found).filter((code) => code !== 'no-guard-band')).toEqual(expected);
  });

  it('a blending limit below the limit before it takes no oil, and that is said', () => {
    const found = of('45', { blendingLimit: '20 %' });
    expect(found.state).toBe('declined');
    expect(found.reasons.find(({ code }) => code === 'limit-out-of-order')?.params).toEqual({ which: 'blendingLimit', limit: '20', before: '40', beforeWhich: 'pretreatmentLimit' });
  });

  // 5 % of the value, rectangular: u = 0.05·2.9/√3 = 0.0837 %; the guard band 1.645 u = 0.138 % reaches over 3.0
  it('too close to a limit is held, and says what lies on either side', () => {
    const found = judged(certified('2.9'), site({ figures: { certificateTolerance: '5 %' } }));
    expect(found.state).toBe('held-for-retest');
    expect(found.reasons[0]).toMatchObject({ code: 'too-close', params: { which: 'directLimit', below: 'accepted', above: 'for-pretreatment' } });
    expect(Number(found.reasons[0]!.params['guard'])).toBeCloseTo((1.645 * 0.05 * 2.9) / Math.sqrt(3), 3);
    expect(found.retest[0]?.what).toBe('acidity');
    expect(judged(certified('2.8'), site({ figures: { certificateTolerance: '5 %' } })).state).toBe('accepted');
  });

  it('too close to the blending limit is held, too', () => {
    const found = judged(certified('59'), site({ figures: { certificateTolerance: '5 %', blendingLimit: '60 %' } }));
    expect(found.reasons[0]).toMatchObject({ code: 'too-close', params: { which: 'blendingLimit', below: 'for-blending', above: 'declined' } });
  });

  it('without an acidity nothing is judged, unless it is declined for something else', () => {
    expect(judged(lot({})).state).toBe('not-known');
    const wet = lot({ figures: { waterContent: '5 %' } });
    expect(judged(wet, site({ figures: { acceptedWater: '1 %' }, options: { waterAbove: 'decline' } })).state).toBe('declined');
    expect(judged(wet, site({ figures: { acceptedWater: '1 %' } })).state).toBe('not-known');
  });
});

describe.each([
  ['waterContent', 'acceptedWater', 'waterAbove', 'water'],
  ['insolubles', 'acceptedInsolubles', 'insolublesAbove', 'insolubles'],
])('%s of a delivery', (figure, limit, option, what) => {
  it('is asked only where the site sets a limit', () => {
    expect(of('2').state).toBe('accepted');
    expect(of('2', {}, {}, { [figure]: '9 %' }).state).toBe('accepted');
  });
  it('keeps the limit to the digit', () => {
    expect(of('2', { [limit]: '1 %' }, {}, { [figure]: '1 %' }).state).toBe('accepted');
    expect(of('2', { [limit]: '1 %' }, {}, { [figure]: '1.001 %' }).state).toBe('held-for-retest');
    expect(of('2', { [limit]: '1 %' }, {}, { [figure]: '10001 mg/kg' }).reasons.at(-1)).toMatchObject({ code: `${what}-above`, params: { found: '1.0001', limit: '1' } });
  });
  it('above it is held with what to do, or declined', () => {
    expect(of('2', { [limit]: '1 %' }, {}, { [figure]: '2 %' }).retest).toEqual([{ what, how: 'treat-and-measure', params: {} }]);
    expect(of('2', { [limit]: '1 %' }, { [option]: 'decline' }, { [figure]: '2 %' }).state).toBe('declined');
  });
  it('not measured is held, even where a usual value stands', () => {
    const found = of('2', { [limit]: '1 %' });
    expect(found.state).toBe('held-for-retest');
    expect(found.retest).toEqual([{ what, how: 'measure', params: {} }]);
  });
});

it.each([
  ['60 °C', {}, 'accepted'], ['61 °C', {}, 'held-for-retest'], ['20 °C', {}, 'accepted'], ['19 °C', {}, 'held-for-retest'], [undefined, {}, 'held-for-retest'], ['140 °F', {}, 'accepted'], ['142 °F', {}, 'held-for-retest'],
])('arriving at %s between 20 and 60 °C', (temperature, options, state) => {
  expect(of('2', { lowestArrival: '20 °C', highestArrival: '60 °C' }, options, temperature ? { arrivalTemperature: temperature } : {}).state).toBe(state);
});

describe('runs', () => {
  const titrated = (...titres: string[]): LotEntry =>
    lot({ figures: { oilAmount: '900 kg', titrantStrength: '0.1 mol/L' }, runs: titres.map((end) => run('5.000 g', '0.00', end)) });
  it('that lie too far apart hold the delivery, with the next step of ISO 5725-6', () => {
    const found = judged(titrated('2.00', '2.60'));
    expect(found.state).toBe('held-for-retest');
    expect(codes(found)).toContain('runs-differ');
    expect(found.retest[0]).toEqual({ what: 'acidity', how: 'two-more', params: {} });
  });
  it('one is enough, unless the site asks for two', () => {
    expect(judged(titrated('2.00')).state).toBe('accepted');
    const strict = judged(titrated('2.00'), site({ options: { takesOneRun: 'no' } }));
    expect(strict.state).toBe('held-for-retest');
    expect(strict.retest[0]?.how).toBe('second-run');
    expect(judged(titrated('2.00', '2.02'), site({ options: { takesOneRun: 'no' } })).state).toBe('accepted');
  });
});

it('the worst of what the limits say is the state, and more acid, water or dirt never betters it', () => {
  const rank = (state: Triage['state']): number => STATES.indexOf(state);
  const share = fc.integer({ min: 1, max: 700 }).map((tenths) => tenths / 10);
  fc.assert(
    fc.property(share, share, fc.integer({ min: 0, max: 30 }), fc.integer({ min: 0, max: 30 }), fc.constantFrom('hold', 'decline'), fc.boolean(), (ffa, more, water, wetter, whenWet, acidProof) => {
      const profile: SiteProfile = site({
        figures: { acceptedWater: '1 %', blendingLimit: '50 %', ...exact }, options: { waterAbove: whenWet, acidProofEquipment: acidProof ? 'yes' : 'no' },
      });
      const at = (acid: number, wet: number): Triage => judged(certified(String(acid), { figures: { waterContent: `${wet / 10} %` } }), profile);
      const [first, sourer, damper] = [at(ffa, water), at(Math.max(ffa, more), water), at(ffa, Math.max(water, wetter))];
      expect(rank(sourer.state)).toBeGreaterThanOrEqual(rank(first.state));
      expect(rank(damper.state)).toBeGreaterThanOrEqual(rank(first.state));
      for (const { state } of first.reasons) if (state) expect(rank(first.state)).toBeGreaterThanOrEqual(rank(state));
    }),
    { numRuns: 150, seed: 11 },
  );
});

describe('settlement', () => {
  const contract = {
    oilPrice: '600 ¤/t', 'settlement.baseFfa': '3 %', 'settlement.ffaRate': '12 ¤/t per %', 'settlement.waterAllowance': '0.5 %', 'settlement.waterRate': '10 ¤/t per %',
    'settlement.insolublesAllowance': '0.1 %', 'settlement.insolublesRate': '20 ¤/t per %',
  };
  const paid = (ffa: string, figures: Readonly<Record<string, string>>, options: Readonly<Record<string, string>> = {}, rates: Readonly<Record<string, string>> = contract) =>
    judged(certified(ffa, { figures: { oilAmount: '24 t', ...figures } }), site({ figures: rates, options }));

  it('by hand: 600 − 12·(5 − 3) − 10·(1.2 − 0.5) − 20·(0.25 − 0.1) = 566 ¤/t, of 24 t 13,584 ¤', () => {
    expect(paid('5', { waterContent: '1.2 %', insolubles: '0.25 %' }).settlement).toEqual({
      price: '566.00', amount: '13584.00', deductions: { ffa: '24.00', water: '7.00', insolubles: '3.00' }, assumed: [],
    });
  });
  it('below base and allowance nothing is deducted, and nothing added', () => {
    expect(paid('1', { waterContent: '0.1 %', insolubles: '0.05 %' }).settlement).toMatchObject({ price: '600.00', deductions: { ffa: '0.00', water: '0.00', insolubles: '0.00' } });
  });
  it('without water and insolubles: 24 t · (1 − 0.012 − 0.0025) = 23.652 t at 566 ¤/t', () => {
    expect(paid('5', { waterContent: '1.2 %', insolubles: '0.25 %' }, { settledBy: 'without-water-and-insolubles' }).settlement?.amount).toBe('13387.03');
  });
  it('a rate that the contract has not deducts nothing', () => {
    expect(paid('5', {}, {}, { oilPrice: '600 ¤/t' }).settlement).toMatchObject({ price: '600.00', assumed: [] });
  });
  it('a rate without its base is asked about', () => {
    const found = paid('5', {}, {}, { oilPrice: '600 ¤/t', 'settlement.ffaRate': '12 ¤/t per %' });
    expect(found.settlement).toBeUndefined();
    expect(found.unsettled).toEqual(['settlement.baseFfa']);
  });
  it('what was not measured is named', () => {
    expect(paid('5', {}).settlement?.assumed).toEqual(['waterContent', 'insolubles']);
  });
  it('can be below zero', () => {
    expect(paid('60', { waterContent: '0.1 %', insolubles: '0.1 %' }).settlement?.price).toBe('-84.00');
  });
  it('refuses a rate below zero, at its field', () => {
    const found = paid('5', {}, {}, { ...contract, 'settlement.ffaRate': '-1 ¤/t per %' });
    expect(found.problems).toContainEqual(expect.objectContaining({ code: 'negative', quantity: 'settlement.ffaRate' }));
    expect(found.settlement).toBeUndefined();
    expect(found.state).toBe('for-pretreatment');
  });
});

it('a document that cannot be read says why', () => {
  expect(triage({ version: 9 })).toMatchObject({ faults: [{ code: 'newer-version' }] });
  expect(triage({ version: 1 }, { version: 1, figures: { accepted: { text: '1', unit: '%' } } })).toMatchObject({ faults: [{ code: 'unknown-key' }] });
});
