import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { REFUSALS, REMARKS } from '../../src/decision/blend/blend.js';
import { GOALS, MASS_RULES, SHARES } from '../../src/decision/blend/stock.js';
import { EMPTY_LOT, readLot } from '../../src/core.js';
import type { BlendStock, StockItem, StockLimits } from '../../src/lot/blend-stock.js';
import { EMPTY_STOCK, ITEM_FIGURES, checkBlendStock } from '../../src/lot/blend-stock.js';
import { blendedLot, readBlend, stockItemOf } from '../../src/lot/blend.js';
import type { BlendFound, BlendRefused } from '../../src/lot/blend.js';
import { deBlend } from '../../src/locales/de-blend.js';
import { enBlend } from '../../src/locales/en-blend.js';
import { certified, figure, lot, read, run, shownIn, site } from './lot.ts';

const item = (name: string, texts: Readonly<Partial<Record<Exclude<keyof StockItem, 'name'>, string>>>): StockItem => ({
  name, ...Object.fromEntries(Object.entries(texts).map(([key, text]) => [key, figure(text)])),
});
const stock = (items: readonly StockItem[], limits: StockLimits = {}, goal: BlendStock['goal'] = 'use-sour'): BlendStock => ({ version: 1, items, limits, goal });

const SOUR = item('Fryers', { mass: '900 kg', freeFattyAcid: '5 %', water: '0.1 %', cost: '0.30 ¤/kg' });
const CLEAN = item('Tank 2', { mass: '1.2 t', freeFattyAcid: '1 %', water: '500 mg/kg', cost: '600 ¤/t' });

function found(of: unknown, profile?: Parameters<typeof readBlend>[1]): BlendFound {
  const result = readBlend(of, profile);
  if (!('parts' in result)) throw new Error(JSON.stringify(result));
  return result;
}
const problems = (of: BlendStock): readonly string[] => {
  const result = readBlend(of);
  return 'problems' in result ? result.problems.map(({ code, quantity }) => `${quantity}: ${code}`) : [];
};

describe('a stock as a document', () => {
  it('blends, in decimal text, whatever units the figures came in', () => {
    const result = found(stock([SOUR, CLEAN]));
    expect(result.parts).toEqual([
      { item: 0, name: 'Fryers', mass: '900', available: '900', share: '50' }, { item: 1, name: 'Tank 2', mass: '900', available: '1200', share: '50' },
    ]);
    expect(result.shares).toEqual({ freeFattyAcid: '3', water: '0.075' });
    expect([result.mass, result.cost, result.sour, result.sourThere, result.step]).toEqual(['1800', '810', '900', '900', '1']);
    expect(result.pair).toEqual({ item: 0, most: '50', by: 'freeFattyAcid' });
    expect(JSON.parse(JSON.stringify(result))).toEqual(result);
  });

  it('takes the direct limit of the site where it sets none', () => {
    expect(found(stock([SOUR, CLEAN]), site({ figures: { directLimit: '2 %' } })).parts.map(({ mass }) => mass)).toEqual(['400', '1200']);
    expect(found(stock([SOUR, CLEAN], { freeFattyAcid: figure('2 %') })).shares.freeFattyAcid).toBe('2');
  });

  it('says of each item what is to be put right, leaves it out, and names the others by their place', () => {
    const items = [item('', {}), item('No acid', { mass: '100 kg' }), SOUR, item('Dry?', { mass: '50 kg', freeFattyAcid: '1 %' }), CLEAN, item('Odd', { mass: '-5 kg', freeFattyAcid: '120 %', leastMass: '7 stone' })];
    const wet = stock(items, { water: figure('0.1 %') });
    expect(problems(wet)).toEqual([
      'items.1.freeFattyAcid: needed', 'items.1.water: needed', 'items.3.water: needed', 'items.5.mass: negative', 'items.5.freeFattyAcid: above-100-percent', 'items.5.leastMass: unknown-unit', 'items.5.water: needed',
    ]);
    expect(found(wet).parts.map(({ item: place }) => place)).toEqual([2, 4]);
    expect(problems(stock([item('A', { mass: '5 kg', freeFattyAcid: '1 %', leastMass: '6 kg' }), item('B', { mass: '1e5 kg', freeFattyAcid: '1 %' }), item('C', { mass: '99999999 t', freeFattyAcid: '1 %' })]))).toEqual([
      'items.0.leastMass: least-above-available', 'items.1.mass: not-a-number', 'items.2.mass: out-of-range',
    ]);
  });

  it('with a limit that cannot be used gives no blend, but the reason', () => {
    const result = readBlend(stock([SOUR, CLEAN], { water: { typed: '1,500', doubt: 'ambiguous', unit: '%' }, step: figure('0 kg') }));
    expect(result).toEqual({ problems: [
      { code: 'ambiguous', quantity: 'limits.water', params: { typed: '1,500' } }, { code: 'not-above-zero', quantity: 'limits.step' },
    ] });
  });

  it('names remedies by the place in the stock', () => {
    const refused = readBlend(stock([item('', {}), SOUR, item('Tank 3', { mass: '300 kg', freeFattyAcid: '1 %' })], { mass: figure('1 t') })) as BlendRefused;
    expect([refused.refused, refused.remedies]).toEqual(['together', [{ code: 'raise-limit', of: 'freeFattyAcid', to: '3.8' }, { code: 'less-mass', to: '600' }, { code: 'more-of', item: 2, by: '200' }]]);
  });

  it.each([
    ['not an object', 7, 'not-an-object', ''],
    ['of a newer version', { version: 2 }, 'newer-version', 'version'],
    ['with an unknown key', { version: 1, items: [{ ffa: figure('1 %') }] }, 'unknown-key', 'items.0.ffa'],
    ['with a number for a figure', { version: 1, items: [{ mass: 5 }] }, 'wrong-type', 'items.0.mass'],
    ['with an unknown goal', { version: 1, goal: 'glory' }, 'unknown-option', 'goal'],
    ['with an unknown rule', { version: 1, limits: { massRule: 'about' } }, 'unknown-option', 'limits.massRule'],
    ['with too many lots', { version: 1, items: Array.from({ length: 201 }, () => ({})) }, 'too-long', 'items'],
  ])('%s is a fault', (_, document, code, path) => {
    const result = readBlend(document);
    expect('faults' in result && result.faults[0]).toMatchObject({ code, path });
  });

  it('left empty counts as empty', () => {
    expect(checkBlendStock({ version: 1 })).toEqual(EMPTY_STOCK);
    expect(readBlend(EMPTY_STOCK)).toMatchObject({ refused: 'empty-stock' });
  });

  it('never throws, whatever comes', () => {
    const text = fc.oneof(fc.constantFrom('0', '1', '-1', '900', '3', '99999999999999999999', '0.000001', 'x', '1e9'), fc.integer().map(String));
    const some = fc.record({ text, unit: fc.constantFrom('kg', 't', '%', 'mg/kg', '¤/kg', 'L', 'stone') });
    const keys = ['mass', 'leastMass', 'freeFattyAcid', 'water', 'insolubles', 'cost'] as const;
    const anyItem = fc.record(Object.fromEntries(keys.map((key) => [key, some])), { requiredKeys: [] });
    const any = fc.record({ version: fc.constant(1), items: fc.array(anyItem, { maxLength: 6 }), limits: fc.record({ freeFattyAcid: some, water: some, mass: some, step: some }, { requiredKeys: [] }), goal: fc.constantFrom('use-sour', 'least-cost') });
    fc.assert(fc.property(fc.oneof({ weight: 9, arbitrary: any }, fc.jsonValue()), (document) => {
      const result = readBlend(document);
      return 'parts' in result || 'refused' in result || 'problems' in result || 'faults' in result;
    }), { seed: 20, numRuns: 400 });
  });
});

describe('a blend as a lot', () => {
  it('reads as the blend: amount, acid, water', () => {
    const blend = found(stock([SOUR, CLEAN]));
    const entry = blendedLot(blend);
    const reading = read(entry);
    expect([entry.name, entry.source]).toEqual(['Fryers + Tank 2', '900 kg Fryers + 900 kg Tank 2']);
    expect(['freeFattyAcid', 'oilMass', 'waterContent'].map((key) => shownIn(reading, key))).toEqual(['3.00 %', '1800 kg', '0.075 %']);
    // not every part tells its insolubles: the usual value stands
    expect('insolubles' in entry.figures).toBe(false);
    // and it is no surer than a certificate
    expect(Number(reading.uncertainties['freeFattyAcid']?.u)).toBeGreaterThan(0);
    expect(reading.route.verdict).toBe('too-close');
    expect(readLot(JSON.parse(JSON.stringify(entry)))).toEqual(readLot(entry));
  });

  it('leaves the bench as it was, and counts acid as the site does', () => {
    const before = lot({ figures: { titrantStrength: '0.1023 mol/L', oilAmount: '7 kg' }, options: { referenceAcid: 'lauric', titrantAlkali: 'NaOH' }, runs: [run('2.5 g', '0', '1')] });
    const entry = blendedLot(found(stock([SOUR, CLEAN])), before);
    expect(entry.options).toEqual({ titrantAlkali: 'NaOH', acidKnownFrom: 'certificate-ffa' });
    expect([entry.figures['titrantStrength']?.unit, entry.runs]).toEqual(['mol/L', []]);
  });

  it('shortens a name that no one could read', () => {
    const many = Array.from({ length: 30 }, (_, i) => item(`Delivery ${i}`, { mass: '10 kg', freeFattyAcid: '1 %' }));
    const entry = blendedLot(found(stock(many, { mass: figure('300 kg') })));
    expect([entry.name!.length, entry.name!.at(-1)]).toEqual([60, '…']);
  });
});

it('every word and code of a blend has its sentence, and no other', () => {
  const keys = (record: object): readonly string[] => Object.keys(record).sort();
  for (const texts of [enBlend, deBlend]) {
    expect(keys(texts.refused)).toEqual([...REFUSALS].sort());
    expect(keys(texts.remarks)).toEqual([...REMARKS].sort());
    expect(keys(texts.massRules)).toEqual([...MASS_RULES].sort());
    for (const part of [texts.goals, texts.gain, texts.found]) expect(keys(part)).toEqual([...GOALS].sort());
    expect(keys(texts.columns)).toEqual(['name', ...ITEM_FIGURES].sort());
    expect(keys(texts.names)).toEqual([...SHARES].sort());
  }
});

describe('the lot on the bench as an item', () => {
  it('takes what is known of it', () => {
    expect(stockItemOf({ ...certified('4.3', { figures: { waterContent: '0.2 %' } }), name: 'HK-1' }, site({ figures: { oilPrice: '350 ¤/t' } }))).toEqual({
      name: 'HK-1', mass: figure('1000 kg'), freeFattyAcid: figure('4.3 %'), water: figure('0.2 %'), cost: figure('350 ¤/t'),
    });
    expect(stockItemOf(EMPTY_LOT)).toEqual({});
  });

  it('counts its acid as the site does: 2 % as lauric acid is 2 · 282/200 % as oleic', () => {
    const lauric = certified('2', { options: { referenceAcid: 'lauric' } });
    expect(Number(stockItemOf(lauric).freeFattyAcid && (stockItemOf(lauric).freeFattyAcid as { text: string }).text)).toBeCloseTo((2 * 282) / 200, 3);
  });

  it('gives back as a lot what it was', () => {
    const entry = certified('2.5');
    const again = blendedLot(found(stock([stockItemOf(entry)], { mass: figure('1000 kg'), massRule: 'exactly' })));
    expect([shownIn(read(again), 'freeFattyAcid'), shownIn(read(again), 'oilMass')]).toEqual([shownIn(read(entry), 'freeFattyAcid'), shownIn(read(entry), 'oilMass')]);
  });
});
