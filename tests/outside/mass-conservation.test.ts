import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CATALYST_PRODUCTS } from '../../src/chemistry/catalyst.js';
import { FATS } from '../../src/chemistry/fats.js';
import type { LotReading } from '../../src/core.js';
import { certified, read, site, valueIn } from '../lot/lot.js';
import { ALKALI, SPECIES, Stock, WEIGHT, expectSame, wide } from './atoms.js';
import type { Atoms, Wide } from './atoms.js';

// Source: conservation of mass and of every element. What a reading gives as masses of ester, glycerol, soap, water and so on
// is turned back into atoms and must be what went in, whatever the lot. The fatty chains are atoms of their own here: A for
// the acyl groups of the glycerides, B for those of the free acid (a mean acid has no whole number of carbons).

/** A lot's readings, as amounts. */
class Readings {
  constructor(
    private readonly reading: LotReading,
    readonly catalyst: keyof typeof ALKALI,
  ) {}

  /** As read: mol, kg or whatever the reading has. */
  get(key: string): Wide {
    return wide(valueIn(this.reading, key));
  }

  share(key: string): Wide {
    return this.get(key).div(100);
  }

  /** A mass in kg as grams. */
  grams(key: string): Wide {
    return this.get(key).times(1000);
  }

  readonly weight = (element: string): Wide => {
    const carboxyl = wide(WEIGHT['O']!).plus(WEIGHT['H']!);
    if (element === 'A') return this.get('glycerideAcidMolarMass').minus(carboxyl);
    if (element === 'B') return this.get('acidMolarMass').minus(carboxyl);
    return wide(WEIGHT[element]!);
  };

  stock(): Stock {
    return new Stock(this.weight);
  }

  /** An amount, mol, from a mass in kg of a substance. */
  moles(key: string, atoms: Atoms): Wide {
    return this.grams(key).div(new Stock(this.weight).add(wide(1), atoms).mass);
  }

  get insolubles(): Wide {
    return this.share('insolubles').times(this.grams('oilMass'));
  }

  /** The oil as it came: glycerides, acid, water and insolubles. */
  oil(): Stock {
    return this.stock()
      .add(this.get('direct.glycerideAmount'), SPECIES.triglyceride)
      .add(this.get('acidAmount'), SPECIES.freeAcid)
      .add(this.share('waterContent').times(this.grams('oilMass')).div(this.stock().add(wide(1), SPECIES.water).mass), SPECIES.water)
      .addInert(this.insolubles);
  }

  /** What the bought methanol of a step brings: the rest is water. */
  addMethanol(stock: Stock, key: string): Stock {
    const grams = this.grams(key);
    const { methanol, water } = SPECIES;
    return stock
      .add(grams.times(this.share('methanolAssay')).div(this.stock().add(wide(1), methanol).mass), methanol)
      .add(grams.times(wide(1).minus(this.share('methanolAssay'))).div(this.stock().add(wide(1), water).mass), water);
  }
}

/** The base step of a route: the feed, catalyst and methanol in; everything that is then in the vessel out. */
function baseStep(readings: Readings, route: 'direct' | 'twoStep', feed: Stock, methanolInFeed: Wide, esterInFeed: Wide): void {
  const { base, metal, hydroxide } = ALKALI[readings.catalyst];
  const get = (name: string): Wide => readings.get(`${route}.${name}`);
  const { methanol, water, ester, glycerol, triglyceride, esterOfFreeAcid } = SPECIES;

  // in: of the catalyst's rest some is methanol, some counts as water, the remainder is only a mass
  const product = readings.grams(`${route}.catalyst`);
  const rest = product.times(wide(1).minus(readings.share('catalystAssay')));
  const restMethanol = rest.times(readings.share('methanolInRest'));
  const restWater = rest.times(readings.share('waterInRest'));
  const gramsOf = (atoms: Atoms): Wide => readings.stock().add(wide(1), atoms).mass;
  const charged = readings.addMethanol(feed, `${route}.methanol`)
    .add(product.times(readings.share('catalystAssay')).div(gramsOf(base)), base)
    .add(restMethanol.div(gramsOf(methanol)), methanol)
    .add(restWater.div(gramsOf(water)), water)
    .addInert(rest.minus(restMethanol).minus(restWater));
  expectSame(charged.mass, readings.grams(`${route}.feedMass`).plus(readings.grams(`${route}.methanol`)).plus(product));

  // out: a hydroxide that drives the reaction takes a methanol to become methoxide, a methoxide that meets acid gives one
  const driving = readings.moles(`${route}.basePure`, base);
  const spent = readings.moles(`${route}.extraPure`, base);
  const turned = readings.share('conversion');
  const methanolIn = readings.grams(`${route}.methanol`).times(readings.share('methanolAssay')).plus(restMethanol).div(gramsOf(methanol)).plus(methanolInFeed);
  const methanolLeft = methanolIn.minus(get('glycerideAmount').times(3).times(turned))
    .minus(hydroxide ? driving : wide(0)).plus(hydroxide ? wide(0) : spent);
  const out = readings.stock()
    .add(readings.moles(`${route}.esterMade`, ester), ester)
    .add(esterInFeed, esterOfFreeAcid)
    .add(readings.moles(`${route}.glycerol`, glycerol), glycerol)
    .add(get('glycerideAmount').times(wide(1).minus(turned)), triglyceride)
    .add(readings.moles(`${route}.soap`, { B: 1, O: 1, [metal]: 1 }), { B: 1, O: 1, [metal]: 1 })
    .add(readings.moles(`${route}.waterInBatch`, water), water)
    .add(driving, { [metal]: 1, O: 1, C: 1, H: 3 })
    .add(get('sulfuricAcid'), { [metal]: 2, S: 1, O: 4 })
    .add(methanolLeft, methanol)
    .addInert(readings.insolubles.plus(rest.minus(restMethanol).minus(restWater)));
  charged.expectSame(out);
  // the ester as read is the two kinds of it together
  expectSame(readings.grams(`${route}.ester`), readings.grams(`${route}.esterMade`).plus(esterInFeed.times(gramsOf(esterOfFreeAcid))));
}

/** A pass of the acid step, at one end of its band. Returns the ester of the free acid made up to then, mol. */
function acidPass(readings: Readings, pass: number, pace: 'slow' | 'fast', esterBefore: Wide): Wide {
  const { triglyceride, freeAcid, esterOfFreeAcid, methanol, water, sulfuricAcid } = SPECIES;
  const get = (name: string): Wide => readings.get(`pass${pass}.${name}.${pace}`);
  const before = (name: string): Wide => readings.get(`pass${pass - 1}.${name}.${pace}`);
  /** What the acid meets is the same at both ends of the first pass. */
  const present = (name: string): Wide => readings.get(pass === 1 ? `pass1.${name}` : `pass${pass}.${name}.${pace}`);
  const gramsOf = (atoms: Atoms): Wide => readings.stock().add(wide(1), atoms).mass;

  let feed = readings.oil();
  if (pass > 1) {
    feed = readings.stock()
      .add(readings.get('direct.glycerideAmount'), triglyceride)
      .add(before('acidLeft'), freeAcid)
      .add(esterBefore, esterOfFreeAcid)
      .add(before('methanolCarried'), methanol)
      .add(before('waterCarried'), water)
      .add(readings.moles(`pass${pass - 1}.sulfuricCarried`, sulfuricAcid), sulfuricAcid)
      .addInert(readings.insolubles);
  }
  const acid = readings.grams(`pass${pass}.sulfuric`);
  const charged = readings.addMethanol(feed, `pass${pass}.methanol`)
    .add(acid.times(readings.share('sulfuricAssay')).div(gramsOf(sulfuricAcid)), sulfuricAcid)
    .add(acid.times(wide(1).minus(readings.share('sulfuricAssay'))).div(gramsOf(water)), water);

  const ester = esterBefore.plus(get('esterified'));
  charged.expectSame(readings.stock()
    .add(readings.get('direct.glycerideAmount'), triglyceride)
    .add(get('acidLeft'), freeAcid)
    .add(ester, esterOfFreeAcid)
    .add(present('methanolPresent').minus(get('esterified')), methanol)
    .add(present('waterPresent').plus(get('esterified')), water)
    .add(readings.moles(`pass${pass}.sulfuricPresent`, sulfuricAcid), sulfuricAcid)
    .addInert(readings.insolubles));

  // the layer drawn off and what stays are the whole of it
  const stays = readings.share('carryOver');
  expectSame(get('methanolCarried'), present('methanolPresent').minus(get('esterified')).times(stays));
  expectSame(get('waterCarried'), present('waterPresent').plus(get('esterified')).times(stays));
  expectSame(readings.grams(`pass${pass}.sulfuricCarried`), readings.grams(`pass${pass}.sulfuricPresent`).times(stays));
  return ester;
}

/** The oil after the last pass, and what is in it. */
function pretreated(readings: Readings, ester: Wide): Stock {
  const { triglyceride, freeAcid, esterOfFreeAcid, methanol, water, sulfuricAcid } = SPECIES;
  const oil = readings.stock()
    .add(readings.get('twoStep.glycerideAmount'), triglyceride)
    .add(readings.get('twoStep.acid'), freeAcid)
    .add(ester, esterOfFreeAcid)
    .add(readings.get('pretreated.methanolLeft'), methanol)
    .add(readings.get('pretreated.waterLeft'), water)
    .add(readings.get('twoStep.sulfuricAcid'), sulfuricAcid)
    .addInert(readings.insolubles);
  expectSame(oil.mass, readings.grams('pretreated.mass'));
  expectSame(readings.grams('pretreated.ester'), ester.times(readings.stock().add(wide(1), esterOfFreeAcid).mass));
  return oil;
}

const decimals = (least: number, most: number, digits: number): fc.Arbitrary<string> =>
  fc.integer({ min: least * 10 ** digits, max: most * 10 ** digits }).map((n) => (n / 10 ** digits).toFixed(digits));

const randomLot = fc.record({
  ffa: decimals(0.1, 60, 2), oil: decimals(1, 5000, 1), oilUnit: fc.constantFrom('kg', 'L', 't', 'lb', 'US gal'), water: decimals(0, 1, 3), insolubles: decimals(0, 1, 2),
  saponification: decimals(185, 200, 1), oilTemperature: decimals(0, 80, 1), methanolAssay: decimals(95, 100, 2), sulfuricAssay: decimals(90, 100, 1),
  ratio: decimals(4, 12, 1), conversion: decimals(50, 100, 1), entrained: decimals(0, 2, 2), carryOver: decimals(0, 60, 1), time: decimals(5, 300, 0), celsius: decimals(30, 64, 1),
  perAcid: decimals(5, 80, 1), perOil: decimals(2, 20, 1), shareOfVolume: decimals(5, 60, 1), ofAcid: decimals(1, 20, 1), ofOil: decimals(0.1, 3, 2), acidOfVolume: decimals(0.1, 2, 2),
  catalyst: fc.constantFrom(...CATALYST_PRODUCTS), catalystAssay: decimals(20, 100, 1), baseLoad: decimals(0, 2, 2),
  glyceridesBy: fc.constantFrom('saponification-value', 'profile'), fat: fc.constantFrom(...FATS),
  referenceAcid: fc.constantFrom('oleic', 'palmitic', 'lauric', 'erucic', 'linoleic', 'stearic', 'other'),
  methanolBasis: fc.constantFrom('by-acidity', 'per-acid', 'per-oil', 'oil-volume'), acidBasis: fc.constantFrom('by-acidity', 'of-acid', 'of-oil', 'oil-volume'),
  // one pass, three, or as many as it takes
  target: fc.constantFrom('100', '0.0000001', '1.0'),
});

describe('what goes in comes out', () => {
  const passesSeen = new Set<number>();

  it('of the base step, of every pass of the acid step, and of the base step after it, element by element', () => {
    fc.assert(fc.property(randomLot, (x) => {
      const entry = certified(x.ffa, {
        figures: {
          oilAmount: `${x.oil} ${x.oilUnit}`, waterContent: `${x.water} %`, insolubles: `${x.insolubles} %`, saponificationValue: `${x.saponification} mg/g`,
          oilTemperature: `${x.oilTemperature} °C`, otherAcidMolarMass: '298.47 g/mol', pretreatmentTemperature: `${x.celsius} °C`, pretreatmentTime: `${x.time} min`,
        },
        options: { catalyst: x.catalyst, glyceridesBy: x.glyceridesBy, fat: x.fat, referenceAcid: x.referenceAcid },
      });
      const profile = site({
        figures: {
          methanolAssay: `${x.methanolAssay} %`, sulfuricAssay: `${x.sulfuricAssay} %`, methanolRatio: `${x.ratio} mol/mol`, conversion: `${x.conversion} %`,
          entrainedEster: `${x.entrained} kg/kg`, carryOver: `${x.carryOver} %`, pretreatmentTarget: `${x.target} %`,
          pretreatmentMethanolPerAcid: `${x.perAcid} mol/mol`, pretreatmentMethanolPerOil: `${x.perOil} mol/mol`, pretreatmentMethanolShare: `${x.shareOfVolume} %`,
          pretreatmentAcidOfAcid: `${x.ofAcid} %`, pretreatmentAcidOfOil: `${x.ofOil} %`, pretreatmentAcidShare: `${x.acidOfVolume} %`,
          [`${x.catalyst}.assay`]: `${x.catalystAssay} %`, [`${x.catalyst}.baseLoad`]: `${x.baseLoad} %`,
        },
        options: { pretreatmentMethanolBasis: x.methanolBasis, pretreatmentAcidBasis: x.acidBasis },
      });
      const reading = read(entry, profile);
      expect(reading.problems).toEqual([]);
      const readings = new Readings(reading, x.catalyst.replace('-solution', '') as keyof typeof ALKALI);

      expectSame(readings.oil().mass, readings.grams('oilMass'));
      baseStep(readings, 'direct', readings.oil(), wide(0), wide(0));

      const passes = Math.max(...Object.keys(reading.readings).map((key) => Number(/^pass(\d)\./.exec(key)?.[1] ?? 0)));
      passesSeen.add(passes);
      let ester = wide(0);
      let fastEster = wide(0);
      for (let pass = 1; pass <= passes; pass++) {
        ester = acidPass(readings, pass, 'slow', ester);
        fastEster = acidPass(readings, pass, 'fast', fastEster);
      }
      baseStep(readings, 'twoStep', pretreated(readings, ester), readings.get('pretreated.methanolLeft'), ester);
    }), { seed: 20250312, numRuns: 200 });
  }, 120_000);

  it('has been seen with one, two and three passes', () => {
    expect([...passesSeen].sort()).toEqual([1, 2, 3]);
  });
});
