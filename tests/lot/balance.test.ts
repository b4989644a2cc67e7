import { describe, expect, it } from 'vitest';
import { balance } from '../../src/lot/balance.js';
import type { Balance, BalanceStep } from '../../src/lot/balance.js';
import { monteCarloSlices } from '../../src/lot/monte-carlo.js';
import { secondCheck, uncertainty, working } from '../../src/working.js';
import { clean, nonsense, retested, sour } from '../elements/tools/lots.js';
import { certified, lot, numberIn, read, site } from './lot.js';

const of = (...documents: Parameters<typeof balance>): Balance => {
  const found = balance(...documents);
  if (!('steps' in found)) throw new Error(JSON.stringify(found));
  return found;
};
const stepOf = ({ steps }: Balance, name: string): BalanceStep => steps.find(({ step }) => step === name)!;
const massOf = (step: BalanceStep, side: 'in' | 'out', stream: string, component: string): number =>
  Number(step[side].find((flow) => flow.stream === stream && flow.component === component)?.mass);

describe('a balance', () => {
  it('of the route that the lot is charged by, where none is named', () => {
    expect(of(clean).route).toBe('direct');
    expect(of(sour).route).toBe('twoStep');
    expect(of(sour, undefined, 'direct').steps.map(({ step }) => step)).toEqual(['react', 'settle']);
    expect(of(sour).steps.map(({ step }) => step)).toEqual(['pass1', 'react', 'settle']);
    expect(of(retested).steps.map(({ step }) => step)).toEqual(['pass1', 'retest', 'react', 'settle']);
  });

  it('is the version of the format, and plain JSON', () => {
    const found = of(sour);
    expect(found.version).toBe(1);
    expect(JSON.parse(JSON.stringify(found))).toEqual(found);
  });

  it('gives each amount under a key that opens to its working', () => {
    for (const route of ['direct', 'twoStep'] as const) {
      const keys = of(sour, undefined, route).steps.flatMap(({ in: into, out, charged, layers, totals, difference }) =>
        [...into, ...out, ...charged, ...layers, ...Object.values(totals), difference].map(({ key }) => key).concat(layers.map(({ volumeKey }) => volumeKey)));
      for (const key of keys) {
        const { formula, result } = working(sour, site({}), key);
        expect([key, formula?.general.text, result]).toEqual([key, expect.stringMatching(/./), expect.stringMatching(/^[\d.,]+ (?:kg|L)$/)]);
      }
    }
  });

  it('says the same as readings and charge', () => {
    const [reading, found] = [read(sour), of(sour, undefined, 'direct')];
    const react = stepOf(found, 'react');
    expect(react.charged.map(({ stream, mass }) => [stream, Number(mass)])).toEqual([['methanol', numberIn(reading, 'direct.methanol')], ['catalyst', numberIn(reading, 'direct.catalyst')]]);
    expect(massOf(react, 'out', 'mixture', 'soap')).toBe(numberIn(reading, 'direct.soap'));
    expect(massOf(react, 'out', 'mixture', 'glycerol')).toBe(numberIn(reading, 'direct.glycerol'));
  });

  it('has figures that can be checked, and whose uncertainty is known, like any other', () => {
    const found = of(sour);
    const { key, mass } = stepOf(found, 'settle').layers[0]!;
    expect(secondCheck(sour, site({}), key, { text: Number(mass).toPrecision(4), unit: 'kg' })).toMatchObject({ verdict: 'agrees' });
    const drawn = 'balance.pass1.methanolDrawn';
    expect(Number((uncertainty(sour, site({}), drawn) as { u: string }).u)).toBeGreaterThan(0);
    for (const { difference } of found.steps) expect(uncertainty(sour, site({}), difference.key)).toBeTypeOf('object');
    const slices = monteCarloSlices({ entry: sour, site: site({}), keys: [drawn], draws: 2000, seed: 1 });
    let slice = slices.next();
    while (!slice.done) slice = slices.next();
    expect(slice.value.results[drawn]?.mean).toBeCloseTo(massOf(stepOf(found, 'pass1'), 'out', 'drawnOff', 'methanol'), -1);
  });

  it('is not changed by a reading, and changes none', () => {
    const before = JSON.stringify(read(sour));
    of(sour);
    expect(JSON.stringify(read(sour))).toBe(before);
  });
});

describe('a tonne of oil of 2.82 % FFA, by hand', () => {
  // 1000 kg, dry and clean; acid 28.2 kg at 282.468 g/mol; SV 190 mg/g and AV by acid content: 99.834 mol of acid, so
  // (190 − 5.601)/(3 · 56.1053) · 1000 = 1095.56 mol of glycerides (by hand, atomic weights as in the standards)
  const figures = { waterContent: '0 %', insolubles: '0 %' };
  const profile = site({ figures: { conversion: '100 %', methanolAssay: '100 %', 'KOH.assay': '100 %', 'KOH.baseLoad': '1 %', methanolRatio: '6 mol/mol', methanolInLower: '60 %', entrainedEster: '0 kg/kg' } });
  const found = of(certified('2.82', { figures, options: { glyceridesBy: 'saponification-value' } }), profile, 'direct');

  it('reacts as the equation says', () => {
    const step = stepOf(found, 'react');
    const glycerides = massOf(step, 'in', 'oil', 'glycerides');
    const acid = massOf(step, 'in', 'oil', 'freeAcid');
    expect(glycerides + acid).toBeCloseTo(1000, 9);
    // glycerol 92.094 g a mole; ester brings CH2 more than the acid it is made of, three times
    const moles = massOf(step, 'out', 'mixture', 'glycerol') / 0.092094;
    expect(moles).toBeCloseTo(1095.56, 0);
    expect(massOf(step, 'out', 'mixture', 'ester')).toBeCloseTo(glycerides + moles * 3 * 0.032042 - moles * 0.092094, 6);
    // of 6 mol of methanol a mole three are left
    expect(massOf(step, 'out', 'mixture', 'methanol')).toBeCloseTo(moles * 3 * 0.032042, 6);
    // 10 kg of KOH go on as they are; the rest has met the acid and made a mole of water a mole
    expect(massOf(step, 'out', 'mixture', 'catalyst')).toBeCloseTo(10, 9);
    expect(massOf(step, 'out', 'mixture', 'water')).toBeCloseTo((acid / 0.282468) * 0.018015, 6);
    // potassium oleate, 320.558 g/mol
    expect(massOf(step, 'out', 'mixture', 'soap')).toBeCloseTo((acid / 0.282468) * 0.3205583, 6);
  });

  it('settles: four tenths of the methanol stay with the ester, soap and salt go down', () => {
    const step = stepOf(found, 'settle');
    const left = massOf(step, 'in', 'mixture', 'methanol');
    expect(massOf(step, 'out', 'esterLayer', 'methanol')).toBeCloseTo(0.4 * left, 9);
    expect(massOf(step, 'out', 'glycerolLayer', 'methanol')).toBeCloseTo(0.6 * left, 9);
    expect(step.out.filter(({ component }) => component === 'soap' || component === 'salt').map(({ stream }) => stream)).toEqual(['glycerolLayer', 'glycerolLayer']);
    // 10 kg of KOH, 178.236 mol, give as much water when they are neutralised
    expect(massOf(step, 'out', 'glycerolLayer', 'water') - massOf(step, 'in', 'mixture', 'water') - massOf(step, 'in', 'neutralisingAcid', 'water')).toBeCloseTo(0.178236 * 18.015, 4);
  });
});

describe('what is drawn off after a pass', () => {
  it('is all of methanol, water and sulfuric acid but what the site lets stay', () => {
    const step = stepOf(of(sour, site({ figures: { carryOver: '25 %' } })), 'pass1');
    for (const component of ['methanol', 'water', 'sulfuricAcid']) {
      expect(massOf(step, 'out', 'drawnOff', component)).toBeCloseTo(3 * massOf(step, 'out', 'oil', component), 9);
    }
    expect(step.layers.map(({ stream }) => stream)).toEqual(['drawnOff', 'oil']);
  });
});

describe('no balance', () => {
  it('names the fields that are missing', () => {
    expect(balance(lot({}))).toEqual({ version: 1, missing: expect.arrayContaining(['oilAmount', 'run1.sample']) as unknown });
  });

  it('names what was refused', () => {
    expect(balance(nonsense, undefined, 'twoStep')).toEqual({ version: 1, problem: expect.objectContaining({ code: expect.any(String) as unknown }) as unknown });
  });

  it('says what is wrong with a document', () => {
    expect(balance({ version: 1, weight: 3 })).toEqual({ version: 1, faults: [{ code: 'unknown-key', path: 'weight', found: 'weight', in: 'entry' }] });
    expect(balance(sour, { version: 9 })).toMatchObject({ faults: [{ code: 'newer-version', in: 'site' }] });
  });
});
