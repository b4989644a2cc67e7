import { describe, expect, it } from 'vitest';
import { blend } from '../../src/decision/blend/blend.js';
import type { Blended, NoBlend } from '../../src/decision/blend/blend.js';
import { solved } from '../../src/decision/blend/programme.js';
import type { BlendItem, BlendTask } from '../../src/decision/blend/stock.js';
import { twoLots } from '../../src/decision/blend/two-lots.js';
import { Decimal } from '../../src/formula/decimal.js';

// Small blends worked out by hand.

const d = (text: string): Decimal => new Decimal(text);

/** `900 kg, 5 %`, with a price, kg that must go in, water and insolubles where they matter. */
function item(available: string, ffa: string, more: { cost?: string; least?: string; water?: string; insolubles?: string } = {}): BlendItem {
  const { cost, least = '0', water, insolubles } = more;
  return {
    name: ffa, available: d(available), least: d(least), ...(cost !== undefined && { cost: d(cost) }),
    shares: { freeFattyAcid: d(ffa), ...(water !== undefined && { water: d(water) }), ...(insolubles !== undefined && { insolubles: d(insolubles) }) },
  };
}

interface Wanted {
  readonly ffa?: string;
  readonly water?: string;
  readonly insolubles?: string;
  readonly mass?: readonly ['at-least' | 'exactly' | 'at-most', string];
  readonly goal?: BlendTask['goal'];
  readonly step?: string;
}
const task = (items: readonly BlendItem[], { ffa = '3', water, insolubles, mass, goal = 'use-sour', step = '1' }: Wanted = {}): BlendTask => ({
  items, goal, step: d(step), ...(mass && { mass: { rule: mass[0], of: d(mass[1]) } }),
  limits: { freeFattyAcid: d(ffa), ...(water !== undefined && { water: d(water) }), ...(insolubles !== undefined && { insolubles: d(insolubles) }) },
});

function given(of: BlendTask): Blended {
  const found = blend(of);
  if ('refused' in found) throw new Error(JSON.stringify(found));
  return found;
}
function refused(of: BlendTask): NoBlend {
  const found = blend(of);
  if (!('refused' in found)) throw new Error(JSON.stringify(found));
  return found;
}
const masses = (of: BlendTask): readonly number[] => given(of).masses.map(Number);
const told = ({ remedies }: NoBlend): readonly unknown[] => remedies.map((remedy) => Object.values(remedy).map((part) => (part instanceof Decimal ? part.toString() : part)));

describe('using up sour oil', () => {
  it('takes as much as the clean oil carries, and no more clean oil than that needs', () => {
    // 5 % is 2 above the limit, 1 % is 2 below: kilogram for kilogram
    expect(masses(task([item('900', '5'), item('400', '1')]))).toEqual([400, 400]);
    expect(masses(task([item('300', '5'), item('400', '1')]))).toEqual([300, 300]);
  });

  it('of equal sour oil takes the cheaper clean oil, where all have prices', () => {
    const oils = [item('300', '5', { cost: '0' }), item('400', '1', { cost: '0.8' }), item('900', '2', { cost: '0.3' })];
    // 600 kg·% to carry: 300 kg at 0.8 are 240, 600 kg at 0.3 are 180
    expect(masses(task(oils))).toEqual([300, 0, 600]);
    // without one of the prices: the fewest kg of clean oil
    expect(masses(task([oils[0]!, oils[1]!, item('900', '2')]))).toEqual([300, 300, 0]);
  });

  it('keeps water and insolubles too', () => {
    // water: 0.3 is 0.2 above, 0.05 is 0.05 below: 1 : 4, though the acid would allow 1 : 1
    expect(masses(task([item('900', '5', { water: '0.3' }), item('400', '1', { water: '0.05' })], { water: '0.1' }))).toEqual([100, 400]);
    expect(masses(task([item('900', '5', { insolubles: '0.5' }), item('400', '1', { insolubles: '0' })], { insolubles: '0.1' }))).toEqual([100, 400]);
  });

  it('says when no oil is above the limit', () => {
    const { remarks, mixture } = given(task([item('900', '2'), item('400', '1')], { mass: ['exactly', '500'] }));
    expect([remarks, mixture.sour.toString(), mixture.mass.toString()]).toEqual([['none-sour'], '0', '500']);
  });
});

describe('least cost', () => {
  const oils = [item('1000', '5', { cost: '0.30' }), item('1000', '1', { cost: '0.60' })];

  it('blends to the limit', () => {
    const found = given(task(oils, { goal: 'least-cost', mass: ['exactly', '1000'] }));
    expect(found.masses.map(Number)).toEqual([500, 500]);
    expect(found.mixture.cost!.toString()).toBe('450');
  });

  it('what is at its limit, worth by the step that people speak in', () => {
    const { bindings } = given(task(oils, { goal: 'least-cost', mass: ['exactly', '1000'] }));
    // 0.1 % more: 525 sour and 475 clean cost 442.50; 100 kg less cost a tenth less
    expect(bindings.map(({ code, of, step, worth }) => [code, of, step.toString(), worth?.toNumber().toFixed(4)])).toEqual([
      ['mass', undefined, '-100', '45.0000'], ['share', 'freeFattyAcid', '0.1', '7.5000'],
    ]);
  });

  it('takes oil that brings money as far as it may, and oil for nothing', () => {
    const paid = [item('1000', '5', { cost: '-0.10' }), item('800', '1', { cost: '0.05' })];
    // each kg of sour oil brings 0.10 and needs a kg of clean oil for 0.05
    expect(masses(task(paid, { goal: 'least-cost' }))).toEqual([800, 800]);
    expect(masses(task([item('500', '1', { cost: '0' }), item('500', '2', { cost: '0.1' })], { goal: 'least-cost', mass: ['at-least', '400'] }))[1]).toBe(0);
  });

  it('falls back to sour oil where a price is missing, and says so', () => {
    const { goal, remarks } = given(task([oils[0]!, item('400', '1')], { goal: 'least-cost' }));
    expect([goal, remarks]).toEqual(['use-sour', ['prices-missing']]);
  });

  it('of nothing asked for: nothing is cheapest', () => {
    expect(refused(task(oils, { goal: 'least-cost' })).refused).toBe('nothing-is-cheapest');
    expect(refused(task(oils, { goal: 'least-cost', mass: ['at-most', '500'] })).refused).toBe('nothing-is-cheapest');
    // unless some must go in
    expect(masses(task([item('1000', '5', { cost: '0.3', least: '200' }), oils[1]!], { goal: 'least-cost' }))).toEqual([200, 200]);
  });

  it('what must go in, and is dear, is worth less of it', () => {
    const found = given(task([...oils, item('500', '2', { cost: '2', least: '300' })], { goal: 'least-cost', mass: ['exactly', '1000'] }));
    const { worth, step } = found.bindings.find(({ code }) => code === 'must-use')!;
    // 100 kg at 2 % and 2 a kg give way to 25 kg of 5 % and 75 kg of 1 %: 200 − (7.5 + 45)
    expect([step.toString(), worth!.toNumber().toFixed(4)]).toEqual(['-100', '147.5000']);
  });
});

describe('masses that can be pumped', () => {
  it('are whole steps on the safe side', () => {
    // exactly: 333.3 of 5 % and 666.7 of 2 %
    const found = given(task([item('900', '5'), item('900', '2')], { mass: ['exactly', '1000'] }));
    expect(found.masses.map(Number)).toEqual([333, 667]);
    expect(masses(task([item('900', '5'), item('900', '2')], { mass: ['exactly', '1000'], step: '10' }))).toEqual([330, 670]);
    expect(masses(task([item('900', '5'), item('900', '2')], { mass: ['at-least', '1000'], step: '50', goal: 'use-sour' }))).toEqual([450, 900]);
  });

  it('or all there is of a lot', () => {
    expect(masses(task([item('333.25', '5'), item('900', '1')], { step: '10' }))).toEqual([333.25, 340]);
  });

  it('finer where whole steps miss a limit, which is said', () => {
    // acid allows up to 333.3 kg of the sour, water at least 332.9: no whole ten
    const { masses: found, step, remarks } = given(task([item('900', '5', { water: '0' }), item('900', '2', { water: '0.1499' })], { water: '0.1', mass: ['exactly', '1000'], step: '10' }));
    expect([found.map(Number), step.toString(), remarks]).toEqual([[333, 667], '1', ['finer-step']]);
  });

  it('keep a limit to the last digit, far below what floating point tells apart', () => {
    expect(masses(task([item('400', '5.0000000000000000001'), item('400', '1')]))).toEqual([399, 400]);
    expect(masses(task([item('400', '5'), item('400', '1')]))).toEqual([400, 400]);
    expect(masses(task([item('900', '5.0000000000000000001'), item('900', '2')], { mass: ['exactly', '900'] }))).toEqual([299, 601]);
  });

  it('the one blend there is, in thirds, cannot be weighed', () => {
    // water and acid meet in a single ratio of 1 : 2, of a mass that thirds do not divide
    const single = task([item('900', '5', { water: '0' }), item('900', '2', { water: '0.15' })], { water: '0.1', mass: ['exactly', '1000'] });
    expect(refused(single).refused).toBe('step-too-coarse');
    expect(masses({ ...single, mass: { rule: 'exactly', of: d('900') } })).toEqual([300, 600]);
  });
});

describe('no blend', () => {
  it('of nothing', () => {
    expect(refused(task([])).refused).toBe('empty-stock');
    expect(refused(task([item('0', '1')])).refused).toBe('empty-stock');
  });

  it('below the cleanest lot: the limit would have to rise to it', () => {
    const found = refused(task([item('500', '5'), item('500', '3.4')], { mass: ['at-least', '600'] }));
    expect([found.refused, found.share, found.found?.toString()]).toEqual(['above-all', 'freeFattyAcid', '3.4']);
    // 500 kg of 3.4 % and 100 kg of 5 % are 3.67 %
    expect(told(found)).toEqual([['raise-limit', 'freeFattyAcid', '3.67']]);
    expect(refused(task([item('500', '5'), item('500', '3.4')])).refused).toBe('above-all');
  });

  it('of too little clean oil: a higher limit, less, or more clean oil', () => {
    const found = refused(task([item('900', '5'), item('300', '1')], { mass: ['exactly', '1000'] }));
    // 700 · 5 + 300 · 1 is 3.8 % of 1000; 300 kg carry 300 kg; 500 kg are needed
    expect([found.refused, told(found)]).toEqual(['together', [['raise-limit', 'freeFattyAcid', '3.8'], ['less-mass', '600'], ['more-of', 1, '200']]]);
  });

  it('of less than is asked for', () => {
    const found = refused(task([item('100', '1'), item('50', '2')], { mass: ['exactly', '500'] }));
    expect([found.refused, found.found?.toString(), told(found)]).toEqual(['too-little', '150', [['less-mass', '150'], ['more-of', 0, '350']]]);
  });

  it('of more that must go in than is asked for, or than the rest carries', () => {
    const much = refused(task([item('900', '2', { least: '600' }), item('900', '1')], { mass: ['at-most', '500'] }));
    expect([much.refused, much.found?.toString(), told(much)]).toEqual(['must-use-too-much', '600', [['more-mass', '600'], ['less-of', 0, '500']]]);
    const sour = refused(task([item('900', '5', { least: '600' }), item('400', '1')]));
    expect([sour.refused, told(sour)]).toEqual(['together', [['raise-limit', 'freeFattyAcid', '3.4'], ['less-of', 0, '400'], ['more-of', 1, '200']]]);
  });

  it('where two limits stand in the way no single change is named', () => {
    const found = refused(task([item('500', '5', { water: '0.5' }), item('500', '4', { water: '0.4' })], { water: '0.1', mass: ['exactly', '800'] }));
    expect([found.refused, told(found)]).toEqual(['above-all', []]);
  });

  it('where sour oil is too wet for any of it to go in', () => {
    expect(refused(task([item('500', '5', { water: '0.5' }), item('500', '1', { water: '0.1' })], { water: '0.1' })).refused).toBe('nothing-fits');
  });
});

describe('a programme', () => {
  const two = { objective: [1, 1], lower: [0, 0], upper: [Infinity, 5], rows: [{ of: [1, -1], least: -1 }] };

  it('without an end is unbounded, between bounds that cross infeasible', () => {
    expect(solved({ ...two, best: 'maximize' })).toBe('unbounded');
    expect(solved({ ...two, best: 'maximize', lower: [0, 6] })).toBe('infeasible');
    expect(solved({ ...two, best: 'minimize', rows: [{ of: [0, 1], least: 6 }] })).toBe('infeasible');
  });

  it('counts its columns from their lower bounds, in cans as in tank farms', () => {
    for (const size of [1e-3, 1, 1e7]) {
      const found = solved({ best: 'minimize', objective: [2, 1], lower: [2 * size, 0], upper: [9 * size, 3 * size], rows: [{ of: [1, 1], least: 7 * size }] });
      expect(typeof found !== 'string' && found.values.map((value) => Number((value / size).toFixed(6)))).toEqual([4, 3]);
    }
  });
});

describe('two lots in closed form', () => {
  const shares = (freeFattyAcid: string, water?: string): BlendItem['shares'] => ({ freeFattyAcid: d(freeFattyAcid), ...(water !== undefined && { water: d(water) }) });
  const pair = (...of: Parameters<typeof twoLots>): unknown => {
    const found = twoLots(...of);
    return found && [found.most.toSignificantDigits(8).toString(), found.by];
  };

  it.each([
    ['5 % and 1 % at 3 %: one half', shares('5'), shares('1'), shares('3'), ['50', 'freeFattyAcid']],
    ['5 % and 2 % at 3 %: a third', shares('5'), shares('2'), shares('3'), ['33.333333', 'freeFattyAcid']],
    ['water sets it', shares('5', '0.5'), shares('1', '0.05'), shares('3', '0.1'), ['11.111111', 'water']],
    ['both keep it', shares('2'), shares('1'), shares('3'), ['100', undefined]],
    ['neither does', shares('5'), shares('4'), shares('3'), undefined],
    ['each misses another', shares('5', '0'), shares('1', '0.2'), shares('3', '0.1'), ['50', 'freeFattyAcid']],
    ['each misses another too far', shares('5', '0.05'), shares('2.9', '0.5'), shares('3', '0.1'), undefined],
    ['an unknown share sets nothing', shares('5'), shares('1', '0.2'), shares('3', '0.1'), ['50', 'freeFattyAcid']],
  ] as const)('%s', (_, first, second, limits, expected) => {
    expect(pair(first, second, limits)).toEqual(expected);
  });
});
