import { describe, expect, it } from 'vitest';
import { CATALYST_PRODUCTS } from '../../src/chemistry/catalyst.js';
import { neutralisingAcid } from '../../src/chemistry/neutralising.js';
import { DEFAULT_FIGURES, EMPTY_SITE } from '../../src/core.js';
import { Missing, Refused } from '../../src/formula/reading.js';
import { found, numbers, outcome } from '../lot/found.js';
import { certified, lot, read, site } from '../lot/lot.js';

/** A tonne of oil with one kilogram of pure catalyst as base load, and an acid content of 0.1 mol/kg: 2.82 % as oleic acid, M 282. */
const kilogramLeft = (catalyst: string, acid: string) =>
  [certified('2.82', { options: { catalyst } }), site({ figures: { [`${catalyst}.baseLoad`]: '0.1 %' }, options: { neutralisingAcid: acid } })] as const;
const of = (catalyst: string, acid: string): ((name: string) => number) => {
  const value = numbers(...kilogramLeft(catalyst, acid));
  return (name) => value(`after.direct.${name}`);
};

describe('acid that neutralises a kilogram of catalyst', () => {
  // kg, derived from the atomic weights: acetic 60.05 and phosphoric acid 97.99 g/mol beside NaOH 39.997, KOH 56.105;
  // phosphoric acid to the monohydrogen salt takes up two. Citric 192.12 / 3, sulfuric 98.07 / 2, hydrochloric 36.46 by hand:
  // 192.12 / 119.991, 192.12 / 168.316; 98.07 / 79.994, 98.07 / 112.211; 36.46 / 39.997, 36.46 / 56.105
  it.each([
    ['acetic', 1.501, 1.07], ['acetic-80', 1.501, 1.07], ['vinegar', 1.501, 1.07],
    ['phosphoric-dihydrogen', 2.45, 1.747], ['phosphoric-monohydrogen', 1.225, 0.8733],
    ['citric', 1.6011, 1.1414], ['sulfuric', 1.226, 0.874], ['hydrochloric', 0.9116, 0.6499],
  ])('%s: %d kg a kilogram of NaOH, %d of KOH', (acid, sodium, potassium) => {
    expect(of('NaOH', acid)('acidPure')).toBeCloseTo(sodium, 3);
    expect(of('KOH', acid)('acidPure')).toBeCloseTo(potassium, 3);
  });

  // a methoxide takes a proton as its hydroxide does: 60.052 / 54.024 and 60.052 / 70.132 (derived)
  it.each([['NaOCH3', 1.1116], ['NaOCH3-solution', 1.1116], ['KOCH3', 0.8563], ['KOCH3-solution', 0.8563]])('acetic: %s takes %d kg', (catalyst, kilograms) => {
    expect(of(catalyst, 'acetic')('acidPure')).toBeCloseTo(kilograms, 4);
  });

  // molar masses of the salts, g/mol, as handbooks list them (from memory): a kilogram of alkali makes n/ν of them
  it.each([
    ['NaOH', 'acetic', 82.034, 1], ['KOH', 'phosphoric-dihydrogen', 136.086, 1], ['KOH', 'phosphoric-monohydrogen', 174.18, 2], ['NaOH', 'citric', 258.07, 3],
    ['NaOH', 'sulfuric', 142.04, 2], ['KOH', 'sulfuric', 174.26, 2], ['KOH', 'hydrochloric', 74.551, 1],
  ])('%s and %s make the salt of %d g/mol', (catalyst, acid, molarMass, equivalents) => {
    const alkali = { NaOH: 39.997, KOH: 56.105 }[catalyst] ?? NaN;
    expect(of(catalyst, acid)('salt')).toBeCloseTo(molarMass / alkali / equivalents, 3);
  });

  // as bought, by hand: 1.5014 kg of acetic acid in 50 g/L is 30.03 L, of 80 % and 1.070 g/mL 1.754 L; 2.4500 / 0.85 / 1.685 = 1.711 L
  it.each([
    ['vinegar', 30.33, 30.03], ['acetic-80', 1.8768, 1.754], ['phosphoric-dihydrogen', 2.8824, 1.7106], ['acetic', 1.5044, 1.4342],
    ['sulfuric', 1.2771, 0.6958], ['hydrochloric', 2.4636, 2.0807], ['citric', 1.6092, 0],
  ])('%s as bought: %d kg, %d L for a kilogram of NaOH', (acid, kilograms, litres) => {
    expect(of('NaOH', acid)('acid')).toBeCloseTo(kilograms, 2);
    expect(of('NaOH', acid)('acidVolume')).toBeCloseTo(litres, 2);
  });
});

describe('acid that splits the soap as well', () => {
  // 100 mol of soap beside 25.002 mol of NaOH. A strong acid: 100 · 36.458 g and 100 / 2 · 98.072 g more. Where soap is split phosphoric
  // acid gives off one proton, so what stood as the monohydrogen salt takes its own again: (25.002 + 100) − 25.002 / 2 = 112.501 mol;
  // citric acid likewise: 125.002 − 25.002 / 3 = 116.668 mol (by hand, pKa from memory)
  it.each([
    ['hydrochloric', 25.002, 100], ['sulfuric', 12.501, 50], ['phosphoric-dihydrogen', 25.002, 100], ['acetic', 25.002, 100],
    ['phosphoric-monohydrogen', 12.501, 112.501], ['citric', 8.334, 116.668],
  ])('%s: beside %d mol for the catalyst %d mol more, shown apart', (acid, forCatalyst, more) => {
    const value = of('NaOH', acid);
    expect(value('acidAmount')).toBeCloseTo(forCatalyst, 3);
    expect(value('splitAmount')).toBeCloseTo(more, 3);
  });

  it('hydrochloric acid of 37 %: 3.6458 / 0.37 = 9.853 kg, 8.322 L', () => {
    const value = of('NaOH', 'hydrochloric');
    expect(value('splitAcid')).toBeCloseTo(9.853, 2);
    expect(value('splitVolume')).toBeCloseTo(8.322, 2);
  });
});

describe('the layers', () => {
  // conservation of mass: what is charged is what settles, whichever catalyst and acid, by either route
  it.each(CATALYST_PRODUCTS.flatMap((catalyst) => neutralisingAcid.options.map((acid) => [catalyst, acid] as const)))('%s, %s: together weigh what went in', (catalyst, acid) => {
    for (const ffa of ['0.5', '8', '35']) {
      const entry = certified(ffa, { options: { catalyst } });
      const profile = site({ options: { neutralisingAcid: acid } });
      for (const route of ['direct', 'twoStep']) {
        const value = (key: string) => found(entry, key, profile);
        const charged = value(`${route}.feedMass`).plus(value(`${route}.methanol`)).plus(value(`${route}.catalyst`)).plus(value(`after.${route}.acid`));
        const settled = value(`after.${route}.upperMass`).plus(value(`after.${route}.lowerMass`));
        expect(settled.div(charged).minus(1).abs().toNumber()).toBeLessThan(1e-28);
      }
    }
  });

  it('of a very sour oil: the upper one never holds less than no ester', () => {
    expect(found(certified('75'), 'after.direct.ester').toNumber()).toBe(0);
  });

  // common practice, no source: vinegar at a quarter of the oil's volume is more than enough for a batch of neat oil, and
  // the lower layer then comes to about half the volume of the oil
  it('neat oil: a quarter of its volume of vinegar is more than enough, the lower layer is then about half of it', () => {
    const value = numbers(certified('0.05', { options: { catalyst: 'NaOH' } }), site({ options: { neutralisingAcid: 'vinegar' } }));
    const quarter = value('oilVolume') / 4;
    const needed = value('after.direct.acidVolume');
    expect(needed).toBeLessThan(quarter);
    expect(needed).toBeGreaterThan(quarter / 2);
    const half = (value('after.direct.lowerVolume') + quarter - needed) / value('oilVolume');
    expect(half).toBeGreaterThan(0.4);
    expect(half).toBeLessThan(0.6);
    expect(DEFAULT_FIGURES['vinegar.strength']?.source.mark).toBe('practice');
  });

  // theoretical glycerol 92.09 / M_oil ≈ 0.105 g a gram at 875 g/mol (derived), and crude glycerol about 10 % of the ester (found: a review);
  // with methanol, soap and salt the layer of neat oil is somewhat more
  it('neat oil without vinegar: the lower layer is a sixth to a quarter of the oil', () => {
    const value = numbers(certified('0.05'));
    expect(value('direct.glycerol') / value('oilMass')).toBeCloseTo(0.103, 2);
    expect(value('after.direct.lowerShare')).toBeGreaterThan(14);
    expect(value('after.direct.lowerShare')).toBeLessThan(25);
  });

  it('the densities are those of such layers: ester near 0.88 g/mL, the lower one above it and below glycerol', () => {
    const value = numbers(certified('2'));
    const upper = value('after.direct.upperMass') / value('after.direct.upperVolume');
    const lower = value('after.direct.lowerMass') / value('after.direct.lowerVolume');
    expect(upper).toBeGreaterThan(0.86); // EN 14214: 0.860 to 0.900 g/mL at 15 °C (found)
    expect(upper).toBeLessThan(0.9);
    expect(lower).toBeGreaterThan(0.95);
    expect(lower).toBeLessThan(1.2613);
  });
});

describe('the hold of the base step', () => {
  // common practice, no source: 55 to 65 °C, 30 to 60 min, one day to settle
  it.each([['reactionTemperature', 55, 65], ['reactionTime', 30, 60], ['settlingTime', 24, 24]])('%s lies between %d and %d by default, as practice', (key, least, most) => {
    const value = found(certified('2'), key).toNumber();
    expect(value).toBeGreaterThanOrEqual(least);
    expect(value).toBeLessThanOrEqual(most);
    expect(DEFAULT_FIGURES[key]?.source.mark).toBe('practice');
  });

  it('is refused where methanol boils', () => {
    const refused = outcome(certified('2'), 'reactionTemperature', site({ figures: { reactionTemperature: '65 °C' } }));
    expect(refused).toBeInstanceOf(Refused);
    expect((refused as Refused).problem.code).toBe('above-boiling-point');
  });
});

describe('the acid value of the product', () => {
  const titrated = (titre: string, blank?: string) =>
    lot({ figures: { titrantStrength: '0.1 mol/L', productSample: '20 g', productTitre: `${titre} mL`, ...(blank && { productBlank: `${blank} mL` }) } });

  // EN 14104: AV = 56.1 · c · V / m. 1.78 mL of 0.1 mol/L on 20 g: 0.4993; 1.80 mL: 0.5049 (by hand)
  it('is that of EN 14104, less the blank', () => {
    expect(found(titrated('1.78'), 'after.productAcidValue').toString()).toBe('0.49929');
    expect(found(titrated('1.85', '0.05'), 'after.productAcidValue').toString()).toBe('0.5049');
  });

  // EN 14214 and ASTM D6751: at most 0.50 mg/g (found)
  it('has its limit at 0.50 mg/g', () => {
    expect(DEFAULT_FIGURES['productAcidLimit']).toMatchObject({ text: '0.50', unit: 'mg/g', source: { mark: 'found' } });
    expect(found(titrated('1.78'), 'after.productAcidValue').lte(found(lot({}), 'productAcidLimit'))).toBe(true);
    expect(found(titrated('1.80'), 'after.productAcidValue').lte(found(lot({}), 'productAcidLimit'))).toBe(false);
  });

  it('may be given, and is missing until it is', () => {
    const given = lot({ figures: { productAcidTyped: '0.32 mg/g' }, options: { productAcidFrom: 'typed' } });
    expect(found(given, 'after.productAcidValue').toString()).toBe('0.32');
    expect(outcome(lot({ options: { productAcidFrom: 'typed' } }), 'after.productAcidValue')).toEqual(new Missing(['productAcidTyped']));
  });

  it('a titre below its blank is refused at the titre', () => {
    expect(outcome(titrated('0.10', '0.15'), 'after.productAcidValue')).toMatchObject({ problem: { code: 'titre-below-blank', quantity: 'productTitre' } });
  });
});

describe('reading every lot', () => {
  it('does not work any of this out', () => {
    const keys = Object.keys(read(certified('7'), EMPTY_SITE).readings);
    expect(keys.filter((key) => /^(?:after|heat|cost)\.|[pP]rice|\.density$/.test(key))).toEqual([]);
  });
});
