import { describe, expect, it } from 'vitest';
import { readLot } from '../../src/core.js';
import { Missing } from '../../src/formula/reading.js';
import { unpriced } from '../../src/lot/unpriced.js';
import { found, numbers, outcome } from './found.js';
import { certified, site, valueIn } from './lot.js';

// Costs worked out by hand from the amounts of a lot: a tonne of oil of 2.82 % FFA, KOH, phosphoric acid.

const PRICES = {
  oilPrice: '600 ¤/t', esterPrice: '1000 ¤/t', methanolPrice: '0.45 ¤/kg', 'KOH.price': '1.20 ¤/kg', sulfuricPrice: '0.30 ¤/kg', 'phosphoric.price': '1.10 ¤/kg',
  lowerLayerPrice: '-50 ¤/t', drawnOffPrice: '80 ¤/t', energyPrice: '0.25 ¤/kWh', energyBaseStep: '60 kWh/t', energyAcidPass: '40 kWh/t',
  hourPrice: '35 ¤/h', hoursBaseStep: '6 h', hoursAcidPass: '3 h',
};
const priced = (changes: Readonly<Record<string, string>> = {}) => site({ figures: { ...PRICES, ...changes } });
const without = (...keys: readonly string[]) => site({ figures: Object.fromEntries(Object.entries(PRICES).filter(([key]) => !keys.includes(key))) });
const entry = certified('2.82', { figures: { oilAmount: '1000 kg' } });

describe('what a route costs', () => {
  const value = numbers(entry, priced());

  it('direct: each part is an amount times its price', () => {
    expect(value('cost.direct.oil')).toBe(600);
    expect(value('cost.direct.methanol')).toBeCloseTo(0.45 * value('direct.methanol'), 9);
    // base 10 kg, extra 100 mol or 5.6105 kg, by 90 %: 17.345 kg at 1.20
    expect(value('cost.direct.catalyst')).toBeCloseTo(20.81, 2);
    // 10 kg of KOH is 178.24 mol, 17.466 kg of phosphoric acid, of 85 % 20.548 kg at 1.10
    expect(value('cost.direct.neutralising')).toBeCloseTo(22.6, 2);
    expect(value('cost.direct.lowerLayer')).toBeCloseTo((-50 * value('after.direct.lowerMass')) / 1000, 9);
    expect(value('cost.direct.energy')).toBe(15); // 60 kWh at 0.25
    expect(value('cost.direct.time')).toBe(210); // 6 h at 35
  });

  it('direct: lost ester is what the acid would have given and what the soap carries along', () => {
    // 100 mol of acid: 29.65 kg of ester (282.468 + 14.027 g/mol), 32.06 kg of soap and as much ester with it
    expect(value('cost.direct.esterLost')).toBeCloseTo(29.6495 + 32.0558, 3);
    expect(value('cost.direct.lost')).toBeCloseTo(61.71, 2);
  });

  it('two-step: the acid step’s methanol, acid, layer, energy and hours on top, pass by pass', () => {
    expect(found(entry, 'pass1.ffaLeft.slow', priced()).gt(0)).toBe(true);
    const passes = 1;
    expect(value('cost.twoStep.methanol')).toBeCloseTo(0.45 * (value('twoStep.methanol') + value('pass1.methanol')), 9);
    // 10 % of 28.2 kg of acid, by 96 %: 2.9375 kg at 0.30
    expect(value('cost.twoStep.sulfuric')).toBeCloseTo(0.88, 2);
    const drawn = value('oilMass') + value('pass1.methanol') + value('pass1.sulfuric') - value('pretreated.mass');
    expect(value('cost.twoStep.drawnOff')).toBeCloseTo((80 * drawn) / 1000, 9);
    expect(value('cost.twoStep.energy')).toBe(15);
    expect(value('cost.twoStep.energyPasses')).toBe(10 * passes);
    expect(value('cost.twoStep.timePasses')).toBe(105 * passes);
  });

  it('two passes take the hours of two', () => {
    const sour = numbers(certified('20'), priced());
    expect(sour('cost.twoStep.timePasses') / 105).toBeGreaterThan(1);
    expect(sour('cost.twoStep.timePasses') % 105).toBe(0);
    expect(sour('cost.twoStep.methanolUsed')).toBeGreaterThan(sour('twoStep.methanol') + sour('pass1.methanol') + sour('pass2.methanol') - 1e-9);
  });

  it('the totals are the sums of their parts', () => {
    for (const [route, parts] of Object.entries({
      direct: ['oil', 'methanol', 'catalyst', 'neutralising', 'lowerLayer', 'energy', 'time'],
      twoStep: ['oil', 'methanol', 'catalyst', 'neutralising', 'lowerLayer', 'energy', 'time', 'sulfuric', 'drawnOff', 'energyPasses', 'timePasses'],
    })) {
      const sum = parts.reduce((all, part) => all + value(`cost.${route}.${part}`), 0);
      expect(value(`cost.${route}.outlay`)).toBeCloseTo(sum, 9);
      expect(value(`cost.${route}.total`)).toBeCloseTo(sum + value(`cost.${route}.lost`), 9);
      expect(value(`cost.${route}.perTonne`)).toBeCloseTo(value(`cost.${route}.total`), 9); // of one tonne
      expect(value(`cost.${route}.yield`)).toBeCloseTo(value(`after.${route}.ester`), 9);
      expect(value(`cost.${route}.perTonneOfEster`)).toBeCloseTo((1000 * sum) / value(`after.${route}.ester`), 6);
    }
    expect(value('cost.difference')).toBeCloseTo(value('cost.twoStep.total') - value('cost.direct.total'), 9);
  });

  it('what one route loses more than the other is what it yields less', () => {
    expect(value('cost.direct.esterLost') - value('cost.twoStep.esterLost')).toBeCloseTo(value('after.twoStep.ester') - value('after.direct.ester'), 9);
  });

  it('a larger batch costs the same a tonne, but for its hours', () => {
    const double = numbers(certified('2.82', { figures: { oilAmount: '2 t' } }), priced());
    expect(value('cost.direct.perTonne') - double('cost.direct.perTonne')).toBeCloseTo(105, 6); // 210 spread over two
  });
});

describe('prices', () => {
  it('by mass or by volume, as they are typed', () => {
    // methanol 0.7913 g/mL at 20 °C: 0.35 ¤/L is 0.4423 ¤/kg; ester 0.88: 0.88 ¤/L is 1000 ¤/t; oil 916.8 kg/m³ at 20 °C
    const value = numbers(entry, priced({ methanolPrice: '0.35 ¤/L', esterPrice: '0.88 ¤/L', oilPrice: '0.55 ¤/L' }));
    expect(value('methanolPrice')).toBeCloseTo(0.44231, 5);
    expect(value('esterPrice')).toBe(1000);
    expect(value('oilPrice')).toBeCloseTo(599.91, 2);
    // 1 ¤/US gal is 0.264172 ¤/L, 1 ¤/lb is 2.204623 ¤/kg (NIST SP 811)
    expect(found(entry, 'methanolPrice', priced({ methanolPrice: '1 ¤/US gal' })).toNumber()).toBeCloseTo(0.264172 / 0.7913, 5);
    expect(found(entry, 'catalystPrice', priced({ 'KOH.price': '1 ¤/lb' })).toNumber()).toBeCloseTo(2.204623, 6);
    expect(found(entry, 'catalystPrice', priced({ 'KOH.price': '1200 ¤/t' })).toNumber()).toBe(1.2);
  });

  it('are those of the products in use: vinegar by the litre, sulfuric acid as for the acid step', () => {
    const vinegar = site({ figures: { ...PRICES, 'vinegar.price': '0.20 ¤/L' }, options: { neutralisingAcid: 'vinegar' } });
    expect(found(entry, 'cost.direct.neutralising', vinegar).toNumber()).toBeCloseTo(0.2 * found(entry, 'after.direct.acidVolume', vinegar).toNumber(), 9);
    const sulfuric = site({ figures: PRICES, options: { neutralisingAcid: 'sulfuric' } });
    expect(found(entry, 'neutralisingPrice', sulfuric).toString()).toBe('0.3');
    const sodium = certified('2.82', { options: { catalyst: 'NaOH' } });
    expect(outcome(sodium, 'cost.direct.catalyst', priced())).toEqual(new Missing(['NaOH.price']));
  });

  it('left out leave the part that needs them unknown, and the totals without it', () => {
    const full = numbers(entry, priced());
    const profile = without('methanolPrice', 'hoursAcidPass');
    expect(outcome(entry, 'cost.direct.methanol', profile)).toEqual(new Missing(['methanolPrice']));
    expect(outcome(entry, 'cost.twoStep.timePasses', profile)).toEqual(new Missing(['hoursAcidPass']));
    const left = numbers(entry, profile);
    expect(left('cost.direct.total')).toBeCloseTo(full('cost.direct.total') - full('cost.direct.methanol'), 9);
    expect(left('cost.twoStep.total')).toBeCloseTo(full('cost.twoStep.total') - full('cost.twoStep.methanol') - full('cost.twoStep.timePasses'), 9);
    expect(unpriced(entry, profile, 'direct')).toEqual(['methanolPrice']);
    expect(unpriced(entry, profile, 'twoStep')).toEqual(['methanolPrice', 'hoursAcidPass']);
    expect(unpriced(entry, priced(), 'twoStep')).toEqual([]);
  });

  it('without that of the ester the total is the outlay', () => {
    const value = numbers(entry, without('esterPrice'));
    expect(value('cost.direct.total')).toBe(value('cost.direct.outlay'));
    expect(outcome(entry, 'cost.direct.lost', without('esterPrice'))).toEqual(new Missing(['esterPrice']));
  });

  it('none at all: no total, and every price is missing', () => {
    const total = outcome(entry, 'cost.direct.total');
    expect(total).toEqual(new Missing([
      'oilPrice', 'methanolPrice', 'KOH.price', 'phosphoric.price', 'lowerLayerPrice', 'energyBaseStep', 'energyPrice', 'hoursBaseStep', 'hourPrice',
    ]));
    expect(outcome(entry, 'cost.direct.perTonne', site({ figures: { esterPrice: '900 ¤/t' } }))).toEqual(total);
    // a price of the acid step alone makes a total of the two-step route, not of the direct one
    const acidOnly = site({ figures: { sulfuricPrice: '0.30 ¤/kg' } });
    expect(found(entry, 'cost.twoStep.total', acidOnly).toNumber()).toBeCloseTo(0.88, 2);
    expect(outcome(entry, 'cost.direct.total', acidOnly)).toBeInstanceOf(Missing);
  });

  it('of nothing count as nothing, not as missing', () => {
    const free = priced({ oilPrice: '0 ¤/t', hoursBaseStep: '0 h' });
    expect(found(entry, 'cost.direct.oil', free).toString()).toBe('0');
    expect(unpriced(entry, free, 'twoStep')).toEqual([]);
  });

  it.each(['methanolPrice', 'KOH.price', 'sulfuricPrice', 'phosphoric.price', 'oilPrice', 'esterPrice', 'energyPrice', 'hourPrice', 'energyBaseStep', 'hoursAcidPass'])('%s below zero is refused, and with it the total', (key) => {
    const unit = PRICES[key as keyof typeof PRICES].split(' ')[1] ?? '';
    const refused = outcome(entry, 'cost.twoStep.total', priced({ [key]: `-1 ${unit}` }));
    expect(refused).toMatchObject({ problem: { code: 'negative' } });
  });

  it.each(['lowerLayerPrice', 'drawnOffPrice'])('%s below zero is a layer that is sold', (key) => {
    const [paid, sold] = ['100 ¤/t', '-100 ¤/t'].map((price) => found(entry, 'cost.twoStep.total', priced({ [key]: price })));
    expect(sold!.lt(paid!)).toBe(true);
  });

  it('in a unit that is none of a price are refused', () => {
    expect(outcome(entry, 'cost.direct.methanol', priced({ methanolPrice: '1 kg' }))).toMatchObject({ problem: { code: 'unit-does-not-fit', quantity: 'methanolPrice' } });
    expect(outcome(entry, 'cost.direct.methanol', priced({ methanolPrice: '1 €/kg' }))).toMatchObject({ problem: { code: 'unknown-unit', quantity: 'methanolPrice' } });
  });
});

describe('costs in a lot', () => {
  it('are read when asked for, by readLot too', () => {
    const result = readLot(entry, priced(), { only: ['cost.difference', 'cost.twoStep.total'] });
    if ('faults' in result) throw new Error(JSON.stringify(result.faults));
    expect(valueIn(result, 'cost.difference').toString()).toBe(found(entry, 'cost.difference', priced()).toString());
    expect(result.readings['cost.twoStep.total']).toMatchObject({ unit: '¤', from: 'formula' });
  });

  it('need the amount of oil and its acid content', () => {
    const { oilAmount: _, ...figures } = entry.figures;
    expect(outcome({ ...entry, figures }, 'cost.direct.total', priced())).toEqual(new Missing(['oilAmount']));
  });
});
