import { describe, expect, it } from 'vitest';
import { breakEven } from '../../src/lot/break-even.js';
import type { BreakEven } from '../../src/lot/break-even.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { found } from './found.js';
import { certified, lot, run, site } from './lot.js';

const PRICES = {
  oilPrice: '600 ¤/t', esterPrice: '1000 ¤/t', methanolPrice: '0.45 ¤/kg', 'KOH.price': '1.20 ¤/kg', sulfuricPrice: '0.30 ¤/kg', 'phosphoric.price': '1.10 ¤/kg',
};
const priced = (changes: Readonly<Record<string, string>> = {}, options: Readonly<Record<string, string>> = {}) => site({ figures: { ...PRICES, ...changes }, options });

function compared(entry: LotEntry, profile: SiteProfile): BreakEven {
  const result = breakEven(entry, profile);
  if (!('points' in result)) throw new Error(JSON.stringify(result));
  return result;
}
/** Costs of a lot of this FFA, from the lot itself: two-step less direct, ¤ a tonne. */
const difference = (ffa: number, profile: SiteProfile): number => found(certified(ffa.toFixed(4)), 'cost.difference', profile).toNumber();

describe('the acid content at which the cheaper route changes', () => {
  const profile = priced({ hourPrice: '35 ¤/h', hoursAcidPass: '1 h' });

  it('lies where the two cost the same', () => {
    const { crossings, cheapest } = compared(certified('7'), profile);
    expect(cheapest).toBe('direct');
    const crossing = crossings[0]!;
    expect(crossing).toMatchObject({ below: 'direct', above: 'two-step' });
    const at = Number(crossing.ffa);
    expect(difference(at - 0.02, profile)).toBeGreaterThan(0);
    expect(difference(at + 0.02, profile)).toBeLessThan(0);
    if (crossing.kind === 'crossing') expect(Math.abs(difference(at, profile))).toBeLessThan(0.5);
  });

  it('is that of a search step by step, all of them and no other', () => {
    const { crossings } = compared(certified('7'), profile);
    const signs = Array.from({ length: 400 }, (_, i) => ({ ffa: (i + 1) / 10, sign: Math.sign(difference((i + 1) / 10, profile)) }));
    const changes = signs.flatMap(({ ffa, sign }, i) => (i && sign !== signs[i - 1]!.sign ? [ffa] : []));
    expect(crossings.map(({ ffa }) => Math.ceil(Number(ffa) * 10 - 1e-9) / 10)).toEqual(changes);
  });

  it('has the points of both routes, from sweet to sour, as the lot itself would cost', () => {
    const { points } = compared(certified('7'), profile);
    expect(points[0]?.ffa).toBe(0.1);
    expect(points.at(-1)?.ffa).toBe(40);
    expect(points.map(({ ffa }) => ffa)).toEqual([...points.map(({ ffa }) => ffa)].sort((a, b) => a - b));
    for (const { ffa, direct, twoStep } of points.filter((_, i) => i % 10 === 0)) {
      expect(direct).toBe(found(certified(String(ffa)), 'cost.direct.perTonne', profile).toNumber());
      expect(twoStep - direct).toBeCloseTo(difference(ffa, profile), 9);
    }
  });

  it('does not rest on how sour the lot is, nor how that is known, nor on a retest', () => {
    const expected = compared(certified('7'), profile);
    const titrated = lot({ figures: { oilAmount: '1000 kg', titrantStrength: '0.1 mol/L' }, runs: [run('5 g', '0', '4')], retestRuns: [run('5 g', '0', '1')] });
    expect(compared(titrated, profile)).toEqual(expected);
    expect(compared(certified('20'), profile)).toEqual(expected);
    const retested = certified('20', { figures: { 'retest.certificateFfa': '0.4 %' }, options: { 'retest.acidKnownFrom': 'certificate-ffa' } });
    expect(compared(retested, profile)).toEqual(expected);
  });
});

describe('one route all along', () => {
  it('direct, where an acid pass costs more than it can save', () => {
    const { crossings, cheapest } = compared(certified('7'), priced({ hourPrice: '1000 ¤/h', hoursAcidPass: '10 h' }));
    expect([crossings, cheapest]).toEqual([[], 'direct']);
  });

  it('two-step, where its methanol is free and ester is dear', () => {
    const { crossings, cheapest } = compared(certified('7'), site({ figures: { methanolPrice: '0 ¤/kg', esterPrice: '1000 ¤/t' } }));
    expect([crossings, cheapest]).toEqual([[], 'two-step']);
  });

  it('the same, where nothing has a price that differs', () => {
    const { crossings, cheapest, unpriced } = compared(certified('7'), site({ figures: { oilPrice: '600 ¤/t' } }));
    expect([crossings, cheapest]).toEqual([[], 'same']);
    expect(unpriced).toContain('methanolPrice');
  });
});

describe('a cost that jumps', () => {
  // the acid step’s methanol falls from 40 to 20 mol a mol of acid at 15 % FFA, so its cost falls by half there
  it('past the other at the rule’s 15 % is a step, found to its place', () => {
    const profile = priced({ methanolPrice: '0.50 ¤/kg' });
    const { crossings } = compared(certified('7'), profile);
    expect(crossings.at(-1)).toEqual({ ffa: '15.00', below: 'direct', above: 'two-step', kind: 'step' });
    expect(difference(14.9999, profile) - difference(15, profile)).toBeGreaterThan(100);
  });

  it('by a further pass makes the direct route the cheaper one again', () => {
    // one pass up to some acid content, two above it: with dear hours each pass is a step up
    const profile = priced({ esterPrice: '1500 ¤/t', hourPrice: '100 ¤/h', hoursAcidPass: '1 h', methanolPrice: '0.2 ¤/kg' });
    const { crossings } = compared(certified('7'), profile);
    expect(crossings.map(({ kind }) => kind)).toEqual(['crossing', 'step', 'crossing']);
    for (const { ffa, below, above, kind } of crossings) {
      const [left, right] = [difference(Number(ffa) - 0.02, profile), difference(Number(ffa) + 0.02, profile)];
      expect([below, above]).toEqual(left > 0 ? ['direct', 'two-step'] : ['two-step', 'direct']);
      expect(Math.sign(right)).toBe(-Math.sign(left));
      expect(kind).toBe(Math.abs(left - right) > 5 ? 'step' : 'crossing');
    }
  });
});

describe('what is not known', () => {
  it('without any price, or without the oil, says what is missing', () => {
    expect(breakEven(certified('7'), site({}))).toMatchObject({ missing: expect.arrayContaining(['oilPrice', 'sulfuricPrice']) as unknown });
    const { oilAmount: _, ...figures } = certified('7').figures;
    expect(breakEven({ ...certified('7'), figures }, priced())).toEqual({ missing: ['oilAmount'] });
  });

  it('a refused price is told at its field', () => {
    expect(breakEven(certified('7'), priced({ esterPrice: '-1 ¤/t' }))).toMatchObject({ problem: { code: 'negative' } });
  });

  it('prices that are left out of the totals are named', () => {
    expect(compared(certified('7'), priced()).unpriced).toEqual([
      'lowerLayerPrice', 'energyBaseStep', 'energyPrice', 'hoursBaseStep', 'hourPrice', 'drawnOffPrice', 'energyAcidPass', 'hoursAcidPass',
    ]);
  });
});
