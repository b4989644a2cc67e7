import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COMPONENTS } from '../../src/chemistry/balance-steps.js';
import type { Component, Stream } from '../../src/chemistry/balance-steps.js';
import { CATALYST_PRODUCTS } from '../../src/chemistry/catalyst.js';
import { FATS } from '../../src/chemistry/fats.js';
import { neutralisingAcid } from '../../src/chemistry/neutralising.js';
import type { LotEntry, SiteProfile } from '../../src/core.js';
import { balance } from '../../src/lot/balance.js';
import type { Balance, BalanceFlow, BalanceStep } from '../../src/lot/balance.js';
import { certified, read, site, valueIn } from '../lot/lot.js';
import { ALKALI, SPECIES, Stock, WEIGHT, expectSame, wide } from './atoms.js';
import type { Atoms, Wide } from './atoms.js';

// Source: conservation of mass and of every element, by the atomic weights of `atoms.ts` (IUPAC, found). Every mass that the
// balance names is taken apart into atoms; what goes into a step must come out of it, whatever the lot. Of the ester it is
// known how much the acid step has made (acyl group B of the free acid); the rest has the acyl groups of the glycerides (A).

/** Neutralising acids and their salts with an alkali metal M (formulas by hand). */
const ACIDS: Readonly<Record<string, { acid: Atoms; protons: number }>> = {
  acetic: { acid: { C: 2, H: 4, O: 2 }, protons: 1 }, 'acetic-80': { acid: { C: 2, H: 4, O: 2 }, protons: 1 }, vinegar: { acid: { C: 2, H: 4, O: 2 }, protons: 1 },
  'phosphoric-dihydrogen': { acid: { H: 3, P: 1, O: 4 }, protons: 1 }, 'phosphoric-monohydrogen': { acid: { H: 3, P: 1, O: 4 }, protons: 2 },
  citric: { acid: { C: 6, H: 8, O: 7 }, protons: 3 }, sulfuric: { acid: { H: 2, S: 1, O: 4 }, protons: 2 }, hydrochloric: { acid: { H: 1, Cl: 1 }, protons: 1 },
};
const FURTHER_WEIGHT: Readonly<Record<string, string>> = { P: '30.973762', Cl: '35.45' };
const ELEMENTS = [...Object.keys(WEIGHT), ...Object.keys(FURTHER_WEIGHT), 'A', 'B'];

interface Of {
  readonly catalyst: keyof typeof ALKALI;
  readonly acid: string;
  /** Molar masses of the fatty acids, g/mol: in the glycerides, and free. */
  readonly acyl: { readonly A: Wide; readonly B: Wide };
}

/** The atoms of what a step takes in or gives. `acidEster`, g: how much of its ester the acid step has made. */
function stockOf(flows: readonly BalanceFlow[], { catalyst, acid, acyl }: Of, acidEster: Wide): Stock {
  const weight = (element: string): Wide =>
    element === 'A' || element === 'B' ? acyl[element].minus(wide(WEIGHT['O']!)).minus(wide(WEIGHT['H']!)) : wide(WEIGHT[element] ?? FURTHER_WEIGHT[element]!);
  const { base, metal } = ALKALI[catalyst];
  const { acid: neutralising, protons } = ACIDS[acid]!;
  const salt: Atoms = { ...neutralising, H: (neutralising['H'] ?? 0) - protons, [metal]: protons };
  const composition: Partial<Record<Component, Atoms>> = {
    glycerides: SPECIES.triglyceride, freeAcid: SPECIES.freeAcid, glycerol: SPECIES.glycerol, soap: { B: 1, O: 1, [metal]: 1 }, methanol: SPECIES.methanol, water: SPECIES.water,
    catalyst: base, sulfuricAcid: SPECIES.sulfuricAcid, sulfate: { [metal]: 2, S: 1, O: 4 }, neutralisingAcid: neutralising, salt,
  };
  const stock = new Stock(weight);
  const add = (grams: Wide, atoms: Atoms): Stock => stock.add(grams.div(new Stock(weight).add(wide(1), atoms).mass), atoms);
  let left = acidEster;
  for (const { component, mass } of flows) {
    const grams = wide(mass).times(1000);
    const atoms = composition[component];
    if (component === 'solids') stock.addInert(grams);
    else if (component === 'ester') {
      const ofAcid = grams.lt(left) ? grams : left;
      left = left.minus(ofAcid);
      add(ofAcid, SPECIES.esterOfFreeAcid);
      add(grams.minus(ofAcid), SPECIES.ester);
    } else add(grams, atoms!);
  }
  return stock;
}

const sum = (flows: readonly { readonly mass: string }[]): Wide => flows.reduce((total, { mass }) => total.plus(wide(mass)), wide(0));
const of = (flows: readonly BalanceFlow[], component: Component, stream?: Stream): Wide =>
  sum(flows.filter((flow) => flow.component === component && (stream === undefined || flow.stream === stream)));

/** A step closes: in mass as summed here and as its totals say, and in every element. */
function expectClosed(step: BalanceStep, about: Of, acidEster: { readonly in: Wide; readonly out: Wide }): void {
  expectSame(sum(step.in), sum(step.out));
  expectSame(sum(step.in), wide(step.totals.in.mass));
  expectSame(sum(step.out), wide(step.totals.out.mass));
  expect([step.step, step.difference.mass]).toEqual([step.step, '0']);
  const [into, out] = [stockOf(step.in, about, acidEster.in), stockOf(step.out, about, acidEster.out)];
  expectSame(into.mass, out.mass);
  expectSame(into.inert, out.inert);
  for (const element of ELEMENTS) expectSame(into.of(element), out.of(element));
  for (const { mass } of [...step.in, ...step.out]) expect(mass.startsWith('-')).toBe(false);
}

/** What a step takes over from the one before is what that one left, stream by stream. */
function expectHandedOn(steps: readonly BalanceStep[]): void {
  for (const [i, step] of steps.entries()) {
    const before = steps[i - 1];
    if (!before) continue;
    const stream: Stream = step.step === 'settle' ? 'mixture' : 'oil';
    for (const component of COMPONENTS) expectSame(of(step.in, component, stream), of(before.out, component, stream));
  }
}

/** Layers and products weigh what their substances do, and have a volume. */
function expectLayers({ layers, charged, in: into, out }: BalanceStep): void {
  for (const { stream, mass, volume } of layers) {
    expectSame(wide(mass), sum(out.filter((flow) => flow.stream === stream)));
    expect(Number(volume) > 0 || Number(mass) === 0).toBe(true);
  }
  for (const { stream, mass } of charged) expectSame(wide(mass), sum(into.filter((flow) => flow.stream === stream)));
}

const decimals = (least: number, most: number, digits: number): fc.Arbitrary<string> =>
  fc.integer({ min: least * 10 ** digits, max: most * 10 ** digits }).map((n) => (n / 10 ** digits).toFixed(digits));

const randomLot = fc.record({
  ffa: decimals(0.1, 60, 2), oil: decimals(1, 5000, 1), oilUnit: fc.constantFrom('kg', 'L', 't', 'lb', 'US gal'), water: decimals(0, 1, 3), insolubles: decimals(0, 1, 2),
  saponification: decimals(185, 200, 1), methanolAssay: decimals(95, 100, 2), sulfuricAssay: decimals(90, 100, 1), ratio: decimals(4, 12, 1), conversion: decimals(50, 100, 1),
  entrained: decimals(0, 2, 2), carryOver: decimals(0, 60, 1), lower: decimals(0, 100, 0), time: decimals(5, 300, 0), perAcid: decimals(5, 80, 1), ofAcid: decimals(1, 20, 1),
  catalyst: fc.constantFrom(...CATALYST_PRODUCTS), catalystAssay: decimals(20, 100, 1), baseLoad: decimals(0, 2, 2), acid: fc.constantFrom(...neutralisingAcid.options),
  glyceridesBy: fc.constantFrom('saponification-value', 'profile'), fat: fc.constantFrom(...FATS), referenceAcid: fc.constantFrom('oleic', 'palmitic', 'lauric', 'other'),
  methanolBasis: fc.constantFrom('by-acidity', 'per-acid'), acidBasis: fc.constantFrom('by-acidity', 'of-acid'),
  // one pass, three, or as many as it takes
  target: fc.constantFrom('100', '0.0000001', '1.0'), retest: fc.option(decimals(0.05, 5, 2), { nil: undefined }),
});
type RandomLot = typeof randomLot extends fc.Arbitrary<infer T> ? T : never;

function documents(x: RandomLot): readonly [LotEntry, SiteProfile] {
  const entry = certified(x.ffa, {
    figures: {
      oilAmount: `${x.oil} ${x.oilUnit}`, waterContent: `${x.water} %`, insolubles: `${x.insolubles} %`, saponificationValue: `${x.saponification} mg/g`,
      otherAcidMolarMass: '298.47 g/mol', pretreatmentTime: `${x.time} min`, ...(x.retest !== undefined && { 'retest.certificateFfa': `${x.retest} %` }),
    },
    options: {
      catalyst: x.catalyst, glyceridesBy: x.glyceridesBy, fat: x.fat, referenceAcid: x.referenceAcid, neutralisingAcid: x.acid,
      ...(x.retest !== undefined && { 'retest.acidKnownFrom': 'certificate-ffa' }),
    },
  });
  const profile = site({
    figures: {
      methanolAssay: `${x.methanolAssay} %`, sulfuricAssay: `${x.sulfuricAssay} %`, methanolRatio: `${x.ratio} mol/mol`, conversion: `${x.conversion} %`,
      entrainedEster: `${x.entrained} kg/kg`, carryOver: `${x.carryOver} %`, methanolInLower: `${x.lower} %`, pretreatmentTarget: `${x.target} %`,
      pretreatmentMethanolPerAcid: `${x.perAcid} mol/mol`, pretreatmentAcidOfAcid: `${x.ofAcid} %`,
      [`${x.catalyst}.assay`]: `${x.catalystAssay} %`, [`${x.catalyst}.baseLoad`]: `${x.baseLoad} %`,
    },
    options: { pretreatmentMethanolBasis: x.methanolBasis, pretreatmentAcidBasis: x.acidBasis },
  });
  return [entry, profile];
}

describe('the mass balance', () => {
  const seen = new Set<string>();

  it('closes in every step of both routes: in mass, and element by element', () => {
    fc.assert(fc.property(randomLot, (x) => {
      const [entry, profile] = documents(x);
      const reading = read(entry, profile);
      expect(reading.problems).toEqual([]);
      const about: Of = {
        catalyst: x.catalyst.replace('-solution', '') as keyof typeof ALKALI, acid: x.acid,
        acyl: { A: wide(valueIn(reading, 'glycerideAcidMolarMass')), B: wide(valueIn(reading, 'acidMolarMass')) },
      };
      for (const route of ['direct', 'twoStep'] as const) {
        const { steps } = balance(entry, profile, route) as Balance;
        seen.add(steps.map(({ step }) => step).join(' '));
        expectHandedOn(steps);
        steps.forEach(expectLayers);
        let acidEster = wide(0);
        for (const step of steps) {
          if (step.step === 'retest') continue;
          const made = step.step.startsWith('pass') ? of(step.out, 'ester').times(1000) : acidEster;
          expectClosed(step, about, { in: acidEster, out: made });
          acidEster = made;
        }
        expectSame(wide(steps[0]!.totals.in.mass), wide(valueIn(reading, 'oilMass')).plus(sum(steps[0]!.charged)));
      }
    }), { seed: 20261201, numRuns: 150 });
  }, 120_000);

  it('has been seen with one, two and three passes, with and without a retest', () => {
    expect([...seen].sort()).toEqual([
      'pass1 pass2 pass3 react settle', 'pass1 pass2 pass3 retest react settle', 'pass1 pass2 react settle', 'pass1 pass2 retest react settle',
      'pass1 react settle', 'pass1 retest react settle', 'react settle',
    ]);
  });

  it('says what the retest changed, and nothing else differs', () => {
    const { steps } = balance(certified('12', { figures: { 'retest.certificateFfa': '0.6 %' }, options: { 'retest.acidKnownFrom': 'certificate-ffa' } }), site({}), 'twoStep') as Balance;
    const retest = steps.find(({ step }) => step === 'retest')!;
    const changed = COMPONENTS.filter((component) => !of(retest.in, component).eq(of(retest.out, component)));
    expect(changed).toEqual(['freeAcid', 'sulfuricAcid']);
    expectSame(wide(retest.difference.mass).toDecimalPlaces(9), sum(retest.in).minus(sum(retest.out)).abs().toDecimalPlaces(9));
    expect(Number(retest.difference.mass)).toBeGreaterThan(0);
  });
});
