import { describe, expect, it } from 'vitest';
import { readLot } from '../../src/core.js';
import { uncertainty } from '../../src/working.js';
import { lot, numberIn, read, run, site } from '../lot/lot.js';

const entry = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('2.5 g', '0', '4'), run('2.5 g', '4', '8.1')] });

describe('burettes by ISO 385:2005 (from memory)', () => {
  it.each([
    ['A-10', 10, 0.02], ['A-25', 25, 0.03], ['A-50', 50, 0.05], ['B-10', 10, 0.05], ['B-25', 25, 0.1], ['B-50', 50, 0.1],
  ] as const)('%s: %d mL, ±%d mL, triangular', (burette, capacity, tolerance) => {
    const reading = read(entry, site({ options: { burette } }));
    expect(numberIn(reading, 'u.burette')).toBeCloseTo(tolerance / Math.sqrt(6), 9);
    const asked = readLot(entry, site({ options: { burette } }), { only: ['buretteCapacity'] });
    expect('readings' in asked && Number(asked.readings['buretteCapacity']?.value)).toBe(capacity);
  });

  it('one of the site’s own', () => {
    const own = site({ figures: { buretteToleranceTyped: '0.012 mL', buretteCapacityTyped: '5 mL' }, options: { burette: 'other' } });
    expect(numberIn(read(entry, own), 'u.burette')).toBeCloseTo(0.012 / Math.sqrt(6), 9);
  });
});

// GUM 4.3 (from memory): rectangular a/√3, two weighings √2; a drop is passed by anything up to its size, so ± half of it
it.each([
  ['u.endPoint', 0.05 / 2 / Math.sqrt(3)],
  ['u.balance', (Math.SQRT2 * 0.002) / Math.sqrt(3)],
  ['u.titrant', (0.1 * 0.005) / Math.sqrt(3)],
  ['u.temperature', (0.0011 * 3) / 1.96],
] as const)('%s of the usual equipment', (key, expected) => {
  expect(numberIn(read(entry), key)).toBeCloseTo(expected, 9);
});

describe('a lot worked out by hand', () => {
  // b = c V / m: 0.16 and 0.164, mean 0.162 mmol/g; AV 9.0882 mg/g
  const b = 0.162;
  const budget = new Map(uncertainty(entry, site({}), 'acidValue')!.budget.map(({ source, u }) => [source, Number(u)]));

  it('every contribution to the acid value', () => {
    const avOf = (content: number): number => 56.1 * content;
    expect(budget.get('u.repeatability')).toBeCloseTo((0.117 * avOf(b)) / 2.8 / Math.SQRT2, 5);
    // the same burette errs alike in both: mean of c/m, not its root
    expect(budget.get('u.burette')).toBeCloseTo(avOf((0.1 / 2.5) * (0.1 / Math.sqrt(6))), 5);
    // a new drop each time: root of two
    expect(budget.get('u.endPoint')).toBeCloseTo(avOf(((0.1 / 2.5) * (0.025 / Math.sqrt(3))) / Math.SQRT2), 5);
    // the same balance: −b/m, both alike
    expect(budget.get('u.balance')).toBeCloseTo(avOf((b / 2.5) * ((Math.SQRT2 * 0.002) / Math.sqrt(3))), 5);
    expect(budget.get('u.titrant')).toBeCloseTo(avOf((b * 0.005) / Math.sqrt(3)), 5);
    expect(budget.get('u.temperature')).toBeCloseTo(avOf((b * 0.0011 * 3) / 1.96), 5);
    expect(budget.size).toBe(6);
  });

  it('together they are the whole, and their shares make one', () => {
    const whole = uncertainty(entry, site({}), 'acidValue')!;
    expect(Number(whole.u)).toBeCloseTo(Math.hypot(...budget.values()), 9);
    expect(Number(whole.expanded)).toBeCloseTo(2 * Number(whole.u), 12);
    expect(whole.budget.reduce((sum, { share }) => sum + Number(share), 0)).toBeCloseTo(1, 12);
    const shares = whole.budget.map(({ share }) => Number(share));
    expect(shares).toEqual([...shares].sort((x, y) => y - x));
  });

  it('the FFA has the same, in per cent of the reference acid', () => {
    expect(Number(uncertainty(entry, site({}), 'freeFattyAcid')!.u) / Number(uncertainty(entry, site({}), 'acidValue')!.u)).toBeCloseTo(282 / 561, 6);
  });
});

describe('what a blank adds', () => {
  const blanked = { ...entry, figures: { ...entry.figures, blank: { text: '0.2', unit: 'mL' } }, options: { blankPolicy: 'blank-subtracted' } };
  it('an end point of its own, the same in both runs', () => {
    const drop = (0.1 / 2.5) * (0.025 / Math.sqrt(3)) * 56.1;
    const budget = new Map(uncertainty(blanked, site({}), 'acidValue')!.budget.map(({ source, u }) => [source, Number(u)]));
    expect(budget.get('u.endPoint')).toBeCloseTo(drop / Math.SQRT2, 5);
    expect(budget.get('u.blankEndPoint')).toBeCloseTo(drop, 5);
  });
});

describe('a certificate', () => {
  it('carries the tolerance that the site gives it', () => {
    const certified = lot({ figures: { certificateFfa: '3 %' }, options: { acidKnownFrom: 'certificate-ffa' } });
    expect(uncertainty(certified, site({}), 'freeFattyAcid')!.budget.map(({ source }) => source)).toEqual(['u.certificate']);
    expect(Number(uncertainty(certified, site({}), 'freeFattyAcid')!.u)).toBeCloseTo((3 * 0.05) / Math.sqrt(3), 9);
  });
});

it.each([['0 mL', 'not-above-zero'], ['-0.05 mL', 'not-above-zero'], ['5 mL', 'out-of-range']])('a drop of %s is refused at its field; the result stands, its ± is not known', (dropVolume, code) => {
  const reading = read(entry, site({ figures: { dropVolume } }));
  expect(reading.problems).toMatchObject([{ code, quantity: 'dropVolume' }]);
  expect(reading.readings['acidValue']?.shown).toBe('9.1');
  expect(reading.uncertainties['acidValue']).toBeUndefined();
  expect(reading.route.verdict).toBe('two-step');
});
